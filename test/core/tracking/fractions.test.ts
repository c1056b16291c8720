import { describe, expect, it } from "vitest";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import type { RuleKind } from "../../../service/core/rules/index.ts";
import fractions from "../../fixtures/fractions-on-test-generator.json" with { type: "json" };
import type { Technology } from "../../oracle/weather-circuit.ts";
import { steadyPoint } from "./steady-run.ts";

const generatorOf = (technology: string) =>
  testGeneratorModule({ technology: technology as Technology, maximumPower: 5000, maximumPowerVoltage: 400 });

describe.each(fractions.rows)("$rule at $fraction on the $technology test generator (EN 50530:2010 Annex C)", (row) => {
  const module = generatorOf(row.technology);
  const kind = row.rule as RuleKind;

  it("keeps the independently derived share of the power at any irradiance, within 1e-5", () => {
    for (const irradiance of [5, 50, 200, 700, 1000, 1400]) {
      const settings = { fraction: row.fraction, pilotCell: true };
      const { efficiency } = steadyPoint(module, [irradiance, 25], { kind, settings });
      expect(Math.abs(efficiency - row.efficiency)).toBeLessThan(1e-5);
    }
  });

  it("charges all it loses to the set point when nothing is interrupted", () => {
    const { causes, lost } = steadyPoint(module, [600, 25], {
      kind,
      settings: { fraction: row.fraction, pilotCell: true },
    });
    expect(causes.setPoint).toBeGreaterThan(0);
    expect(Math.abs(causes.setPoint - lost)).toBeLessThan(1e-12 * lost + 1e-12);
  });
});

describe("sampling", () => {
  const module = generatorOf("crystalline-silicon");

  it("costs .256 s in 16 s exactly: .98893 of the power becomes .97311 (both five digits)", () => {
    const kind = "fractional-open-circuit-voltage";
    const sampled = steadyPoint(module, [1000, 25], { kind, settings: {} });
    const pilot = steadyPoint(module, [1000, 25], { kind, settings: { pilotCell: true } });
    expect(sampled.efficiency).toBeCloseTo(0.97311, 5);
    expect(sampled.efficiency / pilot.efficiency).toBeCloseTo(1 - 0.256 / 16, 14);
    expect(sampled.causes.interruption).toBeCloseTo(0.016 * pilot.efficiency * pilot.available, 9);
  });

  it.each([
    ["short-current-pulse", { fraction: 0.9, sampleDuration: 0.1, samplePeriod: 4 }, 0.025],
    ["power-curve-scan", { sweepDuration: 2, scanPeriod: 600 }, 2 / 600],
    ["power-curve-scan", { sweepDuration: 3, scanPeriod: 60, afterwards: "hold" }, 0.05],
  ] as const)("takes the exact share of the time of %s with %j", (kind, settings, share) => {
    const { causes, power } = steadyPoint(module, [800, 40], { kind, settings });
    expect(causes.interruption / (power[0] + causes.interruption)).toBeCloseTo(share, 14);
  });
});
