import { describe, expect, it } from "vitest";
import { relativeAirMass } from "../../service/climate/air-mass.ts";
import { cleanSkyDirect } from "../../service/climate/clean-sky-limit.ts";
import { airBending, liftByRefraction, refraction, standardPressure } from "../../service/climate/refraction.ts";
import { RADIANS } from "../../service/climate/sun-position.ts";
import sun from "../fixtures/sun-positions.json" with { type: "json" };

const slope = (degrees: number) => Math.tan(degrees * RADIANS);

describe("refraction", () => {
  it("lifts the sun of Reda & Andreas 2004's worked example by the printed 0.016332 deg, within 1e-6", () => {
    const { output, input } = sun.workedExample;
    const elevation = 90 - output.zenith_geometric_topocentric;
    const lift = refraction(elevation, slope(elevation), airBending(input.pressure_mbar, input.temp_C));
    expect(Math.abs(90 - elevation - lift - output.zenith_refracted)).toBeLessThan(1e-6);
  });

  it("is eq. 42 of Reda & Andreas 2004 as printed, within 1e-6 deg from -0.8 to 89.9 deg of elevation", () => {
    for (let e = -0.8; e < 89.95; e += 0.1) {
      const printed = ((950 / 1010) * (283 / (273 + 20)) * 1.02) / (60 * Math.tan((e + 10.3 / (e + 5.11)) * RADIANS));
      expect(Math.abs(refraction(e, slope(e), airBending(950, 20)) - printed)).toBeLessThan(1e-6);
    }
  });

  it("does nothing for a sun wholly below the horizon and almost nothing overhead", () => {
    expect(refraction(-0.9, slope(-0.9), airBending(1013.25))).toBe(0);
    const overhead = { east: 0, north: 0, up: 1, distance: 1 };
    expect(liftByRefraction(overhead, airBending(1013.25))).toBeCloseTo(0, 8);
    expect(overhead.up).toBe(1);
  });

  it("turns a direction upwards by exactly the lift, keeping azimuth and length", () => {
    for (const elevation of [-0.5, 0, 1, 10, 45, 80]) {
      const level = Math.cos(elevation * RADIANS);
      const direction = { east: -0.6 * level, north: 0.8 * level, up: Math.sin(elevation * RADIANS), distance: 1 };
      const zenith = liftByRefraction(direction, airBending(1010)) / RADIANS;
      expect(90 - zenith - elevation).toBeCloseTo(refraction(elevation, slope(elevation), airBending(1010)), 9);
      expect(Math.acos(direction.up) / RADIANS).toBeCloseTo(zenith, 5);
      expect(Math.hypot(direction.east, direction.north, direction.up)).toBeCloseTo(1, 8);
      expect(direction.east / direction.north).toBeCloseTo(-0.75, 12);
    }
  });
});

describe("the air the sun shines through", () => {
  it("has the standard atmosphere's pressure: 1013.25 hPa, 898.75 at 1000 m, 540.20 at 5000 m (tables of 1976, from memory)", () => {
    expect(standardPressure(0)).toBeCloseTo(1013.25, 6);
    expect(Math.abs(standardPressure(1000) - 898.75)).toBeLessThan(0.1);
    expect(Math.abs(standardPressure(5000) - 540.2)).toBeLessThan(0.1);
  });

  it("has the air mass of Kasten & Young 1989 (an independent formula, from memory) within 0.2 % to z = 80 deg, 1.5 % to 87", () => {
    for (let z = 0; z <= 87; z += 0.5) {
      const c = Math.cos(z * RADIANS);
      const lift = refraction(90 - z, slope(90 - z), airBending(1013.25));
      const apparent = z - lift;
      const other = 1 / (Math.cos(apparent * RADIANS) + 0.50572 * (96.07995 - apparent) ** -1.6364);
      expect(Math.abs(relativeAirMass(c) / other - 1)).toBeLessThan(z <= 80 ? 0.002 : 0.015);
    }
    expect(relativeAirMass(1)).toBeCloseTo(1, 5);
    expect(relativeAirMass(-0.3)).toBe(relativeAirMass(0));
  });

  it("lets a clean and dry beam through: 90 % at air mass 1, weakening all the way (Kasten 1996 gives delta(1) = 0.12)", () => {
    expect(cleanSkyDirect(1000, 1)).toBeGreaterThan(890);
    expect(cleanSkyDirect(1000, 1)).toBeLessThan(910);
    let last = cleanSkyDirect(1000, 0.5);
    for (let m = 0.6; m < 40; m += 0.1) {
      const next = cleanSkyDirect(1000, m);
      expect(next).toBeLessThan(last);
      last = next;
    }
  });
});
