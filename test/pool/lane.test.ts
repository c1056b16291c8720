import { describe, expect, it } from "vitest";
import { createLane } from "../../service/pool/lane.ts";

describe("a lane", () => {
  it("serves first come, first served, and forgets who leaves", () => {
    const lane = createLane<{ bytes: number; name: string }>(3, 100);
    const [a, b, c] = ["a", "b", "c"].map((name) => ({ name, bytes: 1 }));
    for (const entry of [a, b, c]) expect(lane.add(entry)).toBe(true);
    lane.remove(b);
    expect([lane.next(), lane.next(), lane.next()]).toEqual([a, c, undefined]);
  });

  it("is full at its number and at its bytes, and one more is refused", () => {
    const lane = createLane<{ bytes: number }>(2, 100);
    expect([lane.add({ bytes: 60 }), lane.add({ bytes: 41 }), lane.add({ bytes: 40 }), lane.add({ bytes: 0 })]).toEqual(
      [true, false, true, false],
    );
    lane.next();
    expect(lane.add({ bytes: 60 })).toBe(true);
    expect(lane.length).toBe(2);
  });
});
