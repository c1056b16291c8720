import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../../service/core/module/single-diode.ts";
import { coldFactor, coldVoltageByCoefficient, mostInSeries } from "../../../service/studies/cold-voltage.ts";
import { OPEN_CONVERTER } from "../../../service/studies/converter-choice.ts";
import { estimate } from "../../../service/studies/estimate.ts";
import { VILLALVA } from "../../core/module/paper-modules.ts";
import cold from "../../fixtures/cold-voltage.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute, printed, relative } from "../check.ts";
import { instantClimate } from "../climb-run.ts";

const { example, rows } = cold;
const EXAMPLE_SOURCE = "NEC 690.7, by coefficient and by table; example whose origin is not recorded, arithmetic";

const factorFigure = (temperature: number, factor: number) =>
  absolute(`${temperature} degC`, factor, coldFactor(temperature) ?? Number.NaN, 1e-12);

/** Every whole degree of the table, halfway into each gap between rows, and from 25 degC up. */
function factorFigures() {
  const inRows = rows.flatMap(({ from, to, factor }) =>
    Array.from({ length: from - to + 1 }, (_, k) => factorFigure(from - k, factor)),
  );
  const between = rows.map(({ from, factor }) => factorFigure(from + 0.5, factor));
  return [factorFigure(40, 1), factorFigure(25, 1), ...inRows, ...between];
}

/** The worked example's open-circuit voltage by the module's coefficient and by the factor table, V. */
function coldVoltages(): { byCoefficient: number; byTable: number } {
  const { openCircuitVoltage, coefficientPercent, temperature } = example;
  return {
    byCoefficient: coldVoltageByCoefficient(openCircuitVoltage, coefficientPercent / 100, temperature),
    byTable: openCircuitVoltage * (coldFactor(temperature) ?? Number.NaN),
  };
}

/** The rating that the caution on short-circuit pulses asks for, A, on the module of Villalva et al. 2009. */
function pulseRating(): number {
  const { currentCoefficientAPerK, voltageCoefficientVPerK, ...sheet } = VILLALVA.datasheet!;
  const { cautions } = estimate({
    module: {
      kind: "datasheet",
      ...sheet,
      shortCircuitCurrentCoefficient: currentCoefficientAPerK,
      openCircuitVoltageCoefficient: voltageCoefficientVPerK,
      bandgap: SILICON_BANDGAP,
      bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT,
    },
    array: { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 },
    climate: instantClimate([500], 3600),
    mode: "steady",
    candidate: { rule: { kind: "short-current-pulse", settings: {} }, converter: OPEN_CONVERTER, pointer: "/rule" },
    traces: "none",
    traceDecimals: 3,
    recordLowTemperature: null,
  });
  return cautions.find(({ code }) => code === "short-circuit-pulses")?.values["minimumRating"] ?? Number.NaN;
}

const topic = "Cautions";

/** Voltages and currents that equipment must bear. */
export const CAUTIONS: Check[] = [
  {
    topic,
    title: "Cold factor on the open-circuit voltage of crystalline silicon",
    source: "NEC table 690.7(A), two transcriptions agree; between rows the colder one",
    figures: factorFigures,
  },
  {
    topic,
    title: "49.5 V, -0.27 %/degC at -10 degC, V, to the printed digits",
    source: EXAMPLE_SOURCE,
    figures: () => {
      const { byCoefficient, byTable } = coldVoltages();
      return [
        printed("by the module's coefficient", example.byCoefficient.voltage, byCoefficient, 2),
        printed("by the factor table", example.byTable.voltage, byTable, 2),
      ];
    },
  },
  {
    topic,
    title: "Most of these modules in series at 600 V",
    source: EXAMPLE_SOURCE,
    figures: () => {
      const { byCoefficient, byTable } = coldVoltages();
      const most = (voltage: number) => mostInSeries(example.rating, voltage);
      return [
        absolute("by the module's coefficient", example.byCoefficient.modules, most(byCoefficient), 1e-9),
        absolute("by the factor table", example.byTable.modules, most(byTable), 1e-9),
      ];
    },
  },
  {
    topic,
    title: "Rating asked for short-circuit pulses, A: 1.25 x 1.25 x Isc",
    source: "NEC 690.8; Isc of Villalva et al. 2009",
    figures: () => [
      relative(
        "54-cell module of Villalva et al. 2009",
        cold.currentFactor * VILLALVA.datasheet!.shortCircuitCurrent,
        pulseRating(),
        1e-9,
      ),
    ],
  },
];
