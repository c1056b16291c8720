import { describe, expect, it } from "vitest";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import steady from "../../fixtures/incremental-conductance-steady.json" with { type: "json" };
import { incrementalMeanPower } from "../../oracle/climbing-simulation.ts";
import { powerCurve } from "../../oracle/power-curve.ts";
import type { Technology } from "../../oracle/weather-circuit.ts";
import { generatorInWeather, nominalOpenCircuit } from "../../oracle/weather-circuit.ts";
import { printFinding } from "../finding.ts";
import { steadyPoint } from "./steady-run.ts";

const kind = "incremental-conductance";
const FREE = { lowest: 0, highest: Infinity, mostPower: Infinity, mostCurrent: Infinity, ripple: 0 };

/** Settings tried against the simulation: steps, and tolerances that rest, hardly rest and never rest. */
const SETTINGS = [
  { stepFraction: 0.01, holdTolerance: 0.1, currentTolerance: 1e-3 },
  { stepFraction: 0.005, holdTolerance: 0.05, currentTolerance: 1e-3 },
  { stepFraction: 0.02, holdTolerance: 0.2, currentTolerance: 1e-3 },
  { stepFraction: 0.01, holdTolerance: 0.01, currentTolerance: 1e-3 },
  { stepFraction: 0.01, holdTolerance: 0, currentTolerance: 0 },
  { stepFraction: 0.01, holdTolerance: 0.5, currentTolerance: 0.05 },
  { stepFraction: 0.03, holdTolerance: 0, currentTolerance: 1e-3 },
];

describe.each(steady.rows)("incremental conductance at rest on the $technology test generator", (row) => {
  const generator = { technology: row.technology as Technology, maximumPower: 1000, maximumPowerVoltage: 100 };
  const module = testGeneratorModule(generator);

  it(`loses ${row.loss} of the power at 1000 W/m2 with a step of 1 % and its defaults, to 2 % of the loss`, () => {
    const { efficiency } = steadyPoint(module, [1000, 25], { kind, settings: {} });
    expect(Math.abs((1 - efficiency) / row.loss - 1)).toBeLessThan(0.02);
  });

  it.each(SETTINGS)("agrees with the rule simulated from open circuit on its way down, %j, within 1e-9", (settings) => {
    for (const [irradiance, cellTemperature] of [
      [1000, 25],
      [300, 50],
      [40, -10],
    ] as const) {
      const curve = powerCurve(generatorInWeather(generator, irradiance, cellTemperature), FREE);
      const step = settings.stepFraction * nominalOpenCircuit(generator);
      const loss = 1 - incrementalMeanPower(curve, { ...settings, step }) / curve.pmp;
      const { efficiency } = steadyPoint(module, [irradiance, cellTemperature], { kind, settings });
      expect(Math.abs(1 - efficiency - loss)).toBeLessThan(1e-9);
    }
  });

  it("prints its loss", () => {
    const { efficiency } = steadyPoint(module, [1000, 25], { kind, settings: {} });
    printFinding(`Incremental conductance at rest, ${row.technology}`, { lost: 1 - efficiency, expected: row.loss });
    expect(efficiency).toBeLessThan(1);
  });
});
