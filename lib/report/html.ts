// HTML put together from pieces: whatever is a plain string is escaped, so that no text from a record becomes markup.

/** Text that is markup already. */
export interface Html {
  readonly html: string;
}

export type Part = string | number | Html | undefined | readonly Part[];

/** Letters, figures and signs that need no escaping: most texts are nothing else. */
const PLAIN = /^[\t\n\r !#-%(-;=?-~\u00a0-\ud7ff]*$/;

/** Text made safe for HTML, in attributes too; control characters HTML forbids become U+FFFD. */
export function escapeHtml(text: string): string {
  if (PLAIN.test(text)) return text;
  return (
    text
      // biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters HTML forbids
      .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]|\p{Cs}/gu, "\ufffd")
      .replace(/&/g, "&amp;")
      .replace(/</g, "&lt;")
      .replace(/>/g, "&gt;")
      .replace(/"/g, "&quot;")
      .replace(/'/g, "&#39;")
  );
}

function write(part: Part): string {
  if (part === undefined) return "";
  if (typeof part === "string") return escapeHtml(part);
  if (typeof part === "number") return String(part);
  return "html" in part ? part.html : part.map(write).join("");
}

/** A template whose holes are escaped unless they are markup already. */
export function h(strings: TemplateStringsArray, ...parts: readonly Part[]): Html {
  return { html: strings.reduce((text, piece, i) => text + write(parts[i - 1]) + piece) };
}

/** Markup from a source that escapes by itself. */
export const raw = (html: string): Html => ({ html });

/** Pieces with a separator between them. */
export const joined = (parts: readonly Part[], separator: Part): Part =>
  parts.flatMap((part, i) => (i === 0 ? [part] : [separator, part]));
