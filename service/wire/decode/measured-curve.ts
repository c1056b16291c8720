import type { z } from "@hono/zod-openapi";
import type { Flaw } from "../problem.ts";
import type { MeasuredCurveSchema } from "../schema/module-fit.ts";

type RawCurve = z.output<typeof MeasuredCurveSchema>;

/** What the points of a measured curve must reach for a circuit to follow from them: common practice, no source. */
const LEAST_SPREAD = 0.5;

/** What is wrong between the columns of a measured curve. */
export function checkMeasuredCurve({ voltage, current, cellsInSeries }: RawCurve): Flaw[] {
  if (current.length !== voltage.length) {
    const detail = `There are ${current.length} currents and ${voltage.length} voltages; give one of each a point.`;
    return [
      {
        pointer: "/module/current",
        code: "unequal-columns",
        detail,
        expected: `${voltage.length} values, as in voltage`,
      },
    ];
  }
  const highest = Math.max(...current);
  if (highest <= 0) {
    const detail =
      "No current is positive; it counts as positive while the module delivers. Turn the sign of the column, or send the curve of a lit module.";
    return [{ pointer: "/module/current", code: "no-light-current", detail, expected: "positive at short circuit" }];
  }
  return [...checkCoverage(voltage, current), ...checkVoltagePerCell(Math.max(...voltage), cellsInSeries)];
}

/** Points on one side of the knee alone leave the other side of the circuit undetermined. */
function checkCoverage(voltage: readonly number[], current: readonly number[]): Flaw[] {
  const flaws: Flaw[] = [];
  const pointer = "/module/voltage";
  const code = "curve-not-covered";
  const expected = "points from near short circuit to near open circuit";
  const left = Math.min(...current) / Math.max(...current);
  if (left > LEAST_SPREAD) {
    const detail = `The points end before the knee: the lowest current is still ${Math.round(100 * left)} % of the highest. Measure on towards open circuit.`;
    flaws.push({ pointer, code, detail, expected });
  }
  const [low, high] = [Math.min(...voltage), Math.max(...voltage)];
  if (low > LEAST_SPREAD * high) {
    const detail = `The points begin beyond the flat part: the lowest voltage is ${low} V, the highest ${high} V. Measure down to near short circuit.`;
    flaws.push({ pointer, code, detail, expected });
  }
  return flaws;
}

/** Between a dim cell near its knee and a wide-gap one at open circuit, V: common practice, no source. */
function checkVoltagePerCell(highest: number, cells: number): Flaw[] {
  const perCell = highest / cells;
  if (perCell >= 0.15 && perCell <= 3) return [];
  return [
    {
      pointer: "/module/cellsInSeries",
      code: "implausible-cell-count",
      detail: `The highest voltage, ${highest} V, over ${cells} cells in series is ${perCell.toPrecision(3)} V a cell; count the cells in series of the module measured, and see whether voltage and current were swapped.`,
      expected: "0.15 to 3 V a cell",
    },
  ];
}
