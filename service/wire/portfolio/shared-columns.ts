type Column = Float64Array | Uint8Array;

const isColumn = (value: unknown): value is Column => value instanceof Float64Array || value instanceof Uint8Array;

/**
 * Plain data with every column moved into memory that threads share: sent to another thread, the data is copied and its
 * columns are not. A column that stands in two places is moved once. `bytes`: of the shared memory.
 */
export function withSharedColumns<Data>(data: Data): { data: Data; bytes: number } {
  const shared = new Map<Column, Column>();
  let bytes = 0;
  const share = (column: Column): Column => {
    const known = shared.get(column);
    if (known !== undefined) return known;
    const memory = new SharedArrayBuffer(column.byteLength);
    const moved = column instanceof Float64Array ? new Float64Array(memory) : new Uint8Array(memory);
    moved.set(column);
    shared.set(column, moved);
    bytes += memory.byteLength;
    return moved;
  };
  const copy = (value: unknown): unknown => {
    if (isColumn(value)) return share(value);
    if (Array.isArray(value)) return value.map(copy);
    if (typeof value !== "object" || value === null) return value;
    return Object.fromEntries(Object.entries(value).map(([name, member]) => [name, copy(member)]));
  };
  return { data: copy(data) as Data, bytes };
}
