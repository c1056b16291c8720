import type { Layout } from "../../../service/core/array/array.ts";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { emptyTrace } from "../../../service/core/array/maximum-power-trace.ts";
import type { Module } from "../../../service/core/module/module.ts";
import type { RuleChoice } from "../../../service/core/rules/index.ts";
import { completeSettings, prepareRule } from "../../../service/core/rules/index.ts";
import type { Cause } from "../../../service/core/tracking/causes.ts";
import { CAUSES } from "../../../service/core/tracking/causes.ts";
import type { Converter } from "../../../service/core/tracking/converter.ts";
import { openLedger, SPAN_COLUMNS } from "../../../service/core/tracking/ledger.ts";
import { trackSteady } from "../../../service/core/tracking/steady.ts";

/** A converter that limits nothing and reads the truth. */
export const OPEN_CONVERTER: Converter = {
  trackingMinimumVoltage: 0,
  trackingMaximumVoltage: Number.POSITIVE_INFINITY,
  maximumPower: Number.POSITIVE_INFINITY,
  maximumCurrent: Number.POSITIVE_INFINITY,
  wakePower: 0,
  rippleAmplitude: 0,
  voltageSensor: { gain: 0, offset: 0, resolution: 0 },
  currentSensor: { gain: 0, offset: 0, resolution: 0 },
};

export const SINGLE: Layout = { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 };

/** One sample of weather: W/m2, degC. */
export type WeatherSample = readonly [irradiance: number, cellTemperature: number];

/** A rule by name, its settings, and what differs from the open converter. */
export interface Trial extends RuleChoice {
  converter?: Partial<Converter>;
}

/** What a trial came to: W summed over the samples. */
export interface Outcome {
  available: number;
  clipped: number;
  lost: number;
  efficiency: number;
  causes: Record<Cause, number>;
  /** Lost W by cause, shape [samples, 6]. */
  causesEach: Float64Array;
  voltage: Float64Array;
  current: Float64Array;
  power: Float64Array;
  /** The array's own maximum, a sample each. */
  maximum: Float64Array;
  /** Every number of the ledger, to compare bits. */
  bits: number[];
}

/** Tracks trials over weather, each sample at rest, in one pass. */
export function steadyRun(
  module: Module,
  layout: Layout,
  samples: readonly WeatherSample[],
  trials: Trial[],
): Outcome[] {
  const array = photovoltaicArray(module, layout);
  const ruleArray = { modulesInSeries: layout.modulesInSeries, standard: array.standard };
  const contenders = trials.map(({ kind, settings, converter }) => ({
    rule: prepareRule(kind, completeSettings({ kind, settings }, ruleArray), ruleArray),
    converter: { ...OPEN_CONVERTER, ...converter },
    ledger: openLedger(samples.length, 1, { operating: true, causes: true }),
  }));
  const maximum = emptyTrace(samples.length);
  const weather = {
    irradiance: Float64Array.from(samples, (sample) => sample[0]),
    cellTemperature: Float64Array.from(samples, (sample) => sample[1]),
    skipped: null,
    spanOf: new Uint16Array(samples.length),
  };
  trackSteady(array, weather, contenders, maximum);
  return contenders.map(({ ledger }) => {
    const { spans, classes } = ledger;
    const operating = ledger.operating!;
    const causes = Object.fromEntries(CAUSES.map((cause, k) => [cause, spans[2 + k]])) as Record<Cause, number>;
    const lost = spans.slice(2, SPAN_COLUMNS).reduce((sum, one) => sum + one, 0);
    return {
      available: spans[0],
      clipped: spans[1],
      lost,
      efficiency: 1 - lost / spans[0],
      causes,
      causesEach: ledger.causes!,
      ...operating,
      maximum: maximum.power,
      bits: [...spans, ...classes, ...operating.voltage, ...operating.current, ...operating.power, ...ledger.causes!],
    };
  });
}

/** Tracks one trial in one sample. */
export function steadyPoint(module: Module, sample: WeatherSample, trial: Trial, layout: Layout = SINGLE): Outcome {
  return steadyRun(module, layout, [sample], [trial])[0];
}
