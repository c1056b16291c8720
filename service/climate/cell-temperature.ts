/** Back of the modules and where they stand: the five mounts measured by King et al. 2004. */
export type KingMount =
  | { backing: "glass"; place: "open-rack" | "close-roof" }
  | { backing: "polymer"; place: "open-rack" | "insulated-back" }
  | { backing: "thin-film-steel"; place: "open-rack" };

/** How the cell temperature follows from irradiance, ambient temperature and wind. */
export type CellTemperatureModel =
  /** `heatLoss` W/(m2 K), default 25, and `windHeatLoss` W s/(m3 K), default 6.84. */
  | { kind: "faiman"; heatLoss?: number; windHeatLoss?: number }
  /** Nominal operating cell temperature, degC: at 800 W/m2, 20 degC and 1 m/s. */
  | { kind: "noct"; nominalOperatingCellTemperature: number }
  | ({ kind: "king" } & KingMount);

/** Cell temperature, degC, from irradiance (W/m2), ambient temperature (degC) and wind speed (m/s). */
export type CellTemperature = (irradiance: number, ambient: number, wind: number) => number;

/** Heat losses of Faiman, Prog. Photovolt. 16 (2008) 307-315: U0 W/(m2 K), U1 W s/(m3 K). */
export const FAIMAN = { heatLoss: 25, windHeatLoss: 6.84 } as const;

/** a, b (s/m) and cell over module at 1000 W/m2 (K): King et al. 2004, SAND2004-3535, Table 1; dT from memory. */
const KING = {
  "glass open-rack": { a: -3.47, b: -0.0594, dT: 3 },
  "glass close-roof": { a: -2.98, b: -0.0471, dT: 1 },
  "polymer open-rack": { a: -3.56, b: -0.075, dT: 3 },
  "polymer insulated-back": { a: -2.81, b: -0.0455, dT: 0 },
  "thin-film-steel open-rack": { a: -3.58, b: -0.113, dT: 3 },
} as const;

/** t = ta + G/(U0 + U1 w): Faiman 2008 (his module temperature, taken for the cell's). Infinite where U0 + U1 w is 0. */
export function faimanTemperature(heatLoss: number, windHeatLoss: number): CellTemperature {
  return (irradiance, ambient, wind) => ambient + irradiance / (heatLoss + windHeatLoss * wind);
}

/** t = ta + (NOCT - 20)/800 G, whatever the wind: the conditions of IEC 61215 (from memory). */
export function noctTemperature(nominalOperatingCellTemperature: number): CellTemperature {
  const perIrradiance = (nominalOperatingCellTemperature - 20) / 800;
  return (irradiance, ambient) => ambient + perIrradiance * irradiance;
}

/** t = ta + G exp(a + b w) + G/1000 dT: King et al. 2004, SAND2004-3535, eqs. 11 and 12, for one of its five mounts. */
export function kingTemperature(mount: KingMount): CellTemperature {
  const { a, b, dT } = KING[`${mount.backing} ${mount.place}` as keyof typeof KING];
  return (irradiance, ambient, wind) => ambient + irradiance * (Math.exp(a + b * wind) + dT / 1000);
}

/** The function of a model; NaN arguments give NaN. */
export function cellTemperatureOf(model: CellTemperatureModel): CellTemperature {
  switch (model.kind) {
    case "faiman":
      return faimanTemperature(model.heatLoss ?? FAIMAN.heatLoss, model.windHeatLoss ?? FAIMAN.windHeatLoss);
    case "noct":
      return noctTemperature(model.nominalOperatingCellTemperature);
    case "king":
      return kingTemperature(model);
  }
}

/**
 * Cell temperatures, degC, sample by sample, from columns of equal length (W/m2, degC, m/s); `wind` may be one value
 * for all. NaN in any column gives NaN; empty columns give an empty one.
 */
export function cellTemperatures(
  model: CellTemperatureModel,
  irradiance: Float64Array,
  ambient: Float64Array,
  wind: Float64Array | number,
): Float64Array {
  const at = cellTemperatureOf(model);
  const out = new Float64Array(irradiance.length);
  for (let i = 0; i < out.length; i++)
    out[i] = at(irradiance[i], ambient[i], typeof wind === "number" ? wind : wind[i]);
  return out;
}
