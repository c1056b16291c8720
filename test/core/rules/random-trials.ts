import { singleDiodeModule } from "../../../service/core/module/single-diode.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import type { RuleKind } from "../../../service/core/rules/index.ts";
import type { RuleDefinition } from "../../../service/core/rules/rule.ts";
import type { Converter } from "../../../service/core/tracking/converter.ts";
import type { SeededRandom } from "../../oracle/seeded-random.ts";
import { VILLALVA_SOLVED } from "../module/paper-modules.ts";
import type { Trial, WeatherSample } from "../tracking/steady-run.ts";
import { OPEN_CONVERTER } from "../tracking/steady-run.ts";

/** The solved circuit of Villalva's module: 26.3 V, 7.61 A. */
export const MODULE = singleDiodeModule(VILLALVA_SOLVED);

/** Modules of about 26 V and 200 W. */
export const MODULES = [
  MODULE,
  testGeneratorModule({ technology: "crystalline-silicon", maximumPower: 200, maximumPowerVoltage: 26 }),
  testGeneratorModule({ technology: "thin-film", maximumPower: 200, maximumPowerVoltage: 26 }),
];

/** The settings that have no default; V of one module. */
const REQUIRED: Record<string, Record<string, number>> = { "battery-coupled": { batteryVoltage: 24.6 } };

/** A sensor that reads the truth. */
export const EXACT = { gain: 0, offset: 0, resolution: 0 };

/** A rule with nothing but what it requires. */
export function plainTrial(rule: RuleDefinition): Trial {
  return { kind: rule.kind as RuleKind, settings: REQUIRED[rule.kind] ?? {} };
}

/** A converter at random for one module of about 26 V, 7.6 A and 200 W. */
export function randomConverter(random: SeededRandom): Converter {
  const or = (probability: number, value: number, none: number): number => (random.chance(probability) ? value : none);
  return {
    ...OPEN_CONVERTER,
    trackingMinimumVoltage: or(0.5, random.between(15, 27), 0),
    trackingMaximumVoltage: or(0.5, random.between(27, 36), Number.POSITIVE_INFINITY),
    maximumPower: or(0.4, random.between(20, 220), Number.POSITIVE_INFINITY),
    maximumCurrent: or(0.4, random.between(0.5, 9), Number.POSITIVE_INFINITY),
    wakePower: or(0.3, random.between(0, 5), 0),
    rippleAmplitude: or(0.4, random.between(0, 0.1), 0),
    voltageSensor: random.chance(0.3)
      ? { gain: random.between(-0.02, 0.02), offset: random.between(-0.3, 0.3), resolution: or(0.5, 0.02, 0) }
      : EXACT,
    currentSensor: random.chance(0.3)
      ? { gain: random.between(-0.02, 0.02), offset: random.between(-0.05, 0.05), resolution: or(0.5, 0.01, 0) }
      : EXACT,
  };
}

/** Settings at random inside each parameter's usual range; those without one keep their default. */
export function randomSettings(rule: RuleDefinition, random: SeededRandom): Trial["settings"] {
  const settings: Record<string, number | boolean | string> = { ...REQUIRED[rule.kind] };
  for (const [name, parameter] of Object.entries(rule.parameters)) {
    if (parameter.type === "flag") settings[name] = random.chance(0.5);
    if (parameter.type === "choice") settings[name] = parameter.choices[random.whole(0, parameter.choices.length - 1)];
    if (parameter.type !== "number" || parameter.usual === undefined) continue;
    const [low, high] = parameter.usual;
    settings[name] = parameter.integer ? random.whole(low, high) : random.between(low, high);
  }
  return settings;
}

/** Irradiance (W/m2), log-uniform from 1e-3 to 2000, and cell temperature (degC) from -40 to 90. */
export function randomSample(random: SeededRandom): WeatherSample {
  return [random.logBetween(1e-3, 2000), random.between(-40, 90)];
}
