import { defineRule } from "./rule.ts";

/** Holds the maximum power point inside the converter's window without error: the control case. */
export const perfect = defineRule({
  kind: "perfect",
  title: "Perfect tracking",
  description:
    "The maximum of the power curve inside the converter's voltage window, without ripple, sensor error or waiting. Loses only what the window costs.",
  interrupts: "nothing",
  sources: ["the definition of the MPPT efficiency in EN 50530:2010, 4.3"],
  parameters: {},
  prepare: () => ({ behaviour: "perfect" }),
});
