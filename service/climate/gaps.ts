import { ClimateError } from "./climate-error.ts";

/**
 * What to do about missing samples (NaN in a column): refuse them, leave them out of every sum, or fill gaps of at most
 * so many seconds (missing samples times step) along a straight line and leave out longer ones.
 */
export type GapPolicy = "refuse" | "skip" | { readonly interpolateUpTo: number };

/** Columns after the gap policy. */
export interface GapsClosed {
  /** In the order given; a column without a filled gap is the very array that came in. */
  columns: Float64Array[];
  /** 1 where every column has a value, 0 elsewhere; null where all samples are usable. */
  used: Uint8Array | null;
  /** Samples that interpolation made usable, and samples that stay unusable. */
  filled: number;
  skipped: number;
}

function firstMissing(column: Float64Array): number {
  for (let i = 0; i < column.length; i++) if (Number.isNaN(column[i])) return i;
  return -1;
}

/**
 * A copy of `column` whose gaps of at most `longest` samples between two values are filled along a straight line; gaps at
 * either end and longer ones stay NaN. The column itself where nothing was filled. Linear interpolation; no source needed.
 */
export function bridgeGaps(column: Float64Array, longest: number): Float64Array {
  let out = column;
  let before = -1;
  for (let i = 0; i < column.length; i++) {
    if (Number.isNaN(column[i])) continue;
    const missing = i - before - 1;
    if (before >= 0 && missing > 0 && missing <= longest) {
      if (out === column) out = column.slice();
      const slope = (column[i] - column[before]) / (i - before);
      for (let k = before + 1; k < i; k++) out[k] = column[before] + slope * (k - before);
    }
    before = i;
  }
  return out;
}

/** 1 where all columns have a value, 0 elsewhere, and how many are 0. */
function usable(columns: readonly Float64Array[], length: number): { used: Uint8Array; skipped: number } {
  const used = new Uint8Array(length).fill(1);
  for (const column of columns) for (let i = 0; i < length; i++) if (Number.isNaN(column[i])) used[i] = 0;
  let skipped = 0;
  for (let i = 0; i < length; i++) skipped += 1 - used[i];
  return { used, skipped };
}

/**
 * Applies `policy` to named columns of equal length, one sample each `step` seconds, in which NaN marks a missing value.
 *
 * Throws {@link ClimateError} `missing-samples`, naming column and first index, under "refuse". Interpolation works
 * column by column. Input columns are never written to. Empty columns have no gaps.
 */
export function closeGaps(
  columns: Readonly<Record<string, Float64Array>>,
  step: number,
  policy: GapPolicy,
): GapsClosed {
  const given = Object.entries(columns);
  const gaps = given.map(([, column]) => firstMissing(column));
  const first = gaps.findIndex((at) => at >= 0);
  if (first < 0) return { columns: given.map(([, column]) => column), used: null, filled: 0, skipped: 0 };
  if (policy === "refuse") {
    const [name] = given[first];
    throw new ClimateError(
      "missing-samples",
      `${name} has no value at sample ${gaps[first]}: fill it, or choose to skip gaps or to interpolate them.`,
      name,
      gaps[first],
    );
  }
  const before = usable(
    given.map(([, column]) => column),
    given[0][1].length,
  );
  if (policy === "skip")
    return { columns: given.map(([, column]) => column), used: before.used, filled: 0, skipped: before.skipped };
  const longest = Math.floor(policy.interpolateUpTo / step + 1e-9);
  const bridged = given.map(([, column]) => bridgeGaps(column, longest));
  const after = usable(bridged, bridged[0].length);
  return {
    columns: bridged,
    used: after.skipped > 0 ? after.used : null,
    filled: before.skipped - after.skipped,
    skipped: after.skipped,
  };
}
