// The thread of heartbeat and control. An interrupt is first told to the thread that runs cells, which cuts off what
// waits; if that thread does not look up, it is in a loop, and the loop is ended by force.
//
// Behaviours leaned on (held by tests/kernel/jupyter/protocol_suite.py):
//   - `connectToMainThread` reaches the other thread's inspector while that thread is busy, and `terminateExecution`
//     ends what it is at; node's flag --no-force-async-hooks-checks keeps a callback ended in this way from ending the
//     process.
import { Session as Inspector } from "node:inspector";
import { setTimeout as sleep } from "node:timers/promises";
import { parentPort, workerData } from "node:worker_threads";
import { Activity } from "../interruption.ts";
import type { FromLifeline, LifelineParts } from "./lifeline.ts";
import { decode, type Json, type Message, Refusal, Writer } from "./message.ts";
import { openPort, type Port } from "./sockets.ts";

/** How long the other thread may take to look up: a cell's longest pause in a healthy kernel is far shorter. */
const PATIENCE_ms = 80;
/** How long it may be busy with something that is not known to be a cell's. */
const LONG_PATIENCE_ms = 2000;
/** How long a kernel may take to end by itself. */
const FAREWELL_ms = 2000;
const LOOK_ms = 2000;

const { connection, name, info, activity: shared, seen } = workerData as LifelineParts;
const activity = new Activity(shared);
const seenState = new Int32Array(seen);
const tell = (message: FromLifeline): void => parentPort?.postMessage(message);
const writer = new Writer(connection.key, `${name}-control`, () => new Date().toISOString());
const timers: NodeJS.Timeout[] = [];
let interrupts = 0;

function terminate(): Promise<void> {
  const inspector = new Inspector();
  inspector.connectToMainThread();
  return new Promise((settle) => {
    inspector.post("Runtime.terminateExecution", () => {
      inspector.disconnect();
      settle();
    });
  });
}

async function interrupt(): Promise<void> {
  const id = ++interrupts;
  const { run } = activity;
  const looked = (): boolean => Atomics.load(seenState, 0) >= id;
  tell({ kind: "interrupt", id, run });
  for (let waited = 0; waited < LONG_PATIENCE_ms; waited += PATIENCE_ms) {
    await sleep(PATIENCE_ms);
    if (looked()) return;
    if (activity.atWork) await terminate();
  }
  while (!looked()) {
    await terminate();
    await sleep(PATIENCE_ms);
  }
}

function shutdown(): void {
  tell({ kind: "shutdown" });
  timers.push(setTimeout(() => process.kill(process.pid, "SIGKILL"), FAREWELL_ms));
}

function answer({ header, content }: Message): Json {
  switch (header.msg_type) {
    case "interrupt_request":
      void interrupt();
      return { status: "ok" };
    case "shutdown_request":
      shutdown();
      return { status: "ok", restart: content.restart === true };
    case "kernel_info_request":
      return info;
    default:
      return {
        status: "error",
        ename: "UnknownRequest",
        evalue: `the control channel does not know "${header.msg_type}"; it knows interrupt_request, shutdown_request and kernel_info_request`,
        traceback: [],
      };
  }
}

function reply(port: Port, frames: readonly Uint8Array[]): void {
  const message = decode(frames, connection.key);
  const { identities, header } = message;
  if (!header.msg_type.endsWith("_request")) return;
  const type = header.msg_type.replace(/_request$/, "_reply");
  port.send(writer.frames({ identities, type, parent: header, content: answer(message) }));
}

async function control(port: Port): Promise<void> {
  for await (const frames of port.receive()) {
    try {
      reply(port, frames);
    } catch (error) {
      if (!(error instanceof Refusal)) throw error; // a foreign message is dropped
    }
  }
}

async function heartbeat(port: Port): Promise<void> {
  for await (const frames of port.receive()) port.send(frames);
}

function isAlive(process_id: number): boolean {
  try {
    process.kill(process_id, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code !== "ESRCH";
  }
}

/** A kernel whose front end is gone ends too, if the front end has asked for it as Jupyter's do. */
function watchParent(): void {
  const asked = Number(process.env.JPY_PARENT_PID);
  if (!Number.isInteger(asked) || asked <= 0) return;
  const parent = process.ppid;
  // A front end that went while this process was starting has left it to another parent.
  const wasGone = parent !== asked && !isAlive(asked);
  timers.push(
    setInterval(() => {
      if (wasGone || process.ppid !== parent) shutdown();
    }, LOOK_ms),
  );
}

try {
  const [beats, orders] = [await openPort(connection, "hb"), await openPort(connection, "control")];
  parentPort?.once("message", () => {
    for (const timer of timers) clearInterval(timer);
    void orders.flushed().then(() => {
      beats.close();
      orders.close();
    });
  });
  void heartbeat(beats);
  void control(orders);
  watchParent();
  tell({ kind: "ready" });
} catch (error) {
  tell({ kind: "failed", message: (error as Error).message });
}
