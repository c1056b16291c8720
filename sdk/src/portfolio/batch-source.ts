import { encodeBody } from "../encode-body.ts";
import type { CallContext } from "../errors/kneegap-error.ts";
import { SiteInputError } from "../errors/site-input-error.ts";
import type { ClimateLines } from "./climate-lines.ts";
import type { PortfolioSiteRequest } from "./portfolio-lines.ts";
import { SeenIds } from "./seen-ids.ts";

/** A site on its way. */
export interface OpenSite {
  readonly id: string;
  readonly line: Uint8Array;
  /** The name of its climate; null when it names none. */
  readonly climate: string | null;
}

/** Up to what a batch is filled. */
export interface BatchBounds {
  readonly sites: number;
  /** Of the sites and the climates that they name. */
  readonly bytes: number;
}

/** What the sites of a portfolio may refer to. */
export interface SharedParts {
  readonly climates: ClimateLines;
  /** The name of the climate that a site has without one of its own; null when the defaults name none. */
  readonly climate: string | null;
}

/** How long the caller's sequence may keep a batch that is not full waiting, ms. */
const PATIENCE = 100;

/** Takes the caller's sites one by one and packs them into batches. */
export class BatchSource {
  readonly #sites: Iterator<PortfolioSiteRequest> | AsyncIterator<PortfolioSiteRequest>;
  readonly #shared: SharedParts;
  #bounds: BatchBounds;
  readonly #context: CallContext;
  readonly #seen = new SeenIds();
  #taken = 0;
  /** A site that no longer went into the last batch. */
  #over: OpenSite | null = null;
  #pending: Promise<IteratorResult<PortfolioSiteRequest>> | null = null;
  #ended = false;
  #failure: { readonly error: unknown } | null = null;

  constructor(
    sites: Iterable<PortfolioSiteRequest> | AsyncIterable<PortfolioSiteRequest>,
    shared: SharedParts,
    bounds: BatchBounds,
    context: CallContext,
  ) {
    this.#sites = Symbol.asyncIterator in sites ? sites[Symbol.asyncIterator]() : sites[Symbol.iterator]();
    this.#shared = shared;
    this.#bounds = bounds;
    this.#context = context;
  }

  /** How many sites were taken. */
  get taken(): number {
    return this.#taken;
  }

  /** Fills the batches that follow up to no more than `bytes`. */
  narrow(bytes: number): void {
    this.#bounds = { ...this.#bounds, bytes: Math.min(this.#bounds.bytes, bytes) };
  }

  /**
   * The next batch: full, or what there is when the sequence ends, fails, or keeps it waiting for 100 ms; null at the
   * end. A failure of the sequence, or a SiteInputError, is thrown once the sites before it are in a batch.
   */
  async next(): Promise<OpenSite[] | null> {
    const batch: OpenSite[] = [];
    const named = new Set<string>();
    let bytes = 0;
    for (;;) {
      const site = await this.#take(batch.length > 0);
      if (site === null) break;
      const climate =
        site.climate === null || named.has(site.climate) ? 0 : this.#shared.climates.line(site.climate).length;
      const more = site.line.length + climate;
      if (batch.length > 0 && bytes + more > this.#bounds.bytes) {
        this.#over = site;
        return batch;
      }
      batch.push(site);
      bytes += more;
      if (site.climate !== null) named.add(site.climate);
      if (batch.length === this.#bounds.sites) return batch;
    }
    if (batch.length > 0) return batch;
    if (this.#failure !== null) throw this.#failure.error;
    return null;
  }

  /** Lets the sequence go, unless it ended by itself. What it throws on the way out is thrown, unless it is still being waited for. */
  async close(): Promise<void> {
    if (this.#ended) return;
    this.#ended = true;
    const closed = Promise.resolve(this.#sites.return?.());
    if (this.#pending === null) await closed;
    else closed.catch(() => {});
  }

  /** The next site; null at the end, at a failure, or when it keeps others waiting. */
  async #take(othersWait: boolean): Promise<OpenSite | null> {
    const over = this.#over;
    this.#over = null;
    if (over !== null || this.#ended) return over;
    try {
      const step = await this.#step(othersWait);
      if (step === null) return null;
      if (step.done === true) this.#ended = true;
      else return this.#open(step.value);
    } catch (error) {
      await this.#fail(error);
    }
    return null;
  }

  async #fail(error: unknown): Promise<void> {
    this.#failure = { error };
    // A sequence that threw has ended; one with a site that cannot be sent has not.
    if (error instanceof SiteInputError) await this.close().catch(() => {});
    this.#ended = true;
  }

  async #step(othersWait: boolean): Promise<IteratorResult<PortfolioSiteRequest> | null> {
    if (this.#pending === null) {
      const step = this.#sites.next();
      if (!("then" in step)) return step;
      this.#pending = step;
      // It may fail while nobody waits for it, and then does so again for the next who does.
      step.catch(() => {});
    }
    const step = await (othersWait ? patiently(this.#pending) : this.#pending);
    if (step !== null) this.#pending = null;
    return step;
  }

  #open(site: PortfolioSiteRequest): OpenSite {
    const index = this.#taken;
    this.#taken += 1;
    const id = typeof site?.id === "string" ? site.id : null;
    const refuse = (reason: string, cause?: unknown) =>
      new SiteInputError({ index, id }, reason, { ...this.#context, cause });
    if (id === null) throw refuse("has no id, or one that is no text");
    const first = this.#seen.add(id, index);
    if (first !== null) throw refuse(`has the id of the site at ${first}; give each its own`);
    const climate = site.climate === undefined ? this.#shared.climate : namedClimate(site);
    if (climate !== null && !this.#shared.climates.has(climate)) {
      throw refuse(`names the climate ${JSON.stringify(climate)}, which the option climates does not hold`);
    }
    try {
      if (climate !== null) this.#shared.climates.line(climate);
      const line = encodeBody({ ...site, kind: "site" }, "application/json", this.#context);
      return { id, line, climate };
    } catch (cause) {
      throw refuse(`cannot be written: ${(cause as Error).message}`, cause);
    }
  }
}

/** The name by which a site, or the defaults, refer to a climate; null when they do not. */
export function namedClimate({ climate }: Pick<PortfolioSiteRequest, "climate">): string | null {
  return climate !== undefined && "kind" in climate && climate.kind === "named" ? climate.name : null;
}

/** What `pending` gives within {@link PATIENCE}, else null. */
async function patiently<T>(pending: Promise<T>): Promise<T | null> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<null>((resolve) => {
    timer = setTimeout(resolve, PATIENCE, null);
  });
  try {
    return await Promise.race([pending, late]);
  } finally {
    clearTimeout(timer);
  }
}
