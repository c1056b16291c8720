import type { PhotovoltaicArray } from "../array/array.ts";
import { conditionVoc, emptyCondition, enterCondition } from "../array/condition.ts";
import type { PointTrace } from "../array/maximum-power-trace.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { emptyPoint } from "../diode/maximum-power.ts";
import type { ClimbingRule, Sampling, TargetRule, TrackingRule } from "../rules/rule.ts";
import type { Cascade } from "./causes.ts";
import type { Converter } from "./converter.ts";
import { isExact } from "./converter.ts";
import type { Ledger } from "./ledger.ts";
import { CLASS_COLUMNS, enterOperating, enterSample, irradianceClass } from "./ledger.ts";
import { addMeanOver } from "./mean-over-voltage.ts";
import { ownOrbit } from "./own-orbit.ts";
import { readSample, targetVoltage } from "./target.ts";
import { Terminals } from "./terminals.ts";
import { threeLevelOrbit } from "./three-level-orbit.ts";

/** Weather a sample, each column of shape [n]. */
export interface Weather {
  /** Plane of array, W/m2. */
  irradiance: Float64Array;
  /** degC. */
  cellTemperature: Float64Array;
  /** 1 where a sample is left out of every sum; null for none. */
  skipped: Uint8Array | null;
  /** Index of the span each sample is summed in, from 0: its month, for a year. */
  spanOf: Uint16Array;
}

/** A rule on its converter, and where its sums go. */
export interface Contender {
  rule: TrackingRule;
  converter: Converter;
  ledger: Ledger;
}

/**
 * Tracks every contender over the weather, each sample at rest, in one pass: the circuit and its maximum are solved
 * once a sample for all of them.
 * @param maximum receives the array's maximum power point, each column of shape [n]; null to leave it
 */
export function trackSteady(
  array: PhotovoltaicArray,
  weather: Weather,
  contenders: readonly Contender[],
  maximum: PointTrace | null,
): void {
  const { irradiance, cellTemperature, skipped, spanOf } = weather;
  const condition = emptyCondition();
  const seats = contenders.map((contender) => ({ ...contender, terminals: new Terminals(contender.converter) }));
  const cascade = emptyCascade();
  const point = emptyPoint();
  const place = { sample: 0, span: 0, irradianceClass: 0 };

  for (let i = 0; i < irradiance.length; i++) {
    if (skipped !== null && skipped[i] === 1) continue;
    place.sample = i;
    place.span = spanOf[i];
    place.irradianceClass = irradianceClass(irradiance[i]);
    for (const { ledger } of seats) ledger.classes[place.irradianceClass * CLASS_COLUMNS]++;
    if (!(irradiance[i] > 0)) continue;
    enterCondition(condition, array, irradiance[i], cellTemperature[i]);
    if (condition.maximum.power <= 0) continue;
    if (maximum !== null) {
      maximum.voltage[i] = condition.maximum.voltage;
      maximum.current[i] = condition.maximum.current;
      maximum.power[i] = condition.maximum.power;
    }
    for (const { rule, ledger, terminals } of seats) {
      terminals.enter(condition);
      trackSample(rule, terminals, i, cascade, point);
      enterSample(ledger, place, cascade, terminals.clipped);
      enterOperating(ledger, i, point);
    }
  }
}

function emptyCascade(): Cascade {
  return { available: 0, best: 0, localPeak: 0, fresh: 0, held: 0, operating: 0, interrupted: 0 };
}

/** Writes the cascade and the operating point of one rule in one lit sample. */
function trackSample(
  rule: TrackingRule,
  terminals: Terminals,
  sample: number,
  cascade: Cascade,
  point: OperatingPoint,
): void {
  cascade.available = terminals.available;
  cascade.best = cascade.localPeak = terminals.best;
  cascade.interrupted = 0;
  if (rule.behaviour === "perfect") {
    terminals.operateWithoutRipple(terminals.bestVoltage, point);
    cascade.fresh = cascade.held = cascade.operating = terminals.best;
    return;
  }
  if (rule.behaviour === "target") holdTarget(rule, terminals, sample, cascade, point);
  else climb(rule, terminals, cascade, point);
  // A mean of powers up to the best may come out above it by the rounding of its weights.
  if (point.power > terminals.best && point.power < terminals.best * (1 + 1e-12)) point.power = terminals.best;
  cascade.operating = point.power;
  cascade.interrupted = interruptedShare(rule.sampling);
  if (terminals.available < terminals.converter.wakePower) sleep(terminals, cascade, point);
  point.current *= 1 - cascade.interrupted;
  point.power *= 1 - cascade.interrupted;
}

/** Asleep: open circuit, nothing delivered; the power it would have held is interrupted. */
function sleep(terminals: Terminals, cascade: Cascade, point: OperatingPoint): void {
  cascade.interrupted = 1;
  point.voltage = conditionVoc(terminals.condition);
}

/** Share of the time that sampling interrupts the power: exact in steady light. */
function interruptedShare(sampling: Sampling | null): number {
  return sampling === null || sampling.pilot ? 0 : sampling.duration / sampling.period;
}

function holdTarget(
  rule: TargetRule,
  terminals: Terminals,
  sample: number,
  cascade: Cascade,
  point: OperatingPoint,
): void {
  const outside = typeof rule.outside === "number" ? rule.outside : rule.outside[sample];
  const reading = rule.sampling === null ? 0 : readSample(rule.sampling, terminals);
  const fresh = targetVoltage(rule, terminals, reading, outside);
  if (rule.step > 0) {
    point.voltage = point.current = point.power = 0;
    addMeanOver(terminals, [fresh - rule.step, fresh + rule.step], 1, point);
    cascade.fresh = cascade.held = terminals.power(fresh);
    return;
  }
  terminals.operate(fresh, point);
  cascade.fresh = cascade.held = terminals.converter.rippleAmplitude > 0 ? terminals.power(fresh) : point.power;
}

function climb(rule: ClimbingRule, terminals: Terminals, cascade: Cascade, point: OperatingPoint): void {
  const { voltageSensor, currentSensor } = terminals.converter;
  cascade.fresh = cascade.held = terminals.best;
  if (rule.orbit === "own" || !isExact(voltageSensor) || !isExact(currentSensor)) ownOrbit(terminals, rule, point);
  else threeLevelOrbit(terminals, terminals.operatingPeak(), rule.step, point);
}
