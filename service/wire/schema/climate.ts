import { z } from "@hono/zod-openapi";
import { FAIMAN } from "../../climate/cell-temperature.ts";
import { column } from "./column.ts";
import { quantity } from "./quantity.ts";

/** An instant of 1950 to 2099 with its offset from UTC; that the day exists is checked afterwards. */
export const INSTANT =
  /^(19[5-9][0-9]|20[0-9][0-9])-(0[1-9]|1[0-2])-(0[1-9]|[12][0-9]|3[01])T([01][0-9]|2[0-3]):[0-5][0-9](:[0-5][0-9](\.[0-9]{1,3})?)?(Z|[+-](0[0-9]|1[0-4]):[0-5][0-9])$/;

/** Irradiance on the tilted plane of the modules. */
export const PlaneOfArraySchema = z
  .strictObject({
    kind: z.literal("plane-of-array"),
    values: column("W/m2", "Irradiance on the plane of the modules; readings down to -10 at night count as 0.", {
      minimum: -10,
      maximum: 2000,
    }),
  })
  .openapi("PlaneOfArrayIrradiance", { description: "Irradiance on the tilted plane of the modules." });

const SiteSchema = z
  .strictObject({
    latitude: quantity("degrees", "North positive.", { minimum: -90, maximum: 90 }),
    longitude: quantity("degrees", "East positive.", { minimum: -180, maximum: 180 }),
    elevation: quantity("m", "Above sea level.", { minimum: -500, maximum: 9000 }).default(0),
    tilt: quantity("degrees", "Of the modules' plane from the horizontal.", { minimum: 0, maximum: 90 }),
    azimuth: quantity("degrees", "Of the modules' plane, clockwise from north: 180 faces south.", {
      minimum: 0,
      maximum: 360,
    }),
    albedo: quantity("1", "Share of the light that the ground throws back.", { minimum: 0, maximum: 1 }).default(0.2),
  })
  .openapi("Site", { description: "Where the modules stand and how their plane lies." });

const horizontalColumn = (description: string) =>
  column("W/m2", description, { minimum: -10, maximum: 2000 }).optional();

/** Irradiance as weather stations have it. */
export const HorizontalSchema = z
  .strictObject({
    kind: z.literal("horizontal"),
    global: horizontalColumn("Global irradiance on the horizontal."),
    directNormal: horizontalColumn("Direct irradiance facing the sun."),
    diffuse: horizontalColumn("Diffuse irradiance on the horizontal."),
    site: SiteSchema,
    skyModel: z.enum(["perez", "hay-davies", "isotropic"]).default("perez").openapi({
      description: "How the sky's light is spread: Perez et al. 1990, Hay & Davies 1980, Liu & Jordan 1963.",
    }),
  })
  .openapi("HorizontalIrradiance", {
    description:
      "Irradiance as weather stations have it: global alone (its diffuse part by Erbs et al. 1982), or any two of the three; the plane of the modules is computed.",
  });

/** The light of a climate. */
export const IrradianceSchema = z
  .discriminatedUnion("kind", [PlaneOfArraySchema, HorizontalSchema])
  .openapi("Irradiance", { description: "The light of a climate." });

const FaimanSchema = z
  .strictObject({
    kind: z.literal("faiman"),
    heatLoss: quantity("W/(m2 K)", "Heat loss of the modules in still air.", {
      minimum: 5,
      maximum: 100,
    }).default(FAIMAN.heatLoss),
    windHeatLoss: quantity("W s/(m3 K)", "Heat loss that each m/s of wind adds.", {
      minimum: 0,
      maximum: 50,
    }).default(FAIMAN.windHeatLoss),
  })
  .openapi("FaimanModel", { description: "Faiman, Prog. Photovolt. 16 (2008) 307-315: t = ta + G/(U0 + U1 w)." });

