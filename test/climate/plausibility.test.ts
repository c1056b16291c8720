import { describe, expect, it } from "vitest";
import type { ClimateSeries, Site } from "../../service/climate/climate-series.ts";
import { noticedMistakes } from "../../service/climate/plausibility.ts";
import { sunTrack } from "../../service/climate/sun-track.ts";
import { seededRandom } from "./seeded-random.ts";

const HOUR = 3_600_000;

interface Weather {
  global: Float64Array;
  directNormal: Float64Array;
  diffuse: Float64Array;
  air: Float64Array;
}

/**
 * Invented weather: days of random clearness, hours of random cloud, averaged over 12 parts of each step so that the
 * sun's crossing of the horizon is in it. Not a model of any place; the sun is the tested one, its own test holds it.
 */
function inventedWeather(site: Site, first: number, step: number, count: number, seed: number): Weather {
  const random = seededRandom(seed);
  const parts = 12;
  const track = sunTrack(first + step / parts / 2, step / parts, count * parts, site);
  const out = {
    global: new Float64Array(count),
    directNormal: new Float64Array(count),
    diffuse: new Float64Array(count),
  };
  const air = new Float64Array(count);
  let clear = 0.5;
  for (let i = 0; i < count; i++) {
    if ((i * step) % 86_400_000 === 0) clear = random();
    const sunny = Math.min(1, Math.max(0, clear + 0.5 * (random() - 0.5)));
    for (let k = 0; k < parts; k++) {
      const height = track.up[i * parts + k];
      if (height <= 0) continue;
      const beam = sunny * sunny * 1000 * 0.7 ** (1 / (height + 0.05)) * 1.3;
      const scattered = height * (330 - 230 * sunny) + 15 * Math.min(1, height * 10);
      out.directNormal[i] += beam / parts;
      out.diffuse[i] += scattered / parts;
      out.global[i] += (beam * height + scattered) / parts;
    }
    air[i] = 12 + 8 * Math.sin((2 * Math.PI * i * step) / (365 * 86_400_000) - 1.7) + 4 * random();
  }
  return { ...out, air };
}

const towns: Site[] = [
  { latitude: 59.9, longitude: 10.7, elevation: 100, tilt: 40, azimuth: 180, albedo: 0.2 },
  { latitude: 35.1, longitude: -110.6, elevation: 1500, tilt: 30, azimuth: 180, albedo: 0.2 },
  { latitude: 1.3, longitude: 103.8, elevation: 15, tilt: 10, azimuth: 180, albedo: 0.2 },
  { latitude: -33.9, longitude: 18.4, elevation: 40, tilt: 30, azimuth: 0, albedo: 0.2 },
  { latitude: 68.4, longitude: 17.4, elevation: 10, tilt: 60, azimuth: 180, albedo: 0.2 },
];

type Columns = "global" | "directNormal" | "diffuse";

function climate(site: Site, weather: Weather, columns: Columns[], over: Partial<ClimateSeries> = {}): ClimateSeries {
  const light = Object.fromEntries(columns.map((name) => [name, weather[name]]));
  return {
    start: Date.UTC(2025, 0, 1),
    utcOffset: 0,
    step: 3600,
    timing: "mean",
    irradiance: { kind: "horizontal", ...light, site },
    temperature: { kind: "ambient", values: weather.air },
    ...over,
  };
}

const years = towns.map((site, k) => ({
  site,
  weather: inventedWeather(site, Date.UTC(2025, 0, 1), HOUR, 8760, 40 + k),
}));
const all: Columns[] = ["global", "directNormal", "diffuse"];
const sets: Columns[][] = [
  all,
  ["global"],
  ["global", "diffuse"],
  ["global", "directNormal"],
  ["directNormal", "diffuse"],
];
const codes = (series: ClimateSeries) => noticedMistakes(series).map(({ code }) => code);
const start = Date.UTC(2025, 0, 1);

