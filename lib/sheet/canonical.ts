// One text for one record, whatever the order its fields were written in, and the digest of that text.
// Source: RFC 8785, JSON Canonicalization Scheme: members sorted by UTF-16 code units, no white space, numbers and
// strings as ECMAScript writes them.

/** A value in canonical JSON. A field that is undefined is left out. Throws naming the place of a number that is not
 *  finite, of a lone surrogate, and of anything JSON has no form for. */
export function canonicalJson(value: unknown, place = "record"): string {
  switch (typeof value) {
    case "boolean":
      return String(value);
    case "number":
      if (!Number.isFinite(value)) throw new Error(`${place} is ${value}; a finite number is wanted`);
      return JSON.stringify(value);
    case "string":
      if (/\p{Cs}/u.test(value)) throw new Error(`${place} holds half a character (a lone surrogate)`);
      return JSON.stringify(value);
    case "object":
      return value === null ? "null" : Array.isArray(value) ? list(value, place) : members(value, place);
  }
  throw new Error(`${place} is ${typeof value}; JSON has no form for that`);
}

function list(values: readonly unknown[], place: string): string {
  return `[${values.map((value, i) => canonicalJson(value, `${place}[${i}]`)).join()}]`;
}

function members(value: object, place: string): string {
  const written = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
    .map(([name, member]) => `${JSON.stringify(name)}:${canonicalJson(member, `${place}.${name}`)}`);
  return `{${written.join()}}`;
}

/** SHA-256 of a text in UTF-8, or of bytes, as 64 hexadecimal digits. */
export async function sha256(matter: string | Uint8Array<ArrayBuffer>): Promise<string> {
  const bytes = typeof matter === "string" ? new TextEncoder().encode(matter) : matter;
  const digest = new Uint8Array(await crypto.subtle.digest("SHA-256", bytes));
  return [...digest].map((byte) => byte.toString(16).padStart(2, "0")).join("");
}

/** SHA-256 of a value's canonical JSON, as 64 hexadecimal digits. */
export function canonicalDigest(value: unknown): Promise<string> {
  return sha256(canonicalJson(value));
}
