/**
 * Rayleigh optical thickness of one air mass of the clean and dry atmosphere, as a whole, at `airMass` (absolute:
 * relative air mass times pressure over 1013.25 hPa).
 *
 * Kasten, Solar Energy 56(3) (1996) 239-244, eqs. 8 and 9 (from memory).
 */
function rayleighThickness(airMass: number): number {
  const m = airMass;
  if (m > 20) return 1 / (10.4 + 0.718 * m);
  return 1 / (6.6296 + m * (1.7513 + m * (-0.1202 + m * (0.0065 - 0.00013 * m))));
}

/**
 * The most the direct beam can carry, W/m2 facing the sun, through clean and dry air: `extraterrestrial` (W/m2) at a
 * Linke turbidity of 1, I = I0 exp(-0.8662 m delta(m)). Real air, with its dust and water, stays below.
 *
 * Kasten 1996, eq. 10 with the factor for air mass 2 turbidity (from memory). NaN goes through.
 */
export function cleanSkyDirect(extraterrestrial: number, airMass: number): number {
  return extraterrestrial * Math.exp(-0.8662 * airMass * rayleighThickness(airMass));
}
