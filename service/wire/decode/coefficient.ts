/** A coefficient in %/K that a number in another unit probably stands for. */
export interface Guess {
  value: number;
  /** How the number was probably meant. */
  because: string;
}

/** What modules on the market print, %/K: common practice, no source. */
const USUAL_VOLTAGE = { from: -0.5, to: -0.2 };
const USUAL_CURRENT = { from: 0.02, to: 0.12 };

const inside = (value: number, range: { from: number; to: number }) => value >= range.from && value <= range.to;

/** Rounded to 3 digits, as one would say it. */
const said = (value: number) => Number(value.toPrecision(3));

function firstUsual(
  readings: readonly [number, string][],
  usual: { from: number; to: number },
  unchanged: number,
): Guess | null {
  for (const [value, because] of readings) {
    if (Number.isFinite(value) && inside(value, usual) && value !== unchanged) return { value: said(value), because };
  }
  return null;
}

/** What an unusual coefficient of the open-circuit voltage probably means: another unit, or a lost sign; null: no idea. */
export function voltageCoefficientGuess(given: number, openCircuitVoltage: unknown): Guess | null {
  const voltage = typeof openCircuitVoltage === "number" ? openCircuitVoltage : Number.NaN;
  const falling = -Math.abs(given);
  const sign = given > 0 ? ", and the voltage falls as the cells warm" : "";
  return firstUsual(
    [
      [falling, `the voltage falls as the cells warm`],
      [100 * falling, `it looks like a fraction per kelvin${sign}`],
      [(100 * falling) / voltage, `it looks like V/K${sign}`],
      [falling / (10 * voltage), `it looks like mV/K${sign}`],
    ],
    USUAL_VOLTAGE,
    given,
  );
}

/** What an unusual coefficient of the short-circuit current probably means; null: no idea. */
export function currentCoefficientGuess(given: number, shortCircuitCurrent: unknown): Guess | null {
  const current = typeof shortCircuitCurrent === "number" ? shortCircuitCurrent : Number.NaN;
  return firstUsual(
    [
      [100 * given, "it looks like a fraction per kelvin"],
      [(100 * given) / current, "it looks like A/K"],
      [given / (10 * current), "it looks like mA/K"],
    ],
    USUAL_CURRENT,
    given,
  );
}
