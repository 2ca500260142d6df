// TeX to MathML. The package's security policy allows no inline style, so style attributes are taken out; what they
// said (display: block) is said by the display attribute already.

import temml from "temml";

/** MathML of a TeX formula, with no style attributes; `display` sets it on a line of its own.
 *  Throws on TeX that cannot be read, naming it. */
export function toMathML(tex: string, options: { readonly display?: boolean } = {}): string {
  try {
    const html = temml.renderToString(tex, {
      displayMode: options.display === true,
      throwOnError: true,
      strict: false,
      trust: false,
    });
    return html.replace(/\sstyle=(?:"[^"]*"|'[^']*')/g, "");
  } catch (error) {
    throw new Error(`the formula "${tex}" cannot be set: ${(error as Error).message}`);
  }
}
