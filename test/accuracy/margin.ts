import type { Figure } from "./check.ts";
import { absoluteTolerance, differenceOf } from "./check.ts";

/**
 * Share of the value below which a difference is rounding: what an exponential or a logarithm that differs in its last
 * bit can move. Smaller differences count as this much, so that the table reads the same on every machine.
 */
const ROUNDING = 5e-14;
/** Margins are told up to this. */
const MOST = 1e6;
const MOST_DIGITS = 10;

/** Tolerance over difference, differences of rounding counted in full; 0 or above, NaN for a figure that is no number. */
function marginOf(figure: Figure): number {
  const scale = figure.kind === "absolute" ? Math.abs(figure.expected) : 1;
  return figure.tolerance / Math.max(differenceOf(figure), ROUNDING * scale, Number.MIN_VALUE);
}

/** The figure of least margin; of equals, by two digits, the first. */
export function worstOf(figures: readonly Figure[]): Figure {
  const rank = (figure: Figure): number => Math.min(MOST, Number(marginOf(figure).toPrecision(2)));
  return figures.reduce((worst, figure) => (rank(figure) < rank(worst) ? figure : worst));
}

/** The margin rounded down to a power of ten. */
export function marginText(figure: Figure): string {
  const margin = marginOf(figure);
  if (!(margin >= 1)) return "missed";
  if (margin >= MOST) return ">= 1e6x";
  const power = [1e5, 1e4, 1000, 100, 10, 1].find((one) => margin >= one)!;
  return `${power >= 1e4 ? power.toExponential().replace("+", "") : power}x`;
}

const exponentOf = (value: number): number => Number(value.toExponential().split("e")[1]);

/** Ours to a hundredth of the tolerance, at most ten digits: what lies below may differ between machines. */
export function oursText(figure: Figure): string {
  const digits = exponentOf(figure.ours) - exponentOf(absoluteTolerance(figure)) + 3;
  return String(Number(figure.ours.toPrecision(Math.min(MOST_DIGITS, Math.max(1, digits)))));
}

/** The expected value to ten digits at most. */
export function expectedText({ expected }: Figure): string {
  return String(Number(expected.toPrecision(MOST_DIGITS)));
}

/** The tolerance, and what it is a share of. */
export function toleranceText({ tolerance, kind }: Figure): string {
  const value = Number(tolerance.toPrecision(3));
  const text = value < 1e-3 ? value.toExponential() : String(value);
  return `${text} ${kind}`;
}
