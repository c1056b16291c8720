import type { OperatingPoint } from "../diode/maximum-power.ts";

/** Sums over the control periods of one sample, in W (V, A) times periods. */
export interface Tally {
  available: number;
  clipped: number;
  best: number;
  fresh: number;
  held: number;
  operating: number;
  /** Operating power times its interrupted share. */
  interrupted: number;
  voltage: number;
  /** Delivered current, interruptions counted. */
  current: number;
  /** Periods awake. */
  lit: number;
  /** Voltage, current and power of the array's maximum, shape [3]. */
  readonly maximum: Float64Array;
  /** Periods in the light. */
  sunlit: number;
  /** Least and most voltage and delivered power of a period; kept only when `keepsExtremes`. */
  readonly keepsExtremes: boolean;
  leastVoltage: number;
  mostVoltage: number;
  leastPower: number;
  mostPower: number;
}

/** Nothing yet. Its sums begin as fractions, for the reason given at `emptyCircuit`. */
export function emptyTally(keepsExtremes: boolean): Tally {
  const tally: Tally = {
    available: 0.5,
    clipped: 0.5,
    best: 0.5,
    fresh: 0.5,
    held: 0.5,
    operating: 0.5,
    interrupted: 0.5,
    voltage: 0.5,
    current: 0.5,
    lit: 0.5,
    maximum: new Float64Array(3),
    sunlit: 0.5,
    keepsExtremes,
    leastVoltage: 0.5,
    mostVoltage: 0.5,
    leastPower: 0.5,
    mostPower: 0.5,
  };
  clearTally(tally);
  return tally;
}

/** Back to nothing. */
export function clearTally(tally: Tally): void {
  tally.available = tally.clipped = tally.best = tally.fresh = tally.held = 0;
  tally.operating = tally.interrupted = tally.voltage = tally.current = tally.lit = 0;
  tally.maximum.fill(0);
  tally.sunlit = 0;
  tally.leastVoltage = tally.leastPower = Number.POSITIVE_INFINITY;
  tally.mostVoltage = tally.mostPower = Number.NEGATIVE_INFINITY;
}

/** Adds the operating point of a period (or `weight` of it), of which a share `interrupted` delivers nothing. */
export function tallyPoint(tally: Tally, point: OperatingPoint, weight: number, interrupted: number): void {
  tally.operating += weight * point.power;
  tally.interrupted += weight * interrupted * point.power;
  tally.voltage += weight * point.voltage;
  tally.current += weight * (1 - interrupted) * point.current;
  tally.lit += weight;
  if (tally.keepsExtremes) stretchExtremes(tally, point.voltage, (1 - interrupted) * point.power);
}

/** Widens the extremes to a period's voltage (V) and delivered power (W). */
export function stretchExtremes(tally: Tally, voltage: number, power: number): void {
  tally.leastVoltage = Math.min(tally.leastVoltage, voltage);
  tally.mostVoltage = Math.max(tally.mostVoltage, voltage);
  tally.leastPower = Math.min(tally.leastPower, power);
  tally.mostPower = Math.max(tally.mostPower, power);
}
