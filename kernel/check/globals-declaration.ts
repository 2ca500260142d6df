// The declarations of what kernel/globals.ts gives a cell, for the type checker. Used when the cells import nothing of
// Node's own; when they do, Node's declarations, which hold all of these, take their place.

/** Those that Node does not have: they are declared beside Node's own declarations too. */
export const OWN_GLOBALS: string = `
/** Shows a value now, before the cell has ended; \`update\` of the answer fills the same place anew. */
declare function display(value: unknown): { update(value: unknown): void };
/** Clears what the cell has shown so far; with \`wait\` when the next output comes. */
declare function clearOutput(options?: { readonly wait?: boolean }): void;
/** Not available in a calculation: throws. */
declare function input(question?: string): never;
`;

export const GLOBALS_DECLARATION: string = `
interface Console {
  assert(condition?: unknown, ...values: unknown[]): void;
  count(label?: string): void;
  countReset(label?: string): void;
  debug(...values: unknown[]): void;
  dir(value: unknown, options?: object): void;
  error(...values: unknown[]): void;
  group(...values: unknown[]): void;
  groupCollapsed(...values: unknown[]): void;
  groupEnd(): void;
  info(...values: unknown[]): void;
  log(...values: unknown[]): void;
  table(rows: unknown, columns?: readonly string[]): void;
  time(label?: string): void;
  timeEnd(label?: string): void;
  timeLog(label?: string, ...values: unknown[]): void;
  trace(...values: unknown[]): void;
  warn(...values: unknown[]): void;
}
declare var console: Console;
interface Timer { ref(): this; unref(): this; hasRef(): boolean; }
declare function setTimeout(callback: (_: void) => void, delay?: number): Timer;
declare function setTimeout<A extends unknown[]>(callback: (...values: A) => void, delay?: number, ...values: A): Timer;
declare function setInterval(callback: (_: void) => void, delay?: number): Timer;
declare function setInterval<A extends unknown[]>(callback: (...values: A) => void, delay?: number, ...values: A): Timer;
declare function setImmediate(callback: (_: void) => void): Timer;
declare function setImmediate<A extends unknown[]>(callback: (...values: A) => void, ...values: A): Timer;
declare function clearTimeout(timer?: Timer): void;
declare function clearInterval(timer?: Timer): void;
declare function clearImmediate(timer?: Timer): void;
declare function queueMicrotask(callback: () => void): void;
declare function structuredClone<T>(value: T): T;
declare function atob(text: string): string;
declare function btoa(text: string): string;
${OWN_GLOBALS}
declare var performance: { now(): number; readonly timeOrigin: number };
interface URLSearchParams extends Iterable<[string, string]> {
  append(name: string, value: string): void;
  delete(name: string): void;
  get(name: string): string | null;
  getAll(name: string): string[];
  has(name: string): boolean;
  set(name: string, value: string): void;
  toString(): string;
}
declare var URLSearchParams: { new (init?: string | Record<string, string> | Iterable<[string, string]>): URLSearchParams };
interface URL {
  hash: string; host: string; hostname: string; href: string; readonly origin: string; password: string;
  pathname: string; port: string; protocol: string; search: string; readonly searchParams: URLSearchParams;
  username: string; toString(): string; toJSON(): string;
}
declare var URL: { new (url: string | URL, base?: string | URL): URL; canParse(url: string, base?: string): boolean };
interface TextEncoder { readonly encoding: string; encode(text?: string): Uint8Array; }
declare var TextEncoder: { new (): TextEncoder };
interface TextDecoder { readonly encoding: string; decode(bytes?: ArrayBuffer | ArrayBufferView): string; }
declare var TextDecoder: { new (label?: string, options?: { fatal?: boolean; ignoreBOM?: boolean }): TextDecoder };
interface Event { readonly type: string; readonly target: EventTarget | null; preventDefault(): void; }
declare var Event: { new (type: string): Event };
interface EventTarget {
  addEventListener(type: string, listener: (event: Event) => void, options?: { once?: boolean; signal?: AbortSignal }): void;
  removeEventListener(type: string, listener: (event: Event) => void): void;
  dispatchEvent(event: Event): boolean;
}
declare var EventTarget: { new (): EventTarget };
interface AbortSignal extends EventTarget { readonly aborted: boolean; readonly reason: unknown; throwIfAborted(): void; }
declare var AbortSignal: { abort(reason?: unknown): AbortSignal; timeout(milliseconds: number): AbortSignal };
interface AbortController { readonly signal: AbortSignal; abort(reason?: unknown): void; }
declare var AbortController: { new (): AbortController };
`;
