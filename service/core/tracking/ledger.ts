import type { PointTrace } from "../array/maximum-power-trace.ts";
import { emptyTrace } from "../array/maximum-power-trace.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import type { Cascade } from "./causes.ts";
import { addCauses, CAUSES } from "./causes.ts";

/** Width of an irradiance class, W/m2. */
export const CLASS_WIDTH = 100;
const CLASSES = 21;
/** Columns of a span's row: available, clipped, then the causes. */
export const SPAN_COLUMNS = 2 + CAUSES.length;
/** Columns of a class's row: samples, available, lost. */
export const CLASS_COLUMNS = 3;

/** Which columns a sample leaves behind. */
export interface TraceChoice {
  /** Operating voltage, current and power. */
  operating: boolean;
  /** Lost energy by cause. */
  causes: boolean;
  /** Least and most of the operating voltage and power within each sample; stepped tracking only. */
  extremes?: boolean;
}

/** Least and most within each sample, V and W, each of shape [n]; 0 in the dark. */
export interface Extremes {
  leastVoltage: Float64Array;
  mostVoltage: Float64Array;
  leastPower: Float64Array;
  mostPower: Float64Array;
}

/**
 * The sums of one rule over a climate, in W times samples. Spans (months, say) and classes each hold every sample once, so either
 * adds up to the total.
 */
export interface Ledger {
  /** Shape [spans, SPAN_COLUMNS]. */
  readonly spans: Float64Array;
  /** Shape [21, CLASS_COLUMNS]. */
  readonly classes: Float64Array;
  /** Columns of the rule's operating point; null when not asked for. */
  readonly operating: PointTrace | null;
  /** Lost W by cause, shape [samples, 6]; null when not asked for. */
  readonly causes: Float64Array | null;
  /** Null when not asked for. */
  readonly extremes: Extremes | null;
}

/** An empty ledger over `samples` samples in `spans` spans. */
export function openLedger(samples: number, spans: number, choice: TraceChoice): Ledger {
  return {
    spans: new Float64Array(spans * SPAN_COLUMNS),
    classes: new Float64Array(CLASSES * CLASS_COLUMNS),
    operating: choice.operating ? emptyTrace(samples) : null,
    causes: choice.causes ? new Float64Array(samples * CAUSES.length) : null,
    extremes: choice.extremes === true ? emptyExtremes(samples) : null,
  };
}

function emptyExtremes(samples: number): Extremes {
  return {
    leastVoltage: new Float64Array(samples),
    mostVoltage: new Float64Array(samples),
    leastPower: new Float64Array(samples),
    mostPower: new Float64Array(samples),
  };
}

/** The irradiance class (row of `Ledger.classes`) of an irradiance, W/m2. */
export function irradianceClass(irradiance: number): number {
  return Math.min(CLASSES - 1, Math.max(0, Math.floor(irradiance / CLASS_WIDTH)));
}

/** Enters one sample: its span, its irradiance class (row), its cascade of powers and what the limits clipped (W). */
export function enterSample(ledger: Ledger, at: SamplePlace, cascade: Cascade, clipped: number): void {
  const { spans, classes, causes } = ledger;
  const span = at.span * SPAN_COLUMNS;
  const row = at.irradianceClass * CLASS_COLUMNS;
  spans[span] += cascade.available;
  spans[span + 1] += clipped;
  addCauses(cascade, spans, span + 2);
  classes[row + 1] += cascade.available;
  classes[row + 2] += cascade.available - (1 - cascade.interrupted) * cascade.operating;
  if (causes !== null) addCauses(cascade, causes, at.sample * CAUSES.length);
}

/** Where a sample belongs. */
export interface SamplePlace {
  sample: number;
  span: number;
  irradianceClass: number;
}

/** Writes the operating point of a sample; without effect when the trace was not asked for. */
export function enterOperating(ledger: Ledger, sample: number, point: OperatingPoint): void {
  const { operating } = ledger;
  if (operating === null) return;
  operating.voltage[sample] = point.voltage;
  operating.current[sample] = point.current;
  operating.power[sample] = point.power;
}
