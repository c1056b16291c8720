import { describe, expect, it } from "vitest";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { conditionVoc, emptyCondition, enterCondition } from "../../../service/core/array/condition.ts";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import type { Converter } from "../../../service/core/tracking/converter.ts";
import { Terminals } from "../../../service/core/tracking/terminals.ts";
import { threeLevelOrbit } from "../../../service/core/tracking/three-level-orbit.ts";
import { VILLALVA_SOLVED } from "../module/paper-modules.ts";
import { OPEN_CONVERTER, SINGLE } from "./steady-run.ts";

const MODULES = [
  { name: "crystalline silicon test generator", technology: "crystalline-silicon" },
  { name: "thin-film test generator", technology: "thin-film" },
] as const;

const CASES = [
  { name: "solved circuit of Villalva's module", module: singleDiodeModule(VILLALVA_SOLVED) },
  ...MODULES.map(({ name, technology }) => ({
    name,
    module: testGeneratorModule({ technology, maximumPower: 200, maximumPowerVoltage: 26 }),
  })),
];

/** 20,000 centres, each with its three levels at 25, 50, 25 %: every level clamped, power 0 beyond open circuit. */
function denseMean(
  terminals: Terminals,
  peak: number,
  step: number,
): { voltage: number; current: number; power: number } {
  const sum = { voltage: 0, current: 0, power: 0 };
  const point = { voltage: 0, current: 0, power: 0 };
  const centres = 20_000;
  for (let k = 0; k < centres; k++) {
    const centre = peak + step * ((k + 0.5) / centres - 0.5);
    for (const [offset, weight] of [
      [-step, 0.25],
      [0, 0.5],
      [step, 0.25],
    ]) {
      terminals.operate(terminals.clamp(centre + offset), point);
      sum.voltage += (weight * point.voltage) / centres;
      sum.current += (weight * point.current) / centres;
      sum.power += (weight * point.power) / centres;
    }
  }
  return sum;
}

describe.each(CASES)("the three-level orbit on the $name", ({ module }) => {
  const array = photovoltaicArray(module, SINGLE);
  const orbits = (sample: readonly [number, number], step: number, limits: Partial<Converter>) => {
    const condition = emptyCondition();
    enterCondition(condition, array, ...sample);
    const terminals = new Terminals({ ...OPEN_CONVERTER, ...limits });
    terminals.enter(condition);
    const mean = { voltage: 0, current: 0, power: 0 };
    const volts = step * conditionVoc(condition);
    threeLevelOrbit(terminals, terminals.bestVoltage, volts, mean);
    return { mean, dense: denseMean(terminals, terminals.bestVoltage, volts), maximum: condition.maximum };
  };

  it.each([0.0005, 0.002, 0.01, 0.015, 0.02, 0.05, 0.1])(
    "has the dense mean of its levels with a step of %d Voc",
    (step) => {
      for (const sample of [
        [1000, 25],
        [80, -20],
        [600, 70],
      ] as const) {
        const { mean, dense, maximum } = orbits(sample, step, {});
        expect(Math.abs(mean.power - dense.power) / maximum.power).toBeLessThan(2e-9);
        expect(Math.abs(mean.current - dense.current) / maximum.current).toBeLessThan(2e-8);
        expect(Math.abs(mean.voltage - dense.voltage) / maximum.voltage).toBeLessThan(1e-8);
      }
    },
  );

  it("has it at the edge of a window and under a power limit too", () => {
    const { maximumPowerVoltage: vmp, maximumPower } = array.standard;
    for (const limits of [
      { trackingMinimumVoltage: 1.005 * vmp },
      { trackingMaximumVoltage: 0.98 * vmp },
      { maximumPower: 0.995 * maximumPower },
      { maximumPower: 0.8 * maximumPower, trackingMaximumVoltage: 1.1 * vmp },
    ]) {
      const { mean, dense, maximum } = orbits([1000, 25], 0.02, limits);
      expect(Math.abs(mean.power - dense.power) / maximum.power).toBeLessThan(2e-9);
    }
  });
});
