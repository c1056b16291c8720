import { setTimeout as sleep } from "node:timers/promises";
import type { Listening } from "./serve.ts";
import type { Log } from "./services.ts";

/** What has to be stopped, and in what time (ms). */
export interface Stopping {
  listening: Listening;
  pool: { close(): Promise<void> };
  log: Log;
  /** During which requests are still taken, so that balancers have time to notice. */
  drain: number;
  /** After which the process ends whatever is left. */
  grace: number;
  /** Told at once: readiness turns false, answers carry `connection: close`. */
  onDraining: () => void;
}

/**
 * Stops at the first SIGTERM or SIGINT: drains, then takes no more connections, finishes what is in flight, and ends with
 * 0; with 1 where the grace time did not suffice. A second signal changes nothing.
 */
export function stopOnSignal(stopping: Stopping): void {
  let stops = false;
  const onSignal = (signal: string) => {
    if (stops) return;
    stops = true;
    stopping.log.info({ signal }, "draining");
    stopping.onDraining();
    void stop(stopping);
  };
  process.on("SIGTERM", onSignal);
  process.on("SIGINT", onSignal);
}

async function stop({ listening, pool, log, drain, grace }: Stopping): Promise<void> {
  const deadline = sleep(grace, "late", { ref: false });
  await Promise.race([sleep(drain), deadline]);
  const ended = await Promise.race([listening.close(), deadline]);
  if (ended === "late") {
    log.error({ grace }, "the grace time is over; what was still in flight is lost");
    listening.cut();
  }
  await pool.close();
  log.info({}, "stopped");
  process.exitCode = ended === "late" ? 1 : 0;
  // Whatever else holds the process must not hold the replica.
  setTimeout(() => process.exit(), 1000).unref();
}
