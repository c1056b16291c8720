import { expect, it } from "vitest";
import type { RuleDefinition } from "../../../service/core/rules/rule.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import type { WeatherSample } from "../tracking/steady-run.ts";
import { SINGLE, steadyPoint, steadyRun } from "../tracking/steady-run.ts";
import { MODULE, MODULES, plainTrial, randomConverter, randomSample, randomSettings } from "./random-trials.ts";

/** 400 random weathers, modules, settings and converters. */
export function accountsForEveryWatt(rule: RuleDefinition): void {
  const random = seededRandom(4242);
  const plain = plainTrial(rule);
  const trials = Array.from({ length: 400 }, () => {
    const converter = randomConverter(random);
    const trial = { kind: plain.kind, settings: randomSettings(rule, random), converter };
    const sample = randomSample(random);
    const outcome = steadyPoint(MODULES[random.whole(0, MODULES.length - 1)], sample, trial);
    return { outcome, converter, story: JSON.stringify({ trial, sample }) };
  });

  it("with causes that add up to available less delivered, within 1e-9 of available", () => {
    for (const { outcome, story } of trials) {
      const missing = outcome.available - outcome.power[0] - outcome.lost;
      expect(Math.abs(missing), story).toBeLessThanOrEqual(1e-9 * outcome.available);
    }
  });

  it("with an efficiency from 0 to 1", () => {
    for (const { outcome, story } of trials) {
      expect(outcome.power[0], story).toBeGreaterThanOrEqual(0);
      expect(outcome.power[0], story).toBeLessThanOrEqual(outcome.available * (1 + 1e-12));
    }
  });

  it("never delivering beyond a limit of its converter", () => {
    for (const { outcome, converter, story } of trials) {
      expect(outcome.power[0], story).toBeLessThanOrEqual(converter.maximumPower * (1 + 1e-12));
      expect(outcome.available + outcome.clipped).toBeCloseTo(outcome.maximum[0], 9);
    }
  });

  it("without a NaN or an infinity, in the weather of the extremes too", () => {
    for (const { outcome, story } of trials) expect(outcome.bits.every(Number.isFinite), story).toBe(true);
    for (const module of MODULES) {
      for (const irradiance of [0, 1e-12, 1e-6, 1e-3, 1, 2000]) {
        for (const cellTemperature of [-40, 25, 90]) {
          const outcome = steadyPoint(module, [irradiance, cellTemperature], plain);
          expect(outcome.bits.every(Number.isFinite), `${irradiance} W/m2, ${cellTemperature} degC`).toBe(true);
        }
      }
    }
  });

  it("adding nothing for samples in the dark, to the bit", () => {
    const lit: WeatherSample[] = [
      [300, 20],
      [900, 45],
    ];
    const nights: WeatherSample[] = [[0, 10], lit[0], [0, 5], [0, -40], lit[1], [0, 12]];
    const day = steadyRun(MODULE, SINGLE, lit, [plain])[0];
    const all = steadyRun(MODULE, SINGLE, nights, [plain])[0];
    expect([all.available, all.clipped, all.causes]).toEqual([day.available, day.clipped, day.causes]);
    expect([all.power[0], all.voltage[2], all.current[3]]).toEqual([0, 0, 0]);
  });
}
