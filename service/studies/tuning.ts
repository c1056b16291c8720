import { photovoltaicArray } from "../core/array/array.ts";
import type { RuleChoice } from "../core/rules/index.ts";
import { completeSettings } from "../core/rules/index.ts";
import type { ConverterChoice } from "./converter-choice.ts";
import { buildModule } from "./module-choice.ts";
import { StudyError } from "./study-error.ts";
import type { TrackingRequest } from "./tracking-run.ts";
import { runTracking } from "./tracking-run.ts";
import type { Tuned } from "./tuning-range.ts";
import { tunedDeclaration, tuningRange } from "./tuning-range.ts";
import type { TuningScale } from "./tuning-scale.ts";
import { scaleBetween } from "./tuning-scale.ts";

/** One site of a tuning: its own array, converter and climate. */
export interface TuningSite extends TrackingRequest {
  id: string;
  converter: ConverterChoice;
  /** Where the site's module and climate stand in the request. */
  pointers: { module: string; climate: string };
}

/** Which numeric setting of a rule is sought, over one site or many. */
export interface TuningRequest extends Tuned {
  sites: TuningSite[];
  /** Points of the loss curve, 41 or more. */
  points: number;
}

/** What a value of the setting loses: kWh, and of the available energy. */
export interface LossAt {
  value: number;
  lost: number;
  lostFraction: number | null;
}

/** One site's own optimum, and what the common setting costs it. */
export interface TunedSite {
  id: string;
  available: number;
  optimum: LossAt;
  atCommon: LossAt;
  /** Lost at the common setting beyond the site's own optimum, kWh, 0 or above. */
  regret: number;
}

export interface TuningResult {
  parameter: string;
  unit: string;
  /** The setting as it is now (given or default); with many sites of derived defaults, the first site's. */
  today: LossAt;
  optimum: LossAt;
  /** Values within 0.1 points of the optimum's lost fraction, around it. */
  flatRange: { from: number; to: number };
  curve: LossAt[];
  sites: TunedSite[];
}

/** Largest lost fraction beyond the optimum's that still counts as flat: 0.1 points. */
const FLAT = 1e-3;
/** Values tried in one pass when closing in, and passes: each shortens the bracket fivefold. */
const REFINED = 9;
const ROUNDS = 7;
/** Values tried beyond the curve: the closing in, and the setting today or the common one. */
export const TRIED_BESIDES = REFINED * ROUNDS + 2;
const NO_TRACES = { maximum: false, operating: false, causes: false };

/**
 * The value of a rule's setting that loses least over one site or many: a curve over the range, then the bracket around
 * its lowest point closed in, 9 values a pass over the weather, to below 1e-5 of the range. @throws StudyError
 */
export function tune(request: TuningRequest): TuningResult {
  const { parameter } = request;
  const { unit, today } = settingToday(request);
  const scale = scaleBetween(tuningRange(request, today)!);
  const sites = request.sites.map((site) => new SiteLosses(site, request.rule, parameter));
  const available = sites.map((site) => site.available);
  const whole = (values: number[]): Float64Array => sum(sites.map((site) => site.lostAt(values)));
  const total = available.reduce((a, b) => a + b, 0);
  const at = (value: number, lost: number, of: number): LossAt => ({
    value,
    lost,
    lostFraction: of > 0 ? lost / of : null,
  });

  const values = scale.spread(request.points);
  const losses = whole(values);
  const optimum = closeIn(scale, values, losses, whole);
  const todayLost = whole([today])[0];
  const common = todayLost < optimum.lost ? { value: today, lost: todayLost } : optimum;
  return {
    parameter,
    unit,
    today: at(today, todayLost, total),
    optimum: at(common.value, common.lost, total),
    flatRange: flatRange(values, losses, common, FLAT * total),
    curve: values.map((value, k) => at(value, losses[k], total)),
    sites: sites.map((site, k) => {
      const atSite = (value: number, lost: number): LossAt => at(value, lost, available[k]);
      if (sites.length > 1) return tuneSite(site, scale, values, common.value, atSite);
      const own = atSite(common.value, common.lost);
      return { id: site.site.id, available: total, optimum: own, atCommon: own, regret: 0 };
    }),
  };
}

/** The losses of one site at values of the setting. */
class SiteLosses {
  readonly site: TuningSite;
  readonly available: number;
  private readonly rule: RuleChoice;
  private readonly parameter: string;

  constructor(site: TuningSite, rule: RuleChoice, parameter: string) {
    this.site = site;
    this.rule = rule;
    this.parameter = parameter;
    this.available = this.run([null])[0].energy.available;
  }

