import { Decimal } from "decimal.js";
import type { Circuit } from "../../../service/core/diode/circuit.ts";
import { circuitOf } from "../../../service/core/diode/circuit.ts";
import ideal from "../../fixtures/ideal-diode.json" with { type: "json" };
import lambert from "../../fixtures/lambert-w.json" with { type: "json" };
import normalised from "../../fixtures/normalised-ideal-diode.json" with { type: "json" };
import type { Check } from "../check.ts";
import { printed, relative } from "../check.ts";
import { POINT_NAMES, POINTS, pointsOf } from "./modules-from-papers.ts";

/** A diode without resistances of 1 A of light and a = 1 V. */
const normalisedDiode = (logSaturationCurrent: number): Circuit =>
  circuitOf({
    photocurrent: 1,
    logSaturationCurrent,
    idealityVoltage: 1,
    seriesResistance: 0,
    shuntConductance: 0,
  });

/** ln I0 of the normalised diode whose open-circuit voltage is `voc`: I0 = 1/(e^Voc - 1), without overflow. */
const logSaturationFor = (voc: number): number => -voc - Math.log1p(-Math.exp(-voc));

/** Vmp/a of the normalised diode in 40 digits: w - 1 with w + ln w = 1 + Voc, by Newton. */
function exactPeak(voc: number): { vmpOverVoc: number; impOverIsc: number; fillFactor: number } {
  const Digits = Decimal.clone({ precision: 40 });
  const sum = new Digits(voc).add(1);
  let w = sum.sub(sum.ln());
  for (let step = 0; step < 40; step++) w = w.sub(w.add(w.ln()).sub(sum).div(w.pow(-1).add(1)));
  const vmp = w.sub(1);
  // I = 1 + I0 - (1 + I0)/(1 + Vmp) at the peak, where the diode's share is (1 + I0)/(1 + Vmp).
  const i0 = new Digits(1).div(new Digits(voc).exp().sub(1));
  const imp = i0.add(1).mul(vmp).div(w);
  return {
    vmpOverVoc: vmp.div(voc).toNumber(),
    impOverIsc: imp.toNumber(),
    fillFactor: vmp.mul(imp).div(voc).toNumber(),
  };
}

const ratiosAt = (voc: number) => {
  const ours = pointsOf(normalisedDiode(logSaturationFor(voc)));
  return {
    vmpOverVoc: ours.maximumPowerVoltage / voc,
    impOverIsc: ours.maximumPowerCurrent / ours.shortCircuitCurrent,
    fillFactor: ours.maximumPower / (voc * ours.shortCircuitCurrent),
  };
};

const RATIOS = { vmpOverVoc: "Vmp/Voc", impOverIsc: "Imp/Isc", fillFactor: "fill factor" } as const;
const RATIO_KEYS = Object.keys(RATIOS) as (keyof typeof RATIOS)[];

const topic = "Ideal diode";

/** A diode without resistances, whose peak has a closed form. */
export const IDEAL_DIODE: Check[] = [
  {
    topic,
    title: "Peak and open circuit without resistances",
    source: ideal.source,
    figures: () =>
      ideal.rows.flatMap(({ photocurrent, saturationCurrent, idealityVoltage, ...points }) => {
        const logSaturationCurrent = Math.log(saturationCurrent);
        const ours = pointsOf(
          circuitOf({ photocurrent, logSaturationCurrent, idealityVoltage, seriesResistance: 0, shuntConductance: 0 }),
        );
        return POINTS.filter((key) => key !== "shortCircuitCurrent").map((key) =>
          relative(`${POINT_NAMES[key]}, ${photocurrent} A`, points[key], ours[key], 1e-12),
        );
      }),
  },
  {
    topic,
    title: "Normalised table, to its six digits",
    source: normalised.source,
    figures: () =>
      normalised.rows.flatMap((row) => {
        const ours = ratiosAt(row.voc);
        return RATIO_KEYS.map((key) => printed(`${RATIOS[key]} at Voc ${row.voc} a`, row[key], ours[key], 6));
      }),
  },
  {
    topic,
    title: "Normalised table, in full",
    source: "Vmp = a (W0(e (IL+I0)/I0) - 1), exact; evaluated independently with 40 digits by a decimal library",
    figures: () =>
      normalised.rows.flatMap(({ voc }) => {
        const [exact, ours] = [exactPeak(voc), ratiosAt(voc)];
        return RATIO_KEYS.map((key) => relative(`${RATIOS[key]} at Voc ${voc} a`, exact[key], ours[key], 1e-12));
      }),
  },
  {
    topic,
    title: "Vmp/a + 1 against tabulated Lambert W, exponents to 1e6",
    source: lambert.source,
    figures: () => {
      // W0's argument is e (IL+I0)/I0, that is e^(1 + Voc/a).
      const ofArguments = lambert.rows.map(({ argument, w }) => ({
        name: `W0(${argument})`,
        voc: Math.log(argument) - 1,
        w,
      }));
      const ofExponents = lambert.exponents.map(({ exponent, w }) => ({
        name: `W0(e^${exponent})`,
        voc: exponent - 1,
        w,
      }));
      return [...ofArguments, ...ofExponents].map(({ name, voc, w }) =>
        relative(name, w, pointsOf(normalisedDiode(logSaturationFor(voc))).maximumPowerVoltage + 1, 1e-12),
      );
    },
  },
];