describe("a sound year of invented weather, at five latitudes", () => {
  it.each(years)("raises nothing at $site.latitude N, whatever columns are given", ({ site, weather }) => {
    for (const columns of sets) expect(codes(climate(site, weather, columns))).toEqual([]);
  });

  it("raises nothing week by week either", () => {
    for (const { site, weather } of years)
      for (let week = 0; week < 52; week++) {
        const cut = (c: Float64Array) => c.slice(week * 168, (week + 1) * 168);
        const part = { ...weather, global: cut(weather.global), air: cut(weather.air) };
        const three = { ...part, directNormal: cut(weather.directNormal), diffuse: cut(weather.diffuse) };
        const over = { start: start + week * 168 * HOUR };
        expect([site.latitude, week, ...codes(climate(site, part, ["global"], over))]).toEqual([site.latitude, week]);
        expect([site.latitude, week, ...codes(climate(site, three, all, over))]).toEqual([site.latitude, week]);
      }
  });
});

describe("each planted mistake is named", () => {
  it.each([-180, -60, 60, 120, 600])("a clock wrong by %i minutes, with the minutes", (minutes) => {
    for (const { site, weather } of years)
      for (const columns of [all, ["global"] as Columns[]]) {
        const found = noticedMistakes(climate(site, weather, columns, { start: start + minutes * 60_000 }));
        expect(found.map(({ code }) => code)).toEqual(["time-shifted"]);
        expect(Math.abs(found[0].values.shiftMinutes - minutes)).toBeLessThanOrEqual(15);
      }
  });

  it("end stamps given as starts, and middles", () => {
    for (const { site, weather } of years) {
      const ends = noticedMistakes(climate(site, weather, all, { start: start + HOUR }));
      expect(ends[0].detail).toContain("ends of intervals");
      const middles = noticedMistakes(climate(site, weather, all, { start: start + HOUR / 2 }));
      expect(middles[0].detail).toContain("middles of intervals");
    }
  });

  it("a longitude with the wrong sign", () => {
    const [, { site, weather }] = years; // 110.6 W
    const wrong = { ...site, longitude: -site.longitude };
    const [found] = noticedMistakes(climate(wrong, weather, all));
    expect(found.code).toBe("time-shifted");
    expect(found.detail).toContain("longitude has the wrong sign");
  });

  it("direct and diffuse swapped", () => {
    for (const { site, weather } of years) {
      const swapped = { ...weather, directNormal: weather.diffuse, diffuse: weather.directNormal };
      const [found] = noticedMistakes(climate(site, swapped, all));
      expect(found.code).toBe("columns-swapped");
      expect(found.detail).toContain("diffuse holds directNormal");
    }
  });

  it("global and diffuse swapped, both beside direct and alone", () => {
    for (const { site, weather } of years) {
      const swapped = { ...weather, global: weather.diffuse, diffuse: weather.global };
      expect(codes(climate(site, swapped, all))).toEqual(["columns-swapped"]);
      expect(codes(climate(site, swapped, ["global", "diffuse"]))).toEqual(["columns-swapped"]);
    }
  });

  it("a direct column that is on the horizontal", () => {
    for (const { site, weather } of years) {
      const directNormal = weather.global.map((g, i) => g - weather.diffuse[i]);
      expect(codes(climate(site, { ...weather, directNormal }, all))).toEqual(["direct-on-horizontal"]);
    }
  });

  it("one column too strong by half: closure is violated, with the mean difference", () => {
    const [{ site, weather }] = years;
    const [found] = noticedMistakes(climate(site, { ...weather, global: weather.global.map((g) => 1.5 * g) }, all));
    expect(found.code).toBe("closure-violated");
    expect(found.values.bias).toBeGreaterThan(25);
  });

  it("global three times too strong: more than arrives outside the atmosphere", () => {
    const [, { site, weather }] = years;
    const global = weather.global.map((g) => Math.min(1990, 3 * g));
    expect(codes(climate(site, { ...weather, global }, ["global"]))).toEqual(["daily-total-too-high"]);
  });

  it("kelvin, Fahrenheit, kWh and MJ", () => {
    const [, { site, weather }] = years;
    const air = (of: (t: number) => number) => ({ ...weather, air: weather.air.map(of) });
    expect(
      codes(
        climate(
          site,
          air((t) => t + 273.15),
          all,
        ),
      ),
    ).toEqual(["temperature-in-kelvin"]);
    expect(
      codes(
        climate(
          site,
          air((t) => 32 + 1.8 * t),
          all,
        ),
      ),
    ).toEqual(["temperature-in-fahrenheit"]);
    const scaled = (by: number) => ({ ...weather, global: weather.global.map((g) => g * by) });
    const [kilowattHours] = noticedMistakes(climate(site, scaled(1e-3), ["global"]));
    expect(kilowattHours.code).toBe("irradiance-as-energy");
    expect(kilowattHours.detail).toContain("kWh/m2");
    const [megajoules] = noticedMistakes(climate(site, scaled(3.6e-3), ["global"]));
    expect(megajoules.detail).toContain("MJ/m2");
  });

  it("Fahrenheit, from cells that are hot in the dark or hotter than any, and from a year's mean", () => {
    const [, { site, weather }] = years;
    const fahrenheit = (t: number) => 32 + 1.8 * t;
    const cells = (of: (i: number) => number): ClimateSeries => ({
      ...climate(site, weather, ["global"]),
      temperature: { kind: "cell", values: weather.air.map((_, i) => of(i)) },
    });
    const cell = (i: number) => weather.air[i] + weather.global[i] / 32;
    expect(codes(cells(cell))).toEqual([]);
    expect(codes(cells((i) => fahrenheit(cell(i))))).toEqual(["temperature-in-fahrenheit"]);
    expect(codes(cells((i) => (weather.global[i] > 1 ? fahrenheit(cell(i) + 20) : 20)))).toEqual([
      "temperature-in-fahrenheit",
    ]);
    const mild = { ...weather, air: weather.air.map((t) => fahrenheit(0.25 * t + 4)) };
    const [found] = noticedMistakes(climate(site, mild, ["global"]));
    expect(found.detail).toContain("The year's mean");
  });

  it("direct and diffuse alone: swapped, or both too strong to be light", () => {
    const [, { site, weather }] = years;
    const two: Columns[] = ["directNormal", "diffuse"];
    const swapped = { ...weather, directNormal: weather.diffuse, diffuse: weather.directNormal };
    expect(codes(climate(site, swapped, two))).toEqual(["columns-swapped"]);
    const strong = (c: Float64Array) => c.map((v) => Math.min(1990, 8 * v));
    const both = { ...weather, directNormal: strong(weather.directNormal), diffuse: strong(weather.diffuse) };
    expect(codes(climate(site, both, two))).toEqual(["irradiance-impossible"]);
  });

  it("a start wrong by 100 minutes, which no reason fits better than another", () => {
    const [, { site, weather }] = years;
    const [found] = noticedMistakes(climate(site, weather, all, { start: start + 100 * 60_000 }));
    expect(found.detail).toContain("the UTC offset, the longitude or the start is wrong");
  });

  it("irradiance and temperature swapped", () => {
    const [{ site, weather }] = years;
    const swapped = { ...weather, global: weather.air, air: weather.global };
    expect(codes(climate(site, swapped, ["global"]))).toEqual(["irradiance-and-temperature-swapped"]);
  });

  it("light in the deep night that no shift explains", () => {
    const [, { site, weather }] = years;
    const global = weather.global.map((g) => g + 12);
    expect(codes(climate(site, { ...weather, global }, ["global"]))).toEqual(["light-at-night"]);
  });

  it("on a plane without a site: light around midnight, and a day brighter than any", () => {
    const [{ weather }] = years;
    const on = (values: Float64Array, over: Partial<ClimateSeries> = {}): ClimateSeries => ({
      ...climate(towns[0], weather, all),
      irradiance: { kind: "plane-of-array", values },
      ...over,
    });
    expect(codes(on(weather.global))).toEqual([]);
    expect(codes(on(weather.global, { utcOffset: 9 * HOUR }))).toEqual(["light-around-midnight"]);
    expect(codes(on(weather.global.map((g) => Math.min(1990, 3 * g))))).toEqual(["daily-total-too-high"]);
  });
});
