/** An instant as a file writes it. */
export interface TimeStamp {
  /** What the clock shows, as ms since 1970-01-01T00:00 of the same clock. */
  readonly clock: number;
  /** How far the clock is ahead of UTC, minutes; null when the stamp does not say. */
  readonly utcOffset: number | null;
}

const STAMP = /^(\d{4})-(\d\d)-(\d\d)[T ](\d\d):(\d\d)(?::(\d\d)(?:[.,](\d{1,3}))?)?\s?(Z|[+-]\d\d(?::?\d\d)?)?$/i;
const OFFSET = /^([+-])(\d\d)(?::?(\d\d))?$/;
const MINUTE = 60_000;

/**
 * Reads an ISO 8601 date and time in extended form, `T` or one blank between them, seconds and offset optional, 24:00 for
 * the end of a day; years 1950 to 2099, as the service takes them. A text that is none gives the reason as a string.
 */
export function readStamp(text: string): TimeStamp | string {
  const match = STAMP.exec(text.trim());
  if (match === null) {
    return "this is not an ISO 8601 date and time such as 2025-01-01T00:00:00+01:00 (year, month, day; the offset may stand in the option utcOffset).";
  }
  const [year, month, day, hour, minute, second] = match.slice(1, 7).map((digits) => Number(digits ?? 0));
  const millisecond = Number((match[7] ?? "").padEnd(3, "0"));
  if (year < 1950 || year > 2099) return "the year is not within 1950 to 2099.";
  const midnight = Date.UTC(year, month - 1, day);
  if (new Date(midnight).getUTCMonth() !== month - 1) return "there is no such day.";
  const ofDay = ((hour * 60 + minute) * 60 + second) * 1000 + millisecond;
  if (minute > 59 || second > 59 || ofDay > 24 * 60 * MINUTE) return "there is no such time of day.";
  const utcOffset = match[8] === undefined ? null : readUtcOffset(match[8]);
  if (utcOffset !== null && Number.isNaN(utcOffset)) return "there is no such offset from UTC.";
  return { clock: midnight + ofDay, utcOffset };
}

/** Minutes ahead of UTC that "Z", "+01", "+0100" or "+01:00" say, at most 14 h 59 min; NaN for any other text. */
export function readUtcOffset(text: string): number {
  if (text === "Z" || text === "z") return 0;
  const [, sign, hours, minutes = "0"] = OFFSET.exec(text) ?? [];
  if (sign === undefined || Number(hours) > 14 || Number(minutes) > 59) return Number.NaN;
  const size = Number(hours) * 60 + Number(minutes);
  return sign === "-" && size > 0 ? -size : size;
}

/** ISO 8601 of an instant (ms since 1970 UTC) by a clock `utcOffset` minutes ahead of UTC; milliseconds only where needed. */
export function writeStamp(instant: number, utcOffset: number): string {
  const clock = new Date(instant + utcOffset * MINUTE).toISOString().replace(/(\.000)?Z$/, "");
  const size = Math.abs(utcOffset);
  const digits = (value: number) => String(value).padStart(2, "0");
  return `${clock}${utcOffset < 0 ? "-" : "+"}${digits(Math.floor(size / 60))}:${digits(size % 60)}`;
}
