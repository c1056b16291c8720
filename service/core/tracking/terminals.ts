import type { Condition } from "../array/condition.ts";
import { conditionIsc, conditionVoc } from "../array/condition.ts";
import { currentAt, powerAt } from "../diode/current.ts";
import { voltageAtCurrent } from "../diode/junction-at-current.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { bracketedRoot } from "../numeric/bracketed-root.ts";
import { GAUSS_16 } from "../numeric/gauss-legendre.ts";
import type { Converter } from "./converter.ts";

/**
 * The converter's terminals in one weather: the array's power as the converter's limits leave it.
 *
 * A power limit cuts every power; a current limit raises the voltage to where the array no longer gives more (its cost
 * is clipped, with the power limit's). Outside 0 V to open circuit nothing is delivered.
 */
export class Terminals {
  readonly converter: Converter;
  condition!: Condition;
  /** Lowest voltage the current limit allows, V. */
  floor = 0;
  /** Most the array could deliver within the limits, W. */
  available = 0;
  /** What the limits cut off the array's maximum, W. */
  clipped = 0;
  /** The best voltage inside the window, V, and its power, W. */
  bestVoltage = 0;
  best = 0;

  constructor(converter: Converter) {
    this.converter = converter;
  }

  /** Takes on a lit condition. */
  enter(condition: Condition): void {
    const { maximum } = condition;
    const { maximumCurrent, maximumPower } = this.converter;
    this.condition = condition;
    this.floor = 0;
    if (maximumCurrent < Number.POSITIVE_INFINITY && conditionIsc(condition) > maximumCurrent) {
      this.floor = Math.max(0, voltageAtCurrent(condition.circuit, maximumCurrent));
    }
    const unbounded = this.floor > maximum.voltage ? powerAt(condition.circuit, this.floor) : maximum.power;
    this.available = Math.min(maximumPower, unbounded);
    this.clipped = Math.max(0, maximum.power - this.available);
    // The power curve is concave in the voltage, so its best inside the window is the clamped peak.
    this.bestVoltage = this.clamp(maximum.voltage);
    this.best = this.bestVoltage === maximum.voltage ? this.available : this.power(this.bestVoltage);
  }

  /** A voltage (V) moved into the tracking window. */
  clamp(voltage: number): number {
    return Math.min(this.converter.trackingMaximumVoltage, Math.max(this.converter.trackingMinimumVoltage, voltage));
  }

  /** Power within the limits at a voltage without ripple, W. */
  power(voltage: number): number {
    const { circuit } = this.condition;
    return Math.min(this.converter.maximumPower, powerAt(circuit, Math.max(voltage, this.floor)));
  }

  /** Power within the limits at a voltage, averaged over the ripple, W. */
  ripplingPower(voltage: number): number {
    if (this.converter.rippleAmplitude === 0) return this.power(voltage);
    return this.rippling(voltage, { voltage: 0, current: 0, power: 0 }).power;
  }

  /** Writes voltage, mean current and mean power at a voltage, ripple and limits included. */
  operate(voltage: number, point: OperatingPoint): void {
    if (this.converter.rippleAmplitude > 0) this.rippling(voltage, point);
    else this.operateWithoutRipple(voltage, point);
  }

  /** Writes voltage, current and power at a voltage, limits included. */
  operateWithoutRipple(voltage: number, point: OperatingPoint): void {
    point.voltage = Math.max(voltage, this.floor);
    point.current = Math.max(0, currentAt(this.condition.circuit, point.voltage));
    point.power = point.voltage * point.current;
    if (point.power > this.converter.maximumPower) this.curtail(point);
  }

  /** The converter at its power limit stands right of the peak, where the array gives just that much. */
  private curtail(point: OperatingPoint): void {
    const { maximumPower } = this.converter;
    const { circuit, maximum } = this.condition;
    const excess = (voltage: number): number => powerAt(circuit, voltage) - maximumPower;
    point.voltage = bracketedRoot(excess, Math.max(maximum.voltage, point.voltage), conditionVoc(this.condition));
    point.power = maximumPower;
    point.current = maximumPower / point.voltage;
  }

  /**
   * Mean of the curve over v (1 + r sin phi), exact to quadrature: 16 Gauss points in phi over the half cycle, which
   * the other half repeats; where the swing passes open circuit the points end there, since beyond it there is nothing.
   */
  private rippling(voltage: number, point: OperatingPoint): OperatingPoint {
    const { circuit } = this.condition;
    const r = this.converter.rippleAmplitude;
    const centre = Math.max(voltage, this.floor);
    const reach = centre > 0 ? (conditionVoc(this.condition) / centre - 1) / r : 1;
    const end = reach >= 1 ? Math.PI / 2 : Math.asin(Math.max(-1, reach));
    const half = (end + Math.PI / 2) / 2;
    let power = 0;
    let current = 0;
    for (let k = 0; k < GAUSS_16.nodes.length; k++) {
      const at = centre * (1 + r * Math.sin(-Math.PI / 2 + half * (1 + GAUSS_16.nodes[k])));
      const amperes = Math.max(0, currentAt(circuit, at));
      current += GAUSS_16.weights[k] * amperes;
      power += GAUSS_16.weights[k] * amperes * at;
    }
    const share = (2 * half) / Math.PI;
    point.voltage = centre;
    point.current = current * share;
    point.power = Math.min(this.converter.maximumPower, power * share);
    return point;
  }

  /** Voltages where the power curve within window and limits has a corner, V. */
  corners(): number[] {
    const { trackingMinimumVoltage, trackingMaximumVoltage, maximumPower } = this.converter;
    const { circuit, maximum } = this.condition;
    const voc = conditionVoc(this.condition);
    const corners = [trackingMinimumVoltage, trackingMaximumVoltage, this.floor, voc];
    if (maximum.power > maximumPower) {
      const excess = (voltage: number): number => powerAt(circuit, voltage) - maximumPower;
      corners.push(bracketedRoot(excess, 0, maximum.voltage), bracketedRoot(excess, maximum.voltage, voc));
    }
    return corners;
  }
}
