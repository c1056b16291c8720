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

/** The three digits of each number below 1000, and how many of them are left without the zeros at their end. */
const DIGITS = new Uint8Array(3000);
const KEPT = new Uint8Array(1000);
for (let group = 0; group < 1000; group++) {
  const text = String(group).padStart(3, "0");
  for (let k = 0; k < 3; k++) DIGITS[3 * group + k] = text.charCodeAt(k);
  KEPT[group] = text.replace(/0+$/, "").length;
}

function writeGroup(out: Uint8Array, at: number, group: number): void {
  const from = 3 * group;
  out[at] = DIGITS[from];
  out[at + 1] = DIGITS[from + 1];
  out[at + 2] = DIGITS[from + 2];
}

/** Writes a whole number below 2^31, no zeros before it. */
function writeWhole(out: Uint8Array, at: number, whole: number): number {
  if (whole >= 1000) {
    const thousands = (whole / 1000) | 0;
    const end = writeWhole(out, at, thousands);
    writeGroup(out, end, whole - thousands * 1000);
    return end + 3;
  }
  const skipped = whole < 10 ? 2 : whole < 100 ? 1 : 0;
  for (let k = skipped; k < 3; k++) out[at + k - skipped] = DIGITS[3 * whole + k];
  return at + 3 - skipped;
}

/** Writes the decimals of a fraction in billionths, 1 ... 999999999, no zeros after them. */
function writeFraction(out: Uint8Array, at: number, billionths: number): number {
  const thousandths = (billionths / 1e6) | 0;
  writeGroup(out, at, thousandths);
  let rest = billionths - thousandths * 1e6;
  if (rest === 0) return at + KEPT[thousandths];
  const millionths = (rest / 1000) | 0;
  writeGroup(out, at + 3, millionths);
  rest -= millionths * 1000;
  if (rest === 0) return at + 3 + KEPT[millionths];
  writeGroup(out, at + 6, rest);
  return at + 6 + KEPT[rest];
}

function writeText(out: Uint8Array, at: number, text: string): number {
  for (let k = 0; k < text.length; k++) out[at + k] = text.charCodeAt(k);
  return at + text.length;
}

/** Writes `magnitude` / `scale` from `at` on, both whole, `magnitude` in 1 ... 1e15; what JSON.stringify writes. */
function writeRatio(out: Uint8Array, at: number, magnitude: number, scale: number): number {
  // Exact: below 1e15 the quotient is never rounded up to the next whole number.
  const whole = Math.floor(magnitude / scale);
  if (whole > 0x7fffffff || (whole === 0 && magnitude * 1e6 < scale)) {
    return writeText(out, at, String(magnitude / scale));
  }
  const end = writeWhole(out, at, whole | 0);
  const fraction = magnitude - whole * scale;
  if (fraction === 0) return end;
  out[end] = POINT;
  return writeFraction(out, end + 1, (fraction * (1e9 / scale)) | 0);
}

function writeValue(out: Uint8Array, at: number, value: number, scale: number): number {
  const scaled = Math.round(value * scale);
  if (scaled === 0) {
    out[at] = ZERO;
    return at + 1;
  }
  let start = at;
  if (scaled < 0) out[start++] = MINUS;
  const magnitude = Math.abs(scaled);
  if (magnitude < 1e15) return writeRatio(out, start, magnitude, scale);
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
      } else at = writeValue(out, at, value, scale);
      out[at++] = COMMA;
    }
    writer.length = at;
  }
  if (values.length > 0) writer.length--;
  writer.ensure(1);
  writer.bytes[writer.length++] = CLOSE;
}
