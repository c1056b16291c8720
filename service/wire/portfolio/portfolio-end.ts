import type { Problem } from "../problem.ts";

/** Thrown where a portfolio cannot go on: nothing after this line will be answered. */
export class PortfolioEnd extends Error {
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail);
    this.name = "PortfolioEnd";
    this.problem = problem;
  }
}
