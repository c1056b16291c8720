import { move, Piscina } from "piscina";
import type { Answer } from "../wire/operation.ts";
import type { Problem } from "../wire/problem.ts";
import { problem } from "../wire/problem.ts";
import type { Job } from "./job.ts";
import type { Lane } from "./lane.ts";
import { createLane } from "./lane.ts";

/** How a pool is set up. */
export interface PoolSettings {
  /** The built worker: dist/service/pool/worker.js. */
  workerFile: string;
  threads: number;
  /** Jobs that may wait for a thread; more are refused. */
  queue: number;
  /** Longest computing of one job, ms. */
  timeLimit: number;
  /** Most memory of one worker's heap, MiB. */
  memory: number;
  /** Told when a worker dies. */
  onWorkerLost: (reason: string) => void;
}

/** Threads that answer jobs. */
export interface Pool {
  /** Answers a job, or says why not: queue full, time over, worker lost. Never rejects. The signal: nobody waits any more. */
  run(job: Job, signal: AbortSignal): Promise<Answer>;
  /** Resolves once every worker is loaded and warm; rejects where one cannot be. */
  warm(): Promise<void>;
  /** Refuses what waits, stops what runs. */
  close(): Promise<void>;
}

/** A job that waits or runs. */
interface Entry {
  bytes: number;
  start: () => void;
  refuse: (problem: Problem) => void;
}

/** Bytes of all bodies that wait. */
const QUEUE_BYTES = 256 * 1024 * 1024;

/** A job whose caller left may end by itself within this, ms: stopping it costs its worker. */
const LEAVE_GRACE = 250;

/** Marks an answer so that its bytes are moved, not copied, out of the worker. */
export function handOver(answer: Answer): Answer {
  // The pool library moves what it is handed as view; an object is copied with the views in it moved.
  return answer.ok ? (moved(answer, answer.bytes) as Answer) : answer;
}

function moved(value: object, view: Uint8Array): unknown {
  return move({ [Piscina.transferableSymbol]: [view.buffer], [Piscina.valueSymbol]: value } as never);
}

/**
 * A pool of worker threads behind one bounded lane. The library's own queue stays empty: a job is handed over when a
 * thread is free, so that lanes decide what goes first and a job that waits can be dropped without cost.
 */
export function createPool(settings: PoolSettings): Pool {
  const piscina = new Piscina<Job | null, Answer>({
    filename: settings.workerFile,
    minThreads: settings.threads,
    maxThreads: settings.threads,
    stricterFIFO: true,
    resourceLimits: { maxOldGenerationSizeMb: settings.memory },
  });
  piscina.on("error", (error: Error) => settings.onWorkerLost(error.message));
  // Single requests; portfolio sites get a second lane that is asked when this one is empty.
  const lanes: Lane<Entry>[] = [createLane<Entry>(settings.queue, QUEUE_BYTES)];
  let free = settings.threads;

  const startNext = () => {
    const next = lanes.find((lane) => lane.length > 0)?.next();
    next?.start();
  };
  const execute = async (job: Job, signal: AbortSignal): Promise<Answer> => {
    free--;
    try {
      return await runJob(piscina, job, signal, settings);
    } finally {
      free++;
      startNext();
    }
  };

  return {
    run(job, signal) {
      if (signal.aborted) return Promise.resolve(refusal(LEFT));
      if (free > 0) return execute(job, signal);
      return waitIn(lanes[0], job, signal, execute);
    },
    async warm() {
      // Each thread is free and takes one; it answers once it is loaded.
      await Promise.all(Array.from({ length: settings.threads }, () => piscina.run(null)));
    },
    async close() {
      for (const lane of lanes)
        for (let entry = lane.next(); entry !== undefined; entry = lane.next()) entry.refuse(DRAINING);
      await piscina.destroy();
    },
  };
}

const LEFT = problem("internal", "Nobody waits for this answer any more.");
const DRAINING = problem("draining", "The service is shutting down; this request was not begun.");
const FULL = problem("overloaded", "Too many requests are waiting; this one was not begun.");

const refusal = (of: Problem): Answer => ({ ok: false, problem: of });

/** Puts a job into a lane, from which it is started, refused, or dropped when its caller leaves. */
function waitIn(
  lane: Lane<Entry>,
  job: Job,
  signal: AbortSignal,
  execute: (job: Job, signal: AbortSignal) => Promise<Answer>,
): Promise<Answer> {
  return new Promise((resolve) => {
    const settle = (answer: Answer | Promise<Answer>) => {
      signal.removeEventListener("abort", leave);
      resolve(answer);
    };
    const entry: Entry = {
      bytes: job.body.byteLength,
      start: () => settle(execute(job, signal)),
      refuse: (of) => settle(refusal(of)),
    };
    const leave = () => {
      lane.remove(entry);
      entry.refuse(LEFT);
    };
    if (!lane.add(entry)) return settle(refusal(FULL));
    signal.addEventListener("abort", leave);
  });
}

/** Has a thread do a job; stops the thread where the time is over, or a while after the caller left. */
async function runJob(
  piscina: Piscina<Job | null, Answer>,
  job: Job,
  signal: AbortSignal,
  { timeLimit, onWorkerLost }: PoolSettings,
): Promise<Answer> {
  const stop = new AbortController();
  const timer = setTimeout(() => stop.abort("time"), timeLimit);
  let grace: NodeJS.Timeout | undefined;
  const leave = () => {
    grace = setTimeout(() => stop.abort("left"), LEAVE_GRACE);
  };
  signal.addEventListener("abort", leave);
  try {
    const own = ownBuffer(job);
    return await piscina.run(own, { signal: stop.signal, transferList: [own.body.buffer] });
  } catch (error) {
    if (stop.signal.reason === "left") return refusal(LEFT);
    if (stop.signal.reason === "time") return refusal(overTime(timeLimit));
    onWorkerLost(error instanceof Error ? error.message : String(error));
    return refusal(
      problem("worker-lost", "The worker died or ran out of memory with this request; send less at once."),
    );
  } finally {
    clearTimeout(timer);
    clearTimeout(grace);
    signal.removeEventListener("abort", leave);
  }
}

function overTime(timeLimit: number): Problem {
  const detail = `The computing was stopped after ${timeLimit / 1000} s. Send fewer samples or candidates at once.`;
  return problem("time-limit-exceeded", detail);
}

/** The job with a body that has its buffer to itself, as moving takes the whole buffer. */
function ownBuffer(job: Job): { operation: Job["operation"]; body: Uint8Array<ArrayBuffer>; limits: Job["limits"] } {
  const { body } = job;
  const whole = body.buffer instanceof ArrayBuffer && body.byteLength === body.buffer.byteLength;
  return { ...job, body: whole ? (body as Uint8Array<ArrayBuffer>) : new Uint8Array(body) };
}
