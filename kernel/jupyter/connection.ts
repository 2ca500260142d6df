// The connection file a front end hands to its kernel: addresses and the key messages are signed with.
// Source: Jupyter client documentation, "Connection files".
import { readFileSync } from "node:fs";

export const CHANNELS = ["shell", "iopub", "stdin", "control", "hb"] as const;

export type Channel = (typeof CHANNELS)[number];

export interface Connection {
  readonly transport: "tcp" | "ipc";
  readonly ip: string;
  readonly key: string;
  readonly ports: Readonly<Record<Channel, number>>;
}

function refuse(what: string): never {
  throw new Error(`connection file: ${what}`);
}

function port(value: unknown, channel: Channel): number {
  if (typeof value === "number" && Number.isInteger(value) && value >= 0 && value < 65_536) return value;
  return refuse(`${channel}_port is ${JSON.stringify(value)}; a port is a whole number from 0 to 65535`);
}

/** A connection from the text of its file. Errors name the field and what would be right. */
export function readConnection(text: string): Connection {
  let about: Record<string, unknown>;
  try {
    about = JSON.parse(text) as Record<string, unknown>;
  } catch (cause) {
    throw new Error(`connection file: it is not JSON (${(cause as Error).message})`, { cause });
  }
  const { transport = "tcp", ip = "127.0.0.1", key = "", signature_scheme: scheme = "hmac-sha256" } = about;
  if (transport !== "tcp" && transport !== "ipc")
    refuse(`transport is ${JSON.stringify(transport)}; tcp and ipc are known`);
  if (typeof ip !== "string" || ip === "") refuse(`ip is ${JSON.stringify(ip)}; an address is wanted`);
  if (typeof key !== "string") refuse(`key is ${JSON.stringify(key)}; a text is wanted`);
  if (scheme !== "hmac-sha256") refuse(`signature_scheme is ${JSON.stringify(scheme)}; hmac-sha256 is known`);
  const ports = Object.fromEntries(
    CHANNELS.map((channel) => [channel, port(about[`${channel}_port`], channel)]),
  ) as Record<Channel, number>;
  return Object.freeze({ transport, ip, key, ports: Object.freeze(ports) });
}

/** Read a connection file. */
export function readConnectionFile(path: string): Connection {
  return readConnection(readFileSync(path, "utf8"));
}

/** The address of one channel, as sockets are bound to it. */
export function addressOf({ transport, ip, ports }: Connection, channel: Channel): string {
  return `${transport}://${ip}${transport === "tcp" ? ":" : "-"}${ports[channel]}`;
}
