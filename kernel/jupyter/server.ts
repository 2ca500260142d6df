// A kernel: answers the requests of a front end, in the order they come.
// Source: Jupyter client documentation, "Messaging in Jupyter" 5.3.

import { setImmediate as nextTurn } from "node:timers/promises";
import { Activity } from "../interruption.ts";
import type { Library } from "../library.ts";
import { librarySession } from "../library-session.ts";
import type { Session } from "../session.ts";
import type { Connection } from "./connection.ts";
import { Execution } from "./execution.ts";
import { kernelInfo } from "./kernel-info.ts";
import { completeness, Language } from "./language.ts";
import { type Lifeline, startLifeline } from "./lifeline.ts";
import { decode, type Json, type Message, Refusal, Writer } from "./message.ts";
import { Outputs } from "./outputs.ts";
import { type Queued, RequestQueue } from "./request-queue.ts";
import { charactersBefore, readCode, readExecute, readHistory, readPlace, WrongRequest } from "./requests.ts";
import { openPort, type Port } from "./sockets.ts";
import { guardStreams } from "./standard-streams.ts";

export interface ServeOptions {
  readonly connection: Connection;
  /** Where the notebook lies. */
  readonly folder: string;
  /** Its file name, where the front end tells it. */
  readonly notebook?: string;
  readonly version: string;
  readonly library: () => Promise<Library>;
}

interface Parts {
  readonly shell: Port;
  readonly outputs: Outputs;
  readonly writer: Writer;
  readonly session: Session;
  readonly language: Language;
  readonly changed: (value: unknown) => readonly string[];
  readonly info: Json;
  readonly key: string;
}

class Kernel {
  readonly queue: RequestQueue = new RequestQueue();
  readonly #parts: Parts;
  readonly #execution: Execution;

  constructor(parts: Parts) {
    this.#parts = parts;
    this.#execution = new Execution(parts.session, parts.outputs, parts.changed);
  }

  /** Take in requests as they arrive; foreign ones are dropped. */
  async receive(): Promise<void> {
    for await (const frames of this.#parts.shell.receive()) {
      try {
        this.queue.add(decode(frames, this.#parts.key));
      } catch (error) {
        if (!(error instanceof Refusal)) throw error;
      }
    }
  }

  /** Answer requests until the queue is closed. */
  async work(): Promise<void> {
    for (let next = await this.queue.next(); next; next = await this.queue.next()) {
      await this.#handle(next);
      await nextTurn(); // other threads and sockets have theirs
    }
  }

  #reply({ identities, header }: Message, content: Json): void {
    const type = header.msg_type.replace(/_request$/, "_reply");
    const { shell, writer } = this.#parts;
    shell.send(writer.frames({ identities, type, parent: header, content }));
  }

  async #handle({ message, aborted }: Queued): Promise<void> {
    const { header } = message;
    const { outputs, language } = this.#parts;
    outputs.answer(header, { muted: false });
    outputs.state("busy", header);
    language.pause();
    try {
      const content = aborted ? { status: "aborted" } : await this.#answer(message);
      if (content) this.#reply(message, content);
    } catch (error) {
      if (header.msg_type.endsWith("_request")) this.#reply(message, refusal(error));
    }
    outputs.state("idle", header);
    language.rest();
  }

  async #answer(message: Message): Promise<Json | undefined> {
    const { info, language, session } = this.#parts;
    switch (message.header.msg_type) {
      case "kernel_info_request":
        return info;
      case "execute_request":
        return this.#execute(message);
      case "complete_request": {
        const place = readPlace(message);
        const { matches, start, end } = await language.complete(session.sources, place);
        const [cursor_start, cursor_end] = [start, end].map((at) => charactersBefore(place.code, at));
        return { status: "ok", matches, cursor_start, cursor_end, metadata: {} };
      }
      case "inspect_request": {
        const text = await language.inspect(session.sources, readPlace(message));
        const data = text === undefined ? {} : { "text/plain": text };
        return { status: "ok", found: text !== undefined, data, metadata: {} };
      }
      case "is_complete_request":
        return { ...(await completeness(language, readCode(message))) };
      case "history_request":
        return { status: "ok", history: this.#execution.log.rows(readHistory(message)) };
      case "comm_info_request":
        return { status: "ok", comms: {} };
      default:
        return this.#other(message);
    }
  }

  async #execute(message: Message): Promise<Json> {
    const request = readExecute(message);
    const { outputs } = this.#parts;
    outputs.answer(message.header, { muted: request.silent });
    const { reply, abort } = await this.#execution.run(request);
    outputs.flush();
    if (abort) await this.queue.abort();
    return reply;
  }

  #other({ header, content }: Message): undefined {
    const { msg_type: type } = header;
    if (type === "comm_open") {
      // Comms join widgets of a front end to a kernel; this kernel has none.
      this.#parts.outputs.publish("comm_close", { comm_id: content.comm_id ?? "", data: {} });
    } else if (type.endsWith("_request")) {
      throw new WrongRequest(`"${type}" is not a request this kernel knows`);
    }
    return undefined;
  }
}

const refusal = (error: unknown): Json => {
  const { name, message } = error as Error;
  return { status: "error", ename: name, evalue: message, traceback: [`${name}: ${message}`] };
};

/** Serve one notebook until the front end ends it. Rejects where a channel cannot be bound. */
export async function serve(options: ServeOptions): Promise<void> {
  const { connection, folder, notebook, version, library } = options;
  const name = `hingebook-${process.pid}`;
  const now = (): string => new Date().toISOString();
  const writer = new Writer(connection.key, name, now);
  const info = kernelInfo(version);
  const activity = new Activity();
  const iopub = await openPort(connection, "iopub");
  const stdin = await openPort(connection, "stdin");
  const shell = await openPort(connection, "shell");
  const outputs = new Outputs(iopub, writer);
  outputs.state("starting", {});
  const {
    session,
    library: loading,
    changed,
  } = librarySession({
    folder,
    overrides: new Map(),
    library,
    activity,
    onOutput: (event) => outputs.event(event),
    ...(notebook === undefined ? {} : { notebook }),
  });
  session.foresee([""]); // starts the compiler while the front end is still connecting
  session.warm();
  loading.catch(() => undefined); // the first cell that imports it reports it
  const language = new Language();
  const kernel = new Kernel({
    shell,
    outputs,
    writer,
    session,
    language,
    changed,
    info,
    key: connection.key,
  });
  const restore = guardStreams((stream, text) => outputs.stream(stream, text));
  process.on("SIGINT", () => session.interrupt());
  process.on("uncaughtException", (error) => session.stray(error)); // of what a package has left behind
  let lifeline: Lifeline | undefined;
  const ended = new Promise<void>((settle) => {
    const parts = {
      connection,
      name,
      info,
      activity,
      onInterrupt: (run: number) => session.interrupt(run),
      onShutdown: settle,
    };
    startLifeline(parts).then(
      (it) => {
        lifeline = it;
      },
      (error: Error) => {
        process.stderr.write(`hingebook: ${error.message}\n`);
        settle();
      },
    );
  });
  void kernel.receive();
  void kernel.work();
  await ended;
  restore();
  kernel.queue.close();
  session.interrupt();
  await Promise.all([iopub.flushed(), shell.flushed()]);
  for (const port of [iopub, shell, stdin]) port.close();
  await Promise.all([session.close(), language.close()]);
  await lifeline?.close();
}
