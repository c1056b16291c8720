import { OpenAPIHono } from "@hono/zod-openapi";
import type { Compute } from "../pool/compute.ts";
import { problem } from "../wire/problem.ts";
import { checkAccept } from "./accept.ts";
import { checkAccess } from "./access.ts";
import type { App, Environment, RequestContext } from "./app-type.ts";
import { createBodyBudget } from "./body-budget.ts";
import { describeShared } from "./document.ts";
import { respondProblem } from "./problem.ts";
import { trackRequest } from "./request-track.ts";
import { addComparisons } from "./routes/comparisons.ts";
import { addCurves } from "./routes/curves.ts";
import { addDocument } from "./routes/document.ts";
import { addEfficiencyTests } from "./routes/efficiency-tests.ts";
import { addEstimates } from "./routes/estimates.ts";
import { addHealth } from "./routes/health.ts";
import { addModuleFits } from "./routes/module-fits.ts";
import { addPortfolios, PORTFOLIOS } from "./routes/portfolios.ts";
import { addRules } from "./routes/rules.ts";
import { addTunings } from "./routes/tunings.ts";
import { addVersion } from "./routes/version.ts";
import type { AppSettings } from "./services.ts";

/** The service as a function of requests: routes, refusals and document; testable without a port. */
export function createApp(compute: Compute, settings: AppSettings): App {
  const services = { ...settings, compute, budget: createBodyBudget(settings.heldBytes) };
  const app: App = new OpenAPIHono<Environment>();
  app.use(trackRequest(services));
  app.use(checkAccept(PORTFOLIOS));
  app.use("/v1/*", checkAccess(services.keys));
  describeShared(app);
  addEstimates(app, services);
  addComparisons(app, services);
  addPortfolios(app, services);
  addTunings(app, services);
  addEfficiencyTests(app, services);
  addModuleFits(app, services);
  addCurves(app, services);
  addRules(app);
  addHealth(app, services);
  addVersion(app, services);
  addDocument(app);
  app.notFound(refusePath(methodsByPath(app)));
  app.onError((error, context) => failed(error, context, settings));
  return app;
}

/** The methods of each path, as an Allow header. */
function methodsByPath(app: App): Map<string, string> {
  const methods = new Map<string, string>();
  for (const { path, method } of app.routes) {
    if (method === "GET") methods.set(path, "GET, HEAD");
    if (method === "POST") methods.set(path, "POST");
  }
  return methods;
}

function refusePath(methods: ReadonlyMap<string, string>) {
  return (context: RequestContext): Response => {
    const allow = methods.get(context.req.path);
    if (allow === undefined) {
      return respondProblem(context, problem("not-found", "This path is none of the document's; see /openapi.json."));
    }
    const { method } = context.req;
    return respondProblem(context, problem("method-not-allowed", `${method} does not fit here; use ${allow}.`), {
      allow,
    });
  };
}

/** Whatever was not foreseen: the log gets the error, the caller the request id. */
function failed(error: Error, context: RequestContext, { log }: AppSettings): Response {
  const requestId = context.get("requestId");
  log.error({ requestId, name: error.name, error: error.message, stack: error.stack }, "request failed");
  return respondProblem(context, problem("internal", "The service failed at this request; quote the request id."));
}
