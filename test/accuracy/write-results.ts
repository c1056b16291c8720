import { writeFileSync } from "node:fs";
import { CHECKS, FINDINGS } from "./all-checks.ts";
import { resultsMarkdown } from "./results.ts";

writeFileSync(new URL("RESULTS.md", import.meta.url), resultsMarkdown(CHECKS, FINDINGS));
