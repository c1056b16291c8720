import type { PlainConverter, PlainCurve } from "./stepper-curve.ts";
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

/** What a climber remembers of one period, as its sensors read it. */
export interface Sight {
  voltage: number;
  current: number;
  power: number;
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

/** What a sensed climber or sweep sees at a voltage. Ripple: the readings keep the ratio of mean power to V times mean I. */
export function sightAt(curve: PlainCurve, converter: PlainConverter, voltage: number): Sight {
  const { current, power } = curve.swung(voltage);
  const seenVoltage = read(converter.voltageSensor, voltage);
  const seenCurrent = read(converter.currentSensor, current);
  const product = voltage * current;
  const ratio = product > 0 ? power / product : 1;
  return { voltage: seenVoltage, current: seenCurrent, power: seenVoltage * seenCurrent * ratio };
}

/** What a sample of a rule reads: physics.md 7, "Sampling" and "Scan". */
export function takeSample(rule: PlainRule, converter: PlainConverter, curve: PlainCurve): number {
  if (rule.kind === "fractional-open-circuit-voltage") return read(converter.voltageSensor, curve.voc);
  if (rule.kind === "short-current-pulse") return read(converter.currentSensor, curve.current(0));
  const points = settingOf(rule, "points");
  const high = Math.max(converter.lowest, Math.min(converter.highest, curve.voc));
  let [best, most] = [converter.lowest, Number.NEGATIVE_INFINITY];
  for (let j = 0; j < points; j++) {
    const voltage = converter.lowest + ((high - converter.lowest) * j) / (points - 1);
    const { power } = sightAt(curve, converter, voltage);
    if (power > most) [best, most] = [voltage, power];
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

/** The next direction of a climber that compares powers: physics.md 7, "Perturb and observe". */
function byPower(now: Sight, before: Sight | null, direction: number, cut: boolean): number {
  if (now.power <= 0 && now.voltage > 0) return -1;
  if (cut || (before !== null && now.power < before.power)) return -direction;
  return direction;
}

/** The next direction of a climber that compares conductances: physics.md 7, "Incremental conductance". */
function byConductance(rule: PlainRule, now: Sight, before: Sight | null): number {
  if (now.current <= 0 || before === null) return -1;
  const [v1, i1, v2, i2] = [before.voltage, before.current, now.voltage, now.current];
  const sloping = v2 !== v1;
  const e = sloping ? 1 + ((v2 / i2) * (i2 - i1)) / (v2 - v1) : (i2 - i1) / i2;
  const tolerance = settingOf(rule, sloping ? "holdTolerance" : "currentTolerance");
  if (e > tolerance) return 1;
  return e < -tolerance ? -1 : 0;
}

/** The next direction of a climber: up 1, stay 0, down -1. */
export function decide(rule: PlainRule, now: Sight, before: Sight | null, direction: number, cut: boolean): number {
  if (rule.kind === "incremental-conductance") return byConductance(rule, now, before);
  return byPower(now, before, direction, cut);
}
