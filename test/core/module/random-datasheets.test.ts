import { describe, expect, it } from "vitest";
import { exactDatasheetFit } from "../../../service/core/module/datasheet.ts";
import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../../service/core/module/single-diode.ts";
import type { ReferenceDatasheet } from "../../oracle/random-datasheets.ts";
import { datasheetOf, plausibleModule, referenceMisfits } from "../../oracle/random-datasheets.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import { moduleInWeather, thermalVoltage } from "../../oracle/weather-circuit.ts";
import { printFinding } from "../finding.ts";

const random = seededRandom(200);
const MODULES = Array.from({ length: 200 }, () => plausibleModule(random));

const fitOf = (sheet: ReferenceDatasheet) =>
  exactDatasheetFit({ ...sheet, bandgap: SILICON_BANDGAP, bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT });

describe("200 random crystalline datasheets, printed from known circuits by bisection", () => {
  const fits = MODULES.map((module) => ({ module, sheet: datasheetOf(module), fit: fitOf(datasheetOf(module)) }));

  it("all have an exact fit", () => {
    expect(fits.filter(({ fit }) => fit === null)).toEqual([]);
  });

  it("are met in all five conditions by the independent solver within 1e-8", () => {
    for (const { module, sheet, fit } of fits) {
      const found = {
        ...module,
        photocurrent: fit!.photocurrent,
        saturationCurrent: Math.exp(fit!.logSaturationCurrent),
        seriesResistance: fit!.seriesResistance,
        shuntResistance: 1 / fit!.shuntConductance,
        ideality: fit!.idealityVoltage / thermalVoltage(1, module.cellsInSeries, 25),
      };
      const misfits = referenceMisfits(sheet, moduleInWeather(found, 1000, 25), moduleInWeather(found, 1000, 35));
      for (const misfit of misfits) expect(Math.abs(misfit)).toBeLessThan(1e-8);
    }
  });

  it("give back the circuits they were printed from", () => {
    for (const { module, fit } of fits) {
      const idealityVoltage = thermalVoltage(module.ideality, module.cellsInSeries, 25);
      expect(Math.abs(fit!.idealityVoltage / idealityVoltage - 1)).toBeLessThan(1e-6);
      expect(Math.abs(fit!.seriesResistance / module.seriesResistance - 1)).toBeLessThan(1e-4);
      expect(Math.abs(fit!.photocurrent / module.photocurrent - 1)).toBeLessThan(1e-6);
    }
  });

  it("print how often their ratios lie where the trade says (common practice, no source)", () => {
    const voltage = fits.map(({ sheet }) => sheet.maximumPowerVoltage / sheet.openCircuitVoltage);
    const current = fits.map(({ sheet }) => sheet.maximumPowerCurrent / sheet.shortCircuitCurrent);
    const range = (values: number[]): string =>
      `${Math.min(...values).toFixed(3)} to ${Math.max(...values).toFixed(3)}`;
    const share = (values: number[], low: number, high: number): string =>
      `${values.filter((value) => value >= low && value <= high).length} of ${values.length}`;
    printFinding("Curve ratios of 200 random crystalline datasheets at standard test conditions", {
      "Vmp/Voc between .70 and .80": share(voltage, 0.7, 0.8),
      "Vmp/Voc range": range(voltage),
      "Imp/Isc within .03 of .92": share(current, 0.89, 0.95),
      "Imp/Isc range": range(current),
    });
    for (const ratio of [...voltage, ...current]) expect(ratio).toBeLessThan(1);
  });
});
