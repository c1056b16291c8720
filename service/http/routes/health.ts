import { problem } from "../../wire/problem.ts";
import { HealthSchema } from "../../wire/schema/service.ts";
import { addRoute } from "../add-route.ts";
import type { App } from "../app-type.ts";
import { ANY_REQUEST, problemResponses, success } from "../documented.ts";
import { respondProblem } from "../problem.ts";
import { sendText } from "../send.ts";
import type { Services } from "../services.ts";

const REFUSALS = {
  warming: problem("warming", "The workers are not warm yet."),
  draining: problem("draining", "The service is shutting down; send new requests elsewhere."),
};

/** GET /health/live and GET /health/ready. Neither touches the pool. */
export function addHealth(app: App, services: Services): void {
  app.openAPIRegistry.register("Health", HealthSchema);
  addRoute(
    app,
    {
      method: "get",
      path: "/health/live",
      operationId: "liveness",
      summary: "Is the process alive",
      description: "Answers as long as the process can answer at all, while draining too.",
      tags: ["service"],
      security: [{}],
      responses: { ...success("Health", "It is.", { status: "live" }), ...problemResponses(ANY_REQUEST) },
    },
    (context) => sendText(context, '{"status":"live"}'),
  );
  addRoute(
    app,
    {
      method: "get",
      path: "/health/ready",
      operationId: "readiness",
      summary: "May requests be sent here",
      description: "True once the workers are warm, false as soon as the service is told to stop.",
      tags: ["service"],
      security: [{}],
      responses: {
        ...success("Health", "They may.", { status: "ready" }),
        ...problemResponses([...ANY_REQUEST, "warming", "draining"]),
      },
    },
    (context) => {
      const state = services.state();
      return state === "ready" ? sendText(context, '{"status":"ready"}') : respondProblem(context, REFUSALS[state]);
    },
  );
}
