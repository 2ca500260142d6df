// One text for one record, whatever the order its fields were written in, and the digest of that text.
// Source: RFC 8785, JSON Canonicalization Scheme: members sorted by UTF-16 code units, no white space, numbers and
// strings as ECMAScript writes them.

/** A value in canonical JSON. A field that is undefined is left out. Throws naming the place of a number that is not
 *  finite, of a lone surrogate, and of anything JSON has no form for. */
export function canonicalJson(value: unknown, place = "record"): string {
  const text = written(value);
  if (text === undefined) throw new Error(faultIn(value, place) ?? `${place} cannot be written`);
  return text;
}

const namesOf = (value: object): readonly string[] =>
  Object.keys(value)
    .filter((name) => value[name as keyof object] !== undefined)
    .sort();

/** The text of a value; nothing where JSON has no form for it or for what is in it. */
function written(value: unknown): string | undefined {
  if (faultOf(value) !== undefined) return undefined;
  if (typeof value !== "object" || value === null) return JSON.stringify(value);
  const parts: string[] = [];
  if (Array.isArray(value)) {
    for (const member of value) {
      const text = written(member);
      if (text === undefined) return undefined;
      parts.push(text);
    }
    return `[${parts.join()}]`;
  }
  for (const name of namesOf(value)) {
    const text = written(value[name as keyof object]);
    if (text === undefined) return undefined;
    parts.push(`${JSON.stringify(name)}:${text}`);
  }
  return `{${parts.join()}}`;
}

/** What keeps a value itself, not what is in it, from being written; in words that follow its place. */
function faultOf(value: unknown): string | undefined {
  switch (typeof value) {
    case "number":
      return Number.isFinite(value) ? undefined : `is ${value}; a finite number is wanted`;
    case "string":
      return /\p{Cs}/u.test(value) ? "holds half a character (a lone surrogate)" : undefined;
    case "boolean":
    case "object":
      return undefined;
  }
  return `is ${typeof value}; JSON has no form for that`;
}

/** The first fault, with its place: looked for only where there is one, as records are large. */
function faultIn(value: unknown, place: string): string | undefined {
  const fault = faultOf(value);
  if (fault !== undefined) return `${place} ${fault}`;
  if (typeof value !== "object" || value === null) return undefined;
  const members: readonly (readonly [string, unknown])[] = Array.isArray(value)
    ? value.map((member, i) => [`${place}[${i}]`, member])
    : namesOf(value).map((name) => [`${place}.${name}`, value[name as keyof object]]);
  for (const [where, member] of members) {
    const found = faultIn(member, where);
    if (found !== undefined) return found;
  }
  return undefined;
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
