import type { Layout, PhotovoltaicArray } from "../../../service/core/array/array.ts";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import type { PointTrace } from "../../../service/core/array/maximum-power-trace.ts";
import type { Module } from "../../../service/core/module/module.ts";
import {
  SILICON_BANDGAP,
  SILICON_BANDGAP_COEFFICIENT,
  singleDiodeModule,
} from "../../../service/core/module/single-diode.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import type { RuleKind } from "../../../service/core/rules/index.ts";
import { completeSettings, prepareRule } from "../../../service/core/rules/index.ts";
import type { Converter } from "../../../service/core/tracking/converter.ts";
import { openLedger } from "../../../service/core/tracking/ledger.ts";
import { trackStepped } from "../../../service/core/tracking/stepped.ts";
import type { TimedWeather } from "../../../service/core/tracking/weather-path.ts";
import type { ReferenceDiode } from "../../oracle/diode-equation.ts";
import type { Outcome, Scene } from "../../oracle/stepper.ts";
import type { PlainConverter } from "../../oracle/stepper-curve.ts";
import type { PlainWeather } from "../../oracle/stepper-weather.ts";
import type { ReferenceModule } from "../../oracle/weather-circuit.ts";
import { generatorInWeather, moduleInWeather, nominalOpenCircuit, wired } from "../../oracle/weather-circuit.ts";

/** The same module twice: for core, and as a reference circuit. */
export interface Twin {
  module: Module;
  inWeather: (irradiance: number, temperature: number) => ReferenceDiode;
  /** Of one module, V, A. */
  nominalVoc: number;
  isc: number;
}

/** The standard's test generator of 1 kW at 100 V. */
export function generatorTwin(technology: "crystalline-silicon" | "thin-film"): Twin {
  const of = { technology, maximumPower: 1000, maximumPowerVoltage: 100 } as const;
  return {
    module: testGeneratorModule(of),
    inWeather: (irradiance, temperature) => generatorInWeather(of, irradiance, temperature),
    nominalVoc: nominalOpenCircuit(of),
    isc: generatorInWeather(of, 1000, 25).photocurrent,
  };
}

/** The 54-cell module of Villalva et al. 2009: solved set of modules-from-papers.json, as n = a q/(Ns k T) too. */
const VILLALVA: ReferenceModule = {
  photocurrent: 8.2271860430828,
  saturationCurrent: 4.29668259257243e-10,
  seriesResistance: 0.33537460469556274,
  shuntResistance: 160.21290768776498,
  ideality: (1.391110225155528 * 1.602176634e-19) / (54 * 1.380649e-23 * 298.15),
  cellsInSeries: 54,
  photocurrentCoefficient: 0.00318,
};

/** The module of Villalva et al. 2009; its open-circuit voltage and short-circuit current are the datasheet's. */
export function villalvaTwin(): Twin {
  const module = singleDiodeModule({
    photocurrent: VILLALVA.photocurrent,
    logSaturationCurrent: Math.log(VILLALVA.saturationCurrent),
    seriesResistance: VILLALVA.seriesResistance,
    shuntConductance: 1 / VILLALVA.shuntResistance,
    idealityVoltage: 1.391110225155528,
    photocurrentCoefficient: VILLALVA.photocurrentCoefficient,
    bandgap: SILICON_BANDGAP,
    bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT,
  });
  const inWeather = (irradiance: number, temperature: number): ReferenceDiode =>
    moduleInWeather(VILLALVA, irradiance, temperature);
  return { module, inWeather, nominalVoc: 32.9, isc: 8.21 };
}

/** A converter that limits nothing and reads the truth. */
export const OPEN: PlainConverter = {
  lowest: 0,
  highest: Number.POSITIVE_INFINITY,
  mostPower: Number.POSITIVE_INFINITY,
  mostCurrent: Number.POSITIVE_INFINITY,
  wakePower: 0,
  ripple: 0,
  voltageSensor: { gain: 0, offset: 0, resolution: 0 },
  currentSensor: { gain: 0, offset: 0, resolution: 0 },
};

/** A rule with what it is given of its settings; a battery's column stands in the weather. */
export interface Choice {
  kind: RuleKind;
  settings: Record<string, number | boolean | string>;
}

/** A scene for both: core's array beside the plain one. */
export interface Pair {
  array: PhotovoltaicArray;
  scene: Scene;
}

/** Puts twin, layout, weather, converter and rule together. */
export function pairOf(
  twin: Twin,
  layout: Layout,
  of: { weather: PlainWeather; converter: PlainConverter; choice: Choice },
): Pair {
  const array = photovoltaicArray(twin.module, layout);
  const { modulesInSeries, stringsInParallel, wiringResistance } = layout;
  return {
    array,
    scene: {
      circuitAt: (irradiance, temperature) =>
        wired(twin.inWeather(irradiance, temperature), modulesInSeries, stringsInParallel, wiringResistance),
      modulesInSeries,
      nominalVoc: twin.nominalVoc * modulesInSeries,
      weather: of.weather,
      converter: of.converter,
      rule: of.choice,
    },
  };
}

/** Core's converter from a plain one. */
export function coreConverter(of: PlainConverter): Converter {
  return {
    trackingMinimumVoltage: of.lowest,
    trackingMaximumVoltage: of.highest,
    maximumPower: of.mostPower,
    maximumCurrent: of.mostCurrent,
    wakePower: of.wakePower,
    rippleAmplitude: of.ripple,
    voltageSensor: { ...of.voltageSensor },
    currentSensor: { ...of.currentSensor },
  };
}

/** Core's weather from a plain one, every sample a span of its own. */
export function coreWeather(of: PlainWeather): TimedWeather {
  return {
    irradiance: Float64Array.from(of.irradiance),
    cellTemperature: Float64Array.from(of.temperature),
    skipped: of.missing.includes(true) ? Uint8Array.from(of.missing, Number) : null,
    spanOf: Uint16Array.from(of.irradiance, (_, i) => i),
    step: of.step,
    timing: of.timing,
  };
}

/** What core says of a scene: W, a sample each. */
export interface CoreOutcome extends Outcome {
  delivered: Float64Array;
}

/** Lets core step the scenes of one array and weather in one call. */
export function stepInCore(pairs: readonly Pair[], maximum: PointTrace | null = null): CoreOutcome[] {
  const [{ array, scene }] = pairs;
  const { weather } = scene;
  const ruleArray = { modulesInSeries: array.layout.modulesInSeries, standard: array.standard };
  const samples = weather.irradiance.length;
  const contenders = pairs.map(({ scene: { rule, converter } }) => {
    const kind = rule.kind as RuleKind;
    const settings = { ...rule.settings, batteryVoltage: Float64Array.from(weather.battery) };
    const prepared = prepareRule(kind, completeSettings({ kind, settings }, ruleArray), ruleArray);
    const ledger = openLedger(samples, samples, { operating: true, causes: true });
    return { rule: prepared, converter: coreConverter(converter), ledger };
  });
  trackStepped(array, coreWeather(weather), contenders, maximum);
  return contenders.map(({ ledger }) => ({
    available: column(ledger.spans, 0, samples),
    clipped: column(ledger.spans, 1, samples),
    causes: ledger.causes!,
    delivered: ledger.operating!.power,
  }));
}

/** One column of an array of 8 columns. */
function column(spans: Float64Array, index: number, samples: number): Float64Array {
  return Float64Array.from({ length: samples }, (_, i) => spans[8 * i + index]);
}
