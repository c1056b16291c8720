import { calendarOf } from "../climate/calendar.ts";
import type { ClimateSeries } from "../climate/climate-series.ts";
import type { Layout, PhotovoltaicArray } from "../core/array/array.ts";
import { photovoltaicArray } from "../core/array/array.ts";
import type { PointTrace } from "../core/array/maximum-power-trace.ts";
import { emptyTrace } from "../core/array/maximum-power-trace.ts";
import type { RuleChoice } from "../core/rules/index.ts";
import { completeSettings, prepareRule } from "../core/rules/index.ts";
import type { Settings } from "../core/rules/rule.ts";
import type { Ledger, TraceChoice } from "../core/tracking/ledger.ts";
import { openLedger } from "../core/tracking/ledger.ts";
import { trackSteady } from "../core/tracking/steady.ts";
import { trackStepped } from "../core/tracking/stepped.ts";
import type { Coverage, StudyClimate } from "./climate-preparation.ts";
import { prepareForStudy } from "./climate-preparation.ts";
import type { ConverterChoice } from "./converter-choice.ts";
import { buildConverter } from "./converter-choice.ts";
import type { EnergySummary } from "./energy.ts";
import { summarize } from "./energy.ts";
import type { BuiltModule, ModuleChoice } from "./module-choice.ts";
import { buildModule } from "./module-choice.ts";
import { checkRule } from "./rule-relations.ts";

/** How the rules are computed: sample by sample at rest, at their own control period, or as the step suggests. */
export type Mode = "auto" | "steady" | "stepped";

/** `auto` takes samples further apart than this, s, at rest: within them clouds come and go unseen anyway. */
const LONGEST_STEPPED = 300;

/** What every study over a climate asks of one array. */
export interface TrackingRequest {
  module: ModuleChoice;
  array: Layout;
  climate: ClimateSeries;
  /** The same climate prepared beforehand, where many sites share it; left out: it is prepared here. */
  prepared?: StudyClimate | undefined;
  mode: Mode;
}

/** One rule on one converter. `pointer` is where the rule stands in the request. */
export interface Candidate {
  rule: RuleChoice;
  converter: ConverterChoice;
  pointer: string;
}

/** A candidate with its defaults filled in and its sums. */
export interface Tracked extends EnergySummary {
  rule: { kind: RuleChoice["kind"]; settings: Settings };
  converter: ConverterChoice;
  ledger: Ledger;
}

/** What a run found, shared by all its candidates but `tracked`. */
export interface TrackingRun {
  built: BuiltModule;
  array: PhotovoltaicArray;
  climate: StudyClimate;
  coverage: Coverage;
  mode: "steady" | "stepped";
  modeReason: string;
  maximum: PointTrace | null;
  tracked: Tracked[];
}

/** Which columns to keep. */
export interface RunTraces extends TraceChoice {
  maximum: boolean;
}

/**
 * Tracks candidates over a climate in one pass.
 * @throws StudyError for a module, rule or climate that physics refuses
 */
export function runTracking(request: TrackingRequest, candidates: Candidate[], traces: RunTraces): TrackingRun {
  const built = buildModule(request.module);
  const array = photovoltaicArray(built.module, request.array);
  const climate = request.prepared ?? prepareForStudy(request.climate);
  const { coverage, insolation } = climate;
  const { samples } = coverage;
  const { months, monthOf } = calendarOf(
    request.climate.start,
    request.climate.utcOffset,
    request.climate.step,
    samples,
  );
  const ruleArray = { modulesInSeries: request.array.modulesInSeries, standard: array.standard };
  const contenders = candidates.map((candidate) => {
    const settings = completeSettings(candidate.rule, ruleArray);
    checkRule(candidate.rule.kind, settings, { samples, skipped: climate.skipped }, candidate.pointer);
    return {
      settings,
      rule: prepareRule(candidate.rule.kind, settings, ruleArray),
      converter: buildConverter(candidate.converter, array.standard),
      ledger: openLedger(samples, months.length, traces),
    };
  });
  const maximum = traces.maximum ? emptyTrace(samples) : null;
  const { mode, modeReason } = resolveMode(request.mode, request.climate.step);
  const weather = { ...climate, spanOf: monthOf, step: request.climate.step, timing: request.climate.timing };
  if (mode === "steady") trackSteady(array, weather, contenders, maximum);
  else trackStepped(array, weather, contenders, maximum);
  const tracked = contenders.map(({ settings, ledger }, index) => ({
    rule: { kind: candidates[index].rule.kind, settings },
    converter: candidates[index].converter,
    ledger,
    ...summarize(ledger, months, request.climate.step, insolation),
  }));
  return { built, array, climate, coverage, mode, modeReason, maximum, tracked };
}

/** The mode a study runs in, and why. `step` in s. */
export function resolveMode(mode: Mode, step: number): { mode: "steady" | "stepped"; modeReason: string } {
  if (mode !== "auto") return { mode, modeReason: "asked for" };
  return step > LONGEST_STEPPED
    ? { mode: "steady", modeReason: `a step of ${step} s is longer than ${LONGEST_STEPPED} s` }
    : { mode: "stepped", modeReason: `a step of ${step} s is not longer than ${LONGEST_STEPPED} s` };
}
