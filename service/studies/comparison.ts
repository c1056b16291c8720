import { daysOf } from "../climate/calendar.ts";
import type { Caution } from "./cautions.ts";
import { cautionsOf } from "./cautions.ts";
import type { Coverage } from "./climate-preparation.ts";
import { StudyError } from "./study-error.ts";
import type { Candidate, Tracked, TrackingRequest, TrackingRun } from "./tracking-run.ts";
import { runTracking } from "./tracking-run.ts";

/** A rule on a converter under a name of the caller's, with a price where worth is asked for. */
export interface LabelledCandidate extends Candidate {
  label: string;
  /** Of the converter, in the currency of `energyValue`; null when not given. */
  price: number | null;
}

/** What a kilowatt-hour is worth. */
export interface EnergyValue {
  /** ISO 4217. */
  currency: string;
  perKilowattHour: number;
}

/** 2 to 24 candidates over one climate. */
export interface ComparisonRequest extends TrackingRequest {
  candidates: LabelledCandidate[];
  /** Label of the candidate the others are compared with; null: the first. */
  baseline: string | null;
  energyValue: EnergyValue | null;
  recordLowTemperature: number | null;
}

/** One candidate's figures beside the baseline's and the best one's. */
export interface ComparedCandidate {
  label: string;
  /** From 1, by delivered energy; equals share a rank. */
  rank: number;
  tracked: Tracked;
  /** Delivered more than the baseline, kWh. */
  differenceToBaseline: number;
  /** Delivered less than the best candidate, as a difference of 0 or below, kWh. */
  differenceToBest: number;
  /** Of the difference to the baseline, in the currency, per year; null with its reason. */
  worthPerYear: number | null;
  worthReason: string | null;
  /** Years in which the worth pays the price above the baseline's; null where there is none. */
  payback: number | null;
}

export interface ComparisonResult {
  run: TrackingRun;
  baseline: string;
  results: ComparedCandidate[];
  cautions: Caution[];
}

/** Several rules and converters on one array over one climate. @throws StudyError for what physics refuses */
export function compare(request: ComparisonRequest): ComparisonResult {
  const { candidates } = request;
  const baseline = request.baseline ?? candidates[0].label;
  const baselineIndex = candidates.findIndex((candidate) => candidate.label === baseline);
  if (baselineIndex < 0) {
    throw new StudyError(
      "unknown-baseline",
      "/baseline",
      `No candidate is labelled "${baseline}"; name one of: ${candidates.map((c) => c.label).join(", ")}.`,
    );
  }
  const run = runTracking(request, candidates, { maximum: false, operating: false, causes: false });
  const delivered = run.tracked.map((tracked) => tracked.energy.delivered);
  const best = Math.max(...delivered);
  const reason = worthReason(request, run.coverage);
  const results = candidates.map((candidate, index): ComparedCandidate => {
    const differenceToBaseline = delivered[index] - delivered[baselineIndex];
    const worthPerYear = reason === null ? differenceToBaseline * request.energyValue!.perKilowattHour : null;
    return {
      label: candidate.label,
      rank: 1 + delivered.filter((other) => other > delivered[index]).length,
      tracked: run.tracked[index],
      differenceToBaseline,
      differenceToBest: delivered[index] - best,
      worthPerYear,
      worthReason: reason,
      payback: paybackOf(candidate.price, candidates[baselineIndex].price, worthPerYear),
    };
  });
  return { run, baseline, results, cautions: cautionsOf(request, run, request.recordLowTemperature) };
}

/** Why no worth per year can be said; null when it can. */
function worthReason(request: ComparisonRequest, coverage: Coverage): string | null {
  if (request.energyValue === null) return "no energyValue was given";
  const days = daysOf(request.climate.step, coverage.samples);
  if (days !== 365 && days !== 366) return `the climate lasts ${Number(days.toFixed(3))} days, not 365 or 366`;
  if (coverage.used < 0.95 * coverage.samples) return "less than 95 % of the year is covered";
  return null;
}

/** Simple payback, years: the higher price over the yearly worth; null where either is missing or not above 0. */
function paybackOf(price: number | null, baselinePrice: number | null, worthPerYear: number | null): number | null {
  if (price === null || baselinePrice === null || worthPerYear === null) return null;
  const more = price - baselinePrice;
  return more > 0 && worthPerYear > 0 ? more / worthPerYear : null;
}
