// Printed text in SVG: escaping, subscripts, and a width estimate that needs no font.

/** Text without the characters XML 1.0 forbids; U+FFFD stands in for them. */
export const allowedInXml = (text: string): string =>
  // biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters XML forbids
  text.replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]|\p{Cs}/gu, "\ufffd");

/** Text made safe for XML: markup escaped, forbidden characters replaced. */
export const escapeXml = (text: string): string =>
  allowedInXml(text)
    .replace(/&/g, "&amp;")
    .replace(/</g, "&lt;")
    .replace(/>/g, "&gt;")
    .replace(/"/g, "&quot;")
    .replace(/'/g, "&#39;");

interface Run {
  readonly text: string;
  readonly lowered: boolean;
}

const SUBSCRIPT =
  /(?<![A-Za-z0-9_])([A-Za-zα-ωΑ-Ω]{1,2}\d{0,3})_(?:\{([^{}]*)\}|([A-Za-z0-9]+(?:,[A-Za-z0-9]+(?!_))*))/gu;

/** A text split at its subscripts: "A_x = 3" and "X_{h1}" lower x and h1; "roof_beam" stays as it is. */
export function runs(text: string): readonly Run[] {
  if (!text.includes("_")) return text === "" ? [] : [{ text, lowered: false }];
  const found: Run[] = [];
  let last = 0;
  for (const match of text.matchAll(SUBSCRIPT)) {
    found.push({ text: text.slice(last, match.index) + match[1], lowered: false });
    found.push({ text: match[2] ?? match[3] ?? "", lowered: true });
    last = match.index + match[0].length;
  }
  found.push({ text: text.slice(last), lowered: false });
  return found.filter((run) => run.text !== "");
}

/** Share of the size a character takes, on the wide side of the usual sans-serif faces. */
function measured(character: string): number {
  if (/[\s.,:;'|!ijl·()[\]]/u.test(character)) return 0.36;
  if (/[ftrI/\-\u2212]/u.test(character)) return 0.45;
  if (/[mwMW%@\u2014]/u.test(character)) return 0.95;
  if (/[A-Z+=<>]/u.test(character)) return 0.74;
  if (/\p{Script=Han}|\p{Emoji_Presentation}/u.test(character)) return 1.1;
  return 0.63;
}

const advances = new Map<string, number>();
const KEPT = 1000;

function advance(character: string): number {
  const known = advances.get(character);
  if (known !== undefined) return known;
  if (advances.size >= KEPT) advances.clear();
  const found = measured(character);
  advances.set(character, found);
  return found;
}

const LOWERED_SIZE = 0.75;

/** Width of a text at a font size, estimated generously. */
export function textWidth(text: string, size: number): number {
  return runs(text).reduce(
    (sum, run) =>
      sum + [...run.text].reduce((w, c) => w + advance(c), 0) * size * (run.lowered ? LOWERED_SIZE : 1),
    0,
  );
}

/** The inside of a <text> element; subscripts as lowered spans. */
export function textContent(text: string, size: number): string {
  const drop = (size * 0.25).toFixed(1);
  let lowered = false;
  return runs(text)
    .map((run) => {
      const shift = run.lowered === lowered ? "" : ` dy="${run.lowered ? "" : "-"}${drop}"`;
      const font = run.lowered ? ` font-size="${(size * LOWERED_SIZE).toFixed(1)}"` : "";
      lowered = run.lowered;
      return shift || font ? `<tspan${shift}${font}>${escapeXml(run.text)}</tspan>` : escapeXml(run.text);
    })
    .join("");
}
