import { describe, expect, it } from "vitest";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { emptyTrace, maximumPowerTrace } from "../../../service/core/array/maximum-power-trace.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import constant from "../../fixtures/constant-voltage-on-test-generator.json" with { type: "json" };
import levels from "../../fixtures/static-levels.json" with { type: "json" };
import weighted from "../../fixtures/weighted-efficiencies.json" with { type: "json" };
import { bisect } from "../../oracle/diode-equation.ts";
import { SINGLE, steadyPoint } from "./steady-run.ts";

const MODULE = testGeneratorModule({ technology: "crystalline-silicon", maximumPower: 1000, maximumPowerVoltage: 100 });
const ARRAY = photovoltaicArray(MODULE, SINGLE);

const efficiencyAt = (irradiance: number): number =>
  steadyPoint(MODULE, [irradiance, 25], { kind: "constant-voltage", settings: {} }).efficiency;

const maximumAt = (irradiance: number): number => {
  const trace = emptyTrace(1);
  maximumPowerTrace(ARRAY, Float64Array.of(irradiance), Float64Array.of(25), trace);
  return trace.power[0];
};

/** The irradiance at which the generator's maximum is a percentage of that at 1000 W/m2. */
const irradianceOf = (level: number): number => {
  const wanted = (level / 100) * maximumAt(1000);
  return bisect((irradiance) => maximumAt(irradiance) < wanted, 1, 1500);
};

describe("constant voltage at the maximum power voltage of 1000 W/m2, crystalline silicon test generator", () => {
  it.each(constant.rows)("keeps $efficiency of the power at $irradiance W/m2, within 1e-4", (row) => {
    expect(Math.abs(efficiencyAt(row.irradiance) - row.efficiency)).toBeLessThan(1e-4);
  });

  it.each(levels.rows)("has $level % of its power at $irradiance W/m2 (printed with three decimals)", (row) => {
    expect(Math.abs(irradianceOf(row.level) - row.irradiance)).toBeLessThan(5.01e-4);
  });

  it.each(weighted.rows)(
    "comes to $efficiency by the $weighting weights with levels of $levelsOf, within 1e-4",
    (row) => {
      const sum = row.weights.reduce((total, { level, weight }) => {
        const irradiance = row.levelsOf === "power" ? irradianceOf(level) : 10 * level;
        return total + weight * efficiencyAt(irradiance);
      }, 0);
      expect(Math.abs(sum - row.efficiency)).toBeLessThan(1e-4);
    },
  );
});
