// Heartbeat and control: sockets in a thread of their own, so that a kernel kept busy by a cell is known to be alive
// and can be interrupted, restarted and shut down. This is the side of the thread that runs cells.
import { Worker } from "node:worker_threads";
import type { Activity } from "../interruption.ts";
import type { Connection } from "./connection.ts";
import type { Json } from "./message.ts";

/** What the lifeline's thread is given. */
export interface LifelineParts {
  readonly connection: Connection;
  readonly name: string;
  readonly info: Json;
  /** `Activity.shared`. */
  readonly activity: SharedArrayBuffer;
  /** Set to the number of the last interrupt this side has seen. */
  readonly seen: SharedArrayBuffer;
}

export type FromLifeline =
  | { readonly kind: "ready" }
  | { readonly kind: "failed"; readonly message: string }
  | { readonly kind: "interrupt"; readonly id: number; readonly run: number }
  | { readonly kind: "shutdown" };

export interface Lifeline {
  /** End the thread; settles when its sockets are closed. */
  close(): Promise<void>;
}

export interface LifelineOptions extends Omit<LifelineParts, "activity" | "seen"> {
  readonly activity: Activity;
  /** Told with `Activity.run` as it was when the interrupt came. */
  readonly onInterrupt: (run: number) => void;
  readonly onShutdown: () => void;
}

/** The thread's own file, beside the bundle this one is in. */
const THREAD = new URL("./lifeline-thread.js", import.meta.url);

/** Start heartbeat and control. Settles once both are bound; rejects where an address is taken. */
export function startLifeline(options: LifelineOptions): Promise<Lifeline> {
  const { connection, name, info, activity, onInterrupt, onShutdown } = options;
  const seen = new SharedArrayBuffer(Int32Array.BYTES_PER_ELEMENT);
  const parts: LifelineParts = { connection, name, info, activity: activity.shared, seen };
  const thread = new Worker(THREAD, { workerData: parts });
  // The thread closes its sockets itself; ended from outside, it would leave them in the middle of something.
  const closing = (): Promise<void> =>
    new Promise((settle) => {
      thread.once("exit", () => settle());
      thread.postMessage("close");
    });
  return new Promise((settle, fail) => {
    thread.on("error", fail);
    thread.on("message", (message: FromLifeline) => {
      if (message.kind === "ready") settle({ close: closing });
      else if (message.kind === "failed") fail(new Error(message.message));
      else if (message.kind === "shutdown") onShutdown();
      else {
        Atomics.store(new Int32Array(seen), 0, message.id);
        onInterrupt(message.run);
      }
    });
  });
}
