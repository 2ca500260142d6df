// Ranges of the point of inflection of single spans: as the near end goes from free to turn to fixed it moves from the end to the
// published place of the span fixed there, the far end fixed or free to turn.
// Sources of the places: the classical span tables (AISC Manual, table 3-23; Roark), from memory, derived again in closed form and
// agreeing to the printed digits; 0.211 L also read in Saouma, Structural Engineering, section 14.3.1. Tolerance: half the last digit.

import { describe, expect, test } from "vitest";
import { inflectionRange, isolatedRange, type Span } from "../../lib/inflection/index.ts";
import { forces, gable, trapezoid, udl } from "../inflection/spans.ts";

const L = 7;
const digits = 5e-7;
const fixedEnds = 0.5 - Math.sqrt(3) / 6;

/** Load, its span, near end, and the published place from that end as a part of L with the far end fixed and free; `tolerance` where
 *  the source prints fewer digits. */
interface Row {
  readonly load: string;
  readonly span: Span;
  readonly near: "left" | "right";
  readonly far: { readonly fixed?: number; readonly free?: number };
  readonly tolerance: number;
}
const row = (
  load: string,
  span: Span,
  near: Row["near"],
  far: Row["far"],
  tolerance: number = digits,
): Row => ({ load, span, near, far, tolerance });

const rows: readonly Row[] = [
  row("uniform", udl(L, 3), "left", { fixed: fixedEnds, free: 1 / 4 }),
  row("uniform, from the other end", udl(L, 3), "right", { fixed: fixedEnds, free: 1 / 4 }),
  row("force at mid-span", forces(L, 5, 1 / 2), "left", { fixed: 1 / 4, free: 3 / 11 }),
  row("force at a quarter", forces(L, 5, 1 / 4), "left", { fixed: 1 / 6 }),
  row("force at a quarter, far from it", forces(L, 5, 1 / 4), "right", { fixed: 3 / 10 }),
  row("force at a third", forces(L, 5, 1 / 3), "left", { fixed: 1 / 5, free: 5 / 23 }),
  row("force at a third, far from it", forces(L, 5, 1 / 3), "right", { fixed: 2 / 7, free: 4 / 13 }),
  row("force at two fifths", forces(L, 5, 2 / 5), "left", { fixed: 2 / 9 }),
  row("force at two fifths, far from it", forces(L, 5, 2 / 5), "right", { fixed: 3 / 11 }),
  row("forces at both third points", forces(L, 5, 1 / 3, 2 / 3), "left", { fixed: 2 / 9, free: 1 / 4 }),
  row("forces at the quarter points", forces(L, 5, 1 / 4, 1 / 2, 3 / 4), "left", { fixed: 5 / 24 }),
  row("triangle, from its tip", trapezoid(L, 0, 1, 0, 3), "left", { fixed: 0.237016 }),
  row("triangle, from its tip, far end free", trapezoid(L, 0, 1, 0, 3), "left", { free: 0.2746 }, 5e-6),
  row("triangle, from its foot", trapezoid(L, 0, 1, 0, 3), "right", { fixed: 1 - 0.807703 }),
  row("triangle, from its foot, far end free", trapezoid(L, 0, 1, 0, 3), "right", { free: 0.2254 }, 5e-5),
  // from the published end moments 11wL²/192 and 5wL²/192 by statics: R = 13wL/32 and 3wL/32
  row("uniform on half", trapezoid(L, 0, 0.5, 3, 3), "left", {
    fixed: 13 / 32 - Math.sqrt((13 / 32) ** 2 - 11 / 96),
  }),
  row("uniform on half, far from it", trapezoid(L, 0, 0.5, 3, 3), "right", { fixed: 5 / 18 }),
  row("gable", gable(L, 3), "left", { fixed: 0.223149 }),
];

describe("ranges of isolated spans, published places", () => {
  test.each(rows)("$load", ({ span, near, far, tolerance }) => {
    for (const [end, fixity] of [
      ["fixed", 1],
      ["free", 0],
    ] as const) {
      const place = far[end];
      if (place === undefined) continue;
      const { least, most } = inflectionRange(span, near, fixity);
      expect(least).toBeCloseTo(0, 12);
      expect(Math.abs(most / L - place)).toBeLessThan(tolerance);
      expect(isolatedRange(span, near).most).toBeGreaterThanOrEqual(most - 1e-12);
    }
  });

  test("eighteen rows of ten kinds of load, twenty-four places", () => {
    expect(rows.length).toBe(18);
    expect(new Set(rows.map(({ load }) => load.split(",")[0])).size).toBe(10);
    expect(rows.flatMap(({ far }) => Object.values(far)).length).toBe(24);
  });
});
