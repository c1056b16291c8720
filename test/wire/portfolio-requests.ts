import { CEILINGS } from "../../service/wire/limits.ts";
import { performStep } from "../../service/wire/portfolio/perform-step.ts";
import type { Errand, PortfolioSettings } from "../../service/wire/portfolio/portfolio.ts";
import { Portfolio } from "../../service/wire/portfolio/portfolio.ts";
import type { Json } from "./requests.ts";
import { bodyOf, climateOf, MODULE } from "./requests.ts";

/** Four rules under names. */
export const CANDIDATES: Json = [
  { label: "hold", rule: { kind: "constant-voltage", setVoltagePerModule: 27 } },
  { label: "fraction", rule: { kind: "fractional-open-circuit-voltage" } },
  { label: "climb", rule: { kind: "perturb-and-observe" } },
  { label: "all", rule: { kind: "perfect" } },
];

/** A defaults line that leaves only the climate to the sites, new at each call. */
export function defaultsLine(more: Json = {}): Json {
  return structuredClone({ kind: "defaults", module: MODULE, candidates: CANDIDATES, ...more });
}

/** A site of `samples` hours whose light is `scale` times the invented one. */
export function siteLine(id: string, more: Json = {}, scale = 1, samples = 6): Json {
  const climate = climateOf(12 + samples);
  climate.irradiance.values = climate.irradiance.values.slice(12).map((light: number) => light * scale);
  climate.temperature.values = climate.temperature.values.slice(12);
  return { kind: "site", id, climate, ...more };
}

/** Lines as a body. */
export function ndjson(lines: readonly Json[]): string {
  return lines.map((line) => `${typeof line === "string" ? line : JSON.stringify(line)}\n`).join("");
}

/** The lines of an answer, the empty ones left out. */
export function linesIn(text: string): Json[] {
  expectLineBreak(text);
  return text
    .split("\n")
    .filter((line) => line !== "")
    .map((line) => JSON.parse(line));
}

function expectLineBreak(text: string): void {
  if (text !== "" && !text.endsWith("\n")) throw new Error("the answer does not end with a line break");
}

/** A portfolio without a service around it. */
export function aPortfolio(settings: Partial<PortfolioSettings> = {}): Portfolio {
  return new Portfolio({ limits: CEILINGS, requestId: "test", hold: () => true, ...settings });
}

/** Takes lines in their order, and settles the sites in the order that `order` brings them into. Gives what is written. */
export function workOff(
  lines: readonly Json[],
  portfolio: Portfolio = aPortfolio(),
  order: (errands: Errand[]) => Errand[] = (errands) => errands,
): Json[] {
  const written: Json[] = [];
  const note = (bytes: Uint8Array | null) => {
    if (bytes !== null) written.push(...linesIn(new TextDecoder().decode(bytes)));
  };
  const waiting: Errand[] = [];
  for (const [index, line] of lines.entries()) {
    const todo = portfolio.take({ number: index + 1, bytes: bodyOf(line) });
    if (todo instanceof Uint8Array) note(todo);
    else if (todo.first) note(todo.settle(performStep(todo.step)));
    else waiting.push(todo);
  }
  for (const errand of order(waiting)) note(errand.settle(performStep(errand.step)));
  note(portfolio.totalsLine());
  return written;
}
