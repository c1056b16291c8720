import { describe, expect, it, vi } from "vitest";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import type { RuleKind } from "../../../service/core/rules/index.ts";
import { RULES } from "../../../service/core/rules/index.ts";
import type { ReferencePoint } from "../../oracle/diode-equation.ts";
import { referenceOpenCircuit, referencePeak } from "../../oracle/diode-equation.ts";
import type { ReferenceLimits } from "../../oracle/power-curve.ts";
import { powerCurve } from "../../oracle/power-curve.ts";
import { plausibleModule } from "../../oracle/random-datasheets.ts";
import { REFERENCE_RULES } from "../../oracle/reference-rules.ts";
import type { SeededRandom } from "../../oracle/seeded-random.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import { steadyReference } from "../../oracle/steady-tracking.ts";
import { moduleInWeather, wired } from "../../oracle/weather-circuit.ts";
import { printFinding } from "../finding.ts";
import { parametersFrom } from "../module/reference-parameters.ts";
import { steadyPoint } from "./steady-run.ts";

const SAMPLES = 50;

vi.setConfig({ testTimeout: 30_000 });

type Numbers = Record<string, number>;

/** Complete settings of a rule at random, inside its usual use; `climbs` never hunts by less than .2 %. */
function randomSettings(kind: string, random: SeededRandom, vmp: number, series: number): Numbers {
  const dither = random.chance(0.5) ? random.between(0.002, 0.05) : 0;
  const stepFraction = random.logBetween(0.002, 0.05);
  const setVoltagePerModule = (vmp / series) * random.between(0.75, 1.15);
  switch (kind) {
    case "perfect":
      return {};
    case "constant-voltage":
      return { setVoltagePerModule, stepFraction: dither };
    case "temperature-compensated-voltage":
      return { setVoltagePerModule, coefficient: random.between(-0.6, 0), stepFraction: dither };
    case "fractional-open-circuit-voltage":
      return {
        fraction: random.between(0.6, 0.95),
        sampleDuration: random.between(0, 1),
        samplePeriod: random.between(5, 60),
        stepFraction: dither,
      };
    case "short-current-pulse":
      return {
        fraction: random.between(0.7, 0.98),
        sampleDuration: random.between(0, 1),
        samplePeriod: random.between(5, 60),
        stepFraction: dither,
      };
    case "battery-coupled":
      return { batteryVoltage: vmp * random.between(0.6, 1.1), pathDrop: random.between(0, 1), stepFraction: dither };
    case "perturb-and-observe":
      return { stepFraction };
    case "incremental-conductance":
      return {
        stepFraction,
        holdTolerance: random.chance(0.3) ? 0 : stepFraction * random.between(1, 15),
        currentTolerance: random.chance(0.3) ? 0 : random.logBetween(1e-4, 1e-2),
      };
    case "power-curve-scan":
      return {
        stepFraction,
        points: random.whole(20, 200),
        sweepDuration: random.between(0, 5),
        scanPeriod: random.between(60, 900),
        holds: random.whole(0, 1),
      };
    default:
      throw new Error(`No random settings for the rule ${kind}: add them here.`);
  }
}

/** A converter at random: each limit absent half the time; what a rule leaves undefined is never asked of it. */
function randomLimits(kind: string, random: SeededRandom, ripples: boolean, peak: ReferencePoint): ReferenceLimits {
  const vmp = peak.voltage;
  const limits: ReferenceLimits = {
    lowest: random.chance(0.4) ? vmp * random.between(0.7, 1.05) : 0,
    highest: random.chance(0.4) ? vmp * random.between(1.06, 1.3) : Number.POSITIVE_INFINITY,
    mostPower: random.chance(0.4) ? peak.power * random.between(0.5, 1.1) : Number.POSITIVE_INFINITY,
    mostCurrent: random.chance(0.3) ? peak.current * random.between(0.6, 1.1) : Number.POSITIVE_INFINITY,
    ripple: ripples ? random.between(0.005, 0.08) : 0,
  };
  // Power and current limits while a rule reads its own current, and a ripple across a limit, are not defined in
  // detail: the comparison keeps to what is.
  if (kind === "incremental-conductance") limits.mostPower = limits.mostCurrent = Number.POSITIVE_INFINITY;
  if (limits.ripple > 0) limits.mostCurrent = Number.POSITIVE_INFINITY;
  return limits;
}

