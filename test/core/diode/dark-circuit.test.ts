import { describe, expect, it } from "vitest";
import { circuitOf, emptyCircuit } from "../../../service/core/diode/circuit.ts";
import { powerAt, shortCircuitCurrent } from "../../../service/core/diode/current.ts";
import { openCircuitVoltage } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";

const DARK = [
  { name: "the empty circuit", circuit: emptyCircuit() },
  {
    name: "a module without light",
    circuit: circuitOf({
      photocurrent: 0,
      logSaturationCurrent: Math.log(4.3e-10),
      idealityVoltage: 1.39,
      seriesResistance: 0.335,
      shuntConductance: 1 / 160,
    }),
  },
  {
    name: "an ideal diode without light",
    circuit: circuitOf({
      photocurrent: 0,
      logSaturationCurrent: -21,
      idealityVoltage: 1.5,
      seriesResistance: 0,
      shuntConductance: 0,
    }),
  },
];

describe.each(DARK)("in the dark, $name", ({ circuit }) => {
  it("gives nothing at any voltage, and every figure is 0 rather than NaN", () => {
    const point = { voltage: 1, current: 1, power: 1 };
    maximumPower(circuit, point);
    expect(point).toEqual({ voltage: 0, current: 0, power: 0 });
    expect(openCircuitVoltage(circuit)).toBe(0);
    expect(shortCircuitCurrent(circuit)).toBe(0);
    for (const voltage of [0, 0.1, 10, 40]) expect(powerAt(circuit, voltage)).toBe(0);
  });
});
