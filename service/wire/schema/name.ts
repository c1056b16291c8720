import { z } from "@hono/zod-openapi";

/** 1 to 100 characters without control characters: a pattern, since JSON Schema counts characters and JavaScript halves. */
const NAME = /^\P{Cc}{1,100}$/u;

/** Whether a string will do as a name. */
export function isName(text: string): boolean {
  return NAME.test(text);
}

/** A name that the caller gives: a label, an id, a group. */
export function name(description: string, example: string) {
  return z.string().regex(NAME).openapi({ pattern: NAME.source, description, example });
}