const NoctSchema = z
  .strictObject({
    kind: z.literal("noct"),
    nominalOperatingCellTemperature: quantity("degC", "Cell temperature at 800 W/m2, 20 degC and 1 m/s.", {
      minimum: 25,
      maximum: 90,
    }),
  })
  .openapi("NoctModel", {
    description: "Nominal operating cell temperature: t = ta + (NOCT - 20)/800 G, in any wind.",
  });

const KingSchema = z
  .strictObject({
    kind: z.literal("king"),
    backing: z.enum(["glass", "polymer", "thin-film-steel"]).openapi({ description: "The back of the modules." }),
    place: z.enum(["open-rack", "close-roof", "insulated-back"]).openapi({
      description:
        "How they stand. Measured: glass on open-rack and close-roof, polymer on open-rack and insulated-back, thin-film-steel on open-rack.",
    }),
  })
  .openapi("KingModel", {
    description: "King et al. 2004, SAND2004-3535, eqs. 11 and 12, for one of its five mounts.",
  });

/** How the cell temperature follows from the ambient. */
export const CellTemperatureModelSchema = z
  .discriminatedUnion("kind", [FaimanSchema, NoctSchema, KingSchema])
  .openapi("CellTemperatureModel", { description: "How the cell temperature follows from irradiance, air and wind." });

const CellTemperatureSchema = z
  .strictObject({
    kind: z.literal("cell"),
    values: column("degC", "Cell temperature.", { minimum: -90, maximum: 150 }),
  })
  .openapi("CellTemperature", { description: "Cell temperature, measured or computed elsewhere." });

const AmbientTemperatureSchema = z
  .strictObject({
    kind: z.literal("ambient"),
    values: column("degC", "Temperature of the air.", { minimum: -90, maximum: 65 }),
    windSpeed: column("m/s", "Wind speed; left out, 1 m/s is taken and a caution says so.", {
      minimum: 0,
      maximum: 100,
    }).optional(),
    model: CellTemperatureModelSchema.optional(),
    thermalLag: quantity("s", "Time constant of the modules' heat, followed below a step of 600 s; 0: none.", {
      minimum: 0,
      maximum: 7200,
    }).default(0),
  })
  .openapi("AmbientTemperature", {
    description:
      "Temperature of the air, and how the cells follow it (`model`: faiman with its defaults when left out).",
  });

/** The temperature of a climate. */
export const TemperatureSchema = z
  .discriminatedUnion("kind", [CellTemperatureSchema, AmbientTemperatureSchema])
  .openapi("Temperature", { description: "The temperature of a climate." });

const InterpolateSchema = z
  .strictObject({
    interpolateUpTo: quantity("s", "Longest gap that is filled; longer ones are left out.", {
      minimum: 1,
      maximum: 86_400,
    }),
  })
  .openapi("InterpolateGaps", { description: "Short gaps are filled along a straight line." });

/** Equally spaced samples of irradiance and temperature. */
export const ClimateSchema = z
  .strictObject({
    start: z.string().regex(INSTANT).openapi({
      pattern: INSTANT.source,
      description: "Start of the first sample, ISO 8601 with offset from UTC; months follow this clock.",
      example: "2025-01-01T00:00:00+01:00",
    }),
    step: quantity("s", "Time from one sample to the next.", { minimum: 1, maximum: 86_400 }),
    timing: z
      .enum(["mean", "instant"])
      .default("mean")
      .openapi({ description: "A sample is the mean over its step, or the value at its start." }),
    gaps: z
      .union([z.enum(["refuse", "skip"]), InterpolateSchema])
      .default("refuse")
      .openapi({
        description:
          "What happens to missing samples (null): the request is refused, they are left out of every sum, or gaps up to a length are filled along a straight line.",
      }),
    irradiance: IrradianceSchema,
    temperature: TemperatureSchema,
  })
  .openapi("Climate", {
    description: "Equally spaced samples of irradiance and temperature; columns of equal length.",
  });
