import { describe, expect, it } from "vitest";
import { emptyTrace } from "../../../service/core/array/maximum-power-trace.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import { stepPlainly } from "../../oracle/stepper.ts";
import type { DrawName } from "./stepped-draws.ts";
import { DRAWS } from "./stepped-draws.ts";
import type { Spice } from "./stepped-random.ts";
import { drawPair } from "./stepped-random.ts";
import type { Pair } from "./stepped-scene.ts";
import { generatorTwin, OPEN, pairOf, stepInCore } from "./stepped-scene.ts";

/*
 * Expected values: the plain stepper of test/oracle, which bisects its way through physics 7 and 8 period by period.
 * Issue 4 asks for 1e-6 of the energy; the cubics promise 3e-8 of the maximum power, so 1e-7 of available is asked here.
 */
const ENERGY = 1e-7;
/** Where the power at the fresh target is not checked along a stretch: a sweep's stairs, and rounded readings' stairs. */
const SWEPT = 1e-5;
const STAIRS = 1e-3;

const SPICES: Record<string, Spice> = {
  "an open converter": {},
  "a window": { window: true },
  "a power limit": { powerLimit: true },
  "a current limit": { currentLimit: true },
  "a wake power": { wakePower: true },
  ripple: { ripple: true },
  "wrong sensors": { sensors: "wrong" },
  "rounding sensors": { sensors: "rounded" },
  "window, ripple, current limit and rounding sensors": {
    window: true,
    ripple: true,
    sensors: "rounded",
    currentLimit: true,
  },
  "window, power limit and wake power": { window: true, powerLimit: true, wakePower: true },
};

/** Six causes of a sample, or of all: core's less the oracle's, over what is available in all. */
function misses(pair: Pair) {
  const [core] = stepInCore([pair]);
  const plain = stepPlainly(pair.scene);
  const samples = plain.available.length;
  const available = plain.available.reduce((sum, one) => sum + one, 0);
  const causes = new Float64Array(6);
  let [lost, delivered] = [0, 0];
  let [sample, shared] = [0, 0];
  for (let i = 0; i < samples; i++) {
    let here = 0;
    for (let c = 0; c < 6; c++) {
      const miss = core.causes[6 * i + c] - plain.causes[6 * i + c];
      causes[c] += miss;
      here += miss;
      delivered += core.causes[6 * i + c];
    }
    lost += here;
    delivered += core.delivered[i] - core.available[i];
    const aside = [here, core.available[i] - plain.available[i], core.clipped[i] - plain.clipped[i]];
    for (const miss of aside) sample = Math.max(sample, Math.abs(miss) / available);
    shared += core.available[i] - plain.available[i];
  }
  const relative = (of: number): number => Math.abs(of) / available;
  return {
    available: relative(shared),
    lost: relative(lost),
    anySample: sample,
    balance: relative(delivered),
    causes: Array.from(causes, relative),
    setPointAndHeld: relative(causes[2] + causes[3]),
    held: relative(core.causes.reduce((sum, one, i) => (i % 6 === 3 ? sum + Math.abs(one) : sum), 0)),
  };
}

/** How far the split between set point and held sample may be off. */
function splitTolerance({ rule, converter }: Pair["scene"]): number {
  if (rule.settings["samplePeriod"] === undefined && rule.kind !== "power-curve-scan") return ENERGY;
  if (rule.settings["afterwards"] === "climb") return ENERGY;
  if (converter.voltageSensor.resolution > 0) return STAIRS;
  return rule.kind === "power-curve-scan" ? SWEPT : ENERGY;
}

function expectAgreement(pair: Pair): void {
  const miss = misses(pair);
  expect(miss.available).toBeLessThan(ENERGY);
  expect(miss.lost).toBeLessThan(ENERGY);
  expect(miss.anySample).toBeLessThan(ENERGY);
  expect(miss.balance).toBeLessThan(1e-12);
  expect(miss.setPointAndHeld).toBeLessThan(ENERGY);
  const split = splitTolerance(pair.scene);
  for (const [c, cause] of miss.causes.entries()) expect(cause).toBeLessThan(c === 2 || c === 3 ? split : ENERGY);
  // A pilot cell is read anew each period: what is held is fresh.
  if (pair.scene.rule.settings["pilotCell"] === true) expect(miss.held).toBeLessThan(ENERGY);
}

/** Sweeps in the plain stepper take long: fewer periods where they are many, or rippling. */
function mostPeriods(name: DrawName, spice: Spice): number {
  if (name === "power-curve-scan, hold") return spice.ripple || spice.powerLimit ? 20 : 200;
  return spice.ripple ? 120 : 800;
}

const SEEDS = [1, 2, 3, 4];

describe.each(Object.keys(DRAWS) as DrawName[])("%s on random weather", (name) => {
  it.each(Object.keys(SPICES))("steps as the plain stepper does, with %s", (spiceName) => {
    const spice = SPICES[spiceName];
    const family = 1000 * Object.keys(DRAWS).indexOf(name) + 10 * Object.keys(SPICES).indexOf(spiceName);
    for (const seed of SEEDS) {
      expectAgreement(drawPair(seededRandom(family + seed), DRAWS[name], spice, mostPeriods(name, spice)));
    }
  });
});

const SINGLE = { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 };

/** A hunting rule in bright light with two dark samples. */
function huntingThrough(irradiance: number[], step: number, controlPeriod: number): Pair {
  const none = irradiance.map(() => 0);
  return pairOf(generatorTwin("crystalline-silicon"), SINGLE, {
    weather: {
      step,
      timing: "mean",
      irradiance,
      temperature: irradiance.map(() => 25),
      battery: none,
      missing: irradiance.map(() => false),
    },
    converter: OPEN,
    choice: { kind: "constant-voltage", settings: { setVoltagePerModule: 70, controlPeriod, stepFraction: 0.05 } },
  });
}

describe("the edges of the control clock", () => {
  const light = [800, 800, 800, 800, 800, 0, 0, 800, 800, 800, 800, 800, 800, 800, 800, 800, 800, 800];

  it("sleeps in a night that holds a period's middle", () => {
    expectAgreement(huntingThrough(light, 10, 4));
  });

  it("knows of no night that falls between the middles of two periods (physics 7, Waking)", () => {
    expectAgreement(huntingThrough(light, 10, 30));
  });

  it("cuts the last period, in the ledger and in the array's own maximum alike", () => {
    const pair = huntingThrough([600, 700], 1, 0.8);
    const maximum = emptyTrace(2);
    const [core] = stepInCore([pair], maximum);
    expectAgreement(pair);
    const sums = [maximum.power, core.available].map((column) => column.reduce((sum, one) => sum + one, 0));
    expect(sums[0] / sums[1]).toBeCloseTo(1, 7);
  });
});
