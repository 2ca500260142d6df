// A record as one HTML file that needs nothing else.

import { createHash } from "node:crypto";
import type { FreeBodyFigure } from "../drawing/index.ts";
import type { CalculationRecord } from "../sheet/index.ts";
import { type Book, bookOf, type Item } from "./book.ts";
import { statusWords } from "./cautions.ts";
import { CLIENT } from "./client.ts";
import { cover } from "./cover.ts";
import { drawFigureSpec } from "./figure.ts";
import { type Html, h, type Part, raw } from "./html.ts";
import { type Figures, line } from "./lines.ts";
import { pageStyle } from "./style.ts";
import { why } from "./why.ts";

export interface PackageOptions {
  /** Language of the page, as in HTML's lang attribute; "en" otherwise. */
  readonly language?: string;
}

const sha256 = (text: string, encoding: "base64" | "hex"): string =>
  createHash("sha256").update(text, "utf8").digest(encoding);

async function drawFigures(record: CalculationRecord): Promise<Figures> {
  const figures = new Map<string, { number: number; svg: string }>();
  for (const entry of record.entries) {
    if (entry.kind !== "figure") continue;
    const number = figures.size + 1;
    try {
      figures.set(entry.id, { number, svg: await drawFigureSpec(entry.spec, `fig${number}`) });
    } catch (error) {
      throw new Error(`figure "${entry.id}" (${entry.caption}): ${(error as Error).message}`);
    }
  }
  return figures;
}

const section = (id: string, heading: string, matter: Part): Html =>
  h`<section class="part" aria-labelledby="${id}"><h2 id="${id}">${heading}</h2>
${matter}</section>
`;

const kept = (book: Book, kind: "given" | "assumption", figures: Figures): Part => {
  const items = book.items.filter((i) => i.entry.kind === kind);
  return items.length === 0 ? h`<p class="none">None.</p>` : items.map((i) => line(book, i, figures));
};

/** The body a line belongs to: that of a step, or the one a free-body figure shows. */
function bodyOf({ entry }: Item): string {
  if (entry.kind === "step") return entry.body;
  if (entry.kind !== "figure" || !("body" in entry.spec)) return "";
  return (entry.spec as FreeBodyFigure).body.name;
}

/** Lines in the notebook's order; what concerns one body stands under its name. */
function calculation(book: Book, figures: Figures): Part {
  let body = "";
  return book.items
    .filter((i) => i.entry.kind !== "given" && i.entry.kind !== "assumption")
    .map((item): Part => {
      const own = bodyOf(item);
      // "beam AB, moments about A" goes on about "beam AB".
      const goesOn = body !== "" && (own === body || own.startsWith(`${body}, `));
      if (!goesOn) body = own;
      const title = goesOn || own === "" ? "" : h`<h3 class="body-name">${own}</h3>\n`;
      return [title, line(book, item, figures, goesOn ? own.slice(body.length + 2) : "")];
    });
}

const embedded = (record: CalculationRecord): string => JSON.stringify(record).replace(/</g, "\\u003c");

function colophon(record: CalculationRecord, json: string): Html {
  const versions = Object.entries(record.versions).map(([name, version]) => `${name} ${version}`);
  return h`<footer class="colophon"><p>Made from notebook ${record.notebook.name} by ${versions.join(", ") || "an unnamed version"}. Record SHA-256 ${sha256(json, "hex")}. This file holds the record and the notebook it was made from.</p></footer>
`;
}

const PANEL = h`<aside id="trace" tabindex="-1" aria-label="What the chosen number stands on" hidden><button type="button">close</button><div class="trace-matter"></div></aside>
`;

const CONTENTS = h`<nav class="contents" aria-label="Contents"><a href="#outcome">Outcome</a> <a href="#givens">Givens</a> <a href="#assumptions">Assumptions</a> <a href="#calculation">Calculation</a> <a href="#provenance">What stands on what</a> <a href="#notebook">Notebook</a></nav>
`;

/** A calculation as one self-contained HTML file: no network, all text escaped, a content-security policy by hash.
 *  Throws on a record that contradicts itself (ids twice, references that cannot be read) and on a figure that cannot
 *  be drawn, naming it. */
export async function renderPackage(
  record: CalculationRecord,
  options: PackageOptions = {},
): Promise<string> {
  const book = bookOf(record);
  const figures = await drawFigures(record);
  const style = pageStyle(record);
  const json = embedded(record);
  const policy = [
    "default-src 'none'",
    `style-src 'sha256-${sha256(style, "base64")}'`,
    `script-src 'sha256-${sha256(CLIENT, "base64")}'`,
    "img-src data:",
    "base-uri 'none'",
    "form-action 'none'",
  ].join("; ");
  const { head, complete } = record;
  const banner = complete
    ? ""
    : h`<p class="banner" role="alert">INCOMPLETE: the calculation did not reach its end</p><div class="stamp" aria-hidden="true">INCOMPLETE</div>\n`;
  return h`<!doctype html>
<html lang="${options.language ?? "en"}">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${policy}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="referrer" content="no-referrer">
<title>${complete ? "" : "INCOMPLETE: "}${head.job} ${head.title}, ${statusWords(head.status)}</title>
<style>${raw(style)}</style>
</head>
<body>
<a class="skip" href="#calculation">Skip to the calculation</a>
${banner}<main>
${cover(book)}${CONTENTS}${section("givens", "Givens", kept(book, "given", figures))}${section("assumptions", "Assumptions", kept(book, "assumption", figures))}${section("calculation", "Calculation", calculation(book, figures))}${section("provenance", "What stands on what", why(book))}${section("notebook", "Notebook", h`<details><summary>Source of ${record.notebook.name}</summary><pre tabindex="0">${record.notebook.source}</pre></details>\n`)}${colophon(record, json)}</main>
${PANEL}<script type="application/json" id="record">${raw(json)}</script>
<script>${raw(CLIENT)}</script>
</body>
</html>
`.html;
}
