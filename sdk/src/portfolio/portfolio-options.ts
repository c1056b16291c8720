import { randomUUID } from "node:crypto";
import type { Settings } from "../client-options.ts";
import { checkCount, checkNumber, LONGEST_TIMEOUT } from "../client-options.ts";
import type { Climate } from "../generated/schema.ts";
import { checkRequestId } from "../transport.ts";
import type { PortfolioDefaultsRequest } from "./portfolio-lines.ts";

/** How far a portfolio is. */
export interface PortfolioProgress {
  /** Sites taken from the caller's sequence. */
  readonly taken: number;
  /** Sites handed to the caller with results. */
  readonly answered: number;
  /** Sites handed to the caller with a problem. */
  readonly refused: number;
  /** Requests sent, those sent again included. */
  readonly requests: number;
}

/** How a portfolio is sent. */
export interface PortfolioOptions {
  /** What the sites share: candidates, baseline, and whatever a site leaves out. Sent with every request. */
  readonly defaults?: PortfolioDefaultsRequest;
  /** Climates by the names that sites give (`{ kind: "named", name }`). A request carries those that its sites name. */
  readonly climates?: Readonly<Record<string, Climate>>;
  /** Requests under way at once, 1 to 64. Default 4. */
  readonly concurrency?: number;
  /** The most sites a request holds, 1 to 64. Default 64. */
  readonly batchSites?: number;
  /** Up to what size a request is filled, bytes; one site alone may be larger. Default 8 MiB. */
  readonly batchBytes?: number;
  /** Called as each site is handed to the caller, before the loop's body. What it throws, the loop throws. */
  readonly onProgress?: (progress: PortfolioProgress) => void;
  /** Ends the portfolio with an AbortedError when it fires. */
  readonly signal?: AbortSignal;
  /**
   * The longest silence of a request, ms; then what it left open is sent again, in smaller requests. The service is never
   * silent for more than 15 s, but a proxy that holds answers back may be. Default: the client's `timeout`.
   */
  readonly timeout?: number;
  /** How often in a row a request may fail without a site being answered. Default: the client's `retry.attempts`. */
  readonly attempts?: number;
  /**
   * What the requests' ids begin with, `^[A-Za-z0-9._-]{1,54}$`; the n-th batch sends `<requestId>.<n>`. Default: a
   * random UUID.
   */
  readonly requestId?: string;
}

/** The options with every default filled in, checked. */
export interface PortfolioSettings {
  readonly defaults: PortfolioDefaultsRequest | undefined;
  readonly climates: Readonly<Record<string, Climate>>;
  readonly concurrency: number;
  readonly batchSites: number;
  readonly batchBytes: number;
  readonly onProgress: (progress: PortfolioProgress) => void;
  readonly signal: AbortSignal | undefined;
  readonly timeout: number;
  readonly attempts: number;
  readonly requestId: string;
}

const MOST_SITES = 64;
const MEBIBYTE = 1024 * 1024;
/** What is left of the 64 characters of an id for the dot and the batch's number. */
const SUFFIX = "0123456789";

/** Fills in the defaults. Throws TypeError or RangeError, naming the option, for one that cannot be used. */
export function resolvePortfolio(options: PortfolioOptions, client: Settings): PortfolioSettings {
  const { defaults, climates = {}, onProgress = () => {}, signal, requestId = randomUUID() } = options;
  checkRequestId(`${requestId}${requestId === "" ? "" : SUFFIX}`);
  return {
    defaults,
    climates,
    concurrency: checkCount("concurrency", options.concurrency ?? 4, 64),
    batchSites: checkCount("batchSites", options.batchSites ?? MOST_SITES, MOST_SITES),
    batchBytes: checkCount("batchBytes", options.batchBytes ?? 8 * MEBIBYTE, 64 * MEBIBYTE),
    onProgress,
    signal,
    timeout: checkNumber("timeout", options.timeout ?? client.timeout, [1, LONGEST_TIMEOUT]),
    attempts: checkCount("attempts", options.attempts ?? client.retry.attempts, 100),
    requestId,
  };
}
