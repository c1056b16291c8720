import { promisify } from "node:util";
import { gzip } from "node:zlib";
import { weightOf } from "./accept.ts";
import type { RequestContext } from "./app-type.ts";

const compress = promisify(gzip);

/** Shorter answers are not worth compressing, bytes. */
const WORTH_COMPRESSING = 1024;

const JSON_TYPE = "application/json";

/** Sends bytes; gzip at level 1, off the main thread, where the caller asks for it. */
export async function sendBytes(context: RequestContext, bytes: Uint8Array, type = JSON_TYPE): Promise<Response> {
  const headers: Record<string, string> = { "content-type": type, vary: "accept-encoding" };
  const asked = weightOf(context.req.header("accept-encoding") ?? "", ["gzip", "*"]) ?? 0;
  if (asked === 0 || bytes.length < WORTH_COMPRESSING)
    return new Response(bytes as Uint8Array<ArrayBuffer>, { headers });
  const body = await compress(bytes, { level: 1 });
  return new Response(body, { headers: { ...headers, "content-encoding": "gzip" } });
}

/** Sends JSON text. */
export function sendText(context: RequestContext, text: string): Promise<Response> {
  return sendBytes(context, Buffer.from(text));
}
