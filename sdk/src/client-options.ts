import { constants } from "node:buffer";
import { setTimeout as wait } from "node:timers/promises";
import type { ColumnKind } from "./columns.ts";
import type { RetryOptions } from "./retry.ts";
import { SDK_VERSION } from "./version.ts";

/** What a client is made from. Times in ms. */
export interface KneegapOptions<C extends ColumnKind = "plain"> {
  /** Where the service is, http or https, with a path where it sits below one; the operations' paths are added to it. */
  readonly baseUrl: string | URL;
  /** Sent as `Authorization: Bearer <key>`; left out when the service is open. */
  readonly apiKey?: string;
  /** The time a whole call may take, attempts and waits included. Default 120,000. */
  readonly timeout?: number;
  readonly retry?: RetryOptions;
  /** The most connections held at once; further calls wait for one. Default 32. */
  readonly connections?: number;
  /** The largest answer that is read, bytes. Default 256 MiB. */
  readonly maximumAnswerBytes?: number;
  /** How columns arrive, see {@link ColumnKind}. Default "plain". */
  readonly columns?: C;
  /** Put before the SDK's own User-Agent: the name and version of the calling program. */
  readonly userAgent?: string;
}

/** The options with every default filled in, checked. */
export interface Settings {
  readonly origin: string;
  /** The base URL's path without a slash at its end. */
  readonly pathPrefix: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly timeout: number;
  readonly retry: Required<RetryOptions>;
  readonly connections: number;
  readonly maximumAnswerBytes: number;
  readonly columns: ColumnKind;
}

/** The longest time a node timer takes; a longer one would fire at once. */
export const LONGEST_TIMEOUT = 2 ** 31 - 1;

/** Fills in the defaults. Throws TypeError for a base URL or key that cannot be used, RangeError for a number out of its range. */
export function resolveOptions(options: KneegapOptions<ColumnKind>): Settings {
  const url = checkBaseUrl(options.baseUrl);
  const { columns = "plain" } = options;
  if (columns !== "plain" && columns !== "typed") throw new TypeError('columns must be "plain" or "typed"');
  return {
    origin: url.origin,
    pathPrefix: url.pathname.replace(/\/+$/, ""),
    headers: commonHeaders(options),
    timeout: checkNumber("timeout", options.timeout ?? 120_000, [1, LONGEST_TIMEOUT]),
    retry: resolveRetry(options.retry ?? {}),
    connections: checkCount("connections", options.connections ?? 32, 65_535),
    maximumAnswerBytes: checkCount(
      "maximumAnswerBytes",
      options.maximumAnswerBytes ?? 256 * 1024 * 1024,
      constants.MAX_STRING_LENGTH,
    ),
    columns,
  };
}

/** `value`, when it lies within `range` (both ends included). Throws RangeError otherwise, and for NaN. */
export function checkNumber(name: string, value: number, [least, most]: readonly [number, number]): number {
  if (typeof value === "number" && value >= least && value <= most) return value;
  throw new RangeError(`${name} must be a number from ${least} to ${most}, not ${value}`);
}

/** `value`, when it is a whole number from 1 to `most`. Throws RangeError otherwise. */
export function checkCount(name: string, value: number, most: number): number {
  if (Number.isInteger(value)) return checkNumber(name, value, [1, most]);
  throw new RangeError(`${name} must be a whole number from 1 to ${most}, not ${value}`);
}

function resolveRetry(retry: RetryOptions): Required<RetryOptions> {
  const baseDelay = checkNumber("retry.baseDelay", retry.baseDelay ?? 250, [0, LONGEST_TIMEOUT]);
  return {
    attempts: checkCount("retry.attempts", retry.attempts ?? 8, 100),
    baseDelay,
    maximumDelay: checkNumber("retry.maximumDelay", retry.maximumDelay ?? Math.max(5000, baseDelay), [
      0,
      LONGEST_TIMEOUT,
    ]),
    random: retry.random ?? Math.random,
    sleep: retry.sleep ?? ((delay, signal) => wait(delay, undefined, { signal })),
  };
}

function checkBaseUrl(baseUrl: string | URL): URL {
  const url = new URL(baseUrl);
  if (url.protocol !== "http:" && url.protocol !== "https:") throw new TypeError("baseUrl must be http or https");
  if (url.username !== "" || url.password !== "") throw new TypeError("baseUrl must not carry a password; use apiKey");
  if (url.search !== "" || url.hash !== "") throw new TypeError("baseUrl must not have a query or a fragment");
  return url;
}

/** The messages never repeat the key. */
function commonHeaders({ apiKey, userAgent }: KneegapOptions<ColumnKind>): Record<string, string> {
  const own = `kneegap-sdk/${SDK_VERSION} node/${process.versions.node}`;
  if (userAgent !== undefined && !/^[\x20-\x7e]+$/.test(userAgent)) {
    throw new TypeError("userAgent must be printable ASCII");
  }
  const headers: Record<string, string> = { "user-agent": userAgent === undefined ? own : `${userAgent} ${own}` };
  if (apiKey === undefined) return headers;
  if (!/^[\x21-\x7e]+$/.test(apiKey)) throw new TypeError("apiKey must be printable ASCII without spaces");
  return { ...headers, authorization: `Bearer ${apiKey}` };
}
