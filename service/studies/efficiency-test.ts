import { laggedTemperatures } from "../climate/thermal-lag.ts";
import type { PhotovoltaicArray } from "../core/array/array.ts";
import { photovoltaicArray } from "../core/array/array.ts";
import { emptyCondition, enterCondition } from "../core/array/condition.ts";
import type { PointTrace } from "../core/array/maximum-power-trace.ts";
import { emptyTrace } from "../core/array/maximum-power-trace.ts";
import { bracketedRoot } from "../core/numeric/bracketed-root.ts";
import type { RuleChoice } from "../core/rules/index.ts";
import { completeSettings, prepareRule } from "../core/rules/index.ts";
import type { Settings, TrackingRule } from "../core/rules/rule.ts";
import { CAUSES } from "../core/tracking/causes.ts";
import type { Converter } from "../core/tracking/converter.ts";
import type { Extremes, Ledger } from "../core/tracking/ledger.ts";
import { openLedger, SPAN_COLUMNS } from "../core/tracking/ledger.ts";
import { trackSteady } from "../core/tracking/steady.ts";
import { trackStepped } from "../core/tracking/stepped.ts";
import type { ConverterChoice } from "./converter-choice.ts";
import { buildConverter } from "./converter-choice.ts";
import type { LostByCause } from "./energy.ts";
import type { BuiltModule, ModuleChoice } from "./module-choice.ts";
import { buildModule } from "./module-choice.ts";
import { rampSequence, SEQUENCES, type SequenceName } from "./ramp-sequence.ts";
import { checkRule } from "./rule-relations.ts";
import { StudyError } from "./study-error.ts";

/** The edition whose sequences and weights are used: EN 50530:2010, from memory; their durations close. */
export const EDITION = "EN 50530:2010 (sequences from memory)";

/** Fractions of the generator's maximum power at 1000 W/m2, and their weights (EN 50530:2010, from memory). */
const LEVELS = [0.05, 0.1, 0.2, 0.25, 0.3, 0.5, 0.75, 1];
const EUROPEAN: Record<number, number> = { 0.05: 0.03, 0.1: 0.06, 0.2: 0.13, 0.3: 0.1, 0.5: 0.48, 1: 0.2 };
const CEC: Record<number, number> = { 0.1: 0.04, 0.2: 0.05, 0.3: 0.12, 0.5: 0.21, 0.75: 0.53, 1: 0.05 };

export interface EfficiencyTestRequest {
  module: ModuleChoice;
  rule: RuleChoice;
  converter: ConverterChoice;
  test: SequenceName | "static";
  /** degC, constant; the ambient temperature where there is a lag. */
  cellTemperature: number;
  /** Lets the cells warm with the light; null keeps their temperature constant, as the standard does. */
  temperatureLag: TemperatureLag | null;
  /** Slope (W/m2/s) of the row whose course is wanted; null for none. */
  traceSlope: number | null;
}

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
export interface EfficiencyRow {
  /** W/m2/s. */
  slope: number;
  repetitions: number;
  /** s, the settling at the low level counted. */
  duration: number;
  efficiency: number;
  /** Shares of the available energy. */
  lostByCause: LostByCause;
}

/** One level of the static test. */
export interface EfficiencyLevel {
  /** 1, of the maximum power at 1000 W/m2. */
  level: number;
  /** W/m2 at which the module gives that power. */
  irradiance: number;
  efficiency: number;
  /** Shares of the available power. */
  lostByCause: LostByCause;
}

export interface EfficiencyTestResult {
  built: BuiltModule;
  rule: { kind: RuleChoice["kind"]; settings: Settings };
  /** Null for the static test. */
  dynamic: { rows: EfficiencyRow[]; efficiency: number; duration: number; trace: RowTrace | null } | null;
  /** Null for a dynamic test. */
  static: { levels: EfficiencyLevel[]; europeanWeighted: number; cecWeighted: number } | null;
}

