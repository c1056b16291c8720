import { writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { photovoltaicArray } from "../../service/core/array/array.ts";
import { emptyTrace, maximumPowerTrace } from "../../service/core/array/maximum-power-trace.ts";
import { BOLTZMANN, ELEMENTARY_CHARGE } from "../../service/core/constants.ts";
import { singleDiodeModule } from "../../service/core/module/single-diode.ts";
import { completeSettings, prepareRule } from "../../service/core/rules/index.ts";
import { openLedger } from "../../service/core/tracking/ledger.ts";
import { trackStepped } from "../../service/core/tracking/stepped.ts";
import { buildConverter, OPEN_CONVERTER } from "../../service/studies/converter-choice.ts";
import type { Row } from "./measure.ts";
import { alternate, best } from "./measure.ts";
import { buildPeer, pythonPeer, runPeer, runPython } from "./peers.ts";
import { peerWeather } from "./weather.ts";

const ONE = { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 };

/** The peers' module. */
const array = photovoltaicArray(
  singleDiodeModule({
    photocurrent: 9.5,
    logSaturationCurrent: Math.log(3e-10),
    seriesResistance: 0.25,
    shuntConductance: 1 / 400,
    idealityVoltage: (1.05 * 60 * BOLTZMANN * 298.15) / ELEMENTARY_CHARGE,
    photocurrentCoefficient: 0.0045,
    bandgap: 1.121,
    bandgapCoefficient: -0.0002677,
  }),
  ONE,
);

function maximumPowerTime(samples: number): () => number {
  const { irradiance, cellTemperature } = peerWeather(samples);
  const trace = emptyTrace(samples);
  const repetitions = samples < 20_000 ? 200 : 6;
  return () => best(repetitions, () => maximumPowerTrace(array, irradiance, cellTemperature, trace));
}

/** P1: maximum power with translation, against scalar C. */
export function maximumPowerAgainstC(): Row[] {
  const binary = buildPeer("maximum_power");
  return [8760, 525_600].map((samples) => ({
    id: "P1",
    work: `maximum power of ${samples} samples`,
    peer: "scalar C",
    goal: "<= 1.0x",
    pairs: alternate(5, maximumPowerTime(samples), binary === null ? null : () => runPeer(binary, String(samples))[2]),
  }));
}

/** P2: the same against numpy, by a vectorised Newton method and by Lambert W with a golden section. */
export function maximumPowerAgainstNumpy(): Row[] {
  const script = pythonPeer();
  return [8760, 525_600].flatMap((samples) => {
    const { irradiance, cellTemperature } = peerWeather(samples);
    const climate = join(tmpdir(), `kneegap-bench-${samples}.json`);
    const columns = { planeOfArrayIrradiance: [...irradiance], cellTemperature: [...cellTemperature], step: 3600 };
    if (script !== null) writeFileSync(climate, JSON.stringify(columns));
    return (["newton", "lambertw"] as const).map((method) => ({
      id: "P2",
      work: `maximum power of ${samples} samples (the peer: and three rules)`,
      peer: `numpy, ${method}`,
      goal: method === "newton" ? "<= 1.0x" : "<= 0.02x",
      pairs: alternate(
        3,
        maximumPowerTime(samples),
        script === null ? null : () => runPython(script, climate, `${climate}.out`, method)[1],
      ),
    }));
  });
}

function stepYear(days: number): number {
  const { irradiance, cellTemperature } = peerWeather(24 * days);
  const ruleArray = { modulesInSeries: 1, standard: array.standard };
  const settings = completeSettings({ kind: "perturb-and-observe", settings: { controlPeriod: 1 } }, ruleArray);
  const contender = {
    rule: prepareRule("perturb-and-observe", settings, ruleArray),
    converter: buildConverter(OPEN_CONVERTER, array.standard),
    ledger: openLedger(irradiance.length, 1, { operating: false, causes: false }),
  };
  const spanOf = new Uint16Array(irradiance.length);
  const weather = { irradiance, cellTemperature, skipped: null, spanOf, step: 3600, timing: "instant" as const };
  return best(1, () => trackStepped(array, weather, [contender], null));
}

/** P3: perturb and observe stepped at 1 s, against scalar C. */
export function steppingAgainstC(): Row[] {
  const binary = buildPeer("stepper");
  const days = 365;
  return [
    {
      id: "P3",
      work: "a year of perturb and observe at 1 s",
      peer: "scalar C",
      goal: "<= 1.0x",
      pairs: alternate(3, () => stepYear(days), binary === null ? null : () => runPeer(binary, String(days))[1]),
    },
  ];
}

/** P10: cost against length. */
export function costAgainstLength(): Row[] {
  const short = maximumPowerTime(8760);
  const long = maximumPowerTime(525_600);
  return [
    {
      id: "P10",
      work: "maximum power of 525,600 samples",
      peer: "8,760 samples",
      goal: "<= 66x",
      pairs: alternate(3, long, short),
    },
  ];
}