/** One random sample tracked by the service and by the reference. */
function trial(kind: RuleKind, random: SeededRandom, ripples: boolean) {
  const module = plausibleModule(random);
  const [modulesInSeries, stringsInParallel] = [random.whole(1, 12), random.whole(1, 4)];
  const bare = moduleInWeather(module, 1000, 25);
  const standardPeak = referencePeak(bare).voltage * modulesInSeries;
  const standardOpenCircuit = referenceOpenCircuit(bare) * modulesInSeries;
  const resistance = (standardOpenCircuit / module.photocurrent) * (1 / stringsInParallel);
  const layout = { modulesInSeries, stringsInParallel, wiringResistance: resistance * random.between(0, 0.02) };
  const weather = [random.logBetween(5, 1200), random.between(-25, 75)] as const;
  const circuit = wired(
    moduleInWeather(module, ...weather),
    modulesInSeries,
    stringsInParallel,
    layout.wiringResistance,
  );
  const peak = referencePeak(circuit);
  const limits = randomLimits(kind, random, ripples, peak);
  const settings = randomSettings(kind, random, standardPeak, modulesInSeries);
  const rule = REFERENCE_RULES[kind](settings, { modulesInSeries, standardOpenCircuit, cellTemperature: weather[1] });
  const { holds, ...given } = settings;
  const afterwards: Record<string, string> = holds === undefined ? {} : { afterwards: holds === 1 ? "hold" : "climb" };
  const ours = steadyPoint(
    singleDiodeModule(parametersFrom(module)),
    weather,
    {
      kind,
      settings: { ...given, ...afterwards },
      converter: {
        trackingMinimumVoltage: limits.lowest,
        trackingMaximumVoltage: limits.highest,
        maximumPower: limits.mostPower,
        maximumCurrent: limits.mostCurrent,
        rippleAmplitude: limits.ripple,
      },
    },
    layout,
  );
  const reference = steadyReference(rule, powerCurve(circuit, limits), limits);
  const story = JSON.stringify({ kind, settings, limits, weather, layout, module, vmp: peak.voltage, pmp: peak.power });
  return { ours, reference, story };
}

/** The worst differences of 50 samples, of available, and the sample with the very worst. */
function worstOf(kind: RuleKind, ripples: boolean) {
  const random = seededRandom(ripples ? 8889 : 8888);
  const worst: Record<string, number> = {
    available: 0,
    clipped: 0,
    window: 0,
    setPoint: 0,
    regulation: 0,
    delivered: 0,
  };
  let [blame, most] = ["", 0];
  for (let sample = 0; sample < SAMPLES; sample++) {
    const { ours, reference, story } = trial(kind, random, ripples);
    const { available } = reference;
    const errors: Record<string, number> = {
      available: ours.available - available,
      clipped: ours.clipped - reference.clipped,
      window: ours.causes.voltageWindow - (available - reference.best),
      setPoint: ours.causes.setPoint - (reference.best - reference.fresh),
      regulation: ours.causes.regulation - (reference.fresh - reference.operating),
      delivered: ours.power[0] - (1 - reference.duty) * reference.operating,
    };
    for (const [name, error] of Object.entries(errors)) {
      worst[name] = Math.max(worst[name], Math.abs(error) / available);
      if (!(worst[name] <= most)) [blame, most] = [`${name}: ${story}`, worst[name]];
    }
  }
  return { worst, blame, most };
}

describe.each(RULES)("$kind at rest, 50 random samples against dense averaging by bisection", ({ kind }) => {
  it("agrees in available, clipped, best, target and delivered power within 1e-8 of available", () => {
    const { worst, blame, most } = worstOf(kind, false);
    printFinding(`Worst against dense averaging, ${kind}, of available`, worst);
    expect(most, blame).toBeLessThan(1e-8);
  });

  it("agrees likewise with a ripple on the voltage", () => {
    const { worst, blame, most } = worstOf(kind, true);
    printFinding(`Worst against dense averaging, ${kind} with ripple, of available`, worst);
    expect(most, blame).toBeLessThan(1e-8);
  });
});
