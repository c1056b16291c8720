import { levenbergMarquardt } from "ml-levenberg-marquardt";

type Search = typeof levenbergMarquardt;

/** Parameters reached by a search and the sum of squares they leave. */
export interface Reached {
  parameterValues: number[];
  parameterError: number;
}

/**
 * One round of the Levenberg-Marquardt method (Marquardt, J. SIAM 11 (1963) 431-441). Null where the normal matrix
 * becomes singular: the data say nothing of some parameter. Any other failure is a defect and is thrown.
 */
export function searchLeastSquares(...[data, model, options]: Parameters<Search>): Reached | null {
  try {
    const { parameterValues, parameterError } = levenbergMarquardt(data, model, options);
    return { parameterValues, parameterError };
  } catch (error) {
    if (error instanceof Error && /singular/.test(error.message)) return null;
    throw error;
  }
}
