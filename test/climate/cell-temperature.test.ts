import { describe, expect, it } from "vitest";
import {
  cellTemperatureOf,
  cellTemperatures,
  FAIMAN,
  type KingMount,
  kingTemperature,
} from "../../service/climate/cell-temperature.ts";
import printed from "../fixtures/cell-temperatures.json" with { type: "json" };

const MOUNTS: Record<string, KingMount> = {
  "glass/cell/glass, open rack": { backing: "glass", place: "open-rack" },
  "glass/cell/glass, close roof": { backing: "glass", place: "close-roof" },
  "glass/cell/polymer, open rack": { backing: "polymer", place: "open-rack" },
  "glass/cell/polymer, insulated back": { backing: "polymer", place: "insulated-back" },
  "polymer/thin-film/steel, open rack": { backing: "thin-film-steel", place: "open-rack" },
};

describe("cell temperature (cell-temperatures.json)", () => {
  it.each(printed.king)("is King et al. 2004's for $mount: $cell degC", ({ mount, cell, module, dT }) => {
    const { irradiance, ambient, wind } = printed.kingConditions;
    const found = kingTemperature(MOUNTS[mount])(irradiance, ambient, wind);
    expect(cellTemperatureOf({ kind: "king", ...MOUNTS[mount] })(irradiance, ambient, wind)).toBe(found);
    expect(Math.abs(found - cell)).toBeLessThanOrEqual(0.00005);
    expect(found - (irradiance / 1000) * dT).toBeCloseTo(module, 3);
  });

  it.each(printed.faiman)(
    "is Faiman 2008's at $irradiance W/m2: $module degC",
    ({ irradiance, ambient, wind, module }) => {
      expect(Math.abs(cellTemperatureOf({ kind: "faiman" })(irradiance, ambient, wind) - module)).toBeLessThanOrEqual(
        5e-7,
      );
    },
  );

  it.each(printed.noct)("follows NOCT $noct: $cell degC", ({ noct, irradiance, ambient, cell }) => {
    const model = cellTemperatureOf({ kind: "noct", nominalOperatingCellTemperature: noct });
    expect(model(irradiance, ambient, 7)).toBeCloseTo(cell, 12);
  });

  it("takes Faiman's heat losses of 25 and 6.84 unless told otherwise", () => {
    expect(FAIMAN).toEqual({ heatLoss: 25, windHeatLoss: 6.84 });
    expect(cellTemperatureOf({ kind: "faiman", heatLoss: 20, windHeatLoss: 0 })(1000, 10, 5)).toBe(60);
  });

  it("works on columns, with a wind column or one wind for all, and passes NaN through", () => {
    const irradiance = Float64Array.of(1000, 0, Number.NaN);
    const ambient = Float64Array.of(35, 12, 10);
    const same = cellTemperatures({ kind: "faiman" }, irradiance, ambient, 0);
    expect([...same]).toEqual([75, 12, Number.NaN]);
    expect([...cellTemperatures({ kind: "faiman" }, irradiance, ambient, Float64Array.of(0, 3, 1))]).toEqual([...same]);
    expect(cellTemperatures({ kind: "faiman" }, new Float64Array(0), new Float64Array(0), 1)).toHaveLength(0);
  });
});
