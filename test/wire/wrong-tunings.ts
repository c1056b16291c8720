import { climateOf, MODULE, sitesRequest, tuningRequest } from "./requests.ts";
import type { WrongGroup } from "./wrong-requests.ts";
import { wrong } from "./wrong-requests.ts";

const TUNED_COLUMN = { kind: "battery-coupled", batteryVoltage: [24, 25] };

/** Wrong tunings of one site and of several. */
export const WRONG_TUNINGS: WrongGroup[] = [
  {
    operation: "tune",
    of: "a tuning",
    sound: tuningRequest,
    wrongs: [
      wrong("an unknown setting", { parameter: "fracton" }, "not-tunable", /name one of: fraction, samplePeriod/),
      wrong("a flag", { parameter: "pilotCell" }, "not-tunable", /pilotCell of fractional.* cannot be tuned/),
      wrong("an inherited name", { parameter: "constructor" }, "not-tunable", /cannot be tuned/),
      wrong("an empty name", { parameter: "" }, "wrong-format", /GET \/v1\/rules/),
      wrong(
        "a rule without settings",
        { rule: { kind: "perfect" }, parameter: "fraction" },
        "not-tunable",
        /choose another/,
      ),
      wrong(
        "a count",
        { rule: { kind: "power-curve-scan" }, parameter: "points" },
        "not-tunable",
        /scanPeriod, sweepDuration, controlPeriod/,
      ),
      wrong("percentages", { range: { from: 70, to: 90 } }, "range-outside-setting", /Did you mean 0\.7 to 0\.9\?/),
      wrong("a range that falls", { range: { from: 0.9, to: 0.7 } }, "range-not-rising", /swapped\?/),
      wrong("a range from nothing", { range: { from: 0, to: 0.9 } }, "range-outside-setting", /above 0 to 1/),
      wrong("a range as a list", { range: [0.7, 0.9] }, "wrong-type", /is an array/),
      wrong("half a range", { range: { from: 0.7 } }, "missing", /to is required/, "/range/to"),
      wrong(
        "periods shorter than the sample",
        { parameter: "samplePeriod", range: { from: 0.1, to: 30 } },
        "range-outside-setting",
        /sampleDuration must stay shorter than samplePeriod/,
      ),
      wrong("few points", { points: 20 }, "out-of-range", /41 to 201/),
      wrong("no module", { module: undefined }, "missing", /no module: give one here/),
      wrong(
        "a battery column too short",
        { parameter: "pathDrop", rule: TUNED_COLUMN },
        "unequal-columns",
        /2 values/,
        "/rule/batteryVoltage",
      ),
    ],
  },
  {
    operation: "tune",
    of: "a tuning of sites",
    sound: sitesRequest,
    wrongs: [
      wrong(
        "no climate at one",
        { "sites.1.climate": undefined },
        "missing",
        /no climate: give one here, or one for all/,
      ),
      wrong("an id used twice", { "sites.1.id": "Heron Bank" }, "id-taken", /id of site 0 too/),
      wrong("an empty id", { "sites.1.id": "" }, "wrong-format", /will not do as id/),
      wrong("no sites", { sites: [] }, "too-few", /none in sites; at least 1 is needed/),
      wrong(
        "unequal columns at one",
        { "sites.1.climate.temperature.values": [1] },
        "unequal-columns",
        /1 value, irradiance has 24/,
      ),
      wrong("a gap at one", { "sites.1.climate.temperature.values.3": null }, "missing-samples", /sample 3: fill it/),
      wrong(
        "a datasheet of no circuit at one",
        { "sites.1.module": { ...MODULE, maximumPowerVoltage: 38.8 } },
        "inconsistent-datasheet",
        /Check openCircuitVoltage/,
      ),
      wrong(
        "an empty window at one",
        { "sites.1.converter": { trackingMinimumVoltage: 60, trackingMaximumVoltage: 20 } },
        "empty-window",
        /swapped\?/,
        "/sites/1/converter/trackingMaximumVoltage",
      ),
      wrong(
        "a column that one site's climate does not have",
        {
          "sites.1.climate": climateOf(25),
          parameter: "pathDrop",
          rule: { kind: "battery-coupled", batteryVoltage: Array(24).fill(26) },
        },
        "unequal-columns",
        /At site "Mud Flats": .*24 values, the climate has 25 samples/,
        "/rule/batteryVoltage",
      ),
    ],
  },
];
