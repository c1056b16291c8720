import type { PhotovoltaicArray } from "../array/array.ts";
import { emptyCondition, enterCondition } from "../array/condition.ts";
import type { Sampling } from "../rules/rule.ts";
import type { Converter } from "./converter.ts";
import { readSample } from "./target.ts";
import { Terminals } from "./terminals.ts";
import type { Run, TimedWeather } from "./weather-path.ts";
import { locate, valueAt } from "./weather-path.ts";

/** When a rule samples: at waking + k samplePeriod, exactly. A reading serves every period whose middle is not before it. */
export class SampleClock {
  readonly sampling: Sampling;
  private readonly array: PhotovoltaicArray;
  private readonly weather: TimedWeather;
  private readonly condition = emptyCondition();
  private readonly terminals: Terminals;
  private readonly place = { left: 0, right: 0, share: 0 };
  private wokeAt = 0;
  private taken = 0;

  constructor(sampling: Sampling, converter: Converter, array: PhotovoltaicArray, weather: TimedWeather) {
    this.sampling = sampling;
    this.array = array;
    this.weather = weather;
    this.terminals = new Terminals(converter);
  }

  /** Starts anew at `time`, s. */
  wake(time: number): void {
    this.wokeAt = time;
    this.taken = 0;
  }

  /** Whether a sample fell due since the last call, up to `time`, s. */
  isDue(time: number): boolean {
    // A sample at the very instant counts, whatever rounding makes of the instant.
    const due = 1 + Math.floor((time - this.wokeAt) / this.sampling.period + 1e-9);
    const is = due !== this.taken;
    this.taken = due;
    return is;
  }

  /** What the latest sample read, at its own instant: V or A; 0 in the dark. */
  read(run: Run): number {
    const { weather, place, condition } = this;
    locate(weather, run, this.wokeAt + (this.taken - 1) * this.sampling.period, place);
    const temperature = valueAt(weather.cellTemperature, place);
    enterCondition(condition, this.array, valueAt(weather.irradiance, place), temperature);
    if (condition.maximum.power <= 0) return 0;
    this.terminals.enter(condition);
    return readSample(this.sampling, this.terminals);
  }

  /** Share of [from, to), s, that interruptions take. */
  interruptedShare(from: number, to: number): number {
    return Math.min(1, (this.interruptedUntil(to) - this.interruptedUntil(from)) / (to - from));
  }

  private interruptedUntil(time: number): number {
    const { period, duration } = this.sampling;
    const elapsed = time - this.wokeAt;
    const whole = Math.floor(elapsed / period);
    return whole * duration + Math.min(duration, elapsed - whole * period);
  }
}
