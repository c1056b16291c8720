import { describe, expect, it } from "vitest";
import { emptyCircuit } from "../../../service/core/diode/circuit.ts";
import { currentAt, shortCircuitCurrent } from "../../../service/core/diode/current.ts";
import { openCircuitVoltage } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import optimum from "../../fixtures/optimum-fractions.json" with { type: "json" };
import printed from "../../fixtures/test-generator.json" with { type: "json" };
import { referenceCurrent, referenceOpenCircuit, referencePeak } from "../../oracle/diode-equation.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import type { Technology } from "../../oracle/weather-circuit.ts";
import { generatorInWeather, nominalOpenCircuit } from "../../oracle/weather-circuit.ts";

const GENERATOR = { maximumPower: 1000, maximumPowerVoltage: 100 };

function solved(technology: Technology, irradiance: number, cellTemperature: number) {
  const circuit = emptyCircuit();
  testGeneratorModule({ technology, ...GENERATOR }).circuitAt(irradiance, cellTemperature, circuit);
  const peak = { voltage: 0, current: 0, power: 0 };
  maximumPower(circuit, peak);
  return { circuit, peak, voc: openCircuitVoltage(circuit), isc: shortCircuitCurrent(circuit) };
}

describe.each(printed.rows)("the standard's test generator, $technology", (row) => {
  const technology = row.technology as Technology;
  const fraction = optimum.rows.find((one) => one.technology === technology)!.fraction;
  const nominal = nominalOpenCircuit({ technology, ...GENERATOR });

  it("has a true open-circuit voltage a printed ratio above its nominal one", () => {
    const { circuit, voc } = solved(technology, 1000, 25);
    const uoc = circuit.idealityVoltage / (technology === "thin-film" ? 0.28 / Math.log(5) : 0.2 / Math.log(10));
    expect(voc / uoc).toBeCloseTo(row.trueOverNominal, technology === "thin-film" ? 6 : 7);
    expect(Math.abs(100 * (1 - uoc / nominal) - row.belowStandardPercent)).toBeLessThan(0.0051);
  });

  it("states voltage steps in the nominal open-circuit voltage, U over the voltage fill factor", () => {
    expect(testGeneratorModule({ technology, ...GENERATOR }).standardOpenCircuitVoltage).toBeCloseTo(nominal, 10);
  });

  it.each([1, 20, 200, 1000, 1500])("has its peak at the printed share of the open-circuit voltage at %d W/m2", (g) => {
    const { peak, voc } = solved(technology, g, 25);
    expect(Math.abs(peak.voltage / voc - fraction)).toBeLessThan(6e-7);
  });

  it("agrees with the independent solver in 200 random weathers within 1e-10", () => {
    const random = seededRandom(50530);
    for (let trial = 0; trial < 200; trial++) {
      const [irradiance, cellTemperature] = [random.logBetween(1e-3, 1500), random.between(-40, 90)];
      const reference = generatorInWeather({ technology, ...GENERATOR }, irradiance, cellTemperature);
      const { circuit, peak, voc, isc } = solved(technology, irradiance, cellTemperature);
      expect(Math.abs(peak.power / referencePeak(reference).power - 1)).toBeLessThan(1e-10);
      expect(Math.abs(voc / referenceOpenCircuit(reference) - 1)).toBeLessThan(1e-10);
      expect(Math.abs(isc / referenceCurrent(reference, 0) - 1)).toBeLessThan(1e-10);
      const voltage = random.between(0, voc);
      const error = Math.abs(currentAt(circuit, voltage) - referenceCurrent(reference, voltage));
      expect(error / reference.photocurrent).toBeLessThan(1e-10);
    }
  });

  it("is dark without irradiance", () => {
    expect(solved(technology, 0, 25).peak).toEqual({ voltage: 0, current: 0, power: 0 });
  });
});

describe("a crystalline silicon test generator asked for 100 V", () => {
  it("has its peak at 99.709 V in fact, to the printed digits", () => {
    expect(solved("crystalline-silicon", 1000, 25).peak.voltage).toBeCloseTo(printed.rows[0].peakOf100V!, 3);
  });
});
