import { z } from "@hono/zod-openapi";
import { CAUSES } from "../../core/tracking/causes.ts";
import { reportedColumn } from "./column.ts";
import { reported, reportedOrNull } from "./quantity.ts";

const CAUSE_MEANINGS = {
  voltageWindow: "The maximum lies outside the converter's voltage window.",
  wrongPeak: "The rule sits on a lower peak of the power curve.",
  setPoint: "The rule's own target misses the maximum.",
  heldSample: "The reference is stale: held from the last sample.",
  regulation: "Steps, hunting and ripple around the target.",
  interruption: "Nothing is delivered while sampling, sweeping or asleep.",
} as const satisfies Record<(typeof CAUSES)[number], string>;

type PerCause<Schema> = Record<(typeof CAUSES)[number], Schema>;

function perCause<Schema>(schemaOf: (meaning: string) => Schema): PerCause<Schema> {
  return Object.fromEntries(CAUSES.map((cause) => [cause, schemaOf(CAUSE_MEANINGS[cause])])) as PerCause<Schema>;
}

/** Energies over the whole climate. */
export const EnergySchema = z
  .object({
    available: reported("kWh", "What the array could have given, within the converter's power and current limits."),
    delivered: reported("kWh", "What the rule took: available minus lost."),
    lost: reported("kWh", "The sum of the six causes."),
    clipped: reported("kWh", "Above the converter's power and current limits; in none of the other figures."),
    lostFraction: reportedOrNull("1", "Lost over available; null when nothing was available."),
    trackingEfficiency: reportedOrNull("1", "Delivered over available; null when nothing was available."),
    insolation: reported("kWh/m2", "On the plane of the modules."),
  })
  .openapi("Energy", { description: "Energies over the whole climate." });

/** Lost energy by cause. */
export const LostByCauseSchema = z.object(perCause((meaning) => reported("kWh", meaning))).openapi("LostByCause", {
  description: "Lost energy by cause; the six add up to what is lost. One may be negative.",
});

/** Lost power by cause: what a rule at rest leaves. */
export const LostPowerByCauseSchema = z
  .object(perCause((meaning) => reported("W", meaning)))
  .openapi("LostPowerByCause", { description: "Lost power by cause; the six add up to what is lost." });

/** Lost shares of the available energy by cause. */
export const LostShareByCauseSchema = z
  .object(perCause((meaning) => reported("1", meaning)))
  .openapi("LostShareByCause", { description: "Lost shares of the available energy by cause." });

/** One calendar month. */
export const MonthSchema = z
  .object({
    month: z
      .string()
      .openapi({ description: "Year and month by the clock of the climate's start.", example: "2025-01" }),
    available: reported("kWh", "What the array could have given."),
    delivered: reported("kWh", "What the rule took."),
    lost: reported("kWh", "The difference."),
    lostByCause: LostByCauseSchema,
  })
  .openapi("Month", { description: "One calendar month." });

/** The samples of one class of irradiance. */
export const IrradianceClassSchema = z
  .object({
    from: reported("W/m2", "Lower end, inside the class."),
    to: reported("W/m2", "Upper end, outside the class; the last class has all above."),
    hours: reported("h", "Time in the class."),
    available: reported("kWh", "What the array could have given."),
    lost: reported("kWh", "What was left."),
  })
  .openapi("IrradianceClass", { description: "The samples of one class of irradiance." });

/** How many samples counted. */
export const CoverageSchema = z
  .object({
    samples: reported("1", "Samples of the climate."),
    used: reported("1", "Samples that count."),
    skipped: reported("1", "Missing samples, left out of every sum."),
  })
  .openapi("Coverage", { description: "How many samples counted." });

/** One operating point a sample. */
export const PointTraceSchema = z
  .object({
    voltage: reportedColumn("V", "Voltage at the converter's terminals.").optional(),
    current: reportedColumn("A", "Current, mean over the sample.").optional(),
    power: reportedColumn("W", "Power, mean over the sample, interruptions counted."),
  })
  .openapi("PointTrace", { description: "One operating point a sample; voltage and current only in full traces." });

const CauseTraceSchema = z
  .object(perCause((meaning) => reportedColumn("kWh", meaning)))
  .openapi("CauseTrace", { description: "Lost energy of each sample by cause." });

/** What each sample did. */
export const TracesSchema = z
  .object({
    start: z.string().openapi({ description: "Start of the first sample, ISO 8601, as it was sent." }),
    step: reported("s", "Time from one sample to the next."),
    maximumPower: PointTraceSchema.optional(),
    operating: PointTraceSchema.optional(),
    lostByCause: CauseTraceSchema.optional(),
  })
  .openapi("Traces", {
    description:
      "What each sample did: the best the array could deliver and what the rule held, or lost energy by cause. Null where a sample was left out.",
  });

