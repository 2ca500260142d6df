// Runs text in V8's REPL mode, in a context of its own. The one file that imports the inspector.
//
// Behaviours leaned on (held by tests/kernel/evaluate.test.ts):
//   - `Runtime.enable` reports every context with the name it was made with, and its id stays good after `disable`;
//   - `Runtime.evaluate` with `replMode` lets `let` follow `let` across calls in one binding, seen by earlier closures;
//     when the new initialiser throws, the old value stays; a name that never got a value is "not defined";
//   - a `"use strict"` at the head holds for the whole text, also with a top-level `await`;
//   - `awaitPromise` waits for the end of a text with a top-level `await`, and reports its rejection;
//   - `//# sourceURL=` names the text in stack traces;
//   - `Runtime.callFunctionOn` hands over the very object that was thrown;
//   - `exceptionDetails` of a text that does not compile carries a script id, line and column (from 0);
//   - `Runtime.terminateExecution`, sent by another thread, ends a loop below `Runtime.evaluate`, which then fails with
//     "Execution was terminated"; a loop after an `await` or in a timer ends too, but `evaluate` is never answered;
//     names keep their values (held by tests/kernel/jupyter/protocol_suite.py).
import { Session as Inspector } from "node:inspector";
import { createContext } from "node:vm";
import type { Position } from "./position.ts";

/** What became of a text. A thrown value is the very object, whatever it is; `at` is where a text does not compile. */
export type Outcome =
  | { readonly ok: true }
  | { readonly ok: false; readonly thrown: unknown; readonly at?: Position; readonly terminated?: true };

interface RemoteObject {
  readonly type: string;
  readonly subtype?: string;
  readonly className?: string;
  readonly value?: unknown;
  readonly unserializableValue?: string;
  readonly objectId?: string;
}

interface ExceptionDetails {
  readonly text: string;
  readonly lineNumber: number;
  readonly columnNumber: number;
  readonly scriptId?: string;
  readonly exception?: RemoteObject;
}

interface Evaluated {
  readonly result: RemoteObject;
  readonly exceptionDetails?: ExceptionDetails;
}

const TERMINATED = "Execution was terminated";

let made = 0;
let runs = 0;

/** A V8 context with REPL mode. `globals` becomes its global object. Close it when done. */
export class Evaluator {
  readonly context: object;
  readonly #inspector = new Inspector();
  readonly #name = `hingebook ${++made}`;
  #contextId = 0;
  #hook = "";
  #taken: unknown;

  private constructor(globals: object) {
    this.context = createContext(globals, { name: this.#name });
  }

  /** Make a context and connect to it. */
  static async open(globals: object): Promise<Evaluator> {
    const evaluator = new Evaluator(globals);
    await evaluator.#connect();
    return evaluator;
  }

  async #connect(): Promise<void> {
    const inspector = this.#inspector;
    inspector.connect();
    inspector.on("Runtime.executionContextCreated", ({ params }) => {
      if (params.context.name === this.#name) this.#contextId = params.context.id;
    });
    await this.#post("Runtime.enable");
    await this.#post("Runtime.disable"); // left on, it would keep every console message
    if (this.#contextId === 0) throw new Error("the JavaScript engine did not report the notebook's context");
    Object.defineProperty(this.context, "__take", {
      configurable: true,
      value: (value: unknown) => {
        this.#taken = value;
      },
    });
    const hook = await this.#post<Evaluated>("Runtime.evaluate", {
      expression: "globalThis.__take",
      contextId: this.#contextId,
    });
    this.#hook = hook.result.objectId ?? "";
    Reflect.deleteProperty(this.context, "__take");
  }

  #post<Reply>(method: string, parameters: object = {}): Promise<Reply> {
    return new Promise((settle, fail) => {
      this.#inspector.post(method, parameters, (error: Error | null, reply?: object) => {
        if (error) fail(error);
        else settle(reply as Reply);
      });
    });
  }

  /** Run a text to its end. `name` stands for it in stack traces. */
  async run(code: string, name: string): Promise<Outcome> {
    const objectGroup = `hingebook ${++runs}`;
    let reply: Evaluated;
    try {
      reply = await this.#post<Evaluated>("Runtime.evaluate", {
        expression: `${code}\n//# sourceURL=${name}`,
        contextId: this.#contextId,
        objectGroup,
        replMode: true,
        awaitPromise: true,
      });
    } catch (error) {
      if (!(error as Error).message.includes(TERMINATED)) throw error;
      return { ok: false, thrown: error, terminated: true };
    }
    const details = reply.exceptionDetails;
    try {
      if (!details) return { ok: true };
      const thrown = await this.#value(details.exception, details.text);
      const compiling = details.scriptId !== undefined && details.exception?.className === "SyntaxError";
      if (!compiling) return { ok: false, thrown };
      return { ok: false, thrown, at: { line: details.lineNumber + 1, column: details.columnNumber + 1 } };
    } finally {
      await this.#post("Runtime.releaseObjectGroup", { objectGroup });
    }
  }

  async #value(remote: RemoteObject | undefined, otherwise: string): Promise<unknown> {
    if (!remote) return otherwise;
    if (remote.objectId !== undefined) return this.#take(remote.objectId);
    if (remote.subtype === "null") return null;
    if (remote.unserializableValue === undefined) return remote.value;
    const text = remote.unserializableValue;
    return remote.type === "bigint" ? BigInt(text.slice(0, -1)) : Number(text);
  }

  async #take(objectId: string): Promise<unknown> {
    await this.#post("Runtime.callFunctionOn", {
      objectId: this.#hook,
      functionDeclaration: "function (value) { this(value); }",
      arguments: [{ objectId }],
    });
    const taken = this.#taken;
    this.#taken = undefined;
    return taken;
  }

  close(): void {
    this.#inspector.disconnect();
  }
}
