import type { z } from "@hono/zod-openapi";
import type { CellTemperatureModel } from "../../climate/cell-temperature.ts";
import type { ClimateSeries } from "../../climate/climate-series.ts";
import type { Limits } from "../limits.ts";
import { CLIMATE_YEARS } from "../limits.ts";
import type { Flaw } from "../problem.ts";
import type { ClimateSchema } from "../schema/climate.ts";
import { CellTemperatureModelSchema } from "../schema/climate.ts";
import type { RawColumn } from "../schema/column.ts";
import { toColumn } from "../schema/column.ts";

type RawClimate = z.output<typeof ClimateSchema>;

/** What is wrong between the members of a climate. */
export function checkClimate(climate: RawClimate, limits: Limits): Flaw[] {
  return [
    ...checkStart(climate),
    ...checkComponents(climate),
    ...checkLengths(climate, limits),
    ...checkPresence(climate),
    ...checkMount(climate),
    ...checkKilowatts(climate),
  ];
}

/** February 30 has the right form and is no day. */
function checkStart({ start }: RawClimate): Flaw[] {
  const [year, month, day] = start.slice(0, 10).split("-").map(Number);
  if (new Date(Date.UTC(year, month - 1, day)).getUTCDate() === day) return [];
  return [
    {
      pointer: "/climate/start",
      code: "no-such-day",
      detail: `${start.slice(0, 10)} is no day of the calendar.`,
      expected: "a day that exists",
    },
  ];
}

/** The columns of the light that were given, by where they stand. */
function lightColumns({ irradiance }: RawClimate): [string, RawColumn][] {
  if (irradiance.kind === "plane-of-array") return [["/climate/irradiance/values", irradiance.values]];
  return (["global", "directNormal", "diffuse"] as const).flatMap((name): [string, RawColumn][] => {
    const values = irradiance[name];
    return values === undefined ? [] : [[`/climate/irradiance/${name}`, values]];
  });
}

/** All columns that were given; the first is the light's that the others are measured by. */
function columnsOf(climate: RawClimate): [string, RawColumn][] {
  const { temperature } = climate;
  const columns = lightColumns(climate);
  columns.push(["/climate/temperature/values", temperature.values]);
  if (temperature.kind === "ambient" && temperature.windSpeed !== undefined) {
    columns.push(["/climate/temperature/windSpeed", temperature.windSpeed]);
  }
  return columns;
}

/** Global alone or two of the three components: direct or diffuse alone say too little. */
function checkComponents({ irradiance }: RawClimate): Flaw[] {
  if (irradiance.kind !== "horizontal" || irradiance.global !== undefined) return [];
  if (irradiance.directNormal !== undefined && irradiance.diffuse !== undefined) return [];
  return [
    {
      pointer: "/climate/irradiance",
      code: "components-missing",
      detail: "Direct or diffuse irradiance alone does not say how much light there is: give global, or both of them.",
      expected: "global, or directNormal and diffuse",
    },
  ];
}

function checkLengths(climate: RawClimate, limits: Limits): Flaw[] {
  const { step } = climate;
  const [[first, { length: samples }], ...others] = columnsOf(climate);
  if (samples > limits.samples) {
    const detail = `The climate has ${samples} samples.`;
    return [{ pointer: first, code: "too-many", detail, expected: `at most ${limits.samples} samples` }];
  }
  if (samples * step > CLIMATE_YEARS * 365.25 * 86_400) {
    return [
      {
        pointer: "/climate/step",
        code: "too-long",
        detail: `${samples} samples of ${step} s last more than ${CLIMATE_YEARS} years.`,
        expected: `a climate of at most ${CLIMATE_YEARS} years`,
      },
    ];
  }
  const name = first.split("/").at(-1) === "values" ? "irradiance" : first.split("/").at(-1);
  return others
    .filter(([, values]) => values.length !== samples)
    .map(([pointer, values]) => ({
      pointer,
      code: "unequal-columns",
      detail: `This column has ${values.length} value${values.length === 1 ? "" : "s"}, ${name} has ${samples}; give every column one value a sample.`,
      expected: `${samples} values`,
    }));
}

