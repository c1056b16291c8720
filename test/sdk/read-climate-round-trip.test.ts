import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { ReadClimate } from "../../sdk/src/index.ts";
import { ClimateFileError, readClimate } from "../../sdk/src/index.ts";

/** One way to write a file down. */
const dialects = fc.record({
  delimiter: fc.constantFrom(",", ";", "\t", " "),
  decimal: fc.constantFrom(".", ","),
  lineEnd: fc.constantFrom("\n", "\r\n", "\r"),
  quoted: fc.boolean(),
  mark: fc.constantFrom("", "\uFEFF"),
  comment: fc.constantFrom("", '# "made up; by the test,\n', "\n"),
  lastLineEnd: fc.boolean(),
  ownOffset: fc.boolean(),
  asBytes: fc.boolean(),
  pieces: fc.array(fc.integer({ min: 1, max: 40 }), { minLength: 1, maxLength: 5 }),
});
type Dialect = typeof dialects extends fc.Arbitrary<infer D> ? D : never;

const value = fc.oneof(
  fc.double({ min: -998, max: 9998, noNaN: true }),
  fc.double({ min: -1e-3, max: 1e-3, noNaN: true }),
  fc.integer({ min: -998, max: 9998 }),
  fc.constant(Number.NaN),
);
const climates = fc.record({
  rows: fc.array(fc.tuple(value, value, value), { minLength: 1, maxLength: 20 }),
  start: fc.integer({ min: Date.UTC(1951, 0) / 1000, max: Date.UTC(2098, 0) / 1000 }),
  step: fc.integer({ min: 1, max: 86_400 }),
  offset: fc.integer({ min: -14 * 60, max: 14 * 60 }),
});

function offsetText(minutes: number): string {
  const size = Math.abs(minutes);
  return `${minutes < 0 ? "-" : "+"}${String(Math.trunc(size / 60)).padStart(2, "0")}:${String(size % 60).padStart(2, "0")}`;
}

function clockText(seconds: number, offset: number): string {
  return new Date((seconds + offset * 60) * 1000).toISOString().slice(0, 19);
}

function* cut(bytes: Uint8Array, { pieces, asBytes }: Dialect): Generator<string | Uint8Array> {
  const text = asBytes ? bytes : new TextDecoder("utf-8", { ignoreBOM: true }).decode(bytes);
  let at = 0;
  for (let turn = 0; at < text.length; turn += 1) {
    const end = at + pieces[turn % pieces.length];
    yield text.slice(at, end);
    at = end;
  }
}

/** Where a comma both separates and marks decimals only quotes tell; the first row shows the decimal mark for certain. */
function write(climate: { rows: number[][]; start: number; step: number; offset: number }, dialect: Dialect): string {
  const { delimiter, decimal, lineEnd, mark, comment, lastLineEnd, ownOffset } = dialect;
  const quoted = dialect.quoted || delimiter === decimal || delimiter === " ";
  const field = (text: string) => (quoted && text !== "-9999.9" ? `"${text}"` : text);
  const number = (x: number) =>
    Number.isNaN(x) ? "-9999.9" : (Object.is(x, -0) ? "-0" : String(x)).replace(".", decimal);
  const suffix = ownOffset ? offsetText(climate.offset) : "";
  const header = ["time", "Plane of Array Irradiance [W/m2]", "wind speed", "ambient temperature [°C]"];
  const lines = climate.rows.map((row, index) => {
    const stamp = clockText(climate.start + index * climate.step, climate.offset) + suffix;
    return [stamp, ...row.map(number)].map(field).join(delimiter);
  });
  const body = [header.map(field).join(delimiter), ...lines].join(lineEnd);
  return mark + comment.replaceAll("\n", lineEnd) + body + (lastLineEnd ? lineEnd : "");
}

describe("columns written as CSV in any dialect", () => {
  it("are read back to the last bit, in whatever pieces they come", async () => {
    const property = fc.asyncProperty(climates, dialects, async (climate, dialect) => {
      const rows = [[0.5, 0.5, 0.5], ...climate.rows];
      const bytes = new TextEncoder().encode(write({ ...climate, rows }, dialect));
      const utcOffset = dialect.ownOffset ? undefined : offsetText(climate.offset);
      const read = await readClimate(cut(bytes, dialect), { missing: ["-9999.9"], utcOffset });
      const column = (index: number) => Float64Array.from(rows, (row) => row[index]);
      expect(read).toEqual({
        start: clockText(climate.start, climate.offset) + offsetText(climate.offset),
        step: climate.step,
        timing: "mean",
        gaps: "refuse",
        irradiance: { kind: "plane-of-array", values: column(0) },
        temperature: { kind: "ambient", values: column(2), windSpeed: column(1) },
      });
    });
    await fc.assert(property, { seed: 20250601, numRuns: 500 });
  });
});

describe("text of any kind", () => {
  const HEADER = "time;plane of array irradiance;cell temperature\n";
  const scraps = fc.constantFrom(
    ...[
      '"',
      ";",
      ",",
      "\t",
      " ",
      "\n",
      "\r",
      "#",
      "\uFEFF",
      "\0",
      "1",
      "2.5",
      "-",
      "time",
      "2025-01-01T00:00Z",
      "2025-01-01T01:00Z",
    ],
  );
  const text = fc.array(fc.oneof(scraps, fc.string({ unit: "binary", maxLength: 3 })), { maxLength: 40 });

  it("is either read, its columns of one length, or refused with a reason on a line that it has", async () => {
    const refused = { count: 0 };
    const property = fc.asyncProperty(fc.boolean(), text, async (withHeader, parts) => {
      const file = (withHeader ? HEADER : "") + parts.join("");
      const read = await readClimate(file, { step: 3600 }).catch((error: unknown) => error);
      if (!(read instanceof ClimateFileError)) {
        const { irradiance, temperature } = read as ReadClimate;
        expect(irradiance.values.length).toBe(temperature.values.length);
        return;
      }
      refused.count += 1;
      expect(read.reason.length).toBeGreaterThan(20);
      expect(read.line ?? 1).toBeGreaterThan(0);
      expect(read.line ?? 1).toBeLessThanOrEqual(file.split(/\r\n|\n|\r/).length);
    });
    await fc.assert(property, { seed: 20250602, numRuns: 3000 });
    expect(refused.count).toBeGreaterThan(1000);
  });
});
