import type { Hash } from "node:crypto";
import { createHash } from "node:crypto";
import { endianness } from "node:os";

const BIG_ENDIAN = endianness() === "BE";

/** 8 bytes a value, little-endian. */
function columnBytes(column: Float64Array): Uint8Array {
  const bytes = Buffer.from(column.buffer, column.byteOffset, column.byteLength);
  return BIG_ENDIAN ? Buffer.from(bytes).swap64() : bytes;
}

function feed(hash: Hash, value: unknown): void {
  if (value instanceof Float64Array) {
    hash.update(`[${value.length}]`);
    hash.update(columnBytes(value));
  } else if (Array.isArray(value)) {
    hash.update("[");
    for (const [index, element] of value.entries()) {
      if (index > 0) hash.update(",");
      feed(hash, element);
    }
    hash.update("]");
  } else if (typeof value === "object" && value !== null) {
    feedMembers(hash, value as Record<string, unknown>);
  } else hash.update(JSON.stringify(value));
}

function feedMembers(hash: Hash, of: Record<string, unknown>): void {
  const names = Object.keys(of).filter((name) => of[name] !== undefined);
  hash.update("{");
  for (const [index, name] of names.sort().entries()) {
    hash.update(`${index > 0 ? "," : ""}${JSON.stringify(name)}:`);
    feed(hash, of[name]);
  }
  hash.update("}");
}

/**
 * SHA-256, in hexadecimal, of plain data: JSON with sorted keys and no spaces, in which each Float64Array stands as [n]
 * followed by n little-endian doubles (NaN: missing). Members that are undefined are left out.
 */
export function inputDigest(data: unknown): string {
  const hash = createHash("sha256");
  feed(hash, data);
  return hash.digest("hex");
}
