import { describe, expect, it } from "vitest";
import { emptyCircuit } from "../../../service/core/diode/circuit.ts";
import { currentAt, shortCircuitCurrent } from "../../../service/core/diode/current.ts";
import { openCircuitVoltage, voltageAtCurrent } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import type { ReferenceDiode } from "../../oracle/diode-equation.ts";
import {
  referenceCurrent,
  referenceOpenCircuit,
  referencePeak,
  referenceVoltage,
  residualCurrent,
} from "../../oracle/diode-equation.ts";
import { exactCurrent, exactDiode, exactPeak, exactVoltage } from "../../oracle/forty-digits.ts";
import { randomModule, randomWeather } from "../../oracle/random-modules.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import { moduleInWeather } from "../../oracle/weather-circuit.ts";
import { printFinding } from "../finding.ts";
import { parametersFrom } from "./reference-parameters.ts";

/** Ours and the reference's circuit of the same random module in the same random weather. */
function randomPair(random: ReturnType<typeof seededRandom>) {
  const module = randomModule(random);
  const [irradiance, cellTemperature] = randomWeather(random);
  const circuit = emptyCircuit();
  singleDiodeModule(parametersFrom(module)).circuitAt(irradiance, cellTemperature, circuit);
  return { circuit, reference: moduleInWeather(module, irradiance, cellTemperature), irradiance, cellTemperature };
}

const peakOf = (circuit: ReturnType<typeof emptyCircuit>) => {
  const point = { voltage: 0, current: 0, power: 0 };
  maximumPower(circuit, point);
  return point;
};

/** The worst of each figure, with the case it came from. */
class Worst {
  readonly errors: Record<string, number> = {};
  note(name: string, error: number): void {
    if (!(error <= (this.errors[name] ?? -1))) this.errors[name] = error;
  }
}

describe("2,000 random modules in random weather against bisection in the terminal voltage", () => {
  const random = seededRandom(20240607);
  const worst = new Worst();
  for (let trial = 0; trial < 2000; trial++) {
    const { circuit, reference } = randomPair(random);
    const scale = reference.photocurrent;
    const voc = referenceOpenCircuit(reference);
    worst.note("maximum power", Math.abs(peakOf(circuit).power / referencePeak(reference).power - 1));
    worst.note("open-circuit voltage", Math.abs(openCircuitVoltage(circuit) / voc - 1));
    const isc = referenceCurrent(reference, 0);
    worst.note("short-circuit current", Math.abs(shortCircuitCurrent(circuit) / isc - 1));
    const voltage = random.between(0, 1.05 * voc);
    const current = referenceCurrent(reference, voltage);
    const ours = currentAt(circuit, voltage);
    worst.note("current", Math.abs(ours - current) / (scale + Math.abs(current)));
    if (voltage < voc) worst.note("residual current", Math.abs(residualCurrent(reference, voltage, ours)) / scale);
    const wanted = 0.999 * random.next() * isc;
    worst.note("voltage", Math.abs(voltageAtCurrent(circuit, wanted) - referenceVoltage(reference, wanted)) / voc);
  }

  it("agree in maximum power, open-circuit voltage and short-circuit current within 1e-10", () => {
    expect(worst.errors["maximum power"]).toBeLessThan(1e-10);
    expect(worst.errors["open-circuit voltage"]).toBeLessThan(1e-10);
    expect(worst.errors["short-circuit current"]).toBeLessThan(1e-10);
  });

  it("agree in the current at a random voltage within 1e-10 of the light's, and in the voltage at a random current", () => {
    expect(worst.errors["current"]).toBeLessThan(1e-10);
    expect(worst.errors["voltage"]).toBeLessThan(1e-10);
    printFinding("Worst against bisection, 2,000 random modules (relative)", worst.errors);
  });
});

describe("40 random modules in random weather against 40-digit arithmetic", () => {
  const random = seededRandom(40);
  const worst = new Worst();
  for (let trial = 0; trial < 40; trial++) {
    const { circuit } = randomPair(random);
    // The circuit's own doubles, so that only the solution is compared.
    const reference: ReferenceDiode = { ...circuit, shuntResistance: 1 / circuit.shuntConductance };
    const exact = exactDiode(reference, circuit.logSaturationCurrent);
    const peak = exactPeak(exact, referencePeak(reference));
    const ours = peakOf(circuit);
    worst.note("maximum power", Math.abs(ours.power / peak.power - 1));
    worst.note("maximum power voltage", Math.abs(ours.voltage / peak.voltage - 1));
    const voc = exactVoltage(exact, 0, referenceOpenCircuit(reference));
    worst.note("open-circuit voltage", Math.abs(openCircuitVoltage(circuit) / voc - 1));
    const voltage = random.between(0, voc);
    const current = exactCurrent(exact, voltage, referenceCurrent(reference, voltage));
    worst.note("current", Math.abs(currentAt(circuit, voltage) - current) / reference.photocurrent);
  }

  it("agree in maximum power and open-circuit voltage within 1e-12, in the peak's place within 1e-11", () => {
    expect(worst.errors["maximum power"]).toBeLessThan(1e-12);
    expect(worst.errors["open-circuit voltage"]).toBeLessThan(1e-12);
    expect(worst.errors["maximum power voltage"]).toBeLessThan(1e-11);
  });

  it("agree in the current within 1e-12 of the light's", () => {
    expect(worst.errors["current"]).toBeLessThan(1e-12);
    printFinding("Worst against 40 digits, 40 random modules (relative)", worst.errors);
  });
});
