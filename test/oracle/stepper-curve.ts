import type { ReferenceDiode } from "./diode-equation.ts";

/** A sensor: reading = true (1 + gain) + offset, rounded to `resolution` where that is above 0. V or A. */
export interface PlainSensor {
  gain: number;
  offset: number;
  resolution: number;
}

/** What bounds a rule: V, A, W; Infinity for no bound. */
export interface PlainConverter {
  lowest: number;
  highest: number;
  mostPower: number;
  mostCurrent: number;
  wakePower: number;
  /** Amplitude of the ripple over the voltage. */
  ripple: number;
  voltageSensor: PlainSensor;
  currentSensor: PlainSensor;
}

/** A voltage, a current and a power. */
export interface PlainPoint {
  voltage: number;
  current: number;
  power: number;
}

const HALVINGS = 62;
/** Simpson intervals of an arc of ripple. */
const RIPPLE_INTERVALS = 80;

/** Halves [low, high] until nothing is left of it: where `isLeft` stops to hold. */
function halve(isLeft: (x: number) => boolean, low: number, high: number): number {
  let [left, right] = [low, high];
  for (let step = 0; step < HALVINGS; step++) {
    const middle = (left + right) / 2;
    if (isLeft(middle)) left = middle;
    else right = middle;
  }
  return (left + right) / 2;
}

/** Integral by Simpson's rule; 0 over nothing. */
function simpson(f: (x: number) => number, from: number, to: number): number {
  const width = (to - from) / RIPPLE_INTERVALS;
  if (!(width > 0)) return 0;
  let sum = 0;
  for (let k = 0; k <= RIPPLE_INTERVALS; k++) {
    const weight = k === 0 || k === RIPPLE_INTERVALS ? 1 : 2 + 2 * (k % 2);
    sum += (weight * width * f(from + k * width)) / 3;
  }
  return sum;
}

/** What a sensor reads. */
export function read(sensor: PlainSensor, truth: number): number {
  const bare = truth * (1 + sensor.gain) + sensor.offset;
  return sensor.resolution > 0 ? Math.round(bare / sensor.resolution) * sensor.resolution : bare;
}

/** The truth at which an unrounded sensor reads `reading`, 0 or more. */
export function truthReadAs(sensor: PlainSensor, reading: number): number {
  return Math.max(0, (reading - sensor.offset) / (1 + sensor.gain));
}

/** One circuit on one converter, every answer by bisection of the circuit's own equation. V, A, W. */
export class PlainCurve {
  private readonly of: ReferenceDiode;
  private readonly converter: PlainConverter;
  readonly voc: number;
  readonly vmp: number;
  readonly pmp: number;
  readonly floor: number;

  constructor(of: ReferenceDiode, converter: PlainConverter) {
    this.of = of;
    this.converter = converter;
    const dark = of.idealityVoltage * Math.log1p(of.photocurrent / of.saturationCurrent);
    this.voc = halve((x) => this.atJunction(x) > 0, 0, dark);
    const peak = halve((x) => this.isRisingAt(x), 0, this.voc);
    this.vmp = peak - of.seriesResistance * this.atJunction(peak);
    this.pmp = this.vmp * this.atJunction(peak);
    const isc = this.current(0);
    this.floor = isc > converter.mostCurrent ? this.voltageAt(converter.mostCurrent) : 0;
  }

  /** Current by the junction voltage x = V + I Rs. */
  private atJunction(x: number): number {
    const { photocurrent, saturationCurrent, idealityVoltage, shuntResistance } = this.of;
    return photocurrent - saturationCurrent * Math.expm1(x / idealityVoltage) - x / shuntResistance;
  }

  /** Whether d(V I)/dx > 0 at a junction voltage. */
  private isRisingAt(x: number): boolean {
    const { saturationCurrent, idealityVoltage, seriesResistance, shuntResistance } = this.of;
    const current = this.atJunction(x);
    const slope = -(saturationCurrent / idealityVoltage) * Math.exp(x / idealityVoltage) - 1 / shuntResistance;
    return current * (1 - seriesResistance * slope) + (x - seriesResistance * current) * slope > 0;
  }

  /** What the equation leaves over at a terminal voltage and a current: positive below the curve. */
  private leftOver(voltage: number, current: number): number {
    return this.atJunction(voltage + current * this.of.seriesResistance) - current;
  }

  /** Current at a terminal voltage; 0 beyond open circuit. */
  current(voltage: number): number {
    if (voltage >= this.voc) return 0;
    return halve((current) => this.leftOver(voltage, current) > 0, 0, this.of.photocurrent);
  }

  /** Terminal voltage at a current; 0 where the array does not give as much. */
  voltageAt(current: number): number {
    if (current >= this.current(0)) return 0;
    return halve((voltage) => this.leftOver(voltage, current) > 0, 0, this.voc);
  }

  clamp(voltage: number): number {
    return Math.min(this.converter.highest, Math.max(this.converter.lowest, voltage));
  }

  /** Power within the limits, no ripple. */
  power(voltage: number): number {
    const at = Math.max(voltage, this.floor);
    return Math.min(this.converter.mostPower, at * this.current(at));
  }

  available(): number {
    return this.power(this.vmp);
  }

  /** The most inside the window. */
  best(): number {
    return this.power(this.clamp(this.vmp));
  }

  /**
   * Where the converter stands when asked for a voltage: raised by the current limit; at the power limit right of the
   * peak, where the array gives just that much; under ripple the centre, mean current and mean power of a cycle.
   */
  operate(voltage: number): PlainPoint {
    const { ripple, mostPower } = this.converter;
    const centre = Math.max(voltage, this.floor);
    if (ripple > 0) return this.swing(centre);
    const current = this.current(centre);
    if (centre * current <= mostPower) return { voltage: centre, current, power: centre * current };
    const most = (at: number): boolean => at * this.current(at) > mostPower;
    const curtailed = halve(most, Math.max(centre, this.vmp), this.voc);
    return { voltage: curtailed, current: mostPower / curtailed, power: mostPower };
  }

  /** The mean over half a cycle, which the other half repeats; smooth up to the floor and up to open circuit. */
  private swing(centre: number): PlainPoint {
    const { ripple, mostPower } = this.converter;
    const phase = (voltage: number): number =>
      Math.asin(Math.min(1, Math.max(-1, centre > 0 ? (voltage / centre - 1) / ripple : 1)));
    const [start, open] = [-Math.PI / 2, phase(this.voc)];
    const bend = this.floor > 0 ? Math.min(open, phase(this.floor)) : start;
    const at = (angle: number): number => Math.max(this.floor, centre * (1 + ripple * Math.sin(angle)));
    const mean = (f: (voltage: number) => number): number =>
      (simpson((angle) => f(at(angle)), start, bend) + simpson((angle) => f(at(angle)), bend, open)) / Math.PI;
    const power = mean((voltage) => voltage * this.current(voltage));
    return { voltage: centre, current: mean((voltage) => this.current(voltage)), power: Math.min(mostPower, power) };
  }
}
