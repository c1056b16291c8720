import { z } from "@hono/zod-openapi";
import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../core/module/single-diode.ts";
import { TEST_GENERATOR_TECHNOLOGIES } from "../../core/module/test-generator.ts";
import { quantity } from "./quantity.ts";

const CELLS = quantity("1", "Cells in series inside the module.", { minimum: 1, maximum: 1000, integer: true });
const CURRENT = { minimum: 0.0001, maximum: 100 };
const VOLTAGE = { minimum: 0.1, maximum: 1000 };
const BANDGAP = quantity("eV", "Band gap of the cells at 25 degC; silicon by default.", {
  minimum: 0.5,
  maximum: 3,
}).default(SILICON_BANDGAP);
const BANDGAP_COEFFICIENT = quantity("1/K", "Relative change of the band gap with temperature; silicon by default.", {
  minimum: -0.001,
  maximum: 0.001,
}).default(SILICON_BANDGAP_COEFFICIENT);

/** A module as its datasheet prints it, at 1000 W/m2 and 25 degC. */
export const DatasheetSchema = z
  .strictObject({
    kind: z.literal("datasheet"),
    cellsInSeries: CELLS,
    shortCircuitCurrent: quantity("A", "Short-circuit current at standard test conditions.", CURRENT),
    openCircuitVoltage: quantity("V", "Open-circuit voltage at standard test conditions.", VOLTAGE),
    maximumPowerCurrent: quantity("A", "Current at maximum power, below the short-circuit current.", CURRENT),
    maximumPowerVoltage: quantity("V", "Voltage at maximum power, below the open-circuit voltage.", VOLTAGE),
    shortCircuitCurrentCoefficient: quantity("%/K", "Change of the short-circuit current with temperature.", {
      minimum: -0.3,
      maximum: 0.5,
    }),
    openCircuitVoltageCoefficient: quantity("%/K", "Change of the open-circuit voltage with temperature.", {
      minimum: -1,
      maximum: -0.05,
    }),
    bandgap: BANDGAP,
    bandgapCoefficient: BANDGAP_COEFFICIENT,
  })
  .openapi("DatasheetModule", { description: "A module as its datasheet prints it, at 1000 W/m2 and 25 degC." });

/** A module by the parameters of its single-diode circuit at 1000 W/m2 and 25 degC. */
export const SingleDiodeSchema = z
  .strictObject({
    kind: z.literal("single-diode"),
    cellsInSeries: CELLS,
    photocurrent: quantity("A", "Photocurrent at standard test conditions.", CURRENT),
    saturationCurrent: quantity("A", "Saturation current of the diode at 25 degC.", {
      minimum: 1e-60,
      maximum: 1,
    }),
    seriesResistance: quantity("ohm", "Series resistance of the module.", { minimum: 0, maximum: 1e6 }),
    shuntResistance: quantity("ohm", "Shunt resistance of the module at 1000 W/m2; null: infinite.", {
      minimum: 0.01,
      maximum: 1e15,
    }).nullable(),
    idealityVoltage: quantity("V", "n Ns k T/q of the whole module at 25 degC (about 0.026 V to 0.05 V a cell).", {
      minimum: 0.001,
      maximum: 100,
    }),
    photocurrentCoefficient: quantity("%/K", "Change of the photocurrent with temperature.", {
      minimum: -0.3,
      maximum: 0.5,
    }).default(0),
    bandgap: BANDGAP,
    bandgapCoefficient: BANDGAP_COEFFICIENT,
  })
  .openapi("SingleDiodeModule", {
    description: "A module by the parameters of its single-diode circuit at 1000 W/m2 and 25 degC.",
  });

/** The standard's generator in place of a module. */
export const TestGeneratorSchema = z
  .strictObject({
    kind: z.literal("test-generator"),
    technology: z.enum(TEST_GENERATOR_TECHNOLOGIES).openapi({ description: "Which of the standard's constants hold." }),
    maximumPower: quantity("W", "Nominal maximum power at standard test conditions.", {
      minimum: 0.01,
      maximum: 1e6,
    }),
    maximumPowerVoltage: quantity("V", "Nominal voltage at maximum power.", { minimum: 0.1, maximum: 1500 }),
  })
  .openapi("TestGeneratorModule", {
    description: "The generator of EN 50530:2010 Annex C and IEC 62891:2020 Annex A.",
  });

/** One photovoltaic module. */
export const ModuleSchema = z
  .discriminatedUnion("kind", [DatasheetSchema, SingleDiodeSchema, TestGeneratorSchema])
  .openapi("Module", { description: "One photovoltaic module." });
