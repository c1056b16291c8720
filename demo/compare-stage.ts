import type { ComparisonAnswer, Kneegap } from "@kneegap/sdk";
import { inventedClimate } from "./invented-climate.ts";
import type { LandingStage } from "./landing-stages.ts";

/** An invented 60-cell module; its figures are plausible and no maker's. */
export const MODULE = {
  kind: "datasheet",
  cellsInSeries: 60,
  shortCircuitCurrent: 9.91,
  openCircuitVoltage: 38.9,
  maximumPowerCurrent: 9.36,
  maximumPowerVoltage: 31.8,
  shortCircuitCurrentCoefficient: 0.05,
  openCircuitVoltageCoefficient: -0.29,
} as const;

/** What the cooperative can buy: three fixed rules, and the better converter they are held against. */
export const CANDIDATES = [
  { label: "constant voltage", rule: { kind: "constant-voltage" } },
  { label: "fraction of Voc", rule: { kind: "fractional-open-circuit-voltage" } },
  { label: "current pulse", rule: { kind: "short-current-pulse" } },
  { label: "perturb & observe", rule: { kind: "perturb-and-observe" } },
] as const;

/** The label of the better converter. */
export const BETTER = CANDIDATES[3].label;

/** Compares the candidates at one landing stage over its invented year. */
export function compareStage(client: Kneegap, stage: LandingStage, seed: number): Promise<ComparisonAnswer> {
  const { irradiance, airTemperature, windSpeed } = inventedClimate(stage, seed);
  return client.compare({
    module: MODULE,
    array: { modulesInSeries: stage.modulesInSeries, stringsInParallel: stage.stringsInParallel },
    converter: { inputVoltageRating: 250 },
    candidates: CANDIDATES.map((candidate) => ({ ...candidate })),
    baseline: CANDIDATES[0].label,
    climate: {
      start: "2025-01-01T00:00:00+00:00",
      step: 3600,
      irradiance: { kind: "plane-of-array", values: irradiance },
      temperature: { kind: "ambient", values: airTemperature, windSpeed, model: { kind: "faiman" } },
    },
    energyValue: { currency: "EUR", perKilowattHour: 0.25 },
  });
}
