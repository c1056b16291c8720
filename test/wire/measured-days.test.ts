import { describe, expect, it } from "vitest";
import type { HorizontalIrradiance } from "../../service/climate/climate-series.ts";
import { CAUSES } from "../../service/core/tracking/causes.ts";
import { measuredClimate, measuredDaysArePresent, readMeasuredDay } from "../climate/measured-day.ts";
import { anApp, post } from "../http/an-app.ts";
import type { Json } from "./requests.ts";
import { MODULE } from "./requests.ts";

/** Cautions that name a mistake of the series, by code. */
const MISTAKES = [
  "closure-violated",
  "columns-swapped",
  "daily-total-too-high",
  "direct-on-horizontal",
  "irradiance-and-temperature-swapped",
  "irradiance-as-energy",
  "irradiance-impossible",
  "light-around-midnight",
  "light-at-night",
  "temperature-in-fahrenheit",
  "temperature-in-kelvin",
  "time-shifted",
];

const RULES: Json[] = [
  { kind: "perfect" },
  { kind: "constant-voltage" },
  { kind: "temperature-compensated-voltage" },
  { kind: "fractional-open-circuit-voltage" },
  { kind: "short-current-pulse" },
  { kind: "battery-coupled", batteryVoltage: 30 },
  { kind: "perturb-and-observe" },
  { kind: "incremental-conductance" },
  { kind: "power-curve-scan" },
];

const { app } = anApp();

async function sent(request: Json): Promise<{ status: number; body: Json }> {
  const answer = await app.request("/v1/estimates", post(JSON.stringify(request)));
  return { status: answer.status, body: await answer.json() };
}

async function estimated(request: Json): Promise<Json> {
  const { status, body } = await sent(request);
  expect(status, JSON.stringify(body.errors)).toBe(200);
  return body;
}

/** A measured day of means over `minutes` as the wire takes it; NaN as null. */
function climateOf(name: "a" | "b", minutes = 1): Json {
  const { start, step, irradiance, temperature } = measuredClimate(readMeasuredDay(name), minutes);
  const light = irradiance as HorizontalIrradiance;
  const column = (values: Float64Array | undefined) =>
    Array.from(values!, (value) => (Number.isNaN(value) ? null : Math.max(-10, value)));
  return {
    start: new Date(start).toISOString(),
    step,
    irradiance: {
      kind: "horizontal",
      global: column(light.global),
      directNormal: column(light.directNormal),
      diffuse: column(light.diffuse),
      site: light.site,
    },
    temperature: {
      kind: "ambient",
      values: column(temperature.values),
      windSpeed: column(temperature.kind === "ambient" ? temperature.windSpeed! : undefined),
    },
  };
}

const requestOf = (climate: Json, more: Json = {}) => ({
  module: MODULE,
  rule: { kind: "fractional-open-circuit-voltage" },
  climate,
  traces: "none",
  ...more,
});

const mistakesIn = (cautions: Json[]) => cautions.map(({ code }) => code).filter((code) => MISTAKES.includes(code));

/** The climate with its start moved by minutes. */
function moved(climate: Json, minutes: number): Json {
  return { ...climate, start: new Date(Date.parse(climate.start) + minutes * 60_000).toISOString() };
}

