import type { SingleDiodeParameters } from "../../../service/core/module/single-diode.ts";
import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../../service/core/module/single-diode.ts";
import type { ReferenceModule } from "../../oracle/weather-circuit.ts";
import { thermalVoltage } from "../../oracle/weather-circuit.ts";

/** A module of the reference code as the service states it. */
export function parametersFrom(of: ReferenceModule): SingleDiodeParameters {
  return {
    photocurrent: of.photocurrent,
    logSaturationCurrent: Math.log(of.saturationCurrent),
    seriesResistance: of.seriesResistance,
    shuntConductance: 1 / of.shuntResistance,
    idealityVoltage: thermalVoltage(of.ideality, of.cellsInSeries, 25),
    photocurrentCoefficient: of.photocurrentCoefficient,
    bandgap: SILICON_BANDGAP,
    bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT,
  };
}
