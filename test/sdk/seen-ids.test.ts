import { setFlagsFromString } from "node:v8";
import { runInNewContext } from "node:vm";
import { describe, expect, it } from "vitest";
import { SeenIds } from "../../sdk/src/portfolio/seen-ids.ts";

setFlagsFromString("--expose_gc");
const collectGarbage = runInNewContext("gc") as () => void;

describe("SeenIds", () => {
  it("takes every id in once and then tells where it was", () => {
    const seen = new SeenIds();
    const count = 50_000;
    for (let index = 0; index < count; index += 1) expect(seen.add(`stage ${index}`, index)).toBeNull();
    for (let index = 0; index < count; index += 7) expect(seen.add(`stage ${index}`, count + index)).toBe(index);
    expect(seen.add("", 3 * count)).toBeNull();
    expect(seen.add("", 4 * count)).toBe(3 * count);
  });

  it("keeps ids apart that differ in case, in blanks or in how a letter is composed", () => {
    const seen = new SeenIds();
    for (const [index, id] of ["Heron", "heron", "heron ", "h\u00e9ron", "he\u0301ron"].entries()) {
      expect(seen.add(id, index)).toBeNull();
    }
  });

  it("holds at most 60 bytes an id, however long", async () => {
    const held = () => {
      collectGarbage();
      return process.memoryUsage().arrayBuffers;
    };
    const count = 200_000;
    const long = "x".repeat(1000);
    const before = held();
    const seen = new SeenIds();
    for (let index = 0; index < count; index += 1) seen.add(`${long}${index}`, index);
    // The collector frees what digests and outgrown tables held in its own time.
    await expect.poll(() => held() - before, { timeout: 5000 }).toBeLessThan(60 * count);
    // This is where they are held at all.
    expect(held() - before).toBeGreaterThan(10 * count);
    expect(seen.add(`${long}0`, count)).toBe(0);
  });
});
