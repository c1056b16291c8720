import type { Check, Finding } from "./check.ts";
import { figuresOf } from "./check.ts";
import { expectedText, marginText, oursText, toleranceText, worstOf } from "./margin.ts";

const INTRODUCTION = `# Accuracy

Generated from the checks in \`test/accuracy/checks/\`; \`npm run accuracy\` rewrites it, and a test refuses a stale copy.

Expected values come from papers, standards and independent computation, never from our own output; the one line that
sets two of our figures side by side says so. "From memory" says that the source was not read for the value;
"second-hand", that it was read elsewhere. A line of several figures shows the one of least margin. The margin is the
tolerance over the difference, rounded down to a power of ten; differences below 5e-14 of the value are rounding and
count as that much. Ours is shown to a hundredth of the tolerance, at most ten digits.`;

const HEADER = ["check", "source", "expected", "ours", "tolerance", "margin"];

function cellsOf(check: Check): string[] {
  const figures = figuresOf(check);
  const worst = worstOf(figures);
  const name = figures.length === 1 ? worst.name : `${worst.name} (least margin of ${figures.length})`;
  const cells = [`${check.title}: ${name}`, check.source, expectedText(worst), oursText(worst)];
  return [...cells, toleranceText(worst), marginText(worst)].map((cell) => cell.replaceAll("|", "\\|"));
}

/** Columns padded to their widest cell, as the formatter would have them. */
function tableOf(rows: readonly string[][]): string {
  const widths = HEADER.map((title, k) => Math.max(title.length, ...rows.map((row) => row[k].length)));
  const line = (cells: readonly string[]): string =>
    `| ${cells.map((cell, k) => cell.padEnd(widths[k])).join(" | ")} |`;
  return [line(HEADER), line(widths.map((width) => "-".repeat(width))), ...rows.map(line)].join("\n");
}

function sectionOf(topic: string, checks: readonly Check[]): string {
  return `## ${topic}\n\n${tableOf(checks.filter((check) => check.topic === topic).map(cellsOf))}`;
}

function findingOf(finding: Finding): string {
  return [
    `### ${finding.title}`,
    "",
    ...finding.lines().map((line) => `- ${line}`),
    `- Source: ${finding.source}.`,
  ].join("\n");
}

/** The accuracy table as Markdown: a section per topic in the order of the checks, then the findings. */
export function resultsMarkdown(checks: readonly Check[], findings: readonly Finding[]): string {
  const topics = [...new Set(checks.map(({ topic }) => topic))];
  const sections = topics.map((topic) => sectionOf(topic, checks));
  const rest = ["## Findings\n\nPrinted for the reader; nothing passes or fails by them.", ...findings.map(findingOf)];
  return `${[INTRODUCTION, ...sections, ...rest].join("\n\n")}\n`;
}
