import type { ClimateSeries } from "./climate-series.ts";
import { extraterrestrialNormal, SOLAR_CONSTANT } from "./extraterrestrial-irradiance.ts";
import type { Notice } from "./notice.ts";
import type { WeatherRecord } from "./weather-record.ts";

/** Highest air temperature on record, degC: 56.7, Furnace Creek 1913 (World Meteorological Organization; from memory). */
const HOTTEST_AIR = 57;
/** No year of any place is warmer on average, degC: 34.6, Dallol 1960-66 (from memory), and a margin. */
const HOTTEST_YEAR = 36;
/** No cell in one sun gets hotter, degC (common practice, no source). */
const HOTTEST_CELL = 130;
/** A whole year, less a month, days. */
const YEAR = 335;

interface Extent {
  lowest: number;
  highest: number;
  mean: number;
}

/** Lowest, highest and mean of a column without its NaN; where nothing is left the mean is NaN and the rest infinite. */
function extentOf(column: Float64Array): Extent {
  let lowest = Number.POSITIVE_INFINITY;
  let highest = Number.NEGATIVE_INFINITY;
  let sum = 0;
  let count = 0;
  for (let i = 0; i < column.length; i++) {
    const value = column[i];
    if (Number.isNaN(value)) continue;
    if (value < lowest) lowest = value;
    if (value > highest) highest = value;
    sum += value;
    count++;
  }
  return { lowest, highest, mean: sum / count };
}

/** Highest temperature among the samples without light; -Infinity where there is none. */
function highestInDark(temperature: Float64Array, light: Float64Array): number {
  let highest = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < temperature.length; i++) if (light[i] <= 1 && temperature[i] > highest) highest = temperature[i];
  return highest;
}

function kelvin(t: Extent): Notice {
  return {
    code: "temperature-in-kelvin",
    detail: `The temperatures lie between ${t.lowest.toFixed(1)} and ${t.highest.toFixed(1)}: most likely they are in kelvin; subtract 273.15.`,
    values: { lowest: t.lowest, highest: t.highest },
  };
}

function fahrenheit(t: Extent, why: string): Notice {
  const highestCelsius = (t.highest - 32) / 1.8;
  return {
    code: "temperature-in-fahrenheit",
    detail: `${why}: most likely the temperatures are in degrees Fahrenheit (${t.highest.toFixed(1)} would be ${highestCelsius.toFixed(1)} degC).`,
    values: { highest: t.highest, highestCelsius },
  };
}

function temperatureNotices(series: ClimateSeries, light: Float64Array): Notice[] {
  const { kind, values } = series.temperature;
  const t = extentOf(values);
  if (t.lowest > 150 && t.highest < 400) return [kelvin(t)];
  const highest = kind === "cell" ? highestInDark(values, light) : t.highest;
  if (highest > HOTTEST_AIR)
    return [fahrenheit(t, `${kind === "cell" ? "Cells in the dark" : "The air"} reach ${highest.toFixed(1)}`)];
  if (t.highest > HOTTEST_CELL) return [fahrenheit(t, `Cells reach ${t.highest.toFixed(1)}`)];
  if (kind === "ambient" && t.mean > HOTTEST_YEAR && values.length * series.step > YEAR * 86_400)
    return [fahrenheit(t, `The year's mean is ${t.mean.toFixed(1)}`)];
  return [];
}

/**
 * kWh or MJ per step taken for W/m2: what the highest reading would be in W/m2, where that is a likely peak under
 * `outside`, the brightest the series' sun gets (W/m2); not in a polar night.
 */
function energyNotices(light: Extent, step: number, outside: number): Notice[] {
  if (!(light.highest > 0 && light.highest <= 5 && outside > 100)) return [];
  const daylight = (power: number) => power > 0.1 * outside && power < 1.3 * outside;
  const fromKilowattHours = (light.highest * 3.6e6) / step;
  const fromMegajoules = (light.highest * 1e6) / step;
  const unit = daylight(fromKilowattHours) ? "kWh/m2" : daylight(fromMegajoules) ? "MJ/m2" : "";
  if (unit === "") return [];
  const inWatts = unit === "kWh/m2" ? fromKilowattHours : fromMegajoules;
  return [
    {
      code: "irradiance-as-energy",
      detail: `The brightest sample has ${light.highest} W/m2: most likely the column is in ${unit} per step, which would make it ${Math.round(inWatts)} W/m2.`,
      values: { highest: light.highest, highestInWatts: inWatts },
    },
  ];
}

/** The highest extraterrestrial irradiance on the horizontal among the samples, W/m2; without a site the solar constant. */
function brightestOutside(record: WeatherRecord | null): number {
  if (record === null) return SOLAR_CONSTANT;
  const { up, distance } = record.sun;
  let brightest = 0;
  for (let i = 0; i < up.length; i++) {
    const outside = up[i] * extraterrestrialNormal(distance[i]);
    if (outside > brightest) brightest = outside;
  }
  return brightest;
}

/** The column that tells most about the light of a series, W/m2. */
export function mainLight(series: ClimateSeries): Float64Array {
  const given = series.irradiance;
  if (given.kind === "plane-of-array") return given.values;
  return given.global ?? given.diffuse ?? given.directNormal ?? new Float64Array(0);
}

/**
 * Looks for temperatures in kelvin or Fahrenheit, energies given as W/m2, and irradiance and temperature exchanged. Judged
 * by records of what occurs on earth, so a cold month in Fahrenheit passes unseen. `record` is null without a site. Empty columns
 * give no notice.
 */
export function unitNotices(series: ClimateSeries, record: WeatherRecord | null): Notice[] {
  const column = mainLight(series);
  const light = extentOf(column);
  const temperature = extentOf(series.temperature.values);
  if (temperature.highest > 200 && temperature.lowest < 20 && temperature.lowest >= -10 && light.highest < 75) {
    const detail = `The temperatures reach ${temperature.highest.toFixed(0)} and the irradiance ${light.highest.toFixed(0)}: most likely the two columns are swapped.`;
    const values = { highestTemperature: temperature.highest, highestIrradiance: light.highest };
    return [{ code: "irradiance-and-temperature-swapped", detail, values }];
  }
  return [...energyNotices(light, series.step, brightestOutside(record)), ...temperatureNotices(series, column)];
}
