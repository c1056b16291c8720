import { describe, expect, it } from "vitest";
import { CAUSES } from "../../service/core/tracking/causes.ts";
import type { Json } from "./requests.ts";
import { answered, climateOf, comparisonRequest, estimateRequest } from "./requests.ts";

const estimated = (request: Json) => answered("estimate", request).answer;

describe("an estimate", () => {
  it("needs only module, rule kind and climate, and fills in the documented defaults", () => {
    const { resolved, traces } = estimated({ ...estimateRequest(), rule: { kind: "fractional-open-circuit-voltage" } });
    // Defaults: the request example of the HTTP contract.
    expect(resolved.rule).toEqual({
      kind: "fractional-open-circuit-voltage",
      fraction: 0.76,
      samplePeriod: 16,
      sampleDuration: 0.256,
      pilotCell: false,
      controlPeriod: 1,
      stepFraction: 0,
    });
    expect(resolved.array).toEqual({ modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 });
    expect(resolved.converter).toMatchObject({
      trackingMinimumVoltage: 0,
      trackingMaximumVoltage: null,
      maximumPower: null,
    });
    expect(traces.operating.voltage).toHaveLength(24);
  });

  it("answers in the members and the order of the contract", () => {
    const answer = estimated(estimateRequest());
    expect(Object.keys(answer)).toEqual([
      "resolved",
      "energy",
      "lostByCause",
      "months",
      "irradianceClasses",
      "coverage",
      "traces",
      "module",
      "cautions",
      "provenance",
    ]);
    expect(Object.keys(answer.energy)).toEqual([
      "available",
      "delivered",
      "lost",
      "clipped",
      "lostFraction",
      "trackingEfficiency",
      "insolation",
    ]);
    expect(Object.keys(answer.lostByCause)).toEqual([...CAUSES]);
    expect(Object.keys(answer.cautions[0])).toEqual(["code", "severity", "detail", "values"]);
  });

  it("has the insolation of its irradiance", () => {
    // kWh/m2 of an hourly column in W/m2: its sum over 1000.
    const request = estimateRequest();
    const sum = request.climate.irradiance.values.reduce((all: number, one: number) => all + one, 0);
    expect(estimated(request).energy.insolation).toBeCloseTo(sum / 1000, 9);
  });

  it("states coefficients in %/K: 0.05 %/K and 0.29 %/K come back in its circuit", () => {
    const { module } = estimated(estimateRequest());
    // By construction of the five conditions the current coefficient in A/K is that of the short-circuit current.
    const { photocurrent, photocurrentCoefficient } = module.circuit;
    expect((photocurrentCoefficient * photocurrent) / 9.91).toBeCloseTo(0.05, 12);
    expect(Math.abs(module.misfits.openCircuitVoltageCoefficient)).toBeLessThan(1e-9);
  });

  it("gives a circuit that can be sent back as a module, for the same energies", () => {
    const first = estimated(estimateRequest());
    const second = estimated({ ...estimateRequest(), module: first.module.circuit });
    expect(second.module.fit).toBe("given");
    expect(second.energy.delivered / first.energy.delivered).toBeCloseTo(1, 9);
    expect(second.energy.lost / first.energy.lost).toBeCloseTo(1, 6);
  });

  it("rounds its traces to the decimals asked for and keeps its energies whole", () => {
    const at = (traceDecimals: number) => answered("estimate", { ...estimateRequest(), traceDecimals });
    const [coarse, fine] = [at(0), at(9)];
    expect(coarse.answer.energy).toEqual(fine.answer.energy);
    for (const [k, power] of fine.answer.traces.maximumPower.power.entries()) {
      expect(coarse.answer.traces.maximumPower.power[k]).toBe(Math.round(power));
    }
    expect(coarse.text).toMatch(/"power":\[0,0,/);
  });

  it("has powers alone, causes alone, or no traces", () => {
    const traces = (kind: string) => estimated({ ...estimateRequest(), traces: kind }).traces;
    expect(Object.keys(traces("power").operating)).toEqual(["power"]);
    expect(traces("none")).toBeNull();
    const { lostByCause } = traces("causes");
    const { lostByCause: total } = estimated(estimateRequest());
    for (const cause of CAUSES) {
      const sum = lostByCause[cause].reduce((all: number, one: number) => all + one, 0);
      expect(sum).toBeCloseTo(total[cause], 4);
    }
  });

  it("shows null where a sample was left out, and counts it", () => {
    const request = estimateRequest();
    request.climate.gaps = "skip";
    request.climate.irradiance.values[12] = null;
    request.climate.temperature.values[13] = null;
    const { traces, coverage } = estimated(request);
    expect(coverage).toEqual({ samples: 24, used: 22, skipped: 2 });
    for (const column of [...Object.values(traces.operating), ...Object.values(traces.maximumPower)] as Json[]) {
      expect(column.flatMap((value: Json, k: number) => (value === null ? [k] : []))).toEqual([12, 13]);
    }
  });

  it("is null, not NaN, where nothing was available", () => {
    const request = estimateRequest(6);
    const { energy } = estimated(request);
    expect(energy).toMatchObject({ available: 0, lost: 0, lostFraction: null, trackingEfficiency: null });
  });

  it("is the same bytes for the same input", () => {
    expect(answered("estimate", estimateRequest()).text).toBe(answered("estimate", estimateRequest()).text);
  });

  it("takes a battery voltage as number or as column, to the same result", () => {
    const at = (batteryVoltage: Json) =>
      estimated({ ...estimateRequest(), rule: { kind: "battery-coupled", batteryVoltage } });
    const [single, column] = [at(25), at(Array(24).fill(25))];
    expect(column.energy).toEqual(single.energy);
    expect(single.resolved.rule.batteryVoltage).toBe(25);
    expect(column.resolved.rule.batteryVoltage).toBeNull();
  });

  it("takes the ambient with wind and each of three models", () => {
    const at = (model: Json, windSpeed?: number[]) => {
      const climate = climateOf(24);
      climate.temperature = { ...climate.temperature, kind: "ambient", model, windSpeed };
      return estimated({ ...estimateRequest(), climate }).energy.available;
    };
    const wind = Array(24).fill(4);
    const all = [
      at({ kind: "faiman" }),
      at({ kind: "faiman" }, wind),
      at({ kind: "noct", nominalOperatingCellTemperature: 45 }),
      at({ kind: "king", backing: "glass", place: "open-rack" }, wind),
    ];
    expect(new Set(all).size).toBe(4);
    // Faiman 2008: left out, the heat losses are 25 W/(m2 K) and 6.84 W s/(m3 K).
    expect(at({ kind: "faiman", heatLoss: 25, windHeatLoss: 6.84 })).toBe(all[0]);
    expect(at(undefined)).toBe(all[0]);
  });

  it("applies the mode it is asked for and says why", () => {
    const at = (mode: string | undefined, step: number) => {
      const request = { ...estimateRequest(), mode };
      request.climate.step = step;
      return estimated(request).resolved;
    };
    expect(at("steady", 60)).toMatchObject({ mode: "steady", modeReason: "asked for" });
    expect(at(undefined, 3600)).toMatchObject({ mode: "steady", modeReason: expect.stringContaining("3600 s") });
    expect(at(undefined, 60)).toMatchObject({ mode: "stepped", modeReason: expect.stringContaining("60 s") });
  });
});

describe("the input digest", () => {
  const digestOf = (request: Json) => estimated(request).provenance.inputDigest;
  const plain = digestOf(estimateRequest());

  it("is SHA-256 in hexadecimal", () => expect(plain).toMatch(/^[0-9a-f]{64}$/));

  it("does not depend on presentation, on the order of members, or on defaults being written out", () => {
    expect(digestOf({ ...estimateRequest(), traces: "none", traceDecimals: 7 })).toBe(plain);
    expect(digestOf(Object.fromEntries(Object.entries(estimateRequest()).reverse()))).toBe(plain);
    const { resolved } = estimated(estimateRequest());
    expect(
      digestOf({ ...estimateRequest(), array: resolved.array, converter: resolved.converter, rule: resolved.rule }),
    ).toBe(plain);
    expect(digestOf({ ...estimateRequest(), mode: "steady" })).toBe(plain);
  });

  it("depends on every figure", () => {
    const changes: [string, Json][] = [
      ["module.openCircuitVoltage", 38.9 + 1e-9],
      ["climate.irradiance.values.12", 900 + 1e-9],
      ["climate.temperature.values.0", 5.000001],
      ["climate.start", "2025-01-01T00:00:00+02:00"],
      ["recordLowTemperature", -20],
      ["array", { wiringResistance: 0.1 }],
      ["rule.setVoltagePerModule", 30],
    ];
    const digests = changes.map(([path, value]) => {
      const request = estimateRequest();
      const steps = path.split(".");
      const parent = steps.slice(0, -1).reduce((node, step) => node[step], request);
      parent[steps.at(-1)!] = value;
      return digestOf(request);
    });
    expect(new Set([...digests, plain]).size).toBe(changes.length + 1);
  });
});

describe("a comparison", () => {
  const compared = (request: Json) => answered("compare", request).answer;

  it("gives each candidate what an estimate gives it", () => {
    const { results } = compared(comparisonRequest());
    for (const [index, candidate] of comparisonRequest().candidates.entries()) {
      const alone = estimated({ ...estimateRequest(), rule: candidate.rule });
      expect(results[index].label).toBe(candidate.label);
      expect(results[index].energy).toEqual(alone.energy);
      expect(results[index].lostByCause).toEqual(alone.lostByCause);
    }
  });

  it("states differences to the baseline and to the best, and ranks", () => {
    const { results, resolved } = compared({ ...comparisonRequest(), baseline: "climb" });
    const [hold, climb] = results;
    expect(resolved.baseline).toBe("climb");
    expect([hold.rank, climb.rank]).toEqual([2, 1]);
    expect(hold.differenceToBaseline).toBeCloseTo(hold.energy.delivered - climb.energy.delivered, 12);
    expect([climb.differenceToBaseline, climb.differenceToBest]).toEqual([0, 0]);
    expect(hold.worthPerYear).toBeNull();
    expect(hold.worthReason).toBe("no energyValue was given");
  });

  it("says what the difference is worth in a year of 365 days, and the years that pay the price", () => {
    const request = comparisonRequest(8760);
    request.energyValue = { currency: "EUR", perKilowattHour: 0.5 };
    request.candidates[0].price = 100;
    request.candidates[1].price = 104;
    const [, climb] = compared(request).results;
    expect(climb.worthPerYear).toBeCloseTo(climb.differenceToBaseline * 0.5, 9);
    expect(climb.payback).toBeCloseTo(4 / climb.worthPerYear, 9);
    const short = compared({ ...request, climate: climateOf(8759) }).results[1];
    expect(short.worthPerYear).toBeNull();
    expect(short.worthReason).toContain("not 365 or 366");
  });

  it("gives a candidate without a converter that of the request", () => {
    const request = comparisonRequest();
    request.converter = { trackingMinimumVoltage: 30 };
    request.candidates[1].converter = { trackingMinimumVoltage: 20 };
    const { candidates } = compared(request).resolved;
    expect(candidates.map((candidate: Json) => candidate.converter.trackingMinimumVoltage)).toEqual([30, 20]);
  });

  it("digests labels, prices and the worth of energy too", () => {
    const digest = (more: Json) => compared({ ...comparisonRequest(), ...more }).provenance.inputDigest;
    const plain = digest({});
    expect(digest({ baseline: "hold" })).toBe(plain);
    expect(digest({ energyValue: { currency: "EUR", perKilowattHour: 1 } })).not.toBe(plain);
  });
});
