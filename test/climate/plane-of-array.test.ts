import { describe, expect, it } from "vitest";
import { diffuseFraction } from "../../service/climate/diffuse-fraction.ts";
import { extraterrestrialNormal } from "../../service/climate/extraterrestrial-irradiance.ts";
import { hayDaviesSky } from "../../service/climate/hay-davies-sky.ts";
import { isotropicSky } from "../../service/climate/isotropic-sky.ts";
import {
  BRIGHTNESS_COEFFICIENTS,
  perezDiffuse,
  perezSky,
  skyBrightness,
  skyClearness,
} from "../../service/climate/perez-sky.ts";
import { cosIncidence, plane } from "../../service/climate/plane.ts";
import { planeOfArrayIrradiance, SKY_MODELS } from "../../service/climate/plane-of-array.ts";
import { darkSky, type Sky } from "../../service/climate/sky.ts";
import {
  observer,
  positionOf,
  RADIANS,
  type SunDirection,
  turnToLatitude,
} from "../../service/climate/sun-position.ts";
import { sunTrack } from "../../service/climate/sun-track.ts";
import printed from "../fixtures/plane-of-array.json" with { type: "json" };
import { seededRandom } from "./seeded-random.ts";

/** Direction to a sun of given declination and hour angle (west positive) from a latitude, degrees. */
function direction(latitude: number, declination: number, hourAngle: number): SunDirection {
  const [d, h] = [declination * RADIANS, hourAngle * RADIANS];
  const seen = { east: -Math.cos(d) * Math.sin(h), north: Math.sin(d), up: Math.cos(d) * Math.cos(h), distance: 1 };
  turnToLatitude(seen, observer(latitude, 0));
  return seen;
}

/** Zenith and azimuth counted from south, west positive, as in Duffie & Beckman. */
function seenFromSouth(latitude: number, declination: number, hourAngle: number) {
  const position = { zenith: 0, azimuth: 0 };
  positionOf(direction(latitude, declination, hourAngle), position);
  return { zenith: position.zenith, azimuth: position.azimuth - 180 };
}

describe("Duffie & Beckman's examples (4th ed. 2013; plane-of-array.json says which figures are read, remembered, recomputed)", () => {
  it("1.5.1: 10:30 clock at 89.4 W on 3 February is 10:19 solar time, in every year from 2020 to 2050", () => {
    for (let year = 2020; year <= 2050; year++) {
      const site = { latitude: 0, longitude: -89.4 };
      const { east, up } = sunTrack(Date.UTC(year, 1, 3, 16, 30), 1, 1, site);
      const solarMinutes = 720 + (Math.atan2(-east[0], up[0]) / RADIANS) * 4;
      expect(Math.abs(solarMinutes - (10 * 60 + 19))).toBeLessThanOrEqual(0.5);
    }
  });

  it("1.6.1: cos(incidence) 0.817 and 35 deg; exact 0.8173843380140", () => {
    const cos = cosIncidence(direction(43, -14, -22.5), plane(45, 180 + 15));
    expect(Math.abs(cos - 0.817)).toBeLessThanOrEqual(0.0005);
    expect(Math.abs(Math.acos(cos) / RADIANS - 35)).toBeLessThanOrEqual(0.5);
    expect(cos).toBeCloseTo(0.817384338014, 12);
  });

  it("1.6.2: zenith 66.5 and azimuth -40.0; 79.6 and 112.0; exact values to ten decimals", () => {
    const a = seenFromSouth(43, -14, -37.5);
    expect(Math.abs(a.zenith - 66.5)).toBeLessThanOrEqual(0.05);
    expect(a.zenith).toBeCloseTo(66.547010634, 9);
    expect(a.azimuth).toBeCloseTo(-40.0810607913, 9);
    const b = seenFromSouth(43, 23.1, 97.5);
    expect(Math.abs(b.zenith - 79.6)).toBeLessThanOrEqual(0.05);
    expect(Math.abs(b.azimuth - 112.0)).toBeLessThanOrEqual(0.05);
    expect(b.zenith).toBeCloseTo(79.6438486825, 9);
    expect(b.azimuth).toBeCloseTo(112.019755816, 9);
  });

  it("1.10.1 and 1.10.3: 33.8 MJ/m2 a day and 3.79 MJ/m2 from 10 to 11 h outside the atmosphere at 43 N on 15 April", () => {
    const { distance } = sunTrack(Date.UTC(2025, 3, 15, 17), 1, 1, { latitude: 43, longitude: 0 });
    const normal = extraterrestrialNormal(distance[0], 1367);
    const energy = (from: number, to: number, parts = 20_000) => {
      let sum = 0;
      for (let k = 0; k < parts; k++)
        sum += Math.max(0, direction(43, 9.4, from + ((k + 0.5) * (to - from)) / parts).up);
      return (normal * (sum / parts) * (to - from) * 240) / 1e6;
    };
    expect(Math.abs(energy(-180, 180) - 33.8)).toBeLessThanOrEqual(0.05);
    expect(Math.abs(energy(-30, -15) - 3.79)).toBeLessThanOrEqual(0.005);
  });
});

