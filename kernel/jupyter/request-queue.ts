// Requests in the order they came, one at a time.
import { setTimeout as sleep } from "node:timers/promises";
import type { Message } from "./message.ts";

/** How long requests sent together may be apart when the first of them fails. */
const TOGETHER_ms = 20;

export interface Queued {
  readonly message: Message;
  aborted: boolean;
}

export class RequestQueue {
  readonly #waiting: Queued[] = [];
  #wake: (() => void) | undefined;
  #closed = false;

  add(message: Message): void {
    this.#waiting.push({ message, aborted: false });
    this.#wake?.();
  }

  /** The next request; nothing once the queue is closed. */
  async next(): Promise<Queued | undefined> {
    while (this.#waiting.length === 0 && !this.#closed) {
      await new Promise<void>((settle) => {
        this.#wake = settle;
      });
    }
    return this.#closed ? undefined : this.#waiting.shift();
  }

  /** Abort the executions that were sent before the front end could know of a failure, those on their way included. */
  async abort(): Promise<void> {
    for (let before = -1; before !== this.#waiting.length; ) {
      before = this.#waiting.length;
      await sleep(TOGETHER_ms);
    }
    for (const queued of this.#waiting)
      if (queued.message.header.msg_type === "execute_request") queued.aborted = true;
  }

  close(): void {
    this.#closed = true;
    this.#wake?.();
  }
}
