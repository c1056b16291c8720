import { batteryCoupled } from "./battery-coupled.ts";
import { constantVoltage } from "./constant-voltage.ts";
import { fractionalOpenCircuitVoltage } from "./fractional-open-circuit-voltage.ts";
import { incrementalConductance } from "./incremental-conductance.ts";
import { perfect } from "./perfect.ts";
import { perturbAndObserve } from "./perturb-and-observe.ts";
import { powerCurveScan } from "./power-curve-scan.ts";
import type { Parameters, RuleArray, RuleDefinition, Settings, TrackingRule } from "./rule.ts";
import { shortCurrentPulse } from "./short-current-pulse.ts";
import { temperatureCompensatedVoltage } from "./temperature-compensated-voltage.ts";

/** Every rule there is, in the order they are shown: the one place to add one. */
export const RULES = [
  perfect,
  constantVoltage,
  temperatureCompensatedVoltage,
  fractionalOpenCircuitVoltage,
  shortCurrentPulse,
  batteryCoupled,
  perturbAndObserve,
  incrementalConductance,
  powerCurveScan,
] as const;

export type RuleKind = (typeof RULES)[number]["kind"];

/** A rule by name with the settings that were given: plain data. */
export interface RuleChoice {
  kind: RuleKind;
  settings: Readonly<Record<string, number | boolean | string | Float64Array>>;
}

/** The definition of a rule, whatever its parameters. */
export function ruleDefinition(kind: RuleKind): RuleDefinition {
  return RULES.find((rule) => rule.kind === kind) as unknown as RuleDefinition;
}

/** The settings of a rule with its fixed and derived defaults filled in, in the order of their declaration. */
export function completeSettings(choice: RuleChoice, array: RuleArray): Settings {
  const settings: Record<string, number | boolean | string | Float64Array> = {};
  const { parameters }: { parameters: Parameters } = ruleDefinition(choice.kind);
  for (const [name, parameter] of Object.entries(parameters)) {
    const given = choice.settings[name];
    if (given !== undefined) settings[name] = given;
    else if (parameter.type === "series") continue;
    else if (typeof parameter.default === "object") settings[name] = parameter.default.value(array, settings);
    else settings[name] = parameter.default;
  }
  return settings as Settings;
}

/** The rule ready to track `array`, from settings completed by `completeSettings`. */
export function prepareRule(kind: RuleKind, settings: Settings, array: RuleArray): TrackingRule {
  return ruleDefinition(kind).prepare(settings, array);
}
