// What a value looks like in a notebook: a bundle of one or more forms by MIME type, plain text always among them.
import { inspect } from "node:util";

export type MimeBundle = Readonly<Record<string, unknown>>;

const DISPLAY = Symbol.for("Jupyter.display");

const plainText = (value: unknown): string =>
  inspect(value, { depth: 4, maxArrayLength: 100, maxStringLength: 10_000, breakLength: 100 });

type Method = (this: unknown) => unknown;

function method(value: object, key: string | symbol): Method | undefined {
  const found = (value as Record<string | symbol, unknown>)[key];
  return typeof found === "function" ? (found as Method) : undefined;
}

function checkBundle(bundle: unknown): MimeBundle {
  if (typeof bundle !== "object" || bundle === null || Array.isArray(bundle)) {
    throw new TypeError(
      `Symbol.for("Jupyter.display") answered ${inspect(bundle)}; it must answer an object of MIME types, for example { "text/html": "…" }`,
    );
  }
  const wrong = Object.keys(bundle).find((type) => !/^[^\s/]+\/[^\s/]+$/.test(type));
  if (wrong !== undefined)
    throw new TypeError(`Symbol.for("Jupyter.display") answered "${wrong}", which is no MIME type`);
  return bundle as MimeBundle;
}

/** Text of a value that shows itself in richer forms: its own `toString`, if it has one, else its structure. */
function companionText(value: object, bundle: MimeBundle): string {
  const markdown = bundle["text/markdown"];
  if (typeof markdown === "string") return markdown;
  const own = method(value, "toString");
  if (own && own !== Object.prototype.toString) {
    const text = own.call(value);
    if (typeof text === "string" && !text.startsWith("[object ")) return text;
  }
  return plainText(value);
}

/** The forms a value is shown in; nothing for `undefined`. `Symbol.for("Jupyter.display")` (which may answer a promise)
 *  comes first, then `toHtml()`, then the value's structure as text. Errors thrown by either are thrown on. */
export async function display(value: unknown): Promise<MimeBundle | undefined> {
  if (value === undefined) return undefined;
  if (value === null || (typeof value !== "object" && typeof value !== "function")) {
    return Object.freeze({ "text/plain": plainText(value) });
  }
  const show = method(value, DISPLAY);
  const html = method(value, "toHtml");
  if (show) {
    const bundle = checkBundle(await show.call(value));
    return Object.freeze({ "text/plain": companionText(value, bundle), ...bundle });
  }
  if (html) {
    const text = await html.call(value);
    if (typeof text === "string")
      return Object.freeze({ "text/plain": companionText(value, {}), "text/html": text });
  }
  return Object.freeze({ "text/plain": plainText(value) });
}
