import { EncodingError } from "./errors/encoding-error.ts";
import type { CallContext } from "./errors/kneegap-error.ts";
import { isJson } from "./media-type.ts";

const DEEPEST = 64;

/**
 * The bytes of a request body. JSON media types: `body` as UTF-8 JSON, where a Float64Array or Float32Array becomes an
 * array and its NaN null; an empty column stays `[]`; members that are undefined are left out. Other media types take a string or bytes as they are.
 * Throws EncodingError, with the pointer, for what JSON cannot carry (see there) and for nesting deeper than 64.
 */
export function encodeBody(body: unknown, mediaType: string, context: CallContext): Uint8Array {
  if (!isJson(mediaType)) {
    if (typeof body === "string") return Buffer.from(body);
    if (body instanceof Uint8Array) return body;
    throw new EncodingError("", `must be a string or bytes of ${mediaType}`, context);
  }
  if (body === undefined) throw new EncodingError("", "is missing", context);
  return Buffer.from(JSON.stringify(toPlain(body, "", { context, depth: 0 })));
}

interface Place {
  readonly context: CallContext;
  readonly depth: number;
}

function toPlain(value: unknown, pointer: string, place: Place): unknown {
  switch (typeof value) {
    case "number":
      if (Number.isFinite(value)) return value;
      throw new EncodingError(pointer, `is ${value}`, place.context);
    case "bigint":
    case "function":
    case "symbol":
      throw new EncodingError(pointer, `is a ${typeof value}`, place.context);
    case "object":
      return value === null ? null : toPlainObject(value, pointer, { ...place, depth: place.depth + 1 });
    default:
      return value;
  }
}

function toPlainObject(value: object, pointer: string, place: Place): unknown {
  if (place.depth > DEEPEST) throw new EncodingError(pointer, `is nested deeper than ${DEEPEST}`, place.context);
  if (value instanceof Float64Array || value instanceof Float32Array) return fromTyped(value, pointer, place.context);
  if (Array.isArray(value)) return fromArray(value, pointer, place);
  if (ArrayBuffer.isView(value) || value instanceof Map || value instanceof Set) {
    const reason = `is a ${value.constructor.name}; send a plain object, number[] or Float64Array`;
    throw new EncodingError(pointer, reason, place.context);
  }
  if (value instanceof Date)
    return toPlain(Number.isNaN(value.getTime()) ? Number.NaN : value.toISOString(), pointer, place);
  const plain: Record<string, unknown> = {};
  for (const [key, member] of Object.entries(value)) {
    plain[key] = toPlain(member, `${pointer}/${escapeToken(key)}`, place);
  }
  return plain;
}

/** JSON.stringify writes the NaN left in the result as null. */
function fromTyped(column: Float64Array | Float32Array, pointer: string, context: CallContext): number[] {
  const plain = new Array<number>(column.length);
  for (let index = 0; index < column.length; index += 1) {
    const value = column[index];
    if (value === Infinity || value === -Infinity) {
      throw new EncodingError(`${pointer}/${index}`, `is ${value}`, context);
    }
    plain[index] = value;
  }
  return plain;
}

/** A plain column is handed on uncopied: only the pointer of a faulty element is ever built. */
function fromArray(values: readonly unknown[], pointer: string, place: Place): unknown {
  if (isFiniteColumn(values)) return values;
  return Array.from(values, (value, index) => {
    if (value === undefined) throw new EncodingError(`${pointer}/${index}`, "is undefined", place.context);
    return toPlain(value, `${pointer}/${index}`, place);
  });
}

/** An indexed loop, because `every` steps over the holes of a sparse array and JSON would fill them with null. */
function isFiniteColumn(values: readonly unknown[]): boolean {
  for (let index = 0; index < values.length; index += 1) {
    const value = values[index];
    if (value !== null && !Number.isFinite(value)) return false;
  }
  return true;
}

/** RFC 6901, section 3. */
function escapeToken(key: string): string {
  return key.replaceAll("~", "~0").replaceAll("/", "~1");
}
