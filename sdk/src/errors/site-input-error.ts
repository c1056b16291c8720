import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/** Which site of a portfolio it is. */
export interface SitePlace {
  /** Its place in the caller's sequence, counted from 0. */
  readonly index: number;
  /** Its id; null where it has none that could be read. */
  readonly id: string | null;
}

/**
 * Thrown by a portfolio for a site that cannot be sent: its id is no text or was taken before, it names a climate that
 * was not given, or it holds what JSON cannot carry (`cause` is then the EncodingError). The sites before it are sent
 * and answered first; it and those after it are not.
 */
export class SiteInputError extends KneegapError {
  override readonly name = "SiteInputError";
  readonly index: number;
  readonly id: string | null;

  constructor(place: SitePlace, reason: string, context: CallContext) {
    super(`The site at ${place.index}${place.id === null ? "" : `, ${JSON.stringify(place.id)},`} ${reason}.`, context);
    this.index = place.index;
    this.id = place.id;
  }
}
