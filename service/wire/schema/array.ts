import { z } from "@hono/zod-openapi";
import { quantity } from "./quantity.ts";

/** Modules in series and in parallel, and the wiring to the converter. */
export const ArraySchema = z
  .strictObject({
    modulesInSeries: quantity("1", "Modules in series in each string.", {
      minimum: 1,
      maximum: 100,
      integer: true,
    }).default(1),
    stringsInParallel: quantity("1", "Strings in parallel.", { minimum: 1, maximum: 10_000, integer: true }).default(1),
    wiringResistance: quantity("ohm", "Resistance between array and converter, of the whole array.", {
      minimum: 0,
      maximum: 100,
    }).default(0),
  })
  .openapi("ArrayLayout", { description: "Modules in series and in parallel, and the wiring to the converter." });
