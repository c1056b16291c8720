import { describe, expect, it } from "vitest";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import type { RuleDefinition } from "../../../service/core/rules/rule.ts";
import type { Converter } from "../../../service/core/tracking/converter.ts";
import type { Outcome, WeatherSample } from "../tracking/steady-run.ts";
import { SINGLE, steadyPoint } from "../tracking/steady-run.ts";
import { accountsForEveryWatt } from "./contract-accounts.ts";
import { declaresItself } from "./contract-declaration.ts";
import { keepsItsFigures } from "./contract-invariances.ts";
import { MODULE, plainTrial } from "./random-trials.ts";

/** The suite that every rule of the table has to pass. */
export function contract(rule: RuleDefinition): void {
  const plain = plainTrial(rule);
  const { kind } = plain;
  const at = (sample: WeatherSample, converter: Partial<Converter> = {}): Outcome =>
    steadyPoint(MODULE, sample, { ...plain, converter });

  describe(`${kind} declares itself`, () => declaresItself(rule));
  describe(`${kind} accounts for every watt`, () => accountsForEveryWatt(rule));
  describe(`${kind} does not care for scale, order or repetition`, () => keepsItsFigures(rule));

  describe(`${kind} under its converter's limits`, () => {
    const { maximumPower: power, maximumPowerVoltage: voltage } = photovoltaicArray(MODULE, SINGLE).standard;

    it("counts what a power limit cuts as clipped, in no figure of the tracking", () => {
      const limit = 0.4 * power;
      const { clipped, available, power: delivered } = at([1000, 25], { maximumPower: limit });
      expect(clipped / (power - limit)).toBeCloseTo(1, 12);
      expect(available).toBe(limit);
      expect(delivered[0]).toBeLessThanOrEqual(limit);
      expect(at([100, 25], { maximumPower: limit }).clipped).toBe(0);
    });

    it("counts what a current limit cuts as clipped, and never carries more current", () => {
      const { clipped, available, maximum, current } = at([1000, 25], { maximumCurrent: 3 });
      expect(clipped + available).toBeCloseTo(maximum[0], 9);
      expect(clipped).toBeGreaterThan(0.4 * power);
      expect(current[0]).toBeLessThanOrEqual(3 * (1 + 1e-12));
    });

    it("delivers no more than there is when a ripple rides on a current limit", () => {
      for (const maximumCurrent of [0.3, 1, 3, 7]) {
        for (const rippleAmplitude of [0.02, 0.08]) {
          const { power: delivered, available } = at([1000, 25], { maximumCurrent, rippleAmplitude });
          expect(delivered[0], `${maximumCurrent} A, ${rippleAmplitude}`).toBeLessThanOrEqual(available * (1 + 1e-12));
        }
      }
    });

    it("stays inside its voltage window, whose cost is the window's", () => {
      for (const [low, high] of [
        [1.1, 1.2],
        [0.7, 0.8],
      ]) {
        const window = { trackingMinimumVoltage: low * voltage, trackingMaximumVoltage: high * voltage };
        const { causes, voltage: held, available } = at([1000, 25], window);
        expect(held[0]).toBeGreaterThanOrEqual(low * voltage * (1 - 1e-12));
        expect(held[0]).toBeLessThanOrEqual(high * voltage * (1 + 1e-12));
        const best = low > 1 ? low * voltage : high * voltage;
        const perfect = steadyPoint(MODULE, [1000, 25], { kind: "perfect", settings: {}, converter: window });
        expect(perfect.voltage[0]).toBe(best);
        expect(causes.voltageWindow).toBe(perfect.lost);
        expect(causes.voltageWindow).toBeGreaterThan(0.02 * available);
      }
    });

    it("delivers nothing where its window lies beyond open circuit", () => {
      const {
        power: delivered,
        causes,
        available,
      } = at([1000, 25], {
        trackingMinimumVoltage: 40,
        trackingMaximumVoltage: 60,
      });
      expect(delivered[0]).toBe(0);
      expect(causes.voltageWindow).toBe(available);
    });

    it("sleeps below its wake power, all of it interruption but what it would have lost anyway", () => {
      const awake = at([50, 25], { wakePower: 1 });
      const asleep = at([50, 25], { wakePower: 50 });
      expect(awake.power[0]).toBeGreaterThan(0);
      if (rule.kind === "perfect") {
        expect(asleep.bits).toEqual(awake.bits);
        return;
      }
      expect(asleep.power[0]).toBe(0);
      expect(asleep.current[0]).toBe(0);
      expect(asleep.lost / asleep.available).toBeCloseTo(1, 12);
      expect(asleep.causes.setPoint).toBe(awake.causes.setPoint);
      expect(asleep.causes.regulation).toBe(awake.causes.regulation);
    });

    it("pays for a ripple in regulation alone; the control case has none", () => {
      const smooth = at([700, 40]);
      const rippling = at([700, 40], { rippleAmplitude: 0.05 });
      const { regulation: before, interruption: _b, ...others } = smooth.causes;
      const { regulation: after, interruption: _a, ...same } = rippling.causes;
      expect(same).toEqual(others);
      if (rule.kind === "perfect") expect(rippling.bits).toEqual(smooth.bits);
      else expect(after).toBeGreaterThan(before);
    });
  });
}
