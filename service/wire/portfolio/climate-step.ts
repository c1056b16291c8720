import { prepareForStudy } from "../../studies/climate-preparation.ts";
import { checkClimate, decodeClimate } from "../decode/climate.ts";
import { refusalOf } from "../define-operation.ts";
import type { Limits } from "../limits.ts";
import { flawed } from "../problem.ts";
import { readLine } from "./read-line.ts";
import { withSharedColumns } from "./shared-columns.ts";
import type { StepAnswer } from "./step.ts";

/** Reads a climate line and prepares its climate for every site that will name it. */
export function performClimate(body: Uint8Array, limits: Limits): StepAnswer<"climate"> {
  const read = readLine(body, "climate");
  if (!read.ok) return read;
  const raw = read.data;
  const flaws = checkClimate(raw.climate, limits);
  if (flaws.length > 0) return { ok: false, problem: flawed(flaws) };
  try {
    const series = decodeClimate(raw.climate);
    const { data, bytes } = withSharedColumns({ series, prepared: prepareForStudy(series) });
    return { ok: true, name: raw.name, climate: data, held: bytes };
  } catch (error) {
    return refusalOf(error);
  }
}
