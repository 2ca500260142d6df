import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { prepare } from "../../lib/exact/index.ts";
import { ordering } from "../../lib/exact/ordering.ts";
import { skeleton } from "../../lib/structure/index.ts";
import { benchFrame } from "./bench-frames.ts";
import { anyStructure, model } from "./random.ts";

describe("ordering", () => {
  test("every node once", () => {
    fc.assert(
      fc.property(anyStructure, (data) => {
        const cut = skeleton(model(data).structure);
        const order = [...ordering(cut)].sort((a, b) => a - b);
        expect(order).toEqual(cut.nodes.map((_, i) => i));
      }),
      { seed: 9, numRuns: 200 },
    );
  });

  test.each([
    [10, 60],
    [3, 40],
  ])("rows stay as long as the frame is wide, however tall: %i bays, %i storeys", (bays, storeys) => {
    const { structure, loads } = benchFrame(bays, storeys);
    const { envelope } = prepare(structure, loads);
    expect(envelope.size / envelope.n).toBeLessThan(3 * (bays + 2));
  });

  test("a wide low frame is numbered across", () => {
    const { structure, loads } = benchFrame(40, 2);
    const { envelope } = prepare(structure, loads);
    expect(envelope.size / envelope.n).toBeLessThan(12);
  });
});
