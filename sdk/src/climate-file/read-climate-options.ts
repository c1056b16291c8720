import { checkCount, checkNumber } from "../client-options.ts";
import { CLIMATE_ROLES } from "./climate-header.ts";
import type { ColumnMapping } from "./find-columns.ts";
import type { DecimalMark } from "./number-reader.ts";
import { readStamp, readUtcOffset } from "./time-stamp.ts";

/** The most samples a request may have. */
export const MOST_SAMPLES = 600_000;

/** What happens to missing samples, as in the request; the longest gap to fill in seconds. */
export type ClimateGaps = "refuse" | "skip" | { readonly interpolateUpTo: number };

/** How `readClimate` reads a file. Without any, a file with the documented headers and stamps with offsets is read. */
export interface ReadClimateOptions<Site extends object = never, Gaps extends ClimateGaps = "refuse"> {
  /**
   * Where the columns stand: each role's header, or its number in the row, counted from 1. Only the columns named are
   * read. Default: those with the documented headers; other columns are left unread.
   */
  readonly columns?: ColumnMapping;
  /** What separates the fields: one character, `" "` for runs of blanks and tabs. Default: found in the header. */
  readonly delimiter?: string;
  /** The decimal mark. Default: the first one that a number shows for certain. */
  readonly decimal?: DecimalMark;
  /**
   * The line with the headers, counted from 1; what stands above is passed over. Default: the first line that is neither
   * empty nor a comment. null: the file has no headers, and `columns` gives every column's number.
   */
  readonly headerLine?: number | null;
  /** What comment lines begin with. Default "#"; null: there are none. */
  readonly comment?: string | null;
  /** How bytes are decoded: a label of the WHATWG Encoding standard. Default: UTF-8, or UTF-16 by its byte order mark. */
  readonly encoding?: string;
  /** What stands for a missing value besides an empty field: texts, numbers among them compared as numbers. Default none. */
  readonly missing?: readonly string[];
  /** The offset from UTC of stamps that carry none, all year the same: `"+01:00"`, or `"Z"`. Default: every stamp carries its own. */
  readonly utcOffset?: string;
  /** Whether a stamp is the start or the end of its row's interval; end stamps move the series' start back one step. Default "start". */
  readonly stamps?: "start" | "end";
  /** The start of the first sample, for rows without a time column; needs `step`. */
  readonly start?: string;
  /** Seconds from row to row, 1 to 86,400. Default: as the first two stamps have it. */
  readonly step?: number;
  /** Whether rows missing inside the series become missing samples. Default false: they are an error. */
  readonly fillMissingRows?: boolean;
  /** Whether a value is the mean over its step or the value at its stamp. Default "mean". */
  readonly timing?: "mean" | "instant";
  /** Handed on to the request. Default "refuse". */
  readonly gaps?: Gaps;
  /** Handed on to the request with horizontal irradiance, which needs it; otherwise unused. */
  readonly site?: Site;
  /** The most samples that are read, filled ones included. Default and ceiling 600,000. */
  readonly maximumSamples?: number;
}

/** The options with their defaults, checked. */
export interface ReadClimateSettings {
  readonly columns: ColumnMapping | undefined;
  readonly delimiter: string | undefined;
  readonly decimal: DecimalMark | undefined;
  readonly headerLine: number | null | undefined;
  readonly comment: string | null;
  readonly missing: readonly string[];
  /** Minutes. */
  readonly utcOffset: number | undefined;
  readonly clockIsUtc: boolean;
  readonly stampsAreEnds: boolean;
  /** The instant (ms since 1970 UTC) and its clock's offset (minutes). */
  readonly start: { readonly instant: number; readonly utcOffset: number } | undefined;
  readonly step: number | undefined;
  readonly fillMissingRows: boolean;
  readonly timing: "mean" | "instant";
  readonly hasSite: boolean;
  readonly maximumSamples: number;
}

