import type { ClimateRole } from "./climate-file/climate-header.ts";
import type { TableContent } from "./climate-file/climate-table.ts";
import { ClimateTable } from "./climate-file/climate-table.ts";
import type { ClimateText } from "./climate-file/climate-text.ts";
import { textPieces } from "./climate-file/climate-text.ts";
import { countKnown } from "./climate-file/find-columns.ts";
import type { ClimateGaps, ReadClimateOptions } from "./climate-file/read-climate-options.ts";
import { resolveReadOptions } from "./climate-file/read-climate-options.ts";
import { RowReader } from "./climate-file/row-reader.ts";
import { writeStamp } from "./climate-file/time-stamp.ts";

/** Irradiance on the modules' plane, W/m2. */
export interface ReadPlaneOfArray {
  readonly kind: "plane-of-array";
  readonly values: Float64Array;
}

/** Irradiance as weather stations have it, W/m2, with the site that was given: global alone or two of the three. */
export interface ReadHorizontal<Site extends object> {
  readonly kind: "horizontal";
  readonly global?: Float64Array;
  readonly directNormal?: Float64Array;
  readonly diffuse?: Float64Array;
  readonly site: Site;
}

/** The irradiance of a climate that was read; without a site it can only be on the modules' plane. */
export type ReadIrradiance<Site extends object = never> = [Site] extends [never]
  ? ReadPlaneOfArray
  : ReadPlaneOfArray | ReadHorizontal<Site>;

/** The temperature of a climate that was read, degC; wind in m/s. */
export type ReadTemperature =
  | { readonly kind: "cell"; readonly values: Float64Array }
  | { readonly kind: "ambient"; readonly values: Float64Array; readonly windSpeed?: Float64Array };

/** A climate that was read: the member `climate` of a request. Columns are of one length, NaN where a value is missing. */
export interface ReadClimate<Site extends object = never, Gaps extends ClimateGaps = "refuse"> {
  /** Start of the first sample, ISO 8601 with offset. */
  readonly start: string;
  /** Seconds from sample to sample. */
  readonly step: number;
  readonly timing: "mean" | "instant";
  readonly gaps: Gaps;
  readonly irradiance: ReadIrradiance<Site>;
  readonly temperature: ReadTemperature;
}

/**
 * Reads comma-separated values (delimiter and decimal mark are found) into the climate of a request.
 *
 * The first row names the columns: `time`, `plane of array irradiance [W/m2]` or the horizontal `global horizontal
 * irradiance [W/m2]`, `direct normal irradiance [W/m2]`, `diffuse horizontal irradiance [W/m2]` (global alone or two of
 * them), `cell temperature [degC]` or `ambient temperature [degC]`, `wind speed [m/s]`; case, blanks, underscores and
 * hyphens do not matter, the unit may be left out. Other names: {@link ReadClimateOptions.columns}. Stamps are ISO 8601
 * and equally spaced. An empty field or one of `options.missing` becomes NaN; empty lines and lines that begin with "#"
 * are passed over. Nothing is repaired.
 *
 * Streams: beside the columns (8 bytes a value, up to three times that for a moment) it holds one piece and one line.
 * Throws ClimateFileError, with line and column, for a file that is not so; TypeError or RangeError for options that
 * cannot be used; and what the source throws; a source that reading began with is closed.
 */
export async function readClimate<Site extends object = never, Gaps extends ClimateGaps = "refuse">(
  text: ClimateText,
  options: ReadClimateOptions<Site, Gaps> = {},
): Promise<ReadClimate<NoInfer<Site>, NoInfer<Gaps>>> {
  const settings = resolveReadOptions(options);
  const table = new ClimateTable(settings);
  const rows = new RowReader(
    {
      delimiter: settings.delimiter,
      comment: settings.comment,
      firstLine: settings.headerLine ?? null,
      countKnown: (fields) => countKnown(fields, settings.columns),
    },
    (fields, line) => table.take(fields, line),
  );
  for await (const piece of textPieces(text, options.encoding)) await rows.write(piece);
  await rows.end();
  const content = table.finish();
  return {
    start: writeStamp(content.start, content.utcOffset),
    step: content.step / 1000,
    timing: settings.timing,
    gaps: options.gaps ?? ("refuse" as Gaps),
    irradiance: irradianceOf(content, options.site) as ReadIrradiance<Site>,
    temperature: temperatureOf(content),
  };
}

/** A table with horizontal columns was refused where there is no site. */
function irradianceOf<Site extends object>(
  { columns }: TableContent,
  site: Site | undefined,
): ReadPlaneOfArray | ReadHorizontal<Site> {
  const values = columns.get("planeOfArray");
  if (values !== undefined) return { kind: "plane-of-array", values };
  const present = (["global", "directNormal", "diffuse"] as const).filter((role) => columns.has(role));
  const components = Object.fromEntries(present.map((role) => [role, columns.get(role)]));
  return { kind: "horizontal", ...components, site: site! };
}

function temperatureOf({ columns }: TableContent): ReadTemperature {
  const column = (role: ClimateRole) => columns.get(role);
  const cell = column("cellTemperature");
  if (cell !== undefined) return { kind: "cell", values: cell };
  const windSpeed = column("windSpeed");
  return { kind: "ambient", values: column("ambientTemperature")!, ...(windSpeed && { windSpeed }) };
}
