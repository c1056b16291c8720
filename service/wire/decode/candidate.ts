import type { z } from "@hono/zod-openapi";
import type { LabelledCandidate } from "../../studies/comparison.ts";
import type { Limits } from "../limits.ts";
import type { Flaw } from "../problem.ts";
import type { CandidateSchema } from "../schema/comparison.ts";
import type { ConverterSchema } from "../schema/converter.ts";
import { checkConverter, decodeConverter } from "./converter.ts";
import { nearestName } from "./nearest-name.ts";
import { decodeRule } from "./rule.ts";

type RawCandidate = z.output<typeof CandidateSchema>;

/** What is wrong with candidates: their number, their labels, their converters; and a baseline that is none of them. */
export function checkCandidates(
  candidates: readonly RawCandidate[],
  baseline: string | undefined,
  limits: Limits,
): Flaw[] {
  if (candidates.length > limits.candidates) {
    const detail = `There are ${candidates.length} candidates.`;
    return [{ pointer: "/candidates", code: "too-many", detail, expected: `at most ${limits.candidates} candidates` }];
  }
  const labels = candidates.map(({ label }) => label);
  return [
    ...candidates.flatMap(({ converter }, index) => checkConverter(converter, `/candidates/${index}/converter`)),
    ...checkLabels(labels),
    ...(baseline === undefined ? [] : checkBaseline(baseline, labels)),
  ];
}

function checkLabels(labels: readonly string[]): Flaw[] {
  return labels.flatMap((label, index) => {
    if (labels.indexOf(label) === index) return [];
    const detail = `The label "${label}" is that of candidate ${labels.indexOf(label)} too; give each its own.`;
    const pointer = `/candidates/${index}/label`;
    return [{ pointer, code: "label-taken", detail, expected: "a label not used before" }];
  });
}

/** What is wrong with a baseline: that it is the label of no candidate. */
export function checkBaseline(baseline: string, labels: readonly string[]): Flaw[] {
  if (labels.includes(baseline)) return [];
  const meant = nearestName(baseline, labels);
  const question = meant === undefined ? "" : ` Did you mean "${meant}"?`;
  const detail = `No candidate is labelled "${baseline}".${question}`;
  return [{ pointer: "/baseline", code: "unknown-baseline", detail, expected: `one of: ${labels.join(", ")}` }];
}

/** A candidate of the wire as the studies take it; one without a converter of its own has `converter`. */
export function decodeCandidate(
  candidate: RawCandidate,
  index: number,
  converter?: z.output<typeof ConverterSchema>,
): LabelledCandidate {
  return {
    label: candidate.label,
    rule: decodeRule(candidate.rule),
    converter: decodeConverter(candidate.converter ?? converter),
    price: candidate.price ?? null,
    pointer: `/candidates/${index}/rule`,
  };
}
