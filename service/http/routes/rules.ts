import { ruleCatalogue } from "../../wire/rule-catalogue.ts";
import { RuleCatalogueSchema } from "../../wire/schema/rules.ts";
import { addRoute } from "../add-route.ts";
import type { App } from "../app-type.ts";
import { ANY_REQUEST, problemResponses, success } from "../documented.ts";
import { sendText } from "../send.ts";

/** GET /v1/rules. */
export function addRules(app: App): void {
  app.openAPIRegistry.register("RuleCatalogue", RuleCatalogueSchema);
  const text = JSON.stringify(ruleCatalogue());
  addRoute(
    app,
    {
      method: "get",
      path: "/v1/rules",
      operationId: "rules",
      summary: "List the tracking rules",
      description: "Every tracking rule with its parameters, defaults, ranges, usual ranges and their sources.",
      tags: ["reference"],
      security: [{}, { key: [] }],
      responses: {
        ...success("RuleCatalogue", "The rules, in the order they are shown."),
        ...problemResponses([...ANY_REQUEST, "unauthorized"]),
      },
    },
    (context) => sendText(context, text),
  );
}
