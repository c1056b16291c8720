import { afterEach, describe, expect, expectTypeOf, it } from "vitest";
import type { Column, Received, Sent, Typed } from "../../sdk/src/columns.ts";
import { typeColumns } from "../../sdk/src/columns.ts";
import { clientOf } from "./fixtures/client-of.ts";
import type { MisbehavingServer } from "./fixtures/misbehaving-server.ts";
import { json, startServer } from "./fixtures/misbehaving-server.ts";
import { REQUEST } from "./fixtures/requests.ts";

describe("typeColumns", () => {
  it("replaces the columns at its paths and nothing else", () => {
    const answer = { traces: { power: [1, null, 3] }, months: [1, 2], results: [{ curve: [4] }, { curve: [] }, {}] };
    const typed = typeColumns(answer, [
      ["traces", "power"],
      ["results", "*", "curve"],
      ["absent", "member"],
    ]);
    expect(typed).toEqual({
      traces: { power: Float64Array.of(1, Number.NaN, 3) },
      months: [1, 2],
      results: [{ curve: Float64Array.of(4) }, { curve: new Float64Array(0) }, {}],
    });
  });

  it("leaves null and an absent branch alone, and takes the answer itself", () => {
    expect(typeColumns({ traces: null }, [["traces", "power"]])).toEqual({ traces: null });
    expect(typeColumns([1, null], [[]])).toEqual(Float64Array.of(1, Number.NaN));
  });

  it("refuses a column that holds something else, and says where", () => {
    expect(() => typeColumns({ a: { b: [1, "2"] } }, [["a", "b"]])).toThrow("/a/b/1 is neither a number nor null");
  });

  it("does not follow a path into inherited members", () => {
    expect(typeColumns({}, [["__proto__", "x"]])).toEqual({});
  });
});

describe("the column types", () => {
  interface Answer {
    power: (number | null)[];
    losses?: number[];
    site: [number, number];
    rows: { curve: number[]; label: string }[] | null;
  }

  it("turn every array of numbers into what is sent or received, and no tuple", () => {
    expectTypeOf<Typed<Answer>>().toEqualTypeOf<{
      power: Float64Array;
      losses?: Float64Array;
      site: [number, number];
      rows: { curve: Float64Array; label: string }[] | null;
    }>();
    expectTypeOf<Received<Answer, "plain">>().toEqualTypeOf<Answer>();
    expectTypeOf<Typed<Answer>>().toExtend<Sent<Answer>>();
    expectTypeOf<Answer>().toExtend<Sent<Answer>>();
    expectTypeOf<Float32Array>().toExtend<Column>();
    expectTypeOf<string[]>().not.toExtend<Column>();
  });
});

describe("a client with typed columns", () => {
  const ANSWER = { traces: { operating: { power: [1.25, null] } } };
  let server: MisbehavingServer;
  afterEach(() => server.close());

  it("receives Float64Array with NaN for null where another receives the plain array", async () => {
    server = await startServer(json(ANSWER));
    const plain = clientOf(server).client;
    const typed = clientOf(server, { columns: "typed" }).client;
    expect(await plain.estimate(REQUEST)).toEqual(ANSWER);
    const { traces } = await typed.estimate(REQUEST);
    expectTypeOf(traces!.operating!.power).toEqualTypeOf<Float64Array>();
    expect(traces!.operating!.power).toEqual(Float64Array.of(1.25, Number.NaN));
    await plain.close();
    await typed.close();
  });

  it("fails when the answer's column is none", async () => {
    server = await startServer(json({ traces: { operating: { power: ["1"] } } }));
    const { client } = clientOf(server, { columns: "typed" });
    await expect(client.estimate(REQUEST)).rejects.toMatchObject({ name: "ProtocolError", status: 200 });
    await client.close();
  });
});
