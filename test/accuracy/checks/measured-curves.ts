import type { Circuit } from "../../../service/core/diode/circuit.ts";
import { circuitOf } from "../../../service/core/diode/circuit.ts";
import { currentAt } from "../../../service/core/diode/current.ts";
import type { MeasuredCurve } from "../../../service/studies/measured-curve-fit.ts";
import { measuredCurveFit, rootMeanSquareError } from "../../../service/studies/measured-curve-fit.ts";
import measured from "../../fixtures/measured-curves.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute, relative } from "../check.ts";
import { POINT_NAMES, POINTS, pointsOf } from "./modules-from-papers.ts";

type Row = (typeof measured.rows)[number];

/** k/q of CODATA 1998, with which the literature built these sets, V/K. */
const OLD_THERMAL = 1.3806503e-23 / 1.60217646e-19;

/** The published circuit of a measured curve. */
function publishedCircuit({ published, cellsInSeries, temperature }: Row): Circuit {
  const cells = published.idealityTimesCells ?? published.ideality! * cellsInSeries;
  return circuitOf({
    photocurrent: published.photocurrent,
    logSaturationCurrent: Math.log(published.saturationCurrent),
    idealityVoltage: cells * OLD_THERMAL * (temperature + 273.15),
    seriesResistance: published.seriesResistance,
    shuntConductance: 1 / published.shuntResistance,
  });
}

function curveOf({ points }: Row): MeasuredCurve {
  return {
    voltage: Float64Array.from(points, (point) => point.voltage),
    current: Float64Array.from(points, (point) => point.measuredCurrent),
  };
}

/** The residual of the equation with the measured currents on both sides, root mean square, A. */
function implicitError(row: Row): number {
  const { photocurrent, saturationCurrent, idealityVoltage, seriesResistance, shuntConductance } =
    publishedCircuit(row);
  const sum = row.points.reduce((total, { voltage, measuredCurrent }) => {
    const junction = voltage + measuredCurrent * seriesResistance;
    const diode = saturationCurrent * Math.expm1(junction / idealityVoltage);
    return total + (photocurrent - diode - junction * shuntConductance - measuredCurrent) ** 2;
  }, 0);
  return Math.sqrt(sum / row.points.length);
}

const topic = "Measured curves";
const { rows, source } = measured;
const PEAK_PLACE = ["maximumPowerVoltage", "maximumPowerCurrent"];

/** The two measured curves of Easwarakhanthan et al. 1986: model, key points, misfits, fits. */
export const MEASURED_CURVES: Check[] = [
  {
    topic,
    title: "Model currents at the published parameters",
    source: `${source} Currents computed independently to 15 digits.`,
    figures: () =>
      rows.flatMap((row) => {
        const circuit = publishedCircuit(row);
        return row.points.map(({ voltage, modelCurrent }) =>
          absolute(`${row.name}, ${voltage} V`, modelCurrent, currentAt(circuit, voltage), 1e-10),
        );
      }),
  },
  {
    topic,
    title: "Isc, Voc and Pmp at the published parameters",
    source: `${source} Points computed independently to 15 digits.`,
    figures: () => keyPoints((key) => !PEAK_PLACE.includes(key), 1e-12),
  },
  {
    topic,
    title: "Vmp and Imp at the published parameters",
    source: `${source} Points computed independently to 15 digits.`,
    figures: () => keyPoints((key) => PEAK_PLACE.includes(key), 1e-8),
  },
  {
    topic,
    title: "Root mean square of the exact current error, A",
    source,
    figures: () =>
      rows.map((row) =>
        absolute(row.name, row.rmseExact, rootMeanSquareError(curveOf(row), publishedCircuit(row)), 1e-8),
      ),
  },
  {
    topic,
    title: "Root mean square with the measured current on both sides, A",
    source,
    figures: () => rows.map((row) => absolute(row.name, row.rmseImplicit, implicitError(row), 1e-8)),
  },
  {
    topic,
    title: "Fits reach the best known root mean square error, A",
    source: `${source} Best known values by independent search.`,
    figures: () =>
      rows.map((row) =>
        relative(row.name, row.rmseExactBestKnown, measuredCurveFit(curveOf(row))!.rootMeanSquareError, 1e-7),
      ),
  },
];

function keyPoints(isWanted: (key: string) => boolean, tolerance: number) {
  return rows.flatMap((row) => {
    const ours = pointsOf(publishedCircuit(row));
    return POINTS.filter(isWanted).map((key) =>
      relative(`${row.name}, ${POINT_NAMES[key]}`, row.keyPoints[key], ours[key], tolerance),
    );
  });
}
