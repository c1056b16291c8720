import type { RuleKind } from "../../core/rules/index.ts";
import { ruleDefinition } from "../../core/rules/index.ts";
import type { TrackingRequest, TrackingRun } from "../../studies/tracking-run.ts";
import { VERSION } from "../version.ts";
import { inputDigest } from "./input-digest.ts";

/** A model the figures rest on; `version` is raised when its figures change. */
interface Model {
  name: string;
  version: string;
  source: string;
}

const DE_SOTO = "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory)";
const MODULE_MODELS = {
  datasheet: [
    { name: "datasheet-fit", version: "1", source: `${DE_SOTO}, its five conditions` },
    { name: "single-diode", version: "1", source: `${DE_SOTO}, its translation to irradiance and temperature` },
  ],
  "single-diode": [
    { name: "single-diode", version: "1", source: `${DE_SOTO}, its translation to irradiance and temperature` },
  ],
  "test-generator": [{ name: "test-generator", version: "1", source: "EN 50530:2010 Annex C; IEC 62891:2020 Annex A" }],
} as const satisfies Record<TrackingRequest["module"]["kind"], Model[]>;

const TEMPERATURE_MODELS = {
  faiman: "Faiman, Prog. Photovolt. 16 (2008) 307-315",
  noct: "IEC 61215, nominal operating cell temperature (from memory)",
  king: "King et al. 2004, SAND2004-3535, eqs. 11 and 12",
} as const;

function modelsOf(request: TrackingRequest, kinds: readonly RuleKind[], mode: TrackingRun["mode"]): Model[] {
  const { temperature } = request.climate;
  const cell =
    temperature.kind === "cell"
      ? []
      : [
          {
            name: `cell-temperature-${temperature.model.kind}`,
            version: "1",
            source: TEMPERATURE_MODELS[temperature.model.kind],
          },
        ];
  const rules = [...new Set(kinds)].map((kind) => ({
    name: kind,
    version: "1",
    source: ruleDefinition(kind).sources.join("; "),
  }));
  const tracking = {
    name: `${mode}-tracking`,
    version: "1",
    source: "own derivation: powers telescoped by cause, sample by sample",
  };
  return [...MODULE_MODELS[request.module.kind], ...cell, ...rules, tracking];
}

/** What the figures of a run rest on. `resolved`: the request as the wire states it, without presentation members. */
export function encodeProvenance(request: TrackingRequest, run: TrackingRun, resolved: object) {
  const kinds = run.tracked.map(({ rule }) => rule.kind);
  return { version: VERSION, models: modelsOf(request, kinds, run.mode), inputDigest: inputDigest(resolved) };
}

/** The climate as the digest takes it: instants in UTC, columns as doubles. */
export function digestClimate({ start, utcOffset, ...climate }: TrackingRequest["climate"]) {
  return { ...climate, start: new Date(start).toISOString(), utcOffset: utcOffset / 60_000 };
}
