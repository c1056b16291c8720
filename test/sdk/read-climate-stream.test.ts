import { createReadStream } from "node:fs";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Readable } from "node:stream";
import { setFlagsFromString } from "node:v8";
import { runInNewContext } from "node:vm";
import { describe, expect, it } from "vitest";
import { readClimate } from "../../sdk/src/index.ts";

const HEADER = "time;plane of array irradiance;cell temperature;remark\n";
const MINUTE = 60_000;

/** Row `i` holds the irradiance i mod 1000 + 0.25 and the cell temperature i mod 50. */
function rowOf(index: number, remark = ""): string {
  const stamp = new Date(Date.UTC(2025, 0, 1) + index * MINUTE).toISOString().slice(0, 16);
  return `${stamp}Z;${index % 1000}.25;${index % 50};${remark}\n`;
}

describe("readClimate on a stream", () => {
  it("holds the columns but not the text", { timeout: 20_000 }, async () => {
    setFlagsFromString("--expose-gc");
    const collect = runInNewContext("gc") as () => void;
    const live = () => {
      collect();
      const { heapUsed, arrayBuffers } = process.memoryUsage();
      return heapUsed + arrayBuffers;
    };
    const [samples, rowsAPiece, remark] = [80_000, 400, "x".repeat(270)];
    const before = live();
    let [written, peak] = [HEADER.length, 0];
    async function* pieces() {
      yield HEADER;
      for (let from = 0; from < samples; from += rowsAPiece) {
        const piece = Array.from({ length: rowsAPiece }, (_, row) => rowOf(from + row, remark)).join("");
        written += piece.length;
        yield piece;
        if (from % (20 * rowsAPiece) === 0) peak = Math.max(peak, live());
      }
    }
    const { irradiance } = await readClimate(pieces());
    const values = irradiance.kind === "plane-of-array" ? irradiance.values : new Float64Array();
    expect(values.length).toBe(samples);
    expect(values[79_999]).toBe(999.25);
    expect(written).toBeGreaterThan(23e6);
    // Two columns of 80,000 doubles are 1.3 MB, at most thrice that while they grow; the text is 24 MB.
    expect(peak - before).toBeLessThan(8e6);
  });

  it("reads a file as node streams it", async () => {
    const folder = await mkdtemp(join(tmpdir(), "kneegap-climate-"));
    try {
      const path = join(folder, "climate.csv");
      await writeFile(path, HEADER + Array.from({ length: 5000 }, (_, index) => rowOf(index, "°")).join(""));
      const { start, step, irradiance } = await readClimate(createReadStream(path, { highWaterMark: 997 }));
      expect([start, step]).toEqual(["2025-01-01T00:00:00+00:00", 60]);
      const values = Float64Array.from({ length: 5000 }, (_, index) => (index % 1000) + 0.25);
      expect(irradiance).toEqual({ kind: "plane-of-array", values });
    } finally {
      await rm(folder, { recursive: true });
    }
  });

  it("reads a web stream and a long string as well", async () => {
    const text = HEADER + Array.from({ length: 5000 }, (_, index) => rowOf(index, "\u{1F31E}")).join("");
    const fromText = await readClimate(text);
    const fromWeb = await readClimate(new Blob([text]).stream() as unknown as AsyncIterable<Uint8Array>);
    expect(fromText).toEqual(fromWeb);
    expect(fromText.temperature.values.length).toBe(5000);
    expect(fromText.temperature.values[4999]).toBe(49);
  });

  it("closes the source when a row is refused", async () => {
    let endless = 0;
    const source = Readable.from(
      (function* () {
        yield HEADER;
        for (;;) yield endless++ === 3 ? "2025-01-01T00:03Z;x;5;\n" : rowOf(endless - 1);
      })(),
    );
    await expect(readClimate(source)).rejects.toMatchObject({ code: "number", line: 5, column: 2 });
    expect(source.destroyed).toBe(true);
    expect(endless).toBeLessThan(100);
  });

  it("throws what the source throws", async () => {
    const failure = new Error("the disk is gone");
    const source = (async function* () {
      yield HEADER;
      throw failure;
    })();
    await expect(readClimate(source)).rejects.toBe(failure);
  });

  it("stops at 600,000 samples", { timeout: 20_000 }, async () => {
    let given = 0;
    const source = (function* () {
      yield "plane of array irradiance;cell temperature\n";
      for (; given < 1_000_000; given += 1000) yield "800;41\n".repeat(1000);
    })();
    const reading = readClimate(source, { start: "2025-01-01T00:00Z", step: 60 });
    await expect(reading).rejects.toMatchObject({ code: "too-many-samples", line: 600_002 });
    expect(given).toBe(600_000);
  });

  it("holds no comments, however many come first", async () => {
    const source = (function* () {
      for (let turn = 0; turn < 200; turn += 1) yield "# made up\n".repeat(1000);
      yield `${HEADER}2025-01-01T00:00Z;x;5;\n`;
    })();
    await expect(readClimate(source)).rejects.toMatchObject({ code: "number", line: 200_002, column: 2 });
  });
});
