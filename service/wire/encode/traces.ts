import type { PointTrace } from "../../core/array/maximum-power-trace.ts";
import { CAUSES } from "../../core/tracking/causes.ts";
import { causeColumns } from "../../studies/estimate.ts";
import type { TrackingRun } from "../../studies/tracking-run.ts";
import type { ByteWriter } from "./byte-writer.ts";
import { writeColumn } from "./fixed-decimals.ts";

/** How the traces of an answer are shown. */
export interface TraceView {
  traces: "full" | "power" | "causes" | "none";
  decimals: number;
  /** The climate's start as it was sent. */
  start: string;
  /** s. */
  step: number;
}

interface Columns {
  [name: string]: Float64Array;
}

/** Writes the traces of a run of one candidate as JSON object, null where none were asked for. */
export function writeTraces(writer: ByteWriter, run: TrackingRun, view: TraceView): void {
  if (view.traces === "none") {
    writer.text("null");
    return;
  }
  writer.text(`{"start":${JSON.stringify(view.start)},"step":${view.step}`);
  for (const [name, columns, decimals] of groupsOf(run, view)) {
    writer.text(`,"${name}":{`);
    for (const [index, [member, column]] of Object.entries(columns).entries()) {
      writer.text(`${index > 0 ? "," : ""}"${member}":`);
      writeColumn(writer, column, decimals, run.climate.skipped);
    }
    writer.text("}");
  }
  writer.text("}");
}

function groupsOf(run: TrackingRun, view: TraceView): [string, Columns, number][] {
  const { ledger } = run.tracked[0];
  if (view.traces === "causes") {
    const columns = causeColumns(ledger.causes!, view.step);
    // kWh want three decimals more than W do.
    const decimals = Math.min(9, view.decimals + 3);
    return [["lostByCause", Object.fromEntries(CAUSES.map((cause, k) => [cause, columns[k]])), decimals]];
  }
  const shown = (trace: PointTrace): Columns => (view.traces === "full" ? { ...trace } : { power: trace.power });
  return [
    ["maximumPower", shown(run.maximum!), view.decimals],
    ["operating", shown(ledger.operating!), view.decimals],
  ];
}
