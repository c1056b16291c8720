import { describe, expect, it } from "vitest";
import { circuitOf } from "../../../service/core/diode/circuit.ts";
import { currentAt, currentsAt, shortCircuitCurrent } from "../../../service/core/diode/current.ts";
import { openCircuitVoltage } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";
import measured from "../../fixtures/measured-curves.json" with { type: "json" };

/** The constants that the literature built these parameter sets with (CODATA 1998). */
const OLD_BOLTZMANN = 1.3806503e-23;
const OLD_CHARGE = 1.60217646e-19;

const rootMeanSquare = (values: number[]): number =>
  Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

describe.each(measured.rows)("the published circuit of the $name (Easwarakhanthan et al. 1986)", (curve) => {
  const { published, points, keyPoints } = curve;
  const cells = published.idealityTimesCells ?? published.ideality! * curve.cellsInSeries;
  const idealityVoltage = (cells * OLD_BOLTZMANN * (curve.temperature + 273.15)) / OLD_CHARGE;
  const circuit = circuitOf({
    photocurrent: published.photocurrent,
    logSaturationCurrent: Math.log(published.saturationCurrent),
    idealityVoltage,
    seriesResistance: published.seriesResistance,
    shuntConductance: 1 / published.shuntResistance,
  });

  it("gives every model current within 1e-10 A, beyond both ends of the curve too", () => {
    for (const { voltage, modelCurrent } of points) {
      expect(Math.abs(currentAt(circuit, voltage) - modelCurrent)).toBeLessThan(1e-10);
    }
  });

  it("gives the same currents in a batch, to the bit", () => {
    const voltage = Float64Array.from(points, (point) => point.voltage);
    const current = new Float64Array(points.length);
    currentsAt(circuit, voltage, current);
    expect([...current]).toEqual(points.map((point) => currentAt(circuit, point.voltage)));
  });

  it("gives the key points within 1e-12 of the current and the power, 1e-8 of the peak's place", () => {
    const point = { voltage: 0, current: 0, power: 0 };
    maximumPower(circuit, point);
    expect(shortCircuitCurrent(circuit) / keyPoints.shortCircuitCurrent - 1).toBeCloseTo(0, 12);
    expect(openCircuitVoltage(circuit) / keyPoints.openCircuitVoltage - 1).toBeCloseTo(0, 12);
    expect(point.power / keyPoints.maximumPower - 1).toBeCloseTo(0, 12);
    expect(Math.abs(point.voltage / keyPoints.maximumPowerVoltage - 1)).toBeLessThan(1e-8);
    expect(Math.abs(point.current / keyPoints.maximumPowerCurrent - 1)).toBeLessThan(1e-8);
  });

  it("misses the measured currents by the published root mean square, within 1e-8 A", () => {
    const errors = points.map((point) => currentAt(circuit, point.voltage) - point.measuredCurrent);
    expect(Math.abs(rootMeanSquare(errors) - curve.rmseExact)).toBeLessThan(1e-8);
  });

  it("misses them by the other published figure when the measured current stands on both sides", () => {
    const errors = points.map(({ voltage, measuredCurrent }) => {
      const junction = voltage + measuredCurrent * circuit.seriesResistance;
      const diode = circuit.saturationCurrent * (Math.exp(junction / circuit.idealityVoltage) - 1);
      return circuit.photocurrent - diode - junction * circuit.shuntConductance - measuredCurrent;
    });
    expect(Math.abs(rootMeanSquare(errors) - curve.rmseImplicit)).toBeLessThan(1e-8);
  });
});
