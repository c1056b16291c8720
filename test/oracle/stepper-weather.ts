/** A series of samples `step` seconds apart; W/m2, degC, V. */
export interface PlainWeather {
  step: number;
  timing: "mean" | "instant";
  irradiance: readonly number[];
  temperature: readonly number[];
  battery: readonly number[];
  missing: readonly boolean[];
}

/** The weather at an instant. */
export interface Instant {
  irradiance: number;
  temperature: number;
  battery: number;
}

/** The weather as straight lines between the samples of each run without missing ones: physics.md 7, "Stepped". */
export class PlainPath {
  private readonly weather: PlainWeather;
  /** First and last sample of each run. */
  private readonly runs: [number, number][] = [];

  constructor(weather: PlainWeather) {
    this.weather = weather;
    weather.missing.forEach((missing, i) => {
      if (missing) return;
      if (i > 0 && !weather.missing[i - 1]) this.runs[this.runs.length - 1][1] = i;
      else this.runs.push([i, i]);
    });
  }

  /** The sample whose interval holds a time, the last one beyond the end. */
  sampleAt(time: number): number {
    return Math.min(this.weather.irradiance.length - 1, Math.floor(time / this.weather.step + 1e-9));
  }

  /** Index of a sample's run; -1 where it is missing. */
  runOf(sample: number): number {
    return this.runs.findIndex(([first, last]) => sample >= first && sample <= last);
  }

  /** The weather at a time, in a run. */
  at(time: number, run: number): Instant {
    const { step, timing, irradiance, temperature, battery } = this.weather;
    const [first, last] = this.runs[run];
    const node = (i: number): number => (timing === "mean" ? i + 0.5 : i) * step;
    const line = (column: readonly number[]): number => {
      if (time <= node(first)) return column[first];
      for (let i = first; i < last; i++) {
        if (time > node(i + 1)) continue;
        const share = (time - node(i)) / (node(i + 1) - node(i));
        return (1 - share) * column[i] + share * column[i + 1];
      }
      return column[last];
    };
    return { irradiance: line(irradiance), temperature: line(temperature), battery: line(battery) };
  }
}
