// What a sample says: the interval that holds a share of it, and its middle.

/** The interval between the order statistics of ranks p(n + 1) and (1 - p)(n + 1), p = (1 - share)/2, interpolated: one more
 *  draw from the same law falls into it with a chance equal to the share. `sorted` ascending, at least 2 / (1 - share) values.
 *  Source: order statistics of a continuous law cut it into n + 1 parts of equal expected chance (S. S. Wilks 1941), from memory. */
export function holding(sorted: Float64Array, share: number): readonly [number, number] {
  const p = (1 - share) / 2;
  return [ranked(sorted, p), ranked(sorted, 1 - p)];
}

/** The value of rank p(n + 1), interpolated. */
export function ranked(sorted: Float64Array, p: number): number {
  const n = sorted.length;
  const rank = Math.min(Math.max(p * (n + 1), 1), n) - 1;
  const below = Math.floor(rank);
  const [a, b] = [sorted[below] ?? Number.NaN, sorted[Math.min(below + 1, n - 1)] ?? Number.NaN];
  return a + (b - a) * (rank - below);
}
