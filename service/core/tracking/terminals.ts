import type { Condition } from "../array/condition.ts";
import { conditionIsc, conditionVoc } from "../array/condition.ts";
import { currentAt, powerAt } from "../diode/current.ts";
import { voltageAtCurrent } from "../diode/junction-at-current.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { emptyPoint } from "../diode/maximum-power.ts";
import { bracketedRoot } from "../numeric/bracketed-root.ts";
import type { Converter } from "./converter.ts";
import { meanOverRipple, ripplePeak } from "./ripple.ts";

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
  floor = Number.NaN;
  /** Most the array could deliver within the limits, W. */
  available = Number.NaN;
  /** What the limits cut off the array's maximum, W. */
  clipped = Number.NaN;
  /** The best voltage inside the window, V, and its power, W. */
  bestVoltage = Number.NaN;
  best = Number.NaN;

  constructor(converter: Converter) {
    this.converter = converter;
    this.floor = 0;
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

  /** Writes voltage, mean current and mean power at a voltage, ripple and limits included. */
  operate(voltage: number, point: OperatingPoint): void {
    if (this.converter.rippleAmplitude === 0) {
      this.operateWithoutRipple(voltage, point);
      return;
    }
    this.ripple(voltage, point);
    point.power = Math.min(this.converter.maximumPower, point.power);
  }

  /** Mean over the ripple around a voltage, before the power limit. */
  private ripple(voltage: number, point: OperatingPoint): void {
    const { floor, converter } = this;
    meanOverRipple(
      this.condition,
      { centre: Math.max(voltage, floor), amplitude: converter.rippleAmplitude, floor },
      point,
    );
  }

  /** Where the mean power over the ripple peaks inside the window, V; without ripple the best voltage. */
  operatingPeak(): number {
    const { rippleAmplitude } = this.converter;
    return rippleAmplitude === 0
      ? this.bestVoltage
      : this.clamp(ripplePeak(this.condition, rippleAmplitude, this.floor));
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

  /** Voltages where the operating power, ripple and limits included, has a corner, V. */
  corners(): number[] {
    const { trackingMinimumVoltage, trackingMaximumVoltage, rippleAmplitude: r } = this.converter;
    const voc = conditionVoc(this.condition);
    const corners = [trackingMinimumVoltage, trackingMaximumVoltage, this.floor, ...this.limitCrossings(voc)];
    return [...corners, this.floor / (1 - r), voc / (1 + r), voc / (1 - r)];
  }

  /** Voltages at which the mean power passes the power limit; none where it stays below. */
  private limitCrossings(voc: number): number[] {
    const { maximumPower, rippleAmplitude } = this.converter;
    if (this.condition.maximum.power <= maximumPower) return [];
    const point = emptyPoint();
    const excess = (voltage: number): number => {
      if (rippleAmplitude === 0) return powerAt(this.condition.circuit, voltage) - maximumPower;
      this.ripple(voltage, point);
      return point.power - maximumPower;
    };
    const peak = Math.max(this.floor, ripplePeak(this.condition, rippleAmplitude, this.floor));
    const end = voc / (1 - rippleAmplitude);
    return [bracketedRoot(excess, 0, peak), bracketedRoot(excess, peak, end)].filter((root) => !Number.isNaN(root));
  }
}
