import { adaptiveMean } from "./adaptive-mean.ts";
import type { IncrementalConductance } from "./climbing-simulation.ts";
import { incrementalMeanPower } from "./climbing-simulation.ts";
import { bisect } from "./diode-equation.ts";
import type { PowerCurve } from "./power-curve.ts";

/** A rule as its definition states it, with every number in V, A or s of the whole array. */
export type ReferenceRule =
  | { behaves: "perfect" }
  | { behaves: "target"; step: number; duty: number; target: (curve: PowerCurve) => number }
  | { behaves: "perturb"; step: number; duty: number }
  | ({ behaves: "incremental" } & IncrementalConductance);

/** The powers of one sample, W, and the share of the time without power. */
export interface SteadyReference {
  available: number;
  clipped: number;
  best: number;
  fresh: number;
  operating: number;
  duty: number;
}

/** The best power inside the window: by a dense scan and golden narrowing, whatever the curve's shape. */
function bestInside(curve: PowerCurve): number {
  const low = curve.clamp(0);
  const high = Math.max(low, curve.clamp(curve.voc));
  const peak = bisect((v) => v < curve.vmp, low, Math.max(low, Math.min(high, curve.vmp)));
  let best = Math.max(curve.power(low), curve.power(high), curve.power(peak));
  for (let k = 0; k <= 2000; k++) best = Math.max(best, curve.power(low + ((high - low) * k) / 2000));
  return best;
}

/** Mean over the three-level orbit: levels at 25, 50, 25 %, the centre uniform within half a step of the peak. */
function threeLevelMeanPower(curve: PowerCurve, step: number): number {
  const centre = curve.clamp(curve.ripplingPeak);
  const level = (offset: number): number => curve.ripplingPower(curve.clamp(offset));
  const levels = (c: number): number => (level(c - step) + 2 * level(c) + level(c + step)) / 4;
  return adaptiveMean(levels, centre - step / 2, centre + step / 2, 1e-10 * curve.pmp);
}

/** The powers of one sample at rest, from the definitions alone. */
export function steadyReference(
  rule: ReferenceRule,
  curve: PowerCurve,
  limits: { mostPower: number },
): SteadyReference {
  const unlimited = curve.floor > curve.vmp ? curve.floor * curve.current(curve.floor) : curve.pmp;
  const available = Math.min(limits.mostPower, unlimited);
  const best = bestInside(curve);
  const common = { available, clipped: curve.pmp - available, best };
  if (rule.behaves === "perfect") return { ...common, fresh: best, operating: best, duty: 0 };
  if (rule.behaves === "perturb") {
    const operating = threeLevelMeanPower(curve, rule.step);
    return { ...common, fresh: best, operating, duty: rule.duty };
  }
  if (rule.behaves === "incremental") {
    return { ...common, fresh: best, operating: incrementalMeanPower(curve, rule), duty: 0 };
  }
  const target = curve.clamp(rule.target(curve));
  const at = (voltage: number): number => curve.ripplingPower(curve.clamp(voltage));
  const operating =
    rule.step > 0 ? adaptiveMean(at, target - rule.step, target + rule.step, 1e-10 * curve.pmp) : at(target);
  return { ...common, fresh: curve.power(target), operating, duty: rule.duty };
}
