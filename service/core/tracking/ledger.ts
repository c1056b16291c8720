import type { PointTrace } from "../array/maximum-power-trace.ts";
import { emptyTrace } from "../array/maximum-power-trace.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import type { Cascade } from "./causes.ts";
import { addCauses, CAUSES } from "./causes.ts";

/** Width of an irradiance class, W/m2. */
export const CLASS_WIDTH = 100;
const CLASSES = 21;
/** Columns of a month's row: available, clipped, then the causes. */
export const MONTH_COLUMNS = 2 + CAUSES.length;
/** Columns of a class's row: samples, available, lost. */
export const CLASS_COLUMNS = 3;

/** Which columns a sample leaves behind. */
export interface TraceChoice {
  /** Operating voltage, current and power. */
  operating: boolean;
  /** Lost energy by cause. */
  causes: boolean;
}

/**
 * The sums of one rule over a climate, in W times samples. Months and classes each hold every sample once, so either
 * adds up to the total.
 */
export interface Ledger {
  /** Shape [months, MONTH_COLUMNS]. */
  readonly months: Float64Array;
  /** Shape [21, CLASS_COLUMNS]. */
  readonly classes: Float64Array;
  /** Columns of the rule's operating point; null when not asked for. */
  readonly operating: PointTrace | null;
  /** Lost W by cause, shape [samples, 6]; null when not asked for. */
  readonly causes: Float64Array | null;
}

/** An empty ledger over `samples` samples in `months` months. */
export function openLedger(samples: number, months: number, choice: TraceChoice): Ledger {
  return {
    months: new Float64Array(months * MONTH_COLUMNS),
    classes: new Float64Array(CLASSES * CLASS_COLUMNS),
    operating: choice.operating ? emptyTrace(samples) : null,
    causes: choice.causes ? new Float64Array(samples * CAUSES.length) : null,
  };
}

/** The irradiance class (row of `Ledger.classes`) of an irradiance, W/m2. */
export function irradianceClass(irradiance: number): number {
  return Math.min(CLASSES - 1, Math.max(0, Math.floor(irradiance / CLASS_WIDTH)));
}

/** Enters one sample: its month, its irradiance class (row), its cascade of powers and what the limits clipped (W). */
export function enterSample(ledger: Ledger, at: SamplePlace, cascade: Cascade, clipped: number): void {
  const { months, classes, causes } = ledger;
  const month = at.month * MONTH_COLUMNS;
  const row = at.irradianceClass * CLASS_COLUMNS;
  months[month] += cascade.available;
  months[month + 1] += clipped;
  addCauses(cascade, months, month + 2);
  classes[row + 1] += cascade.available;
  classes[row + 2] += cascade.available - (1 - cascade.interrupted) * cascade.operating;
  if (causes !== null) addCauses(cascade, causes, at.sample * CAUSES.length);
}

/** Where a sample belongs. */
export interface SamplePlace {
  sample: number;
  month: number;
  irradianceClass: number;
}

/** Writes the operating point of a sample; without effect when the trace was not asked for. */
export function enterOperating(ledger: Ledger, sample: number, point: OperatingPoint): void {
  const { operating } = ledger;
  if (operating === null) return;
  operating.voltage[sample] = point.voltage;
  operating.current[sample] = point.current;
  operating.power[sample] = point.power;
}
