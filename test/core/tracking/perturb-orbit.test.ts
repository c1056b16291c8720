import { describe, expect, it } from "vitest";
import type { PhotovoltaicArray } from "../../../service/core/array/array.ts";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { emptyCondition, enterCondition } from "../../../service/core/array/condition.ts";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import { completeSettings, prepareRule } from "../../../service/core/rules/index.ts";
import type { ClimbingRule } from "../../../service/core/rules/rule.ts";
import { climbOn, firstSight } from "../../../service/core/tracking/climber.ts";
import { Terminals } from "../../../service/core/tracking/terminals.ts";
import curvature from "../../fixtures/peak-curvature.json" with { type: "json" };
import orbit from "../../fixtures/perturb-orbit.json" with { type: "json" };
import { referencePeak } from "../../oracle/diode-equation.ts";
import type { Technology } from "../../oracle/weather-circuit.ts";
import { generatorInWeather } from "../../oracle/weather-circuit.ts";
import { VILLALVA_SOLVED } from "../module/paper-modules.ts";
import { OPEN_CONVERTER, SINGLE, steadyPoint } from "./steady-run.ts";

const kind = "perturb-and-observe";

/** The levels (V from the peak, in steps) and the mean loss (W) of the rule let loose `offset` steps off the lattice. */
function letLoose(array: PhotovoltaicArray, step: number, offset: number) {
  const ruleArray = { modulesInSeries: 1, standard: array.standard };
  const settings = completeSettings(
    { kind, settings: { stepFraction: step / array.standard.openCircuitVoltage } },
    ruleArray,
  );
  const rule = prepareRule(kind, settings, ruleArray) as ClimbingRule;
  const condition = emptyCondition();
  enterCondition(condition, array, 1000, 25);
  const terminals = new Terminals(OPEN_CONVERTER);
  terminals.enter(condition);
  const point = { voltage: 0, current: 0, power: 0 };
  const seen = firstSight();
  let voltage = condition.maximum.voltage + (6 + offset) * step;
  const visits = new Map<number, number>();
  let power = 0;
  for (let period = 0; period < 20 + 400; period++) {
    terminals.operate(voltage, point);
    if (period >= 20) {
      const level = Math.round((voltage - condition.maximum.voltage) / step - offset);
      visits.set(level, (visits.get(level) ?? 0) + 1);
      power += point.power / 400;
    }
    voltage = climbOn(rule, terminals, seen, voltage, point);
  }
  return { visits, loss: condition.maximum.power - power, maximum: condition.maximum };
}

describe("perturb and observe on the solved circuit of Villalva's module at standard test conditions", () => {
  const array = photovoltaicArray(singleDiodeModule(VILLALVA_SOLVED), SINGLE);

  it.each(orbit.rows)("visits three levels 1:2:1 around the peak and loses $loss W with a step of $step V", (row) => {
    const { visits, loss } = letLoose(array, row.step, 0);
    expect([...visits.entries()].sort((a, b) => a[0] - b[0])).toEqual([
      [-1, 100],
      [0, 200],
      [1, 100],
    ]);
    expect(Math.abs(loss / row.loss - 1)).toBeLessThan(1e-5);
  });
});

describe.each(curvature.rows)("perturb and observe on the $technology test generator", ({ technology, kappa }) => {
  const generator = { technology: technology as Technology, maximumPower: 1000, maximumPowerVoltage: 100 };
  const module = testGeneratorModule(generator);
  const array = photovoltaicArray(module, SINGLE);
  const { maximumPowerVoltage: vmp, openCircuitVoltage: voc } = array.standard;

  it("climbs a peak of the printed curvature kappa (four and three digits), by the independent solver", () => {
    const circuit = generatorInWeather(generator, 1000, 25);
    const peak = referencePeak(circuit);
    const { photocurrent: isc, saturationCurrent: i0, idealityVoltage: a } = circuit;
    const power = (v: number): number => v * (isc - i0 * Math.expm1(v / a));
    const h = 2e-3 * peak.voltage;
    const bend = (power(peak.voltage + h) - 2 * peak.power + power(peak.voltage - h)) / (h * h);
    expect(Math.abs((-bend * peak.voltage ** 2) / peak.power - kappa)).toBeLessThan(0.006);
  });

  it.each([0.0025, 0.005, 0.01, 0.015, 0.02])(
    "loses (7 kappa/24)(D/Vmp)^2 on average for D = %d Vmp, to a fiftieth of it",
    (share) => {
      const stepFraction = (share * vmp) / voc;
      const { efficiency } = steadyPoint(module, [1000, 25], { kind, settings: { stepFraction } });
      const law = ((7 * kappa) / 24) * share ** 2;
      expect(Math.abs((1 - efficiency) / law - 1)).toBeLessThan(0.02);
    },
  );

  it.each([0.005, 0.01, 0.02])(
    "loses (kappa/4)(D/Vmp)^2 when its orbit is centred, for D = %d Vmp, to a fiftieth of it",
    (share) => {
      const { loss, maximum } = letLoose(array, share * vmp, 0);
      expect(Math.abs(loss / maximum.power / ((kappa / 4) * share ** 2) - 1)).toBeLessThan(0.02);
    },
  );

  it.each([0.005, 0.01, 0.02])(
    "loses up to (3 kappa/8)(D/Vmp)^2 off the centre, for D = %d Vmp, to a tenth of it",
    (share) => {
      const offsets = Array.from({ length: 64 }, (_, k) => k / 64);
      const worst = Math.max(...offsets.map((offset) => letLoose(array, share * vmp, offset).loss));
      expect(Math.abs(worst / array.standard.maximumPower / (((3 * kappa) / 8) * share ** 2) - 1)).toBeLessThan(0.1);
    },
  );

  it("loses on average over its start what the steady figure says, within 2 % of the loss", () => {
    const offsets = Array.from({ length: 64 }, (_, k) => k / 64);
    const mean = offsets.reduce((sum, offset) => sum + letLoose(array, 0.01 * voc, offset).loss / 64, 0);
    const { lost } = steadyPoint(module, [1000, 25], { kind, settings: { stepFraction: 0.01 } });
    expect(Math.abs(mean / lost - 1)).toBeLessThan(0.02);
  });
});
