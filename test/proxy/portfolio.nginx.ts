import type { ChildProcess } from "node:child_process";
import { spawn } from "node:child_process";
import { once } from "node:events";
import { chmodSync, mkdtempSync, writeFileSync } from "node:fs";
import type { AddressInfo } from "node:net";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { setTimeout as wait } from "node:timers/promises";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { inventedClimate } from "../../demo/invented-climate.ts";
import { LANDING_STAGES } from "../../demo/landing-stages.ts";
import type { PortfolioSiteRequest } from "../../sdk/src/index.ts";
import { Kneegap } from "../../sdk/src/index.ts";
import type { RunningService } from "../sdk/fixtures/running-service.ts";
import { startBuiltService } from "../sdk/fixtures/running-service.ts";

const SITES = 300;

/** nginx as Debian ships it but for the addresses: whole requests and answers are buffered, bodies above 1 MiB refused. */
function configuration(port: number, upstream: string, folder: string): string {
  return `daemon off; pid ${folder}/pid; error_log ${folder}/error.log; events {}
http { access_log off; client_body_temp_path ${folder}/body; proxy_temp_path ${folder}/proxy;
  fastcgi_temp_path ${folder}/f; uwsgi_temp_path ${folder}/u; scgi_temp_path ${folder}/s;
  server { listen 127.0.0.1:${port}; location / { proxy_pass ${upstream}; } } }`;
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, "127.0.0.1");
  await once(probe, "listening");
  const { port } = probe.address() as AddressInfo;
  probe.close();
  await once(probe, "close");
  return port;
}

/** Sites with an invented year of their own each: 64 of them are more than one body that nginx takes. */
function* sites(): Generator<PortfolioSiteRequest> {
  for (let index = 0; index < SITES; index++) {
    const { irradiance, airTemperature } = inventedClimate(LANDING_STAGES[index % LANDING_STAGES.length], index);
    yield {
      id: `landing stage ${index}`,
      climate: {
        start: "2025-01-01T00:00:00Z",
        step: 3600,
        irradiance: { kind: "plane-of-array", values: irradiance },
        temperature: { kind: "ambient", values: airTemperature },
      },
    };
  }
}

describe("a portfolio through a stock nginx that buffers whole messages", () => {
  let service: RunningService;
  let nginx: ChildProcess;
  let client: Kneegap;
  beforeAll(async () => {
    service = await startBuiltService();
    const port = await freePort();
    const folder = mkdtempSync(join(tmpdir(), "kneegap-nginx-"));
    // Started by root, its workers are another user, who must be able to reach the folder.
    chmodSync(folder, 0o755);
    const file = join(folder, "nginx.conf");
    writeFileSync(file, configuration(port, service.url, folder));
    nginx = spawn("nginx", ["-c", file, "-p", folder], { stdio: "inherit" });
    client = new Kneegap({ baseUrl: `http://127.0.0.1:${port}` });
    for (let tries = 0; tries < 100; tries++) {
      const up = await client.readiness({ attempts: 1 }).then(
        () => true,
        () => false,
      );
      if (up) break;
      await wait(50);
    }
  }, 60_000);
  afterAll(async () => {
    await client.close();
    nginx.kill("SIGTERM");
    await once(nginx, "exit");
    await service.close();
  });

  it("comes to its end with every site once", async () => {
    const run = client.portfolio(sites(), {
      defaults: {
        module: {
          kind: "test-generator",
          technology: "crystalline-silicon",
          maximumPower: 300,
          maximumPowerVoltage: 31,
        },
        candidates: [
          { label: "holds a voltage", rule: { kind: "constant-voltage" } },
          { label: "climbs", rule: { kind: "perturb-and-observe" } },
        ],
      },
    });
    const ids: string[] = [];
    for await (const line of run) {
      expect(line.kind).toBe("result");
      ids.push(line.id);
    }
    expect(ids.length).toBe(SITES);
    expect(new Set(ids).size).toBe(SITES);
    expect(run.totals().answered).toBe(SITES);
  });
});
