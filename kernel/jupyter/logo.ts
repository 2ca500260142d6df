// hingebook's mark: a beam on two hinges, bent, with the point of zero moment open. Drawn here; PNG by hand, since it
// is a handful of shapes.
import { crc32, deflateSync } from "node:zlib";

const INK = [28, 39, 51] as const;
const PAPER = [246, 242, 232] as const;
const ACCENT = [200, 72, 40] as const;

type Colour = readonly [number, number, number];

/** Half the side of the square the mark is drawn in; y up, the centre at 0. */
const HALF = 16;

const beamY = (x: number): number => 1.5 + 4.5 * Math.sin((Math.PI * x) / 20);

const distance = (x: number, y: number, cx: number, cy: number): number => Math.hypot(x - cx, y - cy);

/** The colour at a point of the mark, or nothing outside it. */
function colourAt(x: number, y: number): Colour | undefined {
  const corner = 4;
  const [ax, ay] = [Math.abs(x) - (HALF - corner), Math.abs(y) - (HALF - corner)];
  if (Math.hypot(Math.max(ax, 0), Math.max(ay, 0)) > corner) return undefined;
  const hinge = distance(x, y, 0, beamY(0));
  if (hinge < 1.9) return PAPER;
  if (hinge < 3.5) return ACCENT;
  const slope = 0.225 * Math.PI * Math.cos((Math.PI * x) / 20);
  if (Math.abs(x) < 12.4 && Math.abs(y - beamY(x)) < 1.35 * Math.hypot(1, slope)) return INK;
  for (const side of [-1, 1]) {
    const top = beamY(side * 10) - 2;
    const fall = top - y;
    if (fall >= 0 && y > -9 && Math.abs(x - side * 10) < 0.6 + 0.42 * fall) return INK;
  }
  if (y < -10 && y > -11.6 && Math.abs(x) < 13) return INK;
  return PAPER;
}

function chunk(type: string, data: Uint8Array): Buffer {
  const body = Buffer.concat([Buffer.from(type, "latin1"), data]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  const check = Buffer.alloc(4);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, check]);
}

const FINE = 4;

/** One pixel, the mean of the points in it: red, green, blue, opacity. */
function pixel(column: number, row: number, size: number): number[] {
  const sum = [0, 0, 0, 0];
  for (let i = 0; i < FINE; i++)
    for (let j = 0; j < FINE; j++) {
      const x = ((column + (i + 0.5) / FINE) / size) * 2 * HALF - HALF;
      const y = HALF - ((row + (j + 0.5) / FINE) / size) * 2 * HALF;
      const colour = colourAt(x, y);
      if (!colour) continue;
      for (const [k, part] of colour.entries()) sum[k] = (sum[k] ?? 0) + part;
      sum[3] = (sum[3] ?? 0) + 1;
    }
  const [red = 0, green = 0, blue = 0, points = 0] = sum;
  const parts = [red, green, blue].map((part) => Math.round(part / Math.max(1, points)));
  return [...parts, Math.round((255 * points) / FINE ** 2)];
}

/** The mark as a PNG of so many pixels a side. Source of the format: W3C PNG specification. */
export function logoPng(size: number): Buffer {
  const rows: number[] = [];
  for (let row = 0; row < size; row++) {
    rows.push(0); // no filter
    for (let column = 0; column < size; column++) rows.push(...pixel(column, row, size));
  }
  const header = Buffer.alloc(13);
  header.writeUInt32BE(size, 0);
  header.writeUInt32BE(size, 4);
  header.set([8, 6, 0, 0, 0], 8); // eight bits, colour with opacity
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk("IHDR", header),
    chunk("IDAT", deflateSync(Uint8Array.from(rows))),
    chunk("IEND", new Uint8Array()),
  ]);
}

const hex = (colour: Colour): string =>
  `#${colour.map((part) => part.toString(16).padStart(2, "0")).join("")}`;

/** The mark as SVG. */
export function logoSvg(): string {
  const beam: string[] = [];
  for (let x = -12; x <= 12; x++) beam.push(`${x},${(-beamY(x)).toFixed(2)}`);
  const supports = [-1, 1].map((side) => {
    const top = beamY(side * 10) - 2;
    const reach = 0.6 + 0.42 * (top + 9);
    const x = side * 10;
    return `<path d="M${x} ${(-top).toFixed(2)}L${(x - reach).toFixed(2)} 9H${(x + reach).toFixed(2)}Z" fill="${hex(INK)}"/>`;
  });
  return [
    '<svg xmlns="http://www.w3.org/2000/svg" viewBox="-16 -16 32 32" role="img"><title>hingebook</title>',
    `<rect x="-16" y="-16" width="32" height="32" rx="4" fill="${hex(PAPER)}"/>`,
    `<polyline points="${beam.join(" ")}" fill="none" stroke="${hex(INK)}" stroke-width="2.7"/>`,
    ...supports,
    `<path d="M-13 10.8H13" stroke="${hex(INK)}" stroke-width="1.6"/>`,
    `<circle cx="0" cy="${(-beamY(0)).toFixed(2)}" r="2.7" fill="${hex(PAPER)}" stroke="${hex(ACCENT)}" stroke-width="1.6"/>`,
    "</svg>",
  ].join("");
}
