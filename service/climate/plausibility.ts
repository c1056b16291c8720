import type { ClimateSeries } from "./climate-series.ts";
import { clockNotices } from "./clock-check.ts";
import { columnNotices } from "./column-check.ts";
import { dailyTotalNotices } from "./daily-total-check.ts";
import { noonNotices } from "./noon-check.ts";
import type { Notice } from "./notice.ts";
import type { SunTrack } from "./sun-track.ts";
import { unitNotices } from "./unit-check.ts";
import { weatherRecord } from "./weather-record.ts";

/**
 * The mistakes a climate series shows, each with a figure and the likely reason; empty for a sound one. Nothing is changed.
 *
 * One cause is named once: a wrong unit or a swapped column ends the search, and closure and daily totals are not held
 * against a series whose clock is wrong. `sun` is the track of `prepareClimate`, computed anew where null. Expects columns
 * that `checkedColumns` has passed; NaN samples are left out. Linear in the number of samples. Sources: at each check.
 */
export function noticedMistakes(series: ClimateSeries, sun: SunTrack | null = null): Notice[] {
  const record = weatherRecord(series, sun);
  const units = unitNotices(series, record);
  if (units.some(({ code }) => code.startsWith("irradiance"))) return units;
  if (record === null) return [...units, ...noonNotices(series), ...dailyTotalNotices(series, null)];
  const columns = columnNotices(record);
  if (columns.some(({ code }) => code === "columns-swapped" || code === "direct-on-horizontal"))
    return [...units, ...columns];
  const clock = clockNotices(record);
  if (clock.some(({ code }) => code === "time-shifted")) return [...units, ...clock];
  return [...units, ...clock, ...columns, ...dailyTotalNotices(series, record)];
}
