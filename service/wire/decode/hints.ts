import { currentCoefficientGuess, voltageCoefficientGuess } from "./coefficient.ts";
import type { Path } from "./schema-at.ts";
import { valueAt } from "./schema-at.ts";

/** A value that was refused, and where. */
interface Refused {
  value: unknown;
  path: Path;
  root: unknown;
  unit: string;
  /** The lowest and the highest that would do. */
  minimum: number;
  maximum: number;
}

/** What was probably meant by a number outside its range, as a sentence; "" where there is no idea. */
export function rangeHint(refused: Refused): string {
  const { value } = refused;
  if (typeof value !== "number") return "";
  const member = String(refused.path.findLast((step) => typeof step === "string"));
  const parent = valueAt(refused.root, refused.path.slice(0, -1));
  switch (member) {
    case "openCircuitVoltageCoefficient":
      return guessed(voltageCoefficientGuess(value, valueAt(parent, ["openCircuitVoltage"])));
    case "shortCircuitCurrentCoefficient":
      return guessed(currentCoefficientGuess(value, valueAt(parent, ["shortCircuitCurrent"])));
    case "photocurrentCoefficient":
      return guessed(currentCoefficientGuess(value, photocurrentOf(parent)));
    case "step":
      return value < 1 || value > 86_400 ? " The step is in seconds: an hour is 3600, 15 minutes are 900." : "";
    case "azimuth":
      return value < 0 ? " It is counted clockwise from north: east is 90, south 180, west 270." : "";
    case "latitude":
      return Math.abs(Number(valueAt(parent, ["longitude"]))) <= 90 ? " Were latitude and longitude swapped?" : "";
    default:
      return unitHint(value, refused);
  }
}

function guessed(guess: { value: number; because: string } | null): string {
  return guess === null ? "" : ` Did you mean ${guess.value} %/K? (${guess.because}.)`;
}

/** The photocurrent of a circuit, or about that of a measured curve, A. */
function photocurrentOf(module: unknown): unknown {
  const current = valueAt(module, ["current"]);
  if (!Array.isArray(current)) return valueAt(module, ["photocurrent"]);
  return current.reduce(
    (most: number, value: unknown) => (typeof value === "number" && value > most ? value : most),
    0,
  );
}

function unitHint(value: number, { unit, minimum, maximum, root, path }: Refused): string {
  if (unit === "degC" && value > 170 && value < 430) return " It looks like kelvin: subtract 273.15.";
  if (unit === "W/m2" && value > 0 && value < minimum && value <= 2) {
    return ` If it is in kW/m2, write ${Number((1000 * value).toPrecision(12))}.`;
  }
  if (unit === "W/m2" && value > 2000) return energyHint(value, valueAt(root, [...path.slice(0, -3), "step"]));
  if ((unit === "A" || unit === "V") && value > maximum && value > 500) return ` If it is in m${unit}, divide by 1000.`;
  if (unit.startsWith("1") && value > maximum && value / 100 <= maximum && maximum <= 1) {
    return ` Did you mean ${value / 100}? It is a share, not a percentage.`;
  }
  return "";
}

/** Sums of energy in the place of irradiance: J/m2 a step. */
function energyHint(value: number, step: unknown): string {
  if (typeof step !== "number" || !(value / step <= 1500)) return "";
  return ` If it is the energy of a step in J/m2, divide by the step of ${step} s.`;
}
