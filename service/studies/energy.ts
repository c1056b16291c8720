import type { Cause } from "../core/tracking/causes.ts";
import { CAUSES } from "../core/tracking/causes.ts";
import type { Ledger } from "../core/tracking/ledger.ts";
import { CLASS_COLUMNS, CLASS_WIDTH, SPAN_COLUMNS } from "../core/tracking/ledger.ts";

export type LostByCause = Record<Cause, number>;

/** Energies over the whole climate, kWh. */
export interface Energy {
  available: number;
  delivered: number;
  lost: number;
  clipped: number;
  /** lost / available; null when nothing was available. */
  lostFraction: number | null;
  /** delivered / available; null when nothing was available. */
  trackingEfficiency: number | null;
  /** kWh/m2 on the plane of array. */
  insolation: number;
}

/** One calendar month, kWh. */
export interface MonthEnergy {
  month: string;
  available: number;
  delivered: number;
  lost: number;
  lostByCause: LostByCause;
}

/** The samples of one irradiance class [from, to), W/m2. */
export interface IrradianceClass {
  from: number;
  to: number;
  hours: number;
  /** kWh. */
  available: number;
  /** kWh. */
  lost: number;
}

/** The energies of one rule over a climate. */
export interface EnergySummary {
  energy: Energy;
  lostByCause: LostByCause;
  months: MonthEnergy[];
  irradianceClasses: IrradianceClass[];
}

/** Turns the sums of a ledger into energies: W times samples become kWh at `step` seconds a sample. */
export function summarize(ledger: Ledger, months: readonly string[], step: number, insolation: number): EnergySummary {
  const toEnergy = step / 3.6e6;
  const rows = months.map((month, index) => monthEnergy(ledger, index, month, toEnergy));
  const lostByCause = zeroCauses();
  let [available, clipped] = [0, 0];
  for (const [index, row] of rows.entries()) {
    available += row.available;
    clipped += ledger.spans[index * SPAN_COLUMNS + 1] * toEnergy;
    for (const cause of CAUSES) lostByCause[cause] += row.lostByCause[cause];
  }
  const lost = total(lostByCause);
  const lostFraction = available > 0 ? lost / available : null;
  const delivered = available - lost;
  const trackingEfficiency = available > 0 ? delivered / available : null;
  return {
    energy: { available, delivered, lost, clipped, lostFraction, trackingEfficiency, insolation },
    lostByCause,
    months: rows,
    irradianceClasses: classesOf(ledger, step),
  };
}

function zeroCauses(): LostByCause {
  return { voltageWindow: 0, wrongPeak: 0, setPoint: 0, heldSample: 0, regulation: 0, interruption: 0 };
}

function total(lostByCause: LostByCause): number {
  return CAUSES.reduce((sum, cause) => sum + lostByCause[cause], 0);
}

function monthEnergy(ledger: Ledger, index: number, month: string, toEnergy: number): MonthEnergy {
  const row = ledger.spans.subarray(index * SPAN_COLUMNS, (index + 1) * SPAN_COLUMNS);
  const lostByCause = zeroCauses();
  for (const [k, cause] of CAUSES.entries()) lostByCause[cause] = row[2 + k] * toEnergy;
  const available = row[0] * toEnergy;
  const lost = total(lostByCause);
  return { month, available, delivered: available - lost, lost, lostByCause };
}

function classesOf(ledger: Ledger, step: number): IrradianceClass[] {
  const classes: IrradianceClass[] = [];
  for (let row = 0; row * CLASS_COLUMNS < ledger.classes.length; row++) {
    const [samples, available, lost] = ledger.classes.subarray(row * CLASS_COLUMNS, (row + 1) * CLASS_COLUMNS);
    if (samples === 0) continue;
    classes.push({
      from: row * CLASS_WIDTH,
      to: (row + 1) * CLASS_WIDTH,
      hours: (samples * step) / 3600,
      available: (available * step) / 3.6e6,
      lost: (lost * step) / 3.6e6,
    });
  }
  return classes;
}
