/** What a column of a climate file holds. */
export type ClimateRole =
  | "time"
  | "planeOfArray"
  | "global"
  | "directNormal"
  | "diffuse"
  | "cellTemperature"
  | "ambientTemperature"
  | "windSpeed";

interface RoleHeader {
  readonly name: string;
  /** The unit as we write it; null where there is none. */
  readonly unit: string | null;
  /** The unit as files write it, plain (see `plain`); the first is ours. */
  readonly spellings: readonly string[];
}

const IRRADIANCE = { unit: "W/m2", spellings: ["w/m2", "w/m^2", "w/m**2", "wm2", "w/sqm"] };
const TEMPERATURE = { unit: "degC", spellings: ["degc", "°c", "c"] };

const HEADERS: Readonly<Record<ClimateRole, RoleHeader>> = {
  time: { name: "time", unit: null, spellings: [] },
  planeOfArray: { name: "plane of array irradiance", ...IRRADIANCE },
  global: { name: "global horizontal irradiance", ...IRRADIANCE },
  directNormal: { name: "direct normal irradiance", ...IRRADIANCE },
  diffuse: { name: "diffuse horizontal irradiance", ...IRRADIANCE },
  cellTemperature: { name: "cell temperature", ...TEMPERATURE },
  ambientTemperature: { name: "ambient temperature", ...TEMPERATURE },
  windSpeed: { name: "wind speed", unit: "m/s", spellings: ["m/s", "ms1"] },
};

/** All roles, in the order of the documentation. */
export const CLIMATE_ROLES = Object.keys(HEADERS) as readonly ClimateRole[];

const ROLE_BY_NAME = new Map(CLIMATE_ROLES.map((role) => [plain(HEADERS[role].name), role]));

/** The header of a role as the documentation writes it, such as `wind speed [m/s]`. */
export function headerOf(role: ClimateRole): string {
  const { name, unit } = HEADERS[role];
  return unit === null ? name : `${name} [${unit}]`;
}

/** A header as it is compared: compatibility forms folded (NFKC), lower case, without blanks, underscores and hyphens. */
export function plain(text: string): string {
  return text
    .normalize("NFKC")
    .toLowerCase()
    .replace(/[\s_-]+/g, "");
}

/** What a header of the documented names says; null for any other. `unitIsRight` is true also where it names no unit. */
export function recognise(header: string): { readonly role: ClimateRole; readonly unitIsRight: boolean } | null {
  const { name, unit } = nameAndUnit(header);
  const role = ROLE_BY_NAME.get(name);
  if (role === undefined) return null;
  return { role, unitIsRight: unit === null || HEADERS[role].spellings.includes(unit) };
}

/** The name of a header without its unit, as it is compared. */
export function plainName(header: string): string {
  return nameAndUnit(header).name;
}

/** The unit stands in square or round brackets at the end. Both are as they are compared. */
function nameAndUnit(header: string): { readonly name: string; readonly unit: string | null } {
  const compared = plain(header);
  const open = Math.max(compared.lastIndexOf("["), compared.lastIndexOf("("));
  if (open <= 0 || !/[\])]$/.test(compared)) return { name: compared, unit: null };
  return { name: compared.slice(0, open), unit: compared.slice(open + 1, -1) };
}

/** Advice to add where a text holds signs of having been decoded wrongly; empty otherwise. */
export function encodingAdvice(text: string): string {
  if (!/[\uFFFD\0]/.test(text)) return "";
  return " The file is not UTF-8: save it as UTF-8, or give the option encoding, such as windows-1252.";
}
