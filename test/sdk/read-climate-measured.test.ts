import { existsSync, readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { describe, expect, it } from "vitest";
import { readClimate } from "../../sdk/src/index.ts";

const FOLDER = fileURLToPath(new URL("../../../shared/measured", import.meta.url));
const HEADERS = {
  "global horizontal irradiance [W/m2]": 9,
  "direct normal irradiance [W/m2]": 13,
  "diffuse horizontal irradiance [W/m2]": 15,
  "ambient temperature [degC]": 39,
  "wind speed [m/s]": 43,
};

/** The blank-separated file as CSV under our headers; columns counted from 1 as the folder's README does. */
function toCsv(name: string): string {
  const lines = readFileSync(`${FOLDER}/${name}.dat`, "utf8").trimEnd().split("\n").slice(2);
  const rows = lines.map((line) => {
    const fields = line.trim().split(/\s+/);
    const [year, , month, day, hour, minute] = fields.map((text) => text.padStart(2, "0"));
    return [`${year}-${month}-${day} ${hour}:${minute}`, ...Object.values(HEADERS).map((at) => fields[at - 1])].join();
  });
  return [["time", ...Object.keys(HEADERS)].join(), ...rows].join("\n");
}

/**
 * SURFRAD network, public domain (Augustine et al., Bull. Amer. Meteor. Soc. 81 (2000) 2341). Values read off the files'
 * own lines: global, direct, diffuse, air, wind.
 */
const DAYS = [
  { name: "day-a", start: "2016-12-31T23:59:00+00:00", row: 999, values: [454.4, 904.3, 71.5, 3, 5] },
  { name: "day-b", start: "2017-01-04T23:59:00+00:00", row: 1199, values: [316.8, 1.7, 326.1, -14.8, 2.9] },
];

describe.runIf(existsSync(`${FOLDER}/day-a.dat`) && existsSync(`${FOLDER}/day-b.dat`)).each(DAYS)(
  "the measured $name (read in place)",
  ({ name, start, row, values }) => {
    it("is read from CSV with its end stamps in UTC", async () => {
      const climate = await readClimate(toCsv(name), {
        utcOffset: "Z",
        stamps: "end",
        missing: ["-9999.9"],
        site: { latitude: 40 },
      });
      expect([climate.start, climate.step]).toEqual([start, 60]);
      const { irradiance, temperature } = climate;
      if (irradiance.kind !== "horizontal" || temperature.kind !== "ambient")
        throw new Error("other columns were read");
      const columns = [
        irradiance.global,
        irradiance.directNormal,
        irradiance.diffuse,
        temperature.values,
        temperature.windSpeed,
      ];
      expect(columns.map((column) => column?.length)).toEqual([1440, 1440, 1440, 1440, 1440]);
      expect(columns.map((column) => column?.[row])).toEqual(values);
    });
  },
);
