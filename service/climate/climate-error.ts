/** What is wrong with a climate: a stable code, where it is, and a sentence that says what to change. */
export type ClimateErrorCode =
  | "empty-series"
  | "column-length"
  | "not-finite"
  | "irradiance-out-of-range"
  | "wind-out-of-range"
  | "missing-samples"
  | "components-missing"
  | "site-out-of-range"
  | "step-out-of-range";

/**
 * Thrown by the climate functions when a series cannot be used as given; nothing is repaired silently.
 * `column` is the name of the offending column or member, `index` its first bad sample (-1 where none applies).
 */
export class ClimateError extends Error {
  readonly code: ClimateErrorCode;
  readonly column: string;
  readonly index: number;

  constructor(code: ClimateErrorCode, detail: string, column: string, index = -1) {
    super(detail);
    this.name = "ClimateError";
    this.code = code;
    this.column = column;
    this.index = index;
  }
}
