import { describe, expect, it } from "vitest";
import type { PhotovoltaicArray } from "../../../service/core/array/array.ts";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { emptyCondition } from "../../../service/core/array/condition.ts";
import { emptyCircuit } from "../../../service/core/diode/circuit.ts";
import { currentAt } from "../../../service/core/diode/current.ts";
import { FollowingCurrent } from "../../../service/core/diode/following-current.ts";
import { CUBIC_NODES, cubicAt, fitCubic, sumCubic } from "../../../service/core/numeric/cubic.ts";
import { SampleClock } from "../../../service/core/tracking/sample-clock.ts";
import type { Piece } from "../../../service/core/tracking/stretch.ts";
import { enterPiece, Stretch } from "../../../service/core/tracking/stretch.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import { PlainCurve } from "../../oracle/stepper-curve.ts";
import { SILICON, timedWeather } from "./stepped-run.ts";
import { coreConverter, generatorTwin, OPEN, villalvaTwin } from "./stepped-scene.ts";

const VILLALVA = photovoltaicArray(villalvaTwin().module, {
  modulesInSeries: 2,
  stringsInParallel: 3,
  wiringResistance: 0.05,
});

describe("a current that is followed", () => {
  // Jumps of more than a third of the ideality voltage, close to open circuit, leave twice as much.
  it.each([
    [0.05, 1e-9],
    [0.6, 1e-9],
    [4, 3e-9],
  ])("is the solved current, voltage moving by up to %f V: within %f of the photocurrent", (reach, tolerance) => {
    const random = seededRandom(Math.round(100 * reach));
    const following = new FollowingCurrent();
    const circuit = emptyCircuit();
    let [irradiance, temperature, voltage, worst] = [600, 25, 50, 0];
    for (let k = 0; k < 40_000; k++) {
      irradiance = Math.min(1300, Math.max(5, irradiance + random.between(-1, 1) * (random.chance(0.001) ? 800 : 3)));
      temperature = Math.min(70, Math.max(-10, temperature + random.between(-0.1, 0.1)));
      voltage = Math.min(68, Math.max(0, voltage + random.between(-reach, reach)));
      VILLALVA.circuitAt(irradiance, temperature, circuit);
      // Beyond open circuit nothing is delivered, and trackers take the current as 0.
      const [followed, solved] = [following.at(circuit, voltage), currentAt(circuit, voltage)];
      const miss = Math.abs(Math.max(0, followed) - Math.max(0, solved));
      worst = Math.max(worst, miss / circuit.photocurrent);
    }
    expect(worst).toBeLessThan(tolerance);
  });
});

describe("the sum of a cubic", () => {
  it("is that of its values at equally spaced points", () => {
    const random = seededRandom(11);
    for (let trial = 0; trial < 200; trial++) {
      const nodes = Float64Array.from(CUBIC_NODES, () => random.between(-5, 100));
      const coefficients = new Float64Array(4);
      fitCubic(nodes, 0, coefficients, 0);
      for (const [k, s] of CUBIC_NODES.entries()) expect(cubicAt(coefficients, 0, s)).toBeCloseTo(nodes[k], 10);
      const count = random.whole(1, 400);
      const spacing = random.between(0.1, 1) / count;
      const first = random.between(0, 1 - (count - 1) * spacing);
      let plain = 0;
      for (let k = 0; k < count; k++) plain += cubicAt(coefficients, 0, first + k * spacing);
      expect(Math.abs(sumCubic(coefficients, 0, { first, spacing, count }) - plain) / count).toBeLessThan(1e-10);
    }
  });
});

/** A random straight piece of weather of half a minute; in some the light changes little, in some a lot. */
function randomPiece(seed: number): Piece {
  const random = seededRandom(seed);
  const fromIrradiance = random.logBetween(5, 1100);
  const fromTemperature = random.between(0, 60);
  return {
    from: 600,
    to: 630,
    fromIrradiance,
    toIrradiance: Math.max(1, fromIrradiance * random.logBetween(0.5, 2)),
    fromTemperature,
    toTemperature: fromTemperature + random.between(-2, 2),
  };
}

/**
 * Largest errors between 29 instants of a stretch fitted to a random piece: of the maximum power, over its largest; of
 * the current at some voltages, over the light's.
 */
function stretchErrors(array: PhotovoltaicArray, seed: number): { power: number; current: number } {
  const stretch = new Stretch(array, { count: 1, tolerances: [0], write: () => undefined });
  const [condition, circuit] = [emptyCondition(), emptyCircuit()];
  const piece = randomPiece(seed);
  let length = piece.to - piece.from;
  while (!stretch.fit(piece, piece.from, piece.from + length)) length /= 2;
  let [largest, power, current] = [0, 0, 0];
  for (let k = 0; k < 29; k++) {
    const time = piece.from + ((k + 0.5) / 29) * length;
    enterPiece(condition, array, piece, time);
    stretch.circuitAt(time, circuit);
    const { maximum } = condition;
    largest = Math.max(largest, maximum.power);
    const carried = stretch.sumMaximum(2, { first: time, spacing: 1e-3 * length, count: 1 });
    power = Math.max(power, Math.abs(carried - maximum.power));
    for (const share of [0, 0.7, 1, 1.1]) {
      const at = share * maximum.voltage;
      const miss = Math.abs(currentAt(circuit, at) - currentAt(condition.circuit, at));
      current = Math.max(current, miss / circuit.photocurrent);
    }
  }
  return { power: power / largest, current };
}

