import { encodeBody } from "../encode-body.ts";
import type { CallContext } from "../errors/kneegap-error.ts";
import type { Climate } from "../generated/schema.ts";

const KEPT_BYTES = 64 * 1024 * 1024;

/** The lines of named climates, encoded when first used; of those not used lately it keeps 64 MiB at the most. */
export class ClimateLines {
  readonly #climates: Readonly<Record<string, Climate>>;
  readonly #context: CallContext;
  /** The one used last stands last. */
  readonly #kept = new Map<string, Uint8Array>();
  #keptBytes = 0;

  constructor(climates: Readonly<Record<string, Climate>>, context: CallContext) {
    this.#climates = climates;
    this.#context = context;
  }

  /** Whether there is a climate of that name. */
  has(name: string): boolean {
    return Object.hasOwn(this.#climates, name);
  }

  /** The line of a climate that there is. Throws EncodingError for what JSON cannot carry. */
  line(name: string): Uint8Array {
    const kept = this.#kept.get(name);
    const line = kept ?? this.#encode(name);
    this.#kept.delete(name);
    this.#kept.set(name, line);
    if (kept === undefined) this.#keptBytes += line.length;
    for (const [oldest, { length }] of this.#kept) {
      if (this.#keptBytes <= KEPT_BYTES || oldest === name) break;
      this.#kept.delete(oldest);
      this.#keptBytes -= length;
    }
    return line;
  }

  #encode(name: string): Uint8Array {
    return encodeBody({ kind: "climate", name, climate: this.#climates[name] }, "application/json", this.#context);
  }
}