/** Fills in the defaults. Throws TypeError or RangeError, naming the option, for one that cannot be used. */
export function resolveReadOptions(options: ReadClimateOptions<object, ClimateGaps>): ReadClimateSettings {
  const { comment = "#", stamps = "start", timing = "mean", step, headerLine, decimal } = options;
  oneOf("stamps", stamps, ["start", "end"]);
  oneOf("timing", timing, ["mean", "instant"]);
  if (decimal !== undefined) oneOf("decimal", decimal, [".", ","]);
  if (comment === "") throw new TypeError("comment must be a text or null");
  if (stamps === "end" && timing === "instant") {
    throw new TypeError('stamps "end" goes with means: the value at an instant has no end');
  }
  const utcOffset = options.utcOffset === undefined ? undefined : checkUtcOffset(options.utcOffset);
  return {
    columns: checkMapping(options.columns, headerLine === null),
    delimiter: checkDelimiter(options.delimiter),
    decimal,
    headerLine: headerLine == null ? headerLine : checkCount("headerLine", headerLine, 1_000_000),
    comment,
    missing: checkMissing(options.missing ?? []),
    utcOffset,
    clockIsUtc: options.utcOffset?.toUpperCase() === "Z",
    stampsAreEnds: stamps === "end",
    start: options.start === undefined ? undefined : checkStart(options.start, utcOffset, step),
    step: step === undefined ? undefined : checkNumber("step", step, [1, 86_400]),
    fillMissingRows: options.fillMissingRows ?? false,
    timing,
    hasSite: options.site !== undefined,
    maximumSamples: checkCount("maximumSamples", options.maximumSamples ?? MOST_SAMPLES, MOST_SAMPLES),
  };
}

function checkMapping(columns: ColumnMapping | undefined, withoutHeader: boolean): ColumnMapping | undefined {
  if (columns === undefined) {
    if (withoutHeader) throw new TypeError("headerLine null needs the option columns, with the columns' numbers");
    return undefined;
  }
  for (const [role, named] of Object.entries(columns)) {
    oneOf("a member of columns", role, CLIMATE_ROLES);
    if (typeof named === "number") checkCount(`columns.${role}`, named, 65_536);
    else if (typeof named === "string" && withoutHeader) {
      throw new TypeError(`columns.${role} must be a number: there is no header by headerLine null`);
    } else if (named !== undefined && typeof named !== "string") {
      throw new TypeError(`columns.${role} must be a header or a column's number`);
    }
  }
  if (columns.windSpeed !== undefined && columns.cellTemperature !== undefined) {
    throw new TypeError("columns.windSpeed goes with ambientTemperature; cell temperature needs no wind");
  }
  return columns;
}

function checkMissing(missing: readonly string[]): readonly string[] {
  if (Array.isArray(missing) && missing.every((text) => typeof text === "string")) return missing;
  throw new TypeError('missing must be an array of texts, such as ["-9999.9", "NaN"]');
}

function checkDelimiter(delimiter: string | undefined): string | undefined {
  if (delimiter === undefined || (delimiter.length === 1 && /[^\p{L}\p{N}"\r\n.+-]/u.test(delimiter))) return delimiter;
  throw new TypeError(`delimiter must be one character such as "," ";" "\\t" or " ", not ${JSON.stringify(delimiter)}`);
}

function checkUtcOffset(text: string): number {
  const minutes = readUtcOffset(text);
  if (!Number.isNaN(minutes)) return minutes;
  throw new TypeError(`utcOffset must be an offset such as "+01:00" or "Z", not ${JSON.stringify(text)}`);
}

function checkStart(text: string, utcOffset: number | undefined, step: number | undefined) {
  const stamp = readStamp(text);
  if (typeof stamp === "string") throw new TypeError(`start ${JSON.stringify(text)}: ${stamp}`);
  const offset = stamp.utcOffset ?? utcOffset;
  if (offset === undefined) throw new TypeError("start must carry its offset from UTC, or utcOffset must be given");
  if (step === undefined) throw new TypeError("start needs the option step: the rows carry no time");
  return { instant: stamp.clock - offset * 60_000, utcOffset: offset };
}

function oneOf(name: string, value: string, values: readonly string[]): void {
  if (values.includes(value)) return;
  throw new TypeError(
    `${name} must be ${values.map((text) => JSON.stringify(text)).join(" or ")}, not ${JSON.stringify(value)}`,
  );
}
