// Serves the package being worked on, to this machine alone.
import { readFile } from "node:fs/promises";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import { viewerPage } from "./page.ts";

export type ViewerEvent = "running" | "written" | "failed";

export interface Viewer {
  readonly address: string;
  /** Tell every open page; "written" and "failed" make it load `file`. */
  tell(event: ViewerEvent, file?: string): void;
  close(): Promise<void>;
}

const HTML = { "content-type": "text/html; charset=utf-8", "cache-control": "no-store" };

class PackageViewer {
  readonly #title: string;
  readonly #open = new Set<ServerResponse>();
  #file: string | undefined;
  #count = 0;
  #last: { readonly event: ViewerEvent; readonly count: number } | undefined;

  constructor(title: string) {
    this.#title = title;
  }

  tell(event: ViewerEvent, file?: string): void {
    if (file !== undefined) this.#file = file;
    if (event !== "running") this.#last = { event, count: ++this.#count };
    for (const response of this.#open) this.#send(response, event);
  }

  #send(response: ServerResponse, event: ViewerEvent): void {
    response.write(`event: ${event}\ndata: ${this.#count}\n\n`);
  }

  async answer(request: IncomingMessage, response: ServerResponse): Promise<void> {
    // A page of another site must not read the package through a name that leads to this machine.
    const host = /^(?:127\.0\.0\.1|localhost|\[::1\])(?::\d+)?$/.test(request.headers.host ?? "");
    const path = (request.url ?? "/").split("?")[0];
    if (!host || request.method !== "GET") response.writeHead(403).end();
    else if (path === "/") response.writeHead(200, HTML).end(viewerPage(this.#title));
    else if (path === "/package" && this.#file !== undefined)
      response.writeHead(200, HTML).end(await readFile(this.#file));
    else if (path === "/events") this.#subscribe(response);
    else response.writeHead(404).end();
  }

  #subscribe(response: ServerResponse): void {
    response.writeHead(200, { "content-type": "text/event-stream", "cache-control": "no-store" });
    this.#open.add(response);
    response.on("close", () => this.#open.delete(response));
    if (this.#last) this.#send(response, this.#last.event);
    else response.flushHeaders();
  }

  end(): void {
    for (const response of this.#open) response.end();
  }
}

/** Start serving on a free port of this machine. */
export function startViewer(title: string): Promise<Viewer> {
  const viewer = new PackageViewer(title);
  const server = createServer((request, response) => {
    viewer.answer(request, response).catch(() => response.writeHead(500).end());
  });
  return new Promise((settle, fail) => {
    server.once("error", fail);
    server.listen(0, "127.0.0.1", () => {
      const address = server.address();
      const port = typeof address === "object" && address ? address.port : 0;
      settle({
        address: `http://127.0.0.1:${port}/`,
        tell: (event, file) => viewer.tell(event, file),
        close: () =>
          new Promise((done) => {
            viewer.end();
            server.close(() => done());
          }),
      });
    });
  });
}
