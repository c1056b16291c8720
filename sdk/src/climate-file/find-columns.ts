import { ClimateFileError, shorten } from "../errors/climate-file-error.ts";
import type { ClimateRole } from "./climate-header.ts";
import { CLIMATE_ROLES, encodingAdvice, headerOf, plain, plainName, recognise } from "./climate-header.ts";
import { closestName } from "./closest-name.ts";

/** Where the caller says a column stands: its header, or its number in the row, counted from 1. */
export type ColumnMapping = Readonly<Partial<Record<ClimateRole, string | number>>>;

/** The index in the row, counted from 0, of each column that is read. */
export type FoundColumns = Map<ClimateRole, number>;

/** A header further off than this many edits is another word, not a slip of the keyboard. */
const SLIP = 2;
const LISTED_HEADERS = 8;

/** How many of `fields`, as a header row, would be read: what tells the right delimiter from the others. */
export function countKnown(fields: readonly string[], mapping: ColumnMapping | undefined): number {
  if (mapping === undefined) return fields.filter((field) => recognise(field) !== null).length;
  const headers = new Set(fields.map(plain));
  return Object.values(mapping).filter((named) =>
    typeof named === "number" ? named <= fields.length : headers.has(plain(named)),
  ).length;
}

/**
 * The columns that the header row `fields` on `line` names: those of `mapping` alone when it is given, else those with
 * documented names; any other is left unread. Throws ClimateFileError `column-repeated`, `unit` and `column-unknown` (a
 * header of the mapping that is not there, or a header that looks like a documented one misspelt).
 */
export function findColumns(fields: readonly string[], mapping: ColumnMapping | undefined, line: number): FoundColumns {
  const found = mapping === undefined ? documentedColumns(fields, line) : new Map<ClimateRole, number>();
  for (const role of CLIMATE_ROLES) {
    const named = mapping?.[role];
    if (named === undefined) continue;
    const index = typeof named === "number" ? numbered(fields, named, line) : mappedByHeader(fields, named, line);
    addColumn(found, role, { index, line, header: fields[index] });
  }
  return found;
}

/** The headers of a row, quoted, for a message; at most eight. */
export function listHeaders(fields: readonly string[]): string {
  const listed = fields.slice(0, LISTED_HEADERS).map((field) => JSON.stringify(shorten(field)));
  return fields.length > LISTED_HEADERS ? `${listed.join(", ")} and more` : listed.join(", ");
}

function documentedColumns(fields: readonly string[], line: number): FoundColumns {
  const found: FoundColumns = new Map();
  fields.forEach((header, index) => {
    const recognised = recognise(header);
    if (recognised === null) return;
    if (!recognised.unitIsRight) {
      const reason = `this column is read as ${headerOf(recognised.role)}; convert it, or correct its unit.`;
      throw new ClimateFileError("unit", { line, column: index + 1, found: header }, reason + encodingAdvice(header));
    }
    addColumn(found, recognised.role, { index, line, header });
  });
  refuseSlips(fields, found, line);
  return found;
}

/** A misspelt header would otherwise be passed over in silence, and a wind column with it. */
function refuseSlips(fields: readonly string[], found: FoundColumns, line: number): void {
  const absent = new Map(
    CLIMATE_ROLES.filter((role) => !found.has(role)).map((role) => [plainName(headerOf(role)), role]),
  );
  fields.forEach((header, index) => {
    if (recognise(header) !== null || plainName(header).length < 4) return;
    const meant = closestName(plainName(header), [...absent.keys()], SLIP);
    if (meant === null) return;
    const reason = `no column is called that; did you mean "${headerOf(absent.get(meant)!)}"? Otherwise name the columns to read with the option columns.`;
    throw new ClimateFileError("column-unknown", { line, column: index + 1, found: header }, reason);
  });
}

function mappedByHeader(fields: readonly string[], header: string, line: number): number {
  const headers = fields.map(plain);
  const index = headers.indexOf(plain(header));
  if (index < 0) {
    const close = closestName(plain(header), headers, Math.max(SLIP, Math.floor(header.length / 3)));
    const meant = close === null ? "" : ` Did you mean ${JSON.stringify(shorten(fields[headers.indexOf(close)]))}?`;
    const reason = `the option columns names "${shorten(header)}", which is not in the header: ${listHeaders(fields)}.${meant}`;
    throw new ClimateFileError(
      "column-unknown",
      { line, column: null, found: null },
      reason + encodingAdvice(fields.join()),
    );
  }
  const again = headers.indexOf(plain(header), index + 1);
  if (again < 0) return index;
  const reason = `column ${index + 1} has the same header; name the one to read by its number in the option columns.`;
  throw new ClimateFileError("column-repeated", { line, column: again + 1, found: fields[again] }, reason);
}

function numbered(fields: readonly string[], number: number, line: number): number {
  if (number <= fields.length) return number - 1;
  const reason = `the option columns names column ${number}, but the row has ${fields.length}: ${listHeaders(fields)}.`;
  throw new ClimateFileError("column-unknown", { line, column: null, found: null }, reason);
}

interface HeaderPlace {
  readonly index: number;
  readonly line: number;
  readonly header: string;
}

function addColumn(found: FoundColumns, role: ClimateRole, { index, line, header }: HeaderPlace): void {
  const place = { line, column: index + 1, found: header };
  const first = found.get(role);
  if (first !== undefined) {
    const reason = `column ${first + 1} is ${headerOf(role)} too; remove one, or name the one to read with the option columns.`;
    throw new ClimateFileError("column-repeated", place, reason);
  }
  const other = [...found].find(([, taken]) => taken === index);
  if (other !== undefined) {
    const reason = `the option columns reads this column both as ${headerOf(other[0])} and as ${headerOf(role)}.`;
    throw new ClimateFileError("column-repeated", place, reason);
  }
  found.set(role, index);
}
