import type { ClimateSeries } from "../climate/climate-series.ts";
import { irradianceColumn, sampleCount } from "../climate/climate-series.ts";
import type { RuleChoice } from "../core/rules/index.ts";
import { ruleDefinition } from "../core/rules/index.ts";
import type { Candidate, Mode } from "./tracking-run.ts";
import { resolveMode } from "./tracking-run.ts";

/** Control periods that one lit sample at rest costs: one operating point, or an orbit followed from 64 starts. */
const STEADY_COST = 10;
const ORBIT_COST = 1500;
/** What a ripple's quadrature multiplies the cost of an operating point by. */
const RIPPLE_COST = 16;

/**
 * Work a run will take, in control periods: foreseen before anything is computed, from the samples that may be lit
 * (irradiance above 0 in the sample or in a neighbour).
 */
export function workOf(climate: ClimateSeries, mode: Mode, candidates: readonly Candidate[]): number {
  const lit = litSamples(irradianceColumn(climate));
  const stepped = resolveMode(mode, climate.step).mode === "stepped";
  let work = sampleCount(climate);
  for (const { rule, converter } of candidates) {
    const ripple = converter.rippleAmplitude > 0 ? RIPPLE_COST : 1;
    work += ripple * (stepped ? steppedWork(rule, lit * climate.step) : lit * steadyCost(rule));
  }
  return work;
}

/** Work that rules at rest in one weather take, in control periods. */
export function workOfSteady(rules: readonly RuleChoice[], converter: Candidate["converter"]): number {
  const ripple = converter.rippleAmplitude > 0 ? RIPPLE_COST : 1;
  return rules.reduce((work, rule) => work + ripple * steadyCost(rule), 0);
}

function litSamples(irradiance: Float64Array): number {
  let lit = 0;
  for (let i = 0; i < irradiance.length; i++) {
    if (irradiance[i] > 0 || irradiance[i - 1] > 0 || irradiance[i + 1] > 0) lit++;
  }
  return lit;
}

/** A setting as given, or its fixed default; 0 where the rule has none or derives it. */
export function setting(rule: RuleChoice, name: string): number {
  const given = rule.settings[name];
  if (typeof given === "number") return given;
  const parameter = ruleDefinition(rule.kind).parameters[name];
  return parameter?.type === "number" && typeof parameter.default === "number" ? parameter.default : 0;
}

function steppedWork(rule: RuleChoice, seconds: number): number {
  if (rule.kind === "perfect") return seconds / 100;
  const periods = seconds / setting(rule, "controlPeriod");
  const sweeps = setting(rule, "points") * (seconds / (setting(rule, "scanPeriod") || Number.POSITIVE_INFINITY));
  const samples = (5 * seconds) / (setting(rule, "samplePeriod") || Number.POSITIVE_INFINITY);
  return periods + sweeps + Math.min(samples, 5 * periods);
}

function steadyCost(rule: RuleChoice): number {
  if (rule.kind === "incremental-conductance") return ORBIT_COST;
  return STEADY_COST + setting(rule, "points") + (setting(rule, "stepFraction") > 0 ? STEADY_COST : 0);
}

/** Work of `seconds` of light stepped by one rule, in control periods. */
export function workOfStepping(rule: RuleChoice, converter: Candidate["converter"], seconds: number): number {
  return (converter.rippleAmplitude > 0 ? RIPPLE_COST : 1) * steppedWork(rule, seconds);
}
