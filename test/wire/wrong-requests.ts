import type { OperationName } from "../../service/wire/operations.ts";
import type { Json } from "./requests.ts";
import { climateOf, estimateRequest } from "./requests.ts";

/** A request bent in one way, and what its problem must say. */
export interface WrongRequest {
  what: string;
  /** Members to set, by dotted path; undefined takes one out. */
  set: Record<string, Json>;
  code: string;
  says: RegExp;
  /** JSON pointer of the error; left out: that of the last member set. */
  at?: string;
}

/** Wrong requests that start from one sound request. */
export interface WrongGroup {
  operation: OperationName;
  of: string;
  sound: () => Json;
  wrongs: WrongRequest[];
}

/** A request bent in one way. */
export function wrong(what: string, set: Record<string, Json>, code: string, says: RegExp, at?: string): WrongRequest {
  return { what, set, code, says, ...(at === undefined ? {} : { at }) };
}

/** `request` with the members of a wrong one set. */
export function bent(request: Json, { set }: WrongRequest): Json {
  for (const [path, value] of Object.entries(set)) {
    const steps = path.split(".");
    const parent = steps.slice(0, -1).reduce((node, step) => node[step], request);
    Object.defineProperty(parent, steps.at(-1)!, { value, enumerable: true, configurable: true, writable: true });
  }
  return request;
}

/** Where the error of a wrong request must point. */
export function pointerOf({ set, at }: WrongRequest): string {
  return at ?? `/${Object.keys(set).at(-1)!.replaceAll(".", "/")}`;
}

const MODULE = "module.openCircuitVoltageCoefficient";
const CURRENT = "module.shortCircuitCurrentCoefficient";
const LIGHT = "climate.irradiance.values";
const WARMTH = "climate.temperature.values";
const { climate } = estimateRequest();
const week = climateOf(24 * 8);
const ONE_CELL = {
  kind: "single-diode",
  cellsInSeries: 60,
  photocurrent: 9,
  saturationCurrent: 1e-10,
  seriesResistance: 0.3,
  shuntResistance: null,
  idealityVoltage: 0.026,
};
const UNKNOWN_MOUNT = { kind: "king", backing: "polymer", place: "close-roof" };

