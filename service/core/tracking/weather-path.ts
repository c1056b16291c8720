import type { Weather } from "./steady.ts";

/** A series read as weather that runs straight between its samples. */
export interface TimedWeather extends Weather {
  /** s. */
  step: number;
  /** `mean`: a sample's value stands at its middle; `instant`: at its start. */
  timing: "mean" | "instant";
}

/** Between which samples an instant lies: `left` + `share` of the way to `right`. */
export interface Place {
  left: number;
  right: number;
  share: number;
}

/** First and last sample of a stretch of the series without missing ones. */
export interface Run {
  first: number;
  last: number;
}

/** The runs of a series: all of it when nothing is missing. */
export function runsOf(weather: TimedWeather): Run[] {
  const { skipped, irradiance } = weather;
  const runs: Run[] = [];
  let first = -1;
  for (let i = 0; i <= irradiance.length; i++) {
    const missing = i === irradiance.length || (skipped !== null && skipped[i] === 1);
    if (!missing && first < 0) first = i;
    if (!missing || first < 0) continue;
    runs.push({ first, last: i - 1 });
    first = -1;
  }
  return runs;
}

/**
 * Writes where `time` (s from the series' start) lies in a run. The weather runs straight from one sample's value to
 * the next one's, and is constant before the first and after the last of the run: total insolation is kept.
 */
export function locate(weather: TimedWeather, run: Run, time: number, place: Place): void {
  const at = time / weather.step - nodeOf(weather);
  place.left = Math.min(run.last, Math.max(run.first, Math.floor(at)));
  place.right = Math.min(run.last, place.left + 1);
  place.share = Math.min(1, Math.max(0, at - place.left));
}

/** Where in its step a sample's value stands: its middle for means, its start for instants. */
export function nodeOf(weather: TimedWeather): number {
  return weather.timing === "mean" ? 0.5 : 0;
}

/** A column's value at a place. */
export function valueAt(column: Float64Array, { left, right, share }: Place): number {
  return column[left] + share * (column[right] - column[left]);
}
