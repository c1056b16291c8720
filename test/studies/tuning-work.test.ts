import { describe, expect, it } from "vitest";
import { OPEN_CONVERTER } from "../../service/studies/converter-choice.ts";
import type { TuningRequest, TuningSite } from "../../service/studies/tuning.ts";
import { workOfTuning } from "../../service/studies/tuning-work.ts";

/** An hour of light in minutes. */
const site: TuningSite = {
  id: "Heron Bank",
  module: { kind: "test-generator", technology: "crystalline-silicon", maximumPower: 100, maximumPowerVoltage: 30 },
  array: { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 },
  converter: OPEN_CONVERTER,
  climate: {
    start: 0,
    utcOffset: 0,
    step: 60,
    timing: "mean",
    irradiance: { kind: "plane-of-array", values: new Float64Array(60).fill(500) },
    temperature: { kind: "cell", values: new Float64Array(60).fill(25) },
  },
  mode: "stepped",
  pointers: { module: "/module", climate: "/climate" },
};

const request = (range: TuningRequest["range"], sites = [site]): TuningRequest => ({
  sites,
  rule: { kind: "perturb-and-observe", settings: {} },
  parameter: "controlPeriod",
  range,
  points: 41,
});

describe("the work of a tuning", () => {
  it("counts each value's control periods: 41 of the curve, and the closing in at the costlier end", () => {
    // 3600 lit seconds: 3600 periods of 1 s, 36,000 of .1 s.
    const work = workOfTuning(request({ from: 0.1, to: 1 }));
    expect(work).toBeGreaterThan(41 * 3600 + 63 * 36_000);
    expect(work).toBeLessThan((41 + 80) * 36_100);
  });

  it("does not hide that short periods are many", () => {
    const [long, short] = [workOfTuning(request({ from: 1, to: 2 })), workOfTuning(request({ from: 0.001, to: 2 }))];
    expect(short / long).toBeGreaterThan(300);
  });

  it("doubles and adds up for sites, each of which is tuned by itself too", () => {
    const one = workOfTuning(request({ from: 0.1, to: 1 }));
    expect(workOfTuning(request({ from: 0.1, to: 1 }, [site, site, site]))).toBe(6 * one);
  });

  it("is finite and above 0 for a range that will be refused, or a setting that cannot be tuned", () => {
    for (const range of [
      { from: 0, to: 1 },
      { from: -5, to: 1 },
      { from: 2, to: 1 },
    ]) {
      const work = workOfTuning(request(range));
      expect(work).toBeGreaterThan(0);
      expect(work).toBeLessThan(1e8);
    }
    expect(workOfTuning({ ...request(null), parameter: "nothing" })).toBeGreaterThan(0);
  });
});
