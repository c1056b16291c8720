import type { z } from "@hono/zod-openapi";
import { StudyError } from "../studies/study-error.ts";
import { explain } from "./decode/explain.ts";
import { parseBody } from "./decode/parse-body.ts";
import type { Limits } from "./limits.ts";
import type { Answer, Operation, Refusal } from "./operation.ts";
import type { Flaw, Problem } from "./problem.ts";
import { flawed, problem } from "./problem.ts";

/** How one operation reads, checks, works and writes. */
export interface Definition<Schema extends z.ZodType, Request> {
  schema: Schema;
  /** What is wrong between the members of a request that has the right form. */
  check: (raw: z.output<Schema>, limits: Limits) => Flaw[];
  /** Plain data for the study. */
  decode: (raw: z.output<Schema>) => Request;
  /** In control periods, or as much work in another form. */
  work: (request: Request) => number;
  /** The study and its answer as JSON bytes. */
  answer: (request: Request, raw: z.output<Schema>) => Uint8Array;
}

const refuse = (of: Problem) => ({ ok: false as const, problem: of });

/** An operation: bytes are parsed, checked against the schema and against each other, measured, and then worked on. */
export function defineOperation<Schema extends z.ZodType, Request>(of: Definition<Schema, Request>): Operation {
  return (body, limits) => {
    const parsed = parseBody(body);
    if (!parsed.ok) return parsed;
    const read = conform(of.schema, parsed.value);
    if (!read.ok) return read;
    const flaws = of.check(read.data, limits);
    if (flaws.length > 0) return refuse(flawed(flaws));
    const request = of.decode(read.data);
    const work = of.work(request);
    if (work > limits.controlPeriods) return refuse(tooMuch(work, limits.controlPeriods));
    return { ok: true, prepared: { work, perform: () => perform(() => of.answer(request, read.data)) } };
  };
}

/** A value as its schema has it, or what to change for it to conform. */
export function conform<Schema extends z.ZodType>(
  schema: Schema,
  value: unknown,
): { ok: true; data: z.output<Schema> } | Refusal {
  const read = schema.safeParse(value);
  if (read.success) return { ok: true, data: read.data };
  const { flaws, count } = explain(read.error.issues, schema, value);
  return refuse(flawed(flaws, count));
}

/** The problem of a request whose work is above the limit, both in control periods. */
export function tooMuch(work: number, limit: number): Problem {
  return problem(
    "too-much-work",
    `The request is as much work as ${Math.round(work)} control periods; the limit is ${limit}. Send fewer samples, sites, candidates or points at once, or choose a coarser step or a longer controlPeriod.`,
  );
}

/** Answers, or says why physics refuses; no error gets out, since it would not cross a thread whole. */
function perform(answer: () => Uint8Array): Answer {
  try {
    return { ok: true, bytes: answer(), contentType: "application/json" };
  } catch (error) {
    return refusalOf(error);
  }
}

/** The refusal that an error of the studies means; any other is a defect. */
export function refusalOf(error: unknown): Refusal {
  if (error instanceof StudyError) {
    const { pointer, code, message, expected } = error;
    return refuse(flawed([{ pointer, code, detail: message, ...(expected === undefined ? {} : { expected }) }]));
  }
  return failure(error);
}

/** The answer of a defect: nothing of it leaks, the log gets it as plain text. */
export function failure(error: unknown): Refusal {
  const detail = "The service failed at this request; quote the request id.";
  const fault = error instanceof Error ? (error.stack ?? error.message) : String(error);
  return { ok: false, problem: problem("internal", detail), fault };
}
