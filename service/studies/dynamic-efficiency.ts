import { laggedTemperatures } from "../climate/thermal-lag.ts";
import type { PointTrace } from "../core/array/maximum-power-trace.ts";
import { emptyTrace } from "../core/array/maximum-power-trace.ts";
import type { Extremes } from "../core/tracking/ledger.ts";
import { openLedger } from "../core/tracking/ledger.ts";
import { trackStepped } from "../core/tracking/stepped.ts";
import type { EfficiencyBench, EfficiencyShares } from "./efficiency-bench.ts";
import { sharesOf } from "./efficiency-bench.ts";
import type { SequenceName } from "./ramp-sequence.ts";
import { rampSequence, SEQUENCES } from "./ramp-sequence.ts";
import { StudyError } from "./study-error.ts";

/** Cells that follow the light with a first-order lag: cellTemperature + rise G/1000 at rest. */
export interface TemperatureLag {
  /** K at 1000 W/m2. */
  rise: number;
  /** s. */
  timeConstant: number;
}

/** The course of one row, second by second: means over each span, and the extremes of its control periods. */
export interface RowTrace extends Extremes {
  slope: number;
  /** s. */
  step: number;
  /** W/m2 at the start of each span, shape [n]; straight between. */
  irradiance: Float64Array;
  maximum: PointTrace;
  operating: PointTrace;
}

/** One row of a dynamic test: a slope, repeated. */
export interface EfficiencyRow extends EfficiencyShares {
  /** W/m2/s. */
  slope: number;
  repetitions: number;
  /** s, the settling at the low level counted. */
  duration: number;
}

/** A dynamic test: its rows, and the unweighted mean of their efficiencies. */
export interface DynamicEfficiency {
  rows: EfficiencyRow[];
  efficiency: number;
  /** s. */
  duration: number;
  trace: RowTrace | null;
}

/** What a dynamic test may add to the standard's: cells that warm, and the course of one row. */
export interface DynamicOptions {
  temperatureLag: TemperatureLag | null;
  traceSlope: number | null;
}

/** Longest span of a traced row, s. */
const TRACE_STEP = 1;

/** The dynamic test: every row on the rule's own clock, waking anew at the start of its settling. */
export function dynamicTest(bench: EfficiencyBench, test: SequenceName, options: DynamicOptions): DynamicEfficiency {
  const { traceSlope, temperatureLag } = options;
  const rows: EfficiencyRow[] = [];
  let trace: RowTrace | null = null;
  for (const row of SEQUENCES[test].rows) {
    const traced = row.slope === traceSlope;
    const series = rampSequence(
      test,
      row,
      Math.min(traced ? TRACE_STEP : Number.POSITIVE_INFINITY, lagStep(temperatureLag)),
    );
    const { irradiance, step, settling } = series;
    // Span 0 is the settling, which does not count; span 1 the ramps.
    const ledger = openLedger(irradiance.length, 2, { operating: traced, causes: false, extremes: traced });
    const maximum = traced ? emptyTrace(irradiance.length) : null;
    const weather = {
      irradiance,
      cellTemperature: temperaturesOf(bench.cellTemperature, temperatureLag, { irradiance, step }),
      skipped: null,
      spanOf: new Uint16Array(irradiance.length).fill(1, settling),
      step,
      timing: "instant" as const,
    };
    trackStepped(bench.array, weather, [{ rule: bench.rule, converter: bench.converter, ledger }], maximum);
    rows.push({ ...row, duration: series.duration, ...sharesOf(ledger, 1) });
    if (maximum === null) continue;
    trace = { slope: row.slope, step, irradiance, maximum, operating: ledger.operating!, ...ledger.extremes! };
  }
  if (traceSlope !== null && trace === null) throw noSuchSlope(test);
  const efficiency = rows.reduce((sum, row) => sum + row.efficiency, 0) / rows.length;
  return { rows, efficiency, duration: rows.reduce((sum, row) => sum + row.duration, 0), trace };
}

/** Longest span that resolves a lag, s. */
function lagStep(temperatureLag: TemperatureLag | null): number {
  return temperatureLag === null ? Number.POSITIVE_INFINITY : Math.max(0.1, temperatureLag.timeConstant / 10);
}

/** Cell temperature at each sample, degC; with a lag the row starts at rest. */
function temperaturesOf(
  cellTemperature: number,
  temperatureLag: TemperatureLag | null,
  { irradiance, step }: { irradiance: Float64Array; step: number },
): Float64Array {
  if (temperatureLag === null) return new Float64Array(irradiance.length).fill(cellTemperature);
  const atRest = irradiance.map((value) => cellTemperature + (temperatureLag.rise * value) / 1000);
  return laggedTemperatures(atRest, step, temperatureLag.timeConstant, "instant");
}

function noSuchSlope(test: SequenceName): StudyError {
  const slopes = SEQUENCES[test].rows.map(({ slope }) => slope).join(", ");
  return new StudyError(
    "unknown-slope",
    "/traceSlope",
    `${test} has no such row; its slopes are ${slopes} W/m2/s.`,
    `one of: ${slopes}`,
  );
}
