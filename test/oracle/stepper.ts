import type { ReferenceDiode } from "./diode-equation.ts";
import type { PlainConverter, PlainPoint } from "./stepper-curve.ts";
import { PlainCurve } from "./stepper-curve.ts";
import type { PlainRule } from "./stepper-rules.ts";
import { decide, isClimber, settingOf, sightOf, takeSample, target } from "./stepper-rules.ts";
import type { PlainWeather } from "./stepper-weather.ts";
import { PlainPath } from "./stepper-weather.ts";

/** One rule on one array in one weather, as plain as a request. */
export interface Scene {
  /** The array's circuit at the converter's terminals; its voltage steps are stated in `nominalVoc` (V). */
  circuitAt: (irradiance: number, temperature: number) => ReferenceDiode;
  modulesInSeries: number;
  nominalVoc: number;
  weather: PlainWeather;
  converter: PlainConverter;
  rule: PlainRule;
}

/** Mean powers a sample, W. `causes`: window, wrong peak, set point, held sample, regulation, interruption; [n, 6]. */
export interface Outcome {
  available: Float64Array;
  clipped: Float64Array;
  causes: Float64Array;
}

/** What is remembered from period to period while awake. */
interface Awake {
  run: number;
  wokeAt: number;
  samples: number;
  reading: number;
  voltage: number;
  direction: number;
  cut: boolean;
  last: PlainPoint | null;
  /** What the last period is compared with: the one before it; at rest the first of the rest. */
  before: PlainPoint | null;
}

/** Steps a rule through its weather period by period: physics.md 7 "Stepped" and 8, with no thought for speed. */
export function stepPlainly(scene: Scene): Outcome {
  const { weather, rule } = scene;
  const n = weather.irradiance.length;
  const outcome = {
    available: new Float64Array(n),
    clipped: new Float64Array(n),
    causes: new Float64Array(6 * n),
  };
  const period = rule.kind === "perfect" ? Math.min(1, weather.step) : settingOf(rule, "controlPeriod");
  const whole = (n * weather.step) / period;
  const periods = Math.ceil(whole - 1e-9);
  const stepper = new PlainStepper(scene, period, outcome);
  for (let k = 0; k < periods; k++) stepper.take(k, Math.min(1, whole - k));
  return outcome;
}

class PlainStepper {
  private readonly scene: Scene;
  private readonly period: number;
  private readonly outcome: Outcome;
  private readonly path: PlainPath;
  private readonly sampled: boolean;
  private readonly pilot: boolean;
  private awake: Awake | null = null;

  constructor(scene: Scene, period: number, outcome: Outcome) {
    const { kind, settings } = scene.rule;
    this.scene = scene;
    this.period = period;
    this.outcome = outcome;
    this.path = new PlainPath(scene.weather);
    this.sampled = ["fractional-open-circuit-voltage", "short-current-pulse", "power-curve-scan"].includes(kind);
    this.pilot = settings["pilotCell"] === true;
  }

  /** Period `k`, of which `weight` counts. */
  take(k: number, weight: number): void {
    const middle = (k + 0.5) * this.period;
    const sample = this.path.sampleAt(middle);
    const run = this.path.runOf(sample);
    if (this.awake !== null && this.awake.run !== run) this.awake = null;
    if (run < 0) return;
    const { irradiance } = this.path.at(middle, run);
    // Below 1e-9 W/m2 is only what rounding leaves of 0.
    if (!(irradiance > 1e-9)) {
      this.awake = null;
      return;
    }
    this.step(k, weight, sample, this.wake(k, run, this.curveAt(middle, run)));
  }

  private curveAt(time: number, run: number): PlainCurve {
    const { irradiance, temperature } = this.path.at(time, run);
    return new PlainCurve(this.scene.circuitAt(irradiance, temperature), this.scene.converter);
  }

  private wake(k: number, run: number, curve: PlainCurve): Awake {
    this.awake ??= {
      run,
      wokeAt: k * this.period,
      samples: 0,
      reading: 0,
      voltage: curve.clamp(curve.voc),
      direction: -1,
      cut: false,
      last: null,
      before: null,
    };
    return this.awake;
  }