/** Example 2.15.1's hour: 40 N, n = 51, 9 to 10 h, 60 deg south, 1.04 MJ/m2, ground 0.6; energies in MJ/m2. */
function exampleSky(): Sky {
  const normal = 1367 * (1 + 0.033 * Math.cos((360 * 51 * RADIANS) / 365)); // eq. 1.4.1a
  const [phi, dec] = [40 * RADIANS, -11.6 * RADIANS];
  const [w1, w2] = [-45 * RADIANS, -30 * RADIANS];
  const outside = // eq. 1.10.4
    ((12 * 3600) / Math.PI) *
    normal *
    (Math.cos(phi) * Math.cos(dec) * (Math.sin(w2) - Math.sin(w1)) + (w2 - w1) * Math.sin(phi) * Math.sin(dec));
  const sun = direction(40, -11.6, -37.5);
  const diffuse = 1.04 * diffuseFraction(1.04e6 / outside);
  const beam = 1.04 - diffuse;
  return {
    direct: beam / sun.up,
    diffuse,
    extraterrestrial: beam / sun.up / (beam / (outside / 1e6)), // the book's anisotropy: beam over outside, horizontal
    zenith: Math.acos(sun.up),
    cosZenith: sun.up,
    airMass: 1 / sun.up,
    cosIncidence: cosIncidence(sun, plane(60, 180)),
  };
}

describe("Duffie & Beckman's example 2.15.1 onwards", () => {
  const on = plane(60, 180);

  it("splits 1.04 MJ/m2 into diffuse .796 and beam .244 with a beam ratio of 1.71", () => {
    const sky = exampleSky();
    expect(Math.abs(sky.diffuse - 0.796)).toBeLessThanOrEqual(0.0005);
    expect(Math.abs(sky.direct * sky.cosZenith - 0.244)).toBeLessThanOrEqual(0.0005);
    expect(Math.abs(sky.cosIncidence / sky.cosZenith - 1.71)).toBeLessThanOrEqual(0.005);
  });

  it("puts 1.17 MJ/m2 on the plane under an even sky; exact 1.1716913", () => {
    const total = planeOfArrayIrradiance(exampleSky(), on, 0.6, isotropicSky);
    expect(Math.abs(total - 1.17)).toBeLessThanOrEqual(0.005);
    expect(Math.abs(total - 1.1716913)).toBeLessThanOrEqual(5e-8);
  });

  it("puts 1.28 MJ/m2 there once Reindl's horizon term (eq. 2.16.5) is added to Hay & Davies; exact 1.2844217", () => {
    const sky = exampleSky();
    const even = sky.diffuse * (1 - sky.direct / sky.extraterrestrial) * on.skyView;
    const beam = sky.direct * sky.cosZenith;
    const horizon = even * Math.sqrt(beam / 1.04) * Math.sin(30 * RADIANS) ** 3;
    const total = planeOfArrayIrradiance(sky, on, 0.6, hayDaviesSky) + horizon;
    expect(Math.abs(total - 1.28)).toBeLessThanOrEqual(0.005);
    expect(Math.abs(total - 1.2844217)).toBeLessThanOrEqual(5e-8);
  });

  it("puts 1.3711564 MJ/m2 there under Perez's sky, with clearness 1.28248 and brightness .339711", () => {
    const sky = exampleSky();
    sky.extraterrestrial = (1367 * (1 + 0.033 * Math.cos((360 * 51 * RADIANS) / 365)) * 3600) / 1e6;
    expect(Math.abs(skyClearness(sky) - 1.28248)).toBeLessThanOrEqual(5e-6);
    expect(Math.abs(skyBrightness(sky) - 0.339711)).toBeLessThanOrEqual(5e-7);
    expect(Math.abs(planeOfArrayIrradiance(sky, on, 0.6, perezSky) - 1.3711564)).toBeLessThanOrEqual(5e-8);
  });
});

