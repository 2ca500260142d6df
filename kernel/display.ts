// What a value looks like in a notebook: a bundle of one or more forms by MIME type, plain text always among them.
import { inspect, types } from "node:util";

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

/** Go on with an answer, at once when it is one and later when it is a promise of one. */
function then<T>(answer: unknown, next: (answer: unknown) => T): T | Promise<T> {
  return types.isPromise(answer) ? answer.then(next) : next(answer);
}

const VEGA_LITE = /vega\.github\.io\/schema\/vega-lite\/v(\d+)/;

/** A Vega-Lite chart: its specification for front ends that draw it, and the drawing for those that do not. */
async function chartBundle(spec: object, version: string): Promise<MimeBundle> {
  const { drawChart } = await import("./chart.ts");
  const { svg, text } = await drawChart(spec);
  return Object.freeze({
    [`application/vnd.vegalite.v${version}+json`]: spec,
    "image/svg+xml": svg,
    "text/plain": text,
  });
}

/** The forms a value is shown in, now or soon; nothing for `undefined`. `Symbol.for("Jupyter.display")` comes first,
 *  then `toHtml()` (either may answer a promise), then a Vega-Lite specification, then the value's structure as text.
 *  Errors thrown by either are thrown on. */
export function displayForms(value: unknown): MimeBundle | undefined | Promise<MimeBundle | undefined> {
  if (value === undefined) return undefined;
  if (value === null || (typeof value !== "object" && typeof value !== "function")) {
    return Object.freeze({ "text/plain": plainText(value) });
  }
  const show = method(value, DISPLAY);
  if (show) {
    return then(show.call(value), (answer) => {
      const bundle = checkBundle(answer);
      return Object.freeze({ "text/plain": companionText(value, bundle), ...bundle });
    });
  }
  const html = method(value, "toHtml");
  if (html) {
    return then(html.call(value), (text) =>
      Object.freeze({
        "text/plain": companionText(value, {}),
        ...(typeof text === "string" ? { "text/html": text } : {}),
      }),
    );
  }
  const { $schema } = value as { $schema?: unknown };
  const version = typeof $schema === "string" ? VEGA_LITE.exec($schema)?.[1] : undefined;
  return version === undefined
    ? Object.freeze({ "text/plain": plainText(value) })
    : chartBundle(value, version);
}

/** Whether a value shows itself by a function from outside the cells, such as the library's. */
export function isLibraryShown(value: unknown): boolean {
  if (typeof value !== "object" || value === null) return false;
  const show = method(value, DISPLAY);
  return show !== undefined && Object.getPrototypeOf(show) === Function.prototype;
}

/** The forms a value is shown in; nothing for `undefined`. */
export async function display(value: unknown): Promise<MimeBundle | undefined> {
  return await displayForms(value);
}
