// TeX to MathML. The package's security policy allows no inline style, so style attributes are taken out; what they
// said (display: block) is said by the display attribute already.

import temml from "temml";

// A name in \mathrm{…} with several figures in a row is read by temml with the first of them only: h11 as h1. Set as text it
// is whole, upright and one piece.
const withFigures = /\\mathrm\{((?:[\w,.;: -]|\\ )*)\}/g;

const namesWhole = (tex: string): string =>
  tex.replace(withFigures, (all, name: string) =>
    /\d/.test(name) && !name.includes("_") ? `\\text{${name}}` : all,
  );

/** MathML of a TeX formula, with no style attributes; `display` sets it on a line of its own.
 *  Throws on TeX that cannot be read, naming it. */
export function toMathML(tex: string, options: { readonly display?: boolean } = {}): string {
  try {
    const html = temml.renderToString(namesWhole(tex), {
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
