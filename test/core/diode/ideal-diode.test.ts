import { describe, expect, it } from "vitest";
import { circuitOf } from "../../../service/core/diode/circuit.ts";
import { openCircuitVoltage } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";
import ideal from "../../fixtures/ideal-diode.json" with { type: "json" };
import normalised from "../../fixtures/normalised-ideal-diode.json" with { type: "json" };

const relative = (ours: number, theirs: number): number => Math.abs(ours / theirs - 1);

describe("a diode without resistances (exact by the Lambert W function)", () => {
  it.each(ideal.rows)("has its peak within 1e-12 at $photocurrent A and a = $idealityVoltage V", (row) => {
    const circuit = circuitOf({
      photocurrent: row.photocurrent,
      logSaturationCurrent: Math.log(row.saturationCurrent),
      idealityVoltage: row.idealityVoltage,
      seriesResistance: 0,
      shuntConductance: 0,
    });
    const point = { voltage: 0, current: 0, power: 0 };
    maximumPower(circuit, point);
    expect(relative(openCircuitVoltage(circuit), row.openCircuitVoltage)).toBeLessThan(1e-12);
    expect(relative(point.voltage, row.maximumPowerVoltage)).toBeLessThan(1e-12);
    expect(relative(point.current, row.maximumPowerCurrent)).toBeLessThan(1e-12);
    expect(relative(point.power, row.maximumPower)).toBeLessThan(1e-12);
  });

  it.each(normalised.rows)("has the known ratios where Voc is $voc a, to six digits", (row) => {
    const circuit = circuitOf({
      photocurrent: 1,
      logSaturationCurrent: -Math.log(Math.expm1(row.voc)),
      idealityVoltage: 1,
      seriesResistance: 0,
      shuntConductance: 0,
    });
    const point = { voltage: 0, current: 0, power: 0 };
    maximumPower(circuit, point);
    const digits = 5.1e-7;
    expect(Math.abs(openCircuitVoltage(circuit) - row.voc)).toBeLessThan(1e-12);
    expect(Math.abs(point.voltage / row.voc - row.vmpOverVoc)).toBeLessThan(digits);
    expect(Math.abs(point.current - row.impOverIsc)).toBeLessThan(digits);
    expect(Math.abs(point.power / row.voc - row.fillFactor)).toBeLessThan(digits);
  });
});
