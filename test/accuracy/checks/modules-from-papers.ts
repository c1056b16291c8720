import type { Circuit } from "../../../service/core/diode/circuit.ts";
import { circuitOf, emptyCircuit } from "../../../service/core/diode/circuit.ts";
import { shortCircuitCurrent } from "../../../service/core/diode/current.ts";
import { openCircuitVoltage } from "../../../service/core/diode/junction-at-current.ts";
import { maximumPower } from "../../../service/core/diode/maximum-power.ts";
import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../../service/core/module/single-diode.ts";
import type { BuiltModule } from "../../../service/studies/module-choice.ts";
import { buildModule } from "../../../service/studies/module-choice.ts";
import papers from "../../fixtures/modules-from-papers.json" with { type: "json" };
import type { Check } from "../check.ts";
import { printed, relative } from "../check.ts";

type Paper = (typeof papers.rows)[number];

/** The five points of a curve that papers print: A, V, A, V, W. */
export function pointsOf(circuit: Circuit) {
  const point = { voltage: 0, current: 0, power: 0 };
  maximumPower(circuit, point);
  return {
    shortCircuitCurrent: shortCircuitCurrent(circuit),
    openCircuitVoltage: openCircuitVoltage(circuit),
    maximumPowerVoltage: point.voltage,
    maximumPowerCurrent: point.current,
    maximumPower: point.power,
  };
}

/** Their names in words. */
export const POINT_NAMES = {
  shortCircuitCurrent: "Isc",
  openCircuitVoltage: "Voc",
  maximumPowerVoltage: "Vmp",
  maximumPowerCurrent: "Imp",
  maximumPower: "Pmp",
} as const;

/** The keys of the five points. */
export const POINTS = Object.keys(POINT_NAMES) as (keyof typeof POINT_NAMES)[];

const sourceOf = (rows: readonly Paper[]): string => [...new Set(rows.map(({ source }) => source))].join("; ");

/** The module of a paper's datasheet, solved by the service. */
function fromDatasheet({ datasheet }: Paper): BuiltModule {
  const { currentCoefficientAPerK, voltageCoefficientVPerK, ...sheet } = datasheet!;
  return buildModule({
    kind: "datasheet",
    ...sheet,
    shortCircuitCurrentCoefficient: currentCoefficientAPerK,
    openCircuitVoltageCoefficient: voltageCoefficientVPerK,
    bandgap: SILICON_BANDGAP,
    bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT,
  });
}

const WITH_DATASHEET = papers.rows.filter(({ datasheet }) => datasheet !== undefined);
const TRANSLATED = papers.rows.filter(({ translated }) => translated !== undefined);
const FORWARD = papers.rows.filter(({ forward, villalvaForward }) => (forward ?? villalvaForward) !== undefined);

/** k T/q at 25 degC, V: with k and q of CODATA 1998, as Villalva et al. had them, and of the SI of 2019. */
const OLD_THERMAL = (1.3806503e-23 * 298.15) / 1.60217646e-19;
const SI_THERMAL = (1.380649e-23 * 298.15) / 1.602176634e-19;

/** The set a paper prints, what it gives forward, and the thermal voltage it was built with. */
function printedSet(paper: Paper) {
  if (paper.villalvaForward !== undefined) {
    const cells = paper.datasheet!.cellsInSeries;
    return {
      set: { ...paper.villalvaPublished!, cellsInSeries: cells },
      gives: paper.villalvaForward,
      kTq: OLD_THERMAL,
    };
  }
  return { set: paper.parameters!, gives: paper.forward!, kTq: SI_THERMAL };
}

const topic = "Modules from papers";

/** Datasheets and parameter sets of papers, and what they must give. */
export const MODULES_FROM_PAPERS: Check[] = [
  {
    topic,
    title: "Circuits solved from datasheets",
    source: `${sourceOf(WITH_DATASHEET)}; solved independently with 30 digits`,
    figures: () =>
      WITH_DATASHEET.flatMap((paper) => {
        const { photocurrent, logSaturationCurrent, seriesResistance, shuntConductance, idealityVoltage } =
          fromDatasheet(paper).parameters!;
        const solved = paper.solved!;
        const figure = (name: string, expected: number, ours: number) =>
          relative(`${paper.name}, ${name}`, expected, ours, 1e-6);
        return [
          figure("photocurrent", solved.photocurrent, photocurrent),
          figure("saturation current", solved.saturationCurrent, Math.exp(logSaturationCurrent)),
          figure("series resistance", solved.seriesResistance, seriesResistance),
          figure("shunt resistance", solved.shuntResistance, 1 / shuntConductance),
          figure("ideality voltage", solved.idealityVoltage, idealityVoltage),
        ];
      }),
  },
  {
    topic,
    title: "From the datasheet to other weathers",
    source: `${sourceOf(TRANSLATED)}; moved independently with 30 digits after De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory)`,
    figures: () =>
      TRANSLATED.flatMap((paper) => {
        const { module } = fromDatasheet(paper);
        return paper.translated!.flatMap((row) => {
          const circuit = emptyCircuit();
          module.circuitAt(row.irradiance, row.cellTemperature, circuit);
          const ours = pointsOf(circuit);
          const weather = `${row.irradiance} W/m2, ${row.cellTemperature} degC`;
          return POINTS.map((key) => relative(`${POINT_NAMES[key]} at ${weather}`, row[key], ours[key], 1e-8));
        });
      }),
  },
  {
    topic,
    title: "Printed parameter sets run forward, to the printed digits",
    source: `${sourceOf(FORWARD)}; evaluated independently`,
    figures: () =>
      FORWARD.flatMap((paper) => {
        const { set, gives, kTq } = printedSet(paper);
        const ours = pointsOf(
          circuitOf({
            photocurrent: set.photocurrent,
            logSaturationCurrent: Math.log(set.saturationCurrent),
            idealityVoltage: set.ideality * set.cellsInSeries * kTq,
            seriesResistance: set.seriesResistance,
            shuntConductance: 1 / set.shuntResistance,
          }),
        );
        return POINTS.map((key) => printed(`${paper.name}, ${POINT_NAMES[key]}`, gives[key], ours[key], 6));
      }),
  },
];
