/** One number of ours beside the one it should be. */
export interface Figure {
  name: string;
  expected: number;
  ours: number;
  /** Above 0. */
  tolerance: number;
  /** Whether the tolerance is a share of the expected value or stands in its unit. */
  kind: "relative" | "absolute";
}

/** A line of the accuracy table: figures that share a source and a tolerance. */
export interface Check {
  topic: string;
  title: string;
  /** Of the expected values; "from memory" and "common practice, no source" are kept in it. */
  source: string;
  figures(): Figure[];
}

/** Something worth knowing that is neither right nor wrong. */
export interface Finding {
  title: string;
  source: string;
  /** One sentence a line. */
  lines(): string[];
}

/** A figure whose tolerance is a share of the expected value, which is not 0. */
export function relative(name: string, expected: number, ours: number, tolerance: number): Figure {
  return { name, expected, ours, tolerance, kind: "relative" };
}

/** A figure whose tolerance stands in its own unit. */
export function absolute(name: string, expected: number, ours: number, tolerance: number): Figure {
  return { name, expected, ours, tolerance, kind: "absolute" };
}

/** A figure whose expected value was printed with so many decimals: half of the last one is allowed. */
export function printed(name: string, expected: number, ours: number, decimals: number): Figure {
  return absolute(name, expected, ours, 0.5 * 10 ** -decimals);
}

/** How far ours lies from the expected value, in the sense of the figure's tolerance. NaN goes through. */
export function differenceOf({ expected, ours, kind }: Figure): number {
  return kind === "absolute" ? Math.abs(ours - expected) : Math.abs((ours - expected) / expected);
}

/** The figure's tolerance in its own unit. */
export function absoluteTolerance({ expected, tolerance, kind }: Figure): number {
  return kind === "absolute" ? tolerance : tolerance * Math.abs(expected);
}

const computed = new WeakMap<Check, Figure[]>();

/** The figures of a check, computed once. */
export function figuresOf(check: Check): Figure[] {
  const known = computed.get(check) ?? check.figures();
  computed.set(check, known);
  return known;
}
