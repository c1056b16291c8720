// generated from openapi/openapi.json by sdk/scripts/generate.ts: do not edit
import type { Operation } from "../operation.ts";

/** Every operation of the API document. */
export const operationTable = {
  compare: {
    operationId: "compare",
    method: "POST",
    path: "/v1/comparisons",
    requestMediaType: "application/json",
    responseMediaType: "application/json",
    successStatuses: [200],
    columns: [],
  },
  document: {
    operationId: "document",
    method: "GET",
    path: "/openapi.json",
    requestMediaType: null,
    responseMediaType: "application/json",
    successStatuses: [200],
    columns: [],
  },
  estimate: {
    operationId: "estimate",
    method: "POST",
    path: "/v1/estimates",
    requestMediaType: "application/json",
    responseMediaType: "application/json",
    successStatuses: [200],
    columns: [["traces","maximumPower","voltage"],["traces","maximumPower","current"],["traces","maximumPower","power"],["traces","operating","voltage"],["traces","operating","current"],["traces","operating","power"],["traces","lostByCause","voltageWindow"],["traces","lostByCause","wrongPeak"],["traces","lostByCause","setPoint"],["traces","lostByCause","heldSample"],["traces","lostByCause","regulation"],["traces","lostByCause","interruption"]],
  },
  liveness: {
    operationId: "liveness",
    method: "GET",
    path: "/health/live",
    requestMediaType: null,
    responseMediaType: "application/json",
    successStatuses: [200],
    columns: [],
  },
  readiness: {
    operationId: "readiness",
    method: "GET",
    path: "/health/ready",
    requestMediaType: null,
    responseMediaType: "application/json",
    successStatuses: [200],
    columns: [],
  },
  rules: {
    operationId: "rules",
    method: "GET",
    path: "/v1/rules",
    requestMediaType: null,
    responseMediaType: "application/json",
    successStatuses: [200],
    columns: [],
  },
  version: {
    operationId: "version",
    method: "GET",
    path: "/version",
    requestMediaType: null,
    responseMediaType: "application/json",
    successStatuses: [200],
    columns: [],
  },
} as const satisfies Record<string, Operation>;
