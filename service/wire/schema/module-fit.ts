import { z } from "@hono/zod-openapi";
import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../core/module/single-diode.ts";
import { CircuitSchema, MisfitsSchema, ProvenanceSchema } from "./answer.ts";
import { DatasheetSchema } from "./module.ts";
import { quantity, reported, reportedOrNull } from "./quantity.ts";

/** Most points of one measured curve. */
const MOST_POINTS = 2000;

const point = (unit: string, name: string, bounds: { minimum: number; maximum: number }) =>
  z
    .array(quantity(unit, name, bounds))
    .min(5)
    .max(MOST_POINTS)
    .openapi({ description: `${name}, point by point. Unit: ${unit}.`, "x-column": true });

/** Points of a measured I-V curve of one module. */
export const MeasuredCurveSchema = z
  .strictObject({
    kind: z.literal("measured-curve"),
    cellsInSeries: quantity("1", "Cells in series inside the module.", { minimum: 1, maximum: 1000, integer: true }),
    irradiance: quantity("W/m2", "Irradiance during the measurement.", { minimum: 10, maximum: 2000 }),
    cellTemperature: quantity("degC", "Cell temperature during the measurement.", { minimum: -60, maximum: 120 }),
    voltage: point("V", "Terminal voltage", { minimum: -1000, maximum: 1000 }),
    current: point("A", "Current, positive while the module delivers", { minimum: -100, maximum: 100 }),
    photocurrentCoefficient: quantity("%/K", "Change of the photocurrent with temperature.", {
      minimum: -0.3,
      maximum: 0.5,
    }).default(0),
    bandgap: quantity("eV", "Band gap of the cells at 25 degC; silicon by default.", {
      minimum: 0.5,
      maximum: 3,
    }).default(SILICON_BANDGAP),
    bandgapCoefficient: quantity("1/K", "Relative change of the band gap; silicon by default.", {
      minimum: -0.001,
      maximum: 0.001,
    }).default(SILICON_BANDGAP_COEFFICIENT),
  })
  .openapi("MeasuredCurve", { description: "Points of a measured I-V curve of one module." });

/** The body of POST /v1/module-fits. */
export const ModuleFitRequestSchema = z
  .strictObject({
    module: z
      .discriminatedUnion("kind", [DatasheetSchema, MeasuredCurveSchema])
      .openapi("ModuleToFit", { description: "What is known of the module." }),
  })
  .openapi("ModuleFitRequest", { description: "A module whose circuit is sought." });

const MeasuredCircuitSchema = z
  .object({
    photocurrent: reported("A", "Photocurrent."),
    saturationCurrent: reported("A", "Saturation current."),
    seriesResistance: reported("ohm", "Series resistance."),
    shuntResistance: reportedOrNull("ohm", "Shunt resistance; null: infinite."),
    idealityVoltage: reported("V", "n Ns k T/q of the whole module."),
  })
  .openapi("MeasuredCircuit", { description: "The circuit at the measurement's irradiance and temperature." });

const StandardPointSchema = z
  .object({
    shortCircuitCurrent: reported("A", "Short-circuit current."),
    openCircuitVoltage: reported("V", "Open-circuit voltage."),
    maximumPowerCurrent: reported("A", "Current at maximum power."),
    maximumPowerVoltage: reported("V", "Voltage at maximum power."),
    maximumPower: reported("W", "Maximum power."),
    openCircuitVoltageCoefficient: reported("%/K", "Change of the open-circuit voltage over 10 K."),
  })
  .openapi("StandardPoint", { description: "The fitted circuit at 1000 W/m2 and 25 degC." });

/** The answer of POST /v1/module-fits. */
export const ModuleFitAnswerSchema = z
  .object({
    fit: z.string().openapi({ description: "exact, nearest (within 2 % of every condition), or measured." }),
    circuit: CircuitSchema.openapi({ description: "At standard test conditions: a module that can be sent back." }),
    misfits: MisfitsSchema.nullable().openapi({ description: "Null for a measured curve." }),
    measured: MeasuredCircuitSchema.nullable().openapi({ description: "Null for a datasheet." }),
    rootMeanSquareError: reportedOrNull("A", "Of model current minus measured current; null for a datasheet."),
    standard: StandardPointSchema,
    provenance: ProvenanceSchema,
  })
  .openapi("ModuleFitAnswer", { description: "The circuit of a module and how well it fits." });
