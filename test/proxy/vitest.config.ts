import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

// Apart from the other tests, since it needs a stock nginx: `npm run test:proxy`, which CI runs.
export default defineConfig({
  resolve: { alias: { "@kneegap/sdk": fileURLToPath(new URL("../../sdk/src/index.ts", import.meta.url)) } },
  test: {
    root: fileURLToPath(new URL("../..", import.meta.url)),
    include: ["test/proxy/*.nginx.ts"],
    testTimeout: 120_000,
  },
});
