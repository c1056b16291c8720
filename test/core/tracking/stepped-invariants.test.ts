import { describe, expect, it } from "vitest";
import { openLedger } from "../../../service/core/tracking/ledger.ts";
import { trackStepped } from "../../../service/core/tracking/stepped.ts";
import { locate, runsOf, valueAt } from "../../../service/core/tracking/weather-path.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import type { Result, Series, Trial } from "./stepped-run.ts";
import { ruleOf, run, SILICON, timedWeather } from "./stepped-run.ts";
import { coreConverter, OPEN } from "./stepped-scene.ts";

/** Readings in thousandths, so that the last bit of a time cannot turn a climber. */
const ROUNDING = {
  voltageSensor: { gain: 0, offset: 0, resolution: 0.137 },
  currentSensor: { gain: 0, offset: 0, resolution: 0.0137 },
};
const controlPeriod = 0.5;

/** Every rule of the table. */
const TRIALS: Trial[] = [
  { kind: "perfect", settings: {} },
  { kind: "constant-voltage", settings: { controlPeriod } },
  { kind: "temperature-compensated-voltage", settings: { stepFraction: 0.01, controlPeriod } },
  { kind: "fractional-open-circuit-voltage", settings: { samplePeriod: 7.3, controlPeriod } },
  { kind: "fractional-open-circuit-voltage", settings: { pilotCell: true, stepFraction: 0.01, controlPeriod } },
  { kind: "short-current-pulse", settings: { fraction: 0.9, controlPeriod } },
  { kind: "battery-coupled", settings: { batteryVoltage: 91, controlPeriod } },
  { kind: "perturb-and-observe", settings: { controlPeriod }, converter: ROUNDING },
  { kind: "incremental-conductance", settings: { controlPeriod }, converter: ROUNDING },
  { kind: "power-curve-scan", settings: { scanPeriod: 40, controlPeriod }, converter: ROUNDING },
  { kind: "power-curve-scan", settings: { scanPeriod: 40, afterwards: "hold", points: 20, controlPeriod } },
];

/** A day that wanders: `samples` values above 0. */
function day(seed: number, samples: number): number[] {
  const random = seededRandom(seed);
  return Array.from({ length: samples }, () => random.between(40, 1100));
}

/** Largest difference between the causes of two pieces of two results, over what is available in the first. */
function difference(one: Result, other: Result, from: number, at = 0): number {
  let most = 0;
  for (let k = 0; k < other.causesEach.length - 6 * at; k++) {
    most = Math.max(most, Math.abs(one.causesEach[6 * from + k] - other.causesEach[6 * at + k]));
  }
  return most / one.available;
}

describe("a series split at night", () => {
  const night = new Array<number>(6).fill(0);
  const [first, second] = [day(1, 9), day(2, 11)];

  it.each(["mean", "instant"] as const)("changes nothing, values %s", (timing) => {
    const step = 32;
    const whole = run({ irradiance: [...first, ...night, ...second], step, timing }, TRIALS);
    const before = run({ irradiance: [...first, ...night.slice(3)], step, timing }, TRIALS);
    const after = run({ irradiance: [...night.slice(3), ...second], step, timing }, TRIALS);
    for (const [c, one] of whole.entries()) {
      expect(difference(one, before[c], 0), TRIALS[c].kind).toBeLessThan(1e-10);
      expect(difference(one, after[c], first.length + 3), TRIALS[c].kind).toBeLessThan(1e-10);
      expect((before[c].lost + after[c].lost) / one.available).toBeCloseTo(one.fraction, 10);
      expect((before[c].available + after[c].available) / one.available).toBeCloseTo(1, 10);
    }
  });

  it("adds nothing from samples that are dark with dark neighbours", () => {
    const results = run({ irradiance: [...first, ...night, ...second], step: 32, from: 10, until: 14 }, TRIALS);
    for (const { available, lost, causesEach } of results) {
      expect(available).toBe(0);
      expect(lost).toBe(0);
      expect(causesEach.subarray(6 * 10, 6 * 14).every((one) => one === 0)).toBe(true);
    }
  });
});

