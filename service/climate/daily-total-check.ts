import type { ClimateSeries } from "./climate-series.ts";
import { extraterrestrialNormal } from "./extraterrestrial-irradiance.ts";
import type { Notice } from "./notice.ts";
import type { WeatherRecord } from "./weather-record.ts";

const DAY = 86_400_000;
/** No fixed plane on earth receives more in a day, Wh/m2: a sun of 1412 W/m2 over half a turn gives 10.8, a summer's long day some more. */
const MOST = 15_000;
/** A day is named when it lies above the limit by more than this, Wh/m2: polar twilight is no mistake. */
const MARGIN = 100;

interface Worst {
  days: number;
  total: number;
  limit: number;
}

/**
 * Sums `column` (W/m2) day by day of the caller's clock against `limitOf(i)` (Wh/m2 added per sample, or `flat` per day)
 * and keeps the day with the largest excess. Days with a missing sample or cut by the series' ends are left out.
 */
function worstDay(
  column: Float64Array,
  clock: number,
  hours: number,
  limitOf: ((i: number) => number) | number,
): Worst {
  const worst = { days: 0, total: 0, limit: 0 };
  const perDay = Math.round(24 / hours);
  let day = Number.NaN;
  let total = 0;
  let limit = 0;
  let count = 0;
  const close = () => {
    const excess = total - limit;
    if (count !== perDay || !(excess > MARGIN)) return;
    worst.days++;
    if (excess > worst.total - worst.limit) Object.assign(worst, { total, limit });
  };
  for (let i = 0; i < column.length; i++) {
    const today = Math.floor((clock + i * hours * 3_600_000) / DAY);
    if (today !== day) {
      close();
      day = today;
      total = 0;
      limit = typeof limitOf === "number" ? limitOf : 0;
      count = 0;
    }
    total += column[i] * hours;
    if (typeof limitOf !== "number") limit += limitOf(i) * hours;
    count++;
  }
  close();
  return worst;
}

function notice(worst: Worst, limit: string): Notice[] {
  if (worst.days === 0) return [];
  const { days, total } = worst;
  return [
    {
      code: "daily-total-too-high",
      detail: `${days} ${days === 1 ? "day has" : "days have"} more light than ${limit}; the worst has ${(total / 1000).toFixed(2)} of ${(worst.limit / 1000).toFixed(2)} kWh/m2: most likely a wrong unit, site or start.`,
      values: { days, worstTotal: total / 1000, worstLimit: worst.limit / 1000 },
    },
  ];
}

/**
 * Names days whose total exceeds what arrives outside the atmosphere: on the horizontal at the site (sampled at the sun's
 * instants), or 15 kWh/m2 on a plane whose site is not known (common practice, no source). Steps that do not divide a day
 * are not looked at.
 */
export function dailyTotalNotices(series: ClimateSeries, record: WeatherRecord | null): Notice[] {
  const hours = series.step / 3600;
  if (Math.abs(24 / hours - Math.round(24 / hours)) > 1e-9) return [];
  const clock = series.start + series.utcOffset;
  if (series.irradiance.kind === "plane-of-array")
    return notice(worstDay(series.irradiance.values, clock, hours, MOST), "any fixed plane can receive");
  const global = series.irradiance.global;
  if (!global || record === null) return [];
  const { up, distance } = record.sun;
  const outside = (i: number) => (up[i] > 0 ? up[i] * extraterrestrialNormal(distance[i]) : 0);
  return notice(worstDay(global, clock, hours, outside), "arrives outside the atmosphere");
}
