// What a cell finds besides the language itself: a console, timers, and a few standard helpers. Not there on purpose:
// `process`, `Buffer`, `require` (import them from "node:process", "node:buffer", "node:module"), and `fetch`
// (a calculation must give the same answer without a network). check/globals-declaration.ts declares the same names.
import { Console } from "node:console";
import { Writable } from "node:stream";
import { runInContext } from "node:vm";
import type { CellDisplay } from "./cell-display.ts";
import type { Activity } from "./interruption.ts";
import { RUNNER } from "./rewrite/index.ts";

export interface CellGlobals {
  readonly globals: Record<string, unknown>;
  /** Stop every timer a cell has started, or those started in a run up to a number. */
  readonly clearTimers: (upTo?: number) => void;
}

export interface CellHooks {
  readonly write: (stream: "stdout" | "stderr", text: string) => void;
  /** Something thrown by a timer's callback, outside any cell. */
  readonly stray: (thrown: unknown) => void;
  /** Told when a timer's callback is at work. */
  readonly activity: Activity;
  readonly shows: CellDisplay["globals"];
}

function sink(write: (text: string) => void): Writable {
  return new Writable({
    decodeStrings: false,
    write(chunk: unknown, _encoding, done) {
      write(String(chunk));
      done();
    },
  });
}

function cellConsole({ write }: CellHooks): object {
  const inner = new Console({
    stdout: sink((text) => write("stdout", text)),
    stderr: sink((text) => write("stderr", text)),
    colorMode: false,
    inspectOptions: { breakLength: 100 },
  });
  const methods: Record<string, unknown> = {};
  for (const [name, value] of Object.entries(inner)) if (typeof value === "function") methods[name] = value;
  return Object.freeze(methods);
}

type Callback = (...values: unknown[]) => void;
type Handle = ReturnType<typeof setTimeout> | ReturnType<typeof setImmediate>;

function cellTimers({ stray, activity }: CellHooks): {
  timers: Record<string, unknown>;
  clearTimers: CellGlobals["clearTimers"];
} {
  /** Each with the number of the run it was started in. */
  const running = new Map<Handle, number>();
  const add = (handle: Handle): Handle => {
    running.set(handle, Math.abs(activity.run));
    return handle;
  };
  const guarded =
    (callback: unknown, name: string): Callback =>
    (...values) => {
      try {
        if (typeof callback !== "function")
          throw new TypeError(`${name}: the first argument must be a function`);
        activity.enter();
        callback(...values);
      } catch (thrown) {
        stray(thrown);
      } finally {
        activity.leave();
      }
    };
  const once = (callback: unknown, delay?: number, ...values: unknown[]): Handle => {
    const handle = setTimeout(() => {
      running.delete(handle);
      guarded(callback, "setTimeout")(...values);
    }, delay);
    return add(handle);
  };
  const repeated = (callback: unknown, delay?: number, ...values: unknown[]): Handle => {
    const handle = setInterval(guarded(callback, "setInterval"), delay, ...values);
    return add(handle);
  };
  const soon = (callback: unknown, ...values: unknown[]): Handle => {
    const handle = setImmediate(() => {
      running.delete(handle);
      guarded(callback, "setImmediate")(...values);
    });
    return add(handle);
  };
  const stop = (handle?: Handle): void => {
    if (handle === undefined) return;
    running.delete(handle);
    clearTimeout(handle as ReturnType<typeof setTimeout>);
    clearImmediate(handle as ReturnType<typeof setImmediate>);
  };
  return {
    timers: {
      setTimeout: once,
      setInterval: repeated,
      setImmediate: soon,
      clearTimeout: stop,
      clearInterval: stop,
      clearImmediate: stop,
      queueMicrotask: (callback: unknown) => queueMicrotask(() => guarded(callback, "queueMicrotask")()),
    },
    clearTimers: (upTo = Number.POSITIVE_INFINITY) => {
      for (const [handle, run] of [...running]) if (run <= upTo) stop(handle);
    },
  };
}

const standard = {
  structuredClone,
  performance,
  URL,
  URLSearchParams,
  TextEncoder,
  TextDecoder,
  AbortController,
  AbortSignal,
  Event,
  EventTarget,
  atob,
  btoa,
};

/** A calculation is run again by others, who are not there to answer. */
function input(): never {
  throw new Error(
    'a cell cannot ask for input; write the value in the notebook, for example sheet.given("g", "5 kN/m"), and set another from outside with hingebook run --set g="6 kN/m"',
  );
}

/** The globals of one session's cells. */
export function cellGlobals(hooks: CellHooks): CellGlobals {
  const { timers, clearTimers } = cellTimers(hooks);
  const { shows } = hooks;
  return { globals: { ...standard, ...timers, ...shows, input, console: cellConsole(hooks) }, clearTimers };
}

/** Built-ins that cells compare with `instanceof`: values made outside the context must pass too. */
const BRIDGED = [
  "Object Function Array Map Set WeakMap WeakSet Date RegExp Promise ArrayBuffer DataView",
  "Error EvalError RangeError ReferenceError SyntaxError TypeError URIError AggregateError",
  "Int8Array Uint8Array Uint8ClampedArray Int16Array Uint16Array Int32Array Uint32Array",
  "Float32Array Float64Array BigInt64Array BigUint64Array",
]
  .join(" ")
  .split(" ");

const BRIDGE = `(own, outside) => {
  const ordinary = Function.prototype[Symbol.hasInstance];
  Object.defineProperty(own, Symbol.hasInstance, {
    value(value) { return ordinary.call(this, value) || (this === own && ordinary.call(outside, value)); },
  });
}`;

/** Let `error instanceof Error` in a cell hold for an error the library threw, and so on for the other built-ins. */
export function bridgeBuiltIns(context: object): void {
  const bridge = runInContext(BRIDGE, context) as (own: unknown, outside: unknown) => void;
  const outer = globalThis as unknown as Record<string, unknown>;
  for (const name of BRIDGED) bridge(runInContext(name, context), outer[name]);
}

/** Text that makes the global names lexical ones, which V8 reads some twenty times faster than a context's globals. */
export function prologue(context: object): string {
  const names = runInContext("Object.getOwnPropertyNames(globalThis)", context) as string[];
  const constant = new Set(["globalThis", "undefined", "NaN", "Infinity", "eval", RUNNER, "babelHelpers"]);
  const plain = names.filter((name) => !constant.has(name));
  return `let ${[RUNNER, "babelHelpers", ...plain].map((name) => `${name} = globalThis.${name}`).join(", ")};`;
}

/** What compiled decorators call: last decorator first, an answer replaces what it was given. Source: TypeScript's
 *  description of experimental decorators. */
export const decoratorHelpers: object = Object.freeze({
  decorate(decorators: unknown[], target: object, key?: PropertyKey, description?: unknown): unknown {
    const onMember = key !== undefined;
    const described =
      onMember && description === null ? Object.getOwnPropertyDescriptor(target, key) : undefined;
    let result: unknown = onMember ? described : target;
    for (const decorator of decorators.toReversed()) {
      if (typeof decorator !== "function") throw new TypeError("a decorator must be a function");
      const answer = onMember ? decorator(target, key, result) : decorator(result);
      result = answer ?? result;
    }
    if (onMember && result) Object.defineProperty(target, key, result as PropertyDescriptor);
    return result;
  },
  decorateParam(
    index: number,
    decorator: (target: object, key: PropertyKey | undefined, at: number) => void,
  ): unknown {
    return (target: object, key?: PropertyKey) => decorator(target, key, index);
  },
});
