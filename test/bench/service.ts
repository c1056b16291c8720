import { writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import type { RunningService } from "../../demo/service-process.ts";
import { startService } from "../../demo/service-process.ts";
import { CEILINGS } from "../../service/wire/limits.ts";
import { performOperation } from "../../service/wire/operations.ts";
import type { Row } from "./measure.ts";
import { alternate, best } from "./measure.ts";
import { pythonPeer, runPython } from "./peers.ts";
import { peerWeather } from "./weather.ts";

const MAIN = fileURLToPath(new URL("../../dist/service/main.js", import.meta.url));
const MODULE = {
  kind: "single-diode",
  cellsInSeries: 60,
  photocurrent: 9.5,
  saturationCurrent: 3e-10,
  seriesResistance: 0.25,
  shuntResistance: 400,
  idealityVoltage: 1.6186,
  photocurrentCoefficient: 0.0474,
};

function yearRequest(): { module: object; rule: object; climate: Record<string, unknown> } {
  const { irradiance, cellTemperature } = peerWeather(8760);
  return {
    module: MODULE,
    rule: { kind: "fractional-open-circuit-voltage" },
    climate: {
      start: "2025-01-01T00:00:00Z",
      step: 3600,
      irradiance: { kind: "plane-of-array", values: [...irradiance] },
      temperature: { kind: "cell", values: [...cellTemperature] },
    },
  };
}

async function postTime(service: RunningService, body: string): Promise<number> {
  const start = performance.now();
  const answer = await fetch(`${service.baseUrl}/v1/estimates`, {
    method: "POST",
    headers: { "content-type": "application/json" },
    body,
  });
  await answer.arrayBuffer();
  if (!answer.ok) throw new Error(`the service answered ${answer.status}`);
  return performance.now() - start;
}

/** P4: an hourly year over loopback HTTP with full traces, against the analyst's script from file to file. */
export async function estimateAgainstAnalyst(): Promise<Row[]> {
  const script = pythonPeer();
  const service = await startService(MAIN);
  try {
    const request = yearRequest();
    const body = JSON.stringify(request);
    for (let warm = 0; warm < 20; warm++) await postTime(service, body);
    const { irradiance, cellTemperature } = peerWeather(8760);
    const climate = join(tmpdir(), "kneegap-bench-year.json");
    const columns = { planeOfArrayIrradiance: [...irradiance], cellTemperature: [...cellTemperature], step: 3600 };
    writeFileSync(climate, JSON.stringify(columns));
    const pairs: Row["pairs"] = [];
    for (let round = 0; round < 5; round++) {
      let ours = Number.POSITIVE_INFINITY;
      for (let k = 0; k < 10; k++) ours = Math.min(ours, await postTime(service, body));
      const times = script === null ? null : runPython(script, climate, `${climate}.out`, "lambertw");
      pairs.push({ ours, peer: times === null ? null : times.reduce((a, b) => a + b, 0) });
    }
    const work = "an hourly year with full traces, over loopback HTTP";
    return [{ id: "P4", work, peer: "numpy, lambertw, file to file", goal: "<= 0.05x", pairs }];
  } finally {
    await service.stop();
  }
}

function performTime(request: object): () => number {
  const body = new TextEncoder().encode(JSON.stringify(request));
  return () =>
    best(20, () => {
      const answer = performOperation("estimate", body, CEILINGS);
      if (!answer.ok) throw new Error(answer.problem.detail);
    });
}

/** A year of horizontal components against one of plane-of-array irradiance, in process, traces included. */
export function horizontalAgainstPlane(): Row[] {
  const plane = yearRequest();
  const { irradiance } = peerWeather(8760);
  const site = { latitude: 45, longitude: 0, tilt: 30, azimuth: 180 };
  const horizontal = {
    ...plane,
    climate: {
      ...plane.climate,
      irradiance: {
        kind: "horizontal",
        global: [...irradiance],
        diffuse: Array.from(irradiance, (value) => 0.4 * value),
        site,
      },
    },
  };
  const pairs = alternate(5, performTime(horizontal), performTime(plane));
  return [{ id: "P11", work: "an hourly year of horizontal components", peer: "plane of array", goal: "<= 3x", pairs }];
}
