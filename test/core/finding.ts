/** Prints what a test found, beside its verdict: figures for a reader, asserted nowhere. */
export function printFinding(title: string, figures: Readonly<Record<string, number | string>>): void {
  const lines = Object.entries(figures).map(([name, value]) => `  ${name}: ${value}`);
  process.stdout.write(`${[title, ...lines].join("\n")}\n`);
}
