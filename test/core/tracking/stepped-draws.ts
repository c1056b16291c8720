import type { SeededRandom } from "../../oracle/seeded-random.ts";
import type { RuleDraw } from "./stepped-random.ts";

/** A step of the voltage for a rule that may hold its target exactly. */
function targetStep(random: SeededRandom): number {
  return random.chance(0.5) ? 0 : random.between(0.002, 0.03);
}

/** Sampling that fits a control period and a series: now and then several a period, now and then one in many. */
function sampling(random: SeededRandom, controlPeriod: number): { samplePeriod: number; sampleDuration: number } {
  const samplePeriod = controlPeriod * random.logBetween(0.4, 40);
  return { samplePeriod, sampleDuration: samplePeriod * random.between(0, 0.4) };
}

/** Every rule of the table, random settings; voltages of a module's nominal open-circuit voltage. */
export const DRAWS = {
  perfect: () => ({ kind: "perfect", settings: {} }),
  "constant-voltage": (random, { twin, controlPeriod }) => ({
    kind: "constant-voltage",
    settings: {
      setVoltagePerModule: random.between(0.6, 0.95) * twin.nominalVoc,
      controlPeriod,
      stepFraction: targetStep(random),
    },
  }),
  "temperature-compensated-voltage": (random, { twin, controlPeriod }) => ({
    kind: "temperature-compensated-voltage",
    settings: {
      setVoltagePerModule: random.between(0.7, 0.9) * twin.nominalVoc,
      coefficient: random.between(-0.6, 0),
      controlPeriod,
      stepFraction: targetStep(random),
    },
  }),
  "fractional-open-circuit-voltage, sampled": (random, { controlPeriod }) => ({
    kind: "fractional-open-circuit-voltage",
    settings: {
      fraction: random.between(0.6, 0.95),
      ...sampling(random, controlPeriod),
      pilotCell: false,
      controlPeriod,
      stepFraction: targetStep(random),
    },
  }),
  "fractional-open-circuit-voltage, pilot cell": (random, { controlPeriod }) => ({
    kind: "fractional-open-circuit-voltage",
    settings: {
      fraction: random.between(0.6, 0.95),
      ...sampling(random, controlPeriod),
      pilotCell: true,
      controlPeriod,
      stepFraction: targetStep(random),
    },
  }),
  "short-current-pulse, sampled": (random, { controlPeriod }) => ({
    kind: "short-current-pulse",
    settings: {
      fraction: random.between(0.7, 0.97),
      ...sampling(random, controlPeriod),
      pilotCell: false,
      controlPeriod,
      stepFraction: targetStep(random),
    },
  }),
  "short-current-pulse, pilot cell": (random, { controlPeriod }) => ({
    kind: "short-current-pulse",
    settings: {
      fraction: random.between(0.7, 0.97),
      ...sampling(random, controlPeriod),
      pilotCell: true,
      controlPeriod,
      stepFraction: targetStep(random),
    },
  }),
  "battery-coupled": (random, { twin, controlPeriod }) => ({
    kind: "battery-coupled",
    settings: { pathDrop: random.between(0, 0.03) * twin.nominalVoc, controlPeriod, stepFraction: targetStep(random) },
  }),
  "perturb-and-observe": (random, { controlPeriod }) => ({
    kind: "perturb-and-observe",
    settings: { controlPeriod, stepFraction: random.between(0.005, 0.03) },
  }),
  "incremental-conductance": (random, { controlPeriod }) => ({
    kind: "incremental-conductance",
    settings: {
      controlPeriod,
      stepFraction: random.between(0.005, 0.03),
      holdTolerance: random.chance(0.3) ? 0 : random.between(0.02, 0.3),
      currentTolerance: random.between(0.0005, 0.01),
    },
  }),
  "power-curve-scan, hold": (random, { controlPeriod, duration }) => ({
    kind: "power-curve-scan",
    settings: {
      ...scanning(random, duration),
      afterwards: "hold",
      controlPeriod,
      stepFraction: 0.01,
    },
  }),
  "power-curve-scan, climb": (random, { controlPeriod, duration }) => ({
    kind: "power-curve-scan",
    settings: {
      ...scanning(random, duration),
      afterwards: "climb",
      controlPeriod,
      stepFraction: random.between(0.005, 0.03),
    },
  }),
} as const satisfies Record<string, RuleDraw>;

export type DrawName = keyof typeof DRAWS;

/** A few sweeps a series, of a few to a hundred points. */
function scanning(random: SeededRandom, duration: number) {
  const scanPeriod = duration * random.between(0.04, 0.5);
  return { scanPeriod, sweepDuration: scanPeriod * random.between(0, 0.2), points: random.whole(3, 60) };
}
