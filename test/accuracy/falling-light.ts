import { photovoltaicArray } from "../../service/core/array/array.ts";
import { emptyCondition, enterCondition } from "../../service/core/array/condition.ts";
import { completeSettings, prepareRule } from "../../service/core/rules/index.ts";
import type { ClimbingRule } from "../../service/core/rules/rule.ts";
import { climbOn, firstSight } from "../../service/core/tracking/climber.ts";
import { Terminals } from "../../service/core/tracking/terminals.ts";
import { buildModule } from "../../service/studies/module-choice.ts";
import { OPEN_CONVERTER, SINGLE } from "../core/tracking/steady-run.ts";
import { generatorChoice } from "./checks/test-generator.ts";

const [HIGH, LOW] = [500, 100];

/**
 * Lost share of perturb and observe while the light falls from 500 to 100 W/m2 at `slope` (W/m2/s): it wakes `offset`
 * steps off the first peak as the fall begins, and its first step is down, whatever came before. The service's climber
 * and terminals, period by period; no window, which the service would wake it at.
 */
export function fallingShare(slope: number, offset: number): number {
  const array = photovoltaicArray(buildModule(generatorChoice("crystalline-silicon")).module, SINGLE);
  const ruleArray = { modulesInSeries: 1, standard: array.standard };
  const settings = completeSettings({ kind: "perturb-and-observe", settings: { stepFraction: 0.01 } }, ruleArray);
  const rule = prepareRule("perturb-and-observe", settings, ruleArray) as ClimbingRule;
  const terminals = new Terminals(OPEN_CONVERTER);
  const condition = emptyCondition();
  enterCondition(condition, array, HIGH, 25);
  const seen = firstSight();
  const point = { voltage: 0, current: 0, power: 0 };
  let voltage = condition.maximum.voltage + offset * rule.step;
  let [available, delivered] = [0, 0];
  const periods = Math.round((HIGH - LOW) / slope / rule.controlPeriod);
  for (let period = 0; period < periods; period++) {
    enterCondition(condition, array, HIGH - slope * rule.controlPeriod * (period + 0.5), 25);
    terminals.enter(condition);
    terminals.operate(voltage, point);
    available += condition.maximum.power;
    delivered += point.power;
    voltage = climbOn(rule, terminals, seen, voltage, point);
  }
  return 1 - delivered / available;
}
