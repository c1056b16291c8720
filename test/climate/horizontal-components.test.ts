import { describe, expect, it } from "vitest";
import { relativeAirMass } from "../../service/climate/air-mass.ts";
import { cleanSkyDirect } from "../../service/climate/clean-sky-limit.ts";
import { diffuseFraction } from "../../service/climate/diffuse-fraction.ts";
import {
  type Completion,
  fromDirectAndDiffuse,
  fromGlobal,
  fromGlobalAndDiffuse,
  fromGlobalAndDirect,
} from "../../service/climate/horizontal-components.ts";
import { plane } from "../../service/climate/plane.ts";
import { planeOfArrayIrradiance, SKY_MODELS } from "../../service/climate/plane-of-array.ts";
import { darkSky, type Sky } from "../../service/climate/sky.ts";
import { RADIANS } from "../../service/climate/sun-position.ts";
import { seededRandom } from "./seeded-random.ts";

/** A sky without light yet, the sun at `zenith` degrees in front of a plane of `tilt` that faces it. */
function skyAt(zenith: number, tilt = 90): Sky {
  const sky = darkSky();
  sky.zenith = zenith * RADIANS;
  sky.cosZenith = Math.cos(sky.zenith);
  sky.airMass = relativeAirMass(sky.cosZenith);
  sky.extraterrestrial = 1361;
  sky.cosIncidence = Math.cos((zenith - tilt) * RADIANS);
  return sky;
}

const completions: [string, Completion][] = [
  ["global alone", fromGlobal],
  ["global and diffuse", fromGlobalAndDiffuse],
  ["global and direct", fromGlobalAndDirect],
];

describe("the diffuse fraction of Erbs, Klein & Duffie 1982", () => {
  it("follows its three branches: 1 - 0.09 k, the quartic, 0.165 (eq. 1; Duffie & Beckman 2013 eq. 2.10.1)", () => {
    expect(diffuseFraction(0)).toBe(1);
    expect(diffuseFraction(0.2)).toBeCloseTo(0.982, 12);
    expect(diffuseFraction(0.5)).toBeCloseTo(0.9511 - 0.0802 + 1.097 - 2.07975 + 0.771, 12);
    expect(diffuseFraction(0.9)).toBe(0.165);
  });

  it("joins its branches within 0.3 % of global, as the printed coefficients do", () => {
    expect(Math.abs(diffuseFraction(0.22) - diffuseFraction(0.2200001))).toBeLessThan(0.003);
    expect(Math.abs(diffuseFraction(0.8) - diffuseFraction(0.8000001))).toBeLessThan(0.003);
  });

  it("is 1 for a reading below zero and NaN for NaN", () => {
    expect(diffuseFraction(-0.1)).toBe(1);
    expect(diffuseFraction(Number.NaN)).toBeNaN();
  });
});

describe("completing the components", () => {
  it.each(completions)("from %s keeps global = direct cos z + diffuse at every zenith", (_name, complete) => {
    const random = seededRandom(21);
    for (let k = 0; k < 5000; k++) {
      const sky = skyAt(100 * random());
      const given = { global: 1200 * random(), direct: 1300 * random(), diffuse: 800 * random() };
      complete(given, 1013.25, sky);
      const global = sky.direct * Math.max(0, sky.cosZenith) + sky.diffuse;
      expect(global).toBeCloseTo(given.global, 9);
      expect(sky.direct).toBeGreaterThanOrEqual(0);
      expect(sky.diffuse).toBeGreaterThanOrEqual(0);
    }
  });

  it("finds the component that was left out, where no bound is met", () => {
    const random = seededRandom(22);
    for (let k = 0; k < 2000; k++) {
      const sky = skyAt(80 * random());
      const direct = 0.6 * random() * cleanSkyDirect(1361, sky.airMass);
      const diffuse = 300 * random();
      const global = direct * sky.cosZenith + diffuse;
      for (const complete of [fromGlobalAndDiffuse, fromGlobalAndDirect, fromDirectAndDiffuse]) {
        complete({ global, direct, diffuse }, 1013.25, sky);
        expect(sky.direct).toBeCloseTo(direct, 8);
        expect(sky.diffuse).toBeCloseTo(diffuse, 8);
      }
    }
  });

  it("makes all light diffuse once the sun is below the horizon", () => {
    for (const complete of [fromGlobal, fromGlobalAndDiffuse, fromGlobalAndDirect, fromDirectAndDiffuse]) {
      const sky = skyAt(92);
      complete({ global: 8, direct: 50, diffuse: 8 }, 1013.25, sky);
      expect(sky.direct).toBe(0);
      expect(sky.diffuse).toBe(8);
    }
  });
});

describe("low sun", () => {
  it("never lifts a beam above what clean dry air lets through, though the readings say so (Kasten 1996)", () => {
    for (let z = 60; z < 90; z += 0.25) {
      const sky = skyAt(z);
      fromGlobalAndDiffuse({ global: 600, direct: 0, diffuse: 0 }, 1013.25, sky);
      expect(sky.direct).toBeLessThanOrEqual(cleanSkyDirect(1361, sky.airMass));
    }
  });

  it.each(completions)(
    "makes no spike from %s: 5 W/m2 with the sun within 5 deg of the horizon stay below what the bounds allow on a vertical plane",
    (_name, complete) => {
      // beam and circumsolar 1/cos 85 deg each, half the sky, the ground 0.2/2, Perez's brightest horizon 0.156 + 0.251 z;
      // without the bounds 5/cos z alone would be 2865 W/m2 at 89.9 deg
      const most = 5 * (2 / Math.cos(85 * RADIANS) + 0.5 + 0.1 + 0.156 + 0.251 * 96 * RADIANS);
      for (const model of Object.values(SKY_MODELS))
        for (let z = 85; z < 96; z += 0.01) {
          const sky = skyAt(z);
          complete({ global: 5, direct: 5 / Math.max(0.0872, sky.cosZenith), diffuse: 1 }, 1013.25, sky);
          expect(planeOfArrayIrradiance(sky, plane(90, 0), 0.2, model)).toBeLessThan(most);
        }
    },
  );

  it.each(completions.slice(0, 2))(
    "passes 85 deg without a jump, from %s (Perez's classes of clearness jump anywhere)",
    (_name, complete) => {
      for (const model of [SKY_MODELS.isotropic, SKY_MODELS["hay-davies"]]) {
        let last = Number.NaN;
        for (let z = 84; z < 89.99; z += 0.001) {
          const sky = skyAt(z);
          const global = 40 * Math.exp(84 - z);
          complete({ global, direct: 0, diffuse: 0.6 * global }, 1013.25, sky);
          const there = planeOfArrayIrradiance(sky, plane(60, 0), 0.2, model);
          if (!Number.isNaN(last)) expect(Math.abs(there - last)).toBeLessThan(0.005 * last);
          last = there;
        }
      }
    },
  );
});
