import type { ClimateSeries } from "../../service/climate/climate-series.ts";
import type { RuleChoice } from "../../service/core/rules/index.ts";
import { OPEN_CONVERTER } from "../../service/studies/converter-choice.ts";
import type { ModuleChoice } from "../../service/studies/module-choice.ts";
import { runTracking } from "../../service/studies/tracking-run.ts";

/** A climate of instants `step` s apart, W/m2, at a cell temperature of 25 degC. */
export function instantClimate(irradiance: number[], step: number): ClimateSeries {
  return {
    start: Date.UTC(2025, 5, 1, 8),
    utcOffset: 0,
    step,
    timing: "instant",
    irradiance: { kind: "plane-of-array", values: Float64Array.from(irradiance) },
    temperature: { kind: "cell", values: new Float64Array(irradiance.length).fill(25) },
  };
}

/**
 * The loss (W) of a climber on its own clock at 1000 W/m2 and 25 degC once it has come down from `start` (V): the
 * window's top, at which it wakes. A minute is left to come down in; the next is counted, whole orbits of it.
 */
export function restingLoss(module: ModuleChoice, rule: RuleChoice, start: number): number {
  const converter = { ...OPEN_CONVERTER, trackingMaximumVoltage: start };
  const array = { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 };
  const { maximum, tracked } = runTracking(
    { module, array, climate: instantClimate([1000, 1000, 1000], 60), mode: "stepped" },
    [{ rule, converter, pointer: "/rule" }],
    { maximum: true, operating: true, causes: false },
  );
  return maximum!.power[1] - tracked[0].ledger.operating!.power[1];
}