/** Estimates that cannot be answered as they stand. */
export const WRONG_ESTIMATES: WrongRequest[] = [
  wrong(
    "a fraction per kelvin",
    { [MODULE]: -0.0029 },
    "out-of-range",
    /Did you mean -0\.29 %\/K\?.*fraction per kelvin/,
  ),
  wrong(
    "a voltage that rises",
    { [MODULE]: 0.29 },
    "out-of-range",
    /Did you mean -0\.29 %\/K\?.*falls as the cells warm/,
  ),
  wrong("mV/K", { [MODULE]: -113 }, "out-of-range", /Did you mean -0\.29 %\/K\?.*mV\/K/),
  wrong("V/K", { [MODULE]: -0.113 }, "unit-mistaken", /looks like V\/K.*-0\.29 %\/K/),
  wrong("A/K", { [CURRENT]: 0.005 }, "unit-mistaken", /looks like A\/K.*0\.0505 %\/K/),
  wrong("a fraction of the current", { [CURRENT]: 0.0005 }, "unit-mistaken", /fraction per kelvin.*0\.05 %\/K/),
  wrong("Vmp above Voc", { "module.maximumPowerVoltage": 40 }, "not-below-its-limit", /\(38\.9 V\).*swapped\?/),
  wrong("Imp above Isc", { "module.maximumPowerCurrent": 10 }, "not-below-its-limit", /\(9\.91 A\).*swapped\?/),
  wrong(
    "a datasheet of no circuit",
    { "module.maximumPowerVoltage": 38.8 },
    "inconsistent-datasheet",
    /sheet/,
    "/module",
  ),
  wrong("a misspelt member", { "module.cellsInSerie": 60 }, "unknown-member", /did you mean "cellsInSeries"\?/),
  wrong(
    "a misspelt setting",
    { "rule.setVoltagePerModul": 30 },
    "unknown-member",
    /did you mean "setVoltagePerModule"\?/,
  ),
  wrong("__proto__", { ["__proto__"]: {} }, "unknown-member", /no member "__proto__"/),
  wrong("a misspelt rule", { "rule.kind": "constant-votage" }, "not-one-of", /Did you mean "constant-voltage"\?/),
  wrong("no rule kind", { rule: {} }, "missing", /kind is required/, "/rule/kind"),
  wrong("no module", { module: undefined }, "missing", /module is required/),
  wrong("a number as string", { "module.openCircuitVoltage": "38.9" }, "wrong-type", /write 38\.9, without quotes/),
  wrong("a decimal comma", { "module.openCircuitVoltage": "38,9" }, "wrong-type", /write 38\.9/),
  wrong("null for a number", { "climate.step": null }, "wrong-type", /null will not do/),
  wrong("an empty series", { [LIGHT]: [] }, "too-few", /empty/),
  wrong("a column that is none", { [LIGHT]: 500 }, "wrong-type", /not a column/),
  wrong("unequal columns", { [WARMTH]: Array(23).fill(9) }, "unequal-columns", /23 values, irradiance has 24/),
  wrong("one bad sample", { [`${LIGHT}.17`]: 2000.5 }, "out-of-range", /2000\.5 is out of range \(-10 to 2000 W\/m2\)/),
  wrong("joules of an hour", { [`${LIGHT}.12`]: 3_240_000 }, "out-of-range", /divide by the step of 3600 s/),
  wrong("a string among samples", { [`${LIGHT}.3`]: "0" }, "wrong-type", /write 0, without quotes/),
  wrong(
    "kelvin",
    { [WARMTH]: Array(24).fill(290) },
    "out-of-range",
    /kelvin: subtract 273\.15.*23 more/,
    "/climate/temperature/values/0",
  ),
  wrong(
    "kW/m2",
    { climate: week, [LIGHT]: week.irradiance.values.map((g: number) => g / 1000) },
    "unit-mistaken",
    /by 1000/,
  ),
  wrong("only missing samples", { [WARMTH]: Array(24).fill(null) }, "all-missing", /Every sample/),
  wrong("a gap that is refused", { [`${LIGHT}.5`]: null }, "missing-samples", /skip/),
  wrong("a start without offset", { "climate.start": "2025-01-01T00:00:00" }, "wrong-format", /offset from UTC: add Z/),
  wrong("February 30", { "climate.start": "2025-02-30T00:00:00Z" }, "no-such-day", /no day of the calendar/),
  wrong("a step in hours", { "climate.step": 0.25 }, "out-of-range", /in seconds/),
  wrong("centuries", { climate: climateOf(40_000), "climate.step": 86_400 }, "too-long", /100 years/),
  wrong(
    "a percentage",
    { "rule.kind": "short-current-pulse", "rule.fraction": 92 },
    "out-of-range",
    /Did you mean 0\.92\?/,
  ),
  wrong(
    "an interruption without end",
    { "rule.kind": "short-current-pulse", "rule.samplePeriod": 1, "rule.sampleDuration": 1 },
    "interruption-not-shorter-than-period",
    /shorter than samplePeriod/,
  ),
  wrong("no battery voltage", { "rule.kind": "battery-coupled" }, "missing", /required/, "/rule/batteryVoltage"),
  wrong(
    "a battery column too short",
    { "rule.kind": "battery-coupled", "rule.batteryVoltage": [24, 25] },
    "unequal-columns",
    /one value a sample/,
  ),
  wrong(
    "a bad sample of the battery",
    { "rule.kind": "battery-coupled", "rule.batteryVoltage": [24, -1] },
    "out-of-range",
    /0 to 2000 V/,
    "/rule/batteryVoltage/1",
  ),
  wrong(
    "an empty window",
    { converter: { trackingMinimumVoltage: 60, trackingMaximumVoltage: 20 } },
    "empty-window",
    /swapped\?/,
    "/converter/trackingMaximumVoltage",
  ),
  wrong(
    "half a module",
    { array: { modulesInSeries: 1.5 } },
    "wrong-type",
    /not a whole number/,
    "/array/modulesInSeries",
  ),
  wrong("cells of the whole array", { "module.cellsInSeries": 600 }, "implausible-cell-count", /V a cell/),
  wrong(
    "a mount that was not measured",
    { "climate.temperature": { ...climate.temperature, kind: "ambient", model: UNKNOWN_MOUNT } },
    "mount-not-measured",
    /polymer module/,
    "/climate/temperature/model/place",
  ),
  wrong(
    "the ideality voltage of one cell",
    { module: ONE_CELL },
    "unit-mistaken",
    /one cell/,
    "/module/idealityVoltage",
  ),
];

const many = Array.from({ length: 25 }, (_, k) => ({ label: `${k}`, rule: { kind: "perfect" } }));

/** Comparisons that cannot be answered as they stand. */
export const WRONG_COMPARISONS: WrongRequest[] = [
  wrong("one candidate", { candidates: many.slice(0, 1) }, "too-few", /at least 2/),
  wrong("25 candidates", { candidates: many }, "too-many", /at most 24/),
  wrong("a label used twice", { "candidates.1.label": "hold" }, "label-taken", /candidate 0 too/),
  wrong("a baseline that is no label", { baseline: "hodl" }, "unknown-baseline", /Did you mean "hold"\?/),
  wrong("an empty label", { "candidates.0.label": "" }, "wrong-format", /label/),
  wrong(
    "a currency by name",
    { energyValue: { currency: "euro", perKilowattHour: 0.2 } },
    "wrong-format",
    /currency code/,
    "/energyValue/currency",
  ),
  wrong(
    "a window of one candidate",
    { "candidates.1.converter": { trackingMinimumVoltage: 5, trackingMaximumVoltage: 5 } },
    "empty-window",
    /above/,
    "/candidates/1/converter/trackingMaximumVoltage",
  ),
  wrong("a setting of one candidate", { "candidates.1.rule.stepFraction": 0 }, "out-of-range", /0\.0001 to 0\.1/),
];