function checkPresence(climate: RawClimate): Flaw[] {
  return columnsOf(climate)
    .filter(([, values]) => values.every((value) => value === null))
    .map(([pointer]) => ({
      pointer,
      code: "all-missing",
      detail: "Every sample of this column is missing.",
      expected: "at least one number",
    }));
}

const MOUNTS = [
  "glass open-rack",
  "glass close-roof",
  "polymer open-rack",
  "polymer insulated-back",
  "thin-film-steel open-rack",
];

function checkMount({ temperature }: RawClimate): Flaw[] {
  if (temperature.kind !== "ambient" || temperature.model?.kind !== "king") return [];
  const { backing, place } = temperature.model;
  if (MOUNTS.includes(`${backing} ${place}`)) return [];
  const places = MOUNTS.filter((mount) => mount.startsWith(backing)).map((mount) => mount.slice(backing.length + 1));
  return [
    {
      pointer: "/climate/temperature/model/place",
      code: "mount-not-measured",
      detail: `King et al. 2004 did not measure a ${backing} module in ${place}.`,
      expected: `one of: ${places.join(", ")}`,
    },
  ];
}

/** A week of light that never passes 2 W/m2 is a series in kW/m2 (or kWh/m2 an hour), not a dim one. */
function checkKilowatts(climate: RawClimate): Flaw[] {
  const { step } = climate;
  const columns = lightColumns(climate);
  const { length } = columns[0]?.[1] ?? [];
  if (length * step < 7 * 86_400) return [];
  let highest = 0;
  for (const [, values] of columns) for (const value of values) if (value !== null && value > highest) highest = value;
  if (!(highest > 0.2 && highest <= 2)) return [];
  return [
    {
      pointer: columns[0][0],
      code: "unit-mistaken",
      detail: `The strongest light of ${Math.round((length * step) / 86_400)} days is ${highest} W/m2: it looks like kW/m2, or kWh/m2 an hour. Multiply by 1000.`,
      expected: "W/m2",
    },
  ];
}

/** Minutes ahead of UTC of an instant's clock. */
function offsetMinutes(start: string): number {
  const offset = /([+-])(\d\d):(\d\d)$/.exec(start);
  if (offset === null) return 0;
  return (offset[1] === "-" ? -1 : 1) * (Number(offset[2]) * 60 + Number(offset[3]));
}

/** A climate of the wire as the studies take it; columns of shape [n], NaN where a sample is missing. */
export function decodeClimate(climate: RawClimate): ClimateSeries {
  const { start, step, timing, gaps } = climate;
  return {
    start: Date.parse(start),
    utcOffset: offsetMinutes(start) * 60_000,
    step,
    timing,
    gaps,
    irradiance: decodeIrradiance(climate.irradiance),
    temperature: decodeTemperature(climate.temperature),
  };
}

function decodeIrradiance(irradiance: RawClimate["irradiance"]): ClimateSeries["irradiance"] {
  if (irradiance.kind === "plane-of-array") return { kind: "plane-of-array", values: toColumn(irradiance.values) };
  const given = (values: RawColumn | undefined) => (values === undefined ? undefined : toColumn(values));
  return {
    kind: "horizontal",
    global: given(irradiance.global),
    directNormal: given(irradiance.directNormal),
    diffuse: given(irradiance.diffuse),
    site: irradiance.site,
    skyModel: irradiance.skyModel,
  };
}

function decodeTemperature(temperature: RawClimate["temperature"]): ClimateSeries["temperature"] {
  const values = toColumn(temperature.values);
  if (temperature.kind === "cell") return { kind: "cell", values };
  const windSpeed = temperature.windSpeed === undefined ? null : toColumn(temperature.windSpeed);
  const { thermalLag } = temperature;
  const model = temperature.model ?? CellTemperatureModelSchema.parse({ kind: "faiman" });
  return { kind: "ambient", values, windSpeed, model: model as CellTemperatureModel, thermalLag };
}
