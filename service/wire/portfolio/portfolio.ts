import { PortfolioTotals } from "../../studies/portfolio-totals.ts";
import { encodeLine, encodeTotalsLine } from "../encode/portfolio-line.ts";
import { encodeProblem } from "../encode/problem.ts";
import type { Limits } from "../limits.ts";
import { TOTALS_ROWS } from "../limits.ts";
import type { Refusal } from "../operation.ts";
import type { Flaw, Problem } from "../problem.ts";
import { flawed, problem } from "../problem.ts";
import type { LineHead } from "./line-head.ts";
import { headOf } from "./line-head.ts";
import { NamedClimates } from "./named-climates.ts";
import type { Parts } from "./parts.ts";
import { PortfolioEnd } from "./portfolio-end.ts";
import { SeenIds } from "./seen-ids.ts";
import type { Step, StepAnswer, StepName } from "./step.ts";

/** A line of a request. `bytes`: null where it is longer than a line may be. */
export interface Line {
  /** From 1, empty lines counted. */
  number: number;
  bytes: Uint8Array | null;
}

/** A step to perform, and what becomes of its answer. */
export interface Errand<Name extends StepName = StepName> {
  step: Step<Name>;
  /** Whether the lines after it must wait for it. */
  first: boolean;
  /** The line to write; null: none. @throws PortfolioEnd where the portfolio cannot go on */
  settle(answer: StepAnswer<Name>): Uint8Array | null;
}

/** How a portfolio is worked on. */
export interface PortfolioSettings {
  limits: Limits;
  /** For the problems of its lines. */
  requestId: string;
  /** Asked for memory that is held until the portfolio's end; false: there is none. */
  hold: (bytes: number) => boolean;
}

/**
 * What is known of a portfolio while its lines come and its sites are done. Lines are taken in their order, steps may be
 * settled in any: what is answered to each line, and the totals, do not depend on that order.
 */
export class Portfolio {
  private readonly settings: PortfolioSettings;
  private readonly totals = new PortfolioTotals();
  private readonly ids = new SeenIds();
  private readonly climates: NamedClimates;
  private defaults: Parts = {};
  private defaultClimate: string | null = null;
  private sites = 0;
  private line = 0;

  constructor(settings: PortfolioSettings) {
    this.settings = settings;
    this.climates = new NamedClimates(settings.limits);
  }

  /** Takes the next line that is not empty: to an errand, or to the line that answers it. @throws PortfolioEnd */
  take({ number, bytes }: Line): Errand | Uint8Array {
    const isFirst = this.line === 0;
    this.line = number;
    if (bytes === null) return this.tooLong(number, isFirst);
    const head = headOf(bytes);
    if (head.kind === "climate") return this.climateErrand(number, bytes);
    if (head.kind === "site") return this.siteErrand(head, number, bytes);
    // What is no line of ours in the place of the defaults would let every site after it down.
    if (isFirst) return this.defaultsErrand(bytes);
    if (head.kind === "defaults") throw new PortfolioEnd(lateDefaults(number));
    return this.siteErrand(head, number, bytes);
  }

  /** The last line where every site was answered or refused. */
  totalsLine(): Uint8Array {
    return encodeTotalsLine(this.totals.summary());
  }

  /** The last line where something ended the portfolio before. */
  abortedLine(of: Problem): Uint8Array {
    return encodeLine({ kind: "aborted", line: this.line, problem: encodeProblem(of, this.settings.requestId) });
  }

  /** For the log. */
  counts(): { sites: number; answered: number; refused: number } {
    return { sites: this.sites, ...this.totals.counts };
  }

  private tooLong(number: number, isFirst: boolean): Uint8Array {
    const detail = `The line is longer than ${this.settings.limits.lineBytes} bytes.`;
    const of = problem("body-too-large", detail);
    if (isFirst) throw new PortfolioEnd(of);
    this.countSite();
    return this.refuseSite(null, number, of);
  }

  private defaultsErrand(body: Uint8Array): Errand<"defaults"> {
    const { limits } = this.settings;
    return {
      step: { step: "defaults", body, limits, given: null },
      first: true,
      settle: (answer) => {
        if (!answer.ok) throw new PortfolioEnd(answer.problem);
        this.hold(answer.held);
        this.defaults = answer.parts;
        this.defaultClimate = answer.climateName;
        return null;
      },
    };
  }

  private climateErrand(number: number, body: Uint8Array): Errand<"climate"> {
    this.climates.countLine(body.byteLength);
    return {
      step: { step: "climate", body, limits: this.settings.limits, given: null },
      first: true,
      settle: (answer) => {
        if (!answer.ok) {
          refuseFatal(answer);
          return this.problemLine(null, number, answer.problem);
        }
        const { name, climate, held } = answer;
        const taken = this.climates.lineOf(name);
        if (taken !== null) return this.problemLine(null, number, flawed([nameTaken(name, taken)]));
        this.hold(held);
        this.climates.add(name, number, climate);
        return null;
      },
    };
  }

  private siteErrand({ id, climate }: LineHead, number: number, body: Uint8Array): Errand<"site"> | Uint8Array {
    this.countSite();
    if (id !== null && !this.ids.add(id)) return this.refuseSite(id, number, flawed([idTaken(id)]));
    const name = climate ?? this.defaultClimate;
    const given = { defaults: this.defaults, reference: name === null ? null : this.climates.reference(name) };
    return {
      step: { step: "site", body, limits: this.settings.limits, given },
      first: false,
      settle: (answer) => {
        if (!answer.ok) {
          refuseFatal(answer);
          return this.refuseSite(id, number, answer.problem);
        }
        this.totals.add(answer.outcome);
        if (this.totals.rows > TOTALS_ROWS) throw new PortfolioEnd(TOO_MANY_ROWS);
        return answer.bytes;
      },
    };
  }

  private countSite(): void {
    const { sites } = this.settings.limits;
    if (++this.sites > sites) {
      throw new PortfolioEnd(
        problem("too-much-work", `There are more than ${sites} sites; send the rest in a request of their own.`),
      );
    }
  }

  private refuseSite(id: string | null, line: number, of: Problem): Uint8Array {
    this.totals.refuse();
    return this.problemLine(id, line, of);
  }

  private problemLine(id: string | null, line: number, of: Problem): Uint8Array {
    return encodeLine({ kind: "site-problem", id, line, problem: encodeProblem(of, this.settings.requestId) });
  }

  private hold(bytes: number): void {
    if (!this.settings.hold(bytes))
      throw new PortfolioEnd(problem("overloaded", "There is no room for its climates now."));
  }
}

/** A service that shuts down has not begun this site, nor will it begin the next. */
function refuseFatal({ problem: of }: Refusal): void {
  if (of.code === "draining") throw new PortfolioEnd(of);
}

const TOO_MANY_ROWS = problem(
  "too-much-work",
  `The totals have more than ${TOTALS_ROWS} rows, one a label and one a label in each group; use fewer labels or groups.`,
);

function lateDefaults(number: number): Problem {
  const detail = `Line ${number} is a defaults line, which only the first may be; send what follows as a request of its own.`;
  return flawed([{ pointer: "/kind", code: "defaults-not-first", detail, expected: "site or climate" }]);
}

function idTaken(id: string): Flaw {
  const detail = `A line above is the site "${id}" already; give each its own id.`;
  return { pointer: "/id", code: "id-taken", detail, expected: "an id not used before" };
}

function nameTaken(name: string, line: number): Flaw {
  const detail = `Line ${line} gives a climate "${name}" already; that one stays.`;
  return { pointer: "/name", code: "name-taken", detail, expected: "a name not used before" };
}
