import { randomUUID } from "node:crypto";
import type { IncomingMessage, Server, ServerResponse } from "node:http";
import type { AddressInfo, Socket } from "node:net";
import { Server as NetServer } from "node:net";
import { createAdaptorServer } from "@hono/node-server";
import type { App } from "./app-type.ts";
import { answerParserError } from "./parser-error.ts";
import type { Log } from "./services.ts";

/** A server that listens. */
export interface Listening {
  port: number;
  /** Stops accepting, and resolves once every request in flight is answered. */
  close(): Promise<void>;
  /** Cuts every connection. */
  cut(): void;
}

/** How a server listens. Times in ms. */
export interface ServeSettings {
  host: string;
  port: number;
  log: Log;
  /** Headers must have come whole after this. */
  headersTime: number;
  /** A connection that moves no byte of an answer for this long is cut. */
  stallTime: number;
}

/** Longer than clients and balancers keep theirs open, so that it is not this end that closes under a request. */
const KEEP_ALIVE = 75_000;

/** Listens for an app. @throws Error where the port is taken or not allowed */
export async function serve(app: App, settings: ServeSettings): Promise<Listening> {
  const server = createAdaptorServer({
    fetch: app.fetch,
    serverOptions: {
      // Bodies have their own timers: this one would cut long uploads without a word.
      requestTimeout: 0,
      headersTimeout: settings.headersTime,
      keepAliveTimeout: KEEP_ALIVE,
      connectionsCheckingInterval: Math.min(5000, settings.headersTime),
      maxHeaderSize: 16_384,
    },
  }) as Server;
  const answers = trackAnswers(server);
  server.on("clientError", (error: NodeJS.ErrnoException, socket: Socket) => {
    const requestId = randomUUID();
    const answer = answers.get(socket);
    const begun = answer?.headersSent === true && !answer.writableFinished;
    const code = begun ? null : answerParserError(error, socket, requestId);
    if (code === null) socket.destroy();
    else settings.log.info({ requestId, problem: code, error: error.code }, "unreadable request");
  });
  // An expectation that is not known is not a reason to leave without a problem.
  server.on("checkExpectation", (request, response) => server.emit("request", request, response));
  server.setTimeout(settings.stallTime, (socket: Socket) => {
    const answer = answers.get(socket);
    // Silence while an answer is computed is not a stall; unread bytes of an answer are.
    if (!answer || answer.writableFinished || socket.writableLength > 0) socket.destroy();
  });
  await listen(server, settings);
  return {
    port: (server.address() as AddressInfo).port,
    close: () => closed(server, answers),
    cut: () => server.closeAllConnections(),
  };
}

/** The latest answer of each open connection; null where there was none yet. */
function trackAnswers(server: Server): Map<Socket, ServerResponse | null> {
  const answers = new Map<Socket, ServerResponse | null>();
  server.on("connection", (socket: Socket) => {
    answers.set(socket, null);
    socket.once("close", () => answers.delete(socket));
  });
  server.prependListener("request", (request: IncomingMessage, response: ServerResponse) => {
    answers.set(request.socket, response);
  });
  return answers;
}

function listen(server: Server, { host, port }: ServeSettings): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, host, () => {
      server.removeListener("error", reject);
      resolve();
    });
  });
}

/**
 * Stops listening, ends connections that wait for nothing, and each other one with its answer. Not by the HTTP server's
 * own `close`: it takes an answer that is written but not yet taken by its reader for done, and cuts it.
 */
function closed(server: Server, answers: ReadonlyMap<Socket, ServerResponse | null>): Promise<void> {
  return new Promise((resolve) => {
    NetServer.prototype.close.call(server, () => resolve());
    for (const [socket, answer] of answers) {
      if (answer === null || answer.writableFinished) socket.destroy();
      else answer.once("close", () => socket.destroySoon());
    }
  });
}
