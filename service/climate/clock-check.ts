import { type ClosureShift, closureShift } from "./closure.ts";
import { lightCentre } from "./light-centre.ts";
import type { Notice } from "./notice.ts";
import type { WeatherRecord } from "./weather-record.ts";

/** Shifts are named beyond this share of a step: a whole step (ends given as starts) always is. */
const SHARE_OF_STEP = 0.4;
/** What clouds and twilight may shift the light's centre over many days, and on top of it over one day, minutes. */
const CLOUDS = 10;
const CLOUDS_OF_A_DAY = 10;
/** What leaning radiometers may shift the closure, minutes. */
const LEANING = 6;

/** Whether the closure fit speaks: a good fit, much better than without a shift, and a beam of the right size. */
function speaks(fit: ClosureShift | null, minutes: number): fit is ClosureShift {
  return (
    fit !== null &&
    fit.scatter < 20 &&
    fit.scatter < 0.7 * fit.scatterUnshifted &&
    Math.abs(fit.amplitude - 1) < 0.15 &&
    Math.abs(fit.minutes) > Math.max(LEANING, SHARE_OF_STEP * minutes)
  );
}

/** Minutes by which the light is late, 0 where nothing speaks for a shift. */
function shiftOf(record: WeatherRecord, light: { byPresence: number; byStrength: number; days: number }): number {
  const { global, directNormal, diffuse } = record.given;
  const fit = global && directNormal && diffuse ? closureShift(record, [global, directNormal, diffuse]) : null;
  if (speaks(fit, record.minutes)) return fit.minutes;
  const { byPresence, byStrength } = light;
  const clouds = CLOUDS + CLOUDS_OF_A_DAY / Math.sqrt(Math.max(1, light.days));
  const doubt = Math.max(SHARE_OF_STEP * record.minutes, clouds / Math.max(0.3, record.place.cosLatitude));
  const agree = byPresence * byStrength > 0 && Math.min(Math.abs(byPresence), Math.abs(byStrength)) > doubt;
  return agree ? (byPresence + byStrength) / 2 : 0;
}

/** Minutes between two times of day, 0 to 720. */
function awayFrom(a: number, b: number): number {
  const apart = Math.abs(a - b) % 1440;
  return Math.min(apart, 1440 - apart);
}

/** The likely reason for a shift, in words. */
function reasonFor(shift: number, record: WeatherRecord): string {
  const { minutes } = record;
  const near = (target: number, within: number) => awayFrom(shift, target) <= within;
  const mirrored = 8 * record.given.site.longitude; // 4 minutes a degree, both ways
  const hours = Math.round(shift / 60);
  const wholeHours = hours !== 0 && near(60 * hours, 12);
  const offset = `the UTC offset is ${Math.abs(hours)} h off (daylight saving time counts)`;
  if (near(minutes, Math.max(3, 0.3 * minutes)))
    return `the stamps are ends of intervals given as starts${wholeHours ? `, or ${offset}` : ""}`;
  if (minutes >= 20 && near(minutes / 2, 0.2 * minutes))
    return "the stamps are middles of intervals, or instants, given as starts";
  if (wholeHours) return offset;
  if (Math.abs(mirrored) > 40 && near(mirrored, 15)) return "the longitude has the wrong sign (east is positive)";
  return "the UTC offset, the longitude or the start is wrong";
}

/**
 * Compares the day's light with the sun at the site: `time-shifted` with the minutes that align it best and the likely
 * reason, else `light-at-night` where a fiftieth of the deep night is brighter than 10 W/m2.
 *
 * Where global, direct and diffuse are given and the sun shone, shifts beyond 6 minutes and 0.4 steps are named; else
 * beyond 0.4 steps and 10 to 20 minutes / cos latitude, when two measures agree. A shorter mistake (end stamps of
 * one-minute data) moves the sun by 0.2 deg and cannot be told from a leaning radiometer. No light: no notice.
 */
export function clockNotices(record: WeatherRecord): Notice[] {
  const column = record.given.global ?? record.given.diffuse;
  if (!column) return [];
  const light = lightCentre(record, column);
  const days = (column.length * record.minutes) / 1440;
  const shift = shiftOf(record, { ...light, days });
  const { nightSamples, brightNights } = light;
  if (shift !== 0) {
    const size = Math.round(Math.abs(shift));
    const detail = `The light comes about ${size} min ${shift > 0 ? "later" : "earlier"} than the sun at the site: most likely ${reasonFor(shift, record)}.`;
    return [{ code: "time-shifted", detail, values: { shiftMinutes: Math.round(shift), brightNights } }];
  }
  if (brightNights * 50 <= nightSamples) return [];
  const detail = `${brightNights} of ${nightSamples} samples with the sun more than 6 degrees down are brighter than 10 W/m2: most likely a wrong site, a wrong start or a radiometer with an offset.`;
  return [{ code: "light-at-night", detail, values: { brightNights, nightSamples } }];
}
