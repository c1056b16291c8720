import { expect, it } from "vitest";
import type { Layout } from "../../../service/core/array/array.ts";
import type { RuleDefinition } from "../../../service/core/rules/rule.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import type { Trial } from "../tracking/steady-run.ts";
import { OPEN_CONVERTER, SINGLE, steadyRun } from "../tracking/steady-run.ts";
import { EXACT, MODULE, plainTrial, randomConverter, randomSample, randomSettings } from "./random-trials.ts";

/** A trial for one module at one string, moved to a layout with everything scaled along. */
function scaled(trial: Trial, { modulesInSeries: m, stringsInParallel: s }: Layout): Trial {
  const c = { ...OPEN_CONVERTER, ...trial.converter };
  const { batteryVoltage, pathDrop, ...settings } = trial.settings as Record<string, number>;
  return {
    kind: trial.kind,
    settings: {
      ...settings,
      ...(batteryVoltage === undefined ? {} : { batteryVoltage: m * batteryVoltage }),
      ...(pathDrop === undefined ? {} : { pathDrop: m * pathDrop }),
    },
    converter: {
      ...c,
      trackingMinimumVoltage: m * c.trackingMinimumVoltage,
      trackingMaximumVoltage: m * c.trackingMaximumVoltage,
      maximumPower: m * s * c.maximumPower,
      maximumCurrent: s * c.maximumCurrent,
      wakePower: m * s * c.wakePower,
    },
  };
}

/** Strings, modules in series, repetition and company leave the fractions, or the bits, as they are. */
export function keepsItsFigures(rule: RuleDefinition): void {
  const { kind } = plainTrial(rule);
  const random = seededRandom(77);
  const weather = Array.from({ length: 12 }, () => randomSample(random));
  const trials: Trial[] = Array.from({ length: 12 }, () => {
    const converter = { ...randomConverter(random), voltageSensor: EXACT, currentSensor: EXACT };
    return { kind, settings: randomSettings(rule, random), converter };
  });
  const layouts: Layout[] = [
    { modulesInSeries: 1, stringsInParallel: 7, wiringResistance: 0.1 / 7 },
    { modulesInSeries: 13, stringsInParallel: 1, wiringResistance: 1.3 },
    { modulesInSeries: 9, stringsInParallel: 4, wiringResistance: 0.9 / 4 },
  ];

  it.each(layouts)("keeping its fractions with $modulesInSeries in series and $stringsInParallel strings", (layout) => {
    const one = steadyRun(MODULE, { ...SINGLE, wiringResistance: 0.1 }, weather, trials);
    const many = steadyRun(
      MODULE,
      layout,
      weather,
      trials.map((trial) => scaled(trial, layout)),
    );
    const size = layout.modulesInSeries * layout.stringsInParallel;
    for (const [k, outcome] of one.entries()) {
      expect(many[k].available / (size * outcome.available)).toBeCloseTo(1, 11);
      for (const [cause, watts] of Object.entries(outcome.causes)) {
        const theirs = many[k].causes[cause as keyof typeof outcome.causes];
        const error = Math.abs(theirs / many[k].available - watts / outcome.available);
        expect(error, `${cause} of ${JSON.stringify(trials[k])}`).toBeLessThan(1e-9);
      }
    }
  });

  it("giving the same bits a second time, and in any company", () => {
    const layout = { ...SINGLE, wiringResistance: 0.1 };
    const first = steadyRun(MODULE, layout, weather, trials);
    const again = steadyRun(MODULE, layout, weather, trials);
    const reversed = steadyRun(MODULE, layout, weather, [...trials].reverse()).reverse();
    for (const [k, outcome] of first.entries()) {
      expect(again[k].bits).toEqual(outcome.bits);
      expect(reversed[k].bits).toEqual(outcome.bits);
      expect(steadyRun(MODULE, layout, weather, [trials[k]])[0].bits).toEqual(outcome.bits);
    }
  });
}