describe("a linear ramp sampled twice as finely", () => {
  it("changes nothing beyond 1e-6", () => {
    const corners = [...day(3, 8), 500, 500];
    const finer = corners.flatMap((value, i) => [value, (value + (corners[i + 1] ?? value)) / 2]);
    const coarse = run({ irradiance: corners, step: 40 }, TRIALS);
    const fine = run({ irradiance: finer, step: 20 }, TRIALS);
    for (const [c, one] of coarse.entries()) {
      expect(fine[c].available / 2 / one.available).toBeCloseTo(1, 7);
      expect(Math.abs(fine[c].fraction - one.fraction), TRIALS[c].kind).toBeLessThan(1e-6);
      for (let i = 0; i < 6; i++) {
        const miss = Math.abs(fine[c].causes[i] / 2 - one.causes[i]) / one.available;
        // A sweep's stairs are carried by unchecked cubics: which cause takes a stair may move by a hundred-thousandth.
        const swept = TRIALS[c].settings["afterwards"] === "hold" && (i === 2 || i === 3);
        expect(miss, `${TRIALS[c].kind}, cause ${i}`).toBeLessThan(swept ? 1e-5 : 1e-6);
      }
    }
  });
});

describe("the weather's path", () => {
  it("keeps the insolation of means, each run of them on its own", () => {
    const irradiance = day(4, 40);
    const weather = timedWeather({ irradiance, step: 60, timing: "mean" });
    weather.skipped = Uint8Array.from(irradiance, (_, i) => Number(i % 11 === 7 || i === 20));
    const place = { left: 0, right: 0, share: 0 };
    for (const piece of runsOf(weather)) {
      let [along, given] = [0, 0];
      for (let i = piece.first; i <= piece.last; i++) {
        given += irradiance[i];
        // Straight over each half of a sample: its middle is its mean.
        for (const quarter of [0.25, 0.75]) {
          locate(weather, piece, (i + quarter) * 60, place);
          along += valueAt(weather.irradiance, place) / 2;
        }
      }
      expect(along / given).toBeCloseTo(1, 12);
    }
  });
});

describe("contenders in one call", () => {
  const series: Series = { irradiance: [...day(5, 12), 0, 0, ...day(6, 8)], step: 30, timing: "mean" };

  it("give the same bits for the same input", () => {
    expect(run(series, TRIALS).map(({ bits }) => bits)).toEqual(run(series, TRIALS).map(({ bits }) => bits));
  });

  it("change no bit by their order", () => {
    const backwards = run(series, [...TRIALS].reverse()).reverse();
    expect(backwards.map(({ bits }) => bits)).toEqual(run(series, TRIALS).map(({ bits }) => bits));
  });

  // They share stretches of cubics, which are as short as the most crooked of them asks: within 3e-8 of the maximum power.
  it("change each other's figures by less than 1e-7", () => {
    const together = run(series, TRIALS);
    for (const [c, trial] of TRIALS.entries()) {
      const [alone] = run(series, [trial]);
      expect(Math.abs(alone.available / together[c].available - 1)).toBeLessThan(1e-7);
      expect(Math.abs(alone.fraction - together[c].fraction), trial.kind).toBeLessThan(1e-7);
    }
  });
});

/** What collects garbage and says how many bytes remain in use. */
async function heapInUse(): Promise<() => number> {
  const [v8, vm] = await Promise.all([import("node:v8"), import("node:vm")]);
  v8.setFlagsFromString("--expose-gc");
  const collect = vm.runInNewContext("gc") as () => void;
  return () => {
    collect();
    return process.memoryUsage().heapUsed;
  };
}

describe("memory", () => {
  it("does not grow with the number of control periods", async () => {
    const inUse = await heapInUse();
    const irradiance = day(7, 60);
    const weather = timedWeather({ irradiance, step: 60 });
    const heaps: number[] = [];
    let decisions = 0;
    const rule = ruleOf({ kind: "perturb-and-observe", settings: { controlPeriod: 0.005 } });
    if (rule.behaviour !== "climb") throw new Error("perturb and observe climbs");
    const watched = {
      ...rule,
      decide: (seen: Parameters<typeof rule.decide>[0]) => {
        if (decisions++ % 100_000 === 50_000) heaps.push(inUse());
        return rule.decide(seen);
      },
    };
    const ledger = openLedger(irradiance.length, 2, { operating: true, causes: true });
    trackStepped(SILICON, weather, [{ rule: watched, converter: coreConverter(OPEN), ledger }], null);
    expect(decisions).toBe(720_000);
    expect(heaps.length).toBe(7);
    // A double kept for each of the 600,000 periods between the first look and the last would take 4.8 MB.
    expect(heaps[6] - heaps[0]).toBeLessThan(500_000);
  });
});
