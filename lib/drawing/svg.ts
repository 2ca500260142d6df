// Laid-out scenes written as one SVG element.

import { between, type Pt } from "./geometry.ts";
import { type PlacedLabel, TEXT_SIZE, tieOf } from "./labels.ts";
import { type Laid, PAGE_WIDTH } from "./scale.ts";
import { ACCENT, at, INK, line, PAPER, PENS } from "./scene.ts";
import { escapeXml, textContent } from "./text.ts";

const PAD = 8;
const HEADING = 24;

export interface Panel {
  readonly heading?: string;
  readonly laid: Laid;
}

function writeLabel(placed: PlacedLabel): string {
  const { label, box } = placed;
  const size = label.size ?? TEXT_SIZE;
  const middle: Pt = between([box.left, box.top], [box.right, box.bottom], 0.5);
  const bold = label.bold ? ' font-weight="700"' : "";
  const tie = placed.tied ? line(...tieOf(placed), PENS.leader).svg : "";
  // The paper-coloured edge keeps a text legible where it must lie over a line.
  return (
    `${tie}<text x="${at(middle[0])}" y="${at(middle[1] + size * 0.34)}" font-size="${size}"${bold} ` +
    `fill="${label.accent ? ACCENT : INK}" stroke="${PAPER}" stroke-width="3" stroke-linejoin="round" ` +
    `paint-order="stroke">${textContent(label.text, size)}</text>`
  );
}

function writePanel(panel: Panel, top: number): { readonly svg: string; readonly height: number } {
  const { box, scene, placed } = panel.laid;
  const head = panel.heading ? HEADING : 0;
  const width = box.right - box.left;
  const dx = Math.max(PAD, (PAGE_WIDTH - width) / 2) - box.left;
  const dy = top + head + PAD - box.top;
  const heading = panel.heading
    ? `<text x="${PAD}" y="${at(top + 18)}" font-size="${TEXT_SIZE}" font-weight="700" fill="${INK}" ` +
      `text-anchor="start">${textContent(panel.heading, TEXT_SIZE)}</text>`
    : "";
  const inner = [...scene.shapes.map((s) => s.svg), ...placed.map(writeLabel)].join("\n");
  return {
    svg: `${heading}\n<g transform="translate(${at(dx)} ${at(dy)})">\n${inner}\n</g>`,
    height: head + box.bottom - box.top + 2 * PAD,
  };
}

/** An id prefix, checked: it is written into id attributes. */
export function checkedPrefix(prefix: string): string {
  if (!/^[A-Za-z][A-Za-z0-9_.-]*$/.test(prefix)) {
    throw new Error(
      `figure prefix "${prefix}" will not do; letters, digits, "-", "_", "." after a letter, e.g. "fig3"`,
    );
  }
  return prefix;
}

/** The attributes and the words every figure starts with. */
export function openSvg(
  words: { title: string; description: string },
  prefix: string,
  w: number,
  h: number,
): string {
  const id = checkedPrefix(prefix);
  // Height as an attribute keeps a figure that stands alone from growing with a wide window; a page may override it.
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" role="img" class="figure-svg" aria-labelledby="${id}-title ${id}-desc" ` +
    `viewBox="0 0 ${at(w)} ${at(h)}" width="100%" height="${at(h * 1.15)}" preserveAspectRatio="xMidYMid meet" ` +
    `font-family="'Helvetica Neue', Arial, 'Liberation Sans', sans-serif" text-anchor="middle">\n` +
    `<title id="${id}-title">${escapeXml(words.title)}</title>\n` +
    `<desc id="${id}-desc">${escapeXml(words.description)}</desc>\n` +
    `<rect width="${at(w)}" height="${at(h)}" fill="${PAPER}"/>`
  );
}

/** Panels one below the other as one SVG. */
export function writeSvg(
  panels: readonly Panel[],
  words: { title: string; description: string },
  prefix: string,
): string {
  let top = 0;
  let width = PAGE_WIDTH;
  const parts: string[] = [];
  for (const panel of panels) {
    const { svg, height } = writePanel(panel, top);
    parts.push(svg);
    top += height;
    width = Math.max(width, panel.laid.box.right - panel.laid.box.left + 2 * PAD);
  }
  return `${openSvg(words, prefix, width, top)}\n${parts.join("\n")}\n</svg>\n`;
}
