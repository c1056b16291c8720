import type { ByteWriter } from "./byte-writer.ts";

/** Longest text of one number and its comma: "-1.2345678901234567e+300,". */
const LONGEST = 26;
/** Values between two looks at the room that is left. */
const BLOCK = 4096;
const [ZERO, MINUS, POINT, COMMA, OPEN, CLOSE] = [48, 45, 46, 44, 91, 93];
const NULL = [110, 117, 108, 108];

/** The value nearest to `value` with `decimals` decimals, as the writer writes it. */
export function rounded(value: number, decimals: number): number {
  const scale = Number(`1e${decimals}`);
  return Math.round(value * scale) / scale;
}

/** Writes a number below 2^31 without sign in decimal digits, `digits` of them, from `at` on. */
function writeDigits(out: Uint8Array, at: number, number: number, digits: number): number {
  let rest = number | 0;
  for (let place = at + digits - 1; place >= at; place--) {
    const tenth = (rest / 10) | 0;
    out[place] = ZERO + rest - tenth * 10;
    rest = tenth;
  }
  return at + digits;
}

function digitsOf(number: number): number {
  if (number < 10) return 1;
  if (number < 100) return 2;
  if (number < 1000) return 3;
  if (number < 10_000) return 4;
  let digits = 5;
  for (let limit = 100_000; number >= limit; limit *= 10) digits++;
  return digits;
}

function writeText(out: Uint8Array, at: number, text: string): number {
  for (let k = 0; k < text.length; k++) out[at + k] = text.charCodeAt(k);
  return at + text.length;
}

/** Writes `magnitude` / `scale` from `at` on, both whole, `magnitude` in 1 ... 1e15; what JSON.stringify writes. */
function writeRatio(out: Uint8Array, at: number, magnitude: number, scale: number, decimals: number): number {
  // Exact: below 1e15 the quotient is never rounded up to the next whole number.
  const whole = Math.floor(magnitude / scale);
  if (whole > 0x7fffffff || (whole === 0 && magnitude * 1e6 < scale))
    return writeText(out, at, String(magnitude / scale));
  let end = writeDigits(out, at, whole, digitsOf(whole));
  let fraction = magnitude - whole * scale;
  if (fraction === 0) return end;
  let digits = decimals;
  while (fraction % 10 === 0) {
    fraction /= 10;
    digits--;
  }
  out[end++] = POINT;
  return writeDigits(out, end, fraction, digits);
}

function writeValue(out: Uint8Array, at: number, value: number, scale: number, decimals: number): number {
  const scaled = Math.round(value * scale);
  if (scaled === 0) {
    out[at] = ZERO;
    return at + 1;
  }
  let start = at;
  if (scaled < 0) out[start++] = MINUS;
  const magnitude = Math.abs(scaled);
  if (magnitude < 1e15) return writeRatio(out, start, magnitude, scale, decimals);
  const quotient = magnitude / scale;
  return Number.isFinite(quotient) ? writeText(out, start, String(quotient)) : writeText(out, at, "null");
}

/**
 * Writes a column as JSON array: the very bytes that JSON.stringify gives for its values rounded to `decimals` (0 ... 9)
 * decimals. NaN, Infinity and samples marked in `skipped` (shape [n], or null) become null; an empty column `[]`.
 */
export function writeColumn(
  writer: ByteWriter,
  values: Float64Array,
  decimals: number,
  skipped: Uint8Array | null,
): void {
  const scale = Number(`1e${decimals}`);
  writer.ensure(2);
  writer.bytes[writer.length++] = OPEN;
  for (let from = 0; from < values.length; from += BLOCK) {
    writer.ensure(BLOCK * LONGEST + 1);
    const out = writer.bytes;
    let at = writer.length;
    const end = Math.min(values.length, from + BLOCK);
    for (let i = from; i < end; i++) {
      const value = values[i];
      if ((skipped !== null && skipped[i] !== 0) || Number.isNaN(value)) {
        out.set(NULL, at);
        at += 4;
      } else at = writeValue(out, at, value, scale, decimals);
      out[at++] = COMMA;
    }
    writer.length = at;
  }
  if (values.length > 0) writer.length--;
  writer.ensure(1);
  writer.bytes[writer.length++] = CLOSE;
}
