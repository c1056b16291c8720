import { diffuseFraction } from "../../../service/climate/diffuse-fraction.ts";
import { extraterrestrialNormal } from "../../../service/climate/extraterrestrial-irradiance.ts";
import { hayDaviesSky } from "../../../service/climate/hay-davies-sky.ts";
import { isotropicSky } from "../../../service/climate/isotropic-sky.ts";
import { BRIGHTNESS_COEFFICIENTS, perezSky, skyBrightness, skyClearness } from "../../../service/climate/perez-sky.ts";
import { cosIncidence, plane } from "../../../service/climate/plane.ts";
import { planeOfArrayIrradiance } from "../../../service/climate/plane-of-array.ts";
import type { Sky } from "../../../service/climate/sky.ts";
import { observer, positionOf, RADIANS, turnToLatitude } from "../../../service/climate/sun-position.ts";
import { sunTrack } from "../../../service/climate/sun-track.ts";
import printedTable from "../../fixtures/plane-of-array.json" with { type: "json" };
import textbook from "../../fixtures/sun-and-sky-examples.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute } from "../check.ts";

/** Direction to a sun of given declination and hour angle (west positive) from a latitude, degrees. */
function direction(latitude: number, declination: number, hourAngle: number) {
  const [d, h] = [declination * RADIANS, hourAngle * RADIANS];
  const seen = { east: -Math.cos(d) * Math.sin(h), north: Math.sin(d), up: Math.cos(d) * Math.cos(h), distance: 1 };
  turnToLatitude(seen, observer(latitude, 0));
  return seen;
}

/** Zenith, and azimuth counted from south, west positive, as the textbook has them; degrees. */
function seenFromSouth(declination: number, hourAngle: number): [zenith: number, azimuth: number] {
  const position = { zenith: 0, azimuth: 0 };
  positionOf(direction(43, declination, hourAngle), position);
  return [position.zenith, position.azimuth - 180];
}

/** Solar time at 16:30 UTC on 3 February at 89.4 W, minutes. */
function solarMinutes(year: number): number {
  const { east, up } = sunTrack(Date.UTC(year, 1, 3, 16, 30), 1, 1, { latitude: 0, longitude: -89.4 });
  return 720 + (Math.atan2(-east[0], up[0]) / RADIANS) * 4;
}

/** Energy outside the atmosphere on the horizontal at 43 N on 15 April between two hour angles, MJ/m2. */
function outside(from: number, to: number): number {
  const { distance } = sunTrack(Date.UTC(2025, 3, 15, 17), 1, 1, { latitude: 43, longitude: 0 });
  const normal = extraterrestrialNormal(distance[0], 1367);
  const parts = 20_000;
  let sum = 0;
  for (let k = 0; k < parts; k++) sum += Math.max(0, direction(43, 9.4, from + ((k + 0.5) * (to - from)) / parts).up);
  return (normal * (sum / parts) * (to - from) * 240) / 1e6;
}

/** Extraterrestrial irradiance on 20 February, W/m2 (the textbook's eq. 1.4.1a). */
const NORMAL = 1367 * (1 + 0.033 * Math.cos((360 * 51 * RADIANS) / 365));
const ON = plane(60, 180);

/** The hour of example 2.15.1 (40 N, 20 February, 9 to 10 h, 1.04 MJ/m2) as energies, MJ/m2. */
function exampleSky(): Sky {
  const [phi, dec, w1, w2] = [40 * RADIANS, -11.6 * RADIANS, -45 * RADIANS, -30 * RADIANS];
  const beyond = // eq. 1.10.4
    ((12 * 3600) / Math.PI) *
    NORMAL *
    (Math.cos(phi) * Math.cos(dec) * (Math.sin(w2) - Math.sin(w1)) + (w2 - w1) * Math.sin(phi) * Math.sin(dec));
  const sun = direction(40, -11.6, -37.5);
  const diffuse = 1.04 * diffuseFraction(1.04e6 / beyond);
  const beam = 1.04 - diffuse;
  return {
    direct: beam / sun.up,
    diffuse,
    extraterrestrial: beyond / 1e6 / sun.up,
    zenith: Math.acos(sun.up),
    cosZenith: sun.up,
    airMass: 1 / sun.up,
    cosIncidence: cosIncidence(sun, ON),
  };
}

/** Hay & Davies's sky with Reindl's horizon term (the textbook's eq. 2.16.5), MJ/m2. */
function withHorizonTerm(sky: Sky): number {
  const even = sky.diffuse * (1 - sky.direct / sky.extraterrestrial) * ON.skyView;
  const beam = sky.direct * sky.cosZenith;
  return (
    planeOfArrayIrradiance(sky, ON, 0.6, hayDaviesSky) + even * Math.sqrt(beam / 1.04) * Math.sin(30 * RADIANS) ** 3
  );
}

/** Ours for each row of the textbook's examples, in their order. */
function ourExamples(): number[] {
  const sky = exampleSky();
  const hour = { ...sky, extraterrestrial: (NORMAL * 3600) / 1e6 };
  return [
    solarMinutes(2025),
    cosIncidence(direction(43, -14, -22.5), plane(45, 180 + 15)),
    ...seenFromSouth(-14, -37.5),
    ...seenFromSouth(23.1, 97.5),
    outside(-180, 180),
    outside(-30, -15),
    sky.diffuse,
    sky.direct * sky.cosZenith,
    sky.cosIncidence / sky.cosZenith,
    planeOfArrayIrradiance(sky, ON, 0.6, isotropicSky),
    withHorizonTerm(sky),
    skyClearness(hour),
    skyBrightness(hour),
    planeOfArrayIrradiance(hour, ON, 0.6, perezSky),
  ];
}

const topic = "Plane of array";

/** One line an example. */
function exampleChecks(): Check[] {
  return [...new Set(textbook.rows.map(({ example }) => example))].map((example) => {
    const origins = textbook.rows.filter((row) => row.example === example).map(({ origin }) => origin);
    return {
      topic,
      title: `Textbook example ${example}`,
      source: `${textbook.source}: ${[...new Set(origins)].join("; ")}`,
      figures: () => {
        const ours = ourExamples();
        return textbook.rows.flatMap(({ name, expected, tolerance, ...row }, k) =>
          row.example === example ? [absolute(name, expected, ours[k], tolerance)] : [],
        );
      },
    };
  });
}

/** Sun and sky by a textbook's examples, and the printed coefficients of Perez's sky. */
export const PLANE_OF_ARRAY: Check[] = [
  ...exampleChecks(),
  {
    topic,
    title: "Perez coefficients as printed",
    source: "Perez et al., Solar Energy 44(5) (1990) 271-289, Table 6",
    figures: () => {
      const rows = printedTable.rows.map(({ F11, F12, F13, F21, F22, F23 }) => ({ F11, F12, F13, F21, F22, F23 }));
      const flat = rows.flatMap((row, k) =>
        Object.entries(row).map(([name, value]) => ({ name: `${name} of class ${k + 1}`, value })),
      );
      const sum = BRIGHTNESS_COEFFICIENTS.reduce((total, value) => total + value, 0);
      return [
        absolute("sum of the 48", printedTable.checksum.sumOf48, sum, 1e-9),
        ...flat.map(({ name, value }, k) => absolute(name, value, BRIGHTNESS_COEFFICIENTS[k], 1e-9)),
      ];
    },
  },
];
