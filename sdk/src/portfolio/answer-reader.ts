import { ConnectionError } from "../errors/connection-error.ts";
import type { CallContext } from "../errors/kneegap-error.ts";
import { ProtocolError } from "../errors/protocol-error.ts";
import type { PortfolioOutputLine, PortfolioResult, PortfolioSiteProblem, Problem } from "../generated/schema.ts";
import { problemError } from "../read-answer.ts";
import { isRetriable } from "../retry.ts";
import type { OpenSite } from "./batch-source.ts";
import type { ComposedLine } from "./compose-request.ts";
import type { PortfolioRefusal } from "./portfolio-lines.ts";

/** Who hears of the lines of an answer. */
export interface AnswerListener {
  /** Called once for each site. */
  readonly onAnswer: (line: PortfolioResult | PortfolioRefusal, context: CallContext) => void;
  /** Called with the version of the service at the end of a whole answer. */
  readonly onVersion: (version: string) => void;
}

/** Takes the lines of one answer, and the sites that they answer out of those that are open. */
export class AnswerReader {
  readonly #lines: readonly ComposedLine[];
  readonly #open: Map<string, OpenSite>;
  readonly #listener: AnswerListener;
  readonly #climateProblems = new Map<string, Problem>();
  #complete = false;
  /** The problem of a site that may well be answered when it is sent again. */
  #postponed: Error | null = null;

  constructor(lines: readonly ComposedLine[], open: Map<string, OpenSite>, listener: AnswerListener) {
    this.#lines = lines;
    this.#open = open;
    this.#listener = listener;
  }

  /**
   * Takes a line; kinds that came with a later version are passed over. Throws the problem of an aborted answer or of
   * refused defaults, and ProtocolError for a site that was not asked for or was answered before.
   */
  take(value: unknown, context: CallContext): void {
    const line = value as PortfolioOutputLine;
    switch (line?.kind) {
      case "result":
        this.#answer(line.id, line, context);
        break;
      case "site-problem":
        this.#refuse(line, context);
        break;
      case "aborted":
        throw errorOfProblem(line.problem, context);
      case "totals":
        this.#complete = true;
        this.#listener.onVersion(line.version);
        break;
      default:
    }
  }

  /**
   * To be called at the end of the answer. Throws ConnectionError when it ended before its totals, the problem of a site
   * that is to be sent again, and ProtocolError for totals that came while a site asked for is still open.
   */
  end(context: CallContext): void {
    if (this.#postponed !== null) throw this.#postponed;
    if (!this.#complete) {
      throw new ConnectionError({ ...context, cause: new Error("the answer ended before its totals") });
    }
    for (const line of this.#lines) {
      if (line.kind !== "site" || !this.#open.has(line.site.id)) continue;
      throw new ProtocolError(`it is complete without the site ${JSON.stringify(line.site.id)}`, null, context);
    }
  }

  #refuse({ id: named, line, problem }: PortfolioSiteProblem, context: CallContext): void {
    const error = errorOfProblem(problem, context);
    const at = this.#lines[line - 1];
    if (named === null && at?.kind === "climate") {
      this.#climateProblems.set(at.name, problem);
      return;
    }
    const id = named ?? (at?.kind === "site" ? at.site.id : null);
    if (id === null) throw error;
    if (isRetriable(error)) {
      this.#postponed = error;
      return;
    }
    const climateProblem = this.#climateProblems.get(this.#open.get(id)?.climate ?? "");
    this.#answer(id, { kind: "site-problem", id, problem, ...(climateProblem && { climateProblem }) }, context);
  }

  #answer(id: string, line: PortfolioResult | PortfolioRefusal, context: CallContext): void {
    if (!this.#open.delete(id)) {
      const reason = `it names the site ${JSON.stringify(id)}, which was not asked for or was answered before`;
      throw new ProtocolError(reason, null, context);
    }
    this.#listener.onAnswer(line, context);
  }
}

function errorOfProblem(problem: Problem | undefined, context: CallContext): Error {
  const status = problem?.status ?? 0;
  const error = problem === undefined ? null : problemError({ status, problem, retryAfter: null }, context);
  return error ?? new ProtocolError("a line of it tells of a problem without a status that is an error", null, context);
}
