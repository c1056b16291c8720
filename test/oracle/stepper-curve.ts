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

const HALVINGS = 62;
/** Simpson intervals of half a ripple cycle. */
const RIPPLE_INTERVALS = 160;

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

  /** Mean current and mean power within the limits over a cycle of ripple. */
  swung(voltage: number): { current: number; power: number } {
    const { ripple, mostPower } = this.converter;
    const centre = Math.max(voltage, this.floor);
    if (ripple === 0) return { current: this.current(centre), power: this.power(voltage) };
    const reach = centre > 0 ? (this.voc / centre - 1) / ripple : 1;
    const end = Math.asin(Math.min(1, Math.max(-1, reach)));
    const width = (end + Math.PI / 2) / RIPPLE_INTERVALS;
    let [current, power] = [0, 0];
    for (let k = 0; k <= RIPPLE_INTERVALS; k++) {
      const at = centre * (1 + ripple * Math.sin(k * width - Math.PI / 2));
      const here = this.current(at);
      const simpson = k === 0 || k === RIPPLE_INTERVALS ? 1 : 2 + 2 * (k % 2);
      current += (simpson * here * width) / 3 / Math.PI;
      power += (simpson * here * at * width) / 3 / Math.PI;
    }
    return { current, power: Math.min(mostPower, power) };
  }
}
