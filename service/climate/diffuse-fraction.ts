/**
 * Diffuse share of the global horizontal irradiance at a clearness index `clearness` (global over extraterrestrial, both
 * on the horizontal).
 *
 * Erbs, Klein & Duffie, Solar Energy 28(4) (1982) 293-302, eq. 1 (hourly values; from memory, agrees with Duffie &
 * Beckman, 4th ed. 2013, eq. 2.10.1): 1 - 0.09 k up to 0.22, a quartic to 0.80, 0.165 above. 0 and negative give 1; NaN
 * goes through. It describes hours over years: a single minute may differ by tens of percent.
 */
export function diffuseFraction(clearness: number): number {
  const k = clearness;
  if (k <= 0) return 1;
  if (k <= 0.22) return 1 - 0.09 * k;
  if (k > 0.8) return 0.165;
  return 0.9511 + k * (-0.1604 + k * (4.388 + k * (-16.638 + k * 12.336)));
}
