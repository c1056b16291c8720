import { describe, expect, it } from "vitest";
import type { SingleDiodeParameters } from "../../../service/core/module/single-diode.ts";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import ageing from "../../fixtures/ageing.json" with { type: "json" };
import { thermalVoltage } from "../../oracle/weather-circuit.ts";
import { parametersOf, VILLALVA, VILLALVA_SOLVED } from "../module/paper-modules.ts";
import { steadyPoint } from "./steady-run.ts";

const printed = VILLALVA.villalvaPublished!;
const CIRCUITS: Record<string, { parameters: SingleDiodeParameters; setVoltage: number }> = {
  published: {
    parameters: parametersOf({ ...printed, idealityVoltage: thermalVoltage(printed.ideality, 54, 25) }),
    setVoltage: 26.349,
  },
  solved: { parameters: VILLALVA_SOLVED, setVoltage: VILLALVA.datasheet!.maximumPowerVoltage },
};

const maximumOf = (parameters: SingleDiodeParameters): number =>
  steadyPoint(singleDiodeModule(parameters), [1000, 25], { kind: "perfect", settings: {} }).available;

/** The photocurrent that leaves 90 % of the power, by bisection. */
function dimmed(parameters: SingleDiodeParameters): SingleDiodeParameters {
  const wanted = 0.9 * maximumOf(parameters);
  let [low, high] = [0.5, 1];
  for (let k = 0; k < 60; k++) {
    const share = (low + high) / 2;
    if (maximumOf({ ...parameters, photocurrent: share * parameters.photocurrent }) < wanted) low = share;
    else high = share;
  }
  return { ...parameters, photocurrent: low * parameters.photocurrent };
}

describe.each(ageing.rows)("Villalva's $circuit circuit aged by $ageing (-10 % power)", (row) => {
  const { parameters, setVoltage } = CIRCUITS[row.circuit];
  const aged =
    row.seriesResistance === undefined ? dimmed(parameters) : { ...parameters, seriesResistance: row.seriesResistance };
  const module = singleDiodeModule(aged);

  it("has lost a tenth of its power", () => {
    expect(maximumOf(aged) / maximumOf(parameters)).toBeCloseTo(0.9, 3);
  });

  it("is kept to the independently computed share by constant voltage and by a fraction of .80, within 1e-3", () => {
    const constant = steadyPoint(module, [1000, 25], {
      kind: "constant-voltage",
      settings: { setVoltagePerModule: setVoltage },
    });
    const fraction = steadyPoint(module, [1000, 25], {
      kind: "fractional-open-circuit-voltage",
      settings: { fraction: 0.8, pilotCell: true },
    });
    expect(Math.abs(constant.efficiency - row.constantVoltage)).toBeLessThan(1e-3);
    expect(Math.abs(fraction.efficiency - row.fraction80)).toBeLessThan(1e-3);
  });
});
