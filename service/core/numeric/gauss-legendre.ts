/** Nodes on [-1, 1] and weights of Gauss-Legendre quadrature (Abramowitz & Stegun 1964, table 25.4). */
export interface Quadrature {
  readonly nodes: readonly number[];
  /** Sum to 1: a mean, not an integral. */
  readonly weights: readonly number[];
}

function symmetric(positive: readonly number[], weights: readonly number[]): Quadrature {
  return {
    nodes: [...positive.map((x) => -x).reverse(), ...positive],
    weights: [...weights.map((w) => w / 2).reverse(), ...weights.map((w) => w / 2)],
  };
}

/** 8 points: exact for polynomials up to degree 15. */
export const GAUSS_8 = symmetric(
  [0.18343464249564978, 0.525532409916329, 0.7966664774136267, 0.9602898564975362],
  [0.36268378337836166, 0.3137066458778869, 0.22238103445337443, 0.10122853629037706],
);

/** 16 points: exact for polynomials up to degree 31. */
export const GAUSS_16 = symmetric(
  [
    0.09501250983763744, 0.2816035507792589, 0.45801677765722737, 0.6178762444026438, 0.755404408355003,
    0.8656312023878318, 0.9445750230732326, 0.9894009349916499,
  ],
  [
    0.18945061045506864, 0.18260341504492364, 0.16915651939500265, 0.1495959888165767, 0.12462897125553407,
    0.0951585116824926, 0.062253523938647456, 0.027152459411754176,
  ],
);
