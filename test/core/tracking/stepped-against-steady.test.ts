import { describe, expect, it } from "vitest";
import type { Trial } from "./stepped-run.ts";
import { run, SILICON } from "./stepped-run.ts";

/*
 * Expected: constant light, step 1 % of Uoc,stc: the mean over 64 starts V0 - (j/64) D equals the steady figure within
 * 2 % of the loss; single starts lie within .5 to 2.1 of it (derived independently from the orbits of physics 7). A rule
 * that rests may do so on the peak itself, or at the edge of its tolerance: its single starts lie anywhere from 0 on.
 */
const STARTS = 64;
const STEP = 0.01 * SILICON.standard.openCircuitVoltage;
/** V: just below open circuit at 1000 W/m2, where a waking rule starts when it is the window's upper edge. */
const TOP = 124.5;
/** s: a whole number of the 16 s and 20 s that samples and sweeps are apart. */
const SETTLING = 80;
const COUNTED = 160;
const stepFraction = 0.01;

/** `spread`: how far the window's edge must move for the rule's start to move by a step. */
interface Row {
  trial: Trial;
  spread?: number;
  rests?: true;
}

/** Target rules at the maximum power point (Vmp 99.709 V, fractions .798353 of Voc), where their hunting is all they lose. */
const ROWS: Record<string, Row> = {
  "constant-voltage": { trial: { kind: "constant-voltage", settings: { stepFraction } } },
  "temperature-compensated-voltage": { trial: { kind: "temperature-compensated-voltage", settings: { stepFraction } } },
  "fractional-open-circuit-voltage": {
    trial: { kind: "fractional-open-circuit-voltage", settings: { fraction: 0.798353, stepFraction } },
  },
  "fractional-open-circuit-voltage with a pilot cell": {
    trial: {
      kind: "fractional-open-circuit-voltage",
      settings: { fraction: 0.798353, pilotCell: true, stepFraction },
    },
  },
  "fractional-open-circuit-voltage off the peak": {
    trial: { kind: "fractional-open-circuit-voltage", settings: { fraction: 0.76, stepFraction } },
  },
  "short-current-pulse": { trial: { kind: "short-current-pulse", settings: { fraction: 0.9, stepFraction } } },
  "short-current-pulse with a pilot cell": {
    trial: { kind: "short-current-pulse", settings: { fraction: 0.9, pilotCell: true, stepFraction } },
  },
  "battery-coupled": { trial: { kind: "battery-coupled", settings: { batteryVoltage: 99.709, stepFraction } } },
  "perturb-and-observe": { trial: { kind: "perturb-and-observe", settings: { stepFraction } } },
  "incremental-conductance": { trial: { kind: "incremental-conductance", settings: { stepFraction } }, rests: true },
  "incremental-conductance that never rests": {
    trial: { kind: "incremental-conductance", settings: { stepFraction, holdTolerance: 0 } },
  },
  // Of 6 points the fifth, at .8 of the edge, is the best: the climb starts there.
  "power-curve-scan that climbs": {
    trial: {
      kind: "power-curve-scan",
      settings: { stepFraction, points: 6, scanPeriod: 20, sweepDuration: 0, afterwards: "climb" },
    },
    spread: 1 / 0.8,
  },
};

function singleLosses({ trial, spread = 1 }: Row): number[] {
  const trials = Array.from({ length: STARTS }, (_, j) => ({
    ...trial,
    converter: { trackingMaximumVoltage: TOP - (j / STARTS) * STEP * spread },
  }));
  const irradiance = new Array<number>(SETTLING + COUNTED).fill(1000);
  return run({ irradiance, step: 1, from: SETTLING }, trials).map(({ fraction }) => fraction);
}

describe("stepped tracking in constant light", () => {
  it.each(Object.entries(ROWS))("comes to the steady figure over all starts: %s", (_name, row) => {
    const awake = { ...row.trial, converter: { trackingMaximumVoltage: TOP } };
    const [{ fraction: steady }] = run({ irradiance: [1000], step: 1 }, [awake], "steady");
    const singles = singleLosses(row);
    const mean = singles.reduce((sum, one) => sum + one, 0) / STARTS;
    expect(steady).toBeGreaterThan(1e-5);
    expect(Math.abs(mean / steady - 1)).toBeLessThan(0.02);
    if (row.rests) return;
    expect(Math.min(...singles) / steady).toBeGreaterThan(0.5);
    expect(Math.max(...singles) / steady).toBeLessThan(2.1);
  });

  it("is the steady figure from the first whole sweep on where a swept voltage is held", () => {
    const settings = { points: 37, scanPeriod: 20, sweepDuration: 2, afterwards: "hold" };
    const trial = { kind: "power-curve-scan", settings } as const;
    const [{ fraction: steady }] = run({ irradiance: [1000], step: 1 }, [trial], "steady");
    const [{ fraction }] = run({ irradiance: new Array<number>(160).fill(1000), step: 1 }, [trial]);
    expect(Math.abs(fraction / steady - 1)).toBeLessThan(1e-8);
  });

  it("loses nothing with perfect tracking", () => {
    const [{ lost, available }] = run({ irradiance: new Array<number>(20).fill(1000), step: 1 }, [
      { kind: "perfect", settings: {} },
    ]);
    expect(Math.abs(lost) / available).toBeLessThan(1e-12);
  });
});
