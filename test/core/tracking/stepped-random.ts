import type { Layout } from "../../../service/core/array/array.ts";
import type { SeededRandom } from "../../oracle/seeded-random.ts";
import type { PlainConverter, PlainSensor } from "../../oracle/stepper-curve.ts";
import type { PlainWeather } from "../../oracle/stepper-weather.ts";
import type { Choice, Pair, Twin } from "./stepped-scene.ts";
import { generatorTwin, OPEN, pairOf, villalvaTwin } from "./stepped-scene.ts";

/** What a random scene may hold beside its rule and weather. */
export interface Spice {
  window?: true;
  powerLimit?: true;
  currentLimit?: true;
  wakePower?: true;
  ripple?: true;
  /** Wrong sensors; `rounded` ones as well. */
  sensors?: "wrong" | "rounded";
}

/** A rule of random settings for an array, at a control period. */
export type RuleDraw = (random: SeededRandom, about: { twin: Twin; controlPeriod: number; duration: number }) => Choice;

const TWINS = [() => generatorTwin("crystalline-silicon"), () => generatorTwin("thin-film"), villalvaTwin];

/** A sensor that errs by up to 2 % and half a percent of `scale`, and rounds to a few thousandths of it if asked. */
function wrongSensor(random: SeededRandom, scale: number, rounds: boolean): PlainSensor {
  return {
    gain: random.between(-0.02, 0.02),
    offset: random.between(-0.005, 0.005) * scale,
    resolution: rounds ? random.between(0.001, 0.004) * scale : 0,
  };
}

function drawConverter(random: SeededRandom, spice: Spice, voc: number, isc: number): PlainConverter {
  const converter = { ...OPEN };
  if (spice.window) {
    converter.lowest = random.between(0.5, 0.82) * voc;
    converter.highest = random.between(0.78, 1.05) * voc;
    if (converter.lowest > converter.highest) converter.highest = converter.lowest + 0.05 * voc;
  }
  if (spice.powerLimit) converter.mostPower = random.between(0.3, 0.8) * 0.75 * voc * isc;
  if (spice.currentLimit) converter.mostCurrent = random.between(0.4, 0.9) * isc;
  if (spice.wakePower) converter.wakePower = random.between(0.02, 0.2) * voc * isc;
  if (spice.ripple) converter.ripple = random.between(0.01, 0.08);
  if (spice.sensors !== undefined) {
    converter.voltageSensor = wrongSensor(random, voc, spice.sensors === "rounded");
    converter.currentSensor = wrongSensor(random, isc, spice.sensors === "rounded");
  }
  return converter;
}

/** Weather of 6 to 30 samples: a wandering sun, some nights, some samples missing, a battery that wanders too. */
export function drawWeather(random: SeededRandom, voc: number, spice: { missing: boolean }): PlainWeather {
  const samples = random.whole(6, 30);
  const irradiance: number[] = [];
  const missing: boolean[] = [];
  let [sun, nights, gaps] = [random.between(20, 1100), 0, 0];
  for (let i = 0; i < samples; i++) {
    sun = Math.min(1250, Math.max(1, sun + random.between(-1, 1) * (random.chance(0.3) ? 500 : 60)));
    if (random.chance(0.08)) nights = random.whole(1, 3);
    if (spice.missing && random.chance(0.06)) gaps = random.whole(1, 3);
    irradiance.push(nights-- > 0 ? 0 : sun);
    missing.push(gaps-- > 0);
  }
  const column = (low: number, high: number): number[] => irradiance.map(() => random.between(low, high));
  return {
    step: random.logBetween(1, 300),
    timing: random.chance(0.5) ? "mean" : "instant",
    irradiance,
    temperature: column(5, 65),
    battery: column(0.6 * voc, 0.95 * voc),
    missing,
  };
}

/** A scene for both steppers, of at most about `periods` control periods. */
export function drawPair(random: SeededRandom, draw: RuleDraw, spice: Spice, periods: number): Pair {
  const twin = TWINS[random.whole(0, 2)]();
  const modulesInSeries = random.whole(1, 3);
  const stringsInParallel = random.whole(1, 3);
  const [voc, isc] = [twin.nominalVoc * modulesInSeries, twin.isc * stringsInParallel];
  const wiringResistance = random.chance(0.5) ? random.between(0, 0.02) * (voc / isc) : 0;
  const layout: Layout = { modulesInSeries, stringsInParallel, wiringResistance };
  const weather = drawWeather(random, voc, { missing: random.chance(0.5) });
  const duration = weather.step * weather.irradiance.length;
  const shortest = duration / periods;
  const controlPeriod = Math.max(shortest, Math.min(random.logBetween(0.1, 10), weather.step / 2.1));
  const choice = draw(random, { twin, controlPeriod, duration });
  return pairOf(twin, layout, { weather, converter: drawConverter(random, spice, voc, isc), choice });
}
