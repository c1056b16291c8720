import type { PortfolioSite } from "../../studies/portfolio.ts";
import { portfolioSite } from "../../studies/portfolio.ts";
import { workOf } from "../../studies/work.ts";
import { nearestName } from "../decode/nearest-name.ts";
import { refusalOf, tooMuch } from "../define-operation.ts";
import { encodeResultLine } from "../encode/portfolio-line.ts";
import type { Limits } from "../limits.ts";
import type { Refusal } from "../operation.ts";
import type { Flaw } from "../problem.ts";
import { flawed } from "../problem.ts";
import { checkParts, completeSite, decodeParts, mergeParts } from "./parts.ts";
import { readLine } from "./read-line.ts";
import type { ClimateReference, SiteGiven, StepAnswer } from "./step.ts";

/** Reads a site's line, merges it with the defaults and compares its candidates. */
export function performSite(body: Uint8Array, given: SiteGiven, limits: Limits): StepAnswer<"site"> {
  const read = readSite(body, given, limits);
  if (!read.ok) return read;
  const { site } = read;
  const work = workOf(site.climate, site.mode, site.candidates);
  if (work > limits.controlPeriods) return { ok: false, problem: tooMuch(work, limits.controlPeriods) };
  try {
    const { comparison, outcome } = portfolioSite(site);
    return { ok: true, bytes: encodeResultLine(site, comparison), outcome };
  } catch (error) {
    return refusalOf(error);
  }
}

function readSite(
  body: Uint8Array,
  { defaults, reference }: SiteGiven,
  limits: Limits,
): { ok: true; site: PortfolioSite } | Refusal {
  const read = readLine(body, "site");
  if (!read.ok) return read;
  const raw = read.data;
  // A climate of the site's own leaves no question open.
  const refers = raw.climate === undefined || "kind" in raw.climate ? reference : null;
  const flaws = [...checkParts(raw, limits), ...(refers?.climate === null ? [unknownClimate(refers)] : [])];
  if (flaws.length > 0) return { ok: false, problem: flawed(flaws) };
  const merged = mergeParts(defaults, decodeParts(raw));
  const complete = completeSite(raw.id, refers === null ? merged : { ...merged, climate: refers.climate! });
  return "flaws" in complete ? { ok: false, problem: flawed(complete.flaws) } : { ok: true, site: complete.site };
}

function unknownClimate({ name, known }: ClimateReference): Flaw {
  const meant = nearestName(name, known);
  const question = meant === undefined ? "" : ` Did you mean "${meant}"?`;
  const expected = known.length === 0 ? "a climate line above that was not refused" : `one of: ${known.join(", ")}`;
  const detail = `No line above gives a climate "${name}", or it was refused.${question}`;
  return { pointer: "/climate/name", code: "unknown-climate", detail, expected };
}
