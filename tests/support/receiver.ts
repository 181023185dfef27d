import { createServer, type IncomingHttpHeaders, type Server, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";

export interface Received {
  path: string;
  headers: IncomingHttpHeaders;
  body: string;
}

type Answer = (response: ServerResponse, received: Received) => void;

/** A partner's server on loopback: it keeps what it is sent, and answers as it is told. */
export class Receiver {
  readonly received: Received[] = [];
  answer: Answer = (response) => response.writeHead(204).end();
  readonly #server: Server = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on("data", (chunk: Buffer) => chunks.push(chunk));
    request.on("end", () => {
      const received = { path: request.url!, headers: request.headers, body: Buffer.concat(chunks).toString("utf8") };
      this.received.push(received);
      this.answer(response, received);
    });
  });

  static async start(): Promise<Receiver> {
    const receiver = new Receiver();
    await new Promise<void>((resolve) => receiver.#server.listen(0, "127.0.0.1", resolve));
    return receiver;
  }

  get port(): number {
    return (this.#server.address() as AddressInfo).port;
  }

  url(path = "/hooks"): string {
    return `http://127.0.0.1:${this.port}${path}`;
  }

  async stop(): Promise<void> {
    this.#server.closeAllConnections();
    await new Promise((resolve) => this.#server.close(resolve));
  }
}

/** Waits until something is there; fails where it does not come. */
export async function until<Value>(what: string, look: () => Value | undefined | false | null | Promise<Value | undefined | false | null>, patienceMs = 10_000): Promise<Value> {
  const end = Date.now() + patienceMs;
  for (;;) {
    const value = await look();
    if (value) return value;
    if (Date.now() > end) throw new Error(`waited in vain for ${what}`);
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
}
