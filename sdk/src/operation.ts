import type { ColumnPath } from "./columns.ts";

/** One row of the generated operation table: all the transport needs to know to make a call and to judge its answer. */
export interface Operation {
  readonly operationId: string;
  readonly method: "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
  /** The path below the base URL, with its leading slash. */
  readonly path: string;
  /** The request body's media type; null when the operation takes none. */
  readonly requestMediaType: string | null;
  /** The media type of a success; null when a success has no body. */
  readonly responseMediaType: string | null;
  /** The HTTP statuses that mean success. */
  readonly successStatuses: readonly number[];
  /** Where the columns of a success stand. */
  readonly columns: readonly ColumnPath[];
}

/** What a single call may set. */
export interface CallOptions {
  /** Ends the call with an AbortedError when it fires. */
  readonly signal?: AbortSignal;
  /** The whole call's time, attempts and waits included, ms; the client's `timeout` when left out. */
  readonly timeout?: number;
  /** How often the request may be sent; the client's `retry.attempts` when left out. 1 means no retry. */
  readonly attempts?: number;
  /** The id under which the service logs the call, `^[A-Za-z0-9._-]{1,64}$`; a random UUID when left out. */
  readonly requestId?: string;
}

/** The one function every generated method calls. `body` is undefined for an operation that takes none. */
export type RequestFunction = (operation: Operation, body: unknown, options?: CallOptions) => Promise<unknown>;
