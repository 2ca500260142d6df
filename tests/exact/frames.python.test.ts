// A second opinion that is not ours: building frames assembled and solved by scipy.sparse (the timing of both is the
// matter of `npm run bench`).
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { benchFrame, plainFrame } from "./bench-frames.ts";
import { pythonHas, runPython } from "./python.ts";

const sizes = [
  [1, 1],
  [3, 3],
  [2, 12],
  [10, 60],
] as const;

describe.skipIf(!pythonHas("scipy"))("exact(building frame) against scipy.sparse", () => {
  test("frames of 1 × 1 to 10 × 60 agree to 1e-8", { timeout: 300_000 }, () => {
    const frames = sizes.map(([bays, storeys]) => benchFrame(bays, storeys));
    const answers = runPython(
      "scipy_frames.py",
      frames.map(({ structure, loads }) => plainFrame(structure, loads)),
    ) as readonly { readonly displacements: readonly (readonly number[])[] }[];
    expect(answers).toHaveLength(sizes.length);
    frames.forEach(({ structure, loads }, i) => {
      const { joints } = exact(structure, loads);
      const other = answers[i]?.displacements ?? [];
      const size = Math.max(...joints.map((j) => Math.hypot(j.x, j.y)));
      expect(other).toHaveLength(joints.length);
      joints.forEach((j, k) => {
        [j.x, j.y, j.rotation ?? Number.NaN].forEach((value, axis) => {
          expect(Math.abs(value - (other[k]?.[axis] ?? Number.NaN))).toBeLessThanOrEqual(1e-8 * size);
        });
      });
    });
  });
});
