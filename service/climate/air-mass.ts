/**
 * Relative air mass from the cosine of the sun's airless zenith: 1 overhead, 31.7 at the horizon, where it stays for a sun
 * below.
 *
 * Young, Applied Optics 33(6) (1994) 1108-1110: a ratio of polynomials (from memory), within 0.004 air masses of his own
 * integration. NaN goes through.
 */
export function relativeAirMass(cosZenith: number): number {
  const c = Math.max(0, cosZenith);
  return (0.0096467 + c * (0.148386 + c * 1.002432)) / (0.000303978 + c * (0.0102963 + c * (0.149864 + c)));
}
