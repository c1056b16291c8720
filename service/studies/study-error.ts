/** Why a well-formed request cannot be answered: becomes one error of a 422 problem. `code` never changes meaning. */
export class StudyError extends Error {
  readonly code: string;
  /** JSON pointer (RFC 6901) into the request. */
  readonly pointer: string;
  /** What would be right, where that can be said. */
  readonly expected: string | undefined;

  constructor(code: string, pointer: string, detail: string, expected?: string) {
    super(detail);
    this.name = "StudyError";
    this.code = code;
    this.pointer = pointer;
    this.expected = expected;
  }
}
