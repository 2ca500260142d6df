// A front end of a few lines: starts the built kernel and speaks the protocol with it.
import { type ChildProcess, spawn } from "node:child_process";
import { randomBytes } from "node:crypto";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { Dealer, Subscriber } from "zeromq";
import { CHANNELS } from "../../../kernel/jupyter/connection.ts";
import { kernelCommandLine } from "../../../kernel/jupyter/installation.ts";
import { decode, type Json, type Message, Writer } from "../../../kernel/jupyter/message.ts";
import { command } from "./jupyter.ts";

async function freePorts(count: number): Promise<number[]> {
  const servers = await Promise.all(
    Array.from(
      { length: count },
      () =>
        new Promise<ReturnType<typeof createServer>>((settle) => {
          const server = createServer().listen(0, "127.0.0.1", () => settle(server));
        }),
    ),
  );
  return Promise.all(
    servers.map((server) => {
      const address = server.address();
      const port = typeof address === "object" && address ? address.port : 0;
      return new Promise<number>((settle) => server.close(() => settle(port)));
    }),
  );
}

/** Between two questions to a kernel that has not been heard yet. */
const ASK_AGAIN_ms = 150;
/** A kernel starts in less than a second on a machine that is free; one not heard by then is ended. */
const LONGEST_START_ms = 60_000;

export interface Ran {
  readonly reply: Json;
  /** Messages about the request, in order, without its states. */
  readonly outputs: readonly Message[];
}

export class Client {
  readonly process: ChildProcess;
  readonly key: string;
  readonly ports: Readonly<Record<string, number>>;
  readonly #shell = new Dealer({ linger: 0 });
  readonly #iopub = new Subscriber({ linger: 0 });
  /** The last request given to the shell socket, which takes one at a time. */
  #sent: Promise<void> = Promise.resolve();
  readonly #folder: string;
  readonly #writer: Writer;
  readonly #waiting = new Map<string, { outputs: Message[]; reply?: Json; done: (ran: Ran) => void }>();
  readonly #gone: Promise<void>;

  private constructor(
    process: ChildProcess,
    key: string,
    ports: Readonly<Record<string, number>>,
    folder: string,
  ) {
    this.process = process;
    this.#gone = new Promise((settle) => process.once("exit", () => settle()));
    this.key = key;
    this.ports = ports;
    this.#folder = folder;
    this.#writer = new Writer(key, `client-${ports.shell}`, () => "2000-01-01T00:00:00Z");
  }

  /** Start a kernel in a folder and wait until it answers. */
  static async start(cwd: string): Promise<Client> {
    for (let tries = 1; ; tries++) {
      const client = await Client.#started(cwd);
      if (await client.#isHeard()) return client;
      await client.close();
      // Another process may have taken a port between its being found free and the kernel's binding it.
      if (tries === 3) throw new Error(`the kernel ended ${tries} times before it answered`);
    }
  }

  static async #started(cwd: string): Promise<Client> {
    const folder = mkdtempSync(join(tmpdir(), "hingebook-client-"));
    const numbers = await freePorts(CHANNELS.length);
    const ports = Object.fromEntries(CHANNELS.map((channel, i) => [channel, numbers[i] ?? 0]));
    const key = randomBytes(16).toString("hex");
    const file = join(folder, "connection.json");
    const fields = Object.fromEntries(CHANNELS.map((channel) => [`${channel}_port`, ports[channel]]));
    writeFileSync(file, JSON.stringify({ transport: "tcp", ip: "127.0.0.1", key, ...fields }));
    const [node = "", ...words] = kernelCommandLine(process.execPath, command, file);
    const kernel = spawn(node, words, {
      cwd,
      stdio: ["ignore", "inherit", "inherit"],
      env: { ...process.env, JPY_PARENT_PID: String(process.pid) },
    });
    const client = new Client(kernel, key, ports, folder);
    client.#iopub.subscribe();
    client.#iopub.connect(`tcp://127.0.0.1:${ports.iopub}`);
    client.#shell.connect(`tcp://127.0.0.1:${ports.shell}`);
    void client.#listen(client.#shell, "reply");
    void client.#listen(client.#iopub, "output");
    return client;
  }

