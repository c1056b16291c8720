import { createHash, timingSafeEqual } from "node:crypto";
import type { MiddlewareHandler } from "hono";
import { problem } from "../wire/problem.ts";
import type { Environment } from "./app-type.ts";
import { respondProblem } from "./problem.ts";
import type { Key } from "./services.ts";

/** The name of the key that was shown, or null. Every key is compared, in constant time. */
function nameOf(shown: string, keys: readonly Key[]): string | null {
  const digest = createHash("sha256").update(shown).digest();
  let name: string | null = null;
  for (const key of keys) if (timingSafeEqual(digest, key.digest)) name = key.name;
  return name;
}

/** Lets through who shows a key as `Authorization: Bearer`; everyone where there are no keys. */
export function checkAccess(keys: readonly Key[]): MiddlewareHandler<Environment> {
  return async (context, next) => {
    if (keys.length === 0) return next();
    const bearer = /^Bearer +([^ ]+)$/i.exec(context.req.header("authorization") ?? "");
    const name = bearer === null ? null : nameOf(bearer[1], keys);
    if (name === null) {
      const detail =
        bearer === null
          ? "Send a key of the operator's as Authorization: Bearer <key>."
          : "This key is not known here.";
      return respondProblem(context, problem("unauthorized", detail), { "www-authenticate": 'Bearer realm="kneegap"' });
    }
    context.set("keyName", name);
    return next();
  };
}
