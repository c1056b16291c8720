import { CEILINGS } from "../../wire/limits.ts";
import { VersionSchema } from "../../wire/schema/service.ts";
import { VERSION } from "../../wire/version.ts";
import { addRoute } from "../add-route.ts";
import type { App } from "../app-type.ts";
import { ANY_REQUEST, problemResponses, success } from "../documented.ts";
import { sendText } from "../send.ts";
import type { Services } from "../services.ts";

/** GET /version. */
export function addVersion(app: App, services: Services): void {
  app.openAPIRegistry.register("VersionAnswer", VersionSchema);
  const answer = (limits: object) => ({ name: "kneegap", version: VERSION, limits });
  const text = JSON.stringify(answer(services.limits));
  addRoute(
    app,
    {
      method: "get",
      path: "/version",
      operationId: "version",
      summary: "Name the version and the limits in force",
      description:
        "The service's version and the limits in force: at most this document's ceilings, which the example shows.",
      tags: ["service"],
      security: [{}],
      responses: {
        ...success("VersionAnswer", "Version and limits.", answer(CEILINGS)),
        ...problemResponses(ANY_REQUEST),
      },
    },
    (context) => sendText(context, text),
  );
}
