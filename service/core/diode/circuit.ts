/**
 * The single-diode circuit of a whole module or array at one irradiance and temperature:
 *
 *     I = IL - I0 (exp((V + I Rs)/a) - 1) - (V + I Rs)/Rsh
 *
 * Every solver here works in the junction voltage x = V + I Rs, where I(x) and V(x) are explicit, and with ln I0, so
 * that exponents above 709 do not overflow. Photocurrent 0 is darkness: every current, voltage and power is then 0.
 */
export interface Circuit {
  /** IL, A. */
  photocurrent: number;
  /** ln(I0 / 1 A). */
  logSaturationCurrent: number;
  /** a = n Ns k T/q of all cells in series, V. */
  idealityVoltage: number;
  /** Rs, ohm. May be 0. */
  seriesResistance: number;
  /** 1/Rsh, siemens. 0 is an infinite shunt resistance. */
  shuntConductance: number;
  /** I0, A: the exponential of `logSaturationCurrent`, kept beside it because every current needs it. */
  saturationCurrent: number;
}

/** What a circuit is stated by. */
export type CircuitParameters = Omit<Circuit, "saturationCurrent">;

/** A circuit from its five parameters. */
export function circuitOf(parameters: CircuitParameters): Circuit {
  return { ...parameters, saturationCurrent: Math.exp(parameters.logSaturationCurrent) };
}

/**
 * A dark circuit to be written into. Its members begin as fractions: one that begins as a small integer is kept as a
 * reference by the engine, and every later write would allocate a number.
 */
export function emptyCircuit(): Circuit {
  const circuit = {
    photocurrent: 0.5,
    logSaturationCurrent: -20.5,
    idealityVoltage: 1.5,
    seriesResistance: 0.5,
    shuntConductance: 0.5,
    saturationCurrent: 1.25e-9,
  };
  circuit.photocurrent = 0;
  return circuit;
}
