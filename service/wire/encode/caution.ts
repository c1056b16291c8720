import type { Caution } from "../../studies/cautions.ts";

/** A caution with its members in the order of the contract. */
export function encodeCaution({ code, severity, detail, values }: Caution) {
  return { code, severity, detail, values };
}
