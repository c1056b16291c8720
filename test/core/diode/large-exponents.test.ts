import { describe, expect, it } from "vitest";
import type { CircuitParameters } from "../../../service/core/diode/circuit.ts";
import { circuitOf } from "../../../service/core/diode/circuit.ts";
import { currentAt } from "../../../service/core/diode/current.ts";
import { openCircuitVoltage, voltageAtCurrent } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";
import { exactCurrent, exactDiode, exactPeak, exactVoltage } from "../../oracle/forty-digits.ts";

/** Circuits whose junction exponent passes the 709 at which a double's exponential overflows; not of this world. */
const STEEP: CircuitParameters[] = [
  {
    photocurrent: 8,
    logSaturationCurrent: -705,
    idealityVoltage: 0.05,
    seriesResistance: 0.3,
    shuntConductance: 1 / 160,
  },
  { photocurrent: 8, logSaturationCurrent: -705, idealityVoltage: 0.05, seriesResistance: 0, shuntConductance: 0 },
  { photocurrent: 5, logSaturationCurrent: -730, idealityVoltage: 0.05, seriesResistance: 0.1, shuntConductance: 0 },
  {
    photocurrent: 8,
    logSaturationCurrent: -1000,
    idealityVoltage: 0.04,
    seriesResistance: 0.3,
    shuntConductance: 1 / 160,
  },
  { photocurrent: 8, logSaturationCurrent: -1000, idealityVoltage: 0.04, seriesResistance: 0, shuntConductance: 0 },
  {
    photocurrent: 3,
    logSaturationCurrent: -5000,
    idealityVoltage: 0.01,
    seriesResistance: 0.05,
    shuntConductance: 0.01,
  },
];

describe.each(STEEP)("a circuit with ln I0 = $logSaturationCurrent and Rs = $seriesResistance ohm", (parameters) => {
  const circuit = circuitOf(parameters);
  const exact = exactDiode(
    { ...parameters, shuntResistance: 1 / parameters.shuntConductance },
    parameters.logSaturationCurrent,
  );
  const { photocurrent, idealityVoltage: a, logSaturationCurrent, seriesResistance } = parameters;
  const ceiling = a * (Math.log(photocurrent) - logSaturationCurrent);

  it("has the open-circuit voltage of 40-digit arithmetic within 1e-13", () => {
    expect(openCircuitVoltage(circuit) / exactVoltage(exact, 0, ceiling) - 1).toBeCloseTo(0, 13);
  });

  it("has its current at 90 % of the diode's ceiling, and its voltage at half the light, within 1e-12", () => {
    const low = 0.9 * ceiling;
    expect(currentAt(circuit, low) / exactCurrent(exact, low, photocurrent * 0.9) - 1).toBeCloseTo(0, 12);
    const half = photocurrent / 2;
    const start = a * (Math.log(half) - logSaturationCurrent) - half * seriesResistance;
    expect(voltageAtCurrent(circuit, half) / exactVoltage(exact, half, start) - 1).toBeCloseTo(0, 12);
  });

  it("has the maximum power of 40-digit arithmetic within 1e-12", () => {
    const point = { voltage: 0, current: 0, power: 0 };
    maximumPower(circuit, point);
    const knee = a * (Math.log(photocurrent * (a / ceiling)) - logSaturationCurrent);
    const current = photocurrent * (1 - a / ceiling) - knee * parameters.shuntConductance;
    const peak = exactPeak(exact, { voltage: knee - seriesResistance * current, current });
    expect(peak.power).toBeGreaterThan(0);
    expect(point.power / peak.power - 1).toBeCloseTo(0, 12);
  });
});
