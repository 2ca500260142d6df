// Hatching drawn as strokes of its own, so that no pattern id can clash and print keeps it.

import { type Pt, type Segment, turned } from "./geometry.ts";
import { repeats } from "./repeats.ts";

/** Parallel strokes inside a closed outline (even-odd), at an angle to the page's x axis, `spacing` apart. */
export function hatch(outline: readonly Pt[], angle: number, spacing: number): readonly Segment[] {
  const flat = outline.map((p) => turned(p, -angle));
  const ys = flat.map((p) => p[1]);
  const found: Segment[] = [];
  repeats(Math.max(...ys) - Math.min(...ys), spacing);
  // Strokes sit on multiples of the spacing, so that neighbouring outlines continue each other's hatching.
  for (let i = Math.ceil(Math.min(...ys) / spacing); i * spacing < Math.max(...ys); i++) {
    // A hair off the multiple keeps corners that lie exactly on a stroke from being counted twice.
    const y = i * spacing + 1e-4;
    const xs = crossings(flat, y);
    for (let j = 0; j + 1 < xs.length; j += 2) {
      const [a, b] = [xs[j] ?? 0, xs[j + 1] ?? 0];
      if (b - a > 0.8) found.push([turned([a, y], angle), turned([b, y], angle)]);
    }
  }
  return found;
}

function crossings(outline: readonly Pt[], y: number): number[] {
  const xs: number[] = [];
  outline.forEach((a, i) => {
    const b = outline[(i + 1) % outline.length] ?? a;
    if (a[1] <= y !== b[1] <= y) xs.push(a[0] + ((y - a[1]) * (b[0] - a[0])) / (b[1] - a[1]));
  });
  return xs.sort((p, q) => p - q);
}
