// A bound on what is drawn again and again: a figure out of a stranger's file must not be drawn for ever.

const MOST = 5000;

/** How many times a spacing goes into a length, both in px. Throws when that is more than any figure holds. */
export function repeats(length: number, spacing: number): number {
  const count = length / spacing;
  if (count <= MOST) return count;
  throw new Error(
    `a part ${length} px long would be drawn in ${count} pieces; at most ${MOST} are drawn: a place or a value is out of all proportion`,
  );
}
