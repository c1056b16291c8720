/** The sky over the modules at one instant; written anew for each sample of a series, never shared. */
export interface Sky {
  /** Direct irradiance facing the sun, W/m2. */
  direct: number;
  /** Diffuse irradiance on the horizontal, W/m2. */
  diffuse: number;
  /** Irradiance outside the atmosphere facing the sun, W/m2. */
  extraterrestrial: number;
  /** Apparent zenith of the sun, radians, and its cosine (negative: below the horizon). */
  zenith: number;
  cosZenith: number;
  /** Relative air mass. */
  airMass: number;
  /** Cosine of the angle between sun and the plane's normal (negative: behind the plane). */
  cosIncidence: number;
}

/**
 * cos 85 deg: below 5 degrees of elevation whatever is divided by the sun's height is divided by this instead, the bound
 * of Perez et al., Solar Energy 44(5) (1990) 271-289, for their circumsolar ratio.
 */
export const LOWEST_COSINE = 0.08715574274765817;

/** A sky without light and with the sun overhead, to be filled. */
export function darkSky(): Sky {
  return { direct: 0, diffuse: 0, extraterrestrial: 0, zenith: 0, cosZenith: 1, airMass: 1, cosIncidence: 1 };
}
