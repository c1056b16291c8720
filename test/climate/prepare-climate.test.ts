import { describe, expect, it } from "vitest";
import { ClimateError } from "../../service/climate/climate-error.ts";
import type { ClimateSeries, HorizontalIrradiance, Site } from "../../service/climate/climate-series.ts";
import { prepareClimate } from "../../service/climate/prepare-climate.ts";
import { RADIANS, sunPosition } from "../../service/climate/sun-position.ts";

const site: Site = { latitude: 52, longitude: 5, elevation: 10, tilt: 0, azimuth: 180, albedo: 0.2 };
const start = Date.UTC(2025, 5, 21);

function horizontal(over: Partial<HorizontalIrradiance> = {}, of: Partial<ClimateSeries> = {}): ClimateSeries {
  const global = Float64Array.from({ length: 24 }, (_, h) => Math.max(0, 700 * Math.sin(((h - 4) / 16) * Math.PI)));
  const temperature = { kind: "cell", values: new Float64Array(24).fill(30) } as const;
  const irradiance = { kind: "horizontal", global, site, ...over } as const;
  return { start, utcOffset: 0, step: 3600, timing: "mean", irradiance, temperature, ...of };
}

function planeOfArray(values: number[], of: Partial<ClimateSeries> = {}): ClimateSeries {
  const irradiance = { kind: "plane-of-array", values: Float64Array.from(values) } as const;
  const temperature = { kind: "cell", values: new Float64Array(values.length).fill(25) } as const;
  return { start, utcOffset: 0, step: 3600, timing: "mean", irradiance, temperature, ...of };
}

const refusal = (series: ClimateSeries) => {
  try {
    prepareClimate(series);
  } catch (error) {
    if (error instanceof ClimateError) return { code: error.code, column: error.column, index: error.index };
    throw error;
  }
  return null;
};

describe("a prepared climate", () => {
  it("keeps plane-of-array irradiance and cell temperature as they are, night readings down to -10 W/m2 counting as 0", () => {
    const given = planeOfArray([-10, -0.5, 0, 640, 1180]);
    const { irradiance, cellTemperature, used, notes } = prepareClimate(given);
    expect([...irradiance]).toEqual([0, 0, 0, 640, 1180]);
    expect([...cellTemperature]).toEqual([25, 25, 25, 25, 25]);
    expect(used).toBeNull();
    expect(notes).toEqual([]);
    expect(given.irradiance.kind === "plane-of-array" && given.irradiance.values[0]).toBe(-10);
  });

  it("has global horizontal irradiance at tilt 0, from whatever components and by whatever sky", () => {
    const { global } = horizontal().irradiance as HorizontalIrradiance;
    const diffuse = (global as Float64Array).map((g) => 0.4 * g);
    const directNormal = (global as Float64Array).map((g) => 0.6 * g);
    for (const skyModel of ["perez", "hay-davies", "isotropic"] as const)
      for (const over of [{}, { diffuse }, { directNormal }])
        prepareClimate(horizontal({ ...over, skyModel })).irradiance.forEach((g, h) => {
          expect(g).toBeCloseTo((global as Float64Array)[h], 9);
        });
  });

  it("takes the sun in the middle of a mean and at the instant of an instant", () => {
    const directNormal = new Float64Array(24).fill(500);
    const diffuse = new Float64Array(24);
    for (const timing of ["mean", "instant"] as const) {
      const series = horizontal({ global: undefined, directNormal, diffuse }, { timing });
      const { irradiance } = prepareClimate(series);
      const utc = start + 12 * 3_600_000 + (timing === "mean" ? 1_800_000 : 0);
      const { zenith } = sunPosition(utc, site.latitude, site.longitude);
      expect(irradiance[12]).toBeCloseTo(500 * Math.cos(zenith * RADIANS), 0);
      expect(Math.abs(irradiance[12] - 500 * Math.cos(zenith * RADIANS))).toBeLessThan(0.1);
    }
  });

  it("faces south better than north on the northern half and the other way round on the southern", () => {
    const sum = (at: Partial<Site>) =>
      prepareClimate(
        horizontal({ site: { ...site, tilt: 60, ...at } }, { start: Date.UTC(2025, 2, 21) }),
      ).irradiance.reduce((a, b) => a + b);
    expect(sum({})).toBeGreaterThan(1.3 * sum({ azimuth: 0 }));
    expect(sum({ latitude: -52, azimuth: 0 })).toBeGreaterThan(1.3 * sum({ latitude: -52 }));
  });

  it("takes 1 m/s where no wind is given, and says so (physics.md section 6)", () => {
    const values = new Float64Array(2).fill(20);
    const { cellTemperature, notes } = prepareClimate(
      planeOfArray([1000, 800], { temperature: { kind: "ambient", values } }),
    );
    expect(cellTemperature[0]).toBeCloseTo(51.407035, 6); // checks/cell-temperature.json, Faiman
    expect(cellTemperature[1]).toBeCloseTo(45.125628, 6);
    expect(notes.map(({ code }) => code)).toEqual(["wind-assumed"]);
    expect(notes[0].values).toEqual({ windSpeed: 1 });
  });

  it("does not speak of wind where the model knows none or the column is there", () => {
    const values = new Float64Array(1).fill(20);
    const windSpeed = new Float64Array(1).fill(1);
    const model = { kind: "noct", nominalOperatingCellTemperature: 45 } as const;
    const noct = prepareClimate(planeOfArray([1000], { temperature: { kind: "ambient", values, model } }));
    expect(noct.notes).toEqual([]);
    expect(noct.cellTemperature[0]).toBe(51.25);
    expect(prepareClimate(planeOfArray([1000], { temperature: { kind: "ambient", values, windSpeed } })).notes).toEqual(
      [],
    );
  });

  it("follows a thermal lag at steps under ten minutes and says that it leaves it out above", () => {
    const values = new Float64Array(3).fill(20);
    const windSpeed = new Float64Array(3).fill(1);
    const temperature = { kind: "ambient", values, windSpeed, thermalLag: 420 } as const;
    const minute = prepareClimate(planeOfArray([0, 1000, 1000], { step: 60, temperature }));
    expect(minute.cellTemperature[2]).toBeLessThan(30);
    expect(minute.notes).toEqual([]);
    const hour = prepareClimate(planeOfArray([0, 1000, 1000], { temperature }));
    expect(hour.cellTemperature[2]).toBeCloseTo(51.407035, 6);
    expect(hour.notes.map(({ code }) => code)).toEqual(["thermal-lag-not-followed"]);
  });

  it("marks skipped samples and holds NaN there; filled ones are counted and noted", () => {
    const skipped = prepareClimate(planeOfArray([100, Number.NaN, 300], { gaps: "skip" }));
    expect([...(skipped.used ?? [])]).toEqual([1, 0, 1]);
    expect(skipped.irradiance[1]).toBeNaN();
    expect(skipped.cellTemperature[1]).toBeNaN();
    expect(skipped.skipped).toBe(1);
    const filled = prepareClimate(planeOfArray([100, Number.NaN, 300], { gaps: { interpolateUpTo: 3600 } }));
    expect([...filled.irradiance]).toEqual([100, 200, 300]);
    expect(filled.notes).toMatchObject([{ code: "gaps-filled", values: { filled: 1 } }]);
  });
});

