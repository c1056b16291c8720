import { prepareForStudy } from "../../studies/climate-preparation.ts";
import { buildModule } from "../../studies/module-choice.ts";
import { refusalOf } from "../define-operation.ts";
import type { Limits } from "../limits.ts";
import { flawed } from "../problem.ts";
import type { Parts } from "./parts.ts";
import { checkParts, decodeParts } from "./parts.ts";
import { readLine } from "./read-line.ts";
import { withSharedColumns } from "./shared-columns.ts";
import type { StepAnswer } from "./step.ts";

/** Reads a defaults line: checked as far as it goes without a site, its climate prepared, its module built once to see. */
export function performDefaults(body: Uint8Array, limits: Limits): StepAnswer<"defaults"> {
  const read = readLine(body, "defaults");
  if (!read.ok) return read;
  const raw = read.data;
  const flaws = checkParts(raw, limits);
  if (flaws.length > 0) return { ok: false, problem: flawed(flaws) };
  const climateName = raw.climate !== undefined && "kind" in raw.climate ? raw.climate.name : null;
  try {
    const { data, bytes } = withSharedColumns(prepared(decodeParts(raw)));
    return { ok: true, parts: data, climateName, held: bytes };
  } catch (error) {
    return refusalOf(error);
  }
}

function prepared(parts: Parts): Parts {
  const { module, climate } = parts;
  if (module !== undefined) buildModule(module);
  if (climate === undefined) return parts;
  return { ...parts, climate: { series: climate.series, prepared: prepareForStudy(climate.series) } };
}
