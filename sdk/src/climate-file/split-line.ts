/** What can separate the fields of a row when the caller does not say; " " stands for runs of blanks and tabs. */
const DELIMITERS = ["\t", ";", ",", " "] as const;

/** The fields of one line by `delimiter`, without their quotes; a quote left open runs to the line's end. */
export function splitLine(line: string, delimiter: string): string[] {
  const blanks = delimiter === " ";
  const fields = [""];
  let quoted = false;
  for (const character of line) {
    if (character === '"') quoted = !quoted;
    else if (quoted || !(character === delimiter || (blanks && character === "\t"))) {
      fields[fields.length - 1] += character;
    } else fields.push("");
  }
  const trimmed = fields.map((field) => field.trim());
  return blanks ? trimmed.filter((field) => field !== "") : trimmed;
}

/**
 * The delimiter under which most of `line`'s fields are known to `countKnown`; among equals the first of tab, semicolon,
 * comma, runs of blanks that stands in the line at all.
 */
export function findDelimiter(line: string, countKnown: (fields: readonly string[]) => number): string {
  let best = { delimiter: ",", known: -1 };
  for (const delimiter of DELIMITERS) {
    const fields = splitLine(line, delimiter);
    if (fields.length < 2) continue;
    const known = countKnown(fields);
    if (known > best.known) best = { delimiter, known };
  }
  return best.delimiter;
}
