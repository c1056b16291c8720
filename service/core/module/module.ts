import type { Circuit } from "../diode/circuit.ts";

/** A module as a function of its weather. */
export interface Module {
  /**
   * Writes the module's circuit at `irradiance` (W/m2) and `cellTemperature` (degC) into `circuit`.
   * Irradiance 0 or below is darkness: photocurrent 0. NaN in gives a dark circuit.
   */
  circuitAt(irradiance: number, cellTemperature: number, circuit: Circuit): void;
  /** The open-circuit voltage at standard test conditions that voltage steps and offsets are stated in, V. */
  readonly standardOpenCircuitVoltage: number;
}
