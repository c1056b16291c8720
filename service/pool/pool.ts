import { move, Piscina } from "piscina";
import type { Answer, Refusal } from "../wire/operation.ts";
import type { Step, StepAnswer, StepName } from "../wire/portfolio/step.ts";
import type { Problem } from "../wire/problem.ts";
import { problem } from "../wire/problem.ts";
import type { Job, Task } from "./job.ts";
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
  /**
   * Performs a step of a portfolio, or says why not, when no single job waits. Steps leave one thread to single jobs where
   * there are two or more. Never refuses for a full queue: a portfolio has few steps at once, see `stepsAtOnce`.
   */
  runStep<Name extends StepName>(step: Step<Name>, signal: AbortSignal): Promise<StepAnswer<Name>>;
  /** Resolves once every worker is loaded and warm; rejects where one cannot be. */
  warm(): Promise<void>;
  /** Refuses what waits, stops what runs. */
  close(): Promise<void>;
}

/** A job or step that waits or runs. */
interface Entry {
  bytes: number;
  start: () => void;
  refuse: (problem: Problem) => void;
}

/** Bytes of all bodies that wait. */
const QUEUE_BYTES = 256 * 1024 * 1024;

/** A job whose caller left may end by itself within this, ms: stopping it costs its worker. */
const LEAVE_GRACE = 250;

/** Steps of portfolios that may run at once, of one portfolio and of all: all threads but one, at least one. */
export function stepsAtOnce(threads: number): number {
  return Math.max(1, threads - 1);
}

/** Marks an answer so that its bytes are moved, not copied, out of the worker. */
export function handOver<Given extends Answer | StepAnswer>(answer: Given): Given {
  // The pool library moves what it is handed as view; an object is copied with the views in it moved.
  return answer.ok && "bytes" in answer ? (moved(answer, answer.bytes) as Given) : answer;
}

function moved(value: object, view: Uint8Array): unknown {
  return move({ [Piscina.transferableSymbol]: [view.buffer], [Piscina.valueSymbol]: value } as never);
}

/**
 * A pool of worker threads behind two lanes: single jobs, bounded in number and bytes, and steps of portfolios, which are
 * asked when no single job waits. The library's own queue stays empty: a job is handed over when a thread is free, so that
 * lanes decide what goes first and a job that waits can be dropped without cost.
 */
export function createPool(settings: PoolSettings): Pool {
  const piscina = new Piscina<Task, Answer | StepAnswer>({
    filename: settings.workerFile,
    minThreads: settings.threads,
    maxThreads: settings.threads,
    stricterFIFO: true,
    resourceLimits: { maxOldGenerationSizeMb: settings.memory },
  });
  piscina.on("error", (error: Error) => settings.onWorkerLost(error.message));
  const singles = createLane<Entry>(settings.queue, QUEUE_BYTES);
  // Who fills it bounds it: each portfolio has no more steps here than may run at once.
  const steps = createLane<Entry>(Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY);
  let free = settings.threads;
  let freeForSteps = stepsAtOnce(settings.threads);

  const startNext = () => {
    const next = singles.next() ?? (freeForSteps > 0 ? steps.next() : undefined);
    next?.start();
  };
  const execute = async (task: Job | Step, signal: AbortSignal) => {
    const taken = "step" in task ? 1 : 0;
    free--;
    freeForSteps -= taken;
    try {
      return await runTask(piscina, task, signal, settings);
    } finally {
      free++;
      freeForSteps += taken;
      startNext();
    }
  };
  const run = (task: Job | Step, signal: AbortSignal, lane: Lane<Entry>): Promise<Answer | StepAnswer> => {
    if (signal.aborted) return Promise.resolve(refusal(LEFT));
    if (free > 0 && (lane === singles || freeForSteps > 0)) return execute(task, signal);
    return waitIn(lane, task, signal, execute);
  };

  return {
    run: (job, signal) => run(job, signal, singles) as Promise<Answer>,
    runStep: <Name extends StepName>(step: Step<Name>, signal: AbortSignal) =>
      run(step, signal, steps) as Promise<StepAnswer<Name>>,
    async warm() {
      // Each thread is free and takes one; it answers once it is loaded.
      await Promise.all(Array.from({ length: settings.threads }, () => piscina.run(null)));
    },
    async close() {
      for (const lane of [singles, steps])
        for (let entry = lane.next(); entry !== undefined; entry = lane.next()) entry.refuse(DRAINING);
      await piscina.destroy();
    },
  };
}

const LEFT = problem("internal", "Nobody waits for this answer any more.");
const DRAINING = problem("draining", "The service is shutting down; this request was not begun.");
const FULL = problem("overloaded", "Too many requests are waiting; this one was not begun.");

const refusal = (of: Problem): Refusal => ({ ok: false, problem: of });

/** Puts a task into a lane, from which it is started, refused, or dropped when its caller leaves. */
function waitIn<Result>(
  lane: Lane<Entry>,
  task: Job | Step,
  signal: AbortSignal,
  execute: (task: Job | Step, signal: AbortSignal) => Promise<Result>,
): Promise<Result | Refusal> {
  return new Promise((resolve) => {
    const settle = (answer: Refusal | Promise<Result>) => {
      signal.removeEventListener("abort", leave);
      resolve(answer);
    };
    const entry: Entry = {
      bytes: task.body.byteLength,
      start: () => settle(execute(task, signal)),
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

/** Has a thread do a task; stops the thread where the time is over, or a while after the caller left. */
async function runTask(
  piscina: Piscina<Task, Answer | StepAnswer>,
  task: Job | Step,
  signal: AbortSignal,
  { timeLimit, onWorkerLost }: PoolSettings,
): Promise<Answer | StepAnswer> {
  const stop = new AbortController();
  const timer = setTimeout(() => stop.abort("time"), timeLimit);
  let grace: NodeJS.Timeout | undefined;
  const leave = () => {
    grace = setTimeout(() => stop.abort("left"), LEAVE_GRACE);
  };
  signal.addEventListener("abort", leave);
  try {
    const own = ownBuffer(task);
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

/** The task with a body that has its buffer to itself, as moving takes the whole buffer. */
function ownBuffer<Given extends Job | Step>(task: Given): Given & { body: Uint8Array<ArrayBuffer> } {
  const { body } = task;
  const whole = body.buffer instanceof ArrayBuffer && body.byteLength === body.buffer.byteLength;
  return { ...task, body: whole ? (body as Uint8Array<ArrayBuffer>) : new Uint8Array(body) };
}