describe.runIf(measuredDaysArePresent).each(["a", "b"] as const)("measured day %s (SURFRAD) on the wire", (name) => {
  const climate = measuredDaysArePresent ? climateOf(name) : null;

  describe.each(["steady", "stepped"])("%s", (mode) => {
    it.each(RULES)("$kind loses 0 to 20 %, by causes that add up, and no mistake is seen", async (rule) => {
      const { energy, lostByCause, cautions, coverage, resolved, months } = await estimated(
        requestOf(climate, { rule, mode }),
      );
      expect(resolved.mode).toBe(mode);
      expect(mistakesIn(cautions)).toEqual([]);
      expect(coverage).toEqual({ samples: 1440, used: 1440, skipped: 0 });
      const sum = CAUSES.reduce((all, cause) => all + lostByCause[cause], 0);
      expect(sum).toBeCloseTo(energy.lost, 12);
      expect(Math.abs(energy.delivered + energy.lost - energy.available)).toBeLessThan(1e-15 * 1440);
      // At rest every reference is fresh, and no window or second peak is in the way.
      if (mode === "steady") expect(lostByCause.heldSample).toBe(0);
      expect([lostByCause.voltageWindow, lostByCause.wrongPeak].map(Math.abs)).toEqual([0, 0]);
      expect(energy.available).toBeGreaterThan(0.05);
      expect(energy.lostFraction).toBeGreaterThan(-1e-9);
      expect(energy.lostFraction).toBeLessThan(0.2);
      if (rule.kind === "perfect") expect(Math.abs(energy.lostFraction)).toBeLessThan(1e-9);
      else expect(energy.lost).toBeGreaterThan(0);
      expect(months.reduce((all: number, { lost }: Json) => all + lost, 0)).toBeCloseTo(energy.lost, 12);
    });
  });

  it("has the light, and nearly the maximum, in steady as in stepped", async () => {
    const [steady, stepped] = await Promise.all(
      ["steady", "stepped"].map((mode) => estimated(requestOf(climate, { rule: { kind: "perfect" }, mode }))),
    );
    expect(stepped.energy.insolation).toBe(steady.energy.insolation);
    // Straight lines between middles keep the total light; what differs is the curvature of power over light.
    expect(Math.abs(stepped.energy.available / steady.energy.available - 1)).toBeLessThan(0.005);
  });

  it("is filled along a straight line, or left out, where a quarter of an hour is missing", async () => {
    const holed = structuredClone(climate);
    const noon = holed.irradiance.global.indexOf(Math.max(...holed.irradiance.global));
    for (let k = noon; k < noon + 15; k++) holed.irradiance.global[k] = null;
    const refusal = await sent(requestOf(holed));
    expect(refusal.status).toBe(422);
    expect(refusal.body.errors[0]).toMatchObject({
      pointer: `/climate/irradiance/global/${noon}`,
      code: "missing-samples",
    });
    for (const mode of ["steady", "stepped"]) {
      const at = (gaps: Json) => estimated(requestOf({ ...holed, gaps }, { mode }));
      const [filled, skipped, tooLong] = [
        await at({ interpolateUpTo: 900 }),
        await at("skip"),
        await at({ interpolateUpTo: 840 }),
      ];
      expect(filled.coverage).toEqual({ samples: 1440, used: 1440, skipped: 0 });
      expect(skipped.coverage).toEqual({ samples: 1440, used: 1425, skipped: 15 });
      expect(filled.cautions.map(({ code }: Json) => code)).toContain("gaps-filled");
      expect(tooLong.energy).toEqual(skipped.energy);
      expect(filled.energy.available).toBeGreaterThan(skipped.energy.available);
    }
  });

  it("has with a thermal lag of 10 minutes the same light, and its energy within 1 %", async () => {
    const at = (thermalLag: number) =>
      estimated(requestOf({ ...climate, temperature: { ...climate.temperature, thermalLag } }));
    const [none, lagged] = [await at(0), await at(600)];
    expect(lagged.energy.insolation).toBe(none.energy.insolation);
    expect(lagged.energy.available).not.toBe(none.energy.available);
    expect(Math.abs(lagged.energy.available / none.energy.available - 1)).toBeLessThan(0.01);
  });

  it("differs by sky model in the plane, not in the mistakes it raises", async () => {
    const insolations = [];
    for (const skyModel of ["perez", "hay-davies", "isotropic"]) {
      const { energy, cautions, provenance } = await estimated(
        requestOf({ ...climate, irradiance: { ...climate.irradiance, skyModel } }),
      );
      expect(mistakesIn(cautions)).toEqual([]);
      expect(provenance.models.map((model: Json) => model.name)).toContain(`sky-${skyModel}`);
      insolations.push(energy.insolation);
    }
    expect(new Set(insolations).size).toBe(3);
  });

  it.each([-60, 60])("shifted by %i minutes is named, with the minutes", async (shift) => {
    const { cautions } = await estimated(requestOf(moved(climate, shift)));
    const caution = cautions.find(({ code }: Json) => code === "time-shifted");
    expect(caution?.severity).toBe("warning");
    expect(Math.abs(caution.values.shiftMinutes - shift)).toBeLessThanOrEqual(10);
  });

  it("of half-hourly means stamped at their ends is named as that", async () => {
    const means = climateOf(name, 30);
    expect(mistakesIn((await estimated(requestOf(means))).cautions)).toEqual([]);
    const { cautions } = await estimated(requestOf(moved(means, 30)));
    const caution = cautions.find(({ code }: Json) => code === "time-shifted");
    expect(caution?.detail).toContain("ends of intervals given as starts");
  });

  it("with direct and diffuse swapped is named as that", async () => {
    const { directNormal: diffuse, diffuse: directNormal } = climate.irradiance;
    const { cautions } = await estimated(
      requestOf({ ...climate, irradiance: { ...climate.irradiance, directNormal, diffuse } }),
    );
    const caution = cautions.find(({ code }: Json) => code === "columns-swapped");
    expect(caution?.detail).toContain("diffuse holds directNormal");
  });

  it("in kelvin is refused, and told to subtract 273.15", async () => {
    const values = climate.temperature.values.map((t: number) => t + 273.15);
    const { status, body } = await sent(requestOf({ ...climate, temperature: { ...climate.temperature, values } }));
    expect(status).toBe(422);
    expect(body.errors[0]).toMatchObject({ pointer: "/climate/temperature/values/0", code: "out-of-range" });
    expect(body.errors[0].detail).toMatch(/kelvin: subtract 273\.15/);
  });
});
