/** A unit as it is said after a number: nothing for a pure one, what it is a share of for a share. */
export function unitAfter(unit: string): string {
  if (unit === "1") return "";
  if (unit.startsWith("1, ")) return unit.slice(1);
  return unit.startsWith("that of ") ? `, in the unit of ${unit.slice(8)}` : ` ${unit}`;
}