export const CircuitSchema = z
  .object({
    kind: z.string().openapi({ description: "Always single-diode: the circuit is a module that can be sent back." }),
    cellsInSeries: reported("1", "Cells in series inside the module."),
    photocurrent: reported("A", "Photocurrent at standard test conditions."),
    saturationCurrent: reported("A", "Saturation current of the diode at 25 degC."),
    seriesResistance: reported("ohm", "Series resistance of the module."),
    shuntResistance: reportedOrNull("ohm", "Shunt resistance at 1000 W/m2; null: infinite."),
    idealityVoltage: reported("V", "n Ns k T/q of the whole module at 25 degC."),
    photocurrentCoefficient: reported("%/K", "Change of the photocurrent with temperature."),
    bandgap: reported("eV", "Band gap of the cells at 25 degC."),
    bandgapCoefficient: reported("1/K", "Relative change of the band gap with temperature."),
  })
  .openapi("Circuit", { description: "The single-diode circuit of one module at 1000 W/m2 and 25 degC." });

/** How far a circuit is from its datasheet. */
export const MisfitsSchema = z
  .object({
    shortCircuitCurrent: reported("1", "Relative misfit of Isc."),
    openCircuitVoltage: reported("1", "Relative misfit of Voc."),
    maximumPowerCurrent: reported("1", "Relative misfit of the current at Vmp."),
    maximumPowerSlope: reported("1", "Slope of the power curve at Vmp over Imp; 0 at a maximum."),
    openCircuitVoltageCoefficient: reported("1", "Relative misfit of the change of Voc over 10 K."),
  })
  .openapi("Misfits", { description: "How far the circuit is from each of the datasheet's five conditions." });

/** How the module was understood. */
export const ModuleAnswerSchema = z
  .object({
    fit: z.string().openapi({ description: "exact, nearest (within 2 % of every condition), or given." }),
    circuit: CircuitSchema.nullable().openapi({
      description: "Null for the test generator, whose formula is its own.",
    }),
    misfits: MisfitsSchema.nullable().openapi({ description: "Null where no datasheet was fitted." }),
  })
  .openapi("ModuleAnswer", { description: "How the module was understood." });

/** Something to know before acting on the figures. */
export const CautionSchema = z
  .object({
    code: z.string(),
    severity: z.string().openapi({ description: "info, warning or danger." }),
    detail: z.string().openapi({ description: "What to know before acting on the figures." }),
    values: z.record(z.string(), reported("as the member's name says (V, A or degC)", "A figure of the detail.")),
  })
  .openapi("Caution", { description: "Something to know before acting on the figures." });

/** What the figures rest on. */
export const ProvenanceSchema = z
  .object({
    version: z.string().openapi({ description: "Of the service that computed the answer." }),
    models: z.array(
      z
        .object({
          name: z.string(),
          version: z.string().openapi({ description: "Raised when the model's figures change." }),
          source: z.string(),
        })
        .openapi("Model", { description: "A model the figures rest on." }),
    ),
    inputDigest: z.string().openapi({
      description:
        "SHA-256 of the resolved request without presentation members: JSON with sorted keys and no spaces, in which each column stands as [n] followed by n little-endian doubles.",
    }),
  })
  .openapi("Provenance", { description: "What the figures rest on." });

/** The array as it was computed. */
export const ResolvedArraySchema = z
  .object({
    modulesInSeries: reported("1", "Modules in series in each string."),
    stringsInParallel: reported("1", "Strings in parallel."),
    wiringResistance: reported("ohm", "Resistance between array and converter."),
  })
  .openapi("ResolvedArrayLayout", { description: "The array as it was computed, every default filled in." });

/** The converter as it was computed. */
export const ResolvedConverterSchema = z
  .object({
    trackingMinimumVoltage: reported("V", "Lower end of the voltage window."),
    trackingMaximumVoltage: reportedOrNull("V", "Upper end of the voltage window; null: none."),
    inputVoltageRating: reportedOrNull("V", "Highest voltage the input bears; null: not known."),
    maximumPower: reportedOrNull("W", "Most the input takes; null: no limit."),
    maximumCurrent: reportedOrNull("A", "Most the input takes; null: no limit."),
    wakePower: reported("W", "Asleep while the array could give less."),
    rippleAmplitude: reported("1", "Amplitude of the voltage ripple over the voltage."),
    sensorError: z
      .object({
        voltageGain: reported("1", "Reading over true voltage, minus 1."),
        voltageOffset: reported("1", "Offset over the array's open-circuit voltage."),
        currentGain: reported("1", "Reading over true current, minus 1."),
        currentOffset: reported("1", "Offset over the array's short-circuit current."),
      })
      .openapi("ResolvedSensorError", { description: "Errors of the converter's sensors." }),
    resolution: z
      .object({
        voltage: reported("1", "Step over the array's open-circuit voltage; 0: not rounded."),
        current: reported("1", "Step over the array's short-circuit current; 0: not rounded."),
      })
      .openapi("ResolvedSensorResolution", { description: "Steps of the converter's sensors." }),
  })
  .openapi("ResolvedConverter", { description: "The converter as it was computed, every default filled in." });