describe("Perez et al. 1990's coefficients", () => {
  it("are the 48 printed ones and sum to -1.46", () => {
    const rows = printed.rows.flatMap(({ F11, F12, F13, F21, F22, F23 }) => [F11, F12, F13, F21, F22, F23]);
    expect(BRIGHTNESS_COEFFICIENTS).toEqual(rows);
    expect(BRIGHTNESS_COEFFICIENTS.reduce((a, b) => a + b)).toBeCloseTo(printed.checksum.sumOf48, 10);
  });

  it("are chosen by the printed bounds of clearness: 1.065 belongs to the second class", () => {
    const on = plane(90, 180);
    for (const row of printed.rows.slice(1)) {
      const sky = { ...darkSky(), diffuse: 100, extraterrestrial: 1e9, cosIncidence: 1 }; // overhead, brightness 0
      sky.direct = 100 * (row.eps_lo * (1 + 1e-12) - 1);
      const f1 = Math.max(0, row.F11 * 1);
      const expected = 100 * ((1 - f1) / 2 + f1 + row.F21);
      expect(perezSky(sky, on)).toBeCloseTo(expected, 4);
    }
  });
});

/** A random sky and the direction of its sun, zenith up to 100 deg. */
function randomSky(random: () => number, tilt: number, azimuth: number): { sky: Sky; on: ReturnType<typeof plane> } {
  const z = 100 * random() * RADIANS;
  const a = 2 * Math.PI * random();
  const sun = { east: Math.sin(z) * Math.sin(a), north: Math.sin(z) * Math.cos(a), up: Math.cos(z), distance: 1 };
  const on = plane(tilt, azimuth);
  const cosZenith = sun.up;
  const direct = cosZenith > 0 ? 1000 * random() : 0;
  const sky = {
    direct,
    diffuse: 400 * random(),
    extraterrestrial: 1361,
    zenith: z,
    cosZenith,
    airMass: 1 / Math.max(cosZenith, 0.03),
    cosIncidence: cosIncidence(sun, on),
  };
  return { sky, on };
}

describe("every sky model (plane-of-array.json, invariants)", () => {
  it.each(Object.entries(SKY_MODELS))("%s gives global horizontal at tilt 0, at every zenith", (_name, model) => {
    const random = seededRandom(11);
    for (let k = 0; k < 2000; k++) {
      const { sky, on } = randomSky(random, 0, 360 * random());
      const global = Math.max(0, sky.cosZenith) * sky.direct + sky.diffuse;
      expect(planeOfArrayIrradiance(sky, on, random(), model)).toBeCloseTo(global, 9);
    }
  });

  it("Perez with both coefficients 0, and Hay & Davies without direct light, are the even sky", () => {
    const random = seededRandom(12);
    for (let k = 0; k < 2000; k++) {
      const { sky, on } = randomSky(random, 180 * random(), 360 * random());
      expect(perezDiffuse(0, 0, sky, on)).toBeCloseTo(isotropicSky(sky, on), 9);
      expect(hayDaviesSky({ ...sky, direct: 0 }, on)).toBeCloseTo(isotropicSky(sky, on), 9);
    }
  });

  it.each(Object.entries(SKY_MODELS))("%s is never negative and gives nothing without light", (_name, model) => {
    const random = seededRandom(13);
    for (let k = 0; k < 2000; k++) {
      const { sky, on } = randomSky(random, 180 * random(), 360 * random());
      expect(planeOfArrayIrradiance(sky, on, 0.2, model)).toBeGreaterThanOrEqual(0);
      expect(planeOfArrayIrradiance({ ...sky, direct: 0, diffuse: 0 }, on, 0.2, model)).toBe(0);
    }
  });

  it("a plane facing down sees the ground only: albedo x global", () => {
    const { sky, on } = randomSky(seededRandom(3), 180, 0);
    const global = sky.direct * Math.max(0, sky.cosZenith) + sky.diffuse;
    expect(planeOfArrayIrradiance({ ...sky, cosIncidence: -1 }, on, 0.5, isotropicSky)).toBeCloseTo(global / 2, 9);
  });
});
