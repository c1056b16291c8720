import { fileURLToPath } from "node:url";
import { pino } from "pino";
import { configOrExit } from "./config.ts";
import { createApp } from "./http/app.ts";
import { serve } from "./http/serve.ts";
import type { ServiceState } from "./http/services.ts";
import { stopOnSignal } from "./http/stop.ts";
import { createCompute } from "./pool/compute.ts";
import { createPool, stepsAtOnce } from "./pool/pool.ts";

const config = configOrExit();
const log = pino({ name: "kneegap", level: config.logLevel, redact: ["authorization", "*.authorization"] });
let state: ServiceState = "warming";

const pool = createPool({
  workerFile: fileURLToPath(new URL("./pool/worker.js", import.meta.url)),
  threads: config.threads,
  queue: config.queue,
  timeLimit: config.limits.computeSeconds * 1000,
  memory: config.workerMemory,
  onWorkerLost: (reason) => log.error({ reason }, "worker lost"),
});
const app = createApp(createCompute(pool, config.limits), {
  limits: config.limits,
  keys: config.keys,
  state: () => state,
  log,
  idleTime: 30_000,
  uploadTime: 300_000,
  heldBytes: 1024 ** 3,
  portfolio: {
    perform: (step, signal) => pool.runStep(step, signal),
    stepsAtOnce: stepsAtOnce(config.threads),
    most: 64,
    stallTime: 60_000,
    silence: 10_000,
  },
});
const listening = await serve(app, {
  host: config.host,
  port: config.port,
  log,
  headersTime: 30_000,
  stallTime: 60_000,
});
log.info({ host: config.host, port: listening.port, threads: config.threads, keys: config.keys.length }, "listening");

stopOnSignal({
  listening,
  pool,
  log,
  drain: config.drain * 1000,
  grace: config.grace * 1000,
  onDraining: () => {
    state = "draining";
  },
});
await pool.warm();
if (state === "warming") state = "ready";
log.info({}, "ready");
