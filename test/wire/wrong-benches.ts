import { curveRequest, efficiencyTestRequest, measuredFitRequest, moduleFitRequest } from "./requests.ts";
import type { WrongGroup } from "./wrong-requests.ts";
import { wrong } from "./wrong-requests.ts";

const POINTS = measuredFitRequest().module;
const flat = { voltage: [0, 0.05, 0.1, 0.15, 0.2], current: [0.76, 0.7599, 0.7598, 0.7597, 0.7596] };
const steep = { voltage: [0.4, 0.45, 0.5, 0.55, 0.57], current: [0.72, 0.66, 0.55, 0.2, 0.01] };
const TUNED_COLUMN = { kind: "battery-coupled", batteryVoltage: [24, 25] };

/** Wrong fits of modules, curves and efficiency tests. */
export const WRONG_BENCHES: WrongGroup[] = [
  {
    operation: "fitModule",
    of: "a datasheet",
    sound: moduleFitRequest,
    wrongs: [
      wrong("V/K", { "module.openCircuitVoltageCoefficient": -0.113 }, "unit-mistaken", /V\/K.*-0\.29 %\/K/),
      wrong("Vmp above Voc", { "module.maximumPowerVoltage": 40 }, "not-below-its-limit", /\(38\.9 V\).*swapped\?/),
      wrong("Imp above Isc", { "module.maximumPowerCurrent": 10 }, "not-below-its-limit", /\(9\.91 A\).*swapped\?/),
      wrong(
        "values of no circuit",
        { "module.maximumPowerVoltage": 38.8 },
        "inconsistent-datasheet",
        /misses by: shortCircuitCurrent -?\d+\.\d\d %, openCircuitVoltage .*Check openCircuitVoltage against the sheet/,
        "/module",
      ),
      wrong("currents in mA", { "module.shortCircuitCurrent": 9910 }, "out-of-range", /in mA, divide by 1000/),
      wrong("a circuit that is known", { "module.kind": "single-diode" }, "not-one-of", /not known here/),
      wrong("an array", { array: {} }, "unknown-member", /no member "array"/),
    ],
  },
  {
    operation: "fitModule",
    of: "a measured curve",
    sound: measuredFitRequest,
    wrongs: [
      wrong(
        "four points",
        { "module.voltage": [0, 0.2, 0.4, 0.5] },
        "too-few",
        /are 4 in voltage; at least 5 are needed/,
      ),
      wrong("no points", { "module.current": [] }, "too-few", /are none in current; at least 5/),
      wrong("unequal columns", { "module.current": POINTS.current.slice(1) }, "unequal-columns", /5 currents and 6/),
      wrong("a missing point", { "module.current.2": null }, "wrong-type", /leave this point out of every column/),
      wrong("a quoted point", { "module.current.2": "0,757" }, "wrong-type", /write 0\.757, without quotes/),
      wrong("currents in mA", { "module.current.0": 764 }, "out-of-range", /in mA, divide by 1000/),
      wrong(
        "currents of the wrong sign",
        { "module.current": POINTS.current.map((i: number) => -i) },
        "no-light-current",
        /Turn the sign/,
      ),
      wrong(
        "the flat part alone",
        { "module.current": flat.current, "module.voltage": flat.voltage },
        "curve-not-covered",
        /end before the knee.*100 %.*towards open circuit/,
      ),
      wrong(
        "the steep part alone",
        { "module.current": steep.current, "module.voltage": steep.voltage },
        "curve-not-covered",
        /begin beyond the flat part.*0\.4 V.*down to near short circuit/,
      ),
      wrong(
        "an outlier that hides the knee",
        { "module.voltage": [0, 0.2, 0.4, 0.5, 0.57], "module.current": [0.764, 0.76, 4, 0.72, 0.55] },
        "curve-not-fitted",
        /No circuit follows these points\. Look for outliers/,
        "/module",
      ),
      wrong(
        "voltage and current swapped",
        { "module.voltage": POINTS.current, "module.current": POINTS.voltage },
        "curve-not-fitted",
        /misses these points by 0\.0\d+ A root mean square, \d+\.\d % of the highest current.*swapped/,
        "/module",
      ),
      wrong("the cells of a string", { "module.cellsInSeries": 60 }, "implausible-cell-count", /0\.0095\d* V a cell/),
      wrong("kelvin", { "module.cellTemperature": 306 }, "out-of-range", /kelvin: subtract 273\.15/),
      wrong("kW/m2", { "module.irradiance": 0.85 }, "out-of-range", /in kW\/m2, write 850/),
    ],
  },
  {
    operation: "curve",
    of: "a curve",
    sound: curveRequest,
    wrongs: [
      wrong("kW/m2", { irradiance: 0.8 }, "out-of-range", /in kW\/m2, write 800/),
      wrong("darkness", { irradiance: 0 }, "out-of-range", /1 to 2000 W\/m2/),
      wrong("kelvin", { cellTemperature: 318 }, "out-of-range", /kelvin/),
      wrong("two points", { points: 2 }, "out-of-range", /3 to 2001/),
      wrong("half a point", { points: 9.5 }, "wrong-type", /not a whole number/),
      wrong(
        "a column",
        { "rules.1": TUNED_COLUMN },
        "column-without-climate",
        /as a single number/,
        "/rules/1/batteryVoltage",
      ),
      wrong("one rule in place of a list", { rules: { kind: "perfect" } }, "wrong-type", /is an object/),
      wrong("rule for rules", { rule: { kind: "perfect" } }, "unknown-member", /did you mean "rules"\?/),
      wrong("25 rules", { rules: Array(25).fill({ kind: "perfect" }) }, "too-many", /25 in rules; at most 24/),
      wrong(
        "no battery voltage",
        { rules: [{ kind: "battery-coupled" }] },
        "missing",
        /required/,
        "/rules/0/batteryVoltage",
      ),
      wrong(
        "a sample longer than its period",
        { "rules.1": { kind: "short-current-pulse", samplePeriod: 1, sampleDuration: 2 } },
        "interruption-not-shorter-than-period",
        /\(2 s\) must be shorter than samplePeriod \(1 s\)/,
        "/rules/1/sampleDuration",
      ),
      wrong(
        "a setting of another rule",
        { "rules.0": { kind: "constant-voltage", pilotCell: true } },
        "unknown-member",
        /belongs to kind fractional-open-circuit-voltage, short-current-pulse/,
        "/rules/0/pilotCell",
      ),
    ],
  },
  {
    operation: "testEfficiency",
    of: "an efficiency test",
    sound: efficiencyTestRequest,
    wrongs: [
      wrong(
        "a lag at rest",
        { temperatureLag: { rise: 30, timeConstant: 300 } },
        "lag-without-ramps",
        /leave temperatureLag out/,
      ),
      wrong("a slope at rest", { traceSlope: 5 }, "unknown-slope", /leave traceSlope out/),
      wrong("no such slope", { test: "dynamic-300-1000", traceSlope: 5 }, "unknown-slope", /slopes are 10, 14, 20/),
      wrong("no such test", { test: "dynamic-10-50" }, "not-one-of", /Did you mean "dynamic-100-500"\?/),
      wrong("no test", { test: undefined }, "missing", /test is required/),
      wrong("a lag by its time alone", { temperatureLag: 300 }, "wrong-type", /300 is a number/),
      wrong(
        "half a lag",
        { temperatureLag: { rise: 30 } },
        "missing",
        /timeConstant is required/,
        "/temperatureLag/timeConstant",
      ),
      wrong("a column", { rule: TUNED_COLUMN }, "column-without-climate", /no climate here/, "/rule/batteryVoltage"),
      wrong("kelvin", { cellTemperature: 298 }, "out-of-range", /kelvin/),
      wrong(
        "a misspelt technology",
        { "module.technology": "crystaline-silicon" },
        "not-one-of",
        /"crystalline-silicon"\?/,
      ),
      wrong(
        "a sweep longer than its period",
        { rule: { kind: "power-curve-scan", scanPeriod: 1 } },
        "interruption-not-shorter-than-period",
        /sweepDuration \(2 s\)/,
        "/rule/sweepDuration",
      ),
    ],
  },
];
