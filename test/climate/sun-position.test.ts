import { Body, Equator, HelioDistance, Horizon, Observer as Place } from "astronomy-engine";
import { describe, expect, it } from "vitest";
import {
  extraterrestrialNormal,
  SOLAR_CONSTANT,
  sunDistance,
} from "../../service/climate/extraterrestrial-irradiance.ts";
import { cosIncidence, plane } from "../../service/climate/plane.ts";
import { RADIANS, sunPosition } from "../../service/climate/sun-position.ts";
import { sunTrack } from "../../service/climate/sun-track.ts";
import sun from "../fixtures/sun-positions.json" with { type: "json" };
import { seededRandom } from "./seeded-random.ts";

type Angles = { zenith: number; azimuth: number };

function unit({ zenith, azimuth }: Angles): [number, number, number] {
  const s = Math.sin(zenith * RADIANS);
  return [s * Math.sin(azimuth * RADIANS), s * Math.cos(azimuth * RADIANS), Math.cos(zenith * RADIANS)];
}

function degreesBetween(a: Angles, b: Angles): number {
  const [p, q] = [unit(a), unit(b)];
  return (2 * Math.asin(Math.hypot(p[0] - q[0], p[1] - q[1], p[2] - q[2]) / 2)) / RADIANS;
}

/** Independent: astronomy-engine 2.1 (truncated VSOP87, nutation, aberration, light time), airless and topocentric. */
function independent(utc: number, latitude: number, longitude: number): Angles {
  const place = new Place(latitude, longitude, 0);
  const date = new Date(utc);
  const equator = Equator(Body.Sun, date, place, true, true);
  const horizon = Horizon(date, place, equator.ra, equator.dec);
  return { zenith: 90 - horizon.altitude, azimuth: horizon.azimuth };
}

/** PSA step by step: ecliptic, celestial, horizontal coordinates, then parallax. */
function asPrinted(utc: number, latitude: number, longitude: number): Angles {
  const n = (utc - Date.UTC(2000, 0, 1, 12)) / 86_400_000;
  const hour = (utc % 86_400_000) / 3_600_000;
  const omega = 2.267127827 - 9.300339267e-4 * n;
  const l = 4.895036035 + 0.01720279602 * n;
  const g = 6.239468336 + 0.01720200135 * n;
  const lambda =
    l +
    0.03338320972 * Math.sin(g) +
    3.497596876e-4 * Math.sin(2 * g) -
    1.544353226e-4 -
    8.68972936e-6 * Math.sin(omega);
  const epsilon = 0.4090904909 - 6.213605399e-9 * n + 4.418094944e-5 * Math.cos(omega);
  const ascension = Math.atan2(Math.cos(epsilon) * Math.sin(lambda), Math.cos(lambda));
  const declination = Math.asin(Math.sin(epsilon) * Math.sin(lambda));
  const angle = ((6.697096103 + 0.06570984737 * n + hour) * 15 + longitude) * RADIANS - ascension;
  const phi = latitude * RADIANS;
  const cos = Math.cos(phi) * Math.cos(angle) * Math.cos(declination) + Math.sin(declination) * Math.sin(phi);
  const azimuth = Math.atan2(-Math.sin(angle), Math.tan(declination) * Math.cos(phi) - Math.sin(phi) * Math.cos(angle));
  const zenith = Math.acos(cos) + (6371.01 / 149597890) * Math.sin(Math.acos(cos));
  return { zenith: zenith / RADIANS, azimuth: azimuth / RADIANS };
}

