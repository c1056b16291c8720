import { Decimal } from "decimal.js";
import type { ReferenceDiode } from "./diode-equation.ts";

const Digits = Decimal.clone({ precision: 40 });
type Digits = InstanceType<typeof Digits>;

/** The circuit in 40 digits; ln I0, so that no exponent is too large. */
export interface ExactDiode {
  photocurrent: Digits;
  logSaturation: Digits;
  idealityVoltage: Digits;
  seriesResistance: Digits;
  shuntConductance: Digits;
}

/** A circuit of doubles as 40 digits; ln I0 as given. */
export function exactDiode(of: Omit<ReferenceDiode, "saturationCurrent">, logSaturation: number): ExactDiode {
  return {
    photocurrent: new Digits(of.photocurrent),
    logSaturation: new Digits(logSaturation),
    idealityVoltage: new Digits(of.idealityVoltage),
    seriesResistance: new Digits(of.seriesResistance),
    shuntConductance: of.shuntResistance === Infinity ? new Digits(0) : new Digits(1).div(of.shuntResistance),
  };
}

/** Residual current, and the conductance of diode and shunt with its derivative, at a voltage and a current. */
function linearise(of: ExactDiode, voltage: Digits, current: Digits) {
  const junction = voltage.add(current.mul(of.seriesResistance));
  const exponential = of.logSaturation.add(junction.div(of.idealityVoltage)).exp();
  const diode = exponential.sub(of.logSaturation.exp());
  const conductance = exponential.div(of.idealityVoltage).add(of.shuntConductance);
  const bend = exponential.div(of.idealityVoltage).div(of.idealityVoltage);
  const residual = of.photocurrent.sub(diode).sub(junction.mul(of.shuntConductance)).sub(current);
  return { residual, conductance, bend };
}

/** Current at a voltage: Newton from a start that is right to a few digits. */
export function exactCurrent(of: ExactDiode, voltage: number, start: number): number {
  const at = new Digits(voltage);
  let current = new Digits(start);
  for (let step = 0; step < 60; step++) {
    const { residual, conductance } = linearise(of, at, current);
    const change = residual.div(conductance.mul(of.seriesResistance).add(1));
    current = current.add(change);
    if (change.abs().lt(current.abs().mul("1e-36"))) break;
  }
  return current.toNumber();
}

/** Voltage at a current: Newton from a start that is right to a few digits. */
export function exactVoltage(of: ExactDiode, current: number, start: number): number {
  const at = new Digits(current);
  let voltage = new Digits(start);
  for (let step = 0; step < 60; step++) {
    const { residual, conductance } = linearise(of, voltage, at);
    const change = residual.div(conductance);
    voltage = voltage.add(change);
    if (change.abs().lt(voltage.abs().mul("1e-36"))) break;
  }
  return voltage.toNumber();
}

/** The maximum power point: Newton on I - V g/(1 + Rs g) = 0 and the circuit's equation together. */
export function exactPeak(of: ExactDiode, start: { voltage: number; current: number }) {
  let voltage = new Digits(start.voltage);
  let current = new Digits(start.current);
  const rs = of.seriesResistance;
  for (let step = 0; step < 60; step++) {
    const { residual, conductance: g, bend } = linearise(of, voltage, current);
    const scale = rs.mul(g).add(1);
    const slope = g.div(scale);
    const slopeByJunction = bend.div(scale).div(scale);
    const balance = current.sub(voltage.mul(slope));
    // [dF/dV, dF/dI] and [dB/dV, dB/dI] of the residual F and the balance B.
    const [fv, fi] = [g.neg(), scale.neg()];
    const bv = slope.neg().sub(voltage.mul(slopeByJunction));
    const bi = new Digits(1).sub(voltage.mul(slopeByJunction).mul(rs));
    const determinant = fv.mul(bi).sub(fi.mul(bv));
    const dv = fi.mul(balance).sub(bi.mul(residual)).div(determinant);
    const di = bv.mul(residual).sub(fv.mul(balance)).div(determinant);
    voltage = voltage.add(dv);
    current = current.add(di);
    if (dv.abs().lt(voltage.abs().mul("1e-34"))) break;
  }
  return { voltage: voltage.toNumber(), current: current.toNumber(), power: voltage.mul(current).toNumber() };
}
