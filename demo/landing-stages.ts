/** An invented landing stage of the invented cooperative Saltmarsh Ferries. Nothing here is a real place. */
export interface LandingStage {
  name: string;
  /** What the roof feeds. */
  feeds: "pump" | "lamp" | "ticket gate";
  /** degrees north. */
  latitude: number;
  /** degrees from the horizontal, facing the equator. */
  tilt: number;
  /** Share of the sky that is usually clouded over, 0 to 1. */
  cloudiness: number;
  /** Yearly mean of the air temperature, degC. */
  meanTemperature: number;
  /** Half the difference between summer's and winter's mean, K. */
  seasonalSwing: number;
  /** Half the difference between day and night, K. */
  dailySwing: number;
  /** Mean wind speed, m/s. */
  wind: number;
  modulesInSeries: number;
  stringsInParallel: number;
}

/** All eleven, from a fjord to a desert lake. All figures are invented. */
export const LANDING_STAGES: readonly LandingStage[] = [
  stage("Fjordhead", "lamp", [67.5, 50, 0.72, 3, 9, 2.5, 4.5, 2, 1]),
  stage("Kelp Narrows", "ticket gate", [61.2, 45, 0.68, 6, 8, 3, 6, 2, 2]),
  stage("Gannet Steps", "lamp", [57.8, 42, 0.64, 8, 7, 3, 7, 1, 1]),
  stage("Heron Bank", "pump", [53.1, 38, 0.58, 10, 8, 4, 4, 3, 2]),
  stage("Saltmarsh Quay", "ticket gate", [50.4, 35, 0.55, 11, 8, 4, 4.5, 4, 2]),
  stage("Withy Slip", "lamp", [47.3, 32, 0.5, 11, 10, 5, 2.5, 1, 1]),
  stage("Lower Lagoon", "pump", [43.9, 30, 0.4, 14, 9, 5, 3, 3, 2]),
  stage("Cork Pier", "ticket gate", [39.6, 28, 0.3, 17, 8, 6, 3.5, 2, 2]),
  stage("Reservoir Wall", "pump", [36.1, 25, 0.25, 17, 10, 8, 2.5, 4, 2]),
  stage("Canyon Foot", "lamp", [31.5, 25, 0.15, 20, 10, 9, 2, 2, 1]),
  stage("Desert Lake", "pump", [24.2, 20, 0.08, 26, 9, 10, 3, 4, 3]),
];

function stage(name: string, feeds: LandingStage["feeds"], figures: readonly number[]): LandingStage {
  const [latitude, tilt, cloudiness, meanTemperature, seasonalSwing, dailySwing, wind, inSeries, inParallel] = figures;
  return {
    name,
    feeds,
    latitude,
    tilt,
    cloudiness,
    meanTemperature,
    seasonalSwing,
    dailySwing,
    wind,
    modulesInSeries: inSeries,
    stringsInParallel: inParallel,
  };
}
