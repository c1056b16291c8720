import type { PhotovoltaicArray } from "../array/array.ts";
import type { Condition } from "../array/condition.ts";
import { emptyCondition, enterCondition } from "../array/condition.ts";
import type { Circuit } from "../diode/circuit.ts";
import { CUBIC_CHECKS, CUBIC_NODES, cubicAt, fitCubic, sumCubic } from "../numeric/cubic.ts";

/** A straight piece of the weather inside one sample: time s, irradiance W/m2, cell temperature degC. */
export interface Piece {
  from: number;
  to: number;
  fromIrradiance: number;
  toIrradiance: number;
  fromTemperature: number;
  toTemperature: number;
}

/** Quantities of the array along a stretch, each a cubic: the circuit's, then the maximum power point's. */
const ARRAY_QUANTITIES = 9;
const MAXIMUM = 6;
/** Tolerance of each, and the quantity by whose largest value it is scaled; ln I0 is taken absolutely. */
const TOLERANCES = [1e-9, 5e-8, 1e-9, 1e-8, 1e-9, 1e-9, 1e-6, 1e-6, 3e-8];
const SCALED_BY = [0, -1, 2, 3, 4, 0, 6, 7, 8];
const POINTS = CUBIC_NODES.length + CUBIC_CHECKS.length;
const SHARES = [...CUBIC_NODES, ...CUBIC_CHECKS];

/** What a caller wants as cubics beside the array's own: writes `count` values of a condition from `offset` on. */
export interface Followed {
  readonly count: number;
  /** Largest error of each value, relative to the array's maximum power; 0 for those not to be checked. */
  readonly tolerances: readonly number[];
  write(condition: Condition, place: { time: number }, values: Float64Array, offset: number): void;
}

/**
 * A piece of the weather short enough for cubics: circuit, maximum power point and whatever else is followed are
 * cubics of time, within 3e-8 of the maximum power. The nodes solve the array exactly; three checks between them decide.
 */
export class Stretch {
  readonly condition = emptyCondition();
  from = 0;
  length = 0;
  private readonly array: PhotovoltaicArray;
  private readonly followed: Followed;
  private readonly values: Float64Array;
  private readonly coefficients: Float64Array;
  private readonly sample: Float64Array;

  constructor(array: PhotovoltaicArray, followed: Followed) {
    const quantities = ARRAY_QUANTITIES + followed.count;
    this.array = array;
    this.followed = followed;
    this.values = new Float64Array(quantities * POINTS);
    this.coefficients = new Float64Array(quantities * 4);
    this.sample = new Float64Array(quantities);
  }

  /** Fits the cubics between two times of a piece; false where they would not be exact enough. */
  fit(piece: Piece, from: number, to: number): boolean {
    this.from = from;
    this.length = to - from;
    const place = { time: 0 };
    for (let k = 0; k < POINTS; k++) {
      place.time = from + SHARES[k] * this.length;
      enterPiece(this.condition, this.array, piece, place.time);
      if (this.condition.circuit.photocurrent <= 0) return false;
      this.read(place);
      for (let q = 0; q < this.sample.length; q++) this.values[q * POINTS + k] = this.sample[q];
    }
    for (let q = 0; q < this.sample.length; q++) {
      fitCubic(this.values, q * POINTS, this.coefficients, q * 4);
      if (!this.holds(q)) return false;
    }
    return true;
  }

  private read(place: { time: number }): void {
    const { circuit, maximum } = this.condition;
    const { sample } = this;
    sample[0] = circuit.photocurrent;
    sample[1] = circuit.logSaturationCurrent;
    sample[2] = circuit.idealityVoltage;
    sample[3] = circuit.shuntConductance;
    sample[4] = circuit.seriesResistance;
    sample[5] = circuit.saturationCurrent;
    sample[MAXIMUM] = maximum.voltage;
    sample[MAXIMUM + 1] = maximum.current;
    sample[MAXIMUM + 2] = maximum.power;
    this.followed.write(this.condition, place, sample, ARRAY_QUANTITIES);
  }

