/** What is wrong with a climate file; a code never changes meaning. */
export type ClimateFileErrorCode =
  | "no-samples"
  | "too-many-samples"
  | "line-too-long"
  | "quote"
  | "column-missing"
  | "column-unknown"
  | "column-repeated"
  | "unit"
  | "site-missing"
  | "row-too-short"
  | "row-too-long"
  | "number"
  | "decimal-mark"
  | "time"
  | "utc-offset"
  | "spacing"
  | "clock-change";

/** Where in a file a fault stands. */
export interface FilePlace {
  /** The line, counted from 1 with comments and empty lines; null when the file as a whole is at fault. */
  readonly line: number | null;
  /** The column (field of the row), counted from 1; null when the row or the file as a whole is at fault. */
  readonly column: number | null;
  /** The text that stands there; null when it is what is missing. */
  readonly found: string | null;
}

const SHOWN_CHARACTERS = 40;

/**
 * Thrown by `readClimate` when a file cannot be read as a climate. `reason` says what to change; `line`, `column` and
 * `found` (shortened to 40 characters) say where. Nothing was sent, so it carries no request id.
 */
export class ClimateFileError extends Error implements FilePlace {
  override readonly name = "ClimateFileError";
  readonly code: ClimateFileErrorCode;
  readonly line: number | null;
  readonly column: number | null;
  readonly found: string | null;
  readonly reason: string;

  constructor(code: ClimateFileErrorCode, place: FilePlace, reason: string) {
    const found = place.found === null ? null : shorten(place.found);
    super(`${describePlace({ ...place, found })}: ${reason}`);
    this.code = code;
    this.line = place.line;
    this.column = place.column;
    this.found = found;
    this.reason = reason;
  }
}

/** `text`, cut after 40 characters. */
export function shorten(text: string): string {
  return text.length > SHOWN_CHARACTERS ? `${text.slice(0, SHOWN_CHARACTERS)}…` : text;
}

/** JSON quoting keeps control characters of the file out of terminals and logs. */
function describePlace({ line, column, found }: FilePlace): string {
  const where = line === null ? "The file" : column === null ? `Line ${line}` : `Line ${line}, column ${column}`;
  return found === null ? where : `${where}, ${JSON.stringify(found)}`;
}