describe("a stretch's cubics", () => {
  // Accepted within 3e-8 at its checks. The error of a cubic through 0, 1/3, 2/3, 1 goes as s (s-1/3) (s-2/3) (s-1),
  // which at its largest, s = .127, is 1.065 times what it is at the check at 1/6.
  it.each([
    ["the test generator", SILICON],
    ["a module with resistances", VILLALVA],
  ])(
    "are the array's exact solution within 3.3e-8 of its maximum power, 1e-8 of the light's current: %s",
    (_name, array) => {
      for (let seed = 1; seed <= 200; seed++) {
        const errors = stretchErrors(array, seed);
        expect(errors.power).toBeLessThan(3.3e-8);
        expect(errors.current).toBeLessThan(1e-8);
      }
    },
  );

  it("are refused where the light ends", () => {
    const stretch = new Stretch(SILICON, { count: 1, tolerances: [0], write: () => undefined });
    expect(stretch.fit({ ...randomPiece(1), toIrradiance: 0 }, 600, 630)).toBe(false);
  });
});

/** Light that rises by 1 W/m2 each second, so that a reading tells its instant. */
const RISING = timedWeather({ irradiance: Array.from({ length: 400 }, (_, i) => 100 + i), step: 1 });
const GENERATOR = generatorTwin("crystalline-silicon");

function clockOf(period: number, duration: number): SampleClock {
  const sampling = { reads: "open-circuit-voltage", period, duration, pilot: false, points: 0 } as const;
  return new SampleClock(sampling, coreConverter(OPEN), SILICON, RISING);
}

describe("the sample clock", () => {
  // In whole milliseconds: a sample at waking + j period serves every period whose middle is at or after it (physics 7).
  it("serves each control period with the latest sample at or before its middle, exactly", () => {
    const random = seededRandom(13);
    let late = 0;
    for (let trial = 0; trial < 300; trial++) {
      const [control, sample] = [10 * random.whole(1, 40), 10 * random.whole(1, 60)];
      const wakes = random.whole(0, 300);
      const clock = clockOf(sample / 1000, 0);
      clock.wake((wakes * control) / 1000);
      let taken = 0;
      for (let k = wakes; k < wakes + 300; k++) {
        const halfMilliseconds = (2 * k + 1 - 2 * wakes) * control;
        const due = 1 + Math.floor(halfMilliseconds / (2 * sample));
        if (clock.isDue((k + 0.5) * (control / 1000)) !== (due !== taken)) late++;
        taken = due;
      }
    }
    expect(late).toBe(0);
  });

  it("reads the array at the sample's own instant", () => {
    const clock = clockOf(7.7, 0.5);
    clock.wake(3);
    const whole = { first: 0, last: RISING.irradiance.length - 1 };
    for (let k = 3; k < 380; k++) {
      clock.isDue(k + 0.5);
      const instant = 3 + 7.7 * Math.floor((k + 0.5 - 3) / 7.7);
      const { voc } = new PlainCurve(GENERATOR.inWeather(100 + instant, 25), OPEN);
      expect(clock.read(whole) / voc).toBeCloseTo(1, 12);
    }
  });

  it("reads 0 in the dark", () => {
    const dark = timedWeather({ irradiance: [0, 0, 500], step: 10 });
    const sampling = { reads: "short-circuit-current", period: 5, duration: 1, pilot: false, points: 0 } as const;
    const clock = new SampleClock(sampling, coreConverter(OPEN), SILICON, dark);
    clock.wake(0);
    expect(clock.isDue(4)).toBe(true);
    expect(clock.read({ first: 0, last: 2 })).toBe(0);
  });

  it("interrupts a period for the share that its samples overlap", () => {
    const random = seededRandom(17);
    for (let trial = 0; trial < 2000; trial++) {
      const period = random.logBetween(0.1, 50);
      const duration = period * random.next();
      const wokeAt = random.between(0, 1000);
      const from = wokeAt + random.between(0, 200);
      const to = from + random.logBetween(0.05, 20);
      let overlap = 0;
      for (let start = wokeAt; start < to; start += period) {
        overlap += Math.max(0, Math.min(to, start + duration) - Math.max(from, start));
      }
      const clock = clockOf(period, duration);
      clock.wake(wokeAt);
      expect(clock.interruptedShare(from, to)).toBeCloseTo(overlap / (to - from), 8);
    }
  });
});
