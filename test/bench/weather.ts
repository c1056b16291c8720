/** The peers' weather: a 24-sample day repeated, drawn from the same 31-bit generator, so that sums can be compared. */
export function peerWeather(samples: number): { irradiance: Float64Array; cellTemperature: Float64Array } {
  let seed = 12345;
  const draw = (): number => {
    seed = (Math.imul(seed, 1103515245) + 12345) & 0x7fffffff;
    return seed / 2147483647;
  };
  const irradiance = new Float64Array(samples);
  const cellTemperature = new Float64Array(samples);
  for (let i = 0; i < samples; i++) {
    const elevation = Math.sin((((i % 24) - 6) / 12) * Math.PI);
    irradiance[i] = elevation > 1e-6 ? elevation * (300 + 700 * draw()) : 0;
    cellTemperature[i] = 10 + 15 * draw() + 0.03 * irradiance[i];
  }
  return { irradiance, cellTemperature };
}
