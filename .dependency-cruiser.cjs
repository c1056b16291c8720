/** The direction of dependency, as drawn in DEVELOPERS.md. `import type` counts too. */
const only = (name, from, to) => ({
  name,
  severity: "error",
  from: { path: from },
  to: { path: "^(service|sdk|openapi|demo|test)/", pathNot: to },
});

module.exports = {
  forbidden: [
    { name: "no-cycles", severity: "error", from: {}, to: { circular: true } },
    {
      name: "core-knows-nothing-outside-itself",
      severity: "error",
      from: { path: "^service/core/" },
      to: { pathNot: "^service/core/" },
    },
    {
      name: "rules-do-not-know-each-other",
      severity: "error",
      from: { path: "^service/core/rules/", pathNot: "^service/core/rules/index.ts$" },
      to: {
        path: "^service/core/rules/",
        pathNot: "^service/core/rules/(rule|climb-by-power|sampling-parameters).ts$",
      },
    },
    only("climate-imports-core", "^service/climate/", "^service/(climate|core)/"),
    only("studies-import-core-and-climate", "^service/studies/", "^service/(studies|climate|core)/"),
    only("wire-imports-study-types-and-the-rule-table", "^service/wire/", "^service/(wire|studies|climate|core)/"),
    {
      name: "wire-knows-no-transport",
      severity: "error",
      from: { path: "^service/wire/" },
      to: { path: "node_modules/(hono|@hono/node-server)/" },
    },
    only("pool-imports-wire-and-studies", "^service/pool/", "^service/(pool|wire|studies)/"),
    only("http-imports-wire-and-pool", "^service/http/", "^service/(http|wire|pool)/|^openapi/openapi.json$"),
    {
      name: "only-pool-imports-the-pool-library",
      severity: "error",
      from: { path: "^service/", pathNot: "^service/pool/pool.ts$" },
      to: { path: "node_modules/piscina/" },
    },
    only("sdk-stands-alone", "^sdk/src/", "^sdk/src/"),
    {
      name: "the-service-does-not-import-its-client",
      severity: "error",
      from: { path: "^service/" },
      to: { path: "^(sdk|demo|test)/" },
    },
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    doNotFollow: { path: "node_modules" },
    exclude: { path: "(^|/)dist/" },
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "node", "default"] },
  },
};
