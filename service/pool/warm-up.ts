import { CEILINGS } from "../wire/limits.ts";
import { performOperation } from "../wire/operations.ts";

/** Enough for the engine to compile what every estimate runs through. */
const [SAMPLES, ROUNDS] = [2000, 8];

/** Runs a made-up estimate a few times, so that the first request is not the one that waits for the compiler. */
export function warmUp(): void {
  const irradiance = Array.from({ length: SAMPLES }, (_, k) => Math.max(0, 800 * Math.sin((k / 24) * 2 * Math.PI)));
  const request = {
    module: {
      kind: "datasheet",
      cellsInSeries: 60,
      shortCircuitCurrent: 10,
      openCircuitVoltage: 39,
      maximumPowerCurrent: 9.4,
      maximumPowerVoltage: 32,
      shortCircuitCurrentCoefficient: 0.05,
      openCircuitVoltageCoefficient: -0.29,
    },
    rule: { kind: "fractional-open-circuit-voltage" },
    climate: {
      start: "2025-01-01T00:00:00Z",
      step: 3600,
      irradiance: { kind: "plane-of-array", values: irradiance },
      temperature: { kind: "ambient", values: irradiance.map((value) => 5 + value / 100) },
    },
  };
  const body = new TextEncoder().encode(JSON.stringify(request));
  for (let round = 0; round < ROUNDS; round++) {
    const answer = performOperation("estimate", body, CEILINGS);
    if (!answer.ok) throw new Error(`the warm-up was refused: ${answer.problem.detail}`);
  }
}
