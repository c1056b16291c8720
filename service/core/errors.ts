/** What core throws when it cannot answer. `code` never changes meaning; `values` are plain numbers for the caller's message. */
export class CoreError extends Error {
  readonly code: string;
  readonly values: Readonly<Record<string, number>>;

  constructor(code: string, message: string, values: Readonly<Record<string, number>> = {}) {
    super(message);
    this.name = "CoreError";
    this.code = code;
    this.values = values;
  }
}