  private holds(quantity: number): boolean {
    const { values } = this;
    const at = quantity * POINTS;
    const followed = quantity - ARRAY_QUANTITIES;
    const tolerance = followed >= 0 ? this.followed.tolerances[followed] : TOLERANCES[quantity];
    if (tolerance === 0) return true;
    const scaledBy = followed >= 0 ? MAXIMUM + 2 : SCALED_BY[quantity];
    let scale = scaledBy < 0 ? 1 : 0;
    if (scaledBy >= 0) for (let k = 0; k < 4; k++) scale = Math.max(scale, Math.abs(values[scaledBy * POINTS + k]));
    for (let c = 0; c < CUBIC_CHECKS.length; c++) {
      const error = cubicAt(this.coefficients, quantity * 4, CUBIC_CHECKS[c]) - values[at + CUBIC_NODES.length + c];
      if (!(Math.abs(error) <= tolerance * scale)) return false;
    }
    return true;
  }

  /** Writes the circuit at a time (s) of the stretch. */
  circuitAt(time: number, circuit: Circuit): void {
    const s = (time - this.from) / this.length;
    const c = this.coefficients;
    circuit.photocurrent = c[0] + s * (c[1] + s * (c[2] + s * c[3]));
    circuit.logSaturationCurrent = c[4] + s * (c[5] + s * (c[6] + s * c[7]));
    circuit.idealityVoltage = c[8] + s * (c[9] + s * (c[10] + s * c[11]));
    circuit.shuntConductance = c[12] + s * (c[13] + s * (c[14] + s * c[15]));
    circuit.seriesResistance = c[16] + s * (c[17] + s * (c[18] + s * c[19]));
    circuit.saturationCurrent = c[20] + s * (c[21] + s * (c[22] + s * c[23]));
  }

  /** The followed quantity `index` at a time (s). */
  followedAt(index: number, time: number): number {
    return cubicAt(this.coefficients, 4 * (ARRAY_QUANTITIES + index), (time - this.from) / this.length);
  }

  /** The sum of the followed quantity `index` over `count` equally spaced times (s). */
  sumFollowed(index: number, times: Times): number {
    return sumCubic(this.coefficients, 4 * (ARRAY_QUANTITIES + index), this.shares(times));
  }

  /** The sums of voltage, current and power of the maximum power point over equally spaced times. */
  sumMaximum(index: 0 | 1 | 2, times: Times): number {
    return sumCubic(this.coefficients, 4 * (MAXIMUM + index), this.shares(times));
  }

  /** Voltage, current or power of the maximum power point at a time (s). */
  maximumAt(index: 0 | 1 | 2, time: number): number {
    return cubicAt(this.coefficients, 4 * (MAXIMUM + index), (time - this.from) / this.length);
  }

  private shares({ first, spacing, count }: Times): Times {
    return { first: (first - this.from) / this.length, spacing: spacing / this.length, count };
  }
}

/** Equally spaced times: the first, s; their spacing, s; how many. */
export interface Times {
  first: number;
  spacing: number;
  count: number;
}

/** Solves the array in the weather of a piece at a time (s). */
export function enterPiece(condition: Condition, array: PhotovoltaicArray, piece: Piece, time: number): void {
  const share = (time - piece.from) / (piece.to - piece.from);
  const irradiance = piece.fromIrradiance + share * (piece.toIrradiance - piece.fromIrradiance);
  enterCondition(condition, array, Math.max(0, irradiance), temperatureAt(piece, time));
}

/** Cell temperature of a piece at a time, degC. */
export function temperatureAt(piece: Piece, time: number): number {
  const share = (time - piece.from) / (piece.to - piece.from);
  return piece.fromTemperature + share * (piece.toTemperature - piece.fromTemperature);
}
