import type { Info } from "csv-parse";
import { CsvError, Parser } from "csv-parse";
import { ClimateFileError } from "../errors/climate-file-error.ts";
import { findDelimiter } from "./split-line.ts";

/** The longest line, header included, in characters. */
export const LONGEST_LINE = 65_536;

/** How a file is divided into rows and fields. */
export interface RowSettings {
  /** One character, " " for runs of blanks and tabs; undefined: to be found in the header. */
  readonly delimiter: string | undefined;
  /** Lines that begin with it are passed over; null: none are. */
  readonly comment: string | null;
  /** The line of the first row, counted from 1; null: the first that is neither empty nor a comment. */
  readonly firstLine: number | null;
  /** How many of a line's fields, split by a delimiter, are known: see {@link findDelimiter}. */
  readonly countKnown: (fields: readonly string[]) => number;
}

/** Takes one row: its fields, and the line it begins on. What it throws ends the reading. */
export type RowHandler = (fields: readonly string[], line: number) => void;

/**
 * Turns text that arrives in pieces into rows (RFC 4180: fields may be quoted, quotes are doubled inside; blanks around a
 * field are dropped). Holds one line at most. Empty lines and comments are counted but are no rows.
 */
export class RowReader {
  readonly #settings: RowSettings;
  readonly #onRow: RowHandler;
  #parser: Parser | undefined;
  /** What was read before the first row's line is complete. */
  #head = "";
  #linesBefore = 0;
  /** The lines that the rows so far, the comments and the empty lines take up. */
  #rowEnd = 0;
  #passedOver = 0;

  constructor(settings: RowSettings, onRow: RowHandler) {
    this.#settings = settings;
    this.#onRow = onRow;
  }

  /** Reads on. Throws what the handler throws, and ClimateFileError `quote` or `line-too-long`. */
  async write(piece: string): Promise<void> {
    if (this.#parser !== undefined) return this.#parse(this.#parser, piece);
    this.#head += piece;
    if (piece.includes("\n")) this.#passOverHead();
    const complete = this.#head.includes("\n");
    if (this.#head.length > LONGEST_LINE && !complete) throw tooLong(this.#linesBefore + 1);
    if (complete) await this.#begin();
  }

  /** Reads what is left, after the last piece. */
  async end(): Promise<void> {
    if (this.#parser === undefined) {
      if (this.#head === "" || this.#isPassedOver(this.#head)) return;
      await this.#begin();
    }
    const parser = this.#parser!;
    await settled((done) => parser.end(done), this.#translate);
  }

  /** Drops the lines before the first row as they come, so that no number of them is held. */
  #passOverHead(): void {
    for (;;) {
      const end = this.#head.indexOf("\n");
      if (end < 0 || !this.#isPassedOver(this.#head.slice(0, end))) return;
      this.#head = this.#head.slice(end + 1);
      this.#linesBefore += 1;
    }
  }

  #isPassedOver(line: string): boolean {
    const { firstLine, comment } = this.#settings;
    if (firstLine !== null) return this.#linesBefore + 1 < firstLine;
    const text = line.trim();
    return text === "" || (comment !== null && text.startsWith(comment));
  }

  async #begin(): Promise<void> {
    const [line] = this.#head.split("\n", 1);
    const delimiter = this.#settings.delimiter ?? findDelimiter(line, this.#settings.countKnown);
    this.#parser = this.#newParser(delimiter);
    const head = this.#head;
    this.#head = "";
    await this.#parse(this.#parser, head);
  }

  #newParser(delimiter: string): Parser {
    const blanks = delimiter === " ";
    const parser = new Parser({
      delimiter: blanks ? [" ", "\t"] : delimiter,
      record_delimiter: "\n",
      comment: this.#settings.comment,
      comment_no_infix: true,
      trim: true,
      skip_empty_lines: true,
      relax_column_count: true,
      max_record_size: LONGEST_LINE,
      on_record: (fields: string[], info) => {
        this.#onRow(blanks ? fields.filter((field) => field !== "") : fields, this.#beginningOf(info));
        this.#rowEnd = info.lines;
        this.#passedOver = info.comment_lines + info.empty_lines;
        return null;
      },
    });
    // Every failure arrives in the callback of the write that met it; unheard, the event of the same error would end the process.
    return parser.on("error", () => undefined).resume();
  }

  #parse(parser: Parser, piece: string): Promise<void> {
    return settled((done) => parser.write(piece, done), this.#translate);
  }

  /** A quoted field may hold line breaks, so a row can end lines after it begins. */
  #beginningOf(info: Pick<Info, "comment_lines" | "empty_lines">): number {
    return this.#linesBefore + this.#rowEnd + info.comment_lines + info.empty_lines - this.#passedOver + 1;
  }

  readonly #translate = (error: Error): Error => {
    if (!(error instanceof CsvError)) return error;
    const line = this.#beginningOf(error as unknown as Info);
    if (error.code === "CSV_MAX_RECORD_SIZE") return tooLong(line);
    const column = Number(error["column"]) + 1;
    const reason =
      error.code === "CSV_QUOTE_NOT_CLOSED"
        ? "a quote is opened here and never closed; close it, or leave the quotes out."
        : "a quote stands inside a field; put the whole field in quotes and double the quotes in it, or leave them out.";
    return new ClimateFileError("quote", { line, column, found: null }, reason);
  };
}

function tooLong(line: number): ClimateFileError {
  const reason = `it is longer than ${LONGEST_LINE} characters: the lines may end otherwise than in a line break, or a quote is never closed.`;
  return new ClimateFileError("line-too-long", { line, column: null, found: null }, reason);
}

function settled(
  start: (done: (error?: Error | null) => void) => void,
  translate: (error: Error) => Error,
): Promise<void> {
  return new Promise((resolve, reject) => {
    start((error) => (error ? reject(translate(error)) : resolve()));
  });
}
