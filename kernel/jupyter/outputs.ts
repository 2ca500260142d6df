// What a kernel tells everyone who listens: its state, and the outputs of the request it is at.
// Source: Messaging in Jupyter, "Messages on the IOPub channel".
import type { OutputEvent } from "../session.ts";
import type { Json, Writer } from "./message.ts";
import type { Port } from "./sockets.ts";

type StreamName = "stdout" | "stderr";

/** Text printed in quick succession goes out as one message. */
const TOGETHER_ms = 40;
const TOGETHER_chars = 32_768;

export class Outputs {
  readonly #port: Port;
  readonly #writer: Writer;
  #parent: Json = {};
  #muted = false;
  #held: { readonly name: StreamName; text: string } | undefined;
  #sent_ms = Number.NEGATIVE_INFINITY;
  #timer: ReturnType<typeof setTimeout> | undefined;

  constructor(port: Port, writer: Writer) {
    this.#port = port;
    this.#writer = writer;
  }

  /** From now on outputs belong to this request; `muted` ones are dropped, apart from the state. */
  answer(parent: Json, { muted }: { readonly muted: boolean }): void {
    this.flush();
    this.#parent = parent;
    this.#muted = muted;
  }

  state(state: "starting" | "busy" | "idle", parent: Json): void {
    this.flush();
    this.#send("status", { execution_state: state }, parent);
  }

  /** Publish a message about the present request. Throws where the content cannot be written as JSON. */
  publish(type: string, content: Json): void {
    if (this.#muted) return;
    this.flush();
    this.#send(type, content, this.#parent);
  }

  #send(type: string, content: Json, parent: Json): void {
    const topic = type === "stream" ? `stream.${String(content.name)}` : type;
    this.#port.send(this.#writer.frames({ identities: [topic], type, parent, content }));
  }

  stream(name: StreamName, text: string): void {
    if (this.#muted || text === "") return;
    if (this.#held && this.#held.name !== name) this.flush();
    this.#held ??= { name, text: "" };
    this.#held.text += text;
    const due = performance.now() - this.#sent_ms > TOGETHER_ms;
    if (due || this.#held.text.length > TOGETHER_chars) this.flush();
    else this.#timer ??= setTimeout(() => this.flush(), TOGETHER_ms);
  }

  /** Send what is held back. */
  flush(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
    const held = this.#held;
    if (!held) return;
    this.#held = undefined;
    this.#sent_ms = performance.now();
    this.#send("stream", { name: held.name, text: held.text }, this.#parent);
  }

  /** Publish what a cell prints or shows before it ends. Errors outside any cell are printed. */
  event(event: OutputEvent): void {
    if (event.kind === "stream") this.stream(event.name, event.text);
    else if (event.kind === "stray") this.stream("stderr", `${event.failure.traceback.join("\n")}\n`);
    else if (event.kind === "clear") this.publish("clear_output", { wait: event.wait });
    else {
      const { data, id, update } = event;
      this.publish(update ? "update_display_data" : "display_data", {
        data,
        metadata: {},
        transient: { display_id: id },
      });
    }
  }
}
