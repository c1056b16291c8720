import type { Condition } from "../array/condition.ts";
import { conditionVoc } from "../array/condition.ts";
import { currentAt, powerSlopeAt } from "../diode/current.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { bracketedRoot } from "../numeric/bracketed-root.ts";
import { GAUSS_16 } from "../numeric/gauss-legendre.ts";

/** A voltage that swings as centre (1 + amplitude sin phi), but not below the floor that a current limit sets, V. */
export interface Ripple {
  centre: number;
  amplitude: number;
  floor: number;
}

/** The phase at which the swing passes a voltage (V), within the half cycle [-pi/2, pi/2] that the other half repeats. */
function phaseAt(voltage: number, { centre, amplitude }: Ripple): number {
  return Math.asin(Math.min(1, Math.max(-1, (voltage / centre - 1) / amplitude)));
}

/** Calls `visit` with the weight and voltage of 16 Gauss points over the arc between floor and open circuit. */
function overArc(condition: Condition, ripple: Ripple, visit: (weight: number, voltage: number) => void): void {
  const from = phaseAt(ripple.floor, ripple);
  const half = Math.max(0, phaseAt(conditionVoc(condition), ripple) - from) / 2;
  for (let k = 0; k < GAUSS_16.nodes.length; k++) {
    const swing = Math.sin(from + half * (1 + GAUSS_16.nodes[k]));
    visit((GAUSS_16.weights[k] * 2 * half) / Math.PI, ripple.centre * (1 + ripple.amplitude * swing));
  }
}

/**
 * Writes the centre and the mean current and power of a lit array over a ripple: beyond open circuit nothing is
 * delivered, at the floor the current is the limit's. Accuracy: 1e-12 of the maximum power, amplitudes up to 0.5.
 */
export function meanOverRipple(condition: Condition, ripple: Ripple, point: OperatingPoint): void {
  const { circuit } = condition;
  point.voltage = ripple.centre;
  point.current = point.power = 0;
  if (ripple.centre <= 0) {
    point.current = Math.max(0, currentAt(circuit, 0));
    return;
  }
  overArc(condition, ripple, (weight, voltage) => {
    const current = Math.max(0, currentAt(circuit, voltage));
    point.current += weight * current;
    point.power += weight * current * voltage;
  });
  if (ripple.floor <= ripple.centre * (1 - ripple.amplitude)) return;
  const held = phaseAt(ripple.floor, ripple) / Math.PI + 0.5;
  const current = Math.max(0, currentAt(circuit, ripple.floor));
  point.current += held * current;
  point.power += held * current * ripple.floor;
}

/** The centre (V) of a ripple with the highest mean power: where the mean of (1 + r sin phi) dP/dV is 0. */
export function ripplePeak(condition: Condition, amplitude: number, floor: number): number {
  const { circuit, maximum } = condition;
  const slope = (centre: number): number => {
    let sum = 0;
    overArc(condition, { centre, amplitude, floor }, (weight, voltage) => {
      sum += weight * (voltage / centre) * powerSlopeAt(circuit, voltage);
    });
    return sum;
  };
  const peak = bracketedRoot(slope, maximum.voltage / (1 + amplitude), maximum.voltage / (1 - amplitude));
  return Math.max(floor, Number.isNaN(peak) ? maximum.voltage : peak);
}
