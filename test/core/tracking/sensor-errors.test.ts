import { describe, expect, it } from "vitest";
import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import { sensorsOf } from "../../../service/core/tracking/converter.ts";
import type { SensorErrors } from "../../oracle/climbing-simulation.ts";
import { incrementalMeanPower, NO_ERRORS, perturbMeanPower } from "../../oracle/climbing-simulation.ts";
import { bisect, referenceCurrent, referenceOpenCircuit, referencePeak } from "../../oracle/diode-equation.ts";
import { powerCurve } from "../../oracle/power-curve.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import { VILLALVA, VILLALVA_SOLVED } from "../module/paper-modules.ts";
import { steadyPoint } from "./steady-run.ts";

const MODULE = singleDiodeModule(VILLALVA_SOLVED);
const CIRCUIT = VILLALVA.solved!;
const VOC = referenceOpenCircuit(CIRCUIT);
const ISC = referenceCurrent(CIRCUIT, 0);
const PEAK = referencePeak(CIRCUIT);
const FREE = { lowest: 0, highest: Infinity, mostPower: Infinity, mostCurrent: Infinity, ripple: 0 };

const powerAt = (voltage: number): number => voltage * referenceCurrent(CIRCUIT, voltage);
const sensors = (of: Partial<SensorErrors>) => {
  const errors = { ...NO_ERRORS, ...of };
  return {
    voltageSensor: {
      gain: errors.voltageGain,
      offset: errors.voltageOffset,
      resolution: errors.voltageResolution,
    },
    currentSensor: {
      gain: errors.currentGain,
      offset: errors.currentOffset,
      resolution: errors.currentResolution,
    },
  };
};

/** What Villalva's solved circuit delivers at standard test conditions: a reading is true (1 + gain) + offset. */
describe("a target rule with erring sensors holds what its sensor reads as the target", () => {
  it("constant voltage: (target - offset)/(1 + gain)", () => {
    const { power, causes } = steadyPoint(MODULE, [1000, 25], {
      kind: "constant-voltage",
      settings: { setVoltagePerModule: 26.3 },
      converter: sensors({ voltageGain: 0.02, voltageOffset: -0.4 }),
    });
    const expected = powerAt((26.3 + 0.4) / 1.02);
    expect(power[0] / expected).toBeCloseTo(1, 9);
    expect(causes.setPoint / (PEAK.power - expected)).toBeCloseTo(1, 7);
  });

  it("fractional open-circuit voltage: gain cancels, an offset does not", () => {
    const settings = { fraction: 0.8, pilotCell: true };
    const kind = "fractional-open-circuit-voltage";
    const gain = steadyPoint(MODULE, [1000, 25], { kind, settings, converter: sensors({ voltageGain: -0.03 }) });
    const offset = steadyPoint(MODULE, [1000, 25], { kind, settings, converter: sensors({ voltageOffset: 1.5 }) });
    expect(gain.voltage[0] / (0.8 * VOC)).toBeCloseTo(1, 9);
    expect(offset.voltage[0] / (0.8 * (VOC + 1.5) - 1.5)).toBeCloseTo(1, 9);
  });

  it("fractional open-circuit voltage: the sample is rounded to the resolution", () => {
    const { voltage } = steadyPoint(MODULE, [1000, 25], {
      kind: "fractional-open-circuit-voltage",
      settings: { fraction: 0.8 },
      converter: sensors({ voltageResolution: 0.7 }),
    });
    expect(voltage[0] / (0.8 * 0.7 * Math.round(VOC / 0.7))).toBeCloseTo(1, 12);
  });

  it("short-current pulse: the voltage at (fraction (Isc (1 + gain) + offset) - offset)/(1 + gain)", () => {
    const { power } = steadyPoint(MODULE, [1000, 25], {
      kind: "short-current-pulse",
      settings: { fraction: 0.9, pilotCell: true },
      converter: sensors({ currentGain: 0.01, currentOffset: 0.1 }),
    });
    const current = (0.9 * (ISC * 1.01 + 0.1) - 0.1) / 1.01;
    const voltage = bisect((v) => referenceCurrent(CIRCUIT, v) > current, 0, VOC);
    expect(power[0] / powerAt(voltage)).toBeCloseTo(1, 9);
  });

  it("battery-coupled: nothing, for no sensor comes between", () => {
    const trial = { kind: "battery-coupled", settings: { batteryVoltage: 24 } } as const;
    const erring = steadyPoint(MODULE, [1000, 25], { ...trial, converter: sensors({ voltageGain: 0.05 }) });
    expect(erring.bits).toEqual(steadyPoint(MODULE, [1000, 25], trial).bits);
  });

  it("states offsets and resolutions in the open-circuit voltage and short-circuit current at standard conditions", () => {
    const standard = { openCircuitVoltage: 40, shortCircuitCurrent: 8 } as Parameters<typeof sensorsOf>[1];
    const shares = { voltageGain: 0.1, voltageOffset: 0.01, voltageResolution: 0.001 };
    const both = { ...shares, currentGain: -0.1, currentOffset: 0.02, currentResolution: 0.002 };
    expect(sensorsOf(both, standard)).toEqual({
      voltage: { gain: 0.1, offset: 0.4, resolution: 0.04 },
      current: { gain: -0.1, offset: 0.16, resolution: 0.016 },
    });
  });
});

describe("a climber with erring sensors falls into the orbit that they show it", () => {
  const random = seededRandom(64);
  const curve = powerCurve(CIRCUIT, FREE);
  const erring = Array.from({ length: 30 }, () => ({
    stepFraction: random.logBetween(0.003, 0.03),
    errors: {
      ...NO_ERRORS,
      voltageGain: random.between(-0.03, 0.03),
      voltageOffset: random.between(-0.02, 0.02) * VOC,
      currentGain: random.between(-0.03, 0.03),
      currentOffset: random.between(-0.02, 0.02) * ISC,
    },
  }));
  const rounding = Array.from({ length: 30 }, () => ({
    stepFraction: random.logBetween(0.005, 0.03),
    errors: {
      ...NO_ERRORS,
      voltageResolution: random.logBetween(1e-4, 1e-3) * VOC,
      currentResolution: random.logBetween(1e-4, 1e-3) * ISC,
    },
  }));
  const cases = [...erring, ...rounding];

  it("perturb and observe, as simulated from open circuit, within 1e-8", () => {
    for (const { stepFraction, errors } of cases) {
      const { power, causes } = steadyPoint(MODULE, [1000, 25], {
        kind: "perturb-and-observe",
        settings: { stepFraction },
        converter: sensors(errors),
      });
      const expected = perturbMeanPower(curve, stepFraction * VOC, errors);
      expect(Math.abs(power[0] - expected) / PEAK.power, JSON.stringify({ stepFraction, errors })).toBeLessThan(1e-8);
      expect(causes.setPoint).toBe(0);
    }
  });

  it("incremental conductance, as simulated from open circuit, within 1e-8", () => {
    for (const { stepFraction, errors } of cases) {
      const tolerances = { holdTolerance: 10 * stepFraction, currentTolerance: 1e-3 };
      const { power } = steadyPoint(MODULE, [1000, 25], {
        kind: "incremental-conductance",
        settings: { stepFraction },
        converter: sensors(errors),
      });
      const expected = incrementalMeanPower(curve, { step: stepFraction * VOC, ...tolerances }, errors);
      expect(Math.abs(power[0] - expected) / PEAK.power, JSON.stringify({ stepFraction, errors })).toBeLessThan(1e-8);
    }
  });
});
