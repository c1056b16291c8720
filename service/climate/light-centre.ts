import { extraterrestrialNormal } from "./extraterrestrial-irradiance.ts";
import type { WeatherRecord } from "./weather-record.ts";

/** A horizontal reading counts as light above this, W/m2: clear of a radiometer's night offset. */
const LIGHT = 5;
/** Light this strong with the sun this far down is no twilight: W/m2, and the sine of 6 degrees (civil twilight). */
const BRIGHT = 10;
const DEEP = 0.1045;
/** Shorter than this share of its weights a mean direction says nothing (a sun that never sets). */
const VAGUE = 0.1;

const MINUTES_PER_RADIAN = 720 / Math.PI;

/** How far the centre of the light lies behind the centre of the sun's presence. */
export interface LightCentre {
  /** Minutes, positive: the light comes later than the sun; from lit samples against samples with the sun up. */
  byPresence: number;
  /** The same from the square roots of the irradiance and of the extraterrestrial one. */
  byStrength: number;
  /** Samples with the sun more than 6 degrees down, and those among them brighter than 10 W/m2. */
  nightSamples: number;
  brightNights: number;
}

/** The weighted mean of directions on the day's circle: sums of cosine and sine of the hour angle and of the weights. */
interface Circle {
  cos: number;
  sin: number;
  weight: number;
}

function add(to: Circle, cos: number, sin: number, weight: number): void {
  to.cos += weight * cos;
  to.sin += weight * sin;
  to.weight += weight;
}

/** Minutes from `sun` to `light` along the day, within -720 to 720; NaN where either has no clear direction. */
function minutesBetween(light: Circle, sun: Circle): number {
  const clear = (c: Circle) => Math.hypot(c.cos, c.sin) > VAGUE * c.weight;
  if (!clear(light) || !clear(sun)) return Number.NaN;
  const across = light.sin * sun.cos - light.cos * sun.sin;
  return Math.atan2(across, light.cos * sun.cos + light.sin * sun.sin) * MINUTES_PER_RADIAN;
}

/**
 * Where in the day the light of `column` (W/m2 on the horizontal) is centred, against the sun's own path over the same
 * samples; NaN samples are left out of both.
 *
 * Clouds shift the strength, hardly the presence; long steps shift the presence, hardly the strength. On a single day of
 * one-minute data either is good to some 8 minutes (seen on two measured days), and better over many. A mean direction on
 * the circle (Mardia & Jupp, Directional Statistics, 2000, sec. 2.2; from memory); the rest is our own.
 */
export function lightCentre(record: WeatherRecord, column: Float64Array): LightCentre {
  const { sun, place } = record;
  const circles = [0, 1, 2, 3].map(() => ({ cos: 0, sin: 0, weight: 0 }));
  const [present, up, strength, sky] = circles;
  const seen = { nightSamples: 0, brightNights: 0 };
  for (let i = 0; i < column.length; i++) {
    const value = column[i];
    const height = sun.up[i];
    if (height < -DEEP && !Number.isNaN(value)) {
      seen.nightSamples++;
      if (value > BRIGHT) seen.brightNights++;
    }
    if (!(value > LIGHT || (height > 0 && !Number.isNaN(value)))) continue;
    const x = place.cosLatitude * height - place.sinLatitude * sun.north[i];
    const west = -sun.east[i];
    const cosDeclination = Math.sqrt(x * x + west * west);
    const cos = x / cosDeclination;
    const sin = west / cosDeclination;
    if (value > LIGHT) add(present, cos, sin, 1);
    if (value > 0) add(strength, cos, sin, Math.sqrt(value));
    if (height <= 0) continue;
    add(up, cos, sin, 1);
    add(sky, cos, sin, Math.sqrt(height * extraterrestrialNormal(sun.distance[i])));
  }
  return { byPresence: minutesBetween(present, up), byStrength: minutesBetween(strength, sky), ...seen };
}
