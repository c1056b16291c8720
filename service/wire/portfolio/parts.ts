import type { z } from "@hono/zod-openapi";
import type { ClimateSeries } from "../../climate/climate-series.ts";
import type { StudyClimate } from "../../studies/climate-preparation.ts";
import type { EnergyValue, LabelledCandidate } from "../../studies/comparison.ts";
import type { ConverterChoice } from "../../studies/converter-choice.ts";
import type { ModuleChoice } from "../../studies/module-choice.ts";
import type { PortfolioSite } from "../../studies/portfolio.ts";
import { checkBaseline, checkCandidates, decodeCandidate } from "../decode/candidate.ts";
import { checkClimate, decodeClimate } from "../decode/climate.ts";
import { checkConverter, decodeConverter } from "../decode/converter.ts";
import { checkModule, decodeModule } from "../decode/module.ts";
import type { Limits } from "../limits.ts";
import type { Flaw } from "../problem.ts";
import { ArraySchema } from "../schema/array.ts";
import type { NamingLineSchema, PlainLineSchema } from "../schema/portfolio.ts";

type RawLine = z.output<typeof PlainLineSchema> | z.output<typeof NamingLineSchema>;

/** A defaults or site line that has the right form. */
export type RawParts = Exclude<RawLine, { kind: "climate" }>;

/** A climate, and what the studies make of it where that is done already. */
export interface GivenClimate {
  series: ClimateSeries;
  prepared?: StudyClimate | undefined;
}

/** What a line says of its site, or the defaults of every site: plain data for the studies, nothing filled in. */
export interface Parts {
  module?: ModuleChoice | undefined;
  array?: PortfolioSite["array"] | undefined;
  converter?: ConverterChoice | undefined;
  /** Null where a candidate has the converter of its site. */
  candidates?: (Omit<LabelledCandidate, "converter"> & { converter: ConverterChoice | null })[] | undefined;
  baseline?: string | undefined;
  climate?: GivenClimate | undefined;
  mode?: PortfolioSite["mode"] | undefined;
  energyValue?: EnergyValue | undefined;
  recordLowTemperature?: number | null | undefined;
  count?: number | undefined;
  group?: string | undefined;
}

/** What is wrong inside the members of a line. */
export function checkParts({ module, converter, candidates, baseline, climate }: RawParts, limits: Limits): Flaw[] {
  return [
    ...(module === undefined ? [] : checkModule(module)),
    ...checkConverter(converter, "/converter"),
    ...(candidates === undefined ? [] : checkCandidates(candidates, baseline, limits)),
    ...(climate === undefined || "kind" in climate ? [] : checkClimate(climate, limits)),
  ];
}

/** The members of a line as the studies take them; a climate that is only named is not among them. */
export function decodeParts(raw: RawParts): Parts {
  const { module, array, converter, candidates, climate, baseline, mode, energyValue, count, group } = raw;
  return {
    module: module && decodeModule(module),
    array,
    converter: converter && decodeConverter(converter),
    candidates: candidates?.map((candidate, index) => ({
      ...decodeCandidate(candidate, index),
      converter: candidate.converter === undefined ? null : decodeConverter(candidate.converter),
    })),
    baseline,
    climate: climate === undefined || "kind" in climate ? undefined : { series: decodeClimate(climate) },
    mode,
    energyValue,
    recordLowTemperature: raw.recordLowTemperature,
    count,
    group,
  };
}

/** The defaults with every member that a site has of its own in its place. */
export function mergeParts(defaults: Parts, own: Parts): Parts {
  const given = Object.entries(own).filter(([, member]) => member !== undefined);
  return { ...defaults, ...Object.fromEntries(given) };
}

/** The site that merged parts come to, or what they lack. */
export function completeSite(id: string, parts: Parts): { site: PortfolioSite } | { flaws: Flaw[] } {
  const { module, candidates, climate, baseline } = parts;
  if (module === undefined || candidates === undefined || climate === undefined) return { flaws: lacking(parts) };
  if (baseline !== undefined) {
    const labels = candidates.map(({ label }) => label);
    const flaws = checkBaseline(baseline, labels);
    if (flaws.length > 0) return { flaws };
  }
  const converter = parts.converter ?? decodeConverter(undefined);
  return {
    site: {
      id,
      module,
      array: parts.array ?? ArraySchema.parse({}),
      climate: climate.series,
      prepared: climate.prepared,
      mode: parts.mode ?? "auto",
      candidates: candidates.map((candidate) => ({ ...candidate, converter: candidate.converter ?? converter })),
      baseline: baseline ?? null,
      energyValue: parts.energyValue ?? null,
      recordLowTemperature: parts.recordLowTemperature ?? null,
      count: parts.count ?? 1,
      group: parts.group ?? null,
    },
  };
}

function lacking(parts: Parts): Flaw[] {
  const names = (["module", "candidates", "climate"] as const).filter((name) => parts[name] === undefined);
  return names.map((name) => ({
    pointer: `/${name}`,
    code: "missing",
    detail: `The site has no ${name}: give it here, or once for all sites in a defaults line.`,
    expected: name === "candidates" ? "2 to 24 candidates" : `a ${name}`,
  }));
}
