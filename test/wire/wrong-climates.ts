import { estimateRequest, horizontalClimate } from "./requests.ts";
import type { WrongGroup } from "./wrong-requests.ts";
import { wrong } from "./wrong-requests.ts";

const LIGHT = "climate.irradiance";
const PLACE = "climate.irradiance.site";
const withHole = [...Array(11).fill(26), null, ...Array(12).fill(26)];
const horizontal = () => ({ ...estimateRequest(), climate: horizontalClimate(24) });

/** Estimates over climates that cannot be used: horizontal components, gaps, lags, columns of a rule. */
export const WRONG_CLIMATES: WrongGroup[] = [
  {
    operation: "estimate",
    of: "a climate in horizontal components",
    sound: horizontal,
    wrongs: [
      wrong(
        "none of them",
        { [`${LIGHT}.diffuse`]: undefined, [`${LIGHT}.global`]: undefined },
        "components-missing",
        /give global/,
        "/climate/irradiance",
      ),
      wrong(
        "diffuse alone",
        { [`${LIGHT}.global`]: undefined },
        "components-missing",
        /give global, or both/,
        "/climate/irradiance",
      ),
      wrong("no site", { [PLACE]: undefined }, "missing", /site is required/),
      wrong("values of a plane", { [`${LIGHT}.values`]: [1] }, "unknown-member", /belongs to kind plane-of-array/),
      wrong("an azimuth from south", { [`${PLACE}.azimuth`]: -90 }, "out-of-range", /clockwise from north: east is 90/),
      wrong(
        "coordinates swapped",
        { [`${PLACE}.longitude`]: 1.3, [`${PLACE}.latitude`]: 104 },
        "out-of-range",
        /swapped\?/,
      ),
      wrong("an albedo in percent", { [`${PLACE}.albedo`]: 20 }, "out-of-range", /Did you mean 0\.2\?/),
      wrong("an unknown sky", { [`${LIGHT}.skyModel`]: "haydavies" }, "not-one-of", /Did you mean "hay-davies"\?/),
      wrong("unequal columns", { [`${LIGHT}.diffuse`]: [1, 2] }, "unequal-columns", /2 values, global has 24/),
      wrong("a missing sample", { [`${LIGHT}.global.3`]: null }, "missing-samples", /global has no value at sample 3/),
      wrong("too short a wind", { "climate.temperature.windSpeed": [1] }, "unequal-columns", /global has 24/),
      wrong("a lag too long", { "climate.temperature.thermalLag": 10_000 }, "out-of-range", /0 to 7200 s/),
      wrong("gaps that no one knows", { "climate.gaps": "interpolate" }, "not-one-of", /not known here/),
      wrong(
        "gaps of no length",
        { "climate.gaps": { interpolateUpTo: 0 } },
        "out-of-range",
        /1 to 86400 s/,
        "/climate/gaps/interpolateUpTo",
      ),
      wrong(
        "gaps misspelt",
        { "climate.gaps": { interpolateUpto: 60 } },
        "unknown-member",
        /mean "interpolateUpTo"\?/,
        "/climate/gaps/interpolateUpto",
      ),
      wrong(
        "gaps in quotes",
        { "climate.gaps": { interpolateUpTo: "3600" } },
        "wrong-type",
        /write 3600/,
        "/climate/gaps/interpolateUpTo",
      ),
      wrong("a step backwards", { "climate.step": -60 }, "out-of-range", /in seconds/),
    ],
  },
  {
    operation: "estimate",
    of: "an estimate",
    sound: estimateRequest,
    wrongs: [
      wrong(
        "a lag of given cells",
        { "climate.temperature.thermalLag": 300 },
        "unknown-member",
        /belongs to kind ambient/,
      ),
      wrong(
        "a hole in the battery's column",
        { rule: { kind: "battery-coupled", batteryVoltage: withHole } },
        "missing-samples",
        /no value at sample 11, which counts: fill it, or leave the sample out/,
        "/rule/batteryVoltage/11",
      ),
    ],
  },
];
