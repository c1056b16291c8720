import { ClimateFileError } from "../errors/climate-file-error.ts";
import { checkColumns } from "./check-columns.ts";
import type { ClimateRole } from "./climate-header.ts";
import { findColumns } from "./find-columns.ts";
import { GrowingColumn } from "./growing-column.ts";
import { NumberReader } from "./number-reader.ts";
import type { ReadClimateSettings } from "./read-climate-options.ts";
import { StampSequence } from "./stamp-sequence.ts";

interface ValueColumn {
  readonly role: ClimateRole;
  readonly index: number;
  readonly values: GrowingColumn;
}

/** What the header row settled. */
interface Layout {
  readonly line: number;
  /** How many fields a row must have. */
  readonly width: number;
  readonly time: number | undefined;
  readonly columns: readonly ValueColumn[];
}

/** A climate file's columns, all of one length, NaN where missing, and the time of their first sample. */
export interface TableContent {
  /** ms since 1970 UTC, the start of the first sample. */
  readonly start: number;
  /** Minutes ahead of UTC of the clock the file keeps. */
  readonly utcOffset: number;
  /** ms. */
  readonly step: number;
  readonly columns: ReadonlyMap<ClimateRole, Float64Array>;
}

/** Takes the rows of a climate file one by one and holds nothing of them but the numbers. */
export class ClimateTable {
  readonly #settings: ReadClimateSettings;
  readonly #numbers: NumberReader;
  readonly #stamps: StampSequence;
  #layout: Layout | undefined;
  #samples = 0;

  constructor(settings: ReadClimateSettings) {
    this.#settings = settings;
    this.#numbers = new NumberReader(settings.decimal, settings.missing);
    this.#stamps = new StampSequence(settings);
  }

  /** Takes the next row, the header row first. Throws ClimateFileError, see its codes. */
  take(fields: readonly string[], line: number): void {
    const isHeader = this.#layout === undefined && this.#settings.headerLine !== null;
    this.#layout ??= this.#layOut(fields, line);
    if (!isHeader) this.#takeSample(fields, line, this.#layout);
  }

  /** What was read. Throws ClimateFileError `no-samples`, and `spacing` or `decimal-mark` where the end leaves them open. */
  finish(): TableContent {
    const layout = this.#layout;
    if (layout === undefined) throw noSamples(null, "it is empty, or ends before its header.");
    if (this.#samples === 0) throw noSamples(layout.line, "no row follows the header.");
    this.#numbers.finish();
    const columns = new Map(layout.columns.map(({ role, values }) => [role, values.toArray()]));
    const { start, step, stampsAreEnds } = this.#settings;
    if (start !== undefined) return { start: start.instant, utcOffset: start.utcOffset, step: step! * 1000, columns };
    const sequence = this.#stamps.finish();
    return { ...sequence, start: stampsAreEnds ? sequence.first - sequence.step : sequence.first, columns };
  }

  #layOut(fields: readonly string[], line: number): Layout {
    const { columns: mapping, hasSite, start } = this.#settings;
    const found = findColumns(fields, mapping, line);
    checkColumns(found, { fields, line, hasSite, hasStart: start !== undefined });
    if (found.has("cellTemperature")) found.delete("windSpeed");
    const time = found.get("time");
    found.delete("time");
    const columns = [...found].map(([role, index]) => ({ role, index, values: new GrowingColumn() }));
    const lastNamed = fields.findLastIndex((field) => field !== "") + 1;
    const lastRead = Math.max(time ?? 0, ...found.values()) + 1;
    return { line, width: Math.max(lastNamed, lastRead), time, columns };
  }

  #takeSample(fields: readonly string[], line: number, { width, time, columns }: Layout): void {
    checkWidth(fields, line, width);
    const missing = time === undefined ? 0 : this.#stamps.accept(fields[time], line, time + 1);
    this.#samples += missing + 1;
    if (this.#samples > this.#settings.maximumSamples) throw this.#tooMany(line, missing);
    for (const { index, values } of columns) {
      if (missing > 0) values.pushMissing(missing);
      values.push(this.#numbers.read(fields[index], line, index + 1));
    }
  }

  #tooMany(line: number, missing: number): ClimateFileError {
    const filled = missing > 0 ? ` (${missing} rows are missing before this one)` : "";
    const reason = `with this row there are more than ${this.#settings.maximumSamples} samples${filled}; split the file, or average it to longer steps.`;
    return new ClimateFileError("too-many-samples", { line, column: null, found: null }, reason);
  }
}

/** Spreadsheets end rows with empty fields too many; those are let pass, text is not. */
function checkWidth(fields: readonly string[], line: number, width: number): void {
  if (fields.length < width) {
    const reason = `the row has ${fields.length} of ${width} fields; the file may be cut off here. Leave the field of a missing value empty, but keep its delimiter; where blanks separate, write a text and name it in the option missing.`;
    throw new ClimateFileError("row-too-short", { line, column: fields.length + 1, found: null }, reason);
  }
  if (fields.length === width) return;
  const extra = fields.findIndex((field, index) => index >= width && field !== "");
  if (extra < 0) return;
  const reason = `the row has ${fields.length} fields, ${width} were expected; a decimal comma or a blank inside a field must not be the delimiter: put such fields in quotes, or use another delimiter.`;
  throw new ClimateFileError("row-too-long", { line, column: extra + 1, found: fields[extra] }, reason);
}

function noSamples(line: number | null, what: string): ClimateFileError {
  const reason = `${what} A header row and at least one row of values are needed.`;
  return new ClimateFileError("no-samples", { line, column: null, found: null }, reason);
}
