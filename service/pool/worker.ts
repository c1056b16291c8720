import type { Answer } from "../wire/operation.ts";
import { performOperation } from "../wire/operations.ts";
import type { Job } from "./job.ts";
import { handOver } from "./pool.ts";
import { warmUp } from "./warm-up.ts";

warmUp();

/** Performs a job on this thread; null asks only whether it is loaded. */
export default function work(job: Job | null): Answer | null {
  return job === null ? null : handOver(performOperation(job.operation, job.body, job.limits));
}
