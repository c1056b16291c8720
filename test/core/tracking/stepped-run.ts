import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import type { RuleChoice } from "../../../service/core/rules/index.ts";
import { completeSettings, prepareRule } from "../../../service/core/rules/index.ts";
import type { TrackingRule } from "../../../service/core/rules/rule.ts";
import type { Converter } from "../../../service/core/tracking/converter.ts";
import { openLedger, SPAN_COLUMNS } from "../../../service/core/tracking/ledger.ts";
import { trackSteady } from "../../../service/core/tracking/steady.ts";
import { trackStepped } from "../../../service/core/tracking/stepped.ts";
import type { TimedWeather } from "../../../service/core/tracking/weather-path.ts";
import { coreConverter, OPEN } from "./stepped-scene.ts";

/** The standard's crystalline silicon test generator of 1 kW at 100 V: Uoc,stc 125 V (EN 50530:2010 Annex C). */
export const SILICON = photovoltaicArray(
  testGeneratorModule({ technology: "crystalline-silicon", maximumPower: 1000, maximumPowerVoltage: 100 }),
  { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 },
);

/** A rule by name, its settings, and what differs from the open converter. */
export interface Trial extends RuleChoice {
  converter?: Partial<Converter>;
}

/** A series at 25 degC; only samples from `from` until before `until` are counted. */
export interface Series {
  irradiance: ArrayLike<number>;
  step: number;
  timing?: "mean" | "instant";
  from?: number;
  until?: number;
}

/** What a trial came to over the samples counted: W times samples. */
export interface Result {
  available: number;
  lost: number;
  /** Lost over available. */
  fraction: number;
  causes: Float64Array;
  /** Lost W by cause, shape [samples, 6], all samples. */
  causesEach: Float64Array;
  /** Every number of the ledger, to compare bits. */
  bits: number[];
}

/** The rule of a trial on the crystalline silicon generator. */
export function ruleOf({ kind, settings }: RuleChoice): TrackingRule {
  const about = { modulesInSeries: 1, standard: SILICON.standard };
  return prepareRule(kind, completeSettings({ kind, settings }, about), about);
}

/** The series as core takes it: samples counted are span 1. */
export function timedWeather(series: Series): TimedWeather {
  const { irradiance, step, timing = "instant", from = 0, until = irradiance.length } = series;
  return {
    irradiance: Float64Array.from(irradiance),
    cellTemperature: new Float64Array(irradiance.length).fill(25),
    skipped: null,
    spanOf: Uint16Array.from({ length: irradiance.length }, (_, i) => Number(i >= from && i < until)),
    step,
    timing,
  };
}

/** Tracks trials on the crystalline silicon generator, all in one call, stepped or each sample at rest. */
export function run(series: Series, trials: readonly Trial[], mode: "stepped" | "steady" = "stepped"): Result[] {
  const weather = timedWeather(series);
  const contenders = trials.map((trial) => ({
    rule: ruleOf(trial),
    converter: { ...coreConverter(OPEN), ...trial.converter },
    ledger: openLedger(series.irradiance.length, 2, { operating: true, causes: true }),
  }));
  if (mode === "stepped") trackStepped(SILICON, weather, contenders, null);
  else trackSteady(SILICON, weather, contenders, null);
  return contenders.map(({ ledger }) => {
    const span = ledger.spans.subarray(SPAN_COLUMNS);
    const causes = span.slice(2, SPAN_COLUMNS);
    const lost = causes.reduce((sum, one) => sum + one, 0);
    const { voltage, current, power } = ledger.operating!;
    const bits = [...ledger.spans, ...ledger.classes, ...voltage, ...current, ...power, ...ledger.causes!];
    return { available: span[0], lost, fraction: lost / span[0], causes, causesEach: ledger.causes!, bits };
  });
}
