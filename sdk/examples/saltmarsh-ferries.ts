// Invented data for the examples: the cooperative Saltmarsh Ferries, its landing stages, module, rules and weather are
// made up, and no real place or product is meant.
//
//   npx tsx sdk/examples/saltmarsh-ferries.ts climates     writes a climate file for each landing stage to the folder climates

import { mkdir, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import type { Candidate, DatasheetModule } from "@kneegap/sdk";

/** An invented 60-cell module. */
export const MODULE: DatasheetModule = {
  kind: "datasheet",
  cellsInSeries: 60,
  shortCircuitCurrent: 9.91,
  openCircuitVoltage: 38.9,
  maximumPowerCurrent: 9.36,
  maximumPowerVoltage: 31.8,
  shortCircuitCurrentCoefficient: 0.05,
  openCircuitVoltageCoefficient: -0.29,
};

/** What the cooperative has, and what it could buy; prices in EUR, invented. */
export const CANDIDATES: Candidate[] = [
  { label: "holds a voltage", rule: { kind: "constant-voltage" }, price: 90 },
  { label: "holds a fraction", rule: { kind: "fractional-open-circuit-voltage" }, price: 110 },
  { label: "climbs", rule: { kind: "perturb-and-observe" }, price: 160 },
];

/** A landing stage. */
export interface LandingStage {
  readonly name: string;
  /** degrees north. */
  readonly latitude: number;
  /** Share of the light that clouds take over the year, 0 to 1. */
  readonly cloudiness: number;
  /** Mean of the year, degC. */
  readonly temperature: number;
}

/** From a fjord to a desert lake. */
export const STAGES: readonly LandingStage[] = [
  { name: "Fjordhead", latitude: 67.5, cloudiness: 0.62, temperature: 3 },
  { name: "Gannet Steps", latitude: 57.8, cloudiness: 0.55, temperature: 8 },
  { name: "Heron Bank", latitude: 53.1, cloudiness: 0.5, temperature: 10 },
  { name: "Withy Slip", latitude: 47.3, cloudiness: 0.42, temperature: 11 },
  { name: "Lower Lagoon", latitude: 43.9, cloudiness: 0.32, temperature: 14 },
  { name: "Canyon Foot", latitude: 31.5, cloudiness: 0.12, temperature: 20 },
  { name: "Desert Lake", latitude: 24.2, cloudiness: 0.06, temperature: 26 },
];

const HOURS = 8760;
const RADIAN = Math.PI / 180;

/** An invented hourly year at a landing stage as comma-separated values, with the headers that `readClimate` knows. */
export function climateFile({ latitude, cloudiness, temperature }: LandingStage): string {
  const rows = ["time,plane of array irradiance [W/m2],ambient temperature [degC],wind speed [m/s]"];
  for (let hour = 0; hour < HOURS; hour += 1) {
    const declination = -23.45 * RADIAN * Math.cos((2 * Math.PI * (hour / 24 + 10)) / 365);
    const angle = ((hour % 24) + 0.5 - 12) * 15 * RADIAN;
    const swing = Math.cos(latitude * RADIAN) * Math.cos(declination) * Math.cos(angle);
    const height = Math.max(0, Math.sin(latitude * RADIAN) * Math.sin(declination) + swing);
    // Two waves that never fall into step stand for the weather.
    const weather = 0.5 + 0.3 * Math.sin(hour / 37) + 0.2 * Math.sin(hour / 5.3);
    const irradiance = 1050 * height * Math.max(0, 1 - cloudiness * (0.5 + weather));
    const air = temperature - 8 * Math.cos((2 * Math.PI * (hour - 500)) / HOURS) + 5 * height;
    const time = new Date(Date.UTC(2025, 0, 1, hour)).toISOString().slice(0, 16);
    rows.push(`${time}Z,${irradiance.toFixed(1)},${air.toFixed(1)},${(2 + 3 * weather).toFixed(1)}`);
  }
  return `${rows.join("\n")}\n`;
}

/** Writes a climate file for each landing stage to `folder`. */
export async function writeClimates(folder: string): Promise<void> {
  await mkdir(folder, { recursive: true });
  for (const stage of STAGES) await writeFile(join(folder, `${stage.name}.csv`), climateFile(stage));
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const [folder = "climates"] = process.argv.slice(2);
  await writeClimates(folder);
  process.stdout.write(`wrote ${STAGES.length} climate files to ${folder}\n`);
}
