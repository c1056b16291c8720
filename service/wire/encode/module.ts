import type { SingleDiodeParameters } from "../../core/module/single-diode.ts";
import type { BuiltModule, ModuleChoice } from "../../studies/module-choice.ts";

/** How a module was understood: its circuit, which can be sent back as a single-diode module, and how well it fits. */
export function encodeModule({ fit, parameters, misfits }: BuiltModule, choice: ModuleChoice) {
  if (parameters === null || choice.kind === "test-generator") return { fit, circuit: null, misfits };
  return { fit, circuit: encodeCircuit(parameters, choice.cellsInSeries), misfits };
}

/** A circuit at standard test conditions as the wire states it: a single-diode module. */
export function encodeCircuit(parameters: SingleDiodeParameters, cellsInSeries: number) {
  const { photocurrent, shuntConductance } = parameters;
  return {
    kind: "single-diode",
    cellsInSeries,
    photocurrent,
    saturationCurrent: Math.exp(parameters.logSaturationCurrent),
    seriesResistance: parameters.seriesResistance,
    shuntResistance: shuntConductance === 0 ? null : 1 / shuntConductance,
    idealityVoltage: parameters.idealityVoltage,
    photocurrentCoefficient: (100 * parameters.photocurrentCoefficient) / photocurrent,
    bandgap: parameters.bandgap,
    bandgapCoefficient: parameters.bandgapCoefficient,
  };
}
