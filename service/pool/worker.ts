import type { Answer } from "../wire/operation.ts";
import { performOperation } from "../wire/operations.ts";
import { performStep } from "../wire/portfolio/perform-step.ts";
import type { StepAnswer } from "../wire/portfolio/step.ts";
import type { Task } from "./job.ts";
import { handOver } from "./pool.ts";
import { warmUp } from "./warm-up.ts";

warmUp();

/** Performs a task on this thread; null asks only whether it is loaded. */
export default function work(task: Task): Answer | StepAnswer | null {
  if (task === null) return null;
  return handOver("step" in task ? performStep(task) : performOperation(task.operation, task.body, task.limits));
}