  private step(k: number, weight: number, sample: number, awake: Awake): void {
    const { rule, converter, modulesInSeries, nominalVoc } = this.scene;
    const middle = (k + 0.5) * this.period;
    const curve = this.curveAt(middle, awake.run);
    const best = curve.best();
    const share = (weight * this.period) / this.scene.weather.step;
    this.outcome.available[sample] += share * curve.available();
    this.outcome.clipped[sample] += share * (curve.pmp - curve.available());
    const enter = (losses: number[]): void => {
      const all = [curve.available() - best, 0, ...losses];
      for (let c = 0; c < 6; c++) this.outcome.causes[6 * sample + c] += share * all[c];
    };
    if (rule.kind === "perfect") {
      enter([0, 0, 0, 0]);
      return;
    }
    this.sample(middle, awake, curve);
    const d = curve.available() < converter.wakePower ? 1 : this.interrupted(k, weight, awake);
    const step = settingOf(rule, "stepFraction") * nominalVoc;
    if (isClimber(rule)) {
      const point = curve.operate(awake.voltage);
      enter([0, 0, best - point.power, d * point.power]);
      this.climb(curve, awake, step, point);
      return;
    }
    const now = { curve, ...this.path.at(middle, awake.run), reading: awake.reading };
    const held = target(rule, converter, modulesInSeries, now);
    const reading = this.sampled ? takeSample(rule, converter, curve) : 0;
    const fresh = target(rule, converter, modulesInSeries, { ...now, reading });
    const exact = step === 0 || rule.kind === "power-curve-scan";
    if (exact) awake.voltage = held;
    const { power } = curve.operate(awake.voltage);
    enter([best - curve.power(fresh), curve.power(fresh) - curve.power(held), curve.power(held) - power, d * power]);
    if (!exact) awake.voltage = curve.clamp(awake.voltage + (awake.voltage < held ? step : -step));
  }

  /** The latest sample at or before a period's middle; a pilot cell is read each period. */
  private sample(middle: number, awake: Awake, curve: PlainCurve): void {
    const { rule, converter } = this.scene;
    if (!this.sampled) return;
    if (this.pilot) {
      awake.reading = takeSample(rule, converter, curve);
      return;
    }
    const { every } = this.timing();
    const due = 1 + Math.floor((middle - awake.wokeAt) / every + 1e-9);
    if (due === awake.samples) return;
    awake.samples = due;
    const instant = this.path.at(awake.wokeAt + (due - 1) * every, awake.run);
    const lit = instant.irradiance > 1e-9;
    awake.reading = lit ? takeSample(rule, converter, this.curveAt(awake.wokeAt + (due - 1) * every, awake.run)) : 0;
    if (!isClimber(rule)) return;
    awake.voltage = curve.clamp(awake.reading);
    awake.direction = -1;
    awake.cut = false;
    awake.last = awake.before = null;
  }

  private timing(): { every: number; lasting: number } {
    const { rule } = this.scene;
    if (rule.kind !== "power-curve-scan") {
      return { every: settingOf(rule, "samplePeriod"), lasting: settingOf(rule, "sampleDuration") };
    }
    return { every: settingOf(rule, "scanPeriod"), lasting: settingOf(rule, "sweepDuration") };
  }

  /** Share of the counted part of period `k` overlapped by samples. */
  private interrupted(k: number, weight: number, awake: Awake): number {
    if (!this.sampled || this.pilot) return 0;
    const { every, lasting } = this.timing();
    const [from, to] = [k * this.period, (k + weight) * this.period];
    let overlap = 0;
    const first = Math.max(0, Math.floor((from - awake.wokeAt) / every) - 1);
    for (let start = awake.wokeAt + first * every; start < to; start += every) {
      overlap += Math.max(0, Math.min(to, start + lasting) - Math.max(from, start));
    }
    return overlap / (to - from);
  }

  private climb(curve: PlainCurve, awake: Awake, step: number, point: PlainPoint): void {
    const { rule, converter } = this.scene;
    const seen = sightOf(point, converter);
    // A rule at rest measures change from where it came to rest, so that a slow drift adds up (argued deviation from
    // physics 7, where it is measured from period to period: see the log, "A resting climber now measures change").
    const rests = awake.direction === 0 && awake.last?.voltage === awake.before?.voltage;
    if (!rests) awake.before = awake.last;
    awake.last = seen;
    awake.direction = decide(rule, seen, awake.before, awake.direction, awake.cut);
    const wanted = awake.voltage + awake.direction * step;
    awake.voltage = curve.clamp(wanted);
    awake.cut = awake.voltage !== wanted;
  }
}
