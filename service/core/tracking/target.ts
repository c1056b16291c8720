import { conditionIsc, conditionVoc } from "../array/condition.ts";
import { voltageAtCurrent } from "../diode/junction-at-current.ts";
import { emptyPoint } from "../diode/maximum-power.ts";
import type { Sampling, TargetRule } from "../rules/rule.ts";
import { readPower } from "./climber.ts";
import { readingOf, valueReadAs } from "./converter.ts";
import type { Terminals } from "./terminals.ts";

/** What a sample reads in the terminals' condition, through the sensor and regardless of the window: V or A. */
export function readSample(sampling: Sampling, terminals: Terminals): number {
  const { voltageSensor, currentSensor } = terminals.converter;
  switch (sampling.reads) {
    case "open-circuit-voltage":
      return readingOf(voltageSensor, conditionVoc(terminals.condition));
    case "short-circuit-current":
      return readingOf(currentSensor, conditionIsc(terminals.condition));
    case "best-swept-voltage":
      return bestSwept(sampling.points, terminals);
  }
}

/** The voltage (V) of the highest power read at `points` voltages equally spaced over window and [0, Voc]. */
function bestSwept(points: number, terminals: Terminals): number {
  const { trackingMinimumVoltage, trackingMaximumVoltage } = terminals.converter;
  const low = Math.max(0, trackingMinimumVoltage);
  const high = Math.max(low, Math.min(trackingMaximumVoltage, conditionVoc(terminals.condition)));
  const point = emptyPoint();
  let best = low;
  let bestPower = 0;
  for (let k = 0; k < points; k++) {
    const voltage = low + ((high - low) * k) / (points - 1);
    terminals.operate(voltage, point);
    const power = readPower(terminals, point);
    // On a plateau, equal but for rounding, the first voltage stands.
    if (k === 0 || power - bestPower > 1e-12 * Math.abs(bestPower)) {
      best = voltage;
      bestPower = power;
    }
  }
  return best;
}

/**
 * The terminal voltage (V), inside the window, that a target rule wants in the terminals' condition: where its sensor
 * reads what its formula says. A current that the array does not give is sought at 0 V.
 * @param reading what the last sample read, V or A; 0 without sampling
 * @param outside the outside voltage now, V
 */
export function targetVoltage(rule: TargetRule, terminals: Terminals, reading: number, outside: number): number {
  const { voltageSensor, currentSensor } = terminals.converter;
  const wanted = rule.reference(reading, terminals.condition.cellTemperature, outside);
  if (rule.regulates === "voltage") {
    return terminals.clamp(rule.sensed ? valueReadAs(voltageSensor, wanted) : wanted);
  }
  const current = rule.sensed ? valueReadAs(currentSensor, wanted) : wanted;
  if (current >= conditionIsc(terminals.condition)) return terminals.clamp(0);
  return terminals.clamp(Math.max(0, voltageAtCurrent(terminals.condition.circuit, current)));
}
