// When a sum that must close is nought.

/** Whether a sum is nought beside the largest of its parts, or below a thousandth of a newton (or N·m) at all. */
export function isNought(sum: number, scale: number): boolean {
  return Math.abs(sum) <= Math.max(1e-9 * scale, 1e-3);
}

/** The sum as it is printed: without the last binary digits where it is nought. */
export function closedSum(sum: number, scale: number): number {
  return isNought(sum, scale) ? 0 : sum;
}
