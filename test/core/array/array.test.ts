import { describe, expect, it } from "vitest";
import type { Layout } from "../../../service/core/array/array.ts";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { conditionIsc, conditionVoc, emptyCondition, enterCondition } from "../../../service/core/array/condition.ts";
import { emptyTrace, maximumPowerTrace } from "../../../service/core/array/maximum-power-trace.ts";
import { currentAt } from "../../../service/core/diode/current.ts";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import { bisect, referenceCurrent, referenceOpenCircuit, referencePeak } from "../../oracle/diode-equation.ts";
import { randomModule, randomWeather } from "../../oracle/random-modules.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import type { ReferenceModule } from "../../oracle/weather-circuit.ts";
import { moduleInWeather } from "../../oracle/weather-circuit.ts";
import { VILLALVA, VILLALVA_SOLVED } from "../module/paper-modules.ts";
import { parametersFrom } from "../module/reference-parameters.ts";

/**
 * Terminal current of an array behind its wiring, from the module's own curve alone: each string carries its share,
 * each module its share of the voltage before the wiring.
 */
function terminalCurrent(module: ReferenceModule, weather: [number, number], layout: Layout, voltage: number): number {
  const circuit = moduleInWeather(module, ...weather);
  const { modulesInSeries, stringsInParallel, wiringResistance } = layout;
  const surplus = (current: number): number =>
    stringsInParallel * referenceCurrent(circuit, (voltage + current * wiringResistance) / modulesInSeries) - current;
  return bisect((current) => surplus(current) > 0, 0, stringsInParallel * circuit.photocurrent);
}

describe("an array behind its wiring", () => {
  const random = seededRandom(31);
  const trials = Array.from({ length: 300 }, () => {
    const module = randomModule(random);
    const weather = randomWeather(random);
    const [modulesInSeries, stringsInParallel] = [random.whole(1, 20), random.whole(1, 12)];
    const resistance = referenceOpenCircuit(moduleInWeather(module, 1000, 25)) / module.photocurrent;
    const scale = (resistance * modulesInSeries) / stringsInParallel;
    const layout = { modulesInSeries, stringsInParallel, wiringResistance: random.between(0, 0.05) * scale };
    const condition = emptyCondition();
    enterCondition(condition, photovoltaicArray(singleDiodeModule(parametersFrom(module)), layout), ...weather);
    return { module, weather, layout, condition, share: random.next() };
  });

  it("gives the current of its modules at any voltage of its terminals, within 1e-9 of the light's", () => {
    for (const { module, weather, layout, condition, share } of trials) {
      const voltage = share * 0.999 * conditionVoc(condition);
      const error = Math.abs(currentAt(condition.circuit, voltage) - terminalCurrent(module, weather, layout, voltage));
      expect(error / condition.circuit.photocurrent).toBeLessThan(1e-9);
    }
  });

  it("has the open-circuit voltage of its modules in series, whatever the wiring", () => {
    for (const { module, weather, layout, condition } of trials) {
      const voc = layout.modulesInSeries * referenceOpenCircuit(moduleInWeather(module, ...weather));
      expect(Math.abs(conditionVoc(condition) / voc - 1)).toBeLessThan(1e-10);
    }
  });

  it("is short-circuited at its terminals, not at its modules", () => {
    for (const { module, weather, layout, condition } of trials) {
      const error = Math.abs(conditionIsc(condition) - terminalCurrent(module, weather, layout, 0));
      expect(error / condition.circuit.photocurrent).toBeLessThan(1e-9);
    }
  });
});

describe("the solved circuit of Villalva's module in an array", () => {
  const module = singleDiodeModule(VILLALVA_SOLVED);

  it("multiplies voltage by modules and current by strings, its datasheet being the standard point", () => {
    const { standard } = photovoltaicArray(module, { modulesInSeries: 12, stringsInParallel: 3, wiringResistance: 2 });
    const sheet = VILLALVA.datasheet!;
    expect(standard.maximumPowerVoltage / (12 * sheet.maximumPowerVoltage)).toBeCloseTo(1, 8);
    expect(standard.maximumPowerCurrent / (3 * sheet.maximumPowerCurrent)).toBeCloseTo(1, 8);
    expect(standard.maximumPower / (36 * 200.143)).toBeCloseTo(1, 8);
    expect(standard.openCircuitVoltage / (12 * sheet.openCircuitVoltage)).toBeCloseTo(1, 8);
    expect(standard.shortCircuitCurrent / (3 * sheet.shortCircuitCurrent)).toBeCloseTo(1, 8);
    expect(standard.openCircuitVoltageCoefficient / (12 * sheet.voltageCoefficientVPerK)).toBeCloseTo(1, 8);
  });

  it("loses in its wiring what the same series resistance would cost inside", () => {
    const wire = { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0.2 };
    const trace = emptyTrace(1);
    maximumPowerTrace(photovoltaicArray(module, wire), Float64Array.of(1000), Float64Array.of(25), trace);
    const reference = referencePeak({
      ...VILLALVA.solved!,
      seriesResistance: VILLALVA.solved!.seriesResistance + 0.2,
    });
    expect(Math.abs(trace.power[0] / reference.power - 1)).toBeLessThan(1e-10);
    expect(trace.power[0]).toBeLessThan(190);
  });

  it("traces its translated points sample by sample within 1e-8, and 0 in the dark", () => {
    const rows = VILLALVA.translated!;
    const trace = emptyTrace(rows.length + 1);
    const irradiance = Float64Array.from([...rows.map((row) => row.irradiance), 0]);
    const cellTemperature = Float64Array.from([...rows.map((row) => row.cellTemperature), 10]);
    const layout = { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 };
    maximumPowerTrace(photovoltaicArray(module, layout), irradiance, cellTemperature, trace);
    for (const [i, row] of rows.entries()) {
      expect(Math.abs(trace.power[i] / row.maximumPower - 1)).toBeLessThan(1e-8);
      expect(Math.abs(trace.voltage[i] / row.maximumPowerVoltage - 1)).toBeLessThan(1e-8);
    }
    expect([trace.voltage.at(-1), trace.current.at(-1), trace.power.at(-1)]).toEqual([0, 0, 0]);
  });
});
