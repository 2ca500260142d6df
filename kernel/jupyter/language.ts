// Completion, inspection and is-complete for a front end.
import { Worker } from "node:worker_threads";
import { joinDraft } from "../check/joined.ts";
import { ownFolder } from "../folders.ts";
import { libraryTypes } from "../library.ts";
import { parse } from "../syntax.ts";
import type { PlaceRequest } from "./requests.ts";
import type { Suggestions, TslabOptions } from "./tslab.ts";

export type Question =
  | { readonly kind: "start" | "unfinished"; readonly text: string }
  | { readonly kind: "complete" | "inspect"; readonly text: string; readonly offset: number };

export type Answer =
  | { readonly id: number; readonly answer: unknown }
  | { readonly id: number; readonly error: string };

/** Offsets count UTF-16 units of the text asked about. */
export interface Completion {
  readonly matches: readonly string[];
  readonly start: number;
  readonly end: number;
}

const THREAD = new URL("./language-thread.js", import.meta.url);

/** How long a kernel is left alone before completion is made ready. */
const REST_ms = 1500;

interface Waiting {
  readonly settle: (answer: unknown) => void;
  readonly fail: (error: Error) => void;
}

/** The part of a text literal that stands before a place, and where it begins; nothing outside one. */
function literalBefore(
  code: string,
  offset: number,
): { readonly start: number; readonly text: string } | undefined {
  const line = code.slice(code.lastIndexOf("\n", offset - 1) + 1, offset);
  let open: string | undefined;
  let from = 0;
  for (let at = 0; at < line.length; at++) {
    const character = line[at];
    if (open !== undefined && character === "\\") at++;
    else if (open !== undefined && character === open) open = undefined;
    else if (open === undefined && (character === '"' || character === "'")) {
      open = character;
      from = at + 1;
    }
  }
  if (open === undefined) return undefined;
  return { start: offset - (line.length - from), text: line.slice(from) };
}

export class Language {
  readonly #options: TslabOptions = { ownFolder: ownFolder(), libraryTypes: libraryTypes() };
  #thread: Worker | undefined;
  #waiting = new Map<number, Waiting>();
  #asked = 0;
  #timer: ReturnType<typeof setTimeout> | undefined;
  #used = false;

  #open(): Worker {
    if (this.#thread) return this.#thread;
    const thread = new Worker(THREAD, { workerData: this.#options });
    this.#thread = thread;
    thread.unref();
    thread.on("message", (reply: Answer) => {
      const waiting = this.#waiting.get(reply.id);
      this.#waiting.delete(reply.id);
      if ("error" in reply) waiting?.fail(new Error(`completion failed: ${reply.error}`));
      else waiting?.settle(reply.answer);
    });
    thread.on("error", (error) => this.#lost(error));
    return thread;
  }

  #lost(error: Error): void {
    this.#thread = undefined;
    const waiting = [...this.#waiting.values()];
    this.#waiting.clear();
    for (const { fail } of waiting) fail(error);
  }

  #ask(question: Question): Promise<unknown> {
    const id = ++this.#asked;
    return new Promise((settle, fail) => {
      this.#waiting.set(id, { settle, fail });
      this.#open().postMessage({ id, question });
    });
  }

  /** A request has come: leave the processor to it. */
  pause(): void {
    clearTimeout(this.#timer);
  }

  /** A request is done. After a while without another, completion is made ready. */
  rest(): void {
    if (this.#used) return;
    this.#timer = setTimeout(() => {
      this.#used = true;
      this.#ask({ kind: "start", text: 'import * as library from "hingebook"; library.' }).catch(
        () => undefined,
      );
    }, REST_ms);
    this.#timer.unref();
  }

  /** Names that fit at a place of a cell, after the cells that have run. */
  async complete(before: readonly string[], { code, offset }: PlaceRequest): Promise<Completion> {
    const draft = joinDraft(
      before.map((cell) => parse(cell)),
      code,
    );
    const place = draft.place(offset);
    const { start, end, names } = (await this.#ask({
      kind: "complete",
      text: draft.text,
      offset: place,
    })) as Suggestions;
    const literal = literalBefore(code, offset);
    if (literal) {
      const matches = names.filter((name) => name.toLowerCase().startsWith(literal.text.toLowerCase()));
      return { matches, start: literal.start, end: offset };
    }
    return { matches: names, start: offset - (place - start), end: offset + (end - place) };
  }

  /** What the name at a place is; nothing where there is none, or nobody knows it. */
  async inspect(before: readonly string[], { code, offset }: PlaceRequest): Promise<string | undefined> {
    const draft = joinDraft(
      before.map((cell) => parse(cell)),
      code,
    );
    const at = nameAt(code, offset);
    if (at === undefined) return undefined;
    const question = { kind: "inspect" as const, text: draft.text, offset: draft.place(at) };
    const text = (await this.#ask(question)) as string | undefined;
    return text === undefined || text === "any" ? undefined : text;
  }

  /** Indent of the line to come when more is expected at the end; nothing when it is not. */
  async unfinished(text: string): Promise<string | undefined> {
    return (await this.#ask({ kind: "unfinished", text })) as string | undefined;
  }

  async close(): Promise<void> {
    clearTimeout(this.#timer);
    await this.#thread?.terminate();
  }
}

const IN_NAME = /[\p{ID_Continue}$#]/u;

/** Where the name under a place, or just before it, begins; of a call just opened, where its last name begins. */
function nameAt(code: string, offset: number): number | undefined {
  let at = Math.min(offset, code.length);
  if (!IN_NAME.test(code[at] ?? "")) at = code.slice(0, at).replace(/[\s(]*$/, "").length - 1;
  if (at < 0 || !IN_NAME.test(code[at] ?? "")) return undefined;
  while (at > 0 && IN_NAME.test(code[at - 1] ?? "")) at--;
  return at;
}

export interface Completeness {
  readonly status: "complete" | "incomplete" | "invalid";
  readonly indent?: string;
}

/** Whether a text can be run as it is, wants more lines, or is wrong whatever follows. */
export async function completeness(language: Language, code: string): Promise<Completeness> {
  const text = code.trimEnd();
  const [fault] = parse(text).faults;
  if (!fault) return { status: "complete" };
  // tslab looks at the end alone; what is wrong before it stays wrong. It takes no notice of open comments and templates.
  if (fault.end < text.length) return { status: "invalid" };
  if (/^(?:`|\/\*)/.test(text.slice(fault.start))) return { status: "incomplete", indent: "" };
  const indent = await language.unfinished(text);
  return indent === undefined ? { status: "invalid" } : { status: "incomplete", indent };
}
