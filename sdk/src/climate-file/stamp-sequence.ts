import type { ClimateFileErrorCode } from "../errors/climate-file-error.ts";
import { ClimateFileError } from "../errors/climate-file-error.ts";
import type { TimeStamp } from "./time-stamp.ts";
import { readStamp } from "./time-stamp.ts";

/** How the stamps of a file are to be understood. */
export interface StampSettings {
  /** Minutes ahead of UTC of stamps that carry no offset; undefined when the caller gave none. */
  readonly utcOffset: number | undefined;
  /** Whether that clock is UTC itself, which no summer changes. */
  readonly clockIsUtc: boolean;
  /** Seconds between rows; undefined: as the first two stamps have it. */
  readonly step: number | undefined;
  readonly fillMissingRows: boolean;
}

/** One row's stamp: its instant in ms since 1970 UTC, and where it stands. */
interface Row {
  readonly instant: number;
  readonly stamp: TimeStamp;
  readonly text: string;
  readonly line: number;
  readonly column: number;
}

const HOUR = 3_600_000;
const LONGEST_STEP = 86_400_000;
/** Summer time begins and ends in these months (from 0), on these days (Sunday, Friday), before 5 h; IANA time zone database, from memory. */
const CHANGE_MONTHS: ReadonlySet<number> = new Set([2, 3, 8, 9, 10]);
const CHANGE_DAYS: ReadonlySet<number> = new Set([0, 5]);
const CHANGE_HOUR = 4;

/** Follows the stamps of a file from row to row and holds them to equal steps. */
export class StampSequence {
  readonly #settings: StampSettings;
  /** ms; undefined until two stamps are known. */
  #step: number | undefined;
  #first: Row | undefined;
  #last: Row | undefined;

  constructor(settings: StampSettings) {
    this.#settings = settings;
    this.#step = settings.step === undefined ? undefined : settings.step * 1000;
  }

  /**
   * Takes the next row's stamp and returns how many rows are missing before it: 0, unless missing rows may be filled.
   * Throws ClimateFileError `time`, `utc-offset`, `spacing` or `clock-change`.
   */
  accept(text: string, line: number, column: number): number {
    const row = this.#read(text, line, column);
    const last = this.#last;
    this.#last = row;
    if (last !== undefined) return this.#missingBetween(last, row);
    this.#first = row;
    return 0;
  }

  /**
   * The first stamp (ms since 1970 UTC), its clock's offset (minutes) and the step (ms). Throws ClimateFileError
   * `spacing` when there is one row alone and the step was not given. There must have been a row.
   */
  finish(): { readonly first: number; readonly utcOffset: number; readonly step: number } {
    const first = this.#first!;
    if (this.#step === undefined)
      throw fault("spacing", first, "one row shows no step; give the option step, in seconds.");
    return { first: first.instant, utcOffset: this.#offsetOf(first), step: this.#step };
  }

  #read(text: string, line: number, column: number): Row {
    const stamp = readStamp(text);
    const place = { text, line, column };
    if (typeof stamp === "string") {
      throw fault("time", place, text.trim() === "" ? "this row has no time; write it, or delete the row." : stamp);
    }
    const utcOffset = stamp.utcOffset ?? this.#settings.utcOffset;
    if (utcOffset === undefined) {
      const reason = `this does not say how far its clock is from UTC; write the offset behind it, or give the option utcOffset, such as "+01:00".`;
      throw fault("utc-offset", place, reason);
    }
    return { instant: stamp.clock - utcOffset * 60_000, stamp, ...place };
  }

  #offsetOf({ stamp }: Row): number {
    return stamp.utcOffset ?? this.#settings.utcOffset ?? 0;
  }

  #missingBetween(last: Row, row: Row): number {
    const time = row.instant - last.instant;
    if (this.#step === undefined) this.#step = firstStep(time, row, last);
    if (time === this.#step) return 0;
    if (this.#clockChanged(time, this.#step, row)) {
      const way = time > this.#step ? "forward to" : "back from";
      const reason = `after line ${last.line} the time goes on by ${seconds(time)} instead of ${seconds(this.#step)}: most likely the clock was put ${way} daylight saving time. Write every stamp with its own offset, or in one offset all year.`;
      throw fault("clock-change", row, reason);
    }
    const missing = time / this.#step - 1;
    if (missing > 0 && Number.isInteger(missing) && this.#settings.fillMissingRows) return missing;
    throw fault("spacing", row, unevenReason({ time, step: this.#step, missing, last }));
  }

  /** A whole hour, once, in the early hours of a night when clocks are changed; a stamp with its own offset cannot show it. */
  #clockChanged(time: number, step: number, { stamp }: Row): boolean {
    if (stamp.utcOffset !== null || this.#settings.clockIsUtc || Math.abs(time - step) !== HOUR) return false;
    const clock = new Date(stamp.clock);
    const early = clock.getUTCHours() <= CHANGE_HOUR;
    return early && CHANGE_MONTHS.has(clock.getUTCMonth()) && CHANGE_DAYS.has(clock.getUTCDay());
  }
}

function firstStep(time: number, row: Row, last: Row): number {
  if (time <= 0) throw fault("spacing", row, unevenReason({ time, step: undefined, missing: -1, last }));
  if (time >= 1000 && time <= LONGEST_STEP) return time;
  const reason = `this is ${seconds(time)} after line ${last.line}; steps may be 1 s to 1 day. If rows are missing here, give the option step.`;
  throw fault("spacing", row, reason);
}

interface Unevenness {
  readonly time: number;
  readonly step: number | undefined;
  readonly missing: number;
  readonly last: Row;
}

function unevenReason({ time, step, missing, last }: Unevenness): string {
  if (time === 0) return `this repeats the stamp of line ${last.line}; delete one of the rows.`;
  if (time < 0) {
    return `this is ${seconds(-time)} before line ${last.line}; sort the rows by time, and look for two files put together.`;
  }
  const here = `this is ${seconds(time)} after line ${last.line}, where ${seconds(step!)} were expected`;
  if (missing > 0 && Number.isInteger(missing)) {
    return `${here}: ${missing} ${missing === 1 ? "row is" : "rows are"} missing. Add them, or give the option fillMissingRows: true to read them as missing samples.`;
  }
  if (missing < 0) {
    return `${here}: rows may be missing above, or two files with different steps were put together. Give the option step if it is known.`;
  }
  return `${here}: rows must be equally spaced; resample the file.`;
}

function seconds(ms: number): string {
  return `${ms / 1000} s`;
}

function fault(
  code: ClimateFileErrorCode,
  { text, line, column }: Pick<Row, "text" | "line" | "column">,
  reason: string,
): ClimateFileError {
  return new ClimateFileError(code, { line, column, found: text }, reason);
}
