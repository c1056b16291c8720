import { once } from "node:events";
import { connect } from "node:net";
import { setTimeout as sleep } from "node:timers/promises";
import { afterEach, describe, expect, it } from "vitest";
import type { Listening } from "../../service/http/serve.ts";
import { serve } from "../../service/http/serve.ts";
import type { Compute } from "../../service/pool/compute.ts";
import { anApp } from "./an-app.ts";

const open: Listening[] = [];

async function listening(compute: Compute, stallTime: number): Promise<Listening> {
  const { app } = anApp({}, compute);
  const log = { info: () => undefined, error: () => undefined };
  const one = await serve(app, { host: "127.0.0.1", port: 0, log, headersTime: 300, stallTime });
  open.push(one);
  return one;
}

const answerOf =
  (length: number, delay = 0): Compute =>
  async () => {
    await sleep(delay);
    return { ok: true, bytes: new Uint8Array(length).fill(0x20), contentType: "application/json" };
  };

const REQUEST =
  "POST /v1/estimates HTTP/1.1\r\nhost: x\r\ncontent-type: application/json\r\ncontent-length: 2\r\n\r\n{}";

afterEach(() => {
  for (const one of open.splice(0)) one.cut();
});

describe("the server", () => {
  it("cuts a reader that takes no byte of its answer", async () => {
    const { port, close } = await listening(answerOf(64 * 1024 * 1024), 300);
    const socket = connect(port, "127.0.0.1");
    socket.on("error", () => undefined);
    socket.pause();
    socket.write(REQUEST);
    await sleep(200);
    // Closing waits for the answers in flight: it ends only because the reader is cut.
    const before = performance.now();
    await close();
    expect(performance.now() - before).toBeGreaterThan(50);
    socket.destroy();
  });

  it("lets a slow reader finish its answer while it closes", async () => {
    const length = 32 * 1024 * 1024;
    const { port, close } = await listening(answerOf(length), 10_000);
    const socket = connect(port, "127.0.0.1");
    let received = 0;
    socket.on("data", (piece) => {
      received += piece.length;
    });
    socket.pause();
    socket.write(REQUEST);
    await sleep(200);
    const closing = close();
    await sleep(200);
    socket.resume();
    await Promise.all([closing, once(socket, "close")]);
    expect(received).toBeGreaterThan(length);
  });

  it("does not take silence while an answer is computed for a stall", async () => {
    const { port } = await listening(answerOf(10, 900), 200);
    const answer = await fetch(`http://127.0.0.1:${port}/v1/estimates`, {
      method: "POST",
      body: "{}",
      headers: { "content-type": "application/json" },
    });
    expect([answer.status, (await answer.text()).length]).toEqual([200, 10]);
  });

  it("answers headers that do not come in time with a problem", async () => {
    const { port } = await listening(answerOf(1), 10_000);
    const socket = connect(port, "127.0.0.1");
    let text = "";
    socket.on("data", (piece) => {
      text += piece;
    });
    socket.write("GET /version HTTP/1.1\r\nhost:");
    await once(socket, "close");
    expect(text).toMatch(/^HTTP\/1\.1 408 /);
    expect(JSON.parse(text.split("\r\n\r\n")[1])).toMatchObject({ code: "too-slow", status: 408 });
  });
});
