import { photovoltaicArray } from "../core/array/array.ts";
import type { RuleChoice } from "../core/rules/index.ts";
import { completeSettings, prepareRule } from "../core/rules/index.ts";
import type { Settings } from "../core/rules/rule.ts";
import type { ConverterChoice } from "./converter-choice.ts";
import { buildConverter } from "./converter-choice.ts";
import type { DynamicEfficiency, TemperatureLag } from "./dynamic-efficiency.ts";
import { dynamicTest } from "./dynamic-efficiency.ts";
import type { EfficiencyBench } from "./efficiency-bench.ts";
import type { BuiltModule, ModuleChoice } from "./module-choice.ts";
import { buildModule } from "./module-choice.ts";
import type { SequenceName } from "./ramp-sequence.ts";
import { rampSequence, SEQUENCES } from "./ramp-sequence.ts";
import { checkRule } from "./rule-relations.ts";
import type { StaticEfficiency } from "./static-efficiency.ts";
import { staticTest } from "./static-efficiency.ts";
import { StudyError } from "./study-error.ts";

/** The edition whose sequences and weights are used: EN 50530:2010, from memory; their durations close. */
export const EDITION = "EN 50530:2010 (sequences from memory)";

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

export interface EfficiencyTestResult {
  built: BuiltModule;
  rule: { kind: RuleChoice["kind"]; settings: Settings };
  /** Null for the static test. */
  dynamic: DynamicEfficiency | null;
  /** Null for a dynamic test. */
  static: StaticEfficiency | null;
}

/** Seconds that a dynamic test takes, all rows. */
export function testDuration(test: SequenceName): number {
  return SEQUENCES[test].rows.reduce((sum, row) => sum + rampSequence(test, row, Number.POSITIVE_INFINITY).duration, 0);
}

/** A rule's MPPT efficiency by the standard's sequences, on one module. @throws StudyError */
export function testEfficiency(request: EfficiencyTestRequest): EfficiencyTestResult {
  const built = buildModule(request.module);
  const array = photovoltaicArray(built.module, { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 });
  const ruleArray = { modulesInSeries: 1, standard: array.standard };
  const settings = completeSettings(request.rule, ruleArray);
  checkRule(request.rule.kind, settings, null, "/rule");
  const bench: EfficiencyBench = {
    array,
    rule: prepareRule(request.rule.kind, settings, ruleArray),
    converter: buildConverter(request.converter, array.standard),
    cellTemperature: request.cellTemperature,
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
  return { built, rule, dynamic: dynamicTest(bench, request.test, request), static: null };
}
