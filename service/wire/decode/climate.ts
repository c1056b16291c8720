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

function checkLengths(climate: RawClimate, limits: Limits): Flaw[] {
  const { irradiance, temperature, step } = climate;
  const samples = irradiance.values.length;
  if (samples > limits.samples) {
    return [
      {
        pointer: "/climate/irradiance/values",
        code: "too-many",
        detail: `The climate has ${samples} samples.`,
        expected: `at most ${limits.samples} samples`,
      },
    ];
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
  const columns: [string, RawColumn | undefined][] = [
    ["/climate/temperature/values", temperature.values],
    ["/climate/temperature/windSpeed", temperature.kind === "ambient" ? temperature.windSpeed : undefined],
  ];
  return columns.flatMap(([pointer, values]) =>
    values === undefined || values.length === samples
      ? []
      : [
          {
            pointer,
            code: "unequal-columns",
            detail: `This column has ${values.length} values, irradiance has ${samples}; give every column one value a sample.`,
            expected: `${samples} values`,
          },
        ],
  );
}

function checkPresence({ irradiance, temperature }: RawClimate): Flaw[] {
  const columns: [string, RawColumn][] = [
    ["/climate/irradiance/values", irradiance.values],
    ["/climate/temperature/values", temperature.values],
  ];
  return columns.flatMap(([pointer, values]) =>
    values.some((value) => value !== null)
      ? []
      : [
          {
            pointer,
            code: "all-missing",
            detail: "Every sample of this column is missing.",
            expected: "at least one number",
          },
        ],
  );
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
function checkKilowatts({ irradiance, step }: RawClimate): Flaw[] {
  const { values } = irradiance;
  if (values.length * step < 7 * 86_400) return [];
  const highest = values.reduce<number>((most, value) => (value !== null && value > most ? value : most), 0);
  if (!(highest > 0.2 && highest <= 2)) return [];
  return [
    {
      pointer: "/climate/irradiance/values",
      code: "unit-mistaken",
      detail: `The strongest light of ${Math.round((values.length * step) / 86_400)} days is ${highest} W/m2: it looks like kW/m2, or kWh/m2 an hour. Multiply by 1000.`,
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
    irradiance: { kind: climate.irradiance.kind, values: toColumn(climate.irradiance.values) },
    temperature: decodeTemperature(climate.temperature),
  };
}

function decodeTemperature(temperature: RawClimate["temperature"]): ClimateSeries["temperature"] {
  const values = toColumn(temperature.values);
  if (temperature.kind === "cell") return { kind: "cell", values };
  const windSpeed = temperature.windSpeed === undefined ? null : toColumn(temperature.windSpeed);
  const model = temperature.model ?? CellTemperatureModelSchema.parse({ kind: "faiman" });
  return { kind: "ambient", values, windSpeed, model: model as CellTemperatureModel };
}
