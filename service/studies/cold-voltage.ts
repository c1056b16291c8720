/** Correction of the open-circuit voltage of crystalline silicon, by the lowest expected ambient temperature. */
interface ColdFactor {
  /** Lowest temperature of the row, degC. */
  to: number;
  factor: number;
}

/** NEC table 690.7(A): rows from 24 degC down, each to its lowest whole degree. */
const COLD_FACTORS: readonly ColdFactor[] = [
  { to: 25, factor: 1 },
  { to: 20, factor: 1.02 },
  { to: 15, factor: 1.04 },
  { to: 10, factor: 1.06 },
  { to: 5, factor: 1.08 },
  { to: 0, factor: 1.1 },
  { to: -5, factor: 1.12 },
  { to: -10, factor: 1.14 },
  { to: -15, factor: 1.16 },
  { to: -20, factor: 1.18 },
  { to: -25, factor: 1.2 },
  { to: -30, factor: 1.21 },
  { to: -35, factor: 1.23 },
  { to: -40, factor: 1.25 },
];

/**
 * The published factor by which the open-circuit voltage of crystalline silicon rises at `temperature` (degC): that of
 * the row it lies in, between rows the colder one; 1 at 25 degC and above; null below -40 degC, where only the module's
 * own coefficient serves. Source: NEC table 690.7(A).
 */
export function coldFactor(temperature: number): number | null {
  return COLD_FACTORS.find(({ to }) => temperature >= to)?.factor ?? null;
}

/** Voc (1 + beta (t - 25)): the module's own coefficient, linear as datasheets state it. `coefficient` in 1/K. */
export function coldVoltageByCoefficient(openCircuitVoltage: number, coefficient: number, temperature: number): number {
  return openCircuitVoltage * (1 + coefficient * (temperature - 25));
}

/** The most modules in series that stay at or below a rating, V; `moduleVoltage` V each. */
export function mostInSeries(rating: number, moduleVoltage: number): number {
  return Math.floor(rating / moduleVoltage);
}
