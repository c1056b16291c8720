import type { ClimateFileErrorCode } from "../errors/climate-file-error.ts";
import { ClimateFileError } from "../errors/climate-file-error.ts";
import type { ClimateRole } from "./climate-header.ts";
import { encodingAdvice, headerOf } from "./climate-header.ts";
import type { FoundColumns } from "./find-columns.ts";
import { listHeaders } from "./find-columns.ts";

const HORIZONTAL: readonly ClimateRole[] = ["global", "directNormal", "diffuse"];

/** The header row that was searched, and what the caller gives beside the file. */
export interface ColumnContext {
  readonly fields: readonly string[];
  readonly line: number;
  readonly hasSite: boolean;
  readonly hasStart: boolean;
}

/**
 * Checks that the columns found make one climate: a time column or a start, one kind of irradiance (global alone or two
 * of the horizontal components, with a site), one kind of temperature. Throws ClimateFileError `column-missing`,
 * `column-repeated` or `site-missing`.
 */
export function checkColumns(found: FoundColumns, context: ColumnContext): void {
  checkTime(found, context);
  checkIrradiance(found, context);
  const cell = found.get("cellTemperature");
  const ambient = found.get("ambientTemperature");
  if (cell !== undefined && ambient !== undefined) throw twice("cellTemperature", "ambientTemperature", found, context);
  if (cell === undefined && ambient === undefined) {
    throw missing(`a temperature: ${quoted(["cellTemperature", "ambientTemperature"], " or ")}`, context);
  }
}

function checkTime(found: FoundColumns, context: ColumnContext): void {
  const time = found.get("time");
  if (time === undefined && !context.hasStart) {
    throw missing('the time: "time" (or, when the rows carry none, the options start and step)', context);
  }
  if (time === undefined || !context.hasStart) return;
  const reason =
    "the file has a time column: leave out the option start, or leave this column out of the option columns.";
  throw fault("column-repeated", time, reason, context);
}

function checkIrradiance(found: FoundColumns, context: ColumnContext): void {
  const components = HORIZONTAL.filter((role) => found.has(role));
  if (found.has("planeOfArray")) {
    if (components.length > 0) throw twice("planeOfArray", components[0], found, context);
    return;
  }
  if (components.length === 0) {
    throw missing(`an irradiance: ${quoted(["planeOfArray", "global"], ", or ")} with or without its parts`, context);
  }
  if (components.length === 1 && components[0] !== "global") {
    const others = HORIZONTAL.filter((role) => role !== components[0]);
    throw missing(`a second horizontal component: ${quoted(others, " or ")}`, context);
  }
  if (context.hasSite) return;
  const reason =
    "horizontal irradiance needs the option site: where the modules stand and how their plane lies, as in the request.";
  throw fault("site-missing", found.get(components[0])!, reason, context);
}

function quoted(roles: readonly ClimateRole[], joint: string): string {
  return roles.map((role) => `"${headerOf(role)}"`).join(joint);
}

function missing(what: string, { fields, line }: ColumnContext): ClimateFileError {
  const reason = `there is no column for ${what}. The header has ${listHeaders(fields)}; rename one, or name the columns with the option columns.`;
  return new ClimateFileError(
    "column-missing",
    { line, column: null, found: null },
    reason + encodingAdvice(fields.join()),
  );
}

function twice(one: ClimateRole, other: ClimateRole, found: FoundColumns, context: ColumnContext): ClimateFileError {
  const later = found.get(one)! > found.get(other)! ? one : other;
  const reason = `the file has both ${quoted([one, other], " and ")}; name the columns to read with the option columns.`;
  return fault("column-repeated", found.get(later)!, reason, context);
}

function fault(code: ClimateFileErrorCode, index: number, reason: string, context: ColumnContext): ClimateFileError {
  return new ClimateFileError(code, { line: context.line, column: index + 1, found: context.fields[index] }, reason);
}
