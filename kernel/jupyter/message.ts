// Messages as they travel: frames in, a checked message out, and back.
// Source: Jupyter client documentation, "Messaging in Jupyter", "The wire protocol", version 5.3.
import { createHmac, timingSafeEqual } from "node:crypto";

export const PROTOCOL_VERSION = "5.3";

const DELIMITER = "<IDS|MSG>";

export type Json = Readonly<Record<string, unknown>>;

export interface Header extends Json {
  readonly msg_id: string;
  readonly msg_type: string;
  readonly session: string;
  readonly username: string;
  readonly date: string;
  readonly version: string;
}

export interface Message {
  /** Routing frames, given back with the reply. */
  readonly identities: readonly Uint8Array[];
  readonly header: Header;
  readonly metadata: Json;
  readonly content: Json;
}

/** A message to be sent; `parent` is the header of the request it answers. */
export interface Outgoing {
  readonly identities: readonly (Uint8Array | string)[];
  readonly type: string;
  readonly parent: Json;
  readonly content: Json;
  readonly metadata?: Json;
}

/** Why frames are no message of this front end's. */
export class Refusal extends Error {}

/** A signature of four parts in hexadecimal digits; empty where there is no key. */
export function signature(key: string, parts: readonly (Uint8Array | string)[]): string {
  if (key === "") return "";
  const mac = createHmac("sha256", key);
  for (const part of parts) mac.update(part);
  return mac.digest("hex");
}

function sameText(given: string, wanted: string): boolean {
  const [left, right] = [Buffer.from(given), Buffer.from(wanted)];
  return left.length === right.length && timingSafeEqual(left, right);
}

const isObject = (value: unknown): value is Json =>
  typeof value === "object" && value !== null && !Array.isArray(value);

function readPart(frame: Uint8Array | undefined, what: string): Json {
  let value: unknown;
  try {
    value = JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(frame));
  } catch {
    throw new Refusal(`the ${what} is not JSON`);
  }
  if (!isObject(value)) throw new Refusal(`the ${what} is not an object`);
  return value;
}

/** The message in the frames. Throws `Refusal` for frames that are none, or are signed by somebody else. */
export function decode(frames: readonly Uint8Array[], key: string): Message {
  const at = frames.findIndex((frame) => Buffer.from(frame).equals(Buffer.from(DELIMITER)));
  if (at < 0) throw new Refusal("there is no delimiter");
  const [signed, ...parts] = frames.slice(at + 1, at + 6);
  if (parts.length < 4) throw new Refusal("parts are missing");
  if (!sameText(Buffer.from(signed ?? "").toString("latin1"), signature(key, parts)))
    throw new Refusal("the signature is not right");
  const header = readPart(parts[0], "header");
  readPart(parts[1], "parent header");
  const { msg_id, msg_type } = header;
  if (typeof msg_id !== "string" || typeof msg_type !== "string")
    throw new Refusal("the header has no msg_id and msg_type");
  return {
    identities: frames.slice(0, at),
    header: header as Header,
    metadata: readPart(parts[2], "metadata"),
    content: readPart(parts[3], "content"),
  };
}

const wellFormed = (text: string): string => text.replace(/\p{Surrogate}/gu, "\ufffd");

/** JSON of a value, whatever a cell has put into it. */
const written = (value: Json): string =>
  JSON.stringify(value, (_key, inner: unknown) => {
    if (typeof inner === "bigint") return inner.toString();
    return typeof inner === "string" ? wellFormed(inner) : inner;
  });

/** Writes messages of one kernel: numbered and signed. `name` is the kernel's session, `now` the time in words. */
export class Writer {
  readonly #key: string;
  readonly #name: string;
  readonly #now: () => string;
  #count = 0;

  constructor(key: string, name: string, now: () => string) {
    this.#key = key;
    this.#name = name;
    this.#now = now;
  }

  /** The frames of a message. */
  frames({ identities, type, parent, content, metadata = {} }: Outgoing): (Uint8Array | string)[] {
    const header: Header = {
      msg_id: `${this.#name}_${++this.#count}`,
      msg_type: type,
      session: this.#name,
      username: "hingebook",
      date: this.#now(),
      version: PROTOCOL_VERSION,
    };
    const parts = [header, parent, metadata, content].map(written);
    return [...identities, DELIMITER, signature(this.#key, parts), ...parts];
  }
}
