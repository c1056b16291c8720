import type { z } from "@hono/zod-openapi";
import type { ConverterChoice } from "../../studies/converter-choice.ts";
import { OPEN_CONVERTER, TRUE_SENSORS } from "../../studies/converter-choice.ts";
import type { Flaw } from "../problem.ts";
import type { ConverterSchema } from "../schema/converter.ts";

type RawConverter = z.output<typeof ConverterSchema>;

/** What is wrong between the members of a converter at `pointer`. */
export function checkConverter(converter: RawConverter | undefined, pointer: string): Flaw[] {
  if (converter === undefined || converter.trackingMaximumVoltage === null) return [];
  const { trackingMinimumVoltage: low, trackingMaximumVoltage: high } = converter;
  if (low < high) return [];
  return [
    {
      pointer: `${pointer}/trackingMaximumVoltage`,
      code: "empty-window",
      detail: `trackingMaximumVoltage (${high} V) must be above trackingMinimumVoltage (${low} V); were they swapped?`,
      expected: `above ${low} V`,
    },
  ];
}

/** A converter of the wire as the studies take it; left out: one that limits nothing. */
export function decodeConverter(converter: RawConverter | undefined): ConverterChoice {
  if (converter === undefined) return OPEN_CONVERTER;
  const { sensorError, resolution, ...limits } = converter;
  return {
    ...limits,
    sensors: {
      ...TRUE_SENSORS,
      ...sensorError,
      voltageResolution: resolution?.voltage ?? 0,
      currentResolution: resolution?.current ?? 0,
    },
  };
}
