/** The most the service ever does for one request. They stand in the document; the environment may only lower them. */
export const CEILINGS = {
  /** Bytes of a request body, decompressed. */
  bodyBytes: 64 * 1024 * 1024,
  /** Samples of a climate. */
  samples: 600_000,
  /** Candidates of a comparison. */
  candidates: 24,
  /** Control periods of all candidates together, or as much work in another form. */
  controlPeriods: 200_000_000,
  /** Seconds of computing. */
  computeSeconds: 50,
  /** Bytes of one line of a portfolio. */
  lineBytes: 16 * 1024 * 1024,
  /** Sites of a portfolio. */
  sites: 100_000,
  /** Named climates of a portfolio. */
  namedClimates: 64,
  /** Bytes of the lines that name them, together. */
  namedClimateBytes: 64 * 1024 * 1024,
} as const;

/** The limits in force. */
export type Limits = { [Name in keyof typeof CEILINGS]: number };

/** How deep objects and arrays of a body may nest. */
export const NESTING = 32;

/** How long a climate may last, in years of 365.25 days. */
export const CLIMATE_YEARS = 100;

/** Rows of a portfolio's totals, one a label and one a label in each group: what its memory grows with beside its sites. */
export const TOTALS_ROWS = 25_000;