  /** Lost energy at each value, kWh, in one pass over the weather. */
  lostAt(values: readonly number[]): Float64Array {
    return Float64Array.from(this.run(values), ({ energy }) => energy.lost);
  }

  private run(values: readonly (number | null)[]) {
    const candidates = values.map((value) => ({
      rule: value === null ? this.rule : withSetting(this.rule, this.parameter, value),
      converter: this.site.converter,
      pointer: "/rule",
    }));
    return atSite(this.site, () => runTracking(this.site, candidates, NO_TRACES).tracked);
  }
}

/** Does a site's work; what physics refuses is pointed at where the site's own members stand, or said with its id. */
function atSite<T>({ id, pointers }: TuningSite, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof StudyError)) throw error;
    const pointer = error.pointer
      .replace(/^\/module(?=\/|$)/, pointers.module)
      .replace(/^\/climate(?=\/|$)/, pointers.climate);
    const isOwn = pointer.startsWith("/sites/") || !pointers.climate.startsWith("/sites/");
    const detail = isOwn ? error.message : `At site "${id}": ${error.message}`;
    throw new StudyError(error.code, pointer, detail, error.expected);
  }
}

function tuneSite(
  losses: SiteLosses,
  scale: TuningScale,
  values: number[],
  common: number,
  at: (value: number, lost: number) => LossAt,
): TunedSite {
  const lost = losses.lostAt([...values, common]);
  const own = closeIn(scale, values, lost.subarray(0, values.length), (tried) => losses.lostAt(tried));
  const atCommon = lost[values.length];
  const best = atCommon < own.lost ? { value: common, lost: atCommon } : own;
  return {
    id: losses.site.id,
    available: losses.available,
    optimum: at(best.value, best.lost),
    atCommon: at(common, atCommon),
    regret: atCommon - best.lost,
  };
}

/** Closes in on the lowest point of a sampled curve. */
function closeIn(
  scale: TuningScale,
  values: readonly number[],
  losses: Float64Array,
  lossesAt: (values: number[]) => Float64Array,
): { value: number; lost: number } {
  let tried = [...values];
  let lost = losses;
  let best = { value: tried[0], lost: lost[0] };
  for (let round = 0; round <= ROUNDS; round++) {
    const lowest = lost.indexOf(Math.min(...lost));
    if (lost[lowest] <= best.lost) best = { value: tried[lowest], lost: lost[lowest] };
    if (round === ROUNDS) break;
    const around = [tried[Math.max(0, lowest - 1)], tried[Math.min(tried.length - 1, lowest + 1)]] as const;
    tried = scale.between(...around, REFINED);
    lost = lossesAt(tried);
  }
  return best;
}

/** Where the curve around the optimum stays within `more` (kWh) of it, straight between its points. */
function flatRange(values: number[], losses: Float64Array, best: { value: number; lost: number }, more: number) {
  const limit = best.lost + more;
  const crossing = (inside: [number, number], outside: [number, number]): number => {
    const share = (limit - inside[1]) / (outside[1] - inside[1]);
    return inside[0] + share * (outside[0] - inside[0]);
  };
  const walk = (indices: number[]): number => {
    let inside: [number, number] = [best.value, best.lost];
    for (const k of indices) {
      if (losses[k] > limit) return crossing(inside, [values[k], losses[k]]);
      inside = [values[k], losses[k]];
    }
    return inside[0];
  };
  const below = values.map((_, k) => k).filter((k) => values[k] < best.value);
  const above = values.map((_, k) => k).filter((k) => values[k] > best.value);
  return { from: walk(below.reverse()), to: walk(above) };
}

function sum(columns: Float64Array[]): Float64Array {
  const total = new Float64Array(columns[0].length);
  for (const column of columns) for (let k = 0; k < total.length; k++) total[k] += column[k];
  return total;
}

function withSetting(rule: RuleChoice, parameter: string, value: number): RuleChoice {
  return { kind: rule.kind, settings: { ...rule.settings, [parameter]: value } };
}

/** The setting's unit and its value at the first site. @throws StudyError for one that cannot be tuned */
function settingToday(request: TuningRequest): { unit: string; today: number } {
  const { unit } = tunedDeclaration(request);
  const [site] = request.sites;
  const array = atSite(site, () => photovoltaicArray(buildModule(site.module).module, site.array));
  const ruleArray = { modulesInSeries: site.array.modulesInSeries, standard: array.standard };
  return { unit, today: completeSettings(request.rule, ruleArray)[request.parameter] as number };
}
