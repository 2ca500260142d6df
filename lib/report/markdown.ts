// Text cells: Markdown without HTML, without pictures from elsewhere, with $…$ set as maths.

import MarkdownIt from "markdown-it";
import { escapeHtml, type Html, raw } from "./html.ts";
import { maths } from "./maths.ts";

/** A text cell's headings stand below the page's own. */
const DEMOTED = 2;

function reader(): ReturnType<typeof MarkdownIt> {
  const md = new MarkdownIt({ html: false, linkify: false, typographer: false });
  md.inline.ruler.before("escape", "maths", (state, silent) => {
    const match = /^\$(?!\s)((?:[^$\\\n]|\\.)+?)(?<!\s)\$(?!\d)/.exec(state.src.slice(state.pos));
    if (!match) return false;
    if (!silent) state.push("maths", "", 0).content = match[1] ?? "";
    state.pos += match[0].length;
    return true;
  });
  md.renderer.rules.maths = (tokens, i) => maths(tokens[i]?.content ?? "").html;
  md.renderer.rules.image = (tokens, i, options, env, self) => {
    const token = tokens[i];
    const source = String(token?.attrGet("src") ?? "");
    if (token && /^data:image\//i.test(source)) {
      token.attrSet("alt", self.renderInlineAsText(token.children ?? [], options, env));
      return self.renderToken(tokens, i, options);
    }
    // Nothing is fetched by a package: a picture kept elsewhere is named instead.
    return `<em>(picture not in this file: ${escapeHtml(token?.content ?? "")})</em>`;
  };
  md.core.ruler.push("demote", (state) => {
    for (const token of state.tokens) {
      if (token.type !== "heading_open" && token.type !== "heading_close") continue;
      token.tag = `h${Math.min(6, Number(token.tag.slice(1)) + DEMOTED)}`;
    }
  });
  return md;
}

const md = reader();

/** A text cell as HTML. */
export const markdown = (text: string): Html => raw(md.render(text));
