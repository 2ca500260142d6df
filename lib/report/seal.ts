// The seal of a package: its last line holds the digest of everything before it, so that a change of a single byte
// anywhere in the file shows, with whatever version it was made. A seal is no signature: whoever changes a file can
// seal it afresh, and then the register of issues tells.

import { sha256 } from "../sheet/index.ts";

const SEAL = /<!-- SHA-256 of everything before this line: ([0-9a-f]{64}) -->\n$/;

/** A page with its seal as last line. */
export async function sealed(html: string): Promise<string> {
  return `${html}<!-- SHA-256 of everything before this line: ${await sha256(html)} -->\n`;
}

/** What a file's seal says: unbroken; broken, with the digest it names and the one found; or not there. */
export type Seal =
  | { readonly state: "unbroken"; readonly digest: string }
  | { readonly state: "broken"; readonly digest: string; readonly found: string }
  | { readonly state: "missing" };

/** The seal of a file, from its bytes. */
export async function sealOf(bytes: Uint8Array<ArrayBuffer>): Promise<Seal> {
  // Latin-1 keeps one character for one byte, so that the seal is found by its place whatever the bytes before it are.
  const end = new TextDecoder("latin1").decode(bytes.subarray(-200));
  const [whole = "", digest] = SEAL.exec(end) ?? [];
  if (digest === undefined) return { state: "missing" };
  const found = await sha256(bytes.slice(0, bytes.length - whole.length));
  return found === digest ? { state: "unbroken", digest } : { state: "broken", digest, found };
}
