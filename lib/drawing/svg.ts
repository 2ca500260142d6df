// Laid-out scenes written as one SVG element.

import { between, type Pt } from "./geometry.ts";
import { type PlacedLabel, TEXT_SIZE, tieOf } from "./labels.ts";
import type { Laid } from "./scale.ts";
import { ACCENT, at, INK, line, PAPER, PENS } from "./scene.ts";
import { escapeXml, textContent, textWidth } from "./text.ts";

const PAD = 8;
const HEADING = 24;
const NOTE = 18;
const NOTE_SIZE = 12.5;
/** Pixels per unit of the viewBox. */
const SHOWN = 0.94;

export interface Panel {
  readonly heading?: string;
  /** A line of small print under the heading. */
  readonly note?: string;
  /** Absent where the heading says all there is. */
  readonly laid?: Laid;
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

/** Width a panel needs, its heading included. */
function widthOf({ heading = "", note = "", laid }: Panel): number {
  const drawn = laid === undefined ? 0 : laid.box.right - laid.box.left;
  return Math.max(drawn, textWidth(heading, TEXT_SIZE), textWidth(note, NOTE_SIZE) * 0.9) + 2 * PAD;
}

function headingLine(text: string, y: number, size: number, weight: string): string {
  return (
    `<text x="${PAD}" y="${at(y)}" font-size="${size}"${weight} fill="${INK}" ` +
    `text-anchor="start">${textContent(text, size)}</text>`
  );
}

function writePanel(
  { heading, note, laid }: Panel,
  top: number,
  across: number,
): { readonly svg: string; readonly height: number } {
  const head = (heading ? HEADING : 0) + (note ? NOTE : 0);
  const title = [
    ...(heading ? [headingLine(heading, top + 18, TEXT_SIZE, ' font-weight="700"')] : []),
    ...(note ? [headingLine(note, top + head - 5, NOTE_SIZE, "")] : []),
  ].join("\n");
  if (laid === undefined) return { svg: title, height: head };
  const { box, scene, placed } = laid;
  const width = box.right - box.left;
  const dx = Math.max(PAD, (across - width) / 2) - box.left;
  const dy = top + head + PAD - box.top;
  const inner = [...scene.shapes.map((s) => s.svg), ...placed.map(writeLabel)].join("\n");
  return {
    svg: `${title}\n<g transform="translate(${at(dx)} ${at(dy)})">\n${inner}\n</g>`,
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
  // Given in px, so that letters have one size in every figure and a wide window does not blow it up; a page limits the
  // width to its own.
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" role="img" class="figure-svg" aria-labelledby="${id}-title ${id}-desc" ` +
    `viewBox="0 0 ${at(w)} ${at(h)}" width="${at(w * SHOWN)}" height="${at(h * SHOWN)}" preserveAspectRatio="xMidYMid meet" ` +
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
  const width = Math.max(...panels.map(widthOf));
  const parts: string[] = [];
  for (const panel of panels) {
    const { svg, height } = writePanel(panel, top, width);
    parts.push(svg);
    top += height;
  }
  return `${openSvg(words, prefix, width, top)}\n${parts.join("\n")}\n</svg>\n`;
}
