import { emptyCircuit } from "../core/diode/circuit.ts";
import { openCircuitVoltage } from "../core/diode/junction-at-current.ts";
import { SILICON_BANDGAP } from "../core/module/single-diode.ts";
import { ruleDefinition } from "../core/rules/index.ts";
import { coldFactor, coldVoltageByCoefficient, mostInSeries } from "./cold-voltage.ts";
import type { TrackingRequest, TrackingRun } from "./tracking-run.ts";

/** Something the reader must know before acting on the figures. */
export interface Caution {
  code: string;
  severity: "info" | "warning" | "danger";
  detail: string;
  values: Record<string, number>;
}

const DEFER = "Local codes and a licensed designer decide.";

/** The cautions that the input touches, most severe kinds first in the order below. */
export function cautionsOf(request: TrackingRequest, run: TrackingRun, recordLow: number | null): Caution[] {
  return [
    ...coldVoltage(request, run, recordLow),
    ...interruptions(request, run),
    ...unusualSettings(run),
    ...nearestFit(run),
    ...climateNotices(run),
    planning(),
  ];
}

function planning(): Caution {
  return {
    code: "planning-estimate",
    severity: "info",
    detail: `Estimates for planning, not an electrical design. Photovoltaic strings are a shock, arc and fire hazard and cannot be switched off in daylight. ${DEFER}`,
    values: {},
  };
}

/** Open-circuit voltage of the array at 1000 W/m2 and the coldest temperature known, against each converter's rating. */
function coldVoltage(request: TrackingRequest, run: TrackingRun, recordLow: number | null): Caution[] {
  const cautions: Caution[] = [];
  const temperature = recordLow ?? run.climate.coldest;
  const cold = coldModuleVoltage(request, run, temperature);
  const voltage = cold.highest * request.array.modulesInSeries;
  const values = { temperature, openCircuitVoltage: voltage, ...cold.values };
  const ratings = run.tracked.map(({ converter }) => converter.inputVoltageRating);
  const given = ratings.filter((rating) => rating !== null);
  const lowest = Math.min(...given);
  if (voltage > lowest) {
    const most = mostInSeries(lowest, cold.highest);
    cautions.push({
      code: "cold-voltage-above-rating",
      severity: "danger",
      detail: `At ${temperature} degC the array's open-circuit voltage reaches ${voltage.toFixed(1)} V, above the converter's input rating of ${lowest} V: it can destroy the converter and start a fire. At most ${most} of these modules in series stay below it. ${DEFER}`,
      values: { ...values, inputVoltageRating: lowest, mostModulesInSeries: most },
    });
  }
  if (given.length < ratings.length) {
    cautions.push({
      code: "cold-voltage-not-checked",
      severity: "warning",
      detail: `No inputVoltageRating was given, so the open-circuit voltage of ${voltage.toFixed(1)} V at ${temperature} degC was not checked against it.`,
      values,
    });
  }
  if (recordLow === null) {
    cautions.push({
      code: "series-cold-is-not-record-cold",
      severity: "info",
      detail: `The coldest temperature of the series, ${temperature} degC, was taken; the site's record low is likely colder. Give recordLowTemperature.`,
      values: { temperature },
    });
  }
  return cautions;
}

/**
 * Open-circuit voltage of one module in the cold, V: by its circuit at 1000 W/m2, by its coefficient, and, for
 * crystalline silicon, by the published factor table; the highest of them counts.
 */
function coldModuleVoltage({ module, array }: TrackingRequest, run: TrackingRun, temperature: number) {
  const { standard } = run.array;
  const standardVoltage = standard.openCircuitVoltage / array.modulesInSeries;
  const coefficient = standard.openCircuitVoltageCoefficient / standard.openCircuitVoltage;
  const circuit = emptyCircuit();
  run.built.module.circuitAt(1000, temperature, circuit);
  const byCircuit = openCircuitVoltage(circuit);
  const byCoefficient = coldVoltageByCoefficient(standardVoltage, coefficient, temperature);
  const isSilicon =
    module.kind === "test-generator" ? module.technology === "crystalline-silicon" : module.bandgap === SILICON_BANDGAP;
  const factor = isSilicon ? coldFactor(temperature) : null;
  const values: Record<string, number> = { moduleByCircuit: byCircuit, moduleByCoefficient: byCoefficient };
  if (factor !== null) values["moduleByFactorTable"] = factor * standardVoltage;
  return { highest: Math.max(...Object.values(values)), values };
}

/** What a rule that interrupts the power does to the converter's input. */
function interruptions(request: TrackingRequest, run: TrackingRun): Caution[] {
  const cautions: Caution[] = [];
  const kinds = new Set(run.tracked.map(({ rule }) => ruleDefinition(rule.kind).interrupts));
  const { shortCircuitCurrent } = run.array.standard;
  if (kinds.has("short-circuit")) {
    const rating = 1.5625 * shortCircuitCurrent;
    cautions.push({
      code: "short-circuit-pulses",
      severity: "danger",
      detail: `The short-current rule short-circuits the array through a switch: rate it for at least ${rating.toFixed(2)} A (1.25 x 1.25 x Isc) at the maximum system voltage, with the input capacitor isolated during the pulse. ${DEFER}`,
      values: { shortCircuitCurrent, minimumRating: rating },
    });
  }
  if (kinds.has("open-circuit") || kinds.has("sweep")) {
    cautions.push({
      code: "open-circuit-at-each-sample",
      severity: "warning",
      detail: `The rule disconnects the array: its full open-circuit voltage stands at the input at each sample. ${DEFER}`,
      values: { openCircuitVoltage: run.array.standard.openCircuitVoltage },
    });
  }
  if (run.tracked.some(({ rule }) => rule.kind === "battery-coupled")) {
    cautions.push({
      code: "full-battery-not-modelled",
      severity: "info",
      detail:
        "A full battery, which takes no more, is not modelled: the delivered energy is what the array could give.",
      values: { modulesInSeries: request.array.modulesInSeries },
    });
  }
  return cautions;
}

/** What the climate left open, and the mistakes it seems to hold. */
function climateNotices({ climate }: TrackingRun): Caution[] {
  const mistakes = climate.mistakes.map((notice): Caution => ({ ...notice, severity: "warning" }));
  const notes = climate.notes.map((notice): Caution => ({ ...notice, severity: "info" }));
  return [...mistakes, ...notes];
}

/** Settings outside what is usual in the trade: right perhaps, but worth a second look. */
function unusualSettings(run: TrackingRun): Caution[] {
  return run.tracked.flatMap(({ rule }) =>
    Object.entries(ruleDefinition(rule.kind).parameters).flatMap(([name, parameter]): Caution[] => {
      const value = rule.settings[name];
      if (parameter.type !== "number" || parameter.usual === undefined || typeof value !== "number") return [];
      const [low, high] = parameter.usual;
      if (value >= low && value <= high) return [];
      return [
        {
          code: "unusual-setting",
          severity: "info",
          detail: `${name} of ${rule.kind} is ${value}; usual are ${low} to ${high} (${parameter.source}).`,
          values: { value, usualFrom: low, usualTo: high },
        },
      ];
    }),
  );
}

function nearestFit({ built }: TrackingRun): Caution[] {
  if (built.fit !== "nearest" || built.misfits === null) return [];
  return [
    {
      code: "nearest-circuit",
      severity: "warning",
      detail:
        "No circuit meets the datasheet exactly; the nearest one was taken. Its relative misfits are in the values.",
      values: { ...built.misfits },
    },
  ];
}
