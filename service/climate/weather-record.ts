import { type ClimateSeries, firstSunInstant, type HorizontalIrradiance } from "./climate-series.ts";
import { type Observer, observer } from "./sun-position.ts";
import { type SunTrack, sunTrack } from "./sun-track.ts";

/** A horizontal climate beside the sun it claims: what the checks on plausibility look at. */
export interface WeatherRecord {
  readonly given: HorizontalIrradiance;
  readonly sun: SunTrack;
  readonly place: Observer;
  /** Sample length, minutes. */
  readonly minutes: number;
  /** What the caller's clock shows at sample 0, milliseconds since 1970. */
  readonly clock: number;
}

/** The record of a horizontal series, null for a plane-of-array one; `sun` spares a second computation of the track. */
export function weatherRecord(series: ClimateSeries, sun: SunTrack | null): WeatherRecord | null {
  const given = series.irradiance;
  if (given.kind !== "horizontal") return null;
  const count = (given.global ?? given.directNormal ?? given.diffuse ?? new Float64Array(0)).length;
  return {
    given,
    sun: sun ?? sunTrack(firstSunInstant(series), series.step * 1000, count, given.site),
    place: observer(given.site.latitude, given.site.longitude),
    minutes: series.step / 60,
    clock: series.start + series.utcOffset,
  };
}
