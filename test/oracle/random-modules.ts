import type { SeededRandom } from "./seeded-random.ts";
import type { ReferenceModule } from "./weather-circuit.ts";
import { thermalVoltage } from "./weather-circuit.ts";

/**
 * A module at random: 1 to 144 cells of .45 to .78 V open-circuit voltage at 1000 W/m2 and 25 degC, ideality .8 to 2,
 * .05 to 20 A, a fifth without series resistance, a fifth without a shunt.
 */
export function randomModule(random: SeededRandom): ReferenceModule {
  const cellsInSeries = random.whole(1, 144);
  const ideality = random.between(0.8, 2);
  const photocurrent = random.logBetween(0.05, 20);
  const openCircuit = cellsInSeries * random.between(0.45, 0.78);
  const resistance = openCircuit / photocurrent;
  return {
    photocurrent,
    saturationCurrent: photocurrent / Math.expm1(openCircuit / thermalVoltage(ideality, cellsInSeries, 25)),
    seriesResistance: random.chance(0.2) ? 0 : resistance * random.logBetween(1e-4, 0.3),
    shuntResistance: random.chance(0.2) ? Number.POSITIVE_INFINITY : resistance * random.logBetween(2, 5000),
    ideality,
    cellsInSeries,
    photocurrentCoefficient: photocurrent * random.between(-0.0005, 0.0015),
  };
}

/** Irradiance (W/m2), log-uniform from 1e-3 to 1500, and cell temperature (degC) from -40 to 90. */
export function randomWeather(random: SeededRandom): [irradiance: number, cellTemperature: number] {
  return [random.logBetween(1e-3, 1500), random.between(-40, 90)];
}
