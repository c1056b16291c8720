import type { HorizontalIrradiance } from "../../climate/climate-series.ts";
import type { SkyModel } from "../../climate/plane-of-array.ts";
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

const SUN =
  "Blanco-Muriel et al., Solar Energy 70 (2001) 431-441, coefficients of Blanco et al., Solar Energy 212 (2020) 339-341";
const SKY_MODELS = {
  perez: "Perez et al., Solar Energy 44(5) (1990) 271-289",
  "hay-davies": "Hay & Davies 1980 (from memory)",
  isotropic: "Liu & Jordan 1963 (from memory)",
} as const satisfies Record<SkyModel, string>;

const TRACKING_MODELS = {
  steady: "own derivation: each sample at rest, the causes telescoping from available to delivered power",
  stepped: "own derivation: every control period along straight weather, the causes telescoping likewise",
} as const satisfies Record<TrackingRun["mode"], string>;

/** A model by its name and source, in its first version. */
export function model(name: string, source: string): Model {
  return { name, version: "1", source };
}

/** What a module of a kind rests on. */
export function moduleModels({ kind }: TrackingRequest["module"]): readonly Model[] {
  return MODULE_MODELS[kind];
}

/** What rules rest on, each once. */
export function ruleModels(kinds: readonly RuleKind[]): Model[] {
  return [...new Set(kinds)].map((kind) => model(kind, ruleDefinition(kind).sources.join("; ")));
}

/** What a climate rests on: how its cells and, from horizontal components, its plane were computed. */
export function climateModels({ irradiance, temperature }: TrackingRequest["climate"]): Model[] {
  const cell = temperature.kind === "cell" ? [] : [temperature.model?.kind ?? "faiman"];
  const plane = irradiance.kind === "plane-of-array" ? [] : planeModels(irradiance);
  return [...plane, ...cell.map((kind) => model(`cell-temperature-${kind}`, TEMPERATURE_MODELS[kind]))];
}

function planeModels(irradiance: HorizontalIrradiance): Model[] {
  const { skyModel = "perez", global, directNormal, diffuse } = irradiance;
  const alone = global && !directNormal && !diffuse;
  return [
    model("sun-position", SUN),
    ...(alone ? [model("diffuse-fraction", "Erbs, Klein & Duffie, Solar Energy 28 (1982) 293-302 (from memory)")] : []),
    model(`sky-${skyModel}`, SKY_MODELS[skyModel]),
  ];
}

function modelsOf({ module, climate }: TrackingRequest, kinds: readonly RuleKind[], mode: TrackingRun["mode"]) {
  return [
    ...moduleModels(module),
    ...climateModels(climate),
    ...ruleModels(kinds),
    model(`${mode}-tracking`, TRACKING_MODELS[mode]),
  ];
}

/** Provenance of figures that rest on `models`. `resolved`: the request without presentation members. */
export function provenanceOf(models: readonly Model[], resolved: object) {
  return { version: VERSION, models, inputDigest: inputDigest(resolved) };
}

/** What the figures of a run rest on. `resolved`: the request as the wire states it, without presentation members. */
export function encodeProvenance(request: TrackingRequest, run: TrackingRun, resolved: object) {
  const kinds = run.tracked.map(({ rule }) => rule.kind);
  return provenanceOf(modelsOf(request, kinds, run.mode), resolved);
}

/** The climate as the digest takes it: instants in UTC, columns as doubles. */
export function digestClimate({ start, utcOffset, ...climate }: TrackingRequest["climate"]) {
  return { ...climate, start: new Date(start).toISOString(), utcOffset: utcOffset / 60_000 };
}
