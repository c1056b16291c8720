import type { SingleDiodeParameters } from "../../../service/core/module/single-diode.ts";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import { parametersOf, VILLALVA, VILLALVA_SOLVED } from "../../core/module/paper-modules.ts";
import { steadyPoint } from "../../core/tracking/steady-run.ts";
import ageing from "../../fixtures/ageing.json" with { type: "json" };
import { bisect } from "../../oracle/diode-equation.ts";
import { thermalVoltage } from "../../oracle/weather-circuit.ts";
import type { Check } from "../check.ts";
import { absolute } from "../check.ts";

const PUBLISHED = VILLALVA.villalvaPublished!;

/** The new circuits, and the voltage that suited them, V (the published set's: as in the independent computation). */
const CIRCUITS: Record<string, { parameters: SingleDiodeParameters; setVoltage: number }> = {
  published: {
    parameters: parametersOf({ ...PUBLISHED, idealityVoltage: thermalVoltage(PUBLISHED.ideality, 54, 25) }),
    setVoltage: 26.349,
  },
  solved: { parameters: VILLALVA_SOLVED, setVoltage: VILLALVA.datasheet!.maximumPowerVoltage },
};

const trackedBy = (
  parameters: SingleDiodeParameters,
  kind: "perfect" | "constant-voltage" | "fractional-open-circuit-voltage",
  settings: Record<string, number | boolean>,
) => steadyPoint(singleDiodeModule(parameters), [1000, 25], { kind, settings });

const maximumOf = (parameters: SingleDiodeParameters): number => trackedBy(parameters, "perfect", {}).available;

/** The circuit with the photocurrent that leaves 90 % of its power. */
function dimmed(parameters: SingleDiodeParameters): SingleDiodeParameters {
  const dimmedTo = (share: number) => ({ ...parameters, photocurrent: share * parameters.photocurrent });
  const wanted = 0.9 * maximumOf(parameters);
  return dimmedTo(bisect((share) => maximumOf(dimmedTo(share)) < wanted, 0.5, 1));
}

const agedBy = (row: (typeof ageing.rows)[number]) => {
  const { parameters, setVoltage } = CIRCUITS[row.circuit];
  const { seriesResistance } = row;
  const aged = seriesResistance === undefined ? dimmed(parameters) : { ...parameters, seriesResistance };
  return { parameters, aged, setVoltage, name: `${row.circuit} circuit, ${row.ageing}` };
};

const topic = "Ageing";

/** What rules with fixed settings keep of a module that has aged by a tenth of its power. */
export const AGEING: Check[] = [
  {
    topic,
    title: "Power left at standard test conditions",
    source: ageing.source,
    figures: () =>
      ageing.rows.map((row) => {
        const { parameters, aged, name } = agedBy(row);
        return absolute(name, 0.9, maximumOf(aged) / maximumOf(parameters), 1e-3);
      }),
  },
  {
    topic,
    title: "Efficiency of constant voltage",
    source: ageing.source,
    figures: () =>
      ageing.rows.map((row) => {
        const { aged, setVoltage, name } = agedBy(row);
        const { efficiency } = trackedBy(aged, "constant-voltage", { setVoltagePerModule: setVoltage });
        return absolute(name, row.constantVoltage, efficiency, 1e-3);
      }),
  },
  {
    topic,
    title: "Efficiency of a fraction .80 of the open-circuit voltage",
    source: ageing.source,
    figures: () =>
      ageing.rows.map((row) => {
        const { aged, name } = agedBy(row);
        const { efficiency } = trackedBy(aged, "fractional-open-circuit-voltage", { fraction: 0.8, pilotCell: true });
        return absolute(name, row.fraction80, efficiency, 1e-3);
      }),
  },
];
