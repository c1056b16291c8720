import type { KneegapOptions } from "./client-options.ts";
import { resolveOptions } from "./client-options.ts";
import type { ColumnKind } from "./columns.ts";
import { Operations } from "./generated/client.ts";
import { Transport } from "./transport.ts";

/**
 * A client of one kneegap service. It holds a pool of connections: make one, share it, close it at the end.
 * `await using client = new Kneegap(...)` closes it by itself where the language version has it.
 */
export class Kneegap<C extends ColumnKind = "plain"> extends Operations<C> {
  readonly #transport: Transport;

  /** Throws TypeError or RangeError for options that cannot be used. No connection is made before the first call. */
  constructor(options: KneegapOptions<C>) {
    const transport = new Transport(resolveOptions(options));
    super((operation, body, callOptions) => transport.request(operation, body, callOptions));
    this.#transport = transport;
  }

  /** Refuses new calls (ClosedError), waits for those under way, then closes the connections. */
  close(): Promise<void> {
    return this.#transport.close();
  }

  /** The same as `close()`. */
  [Symbol.asyncDispose](): Promise<void> {
    return this.close();
  }
}
