// generated from openapi/openapi.json by sdk/scripts/generate.ts: do not edit
import type { ColumnKind, Received } from "../columns.ts";
import type { CallOptions, RequestFunction } from "../operation.ts";
import { operationTable } from "./operations.ts";
import type { ComparisonAnswer, ComparisonRequest, CurveAnswer, CurveRequest, EfficiencyTestAnswer, EfficiencyTestRequest, EstimateAnswer, EstimateRequest, Health, ModuleFitAnswer, ModuleFitRequest, RuleCatalogue, TuningAnswer, TuningRequest, VersionAnswer, operations } from "./schema.ts";

/** The operations of the service, one method each; those that take lines are in `kneegap.ts`. `C` says how columns arrive. */
export class Operations<C extends ColumnKind> {
  readonly #request: RequestFunction;

  constructor(request: RequestFunction) {
    this.#request = request;
  }

  /**
   * Compare tracking rules and converters
   *
   * 2 to 24 candidates on one array over one climate: what each delivers, its difference to the baseline and to the
   * best, and what the difference is worth per year. Worth and payback need energyValue and a climate of 365 or 366
   * days.
   *
   * `POST /v1/comparisons`
   */
  compare(request: ComparisonRequest, options?: CallOptions): Promise<Received<ComparisonAnswer, C>> {
    return this.#request(operationTable.compare, request, options) as Promise<Received<ComparisonAnswer, C>>;
  }

  /**
   * Draw the I-V and P-V curve
   *
   * The curve of an array in one weather as its converter sees it, every peak, and where each given rule sits at
   * rest with what it loses and why.
   *
   * `POST /v1/curves`
   */
  curve(request: CurveRequest, options?: CallOptions): Promise<Received<CurveAnswer, C>> {
    return this.#request(operationTable.curve, request, options) as Promise<Received<CurveAnswer, C>>;
  }

  /**
   * Read this document
   *
   * The OpenAPI 3.1 document of this version.
   *
   * `GET /openapi.json`
   */
  document(options?: CallOptions): Promise<Received<operations["document"]["responses"][200]["content"]["application/json"], C>> {
    return this.#request(operationTable.document, undefined, options) as Promise<Received<operations["document"]["responses"][200]["content"]["application/json"], C>>;
  }

  /**
   * Estimate what a tracking rule loses
   *
   * One module, one array, one rule on a converter, one climate: available, delivered and lost energy, the loss by
   * cause, by month and by irradiance, and what each sample did. Only module, rule and climate are required.
   *
   * `POST /v1/estimates`
   */
  estimate(request: EstimateRequest, options?: CallOptions): Promise<Received<EstimateAnswer, C>> {
    return this.#request(operationTable.estimate, request, options) as Promise<Received<EstimateAnswer, C>>;
  }

  /**
   * Find a module's circuit
   *
   * From a datasheet or from measured I-V points to the single-diode circuit, which can be sent back as a module,
   * and how well it fits. A datasheet that no circuit meets gets the nearest one, or is refused with every misfit
   * shown.
   *
   * `POST /v1/module-fits`
   */
  fitModule(request: ModuleFitRequest, options?: CallOptions): Promise<Received<ModuleFitAnswer, C>> {
    return this.#request(operationTable.fitModule, request, options) as Promise<Received<ModuleFitAnswer, C>>;
  }

  /**
   * Is the process alive
   *
   * Answers as long as the process can answer at all, while draining too.
   *
   * `GET /health/live`
   */
  liveness(options?: CallOptions): Promise<Received<Health, C>> {
    return this.#request(operationTable.liveness, undefined, options) as Promise<Received<Health, C>>;
  }

  /**
   * May requests be sent here
   *
   * True once the workers are warm, false as soon as the service is told to stop.
   *
   * `GET /health/ready`
   */
  readiness(options?: CallOptions): Promise<Received<Health, C>> {
    return this.#request(operationTable.readiness, undefined, options) as Promise<Received<Health, C>>;
  }

  /**
   * List the tracking rules
   *
   * Every tracking rule with its parameters, defaults, ranges, usual ranges and their sources.
   *
   * `GET /v1/rules`
   */
  rules(options?: CallOptions): Promise<Received<RuleCatalogue, C>> {
    return this.#request(operationTable.rules, undefined, options) as Promise<Received<RuleCatalogue, C>>;
  }

  /**
   * Test a rule's MPPT efficiency by the standard
   *
   * The dynamic sequences and the static levels of EN 50530:2010 (from memory; their durations close) for any rule
   * on any module, by cause, and on request the course of one row.
   *
   * `POST /v1/efficiency-tests`
   */
  testEfficiency(request: EfficiencyTestRequest, options?: CallOptions): Promise<Received<EfficiencyTestAnswer, C>> {
    return this.#request(operationTable.testEfficiency, request, options) as Promise<Received<EfficiencyTestAnswer, C>>;
  }

  /**
   * Find the setting that loses least
   *
   * The best value of one numeric setting of a rule, the loss around it, the range in which it hardly matters, and
   * what the setting of today loses. With several sites: the best common setting, each site's own, and what the
   * common one costs it.
   *
   * `POST /v1/tunings`
   */
  tune(request: TuningRequest, options?: CallOptions): Promise<Received<TuningAnswer, C>> {
    return this.#request(operationTable.tune, request, options) as Promise<Received<TuningAnswer, C>>;
  }

  /**
   * Name the version and the limits in force
   *
   * The service's version and the limits in force: at most this document's ceilings, which the example shows.
   *
   * `GET /version`
   */
  version(options?: CallOptions): Promise<Received<VersionAnswer, C>> {
    return this.#request(operationTable.version, undefined, options) as Promise<Received<VersionAnswer, C>>;
  }
}
