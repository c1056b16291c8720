import type { ChildProcess } from "node:child_process";
import { spawn } from "node:child_process";
import { once } from "node:events";
import type { AddressInfo } from "node:net";
import { createServer } from "node:net";
import { setTimeout as wait } from "node:timers/promises";

/** A kneegap service in a process of its own, for as long as the demo lasts. */
export interface RunningService {
  baseUrl: string;
  stop(): Promise<void>;
}

const SERVICE = new URL("../service/main.js", import.meta.url).pathname;
const STARTS_WITHIN = 30_000;

/** Starts the service on a free port of this machine and waits until it is ready. Throws when it is not within 30 s. */
export async function startService(main: string = SERVICE): Promise<RunningService> {
  const port = await freePort();
  const baseUrl = `http://127.0.0.1:${port}`;
  const child = spawn(process.execPath, [main], {
    env: { ...process.env, HOST: "127.0.0.1", PORT: String(port), LOG_LEVEL: "error", DRAIN: "0" },
    stdio: ["ignore", "inherit", "inherit"],
  });
  process.once("exit", () => child.kill());
  await untilReady(child, baseUrl);
  return {
    baseUrl,
    stop: async () => {
      if (child.exitCode !== null) return;
      const ended = once(child, "exit");
      child.kill("SIGTERM");
      await ended;
    },
  };
}

async function untilReady(child: ChildProcess, baseUrl: string): Promise<void> {
  const until = Date.now() + STARTS_WITHIN;
  while (Date.now() < until) {
    if (child.exitCode !== null) throw new Error(`The service ended with code ${child.exitCode} before it was ready.`);
    const ready = await fetch(`${baseUrl}/health/ready`).then(
      (answer) => answer.ok,
      () => false,
    );
    if (ready) return;
    await wait(50);
  }
  throw new Error(`The service was not ready within ${STARTS_WITHIN / 1000} s.`);
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, "127.0.0.1");
  await once(probe, "listening");
  const { port } = probe.address() as AddressInfo;
  probe.close();
  await once(probe, "close");
  return port;
}
