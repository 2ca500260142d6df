// The sockets of a kernel. The one file that imports zeromq, which is loaded when a kernel is served and not before.
//
// Behaviours leaned on (held by tests/kernel/jupyter/sockets.test.ts):
//   - a socket is an async iterable of its messages, each a list of frames;
//   - `send` on a router or publisher without a high-water mark is done at once, some hundred times in one turn of the
//     event loop; then it takes its time, and until that is over another `send` throws EBUSY;
//   - `maxMessageSize` drops the peer that sends more, not the socket;
//   - a router drops a message for a peer that is gone.
import { setImmediate as nextTurn } from "node:timers/promises";
import type { Publisher, Router } from "zeromq";
import { addressOf, type Channel, type Connection } from "./connection.ts";

export type Frames = readonly (Uint8Array | string)[];

/** Larger messages end the connection they come over: a notebook's cell is some hundred times smaller. */
const LARGEST_bytes = 64 * 1024 * 1024;

/** What one channel can do. */
export interface Port {
  receive(): AsyncIterable<readonly Uint8Array[]>;
  /** Send; done at once as a rule, also while a cell keeps this thread busy. */
  send(frames: Frames): void;
  /** Settles when all that was sent has been handed to the network. */
  flushed(): Promise<void>;
  close(): void;
}

const isBusy = (error: unknown): boolean => (error as { code?: string }).code === "EBUSY";

/** Sends at once for as long as the socket takes it, and what it does not take in turn. */
class Sender {
  readonly #socket: Router | Publisher;
  readonly #held: Frames[] = [];
  #last: Promise<void> = Promise.resolve();

  constructor(socket: Router | Publisher) {
    this.#socket = socket;
  }

  send(frames: Frames): void {
    if (this.#socket.closed) return;
    if (this.#held.length === 0 && this.#give(frames)) return;
    if (this.#held.push(frames) === 1) this.#last = this.#last.then(() => this.#release());
  }

  /** Whether the socket has taken it. */
  #give(frames: Frames): boolean {
    try {
      this.#last = this.#socket.send(frames as (Uint8Array | string)[]).catch(() => undefined); // the peer is gone
      return true;
    } catch (error) {
      if (isBusy(error)) return false;
      throw error;
    }
  }

  async #release(): Promise<void> {
    for (let [next] = this.#held; next && !this.#socket.closed; [next] = this.#held) {
      if (this.#give(next)) this.#held.shift();
      await nextTurn();
    }
  }

  async flushed(): Promise<void> {
    while (this.#held.length > 0 && !this.#socket.closed) await nextTurn();
    await this.#last;
  }
}

function portOf(socket: Router | Publisher): Port {
  const sender = new Sender(socket);
  return {
    receive: () => socket as unknown as AsyncIterable<readonly Uint8Array[]>,
    send: (frames) => sender.send(frames),
    flushed: () => sender.flushed(),
    close: () => socket.close(),
  };
}

/** Open and bind one channel's socket. Throws where the address is taken. The heartbeat's is a router too: a reply socket
 *  wants its messages in one form and stops at others. */
export async function openPort(connection: Connection, channel: Channel): Promise<Port> {
  const zmq = await import("zeromq");
  const options = { linger: 500, sendHighWaterMark: 0, maxMessageSize: LARGEST_bytes };
  const socket =
    channel === "iopub"
      ? new zmq.Publisher(options)
      : new zmq.Router({ ...options, mandatory: false, handover: true });
  const address = addressOf(connection, channel);
  try {
    await socket.bind(address);
  } catch (cause) {
    throw new Error(`the ${channel} channel cannot be bound to ${address}: ${(cause as Error).message}`, {
      cause,
    });
  }
  return portOf(socket);
}
