import type { Layout } from "../core/array/array.ts";
import { photovoltaicArray } from "../core/array/array.ts";
import { conditionIsc, conditionVoc, emptyCondition, enterCondition } from "../core/array/condition.ts";
import { currentsAt } from "../core/diode/current.ts";
import type { OperatingPoint } from "../core/diode/maximum-power.ts";
import type { RuleChoice } from "../core/rules/index.ts";
import { completeSettings, prepareRule } from "../core/rules/index.ts";
import type { Settings } from "../core/rules/rule.ts";
import { openLedger } from "../core/tracking/ledger.ts";
import { trackSteady } from "../core/tracking/steady.ts";
import type { ConverterChoice } from "./converter-choice.ts";
import { buildConverter } from "./converter-choice.ts";
import type { LostByCause } from "./energy.ts";
import { summarize } from "./energy.ts";
import type { BuiltModule, ModuleChoice } from "./module-choice.ts";
import { buildModule } from "./module-choice.ts";
import { checkRule } from "./rule-relations.ts";

/** One array in one weather, and the rules whose place on the curve is asked for. */
export interface CurveRequest {
  module: ModuleChoice;
  array: Layout;
  converter: ConverterChoice;
  /** W/m2, above 0. */
  irradiance: number;
  /** degC. */
  cellTemperature: number;
  rules: RuleChoice[];
  /** Points of the curve, from 0 V to open circuit. */
  points: number;
}

/** Where one rule stands at rest: means over its orbit and its interruptions, V, A, W. */
export interface RulePlace extends OperatingPoint {
  rule: { kind: RuleChoice["kind"]; settings: Settings };
  /** W. */
  lost: number;
  /** W. */
  lostByCause: LostByCause;
}

/** The curve at the converter's terminals. */
export interface CurveResult {
  built: BuiltModule;
  /** V, from 0 to the open-circuit voltage, shape [points]. */
  voltage: Float64Array;
  /** A. */
  current: Float64Array;
  /** W. */
  power: Float64Array;
  peaks: OperatingPoint[];
  shortCircuitCurrent: number;
  openCircuitVoltage: number;
  places: RulePlace[];
}

/** The I-V and P-V curve of an array, its peaks, and where each rule sits at rest. @throws StudyError */
export function curve(request: CurveRequest): CurveResult {
  const built = buildModule(request.module);
  const array = photovoltaicArray(built.module, request.array);
  const condition = emptyCondition();
  enterCondition(condition, array, request.irradiance, request.cellTemperature);
  const openCircuitVoltage = conditionVoc(condition);
  const voltage = Float64Array.from(
    { length: request.points },
    (_, k) => (openCircuitVoltage * k) / (request.points - 1),
  );
  const current = new Float64Array(request.points);
  currentsAt(condition.circuit, voltage, current);
  // Open circuit is where the current is 0 by definition: what is left there is rounding.
  current[request.points - 1] = 0;
  return {
    built,
    voltage,
    current,
    power: voltage.map((v, k) => v * current[k]),
    peaks: [{ ...condition.maximum }],
    shortCircuitCurrent: conditionIsc(condition),
    openCircuitVoltage,
    places: request.rules.map((rule, index) => placeOf(request, array, rule, index)),
  };
}

function placeOf(
  request: CurveRequest,
  array: ReturnType<typeof photovoltaicArray>,
  rule: RuleChoice,
  index: number,
): RulePlace {
  const ruleArray = { modulesInSeries: request.array.modulesInSeries, standard: array.standard };
  const settings = completeSettings(rule, ruleArray);
  checkRule(rule.kind, settings, null, `/rules/${index}`);
  const ledger = openLedger(1, 1, { operating: true, causes: false });
  const contender = {
    rule: prepareRule(rule.kind, settings, ruleArray),
    converter: buildConverter(request.converter, array.standard),
    ledger,
  };
  const weather = {
    irradiance: Float64Array.of(request.irradiance),
    cellTemperature: Float64Array.of(request.cellTemperature),
    skipped: null,
    spanOf: new Uint16Array(1),
  };
  trackSteady(array, weather, [contender], null);
  // One hour at rest: its Wh are the W of the place.
  const { energy, lostByCause } = summarize(ledger, [""], 3600, 0);
  const watts = Object.entries(lostByCause).map(([cause, kilowattHours]) => [cause, kilowattHours * 1000]);
  return {
    rule: { kind: rule.kind, settings },
    voltage: ledger.operating!.voltage[0],
    current: ledger.operating!.current[0],
    power: ledger.operating!.power[0],
    lost: energy.lost * 1000,
    lostByCause: Object.fromEntries(watts) as LostByCause,
  };
}
