import type { Limits } from "../limits.ts";
import { problem } from "../problem.ts";
import type { GivenClimate } from "./parts.ts";
import { PortfolioEnd } from "./portfolio-end.ts";
import type { ClimateReference } from "./step.ts";

/** The climates that lines of a portfolio have given by name. */
export class NamedClimates {
  private readonly limits: Limits;
  private readonly climates = new Map<string, { line: number; climate: GivenClimate }>();
  private lines = 0;
  private bytes = 0;

  constructor(limits: Limits) {
    this.limits = limits;
  }

  /** Counts a climate line before anything is made of it. @throws PortfolioEnd beyond the limits */
  countLine(bytes: number): void {
    const { namedClimates, namedClimateBytes } = this.limits;
    this.bytes += bytes;
    if (++this.lines > namedClimates) {
      throw new PortfolioEnd(problem("too-much-work", `There are more than ${namedClimates} climate lines.`));
    }
    if (this.bytes > namedClimateBytes) {
      const detail = `The climate lines are longer than ${namedClimateBytes} bytes together; give other climates in their sites.`;
      throw new PortfolioEnd(problem("body-too-large", detail));
    }
  }

  add(name: string, line: number, climate: GivenClimate): void {
    this.climates.set(name, { line, climate });
  }

  /** The line that gives a name; null: none does. */
  lineOf(name: string): number | null {
    return this.climates.get(name)?.line ?? null;
  }

  /** What a site's worker must know of the climate it names. */
  reference(name: string): ClimateReference {
    const climate = this.climates.get(name)?.climate ?? null;
    return { name, climate, known: climate === null ? [...this.climates.keys()] : [] };
  }
}
