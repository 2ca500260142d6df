// Corners of many unknowns: least and greatest of a result found by going from corner to corner. A corner is a number with a bit per
// unknown, 1 at its most.

/** Looks at corners one climb may take in a frame whose states hold `size` numbers: some seconds for all results of a middling frame, none
 *  in a very large one, where the corners drawn must do. It depends on the frame alone, and so does the answer. */
export function looksFor(size: number): number {
  return Math.floor(2.5e6 / size ** 2);
}

/** A result that is followed from corner to corner. */
export interface Followed {
  readonly valueAt: (corner: bigint) => number;
  readonly unknowns: number;
  readonly looks: number;
}

/** The value of a result at a corner that is greatest in a sense (1 greatest, -1 least), as far as turning one unknown, then two at
 *  a time, leads from `start` in the looks allowed. */
export function climbed({ valueAt, unknowns, looks }: Followed, start: bigint, sense: 1 | -1): number {
  if (looks < 1) return sense * Number.NEGATIVE_INFINITY;
  const turns = turnsOf(unknowns);
  let [best, corner, idle] = [valueAt(start), start, 0];
  for (let look = 1; look < looks && idle < turns.length; look++, idle++) {
    const next = corner ^ (turns[idle < unknowns ? look % unknowns : idle] ?? 0n);
    const value = valueAt(next);
    if (!(sense * (value - best) > 0)) continue;
    [best, corner, idle] = [value, next, -1];
  }
  return best;
}

/** The corner a result grows towards: by the sign of its covariance with each of the unknowns in `free`. `values` holds `width`
 *  values of unknowns per row, `found` the result, `rowOf` the row of each sample. */
export function towards(
  values: Float64Array,
  width: number,
  free: readonly number[],
  found: Float64Array,
  rowOf: Int32Array,
): bigint {
  let corner = 0n;
  free.forEach((k, bit) => {
    let [sum, x, z] = [0, 0, 0];
    for (const row of rowOf) {
      const [a, b] = [values[row * width + k] ?? 0, found[row] ?? 0];
      x += a;
      z += b;
      sum += a * b;
    }
    if (sum - (x * z) / rowOf.length > 0) corner |= 1n << BigInt(bit);
  });
  return corner;
}

/** Single unknowns, then pairs of them. */
function turnsOf(unknowns: number): readonly bigint[] {
  const single = Array.from({ length: unknowns }, (_, k) => 1n << BigInt(k));
  const pairs = single.flatMap((a, i) => single.slice(i + 1).map((b) => a | b));
  return [...single, ...pairs];
}
