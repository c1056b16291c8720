import { describe, expect, it } from "vitest";
import type { ClimateSeries, HorizontalIrradiance } from "../../service/climate/climate-series.ts";
import { noticedMistakes } from "../../service/climate/plausibility.ts";
import { prepareClimate } from "../../service/climate/prepare-climate.ts";
import { airBending, liftByRefraction, standardPressure } from "../../service/climate/refraction.ts";
import { RADIANS } from "../../service/climate/sun-position.ts";
import { sunTrack } from "../../service/climate/sun-track.ts";
import { type MeasuredDay, measuredClimate, measuredDaysArePresent, readMeasuredDay } from "./measured-day.ts";

/** Largest difference between computed and printed zenith (both refracted), degrees, printed zenith below 80. */
function worstZenith(day: MeasuredDay, firstInstant: number): number {
  const track = sunTrack(firstInstant, 60_000, day.zenith.length, day.site);
  const bending = airBending(standardPressure(day.site.elevation));
  let worst = 0;
  for (let i = 0; i < day.zenith.length; i++) {
    if (day.zenith[i] >= 80) continue;
    const seen = { east: track.east[i], north: track.north[i], up: track.up[i], distance: 1 };
    worst = Math.max(worst, Math.abs(liftByRefraction(seen, bending) / RADIANS - day.zenith[i]));
  }
  return worst;
}

/** Changes to the three columns of a day's climate. */
function withLight(series: ClimateSeries, change: (light: HorizontalIrradiance) => Partial<HorizontalIrradiance>) {
  const light = series.irradiance as HorizontalIrradiance;
  return { ...series, irradiance: { ...light, ...change(light) } };
}

const codes = (series: ClimateSeries) => noticedMistakes(series).map(({ code }) => code);

describe.runIf(measuredDaysArePresent).each(["a", "b"] as const)("measured day %s (SURFRAD, read in place)", (name) => {
  const day = measuredDaysArePresent ? readMeasuredDay(name) : (undefined as never);
  const steps = [1, 5, 10, 15, 30, 60];

  it("has the printed zenith within 0.03 deg in the middle of each minute, and off by more than 0.1 at end stamps taken as starts", () => {
    expect(worstZenith(day, day.firstStamp - 30_000)).toBeLessThan(0.03);
    expect(worstZenith(day, day.firstStamp + 30_000)).toBeGreaterThan(0.1);
  });

  it("closes within 25 W/m2 below 80 deg of zenith, but for at most one minute of passing cloud (27.1 W/m2 on day b)", () => {
    const track = sunTrack(day.firstStamp - 30_000, 60_000, day.zenith.length, day.site);
    const bending = airBending(standardPressure(day.site.elevation));
    const rests: number[] = [];
    for (let i = 0; i < day.zenith.length; i++) {
      if (day.zenith[i] >= 80) continue;
      const seen = { east: track.east[i], north: track.north[i], up: track.up[i], distance: 1 };
      liftByRefraction(seen, bending);
      rests.push(Math.abs(day.global[i] - (day.directNormal[i] * seen.up + day.diffuse[i])));
    }
    expect(rests.length).toBeGreaterThan(350);
    expect(rests.filter((rest) => rest > 25).length).toBeLessThanOrEqual(1);
    expect(Math.max(...rests)).toBeLessThan(28);
  });

  it("raises nothing, at one minute and averaged over up to an hour, whatever columns are given", () => {
    for (const minutes of steps) {
      const series = measuredClimate(day, minutes);
      expect([minutes, ...codes(series)]).toEqual([minutes]);
      const fewer = [
        { directNormal: undefined, diffuse: undefined },
        { directNormal: undefined },
        { diffuse: undefined },
        { global: undefined },
      ];
      for (const without of fewer) expect([minutes, ...codes(withLight(series, () => without))]).toEqual([minutes]);
    }
  });

  it("shifted by an hour either way is named with the minutes, from three columns and from global alone", () => {
    for (const minutes of steps)
      for (const shift of [-60, 60]) {
        const series = measuredClimate(day, minutes);
        const shifted = { ...series, start: series.start + shift * 60_000 };
        for (const given of [shifted, withLight(shifted, () => ({ directNormal: undefined, diffuse: undefined }))]) {
          const [found] = noticedMistakes(given);
          expect([minutes, shift, found?.code]).toEqual([minutes, shift, "time-shifted"]);
          expect(Math.abs(found.values.shiftMinutes - shift)).toBeLessThanOrEqual(Math.max(10, 0.4 * minutes));
        }
      }
  });

  it("averaged over half an hour or an hour and end-stamped is named as that", () => {
    for (const minutes of [30, 60]) {
      const series = measuredClimate(day, minutes);
      const [found] = noticedMistakes({ ...series, start: series.start + minutes * 60_000 });
      expect(found?.code).toBe("time-shifted");
      expect(found.detail).toContain("ends of intervals given as starts");
    }
  });

  it("with direct and diffuse swapped is named as that", () => {
    for (const minutes of steps) {
      const swapped = withLight(measuredClimate(day, minutes), ({ directNormal, diffuse }) => ({
        directNormal: diffuse,
        diffuse: directNormal,
      }));
      const [found] = noticedMistakes(swapped);
      expect([minutes, found?.code]).toEqual([minutes, "columns-swapped"]);
      expect(found.detail).toContain("directNormal holds diffuse");
      expect(found.detail).toContain("diffuse holds directNormal");
    }
  });

  it("in kelvin is named as that", () => {
    const series = measuredClimate(day);
    const values = series.temperature.values.map((t) => t + 273.15);
    expect(codes({ ...series, temperature: { kind: "ambient", values } })).toEqual(["temperature-in-kelvin"]);
  });

  it("comes through every sky model with global kept at tilt 0 and no sample above 1400 W/m2 on a steep plane", () => {
    for (const skyModel of ["perez", "hay-davies", "isotropic"] as const)
      for (const without of [{}, { directNormal: undefined }, { directNormal: undefined, diffuse: undefined }]) {
        const of = (tilt: number) =>
          withLight(measuredClimate(day), ({ site }) => ({ ...without, skyModel, site: { ...site, tilt } }));
        expect(Math.max(...prepareClimate(of(70)).irradiance)).toBeLessThan(1400);
        if (!("directNormal" in without)) continue;
        prepareClimate(of(0)).irradiance.forEach((g, i) => {
          expect(g).toBeCloseTo(Math.max(0, day.global[i]), 8);
        });
      }
  });
});

describe.runIf(measuredDaysArePresent)("measured day a, whose sun shone", () => {
  it("end-stamped at 5, 10 and 15 minutes is named from its closure; at one minute it cannot be", () => {
    const day = readMeasuredDay("a");
    for (const minutes of [10, 15]) {
      const series = measuredClimate(day, minutes);
      const [found] = noticedMistakes({ ...series, start: series.start + minutes * 60_000 });
      expect([minutes, found?.code]).toEqual([minutes, "time-shifted"]);
      expect(found.detail).toContain("ends of intervals given as starts");
    }
    const series = measuredClimate(day, 1);
    expect(codes({ ...series, start: series.start + 60_000 })).toEqual([]);
  });
});
