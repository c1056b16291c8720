import { emptyCondition, enterCondition } from "../core/array/condition.ts";
import { bracketedRoot } from "../core/numeric/bracketed-root.ts";
import { openLedger } from "../core/tracking/ledger.ts";
import { trackSteady } from "../core/tracking/steady.ts";
import type { EfficiencyBench, EfficiencyShares } from "./efficiency-bench.ts";
import { sharesOf } from "./efficiency-bench.ts";

/** Fractions of the generator's maximum power at 1000 W/m2, and their weights (EN 50530:2010, from memory). */
const LEVELS = [0.05, 0.1, 0.2, 0.25, 0.3, 0.5, 0.75, 1];
const EUROPEAN: Record<number, number> = { 0.05: 0.03, 0.1: 0.06, 0.2: 0.13, 0.3: 0.1, 0.5: 0.48, 1: 0.2 };
const CEC: Record<number, number> = { 0.1: 0.04, 0.2: 0.05, 0.3: 0.12, 0.5: 0.21, 0.75: 0.53, 1: 0.05 };

/** One level of the static test. */
export interface EfficiencyLevel extends EfficiencyShares {
  /** 1, of the maximum power at 1000 W/m2. */
  level: number;
  /** W/m2 at which the module gives that power. */
  irradiance: number;
}

/** Efficiencies at the standard's levels and their weighted means. */
export interface StaticEfficiency {
  levels: EfficiencyLevel[];
  europeanWeighted: number;
  cecWeighted: number;
}

/** The static test: each level at rest. */
export function staticTest(bench: EfficiencyBench): StaticEfficiency {
  const levels = LEVELS.map((level): EfficiencyLevel => {
    const irradiance = irradianceFor(bench, level);
    const ledger = openLedger(1, 1, { operating: false, causes: false });
    const weather = {
      irradiance: Float64Array.of(irradiance),
      cellTemperature: Float64Array.of(bench.cellTemperature),
      skipped: null,
      spanOf: new Uint16Array(1),
    };
    trackSteady(bench.array, weather, [{ rule: bench.rule, converter: bench.converter, ledger }], null);
    return { level, irradiance, ...sharesOf(ledger, 0) };
  });
  const weighted = (weights: Record<number, number>): number =>
    levels.reduce((sum, { level, efficiency }) => sum + (weights[level] ?? 0) * efficiency, 0);
  return { levels, europeanWeighted: weighted(EUROPEAN), cecWeighted: weighted(CEC) };
}

/** The irradiance (W/m2) at which the array's maximum power is `level` of that at 1000 W/m2. */
function irradianceFor({ array, cellTemperature }: EfficiencyBench, level: number): number {
  if (level === 1) return 1000;
  const condition = emptyCondition();
  const powerAt = (irradiance: number): number => {
    enterCondition(condition, array, irradiance, cellTemperature);
    return condition.maximum.power;
  };
  const full = powerAt(1000);
  return bracketedRoot((irradiance) => powerAt(irradiance) - level * full, 1, 1000);
}
