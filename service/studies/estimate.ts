import { CAUSES } from "../core/tracking/causes.ts";
import type { Caution } from "./cautions.ts";
import { cautionsOf } from "./cautions.ts";
import type { Candidate, TrackingRequest, TrackingRun } from "./tracking-run.ts";
import { runTracking } from "./tracking-run.ts";

/** Columns an answer carries: everything; the two powers; lost energy by cause; nothing. */
export type TraceKind = "full" | "power" | "causes" | "none";

/** One array, one rule, one climate. */
export interface EstimateRequest extends TrackingRequest {
  candidate: Candidate;
  traces: TraceKind;
  traceDecimals: number;
  /** degC; null when not known. */
  recordLowTemperature: number | null;
}

/** The run with its one candidate, and the cautions that go with it. */
export interface EstimateResult {
  run: TrackingRun;
  cautions: Caution[];
}

/** Lost energy of one rule on one array over a climate. @throws StudyError for what physics refuses */
export function estimate(request: EstimateRequest): EstimateResult {
  const { traces } = request;
  const points = traces === "full" || traces === "power";
  const run = runTracking(request, [request.candidate], {
    maximum: points,
    operating: points,
    causes: traces === "causes",
  });
  return { run, cautions: cautionsOf(request, run, request.recordLowTemperature) };
}

/** Lost kWh of each cause a sample, one column a cause, from the rows of a ledger. */
export function causeColumns(causes: Float64Array, step: number): Float64Array[] {
  const samples = causes.length / CAUSES.length;
  return CAUSES.map((_cause, k) => {
    const column = new Float64Array(samples);
    for (let i = 0; i < samples; i++) column[i] = (causes[i * CAUSES.length + k] * step) / 3.6e6;
    return column;
  });
}
