import { describe, expect, it } from "vitest";
import { CAUSES } from "../../service/core/tracking/causes.ts";
import { seededRandom } from "../oracle/seeded-random.ts";
import type { Json } from "./requests.ts";
import { answered, MODULE } from "./requests.ts";

const HOUR = 3_600_000;
const YEAR = 2023;
const START = Date.UTC(YEAR, 0, 1);

/** An invented year of hours at a landing stage: light and air of random days, the same in every run. */
function year(): { light: number[]; air: number[]; battery: number[] } {
  const random = seededRandom(17);
  const light: number[] = [];
  const air: number[] = [];
  const battery: number[] = [];
  let clear = 0;
  for (let k = 0; k < 8760; k++) {
    if (k % 24 === 0) clear = random.between(0.1, 1);
    const season = 1 - 0.4 * Math.cos((2 * Math.PI * k) / 8760);
    light.push(Math.max(0, 800 * clear * season * Math.sin((((k % 24) - 6) / 12) * Math.PI) + random.between(-20, 20)));
    air.push(8 * season + random.between(-5, 5));
    battery.push(random.between(24, 29));
  }
  return { light: light.map((g) => (g < 1 ? 0 : g)), air, battery };
}

const weather = year();

/** The hours [from, to) as the request of an estimate. */
function requestOf(rule: Json, from: number, to: number, kind: string): Json {
  const cut = (column: number[]) => column.slice(from, to);
  const light = cut(weather.light);
  const site = { latitude: 51, longitude: 0, tilt: 35, azimuth: 170 };
  const irradiance =
    kind === "horizontal"
      ? { kind, global: light, diffuse: light.map((g) => 0.5 * g), site }
      : { kind: "plane-of-array", values: light };
  return {
    module: MODULE,
    array: { modulesInSeries: 2, stringsInParallel: 3, wiringResistance: 0.2 },
    converter: { trackingMinimumVoltage: 50, wakePower: 5, maximumPower: 1200 },
    rule: Array.isArray(rule.batteryVoltage) ? { ...rule, batteryVoltage: cut(rule.batteryVoltage) } : rule,
    climate: {
      start: new Date(START + from * HOUR).toISOString(),
      step: 3600,
      irradiance,
      temperature: { kind: "ambient", values: cut(weather.air) },
    },
    mode: "steady",
    traces: "none",
  };
}

const estimated = (request: Json) => answered("estimate", request).answer;
const MONTHS = Array.from({ length: 12 }, (_, m) => [Date.UTC(YEAR, m, 1), Date.UTC(YEAR, m + 1, 1)]).map((pair) =>
  pair.map((instant) => (instant - START) / HOUR),
);

const RULES: Json[] = [
  { kind: "constant-voltage", setVoltagePerModule: 29 },
  { kind: "temperature-compensated-voltage" },
  { kind: "fractional-open-circuit-voltage" },
  { kind: "short-current-pulse" },
  { kind: "battery-coupled", batteryVoltage: weather.battery.map((v) => 2 * v) },
  { kind: "perturb-and-observe" },
  { kind: "power-curve-scan" },
];

describe.each(["plane-of-array", "horizontal"])("an hourly year of %s", (kind) => {
  it.each(RULES)("by $kind is the sum of its months, each estimated alone, within 1e-9", (rule) => {
    const whole = estimated(requestOf(rule, 0, 8760, kind));
    expect(whole.months).toHaveLength(12);
    const parts = MONTHS.map(([from, to]) => estimated(requestOf(rule, from, to, kind)));
    const scale = whole.energy.available;
    expect(scale).toBeGreaterThan(100);
    for (const name of ["available", "delivered", "lost", "clipped", "insolation"]) {
      const sum = parts.reduce((all, { energy }) => all + energy[name], 0);
      expect(Math.abs(sum - whole.energy[name]), name).toBeLessThan(1e-9 * scale);
    }
    for (const cause of CAUSES) {
      const sum = parts.reduce((all, { lostByCause }) => all + lostByCause[cause], 0);
      expect(Math.abs(sum - whole.lostByCause[cause]), cause).toBeLessThan(1e-9 * scale);
    }
    for (const [index, { months }] of parts.entries()) {
      expect(months).toHaveLength(1);
      expect(months[0].month).toBe(whole.months[index].month);
      expect(Math.abs(months[0].delivered - whole.months[index].delivered)).toBeLessThan(1e-9 * scale);
    }
    const hours = (classes: Json[]) => classes.reduce((all, one) => all + one.hours, 0);
    expect(hours(whole.irradianceClasses)).toBe(8760);
  });
});
