import type { PlainConverter, PlainCurve, PlainPoint } from "./stepper-curve.ts";
import { read, truthReadAs } from "./stepper-curve.ts";

/** A rule as a request names it, every setting given. */
export interface PlainRule {
  kind: string;
  settings: Readonly<Record<string, number | boolean | string | Float64Array>>;
}

/** What a rule is told: the curve now, the cell temperature (degC), the battery (V), and its last sample (V or A). */
export interface Moment {
  curve: PlainCurve;
  temperature: number;
  battery: number;
  reading: number;
}

/** A number among a rule's settings; 0 where it has none of that name. */
export function settingOf(rule: PlainRule, name: string): number {
  const value = rule.settings[name];
  return typeof value === "number" ? value : 0;
}

/** Whether a rule climbs; the others hold a target, but for `perfect`. */
export function isClimber(rule: PlainRule): boolean {
  if (rule.kind === "power-curve-scan") return rule.settings["afterwards"] === "climb";
  return rule.kind === "perturb-and-observe" || rule.kind === "incremental-conductance";
}

/** What a climber or a sweep sees of a period. Ripple: the readings keep the ratio of mean power to V times mean I. */
export function sightOf(point: PlainPoint, converter: PlainConverter): PlainPoint {
  const voltage = read(converter.voltageSensor, point.voltage);
  const current = read(converter.currentSensor, point.current);
  if (voltage === point.voltage && current === point.current) return point;
  const product = point.voltage * point.current;
  const ratio = converter.ripple > 0 && product > 0 ? point.power / product : 1;
  return { voltage, current, power: voltage * current * ratio };
}

/** What a sample of a rule reads: physics.md 7, "Sampling" and "Scan". */
export function takeSample(rule: PlainRule, converter: PlainConverter, curve: PlainCurve): number {
  if (rule.kind === "fractional-open-circuit-voltage") return read(converter.voltageSensor, curve.voc);
  if (rule.kind === "short-current-pulse") return read(converter.currentSensor, curve.current(0));
  const points = settingOf(rule, "points");
  const high = Math.max(converter.lowest, Math.min(converter.highest, curve.voc));
  let [best, most] = [converter.lowest, -Number.MAX_VALUE];
  for (let j = 0; j < points; j++) {
    const voltage = converter.lowest + ((high - converter.lowest) * j) / (points - 1);
    const { power } = sightOf(curve.operate(voltage), converter);
    if (isLess(most, power)) [best, most] = [voltage, power];
  }
  return best;
}

/** The voltage a target rule wants, inside the window: the table of physics.md 7. */
export function target(rule: PlainRule, converter: PlainConverter, series: number, now: Moment): number {
  const { curve, temperature, battery, reading } = now;
  const held = settingOf(rule, "setVoltagePerModule") * series;
  const share = settingOf(rule, "fraction") * reading;
  const warmer = 1 + (settingOf(rule, "coefficient") / 100) * (temperature - 25);
  const sensed = (voltage: number): number => truthReadAs(converter.voltageSensor, voltage);
  switch (rule.kind) {
    case "constant-voltage":
      return curve.clamp(sensed(held));
    case "temperature-compensated-voltage":
      return curve.clamp(sensed(held * warmer));
    case "fractional-open-circuit-voltage":
      return curve.clamp(sensed(share));
    case "short-current-pulse":
      return curve.clamp(curve.voltageAt(truthReadAs(converter.currentSensor, share)));
    case "battery-coupled":
      return curve.clamp(battery + settingOf(rule, "pathDrop"));
    default:
      return curve.clamp(reading);
  }
}

/** Less by more than rounding: equal products of two readings, or powers cut to one limit, may differ in the last bit. */
function isLess(power: number, other: number): boolean {
  return power < other && other - power > 1e-12 * Math.abs(other);
}

/** The next direction of a climber that compares powers: physics.md 7, "Perturb and observe". */
function byPower(now: PlainPoint, before: PlainPoint | null, direction: number, cut: boolean): number {
  if (now.power <= 0 && now.voltage > 0) return -1;
  if (cut || (before !== null && isLess(now.power, before.power))) return -direction;
  return direction;
}

/** The next direction of a climber that compares conductances: physics.md 7, "Incremental conductance". */
function byConductance(rule: PlainRule, now: PlainPoint, before: PlainPoint | null): number {
  if (now.current <= 0 || before === null) return -1;
  const [v1, i1, v2, i2] = [before.voltage, before.current, now.voltage, now.current];
  // A converter held at its power limit stands at one voltage but for rounding.
  const sloping = Math.abs(v2 - v1) > 1e-9 * v2;
  const e = sloping ? 1 + ((v2 / i2) * (i2 - i1)) / (v2 - v1) : (i2 - i1) / i2;
  const tolerance = settingOf(rule, sloping ? "holdTolerance" : "currentTolerance");
  if (e > tolerance) return 1;
  return e < -tolerance ? -1 : 0;
}

/** The next direction of a climber: up 1, stay 0, down -1. */
export function decide(
  rule: PlainRule,
  now: PlainPoint,
  before: PlainPoint | null,
  direction: number,
  cut: boolean,
): number {
  if (rule.kind === "incremental-conductance") return byConductance(rule, now, before);
  return byPower(now, before, direction, cut);
}
