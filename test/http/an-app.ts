import { createApp } from "../../service/http/app.ts";
import type { App } from "../../service/http/app-type.ts";
import type { AppSettings, PortfolioService } from "../../service/http/services.ts";
import type { Compute } from "../../service/pool/compute.ts";
import { CEILINGS } from "../../service/wire/limits.ts";
import { performOperation } from "../../service/wire/operations.ts";
import { performStep } from "../../service/wire/portfolio/perform-step.ts";
import type { Json } from "../wire/requests.ts";

/** Computes on the calling thread, whatever the work. */
export const inline: Compute = async (operation, body) => performOperation(operation, body, CEILINGS);

/** Portfolios computed on the calling thread, two sites at once. */
export const inlinePortfolio: PortfolioService = {
  perform: async (step) => performStep(step),
  stepsAtOnce: 2,
  most: 4,
  stallTime: 5000,
  silence: 5000,
};

/** A line of the log. */
export interface LogLine {
  level: "info" | "error";
  values: Record<string, unknown>;
  message: string;
}

/** An app without a port and what it logs. */
export function anApp(settings: Partial<AppSettings> = {}, compute: Compute = inline): { app: App; lines: LogLine[] } {
  const lines: LogLine[] = [];
  const note = (level: LogLine["level"]) => (values: object, message: string) => {
    lines.push({ level, values: values as Record<string, unknown>, message });
  };
  const app = createApp(compute, {
    limits: CEILINGS,
    keys: [],
    state: () => "ready",
    log: { info: note("info"), error: note("error") },
    idleTime: 1000,
    uploadTime: 5000,
    heldBytes: 2 ** 30,
    portfolio: inlinePortfolio,
    ...settings,
  });
  return { app, lines };
}

/** The document as the service serves it. */
export async function documentOf(): Promise<Json> {
  return (await anApp().app.request("/openapi.json")).json();
}

/** Whatever a request may carry. */
export type Body = NonNullable<RequestInit["body"]>;

/** A POST of JSON. */
export function post(body: Body, headers: Record<string, string> = {}): RequestInit & { duplex?: "half" } {
  return { method: "POST", body, headers: { "content-type": "application/json", ...headers } };
}
