export type { KneegapOptions } from "./client-options.ts";
export type { ClimateRole } from "./climate-file/climate-header.ts";
export type { ClimateText } from "./climate-file/climate-text.ts";
export type { ColumnMapping } from "./climate-file/find-columns.ts";
export type { DecimalMark } from "./climate-file/number-reader.ts";
export type { ClimateGaps, ReadClimateOptions } from "./climate-file/read-climate-options.ts";
export type { Column, ColumnKind, Received, Sent, Typed } from "./columns.ts";
export { AbortedError } from "./errors/aborted-error.ts";
export { AnswerTooLargeError } from "./errors/answer-too-large-error.ts";
export type { ClimateFileErrorCode, FilePlace } from "./errors/climate-file-error.ts";
export { ClimateFileError } from "./errors/climate-file-error.ts";
export { ClosedError } from "./errors/closed-error.ts";
export { ConnectionError } from "./errors/connection-error.ts";
export { EncodingError } from "./errors/encoding-error.ts";
export type { CallContext } from "./errors/kneegap-error.ts";
export { KneegapError } from "./errors/kneegap-error.ts";
export type { ProblemAnswer } from "./errors/problem-error.ts";
export { ProblemError } from "./errors/problem-error.ts";
export { ProtocolError } from "./errors/protocol-error.ts";
export { RateLimitedError } from "./errors/rate-limited-error.ts";
export { RequestProblemError } from "./errors/request-problem-error.ts";
export { ServerProblemError } from "./errors/server-problem-error.ts";
export type { SitePlace } from "./errors/site-input-error.ts";
export { SiteInputError } from "./errors/site-input-error.ts";
export { TimeoutError } from "./errors/timeout-error.ts";
export { UnavailableError } from "./errors/unavailable-error.ts";
export type * from "./generated/models.ts";
export { Kneegap } from "./kneegap.ts";
export type { CallOptions } from "./operation.ts";
export type {
  MergedTotals,
  PortfolioDefaultsRequest,
  PortfolioLine,
  PortfolioRefusal,
  PortfolioSiteRequest,
} from "./portfolio/portfolio-lines.ts";
export type { PortfolioOptions, PortfolioProgress } from "./portfolio/portfolio-options.ts";
export type { PortfolioRun, PortfolioSites } from "./portfolio/portfolio-run.ts";
export type { ReadClimate, ReadHorizontal, ReadIrradiance, ReadPlaneOfArray, ReadTemperature } from "./read-climate.ts";
export { readClimate } from "./read-climate.ts";
export type { RetryOptions } from "./retry.ts";
export { SDK_VERSION } from "./version.ts";
