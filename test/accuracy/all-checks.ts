import type { Check, Finding } from "./check.ts";
import { AGEING } from "./checks/ageing.ts";
import { CAUTIONS } from "./checks/cautions.ts";
import { CELL_TEMPERATURES } from "./checks/cell-temperatures.ts";
import { CLIMBING_RULES } from "./checks/climbing-rules.ts";
import { CONSTANT_VOLTAGE } from "./checks/constant-voltage.ts";
import { CURVE_RATIOS } from "./checks/curve-ratios.ts";
import { DYNAMIC_SEQUENCES } from "./checks/dynamic-sequences.ts";
import { FRACTION_RULES } from "./checks/fraction-rules.ts";
import { IDEAL_DIODE } from "./checks/ideal-diode.ts";
import { MEASURED_CURVES } from "./checks/measured-curves.ts";
import { MODULES_FROM_PAPERS } from "./checks/modules-from-papers.ts";
import { PLANE_OF_ARRAY } from "./checks/plane-of-array.ts";
import { RIPPLE } from "./checks/ripple.ts";
import { SUN_POSITION } from "./checks/sun-position.ts";
import { TEST_GENERATOR } from "./checks/test-generator.ts";

/** Every check, in the order of the table: the one place to add a topic. */
export const CHECKS: readonly Check[] = [
  ...MODULES_FROM_PAPERS,
  ...IDEAL_DIODE,
  ...MEASURED_CURVES,
  ...TEST_GENERATOR,
  ...FRACTION_RULES,
  ...CONSTANT_VOLTAGE,
  ...CLIMBING_RULES,
  ...RIPPLE,
  ...AGEING,
  ...DYNAMIC_SEQUENCES,
  ...CELL_TEMPERATURES,
  ...SUN_POSITION,
  ...PLANE_OF_ARRAY,
  ...CAUTIONS,
];

/** Every finding, after the checks. */
export const FINDINGS: readonly Finding[] = [CURVE_RATIOS];
