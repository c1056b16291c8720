import { setMaxListeners } from "node:events";
import type { Readable } from "node:stream";
import type { Limits } from "../../wire/limits.ts";
import type { Errand, Line, Portfolio } from "../../wire/portfolio/portfolio.ts";
import { PortfolioEnd } from "../../wire/portfolio/portfolio-end.ts";
import type { Problem } from "../../wire/problem.ts";
import { problem } from "../../wire/problem.ts";
import type { PortfolioService } from "../services.ts";
import { bodyFault } from "./body-stream.ts";
import type { HeldMemory } from "./held-memory.ts";
import type { LineOutput } from "./line-output.ts";
import { createLineOutput } from "./line-output.ts";
import { linesOf } from "./lines-of.ts";

/** What a session works with. */
export interface SessionParts {
  portfolio: Portfolio;
  body: Readable;
  limits: Limits;
  held: HeldMemory;
  service: PortfolioService;
  /** Told of defects, as plain text. */
  onFault: (fault: string) => void;
  /** Told how an answer ended: what came of the sites; why before the last line, null where it did not. */
  onEnd: (counts: ReturnType<Portfolio["counts"]>, cause: Problem["code"] | "left" | null) => void;
}

/**
 * One portfolio between its reader and its worker threads. A line is read when a step is free to be taken and the reader
 * keeps up; when the reader leaves, or nothing moves any more, everything stops.
 */
export class PortfolioSession {
  private readonly parts: SessionParts;
  private readonly lines: AsyncGenerator<Line>;
  private readonly output: LineOutput;
  private readonly running = new Set<Promise<void>>();
  private readonly left = new AbortController();
  private readonly stall: NodeJS.Timeout;
  private ending: Problem | null = null;
  private begun: Errand | Uint8Array | null = null;

  constructor(parts: SessionParts) {
    this.parts = parts;
    const { silence, stallTime } = parts.service;
    this.stall = setTimeout(() => this.onStall(), stallTime);
    // One a step.
    setMaxListeners(0, this.left.signal);
    this.output = createLineOutput(silence, {
      onCaughtUp: () => this.stall.refresh(),
      onLeft: () => this.leave(),
    });
    this.lines = linesOf(this.pieces(), parts.limits, parts.held);
  }

  /** The answer's lines. */
  get stream(): ReadableStream<Uint8Array> {
    return this.output.stream;
  }

  /** Whether nobody waits any more. */
  get isLeft(): boolean {
    return this.left.signal.aborted;
  }

  /** Reads the first line, and the defaults where it holds them. Gives why the request is refused, or null. */
  async open(): Promise<Problem | null> {
    await this.guarded(async () => {
      this.begun = await this.nextTodo();
      if (this.begun === null || this.begun instanceof Uint8Array || this.begun.step.step !== "defaults") return;
      const defaults = this.begun;
      this.begun = null;
      await this.start(defaults);
    });
    return this.ending;
  }

  /** Answers all lines; resolves when the last one is written. Never rejects. */
  async answer(): Promise<void> {
    await this.guarded(async () => {
      for (let todo = this.begun ?? (await this.nextTodo()); todo !== null; todo = await this.nextTodo()) {
        await this.attend(todo);
      }
    });
    await Promise.all(this.running);
    const { portfolio } = this.parts;
    if (this.ending !== null) this.output.write(portfolio.abortedLine(this.ending));
    else if (!this.isLeft) this.output.write(portfolio.totalsLine());
    this.close();
    this.parts.onEnd(portfolio.counts(), this.ending?.code ?? (this.isLeft ? "left" : null));
  }

  /** Stops everything, since nobody waits any more. */
  leave(): void {
    this.left.abort();
    this.output.waive();
    this.parts.body.destroy();
  }

  /** Lets go of whatever the session holds. */
  close(): void {
    clearTimeout(this.stall);
    this.output.close();
    this.parts.body.destroy();
    this.parts.held.releaseAll();
  }

  private async *pieces(): AsyncGenerator<Uint8Array> {
    try {
      for await (const piece of this.parts.body) {
        this.stall.refresh();
        yield piece as Uint8Array;
      }
    } catch (error) {
      throw new PortfolioEnd(problem("malformed-body", bodyFault(error)));
    }
  }

  /** The next line, taken; null: there is none, or none that matters any more. */
  private async nextTodo(): Promise<Errand | Uint8Array | null> {
    if (this.isOver) return null;
    const next = await this.lines.next();
    if (next.done === true || this.isOver) return null;
    const bytes = next.value.bytes?.length ?? 0;
    const todo = this.parts.portfolio.take(next.value);
    if (todo instanceof Uint8Array) this.parts.held.release(bytes);
    return todo;
  }

  private get isOver(): boolean {
    return this.ending !== null || this.isLeft;
  }

  /** Takes a step on, or writes a line, as soon as there is room. */
  private async attend(todo: Errand | Uint8Array): Promise<void> {
    await this.output.ready();
    if (todo instanceof Uint8Array) return this.output.write(todo);
    while (this.running.size >= this.parts.service.stepsAtOnce) await Promise.race(this.running);
    if (this.isOver) return;
    const done = this.start(todo);
    if (todo.first) await done;
  }

  private start(errand: Errand): Promise<void> {
    const held = errand.step.body.byteLength;
    const done = this.guarded(() => this.perform(errand)).then(() => {
      this.parts.held.release(held);
      this.running.delete(done);
      this.stall.refresh();
    });
    this.running.add(done);
    return done;
  }

  private async perform(errand: Errand): Promise<void> {
    const answer = await this.parts.service.perform(errand.step, this.left.signal);
    if (this.isLeft) return;
    if (!answer.ok && answer.fault !== undefined) this.parts.onFault(answer.fault);
    const line = errand.settle(answer);
    if (line !== null) this.output.write(line);
  }

  /** Does something that may end the portfolio. */
  private async guarded(deed: () => Promise<void>): Promise<void> {
    try {
      await deed();
    } catch (error) {
      if (error instanceof PortfolioEnd) return this.end(error.problem);
      this.parts.onFault(error instanceof Error ? (error.stack ?? error.message) : String(error));
      this.end(problem("internal", "The service failed at this request; quote the request id."));
    }
  }

  /** Reads no more; what runs is still answered. */
  private end(of: Problem): void {
    if (!this.isLeft) this.ending ??= of;
    this.parts.body.destroy();
  }

  private onStall(): void {
    const { stallTime } = this.parts.service;
    if (this.output.isFull()) {
      this.end(problem("too-slow", `The reader took no byte for ${stallTime / 1000} s.`));
      this.leave();
    } else if (this.running.size > 0) this.stall.refresh();
    else this.end(problem("too-slow", `No byte for ${stallTime / 1000} s.`));
  }
}
