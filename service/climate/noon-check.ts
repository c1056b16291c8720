import type { ClimateSeries } from "./climate-series.ts";
import type { Notice } from "./notice.ts";

const DAY = 86_400_000;
/**
 * How far the light's centre may lie from 12:00 on the caller's clock, hours: legal time differs from the sun's by up to
 * some 3 h, and a plane facing east or west moves the centre by 2 h more (common practice, no source).
 */
const FAR = 5;

/**
 * Without a site, the caller's clock is all there is to hold the light against: `light-around-midnight` where its centre
 * lies more than 5 h from noon. Less than two days of samples, or no clear centre: no notice.
 */
export function noonNotices(series: ClimateSeries): Notice[] {
  if (series.irradiance.kind !== "plane-of-array") return [];
  const { values } = series.irradiance;
  const step = series.step * 1000;
  if (values.length * step < 2 * DAY) return [];
  const first = series.start + series.utcOffset + (series.timing === "mean" ? step / 2 : 0);
  const byMinute = new Float64Array(1440);
  for (let i = 0; i < values.length; i++)
    if (values[i] > 0) byMinute[Math.floor(((((first + i * step) % DAY) + DAY) % DAY) / 60_000)] += values[i];
  let cos = 0;
  let sin = 0;
  let weight = 0;
  for (let minute = 0; minute < 1440; minute++) {
    const angle = (minute * Math.PI) / 720;
    cos += byMinute[minute] * Math.cos(angle);
    sin += byMinute[minute] * Math.sin(angle);
    weight += byMinute[minute];
  }
  if (Math.hypot(cos, sin) <= 0.2 * weight) return [];
  const fromNoon = (Math.atan2(-sin, -cos) * 12) / Math.PI;
  if (Math.abs(fromNoon) <= FAR) return [];
  const detail = `By the stated clock the light is centred ${Math.abs(fromNoon).toFixed(1)} h ${fromNoon > 0 ? "after" : "before"} noon: most likely the start or its UTC offset is wrong.`;
  return [{ code: "light-around-midnight", detail, values: { hoursFromNoon: fromNoon } }];
}
