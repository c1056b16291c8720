import { describe, expect, it } from "vitest";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import ripple from "../../fixtures/ripple-loss.json" with { type: "json" };
import { bisect } from "../../oracle/diode-equation.ts";
import type { Technology } from "../../oracle/weather-circuit.ts";
import { steadyPoint } from "./steady-run.ts";

const kind = "constant-voltage";

describe.each(ripple.rows)("a voltage ripple on the $technology test generator held at its peak", (row) => {
  const module = testGeneratorModule({
    technology: row.technology as Technology,
    maximumPower: 1000,
    maximumPowerVoltage: 100,
  });
  const lossAt = (rippleAmplitude: number): number =>
    1 - steadyPoint(module, [1000, 25], { kind, settings: {}, converter: { rippleAmplitude } }).efficiency;

  it(`costs the exact average over a cycle at an amplitude of ${row.amplitude}, within 1e-5`, () => {
    expect(Math.abs(lossAt(row.amplitude) - row.loss)).toBeLessThan(1e-5);
  });

  it("is charged to regulation, nothing else", () => {
    const { causes, lost } = steadyPoint(module, [1000, 25], {
      kind,
      settings: {},
      converter: { rippleAmplitude: 0.05 },
    });
    expect(causes.regulation / lost).toBeCloseTo(1, 12);
  });
});

describe("the published ripple law (Kjaer, Pedersen & Blaabjerg 2005, eq. 1, from memory)", () => {
  it("has 2 % of the power lost at 8.5 % of amplitude, to 0.4 points, crystalline silicon", () => {
    const module = testGeneratorModule({
      technology: "crystalline-silicon",
      maximumPower: 1000,
      maximumPowerVoltage: 100,
    });
    const loss = (rippleAmplitude: number): number =>
      1 - steadyPoint(module, [1000, 25], { kind, settings: {}, converter: { rippleAmplitude } }).efficiency;
    const amplitude = bisect((r) => loss(r) < 0.02, 0.01, 0.2);
    expect(Math.abs(amplitude - 0.085)).toBeLessThan(0.004);
  });
});
