import type { Layout, StandardPoint } from "../core/array/array.ts";
import { completeSettings, prepareRule } from "../core/rules/index.ts";
import type { TrackingRule } from "../core/rules/rule.ts";
import type { Candidate } from "../studies/tracking-run.ts";

/** A module like any other: what a rule is asked to prepare for, before the real one is known. */
const PLAUSIBLE: StandardPoint = {
  maximumPowerVoltage: 32,
  maximumPowerCurrent: 9,
  maximumPower: 288,
  openCircuitVoltage: 39,
  shortCircuitCurrent: 10,
  openCircuitVoltageCoefficient: -0.11,
};

/** Cost of one sample at rest in control periods of 250 ns, measured (see DEVELOPERS.md): plain, and with ripple. */
const COSTS = {
  target: [4, 13],
  hunting: [13, 40],
  "three-level": [12, 100],
  own: [320, 3500],
} as const;

function costKind(rule: TrackingRule): keyof typeof COSTS {
  if (rule.behaviour === "climb") return rule.orbit;
  return rule.behaviour === "target" && rule.step > 0 ? "hunting" : "target";
}

/** The work of tracking candidates over a climate at rest, in control periods; an estimate before anything is built. */
export function trackingWork(candidates: readonly Candidate[], array: Layout, samples: number): number {
  const ruleArray = { modulesInSeries: array.modulesInSeries, standard: PLAUSIBLE };
  let each = 0;
  for (const { rule, converter } of candidates) {
    const prepared = prepareRule(rule.kind, completeSettings(rule, ruleArray), ruleArray);
    each += COSTS[costKind(prepared)][converter.rippleAmplitude > 0 ? 1 : 0];
  }
  return each * samples;
}
