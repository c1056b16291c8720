import { describe, expect, it } from "vitest";
import { encodeBody } from "../../sdk/src/encode-body.ts";
import { EncodingError } from "../../sdk/src/errors/encoding-error.ts";

const context = { requestId: "a", attempts: 0 };
const encode = (body: unknown) => Buffer.from(encodeBody(body, "application/json", context)).toString();

// Expected texts are JSON as RFC 8259 writes it; pointers as in RFC 6901.
describe("encodeBody", () => {
  it("writes typed columns as arrays, with null for NaN", () => {
    expect(encode({ values: Float64Array.of(1.5, Number.NaN, 0.1) })).toBe('{"values":[1.5,null,0.1]}');
    expect(encode({ a: { b: [{ values: Float32Array.of(0.5, -2) }] } })).toBe('{"a":{"b":[{"values":[0.5,-2]}]}}');
    expect(encode({ values: new Float64Array(0) })).toBe('{"values":[]}');
  });

  it("writes plain columns with their nulls, and leaves out what is undefined", () => {
    expect(encode({ values: [1, null, 2], sky: undefined, on: true, text: "é" })).toBe(
      '{"values":[1,null,2],"on":true,"text":"é"}',
    );
  });

  it("writes dates in ISO 8601", () => {
    expect(encode({ start: new Date(0) })).toBe('{"start":"1970-01-01T00:00:00.000Z"}');
  });

  it("leaves the request as it was", () => {
    const request = { values: Float64Array.of(Number.NaN), rows: [{ a: 1 }] };
    encode(request);
    expect(request).toEqual({ values: Float64Array.of(Number.NaN), rows: [{ a: 1 }] });
  });

  const circle: Record<string, unknown> = {};
  circle.self = circle;
  it.each([
    ["NaN outside a typed array", { rule: { fraction: Number.NaN } }, "/rule/fraction"],
    ["NaN in a plain column", { values: [1, Number.NaN] }, "/values/1"],
    ["Infinity in a typed column", { values: Float64Array.of(1, Number.POSITIVE_INFINITY) }, "/values/1"],
    ["Infinity in a plain member", { "a/b~c": Number.NEGATIVE_INFINITY }, "/a~1b~0c"],
    ["a hole in a plain column", { values: Array(2) }, "/values/0"],
    ["a bigint", { price: 12n }, "/price"],
    ["a function", { price: () => 12 }, "/price"],
    ["an array of another kind", { values: Int32Array.of(1) }, "/values"],
    ["a Map", { candidates: new Map() }, "/candidates"],
    ["an invalid date", { start: new Date(Number.NaN) }, "/start"],
    ["nothing", undefined, ""],
  ])("refuses %s and says where", (_, body, pointer) => {
    const call = () => encode(body);
    expect(call).toThrow(EncodingError);
    expect(call).toThrow(expect.objectContaining({ pointer }));
  });

  it("refuses a structure that contains itself", () => {
    expect(() => encode(circle)).toThrow(/nested deeper/);
  });

  it("sends text and bytes of other media types as they are, and nothing else", () => {
    const bytes = Uint8Array.of(1, 2);
    expect(encodeBody(bytes, "application/vnd.apache.arrow.stream", context)).toBe(bytes);
    expect(Buffer.from(encodeBody("a\nb", "application/x-ndjson", context)).toString()).toBe("a\nb");
    expect(() => encodeBody({}, "application/x-ndjson", context)).toThrow(EncodingError);
  });
});
