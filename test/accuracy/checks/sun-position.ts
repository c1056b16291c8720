import { cosIncidence, plane } from "../../../service/climate/plane.ts";
import { RADIANS, sunPosition } from "../../../service/climate/sun-position.ts";
import sun from "../../fixtures/sun-positions.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute, printed } from "../check.ts";

const { input, output, source: workedSource } = sun.workedExample;

/** Incidence on the worked example's plane from the printed direction of the sun, degrees. */
function printedIncidence(): number {
  const [z, a] = [output.zenith_refracted * RADIANS, output.azimuth * RADIANS];
  const direction = { east: Math.sin(z) * Math.sin(a), north: Math.sin(z) * Math.cos(a), up: Math.cos(z), distance: 1 };
  return Math.acos(cosIncidence(direction, plane(input.slope, 180 + input.azm_rotation))) / RADIANS;
}

const topic = "Sun";

/** Where the sun stands, degrees. */
export const SUN_POSITION: Check[] = [
  {
    topic,
    title: "Zenith and azimuth against the almanac, deg",
    source:
      "almanac, airless, sea level, as published with the PSA algorithm's update: Blanco et al., Solar Energy 212 (2020) 339-341",
    figures: () =>
      sun.rows.flatMap((row) => {
        const utc = Date.UTC(row.year, row.month - 1, row.day, row.hour_ut, row.minute, row.second);
        const { zenith, azimuth } = sunPosition(utc, row.lat, row.lon);
        const place = `${row.year}-${row.month}-${row.day}, ${row.lat} ${row.lon}`;
        return [
          absolute(`zenith, ${place}`, row.zenith_deg, zenith, 0.01),
          absolute(`azimuth, ${place}`, row.azimuth_deg, azimuth, 0.01),
        ];
      }),
  },
  {
    topic,
    title: "Worked example of 2003, deg",
    source: workedSource,
    figures: () => {
      const { zenith, azimuth } = sunPosition(Date.UTC(2003, 9, 17, 19, 30, 30), input.lat, input.lon);
      return [
        absolute("zenith without refraction", output.zenith_geometric_topocentric, zenith, 0.01),
        absolute("azimuth", output.azimuth, azimuth, 0.01),
      ];
    },
  },
  {
    topic,
    title: "Incidence at the worked example's printed sun, deg, to the printed digits",
    source: workedSource,
    figures: () => [printed("slope 30, 10 deg east of south", output.incidence, printedIncidence(), 3)],
  },
];
