import type { z } from "@hono/zod-openapi";
import { resolveMode } from "../studies/tracking-run.ts";
import type { TuningRequest, TuningSite } from "../studies/tuning.ts";
import { tune } from "../studies/tuning.ts";
import { workOfTuning } from "../studies/tuning-work.ts";
import { checkClimate, decodeClimate } from "./decode/climate.ts";
import { checkConverter, decodeConverter } from "./decode/converter.ts";
import { checkModule, decodeModule } from "./decode/module.ts";
import { decodeRule } from "./decode/rule.ts";
import { defineOperation } from "./define-operation.ts";
import { jsonText } from "./encode/byte-writer.ts";
import { climateModels, digestClimate, model, moduleModels, provenanceOf, ruleModels } from "./encode/provenance.ts";
import type { Limits } from "./limits.ts";
import type { Flaw } from "./problem.ts";
import { ArraySchema } from "./schema/array.ts";
import { TuningRequestSchema } from "./schema/tuning.ts";

type Raw = z.output<typeof TuningRequestSchema>;
type RawSite = Pick<Raw, "module" | "array" | "converter" | "climate">;

/** The parts of a request that a site may have of its own, and where they stand: "" for the request itself. */
function partsOf(raw: Raw): { parts: RawSite; pointer: string }[] {
  const sites = (raw.sites ?? []).map((parts, index) => ({ parts, pointer: `/sites/${index}` }));
  return [{ parts: raw, pointer: "" }, ...sites];
}

function check(raw: Raw, limits: Limits): Flaw[] {
  return [...partsOf(raw).flatMap((one) => checkParts(one, limits)), ...checkComplete(raw), ...checkIds(raw)];
}

function checkParts({ parts, pointer }: ReturnType<typeof partsOf>[number], limits: Limits): Flaw[] {
  const { module, converter, climate } = parts;
  const flaws = [
    ...(module === undefined ? [] : checkModule(module)),
    ...checkConverter(converter, "/converter"),
    ...(climate === undefined ? [] : checkClimate(climate, limits)),
  ];
  return flaws.map((flaw) => ({ ...flaw, pointer: pointer + flaw.pointer }));
}

/** Every site needs a module and a climate, its own or the request's. */
function checkComplete(raw: Raw): Flaw[] {
  const lacking = (parts: RawSite, pointer: string): Flaw[] =>
    (["module", "climate"] as const)
      .filter((name) => parts[name] === undefined && raw[name] === undefined)
      .map((name) => ({
        pointer: `${pointer}/${name}`,
        code: "missing",
        detail: `There is no ${name}: give one here, or one for all sites at the top of the request.`,
        expected: `a ${name}`,
      }));
  if (raw.sites === undefined) return lacking(raw, "");
  return raw.sites.flatMap((site, index) => lacking(site, `/sites/${index}`));
}

function checkIds({ sites = [] }: Raw): Flaw[] {
  const ids = sites.map(({ id }) => id);
  return ids.flatMap((id, index) => {
    if (ids.indexOf(id) === index) return [];
    const detail = `"${id}" is the id of site ${ids.indexOf(id)} too; give each its own.`;
    return [{ pointer: `/sites/${index}/id`, code: "id-taken", detail, expected: "an id not used before" }];
  });
}

function decode(raw: Raw): TuningRequest {
  const sites = raw.sites ?? [{ id: "site" }];
  return {
    sites: sites.map((site, index) => decodeSite(raw, site, raw.sites === undefined ? "" : `/sites/${index}`)),
    rule: decodeRule(raw.rule),
    parameter: raw.parameter,
    range: raw.range,
    points: raw.points,
  };
}

function decodeSite(raw: Raw, site: { id: string } & RawSite, pointer: string): TuningSite {
  const standsAt = (name: "module" | "climate"): string =>
    site[name] === undefined ? `/${name}` : `${pointer}/${name}`;
  return {
    id: site.id,
    module: decodeModule((site.module ?? raw.module)!),
    array: site.array ?? raw.array ?? ArraySchema.parse({}),
    converter: decodeConverter(site.converter ?? raw.converter),
    climate: decodeClimate((site.climate ?? raw.climate)!),
    mode: raw.mode,
    pointers: { module: standsAt("module"), climate: standsAt("climate") },
  };
}

function answer(request: TuningRequest, raw: Raw): Uint8Array {
  const result = tune(request);
  const [first] = request.sites;
  const { mode } = resolveMode(first.mode, first.climate.step);
  const perSite = request.sites.flatMap(({ module, climate }) => [...moduleModels(module), ...climateModels(climate)]);
  const models = [
    ...new Map(perSite.map((one) => [one.name, one])).values(),
    ...ruleModels([request.rule.kind]),
    model("tuning", "own derivation: the loss curve sampled, its lowest bracket closed in"),
  ];
  const digested = {
    ...request,
    rule: raw.rule,
    sites: request.sites.map(({ pointers: _where, ...site }) => ({ ...site, climate: digestClimate(site.climate) })),
  };
  return new TextEncoder().encode(jsonText({ ...result, mode, provenance: provenanceOf(models, digested) }));
}

/** POST /v1/tunings on bytes. */
export const tuningOperation = defineOperation({
  schema: TuningRequestSchema,
  check,
  decode,
  work: workOfTuning,
  answer,
});
