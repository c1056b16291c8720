import type { SiteOutcome } from "../../studies/portfolio.ts";
import type { Limits } from "../limits.ts";
import type { Refusal } from "../operation.ts";
import type { GivenClimate, Parts } from "./parts.ts";

/** What a step does with its line, and what it finds. */
export interface Steps {
  /** The first line: what sites share. */
  defaults: { given: null; found: DefaultsFound };
  /** A climate line. */
  climate: { given: null; found: ClimateFound };
  site: { given: SiteGiven; found: SiteFound };
}

export type StepName = keyof Steps;

/** One line of a portfolio to be worked on, wherever: plain data that crosses threads. */
export interface Step<Name extends StepName = StepName> {
  step: Name;
  /** The line. */
  body: Uint8Array;
  limits: Limits;
  given: Steps[Name]["given"];
}

/** What a step found, or why not. */
export type StepAnswer<Name extends StepName = StepName> = ({ ok: true } & Steps[Name]["found"]) | Refusal;

/** Columns are in shared memory: `held` bytes of it. */
export interface DefaultsFound {
  parts: Parts;
  /** The climate that sites have where they give none: named, and so not among the parts. */
  climateName: string | null;
  held: number;
}

/** Columns are in shared memory: `held` bytes of it. */
export interface ClimateFound {
  name: string;
  climate: GivenClimate;
  held: number;
}

/** What a site's line meets. */
export interface SiteGiven {
  defaults: Parts;
  /** What the site's climate refers to; null where it does not refer to any. */
  reference: ClimateReference | null;
}

/** A climate by its name, found or not. */
export interface ClimateReference {
  name: string;
  climate: GivenClimate | null;
  /** Names that would do, where it was not found. */
  known: string[];
}

export interface SiteFound {
  /** The result line, with its line break. */
  bytes: Uint8Array;
  outcome: SiteOutcome;
}
