/** A text that says something. Throws when it is missing, naming what is wanted. */
export function checkedText(what: string, text: unknown): string {
  if (typeof text !== "string" || text.trim() === "")
    throw new Error(`${what} is missing; write a few words`);
  return text;
}

/** A utilisation in percent, with decimals where whole figures would hide on which side of the limit it lies. */
export function percent(utilisation: number): string {
  const near = Math.abs(utilisation - 1);
  if (near < 1e-9 || near >= 0.005) return `${Math.round(utilisation * 100)} %`;
  return `${(utilisation * 100).toFixed(near < 1e-5 ? 6 : 3)} %`;
}

/** A stable id for an entry that has nothing but its words: kind and how they begin. */
export function idFromText(kind: string, text: string): string {
  const words = text.trim().replace(/\s+/g, " ");
  return `${kind} ${words.length > 60 ? words.slice(0, 60).trimEnd() : words}`;
}
