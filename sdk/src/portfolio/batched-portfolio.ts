import { setMaxListeners } from "node:events";
import type { ColumnKind } from "../columns.ts";
import { encodeBody } from "../encode-body.ts";
import { AbortedError } from "../errors/aborted-error.ts";
import type { CallContext } from "../errors/kneegap-error.ts";
import { ProtocolError } from "../errors/protocol-error.ts";
import type { PortfolioResult } from "../generated/schema.ts";
import type { Operation } from "../operation.ts";
import { withTypedColumns } from "../read-answer.ts";
import type { Transport } from "../transport.ts";
import type { BatchPort } from "./answer-batch.ts";
import { answerBatch } from "./answer-batch.ts";
import { BatchSource, namedClimate } from "./batch-source.ts";
import { ClimateLines } from "./climate-lines.ts";
import { composeRequest } from "./compose-request.ts";
import { Lanes } from "./lanes.ts";
import { TotalsMerger } from "./merge-totals.ts";
import type { MergedTotals, PortfolioLine, PortfolioRefusal } from "./portfolio-lines.ts";
import type { PortfolioOptions, PortfolioProgress, PortfolioSettings } from "./portfolio-options.ts";
import { resolvePortfolio } from "./portfolio-options.ts";
import type { PortfolioRun, PortfolioSites } from "./portfolio-run.ts";

/** A line, and the context of the request that it answers. */
interface Arrival {
  readonly line: PortfolioResult | PortfolioRefusal;
  readonly context: CallContext;
}

/** A portfolio that is sent in batches. */
export class BatchedPortfolio<C extends ColumnKind> implements PortfolioRun<C> {
  readonly #transport: Transport;
  readonly #operation: Operation;
  readonly #sites: PortfolioSites;
  readonly #settings: PortfolioSettings;
  readonly #merger = new TotalsMerger();
  readonly #controller = new AbortController();
  #requests = 0;
  #arrived = 0;
  #begun = false;

  /** Throws TypeError or RangeError for options that cannot be used. */
  constructor(transport: Transport, operation: Operation, sites: PortfolioSites, options: PortfolioOptions) {
    this.#transport = transport;
    this.#operation = operation;
    this.#sites = sites;
    this.#settings = resolvePortfolio(options, transport.settings);
    // Each request and each wait listens, a bounded number at once.
    setMaxListeners(0, this.#controller.signal);
  }

  totals(): MergedTotals {
    return this.#merger.totals();
  }

  [Symbol.asyncIterator](): AsyncGenerator<PortfolioLine<C>, void, undefined> {
    if (this.#begun) throw new TypeError("a portfolio can be looped over once; call portfolio again");
    this.#begun = true;
    return this.#lines();
  }

  async *#lines(): AsyncGenerator<PortfolioLine<C>, void, undefined> {
    const { signal, onProgress } = this.#settings;
    const { source, port } = this.#prepare();
    const abort = () => this.#abort(signal?.reason);
    if (signal?.aborted) abort();
    signal?.addEventListener("abort", abort, { once: true });
    const lanes = this.#lanes(source, port);
    let failed = false;
    try {
      for (let next = await lanes.next(); next !== null; next = await lanes.next()) {
        const line = this.#handOver(next.line);
        onProgress(this.#progress(source));
        yield line;
      }
    } catch (error) {
      failed = true;
      throw error;
    } finally {
      signal?.removeEventListener("abort", abort);
      this.#abort(undefined);
      const closed = source.close();
      await (failed ? closed.catch(() => {}) : closed);
    }
  }

  #abort(cause: unknown): void {
    const { requestId } = this.#settings;
    this.#controller.abort(new AbortedError({ requestId, attempts: this.#requests, cause }));
  }

  #lanes(source: BatchSource, port: Omit<BatchPort, "onAnswer">): Lanes<Arrival> {
    const { requestId, concurrency } = this.#settings;
    return new Lanes<Arrival>({
      source,
      concurrency,
      signal: this.#controller.signal,
      answer: (batch, number, onLine) => {
        const id = `${requestId}.${number}`;
        const onAnswer: BatchPort["onAnswer"] = (line, context) => {
          this.#arrived += 1;
          onLine({ line, context });
        };
        return this.#transport.hold(id, () => answerBatch(batch, { ...port, onAnswer }, id));
      },
    });
  }

  #prepare(): { source: BatchSource; port: Omit<BatchPort, "onAnswer"> } {
    const { requestId, defaults, batchSites, batchBytes, timeout, attempts } = this.#settings;
    const context = { requestId, attempts: 0 };
    const defaultsLine =
      defaults === undefined ? null : encodeBody({ ...defaults, kind: "defaults" }, "application/json", context);
    const climates = new ClimateLines(this.#settings.climates, context);
    const bounds = { sites: batchSites, bytes: batchBytes - (defaultsLine?.length ?? 0) };
    const shared = { climates, climate: namedClimate(defaults ?? {}) };
    const source = new BatchSource(this.#sites, shared, bounds, context);
    const port = {
      compose: (sites) => composeRequest(sites, defaultsLine, climates),
      send: (body, onLine, of) => {
        this.#requests += 1;
        const request = { signal: this.#controller.signal, silence: timeout, onLine };
        return this.#transport.requestLines(this.#operation, body, request, of);
      },
      retry: { ...this.#transport.settings.retry, attempts },
      timeout,
      signal: this.#controller.signal,
      answeredAnywhere: () => this.#arrived,
      onTooLarge: (bytes) => source.narrow(bytes / 2 - (defaultsLine?.length ?? 0)),
      onVersion: (version) => this.#merger.seeVersion(version),
    } satisfies Omit<BatchPort, "onAnswer">;
    return { source, port };
  }

  #handOver({ line, context }: Arrival): PortfolioLine<C> {
    if (line.kind === "site-problem") {
      this.#merger.refuse();
      return line;
    }
    try {
      this.#merger.add(line);
    } catch (cause) {
      const reason = `the result of the site ${JSON.stringify(line.id)} cannot be counted`;
      throw new ProtocolError(reason, null, { ...context, cause });
    }
    const typed = this.#transport.settings.columns === "typed";
    if (typed) withTypedColumns(this.#operation, line, { ...context, status: 200 });
    return line as PortfolioLine<C>;
  }

  #progress({ taken }: BatchSource): PortfolioProgress {
    return { taken, answered: this.#merger.answered, refused: this.#merger.refused, requests: this.#requests };
  }
}
