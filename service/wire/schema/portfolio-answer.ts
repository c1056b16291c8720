import { z } from "@hono/zod-openapi";
import { CautionSchema, CoverageSchema, EnergySchema, LostByCauseSchema } from "./answer.ts";
import { ProblemSchema } from "./problem.ts";
import { reported, reportedOrNull } from "./quantity.ts";

const SiteCandidateSchema = z
  .object({
    label: z.string(),
    rank: reported("1", "From 1, by delivered energy; equals share a rank."),
    energy: EnergySchema,
    lostByCause: LostByCauseSchema,
    differenceToBaseline: reported("kWh", "Delivered more than the baseline."),
    differenceToBest: reported("kWh", "Delivered against the best candidate: 0 or below."),
    regret: reported("kWh", "Lost by not choosing the site's own best: 0 or above."),
    worthPerYear: reportedOrNull("the currency of energyValue", "Of the difference to the baseline."),
    payback: reportedOrNull(
      "years",
      "In which the worth pays the price above the baseline's; null where there is none.",
    ),
  })
  .openapi("PortfolioCandidate", { description: "One candidate's figures at one site." });

const ResultLineSchema = z
  .object({
    kind: z.literal("result"),
    id: z.string(),
    count: reported("1", "How often the totals count the site."),
    group: z.string().nullable(),
    baseline: z.string().openapi({ description: "Label of the candidate the others are compared with." }),
    mode: z.string().openapi({ description: "steady or stepped." }),
    results: z.array(SiteCandidateSchema).openapi({ description: "Of one such site, in the order of the candidates." }),
    worthReason: z.string().nullable().openapi({ description: "Why no worth per year can be said; null when it can." }),
    coverage: CoverageSchema,
    cautions: z.array(CautionSchema),
  })
  .openapi("PortfolioResult", {
    description: "What the candidates come to at one site. Lines come as sites are done.",
  });

const ProblemLineSchema = z
  .object({
    kind: z.literal("site-problem"),
    id: z.string().nullable().openapi({ description: "Null where the line has none that will do." }),
    line: reported("1", "Of the request, from 1; empty lines count."),
    problem: ProblemSchema,
  })
  .openapi("PortfolioSiteProblem", {
    description:
      "Why a line got no result; the others are not touched. Its pointers lead into the line as it is with the defaults. A climate line that is refused gets one too, with no id; the totals do not count it, and each site that names it is refused.",
  });

const AbortedLineSchema = z
  .object({
    kind: z.literal("aborted"),
    line: reported("1", "Last line of the request that was begun."),
    problem: ProblemSchema,
  })
  .openapi("PortfolioAborted", {
    description:
      "Why the rest was given up; the last line. Results above stay good, sites without one were not answered.",
  });

const LabelTotalsSchema = z
  .object({
    label: z.string(),
    sites: reported("1", "Sites that had this candidate, each times its count."),
    available: reported("kWh", "What the arrays could have given."),
    delivered: reported("kWh", "What the candidate took."),
    lost: reported("kWh", "What it left."),
    lostFraction: reportedOrNull("1", "Lost over available; null when nothing was available."),
    lostByCause: LostByCauseSchema,
    regret: reported("kWh", "Lost by this candidate everywhere instead of each site's own best."),
  })
  .openapi("PortfolioLabelTotals", { description: "One candidate over many sites, each times its count." });

const TotalsLineSchema = z
  .object({
    kind: z.literal("totals"),
    version: z.string().openapi({ description: "Of the service that computed the answer." }),
    sites: reported("1", "Lines that were meant as sites: answered and refused ones."),
    answered: reported("1", "Result lines above."),
    refused: reported("1", "Sites with a problem in place of a result."),
    labels: z.array(LabelTotalsSchema).openapi({ description: "By label, in the order of their names." }),
    groups: z
      .array(
        z
          .object({ group: z.string(), labels: z.array(LabelTotalsSchema) })
          .openapi("PortfolioGroupTotals", { description: "The totals of one group." }),
      )
      .openapi({ description: "In the order of their names; sites without a group are only in the whole." }),
    best: z
      .string()
      .nullable()
      .openapi({ description: "Label that delivers most of those at every answered site; null: there is none." }),
    worst: z
      .array(
        z
          .object({
            id: z.string(),
            label: z.string().openapi({ description: "The site's baseline." }),
            lost: reported("kWh", "Lost under it, times the site's count."),
            lostFraction: reportedOrNull("1", "Lost over available; null when nothing was available."),
          })
          .openapi("PortfolioWorstSite", { description: "A site that loses much under its baseline." }),
      )
      .openapi({ description: "The 20 sites that lose most under their baseline, the largest loss first." }),
  })
  .openapi("PortfolioTotals", {
    description:
      "What the portfolio comes to, in any order of its sites; the last line. Without it the answer was cut.",
  });

/** One line of the answer of POST /v1/portfolios. */
export const PortfolioOutputLineSchema = z
  .discriminatedUnion("kind", [ResultLineSchema, ProblemLineSchema, AbortedLineSchema, TotalsLineSchema])
  .openapi("PortfolioOutputLine", {
    description: "One line of a portfolio's answer; kinds may be added. Empty lines only keep the connection open.",
  });
