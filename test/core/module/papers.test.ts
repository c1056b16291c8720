import { describe, expect, it } from "vitest";
import { circuitOf, emptyCircuit } from "../../../service/core/diode/circuit.ts";
import { shortCircuitCurrent } from "../../../service/core/diode/current.ts";
import { openCircuitVoltage } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";
import type { Datasheet } from "../../../service/core/module/datasheet.ts";
import { datasheetMisfits, exactDatasheetFit } from "../../../service/core/module/datasheet.ts";
import {
  SILICON_BANDGAP,
  SILICON_BANDGAP_COEFFICIENT,
  singleDiodeModule,
} from "../../../service/core/module/single-diode.ts";
import papers from "../../fixtures/modules-from-papers.json" with { type: "json" };
import { VILLALVA, VILLALVA_SOLVED } from "./paper-modules.ts";

/** k T/q at 25 degC, V: with the constants of CODATA 1998, as Villalva's printed set wants, and of the SI of 2019. */
const OLD_THERMAL = (1.3806503e-23 * 298.15) / 1.60217646e-19;
const SI_THERMAL = (1.380649e-23 * 298.15) / 1.602176634e-19;

const relative = (ours: number, theirs: number): number => Math.abs(ours / theirs - 1);

/** The forward figures are printed with six decimals. */
const HALF_LAST_DIGIT = 5.0001e-7;

const peakOf = (circuit: ReturnType<typeof emptyCircuit>) => {
  const point = { voltage: 0, current: 0, power: 0 };
  maximumPower(circuit, point);
  return point;
};

const WITH_DATASHEET = papers.rows.filter((row) => row.datasheet !== undefined);

describe.each(WITH_DATASHEET)("the datasheet of the $name", ({ datasheet, solved }) => {
  const given = datasheet!;
  const sheet: Datasheet = {
    shortCircuitCurrent: given.shortCircuitCurrent,
    openCircuitVoltage: given.openCircuitVoltage,
    maximumPowerCurrent: given.maximumPowerCurrent,
    maximumPowerVoltage: given.maximumPowerVoltage,
    shortCircuitCurrentCoefficient: given.currentCoefficientAPerK,
    openCircuitVoltageCoefficient: given.voltageCoefficientVPerK,
    bandgap: SILICON_BANDGAP,
    bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT,
  };

  it("gives the independently solved circuit within 1e-6 (printed with 10 digits or more)", () => {
    const fit = exactDatasheetFit(sheet)!;
    const want = solved!;
    expect(relative(fit.photocurrent, want.photocurrent)).toBeLessThan(1e-6);
    expect(relative(Math.exp(fit.logSaturationCurrent), want.saturationCurrent)).toBeLessThan(1e-6);
    expect(relative(fit.seriesResistance, want.seriesResistance)).toBeLessThan(1e-6);
    expect(relative(1 / fit.shuntConductance, want.shuntResistance)).toBeLessThan(1e-6);
    expect(relative(fit.idealityVoltage, want.idealityVoltage)).toBeLessThan(1e-6);
  });

  it("is met in all five conditions within 1e-9", () => {
    for (const misfit of Object.values(datasheetMisfits(sheet, exactDatasheetFit(sheet)!))) {
      expect(Math.abs(misfit)).toBeLessThan(1e-9);
    }
  });
});

describe("the solved circuit of Villalva's module, moved to another weather", () => {
  const module = singleDiodeModule(VILLALVA_SOLVED);

  it.each(VILLALVA.translated!)("has its points at $irradiance W/m2 and $cellTemperature degC within 1e-8", (row) => {
    const circuit = emptyCircuit();
    module.circuitAt(row.irradiance, row.cellTemperature, circuit);
    const point = peakOf(circuit);
    expect(relative(shortCircuitCurrent(circuit), row.shortCircuitCurrent)).toBeLessThan(1e-8);
    expect(relative(openCircuitVoltage(circuit), row.openCircuitVoltage)).toBeLessThan(1e-8);
    expect(relative(point.voltage, row.maximumPowerVoltage)).toBeLessThan(1e-8);
    expect(relative(point.current, row.maximumPowerCurrent)).toBeLessThan(1e-8);
    expect(relative(point.power, row.maximumPower)).toBeLessThan(1e-8);
  });

  it("is dark at 0 W/m2, below it, and where the irradiance is not a number", () => {
    for (const irradiance of [0, -5, Number.NaN]) {
      const circuit = emptyCircuit();
      module.circuitAt(irradiance, 20, circuit);
      expect(peakOf(circuit)).toEqual({ voltage: 0, current: 0, power: 0 });
      expect(openCircuitVoltage(circuit)).toBe(0);
    }
  });
});

/** The printed sets with what they give forward: one printed by Villalva et al., two by Nassar-eddine et al. */
const FORWARD = papers.rows.flatMap((row) => {
  const sets = [];
  if (row.villalvaForward) {
    const cellVoltage = 54 * OLD_THERMAL;
    sets.push({
      name: `${row.name}, as printed`,
      cellVoltage,
      set: row.villalvaPublished!,
      gives: row.villalvaForward,
    });
  }
  if (row.forward) {
    const cellVoltage = row.parameters!.cellsInSeries * SI_THERMAL;
    sets.push({ name: row.name, cellVoltage, set: row.parameters!, gives: row.forward });
  }
  return sets;
});

describe.each(FORWARD)("the printed parameters of the $name", ({ cellVoltage, set, gives }) => {
  const circuit = circuitOf({
    photocurrent: set.photocurrent,
    logSaturationCurrent: Math.log(set.saturationCurrent),
    idealityVoltage: set.ideality * cellVoltage,
    seriesResistance: set.seriesResistance,
    shuntConductance: 1 / set.shuntResistance,
  });
  const point = peakOf(circuit);

  it.each([
    ["short-circuit current", shortCircuitCurrent(circuit), gives.shortCircuitCurrent],
    ["open-circuit voltage", openCircuitVoltage(circuit), gives.openCircuitVoltage],
    ["maximum power voltage", point.voltage, gives.maximumPowerVoltage],
    ["maximum power current", point.current, gives.maximumPowerCurrent],
    ["maximum power", point.power, gives.maximumPower],
  ])("give the %s to the printed digits", (_quantity, ours, theirs) => {
    expect(Math.abs(ours - theirs)).toBeLessThan(HALF_LAST_DIGIT);
  });
});