  /** Ask until an answer comes, however long the kernel takes to start: outputs sent before it knew of this client are
   *  lost, so one question may not be enough. False when the kernel has ended. */
  async #isHeard(): Promise<boolean> {
    const ended = this.#gone.then(() => false);
    const late = setTimeout(() => this.process.kill("SIGKILL"), LONGEST_START_ms);
    void ended.then(() => clearTimeout(late));
    for (let heard: boolean | undefined; ; ) {
      const asked = this.request("kernel_info_request", {}).then(() => true);
      asked.catch(() => undefined); // an unanswered question is given up with the socket
      heard = await Promise.race([asked, ended, this.#sent.then(() => sleep(ASK_AGAIN_ms, undefined))]);
      if (heard === undefined) continue;
      clearTimeout(late);
      return heard;
    }
  }

  async #listen(socket: Dealer | Subscriber, kind: "reply" | "output"): Promise<void> {
    for await (const frames of socket) this.#take(decode(frames, this.key), frames, kind);
  }

  #take(message: Message, frames: readonly Buffer[], kind: "reply" | "output"): void {
    const at = frames.findIndex((frame) => frame.toString() === "<IDS|MSG>");
    const parent = JSON.parse(String(frames[at + 3])) as { msg_id?: string };
    const waiting = this.#waiting.get(parent.msg_id ?? "");
    if (!waiting) return;
    if (kind === "reply") waiting.reply = message.content;
    else if (message.header.msg_type !== "status") waiting.outputs.push(message);
    else if (message.content.execution_state === "idle") {
      // The reply and the last state come over two sockets, in either order.
      const finish = (): void => {
        if (!waiting.reply) return void setTimeout(finish, 1);
        this.#waiting.delete(parent.msg_id ?? "");
        waiting.done({ reply: waiting.reply, outputs: waiting.outputs });
      };
      finish();
    }
  }

  /** Send a request on the shell channel; settles with its reply and outputs. */
  request(type: string, content: Json, metadata: Json = {}): Promise<Ran> {
    const frames = this.#writer.frames({ identities: [], type, parent: {}, content, metadata });
    const { msg_id } = JSON.parse(String(frames[2])) as { msg_id: string };
    return new Promise((done, fail) => {
      this.#waiting.set(msg_id, { outputs: [], done });
      this.#sent = this.#sent.then(() => this.#shell.send(frames)).catch(fail);
      void this.#gone.then(() => fail(new Error(`the kernel ended before it answered the ${type}`)));
    });
  }

  execute(code: string, more: Json = {}): Promise<Ran> {
    return this.request("execute_request", {
      code,
      silent: false,
      store_history: true,
      user_expressions: {},
      allow_stdin: false,
      stop_on_error: true,
      ...more,
    });
  }

  /** Ask the kernel to end; settles when its process is gone. */
  async close(): Promise<void> {
    const control = new Dealer({ linger: 500 });
    control.connect(`tcp://127.0.0.1:${this.ports.control}`);
    const frames = this.#writer.frames({
      identities: [],
      type: "shutdown_request",
      parent: {},
      content: { restart: false },
    });
    const asked = control.send(frames).catch(() => undefined); // of no use where the kernel has ended by itself
    await this.#gone;
    control.close();
    await asked;
    this.#shell.close();
    this.#iopub.close();
    rmSync(this.#folder, { recursive: true, force: true });
  }
}

/** The texts of one kind of output. */
export function textOf({ outputs }: Ran, type: string): string | undefined {
  const found = outputs.find(({ header }) => header.msg_type === type);
  const data = found?.content.data as Record<string, string> | undefined;
  return data?.["text/plain"];
}

/** All that was printed. */
export const printed = ({ outputs }: Ran): string =>
  outputs.map(({ header, content }) => (header.msg_type === "stream" ? String(content.text) : "")).join("");
