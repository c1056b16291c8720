/**
 * Reference solutions of I = IL - I0 (exp((V + I Rs)/a) - 1) - (V + I Rs)/Rsh by plain bisection in the terminal
 * voltage and current, slow and of few ideas. Exponents must stay below 709. A, V, ohm, W.
 */
export interface ReferenceDiode {
  photocurrent: number;
  saturationCurrent: number;
  idealityVoltage: number;
  seriesResistance: number;
  /** Infinity for none. */
  shuntResistance: number;
}

/** A voltage, a current and their power. */
export interface ReferencePoint {
  voltage: number;
  current: number;
  power: number;
}

/** The last point at which `isLeft` holds, between `low`, where it does, and `high`, where it does not. */
export function bisect(isLeft: (x: number) => boolean, low: number, high: number): number {
  let [left, right] = [low, high];
  for (let step = 0; step < 2200; step++) {
    const middle = left + (right - left) / 2;
    if (middle <= left || middle >= right) break;
    if (isLeft(middle)) left = middle;
    else right = middle;
  }
  return left;
}

/** What the circuit's equation leaves over at a voltage and a current, A: 0 on the curve, positive below it. */
export function residualCurrent(of: ReferenceDiode, voltage: number, current: number): number {
  const junction = voltage + current * of.seriesResistance;
  const diode = of.saturationCurrent * Math.expm1(junction / of.idealityVoltage);
  return of.photocurrent - diode - junction / of.shuntResistance - current;
}

/** Current at a voltage of 0 or more. */
export function referenceCurrent(of: ReferenceDiode, voltage: number): number {
  if (of.seriesResistance === 0) return residualCurrent(of, voltage, 0);
  const isBelow = (current: number): boolean => residualCurrent(of, voltage, current) > 0;
  if (isBelow(0)) return bisect(isBelow, 0, of.photocurrent);
  return bisect(isBelow, -voltage / of.seriesResistance, 0);
}

/** Voltage at a current between 0 and the photocurrent. */
export function referenceVoltage(of: ReferenceDiode, current: number): number {
  const ceiling = of.idealityVoltage * Math.log1p(of.photocurrent / of.saturationCurrent);
  return bisect((voltage) => residualCurrent(of, voltage, current) > 0, -current * of.seriesResistance, ceiling);
}

/** Open-circuit voltage. */
export function referenceOpenCircuit(of: ReferenceDiode): number {
  return referenceVoltage(of, 0);
}

/** dI/dV at a point of the curve. */
export function referenceSlope(of: ReferenceDiode, voltage: number, current: number): number {
  const junction = voltage + current * of.seriesResistance;
  const conductance =
    (of.saturationCurrent / of.idealityVoltage) * Math.exp(junction / of.idealityVoltage) + 1 / of.shuntResistance;
  return -conductance / (1 + of.seriesResistance * conductance);
}

/** The maximum power point: where d(V I)/dV changes its sign. */
export function referencePeak(of: ReferenceDiode): ReferencePoint {
  const isRising = (voltage: number): boolean => {
    const current = referenceCurrent(of, voltage);
    return current + voltage * referenceSlope(of, voltage, current) > 0;
  };
  const voltage = bisect(isRising, 0, referenceOpenCircuit(of));
  const current = referenceCurrent(of, voltage);
  return { voltage, current, power: voltage * current };
}