/** A rule's MPPT efficiency by the standard's sequences, on one module. @throws StudyError */
export function testEfficiency(request: EfficiencyTestRequest): EfficiencyTestResult {
  const built = buildModule(request.module);
  const array = photovoltaicArray(built.module, { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 });
  const ruleArray = { modulesInSeries: 1, standard: array.standard };
  const settings = completeSettings(request.rule, ruleArray);
  checkRule(request.rule.kind, settings, 1, "/rule");
  if (Object.values(settings).some((value) => value instanceof Float64Array)) {
    throw new StudyError("column-without-climate", "/rule", "The test has no climate: give a single number.");
  }
  const bench: Bench = {
    array,
    rule: prepareRule(request.rule.kind, settings, ruleArray),
    converter: buildConverter(request.converter, array.standard),
    cellTemperature: request.cellTemperature,
    temperatureLag: request.temperatureLag,
  };
  if (request.test === "static" && request.temperatureLag !== null) {
    throw new StudyError(
      "lag-without-ramps",
      "/temperatureLag",
      "The static test is at rest: leave temperatureLag out.",
    );
  }
  const rule = { kind: request.rule.kind, settings };
  if (request.test === "static" && request.traceSlope !== null) {
    throw new StudyError("unknown-slope", "/traceSlope", "The static test has no slopes: leave traceSlope out.");
  }
  if (request.test === "static") return { built, rule, dynamic: null, static: staticTest(bench) };
  return { built, rule, dynamic: dynamicTest(bench, request.test, request.traceSlope), static: null };
}

/** What is under test. */
interface Bench {
  array: PhotovoltaicArray;
  rule: TrackingRule;
  converter: Converter;
  cellTemperature: number;
  temperatureLag: TemperatureLag | null;
}

/** Longest span of a traced row, s. */
const TRACE_STEP = 1;

function dynamicTest(bench: Bench, test: SequenceName, traceSlope: number | null) {
  const rows: EfficiencyRow[] = [];
  let trace: RowTrace | null = null;
  for (const row of SEQUENCES[test].rows) {
    const traced = row.slope === traceSlope;
    const series = rampSequence(test, row, Math.min(traced ? TRACE_STEP : Number.POSITIVE_INFINITY, lagStep(bench)));
    const { irradiance, step, settling } = series;
    // Span 0 is the settling, which does not count; span 1 the ramps.
    const ledger = openLedger(irradiance.length, 2, { operating: traced, causes: false, extremes: traced });
    const maximum = traced ? emptyTrace(irradiance.length) : null;
    const weather = {
      irradiance,
      cellTemperature: temperaturesOf(bench, irradiance, step),
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
function lagStep({ temperatureLag }: Bench): number {
  return temperatureLag === null ? Number.POSITIVE_INFINITY : Math.max(0.1, temperatureLag.timeConstant / 10);
}

/** Cell temperature at each sample, degC; with a lag the row starts at rest. */
function temperaturesOf({ cellTemperature, temperatureLag }: Bench, irradiance: Float64Array, step: number) {
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
    slopes,
  );
}

/** Efficiency and lost shares of one span; a span without available energy counts as efficiency 1, nothing lost. */
function sharesOf(ledger: Ledger, span: number): { efficiency: number; lostByCause: LostByCause } {
  const [available, , ...lost] = ledger.spans.subarray(span * SPAN_COLUMNS, (span + 1) * SPAN_COLUMNS);
  const shares = CAUSES.map((cause, k) => [cause, available > 0 ? lost[k] / available : 0] as const);
  const efficiency = 1 - shares.reduce((sum, [, share]) => sum + share, 0);
  return { efficiency, lostByCause: Object.fromEntries(shares) as LostByCause };
}

function staticTest(bench: Bench) {
  const levels = LEVELS.map((level): EfficiencyLevel => {
    const irradiance = irradianceFor(bench, level);
    const ledger = openLedger(1, 1, { operating: false, causes: false });
    const weather = {
      irradiance: Float64Array.of(irradiance),
      cellTemperature: Float64Array.of(bench.cellTemperature),
      skipped: null,
      spanOf: new Uint16Array(1),
    };
    trackSteady(bench.array, weather, [{ rule: bench.rule, converter: bench.converter, ledger }], null);
    return { level, irradiance, ...sharesOf(ledger, 0) };
  });
  const weighted = (weights: Record<number, number>): number =>
    levels.reduce((sum, { level, efficiency }) => sum + (weights[level] ?? 0) * efficiency, 0);
  return { levels, europeanWeighted: weighted(EUROPEAN), cecWeighted: weighted(CEC) };
}

/** The irradiance (W/m2) at which the array's maximum power is `level` of that at 1000 W/m2. */
function irradianceFor({ array, cellTemperature }: Bench, level: number): number {
  if (level === 1) return 1000;
  const condition = emptyCondition();
  const powerAt = (irradiance: number): number => {
    enterCondition(condition, array, irradiance, cellTemperature);
    return condition.maximum.power;
  };
  const full = powerAt(1000);
  return bracketedRoot((irradiance) => powerAt(irradiance) - level * full, 1, 1000);
}
