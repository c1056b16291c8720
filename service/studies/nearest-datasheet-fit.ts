import type { Datasheet, Misfits } from "../core/module/datasheet.ts";
import { datasheetMisfits } from "../core/module/datasheet.ts";
import type { SingleDiodeParameters } from "../core/module/single-diode.ts";
import { searchLeastSquares } from "./least-squares.ts";

/** A circuit and how far it is from each of the datasheet's conditions. */
export interface DatasheetFit {
  parameters: SingleDiodeParameters;
  misfits: Misfits;
}

/** Iterations of one round; rounds go on while they still gain. */
const ITERATIONS = 12;
const ROUNDS = 10;
/** A misfit is counted as at most this much, so that a circuit far off cannot overflow the search. */
const WORST = 10;
/** Voc/a at which the search starts: from a soft to a sharp knee. */
const SHARPNESS = [12, 20, 28];
/** The faces of the feasible region a least-squares minimum can lie on: inside, no series resistance, no shunt, neither. */
const FACES = [
  { series: true, shunt: true },
  { series: false, shunt: true },
  { series: true, shunt: false },
  { series: false, shunt: false },
];

/**
 * The circuit with Rs >= 0 and Rsh > 0 whose five misfits have the least sum of squares, equally weighted.
 *
 * Where no circuit meets a datasheet exactly, the minimum usually lies on a bound: every face is searched from three
 * starts by the Levenberg-Marquardt method (Marquardt, J. SIAM 11 (1963) 431-441) and the best is taken.
 */
export function nearestDatasheetFit(of: Datasheet): DatasheetFit {
  let best: DatasheetFit | null = null;
  for (const face of FACES) {
    for (const sharpness of SHARPNESS) {
      const parameters = searchFace(of, face, sharpness);
      const misfits = datasheetMisfits(of, parameters);
      if (best === null || sumOfSquares(misfits) < sumOfSquares(best.misfits)) best = { parameters, misfits };
    }
  }
  return best!;
}

function sumOfSquares(misfits: Misfits): number {
  const sum = Object.values(misfits).reduce((total, value) => total + value * value, 0);
  return Number.isFinite(sum) ? sum : Number.POSITIVE_INFINITY;
}

function searchFace(of: Datasheet, face: (typeof FACES)[number], sharpness: number): SingleDiodeParameters {
  const { shortCircuitCurrent: isc, openCircuitVoltage: voc } = of;
  // Free parameters, each scaled to the order of 1: IL/Isc, the diode's exponent at Voc, a, then Rs and 1/Rsh if free.
  const initial = [1, 0, sharpness / 20];
  if (face.series) initial.push(0.02);
  if (face.shunt) initial.push(0.01);
  const unscale = (scaled: number[]): SingleDiodeParameters => {
    const rest = scaled.slice(3);
    const idealityVoltage = voc / (20 * scaled[2]);
    return {
      photocurrent: scaled[0] * isc,
      logSaturationCurrent: Math.log(isc) + scaled[1] - voc / idealityVoltage,
      idealityVoltage,
      seriesResistance: face.series ? (rest.shift()! * voc) / isc : 0,
      shuntConductance: face.shunt ? (rest.shift()! * isc) / voc : 0,
      photocurrentCoefficient: of.shortCircuitCurrentCoefficient,
      bandgap: of.bandgap,
      bandgapCoefficient: of.bandgapCoefficient,
    };
  };
  const residuals = (scaled: number[]): number[] =>
    Object.values(datasheetMisfits(of, unscale(scaled))).map((misfit) =>
      Number.isNaN(misfit) ? WORST : Math.min(WORST, Math.max(-WORST, misfit)),
    );
  let best = initial;
  let error = Number.POSITIVE_INFINITY;
  for (let round = 0; round < ROUNDS; round++) {
    const found = improve(residuals, best);
    if (found === null) break;
    const gain = error - found.parameterError;
    [best, error] = [found.parameterValues, found.parameterError];
    if (gain <= 1e-12 * error) break;
  }
  return unscale(best);
}

function improve(residuals: (scaled: number[]) => number[], from: number[]) {
  return searchLeastSquares(
    { x: [0, 1, 2, 3, 4], y: [0, 0, 0, 0, 0] },
    (scaled) => {
      const misfits = residuals(scaled);
      return (condition) => misfits[condition];
    },
    {
      initialValues: from,
      minValues: [0.5, -10, 0.1, 0, 0].slice(0, from.length),
      maxValues: [2, 10, 10, 1, 1].slice(0, from.length),
      damping: 1e-3,
      gradientDifference: 1e-6,
      centralDifference: true,
      maxIterations: ITERATIONS,
      errorTolerance: 1e-26,
    },
  );
}
