import type { PhotovoltaicArray } from "../core/array/array.ts";
import type { TrackingRule } from "../core/rules/rule.ts";
import { CAUSES } from "../core/tracking/causes.ts";
import type { Converter } from "../core/tracking/converter.ts";
import type { Ledger } from "../core/tracking/ledger.ts";
import { SPAN_COLUMNS } from "../core/tracking/ledger.ts";
import type { LostByCause } from "./energy.ts";

/** What is under test. */
export interface EfficiencyBench {
  array: PhotovoltaicArray;
  rule: TrackingRule;
  converter: Converter;
  cellTemperature: number;
}

/** Efficiency, and what was lost as shares of the available energy. */
export interface EfficiencyShares {
  efficiency: number;
  lostByCause: LostByCause;
}

/** Efficiency and lost shares of one span; a span without available energy counts as efficiency 1, nothing lost. */
export function sharesOf(ledger: Ledger, span: number): EfficiencyShares {
  const [available, , ...lost] = ledger.spans.subarray(span * SPAN_COLUMNS, (span + 1) * SPAN_COLUMNS);
  const shares = CAUSES.map((cause, k) => [cause, available > 0 ? lost[k] / available : 0] as const);
  const efficiency = 1 - shares.reduce((sum, [, share]) => sum + share, 0);
  return { efficiency, lostByCause: Object.fromEntries(shares) as LostByCause };
}