describe("a climate that cannot be used is refused", () => {
  const hot = { kind: "ambient", values: Float64Array.of(Number.POSITIVE_INFINITY) } as const;
  const storm = { kind: "ambient", values: Float64Array.of(20), windSpeed: Float64Array.of(-1) } as const;
  const longer = { kind: "cell", values: new Float64Array(2) } as const;
  it.each([
    ["below -10 W/m2", planeOfArray([0, -10.1]), "irradiance-out-of-range", "irradiance", 1],
    ["above 2000 W/m2", planeOfArray([2000.1]), "irradiance-out-of-range", "irradiance", 0],
    ["a gap by default", planeOfArray([Number.NaN]), "missing-samples", "irradiance", 0],
    ["infinite temperature", planeOfArray([1], { temperature: hot }), "not-finite", "ambientTemperature", 0],
    ["negative wind", planeOfArray([1], { temperature: storm }), "wind-out-of-range", "windSpeed", 0],
    ["unequal columns", planeOfArray([1], { temperature: longer }), "column-length", "cellTemperature", -1],
    ["no samples", planeOfArray([]), "empty-series", "irradiance", -1],
    ["no step", planeOfArray([1], { step: 0 }), "step-out-of-range", "step", -1],
    ["NaN step", planeOfArray([1], { step: Number.NaN }), "step-out-of-range", "step", -1],
    ["a latitude of 95", horizontal({ site: { ...site, latitude: 95 } }), "site-out-of-range", "latitude", -1],
    ["an albedo in %", horizontal({ site: { ...site, albedo: 20 } }), "site-out-of-range", "albedo", -1],
    [
      "diffuse alone",
      horizontal({ global: undefined, diffuse: new Float64Array(24) }),
      "components-missing",
      "irradiance",
      -1,
    ],
  ])("%s", (_name, series, code, column, index) => {
    expect(refusal(series)).toEqual({ code, column, index });
  });
});
