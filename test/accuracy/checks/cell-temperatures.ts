import type { KingMount } from "../../../service/climate/cell-temperature.ts";
import { cellTemperatureOf } from "../../../service/climate/cell-temperature.ts";
import facts from "../../fixtures/cell-temperatures.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute, printed } from "../check.ts";

const MOUNTS: Record<string, KingMount> = {
  "glass/cell/glass, open rack": { backing: "glass", place: "open-rack" },
  "glass/cell/glass, close roof": { backing: "glass", place: "close-roof" },
  "glass/cell/polymer, open rack": { backing: "polymer", place: "open-rack" },
  "glass/cell/polymer, insulated back": { backing: "polymer", place: "insulated-back" },
  "polymer/thin-film/steel, open rack": { backing: "thin-film-steel", place: "open-rack" },
};

const topic = "Cell temperature";

/** The three models of cell temperature, degC. */
export const CELL_TEMPERATURES: Check[] = [
  {
    topic,
    title: "King et al. 2004, degC, to the stated digits",
    source: "King, Boyson & Kratochvil 2004 (SAND2004-3535); cell over module temperature from memory",
    figures: () => {
      const { irradiance, ambient, wind } = facts.kingConditions;
      return facts.king.map(({ mount, cell }) =>
        printed(mount, cell, cellTemperatureOf({ kind: "king", ...MOUNTS[mount] })(irradiance, ambient, wind), 4),
      );
    },
  },
  {
    topic,
    title: "Faiman 2008, degC, to the stated digits",
    source: "Faiman, Prog. Photovolt. 16 (2008) 307-315, U0 25, U1 6.84",
    figures: () =>
      facts.faiman.map(({ irradiance, ambient, wind, module }) =>
        printed(
          `${irradiance} W/m2, ${ambient} degC, ${wind} m/s`,
          module,
          cellTemperatureOf({ kind: "faiman" })(irradiance, ambient, wind),
          6,
        ),
      ),
  },
  {
    topic,
    title: "Nominal operating cell temperature, degC",
    source: "IEC 61215 conditions; arithmetic",
    figures: () =>
      facts.noct.map(({ noct, irradiance, ambient, cell }) =>
        absolute(
          `NOCT ${noct}, ${irradiance} W/m2, ${ambient} degC`,
          cell,
          cellTemperatureOf({ kind: "noct", nominalOperatingCellTemperature: noct })(irradiance, ambient, 1),
          1e-9,
        ),
      ),
  },
];
