import type { StandardPoint } from "../array/array.ts";

/** What every declared parameter says of itself; schema, catalogue and docs derive from it. */
interface Declared {
  readonly description: string;
  /** Where the default and the usual range come from. */
  readonly source: string;
}

/** A default that follows from the array and from the settings declared before it. */
export interface Derived {
  /** In words, for the catalogue. */
  readonly as: string;
  readonly value: (array: RuleArray, settings: Readonly<Record<string, unknown>>) => number;
}

/** A number with a default, fixed or derived. */
export interface NumberParameter extends Declared {
  readonly type: "number";
  readonly unit: string;
  readonly default: number | Derived;
  readonly minimum?: number;
  readonly exclusiveMinimum?: number;
  readonly maximum: number;
  readonly integer?: true;
  readonly usual?: readonly [number, number];
}

/** Yes or no. */
export interface FlagParameter extends Declared {
  readonly type: "flag";
  readonly default: boolean;
}

/** One of a few words. */
export interface ChoiceParameter extends Declared {
  readonly type: "choice";
  readonly choices: readonly [string, ...string[]];
  readonly default: string;
}

/** A number, or one number a sample of the climate. Always required. */
export interface SeriesParameter extends Declared {
  readonly type: "series";
  readonly unit: string;
  readonly minimum: number;
  readonly maximum: number;
}

export type Parameter = NumberParameter | FlagParameter | ChoiceParameter | SeriesParameter;
export type Parameters = Readonly<Record<string, Parameter>>;

type ValueOf<P extends Parameter> = P extends NumberParameter
  ? number
  : P extends FlagParameter
    ? boolean
    : P extends ChoiceParameter
      ? P["choices"][number]
      : number | Float64Array;

/** The settings of a rule with every default filled in. */
export type Settings<P extends Parameters = Parameters> = { [K in keyof P]: ValueOf<P[K]> };

/** What a sample reads at the terminals while the power is interrupted. */
export type Reading = "open-circuit-voltage" | "short-circuit-current" | "best-swept-voltage";

/** Samples start at waking + k period and interrupt the power for `duration`, s. `pilot`: a cell of its own, no loss. */
export interface Sampling {
  readonly reads: Reading;
  readonly period: number;
  readonly duration: number;
  readonly pilot: boolean;
  /** Points of a sweep; 0 for a single reading. */
  readonly points: number;
}

/** Holds what its formula says. */
export interface TargetRule {
  readonly behaviour: "target";
  /** What the rule regulates: the terminal voltage, or the current. */
  readonly regulates: "voltage" | "current";
  /** False for an array wired straight to what sets its voltage: no sensor comes between. */
  readonly sensed: boolean;
  readonly sampling: Sampling | null;
  /** s. */
  readonly controlPeriod: number;
  /** Step of the terminal voltage, V; 0 holds the target exactly. */
  readonly step: number;
  /** Terminal voltage given from outside, V: one value, or one a sample. Reaches `reference` as `outside`. */
  readonly outside: number | Float64Array;
  /**
   * The voltage (V) or current (A) to be held.
   * @param reading what the last sample read, V or A; 0 without sampling
   * @param cellTemperature degC
   * @param outside the outside voltage now, V
   */
  readonly reference: (reading: number, cellTemperature: number, outside: number) => number;
}

/** A direction of the terminal voltage: down, stay, up. */
export type Direction = -1 | 0 | 1;

/**
 * What a climbing rule reads of the last two control periods: V, A, W; while it rests, of the first period of the rest
 * and the last. NaN before there is anything to see.
 */
export interface Seen {
  earlierVoltage: number;
  earlierCurrent: number;
  earlierPower: number;
  voltage: number;
  current: number;
  power: number;
  /** The direction of the last step. */
  direction: Direction;
  /** True when the window cut the last step short. */
  cut: boolean;
}

/** Climbs the power curve step by step. */
export interface ClimbingRule {
  readonly behaviour: "climb";
  /** s. */
  readonly controlPeriod: number;
  /** Step of the terminal voltage, V, above 0. */
  readonly step: number;
  /** At rest: the known three-level orbit around the peak, or whatever orbit `decide` falls into. */
  readonly orbit: "three-level" | "own";
  /** Relative slope of the power curve within which the rule may rest; 0 never rests. */
  readonly restTolerance: number;
  /** A sweep of the whole window now and then; null climbs from waking on. */
  readonly sampling: Sampling | null;
  readonly decide: (seen: Seen) => Direction;
}

/** The maximum inside the window: the control case. */
export interface PerfectRule {
  readonly behaviour: "perfect";
}

/** A rule with its settings, ready to track one array. */
export type TrackingRule = TargetRule | ClimbingRule | PerfectRule;

/** A tracking rule as the table knows it. */
export interface RuleDefinition<K extends string = string, P extends Parameters = Parameters> {
  readonly kind: K;
  readonly title: string;
  readonly description: string;
  /** What interrupts the power, for the caution that goes with it. */
  readonly interrupts: "nothing" | "open-circuit" | "short-circuit" | "sweep";
  readonly sources: readonly string[];
  readonly parameters: P;
  readonly prepare: (settings: Settings<P>, array: RuleArray) => TrackingRule;
}

/** What a rule may know of the array it is built for. */
export interface RuleArray {
  readonly modulesInSeries: number;
  readonly standard: StandardPoint;
}

/** Keeps the literal types of a definition, so that `settings` in `prepare` is typed by its own declarations. */
export function defineRule<const K extends string, const P extends Parameters>(
  definition: RuleDefinition<K, P>,
): RuleDefinition<K, P> {
  return definition;
}

/** A target rule that regulates the sensed voltage, without sampling, unless `of` says otherwise. */
export function targetRule(
  of: Pick<TargetRule, "controlPeriod" | "step" | "reference"> & Partial<TargetRule>,
): TargetRule {
  return { behaviour: "target", regulates: "voltage", sensed: true, sampling: null, outside: 0, ...of };
}

/** The control period of a rule, s. */
export function controlPeriod(period: number): NumberParameter {
  return {
    type: "number",
    unit: "s",
    description: "Time between two decisions of the rule.",
    default: period,
    minimum: 0.001,
    maximum: 3600,
    usual: [0.02, 1],
    source: "common practice, no source",
  };
}

/** The voltage step of a rule that holds a target: 0 holds it exactly. */
export const TARGET_STEP_FRACTION = {
  type: "number",
  unit: "1, of the open-circuit voltage at standard test conditions",
  description: "Step of the array voltage at each decision; 0 holds the target exactly, more makes the voltage hunt.",
  default: 0,
  minimum: 0,
  maximum: 0.1,
  usual: [0, 0.02],
  source: "common practice, no source",
} as const satisfies NumberParameter;

/** The voltage step of a rule that climbs. */
export const CLIMB_STEP_FRACTION = {
  type: "number",
  unit: "1, of the open-circuit voltage at standard test conditions",
  description: "Step of the array voltage at each decision.",
  default: 0.01,
  minimum: 0.0001,
  maximum: 0.1,
  usual: [0.002, 0.03],
  source: "common practice, no source",
} as const satisfies NumberParameter;
