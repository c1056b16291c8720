import type { ClimateFileErrorCode } from "../errors/climate-file-error.ts";
import { ClimateFileError } from "../errors/climate-file-error.ts";
import { encodingAdvice } from "./climate-header.ts";

export type DecimalMark = "." | ",";

const NUMBER = /^[+-]?(?:\d+(?:([.,])\d*)?|([.,])\d+)(?:[eE][+-]?\d{1,3})?$/;
/** "1,234" may be a number with a decimal mark or with a thousands separator; "0,234" and "1234,567" may not. */
const EITHER_WAY = /^[+-]?[1-9]\d{0,2}[.,]\d{3}$/;
const GROUPED = /^[+-]?\d{1,3}(?:[.,'’\s]\d{3})+(?:[.,]\d+)?$/;
const MISSING_WORD = /^(?:nan|na|n\/a|null|nil|none|missing|inf|[-–—.?*#x]+)$/i;
/** No irradiance, temperature or wind speed of the schema reaches these. */
const PLAUSIBLE = { least: -999, most: 9999 };

interface Seen {
  readonly text: string;
  readonly line: number;
  readonly column: number;
}

/**
 * Reads the numbers of one file. The decimal mark is the one given or the first that a number of the file shows for
 * certain; from there on the other one is an error.
 */
export class NumberReader {
  readonly #missing: ReadonlySet<string>;
  readonly #missingNumbers: ReadonlySet<number>;
  #decimal: DecimalMark | undefined;
  /** The number that showed the decimal mark; undefined when it was given or is not known. */
  #shownBy: Seen | undefined;
  /** The first number with a comma that could be a thousands separator, while the decimal mark is not known. */
  #unclear: Seen | undefined;

  /** `missing`: the texts, besides the empty one, that stand for a missing value; a number among them stands for its value. */
  constructor(decimal: DecimalMark | undefined, missing: readonly string[]) {
    this.#decimal = decimal;
    this.#missing = new Set(["", ...missing.map((text) => text.trim())]);
    const numbers = missing.filter((text) => NUMBER.test(text.trim()));
    this.#missingNumbers = new Set(numbers.map((text) => Number(text.trim().replace(",", "."))));
  }

  /** The number `text` stands for; NaN when it is missing. Throws ClimateFileError `number` or `decimal-mark`. */
  read(text: string, line: number, column: number): number {
    const trimmed = text.trim();
    if (this.#missing.has(trimmed)) return Number.NaN;
    const match = NUMBER.exec(trimmed);
    if (match === null) throw fault("number", { text, line, column }, notANumber(trimmed));
    const mark = match[1] ?? match[2];
    if (mark !== undefined && mark !== this.#decimal) this.#meet(mark as DecimalMark, { text: trimmed, line, column });
    const value = Number(mark === "," ? trimmed.replace(",", ".") : trimmed);
    if (this.#missingNumbers.has(value)) return Number.NaN;
    if (value > PLAUSIBLE.least && value < PLAUSIBLE.most) return value;
    const reason = `this is no irradiance, temperature or wind speed; if it stands for a missing value, give the option missing: [${JSON.stringify(trimmed)}].`;
    throw fault("number", { text, line, column }, reason);
  }

  /** Throws ClimateFileError `decimal-mark` when the file has ended and its commas could still be either. */
  finish(): void {
    if (this.#unclear === undefined) return;
    const reason = `the comma may be a decimal mark or a thousands separator, and no other number of the file tells; give the option decimal: "," or remove the separators.`;
    throw fault("decimal-mark", this.#unclear, reason);
  }

  #meet(mark: DecimalMark, seen: Seen): void {
    if (this.#decimal !== undefined) throw fault("decimal-mark", seen, this.#otherMark(mark, seen.text));
    if (mark === "." && this.#unclear !== undefined) {
      const reason = `the number ${seen.text} on line ${seen.line} has a decimal point, so this comma separates thousands; remove it, or give the option decimal if the comma is the decimal mark.`;
      throw fault("decimal-mark", this.#unclear, reason);
    }
    if (mark === "," && EITHER_WAY.test(seen.text)) {
      this.#unclear ??= seen;
      return;
    }
    this.#decimal = mark;
    this.#shownBy = seen;
    this.#unclear = undefined;
  }

  #otherMark(mark: DecimalMark, text: string): string {
    const known = this.#decimal === "," ? "decimal commas" : "decimal points";
    const source =
      this.#shownBy === undefined
        ? `by the option decimal the file has ${known}`
        : `the file has ${known} (${JSON.stringify(this.#shownBy.text)} on line ${this.#shownBy.line})`;
    const grouped = EITHER_WAY.test(text) ? `, or leave out the "${mark}" if it separates thousands` : "";
    return `${source}; write this number in the same way${grouped}.`;
  }
}

function notANumber(text: string): string {
  if (GROUPED.test(text)) return "leave out the thousands separators.";
  if (MISSING_WORD.test(text)) {
    return `this is not a number; if it stands for a missing value, give the option missing: [${JSON.stringify(text)}], or leave the field empty.`;
  }
  return `this is not a number; write digits alone, such as 12.5, or leave the field empty where the value is missing.${encodingAdvice(text)}`;
}

function fault(code: ClimateFileErrorCode, { text, line, column }: Seen, reason: string): ClimateFileError {
  return new ClimateFileError(code, { line, column, found: text }, reason);
}
