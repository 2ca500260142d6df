// A record as one HTML file that needs nothing else.

import { type CalculationRecord, canonicalJson, sha256 } from "../sheet/index.ts";
import { type Block, blocksOf } from "./arrange.ts";
import { body } from "./body.ts";
import { type Book, bookOf } from "./book.ts";
import { statusWords } from "./cautions.ts";
import { CLIENT } from "./client.ts";
import { closures } from "./closures.ts";
import { cover } from "./cover.ts";
import { policyDigest } from "./digest.ts";
import { drawFigureParts } from "./figure.ts";
import { type Html, h, type Part, raw } from "./html.ts";
import { issueSection, movesSection } from "./issue-section.ts";
import { type DrawnFigure, type Figures, line } from "./lines.ts";
import { RECHECK_CLIENT, recheckLine } from "./recheck-client.ts";
import { pageStyle } from "./style.ts";
import { whyFolded } from "./why.ts";

export interface PackageOptions {
  /** Language of the page, as in HTML's lang attribute; "en" otherwise. */
  readonly language?: string;
}

/** Wider drawings than this, in px, are not shrunk to a telephone. */
const NARROW = 500;

const widthOf = (svg: string): number => Number(/ width="([\d.]+)"/.exec(svg)?.[1] ?? 0);

async function drawFigures(record: CalculationRecord): Promise<Figures> {
  const figures = new Map<string, DrawnFigure>();
  for (const entry of record.entries) {
    if (entry.kind !== "figure") continue;
    const number = figures.size + 1;
    try {
      const parts = await drawFigureParts(entry.spec, `fig${number}`);
      figures.set(entry.id, { number, parts, wide: Math.max(...parts.map(widthOf)) > NARROW });
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

/** Lines in the notebook's order; a body cut free stands beside its equations, equations left over together. */
const calculation = (book: Book, figures: Figures): Part =>
  blocksOf(book).map((block) => blockOf(book, block, figures));

function blockOf(book: Book, block: Block, figures: Figures): Html {
  switch (block.kind) {
    case "line":
      return line(book, block.item, figures);
    case "body":
      return body(book, block, figures);
    case "closures":
      return closures(book, block.items);
  }
}

const embedded = (json: string): string => json.replace(/</g, "\\u003c");

function colophon(record: CalculationRecord, digest: string): Html {
  const versions = Object.entries(record.versions).map(([name, version]) => `${name} ${version}`);
  return h`<footer class="colophon"><p>Made from notebook ${record.notebook.name} by ${versions.join(", ") || "an unnamed version"}. Record SHA-256 ${digest}. This file holds the record and the notebook it was made from.</p></footer>
`;
}

const PANEL = h`<aside id="trace" tabindex="-1" aria-label="What the chosen number stands on" hidden><button type="button">close</button><div class="trace-matter"></div></aside>
`;

const CONTENTS = h`<nav class="contents" aria-label="Contents"><a href="#outcome">Outcome</a> <a href="#givens">Givens</a> <a href="#assumptions">Assumptions</a> <a href="#calculation">Calculation</a> <a href="#provenance">What stands on what</a> <a href="#notebook">Notebook</a></nav>
`;

const SCRIPT = CLIENT + RECHECK_CLIENT;

/** A calculation as one self-contained HTML file: no network, all text escaped, a content-security policy by hash.
 *  Throws on a record that contradicts itself (ids twice, references that cannot be read) and on a figure that cannot
 *  be drawn, naming it. */
export async function renderPackage(given: CalculationRecord, options: PackageOptions = {}): Promise<string> {
  // Written from the canonical form, so that the same record gives the same page, whatever order its fields came in.
  const json = canonicalJson(given);
  const record = JSON.parse(json) as CalculationRecord;
  const book = bookOf(record);
  const figures = await drawFigures(record);
  const style = pageStyle(record);
  const policy = [
    "default-src 'none'",
    `style-src 'sha256-${await policyDigest(style)}'`,
    `script-src 'sha256-${await policyDigest(SCRIPT)}'`,
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
${cover(book)}${recheckLine}${issueSection(book)}${CONTENTS}${section("givens", "Givens", kept(book, "given", figures))}${section("assumptions", "Assumptions", kept(book, "assumption", figures))}${movesSection(book)}${section("calculation", "Calculation", calculation(book, figures))}${section("provenance", "What stands on what", whyFolded(book))}${section("notebook", "Notebook", h`<details><summary>Source of ${record.notebook.name}</summary><pre tabindex="0">${record.notebook.source}</pre></details>\n`)}${colophon(record, await sha256(json))}</main>
${PANEL}<script type="application/json" id="record">${raw(embedded(json))}</script>
<script>${raw(SCRIPT)}</script>
</body>
</html>
`.html;
}
