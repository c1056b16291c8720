import type { OpenSite } from "./batch-source.ts";
import type { ClimateLines } from "./climate-lines.ts";

/** What a line of a request holds. */
export type ComposedLine =
  | { readonly kind: "defaults" }
  | { readonly kind: "climate"; readonly name: string }
  | { readonly kind: "site"; readonly site: OpenSite };

/** A whole request body. */
export interface ComposedRequest {
  readonly bytes: Uint8Array;
  /** The first of `lines` is line 1. */
  readonly lines: readonly ComposedLine[];
}

const LINE_BREAK = Uint8Array.of(0x0a);

/** The body that asks for `sites`: the defaults (null: none), the climates that the sites name, the sites, a line each. */
export function composeRequest(
  sites: readonly OpenSite[],
  defaults: Uint8Array | null,
  climates: ClimateLines,
): ComposedRequest {
  const names = new Set(sites.flatMap(({ climate }) => (climate === null ? [] : [climate])));
  const lines: ComposedLine[] = defaults === null ? [] : [{ kind: "defaults" }];
  const pieces = defaults === null ? [] : [defaults, LINE_BREAK];
  for (const name of names) {
    lines.push({ kind: "climate", name });
    pieces.push(climates.line(name), LINE_BREAK);
  }
  for (const site of sites) {
    lines.push({ kind: "site", site });
    pieces.push(site.line, LINE_BREAK);
  }
  return { bytes: Buffer.concat(pieces), lines };
}