describe("the sun's position", () => {
  it("is within 0.01 deg of the almanac's zenith and azimuth (sun-positions.json, published with PSA's 2020 update)", () => {
    for (const row of sun.rows) {
      const utc = Date.UTC(row.year, row.month - 1, row.day, row.hour_ut, row.minute, row.second);
      const found = sunPosition(utc, row.lat, row.lon);
      expect(Math.abs(found.zenith - row.zenith_deg)).toBeLessThan(0.01);
      expect(Math.abs(found.azimuth - row.azimuth_deg)).toBeLessThan(0.01);
    }
  });

  it("is PSA as printed (Blanco-Muriel et al. 2001 with the 2020 coefficients, physics.md 6), within 1e-8 deg", () => {
    const random = seededRandom(2020);
    for (let k = 0; k < 500; k++) {
      const utc = Math.floor(Date.UTC(2020, 0, 1) + random() * 31 * 365.25 * 86_400_000);
      const [latitude, longitude] = [180 * random() - 90, 360 * random() - 180];
      const found = sunPosition(utc, latitude, longitude);
      expect(degreesBetween(found, asPrinted(utc, latitude, longitude))).toBeLessThan(1e-8);
    }
  });

  it("is within 0.01 deg of Reda & Andreas 2004's worked example, although 2003 lies before the fitted years", () => {
    const { output, input } = sun.workedExample;
    const found = sunPosition(Date.UTC(2003, 9, 17, 19, 30, 30), input.lat, input.lon);
    expect(Math.abs(found.zenith - output.zenith_geometric_topocentric)).toBeLessThan(0.01);
    expect(Math.abs(found.azimuth - output.azimuth)).toBeLessThan(0.01);
  });

  it("is within 0.02 deg of astronomy-engine at 500 random times and places from 2020 to 2050", () => {
    const random = seededRandom(20250105);
    const [first, last] = [Date.UTC(2020, 0, 1), Date.UTC(2050, 11, 31)];
    let worst = 0;
    for (let k = 0; k < 500; k++) {
      const utc = first + random() * (last - first);
      const latitude = Math.asin(2 * random() - 1) / RADIANS;
      const longitude = 360 * random() - 180;
      const apart = degreesBetween(sunPosition(utc, latitude, longitude), independent(utc, latitude, longitude));
      worst = Math.max(worst, apart);
    }
    expect(worst).toBeLessThan(0.02);
  });

  it("needs its parallax: without it the almanac's zeniths would be off by p sin z, 0.0024 deg at the horizon", () => {
    const high = sunPosition(Date.UTC(2030, 2, 20, 6, 0, 0), 0, 0);
    const p = (6371.01 / 149597890 / RADIANS) * Math.sin(high.zenith * RADIANS);
    const geocentric = high.zenith - p;
    const found = independent(Date.UTC(2030, 2, 20, 6, 0, 0), 0, 0).zenith;
    expect(Math.abs(found - high.zenith)).toBeLessThan(0.01);
    expect(p).toBeCloseTo(0.00244, 5);
    expect(geocentric).toBeLessThan(high.zenith);
  });

  it("passes NaN through", () => {
    expect(sunPosition(Number.NaN, 10, 10).zenith).toBeNaN();
    expect(sunPosition(0, Number.NaN, 10).azimuth).toBeNaN();
  });
});

describe("the incidence angle", () => {
  it("is 25.187 deg within 1e-6 at Reda & Andreas 2004's printed (refracted) zenith and azimuth, slope 30, 10 deg east of south", () => {
    const { input, output } = sun.workedExample;
    const [east, north, up] = unit({ zenith: output.zenith_refracted, azimuth: output.azimuth });
    const on = plane(input.slope, 180 + input.azm_rotation);
    const incidence = Math.acos(cosIncidence({ east, north, up, distance: 1 }, on)) / RADIANS;
    expect(Math.abs(incidence - output.incidence)).toBeLessThan(1e-6);
  });
});

describe("the sun's track", () => {
  it("agrees with single positions within 1e-9 deg for steps of a minute, an hour and a day and an uneven one", () => {
    for (const step of [60_000, 3_600_000, 86_400_000, 1_234_567]) {
      const first = Date.UTC(2026, 5, 1, 3, 30);
      const track = sunTrack(first, step, 500, { latitude: -33.4, longitude: 151.2 });
      for (let i = 0; i < 500; i++) {
        const single = sunPosition(first + i * step, -33.4, 151.2);
        const [east, north, up] = unit(single);
        expect(Math.abs(track.east[i] - east)).toBeLessThan(1e-11);
        expect(Math.abs(track.north[i] - north)).toBeLessThan(1e-11);
        expect(Math.abs(track.up[i] - up)).toBeLessThan(1e-11);
      }
    }
  });

  it("is empty for no samples and holds unit vectors", () => {
    expect(sunTrack(0, 1, 0, { latitude: 0, longitude: 0 }).up).toHaveLength(0);
    const { east, north, up } = sunTrack(Date.UTC(2030, 0, 1), 3.6e6, 24, { latitude: 60, longitude: 20 });
    for (let i = 0; i < 24; i++) expect(Math.hypot(east[i], north[i], up[i])).toBeCloseTo(1, 8);
  });
});

describe("the extraterrestrial irradiance", () => {
  it("follows the distance of astronomy-engine within 1e-4 (2e-4 in irradiance) over 200 random days from 2020 to 2050", () => {
    const random = seededRandom(7);
    for (let k = 0; k < 200; k++) {
      const utc = Date.UTC(2020, 0, 1) + random() * 31 * 365.25 * 86_400_000;
      const ours = sunTrack(utc, 1, 1, { latitude: 0, longitude: 0 }).distance[0];
      expect(Math.abs(ours / HelioDistance(Body.Earth, new Date(utc)) - 1)).toBeLessThan(1e-4);
    }
  });

  it("is the solar constant at one astronomical unit: 1361 W/m2 (IAU 2015 Resolution B3; from memory)", () => {
    expect(extraterrestrialNormal(1)).toBe(1361);
    expect(SOLAR_CONSTANT).toBe(1361);
    expect(extraterrestrialNormal(0.5, 1000)).toBe(4000);
  });

  it("is 6.9 % stronger at perihelion than at aphelion: (1.0167/0.9833)^2, eccentricity 0.0167 (astronomy's, from memory)", () => {
    const ratio = (sunDistance(0, -1) / sunDistance(0, 1)) ** 2;
    expect(ratio).toBeCloseTo((1.0167 / 0.9833) ** 2, 3);
  });
});
