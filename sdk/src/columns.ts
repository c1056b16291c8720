/** How columns arrive: `"plain"` as `number[]` with null where skipped, `"typed"` as Float64Array with NaN where skipped. */
export type ColumnKind = "plain" | "typed";

/** A column in a request. NaN in a typed array is sent as null (a gap); a plain array says null itself. */
export type Column = readonly (number | null)[] | Float64Array | Float32Array;

/** Where a column stands in an answer: member names from the root, `"*"` for every element or member. */
export type ColumnPath = readonly string[];

/** `T` as it may be sent: every array of numbers may be a {@link Column}. */
export type Sent<T> = T extends Float64Array | Float32Array
  ? T
  : T extends readonly (infer E)[]
    ? number extends T["length"]
      ? [E] extends [number | null]
        ? Column
        : readonly Sent<E>[]
      : T
    : T extends object
      ? { [K in keyof T]: Sent<T[K]> }
      : T;

/** `T` with every array of numbers as a Float64Array; tuples stay as they are. */
export type Typed<T> = T extends readonly (infer E)[]
  ? number extends T["length"]
    ? [E] extends [number | null]
      ? Float64Array
      : Typed<E>[]
    : T
  : T extends object
    ? { [K in keyof T]: Typed<T[K]> }
    : T;

/** `T` as a client with the column option `C` receives it. */
export type Received<T, C extends ColumnKind> = C extends "typed" ? Typed<T> : T;

/**
 * Replaces the arrays at `paths` inside `answer`, in place, by Float64Array (null becomes NaN) and returns `answer`.
 * Absent members, nulls and anything that is not an array are left alone. Throws TypeError, naming the place, when such
 * an array holds something that is neither a number nor null. Linear in the length of the columns.
 */
export function typeColumns(answer: unknown, paths: readonly ColumnPath[]): unknown {
  const root = { answer };
  for (const path of paths) replaceAt(root, ["answer", ...path], 0);
  return root.answer;
}

function replaceAt(parent: object, path: ColumnPath, depth: number): void {
  const members = parent as Record<string, unknown>;
  for (const key of path[depth] === "*" ? Object.keys(members) : [path[depth]]) {
    if (!Object.hasOwn(members, key)) continue;
    const value = members[key];
    if (depth + 1 < path.length) {
      if (typeof value === "object" && value !== null) replaceAt(value, path, depth + 1);
    } else if (Array.isArray(value)) {
      members[key] = toTyped(value, path);
    }
  }
}

function toTyped(values: readonly unknown[], path: ColumnPath): Float64Array {
  const column = new Float64Array(values.length);
  for (let index = 0; index < values.length; index += 1) {
    const value = values[index];
    if (typeof value !== "number" && value !== null) {
      throw new TypeError(`/${path.slice(1).join("/")}/${index} is neither a number nor null`);
    }
    column[index] = value ?? Number.NaN;
  }
  return column;
}
