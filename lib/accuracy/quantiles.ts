// What a sample says: the interval that holds a share of it, and its middle. `sorted` is ascending.

/** The interval that holds a share of the law the sample came from; ends included. With p = 1 - share, p/2 is left out at each end: the ends
 *  have the ranks p/2 (n + 1) and (1 - p/2)(n + 1), interpolated, and one more draw falls between them with a chance equal to the share.
 *  Where values coincide, as frames at the ends of all ranges do, less than that is left out. The end nearer to zero then moves in until p is
 *  left out in all, or as near as the steps allow; at the end greater in size never more than p/2 is left out.
 *  Source: order statistics of a continuous law cut it into n + 1 parts of equal expected chance (S. S. Wilks 1941), from memory. */
export function holding(sorted: Float64Array, share: number): readonly [number, number] {
  const all = sorted.length + 1;
  const p = 1 - share;
  const [low, high] = [ranked(sorted, p / 2), ranked(sorted, 1 - p / 2)];
  const [below, above] = [countBelow(sorted, low), countAbove(sorted, high)];
  const untied = 2 * (Math.ceil((p / 2) * all) - 1);
  if (below + above + 2 > untied) return [low, high];
  return Math.abs(low) < Math.abs(high)
    ? [ranked(sorted, p - above / all), high]
    : [low, ranked(sorted, 1 - p + below / all)];
}

/** The value of rank p(n + 1), interpolated. */
export function ranked(sorted: Float64Array, p: number): number {
  const n = sorted.length;
  const rank = Math.min(Math.max(p * (n + 1), 1), n) - 1;
  const below = Math.floor(rank);
  const [a, b] = [sorted[below] ?? Number.NaN, sorted[Math.min(below + 1, n - 1)] ?? Number.NaN];
  return a + (b - a) * (rank - below);
}

export function countBelow(sorted: Float64Array, value: number): number {
  let count = 0;
  while (count < sorted.length && (sorted[count] as number) < value) count += 1; // count is within the length
  return count;
}

export function countAbove(sorted: Float64Array, value: number): number {
  let count = 0;
  const n = sorted.length;
  while (count < n && (sorted[n - 1 - count] as number) > value) count += 1; // within the length
  return count;
}
