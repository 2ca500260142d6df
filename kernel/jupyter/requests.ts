// The contents of requests, read with care: a front end may send anything. Source: Messaging in Jupyter 5.3.
import type { HistoryRequest } from "./input-log.ts";
import type { Json, Message } from "./message.ts";

/** A request whose content is not what the protocol says. */
export class WrongRequest extends Error {
  override name = "WrongRequest";
}

type Kind = "string" | "boolean" | "number" | "object";

function field<T>(content: Json, name: string, kind: Kind, otherwise?: T): T {
  const value = content[name];
  if (value === undefined || value === null) {
    if (otherwise !== undefined) return otherwise;
    throw new WrongRequest(`${name} is missing; a ${kind} is wanted`);
  }
  const whole = kind !== "number" || Number.isInteger(value);
  if (typeof value !== kind || !whole || Array.isArray(value))
    throw new WrongRequest(`${name} is ${JSON.stringify(value).slice(0, 80)}; a ${kind} is wanted`);
  return value as T;
}

export interface ExecuteRequest {
  readonly code: string;
  readonly silent: boolean;
  readonly storeHistory: boolean;
  readonly stopOnError: boolean;
  readonly userExpressions: ReadonlyMap<string, string>;
  /** The front end's id for the cell, when it gives one. */
  readonly cellId: string | undefined;
}

export function readExecute({ content, metadata }: Message): ExecuteRequest {
  const silent = field(content, "silent", "boolean", false);
  const asked = field<Json>(content, "user_expressions", "object", {});
  const userExpressions = new Map(
    Object.keys(asked).map((name) => [name, field<string>(asked, name, "string")] as const),
  );
  const { cellId } = metadata;
  return {
    code: field<string>(content, "code", "string"),
    silent,
    storeHistory: !silent && field(content, "store_history", "boolean", true),
    stopOnError: field(content, "stop_on_error", "boolean", true),
    userExpressions,
    cellId: typeof cellId === "string" && cellId !== "" ? cellId : undefined,
  };
}

/** A text and a place in it. `offset` counts UTF-16 units; the protocol counts characters. */
export interface PlaceRequest {
  readonly code: string;
  readonly offset: number;
}

/** UTF-16 offset of a place counted in characters (Unicode code points). */
export function utf16Offset(text: string, characters: number): number {
  let offset = 0;
  for (const character of text) {
    if (characters-- <= 0) return offset;
    offset += character.length;
  }
  return offset;
}

/** A place counted in characters from its UTF-16 offset. */
export const charactersBefore = (text: string, offset: number): number => [...text.slice(0, offset)].length;

export function readPlace({ content }: Message): PlaceRequest {
  const code = field<string>(content, "code", "string");
  const place = field(content, "cursor_pos", "number", [...code].length);
  return { code, offset: utf16Offset(code, Math.max(0, place)) };
}

export const readCode = ({ content }: Message): string => field<string>(content, "code", "string");

const ACCESS = ["tail", "range", "search"] as const;

export function readHistory({ content }: Message): HistoryRequest {
  const access = field<string>(content, "hist_access_type", "string", "tail");
  const known = ACCESS.find((one) => one === access);
  if (!known)
    throw new WrongRequest(`hist_access_type is ${JSON.stringify(access)}; tail, range and search are known`);
  const numbers = Object.fromEntries(
    ["n", "start", "stop", "session"]
      .filter((name) => content[name] !== undefined && content[name] !== null)
      .map((name) => [name, field<number>(content, name, "number")]),
  );
  const pattern = field(content, "pattern", "string", "*");
  const unique = field(content, "unique", "boolean", false);
  return { access: known, output: field(content, "output", "boolean", false), ...numbers, pattern, unique };
}
