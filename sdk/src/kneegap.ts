import type { KneegapOptions } from "./client-options.ts";
import { resolveOptions } from "./client-options.ts";
import type { ColumnKind } from "./columns.ts";
import { Operations } from "./generated/client.ts";
import type { OperationByHand } from "./generated/operations.ts";
import { operationTable } from "./generated/operations.ts";
import { BatchedPortfolio } from "./portfolio/batched-portfolio.ts";
import type { PortfolioOptions } from "./portfolio/portfolio-options.ts";
import type { PortfolioRun, PortfolioSites } from "./portfolio/portfolio-run.ts";
import { Transport } from "./transport.ts";

/** A method for each operation that has no generated one. */
type MethodsByHand = Record<OperationByHand, (...parameters: never[]) => unknown>;

/**
 * A client of one kneegap service. It holds a pool of connections: make one, share it, close it at the end.
 * `await using client = new Kneegap(...)` closes it by itself where the language version has it.
 */
export class Kneegap<C extends ColumnKind = "plain"> extends Operations<C> implements MethodsByHand {
  readonly #transport: Transport;

  /** Throws TypeError or RangeError for options that cannot be used. No connection is made before the first call. */
  constructor(options: KneegapOptions<C>) {
    const transport = new Transport(resolveOptions(options));
    super((operation, body, callOptions) => transport.request(operation, body, callOptions));
    this.#transport = transport;
  }

  /**
   * Compares candidates at many sites, any number of them: `for await (const line of client.portfolio(sites, options))`
   * gives each site's result or problem once, as sites are done; the run's `totals()` say what they come to.
   *
   * Sites are sent in whole requests of at most 64 sites or 8 MiB, several at once, and taken from `sites` only as fast as
   * the loop goes round: no more than `concurrency` requests' worth is ahead of it. What a cut answer leaves open is sent
   * again, as the client's `retry` says. It holds that much, and 30 to 60 bytes for each id. An id must not come twice
   * (SiteInputError).
   *
   * The loop throws what cannot be mended by sending again, after the sites that were under way: the errors of any other
   * call, SiteInputError, and what `sites` throws.
   *
   * `POST /v1/portfolios`
   */
  portfolio(sites: PortfolioSites, options: PortfolioOptions = {}): PortfolioRun<C> {
    return new BatchedPortfolio<C>(this.#transport, operationTable.portfolio, sites, options);
  }

  /** Refuses new calls (ClosedError), waits for those under way, then closes the connections. */
  close(): Promise<void> {
    return this.#transport.close();
  }

  /** The same as `close()`. */
  [Symbol.asyncDispose](): Promise<void> {
    return this.close();
  }
}
