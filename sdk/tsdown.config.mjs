import { defineConfig } from "tsdown";

export default defineConfig({
  entry: ["src/index.ts"],
  format: ["esm", "cjs"],
  platform: "node",
  target: "node20.19",
  dts: true,
  clean: true,
  // Symbol.asyncDispose is in node 20 but not in the ES2022 library of a project that has no @types/node.
  banner: { dts: '/// <reference lib="esnext.disposable" />' },
  checks: { legacyCjs: false },
  // The CSV parser is bundled, so that undici stays the only dependency; the MIT licence asks that its text come along.
  deps: { onlyBundle: ["csv-parse"] },
  copy: [{ from: "../node_modules/csv-parse/LICENSE", to: "dist", rename: "csv-parse.LICENSE.txt" }],
});
