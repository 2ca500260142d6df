// How sensitive the solution is to rounding: the condition number of the stiffness matrix, its displacements scaled so that
// units do not matter. Estimated from a few solutions: W. W. Hager, Condition estimates, SIAM J. Sci. Stat. Comput. 5
// (1984) 311-316; N. J. Higham, Accuracy and Stability of Numerical Algorithms, ch. 15.

import { type Envelope, solveFactored } from "./envelope.ts";

/** Estimate of |S K S| |(S K S)⁻¹| in the 1-norm, S = diag(K)^-1/2, from the matrix and its factors. */
export function condition(envelope: Envelope, matrix: Float64Array, factors: Float64Array): number {
  const { n, shift } = envelope;
  if (n === 0) return 1;
  const root = Float64Array.from({ length: n }, (_, i) => Math.sqrt(matrix[(shift[i] ?? 0) + i] ?? 1));
  return Math.max(1, norm(envelope, matrix, root) * inverseNorm(envelope, factors, root));
}

function norm({ n, first, shift }: Envelope, matrix: Float64Array, root: Float64Array): number {
  const sums = new Float64Array(n);
  for (let i = 0; i < n; i++)
    for (let k = first[i] ?? i; k <= i; k++) {
      const size = Math.abs(matrix[(shift[i] ?? 0) + k] ?? 0) / ((root[i] ?? 1) * (root[k] ?? 1));
      sums[i] = (sums[i] ?? 0) + size;
      if (k < i) sums[k] = (sums[k] ?? 0) + size;
    }
  return sums.reduce((a, b) => Math.max(a, b), 0);
}

/** Hager's ascent: from an even vector to the unit vector that the solution grows most for. */
function inverseNorm(envelope: Envelope, factors: Float64Array, root: Float64Array): number {
  const { n } = envelope;
  let x = new Float64Array(n).fill(1 / n);
  let estimate = 0;
  for (let step = 0; step < 5; step++) {
    const y = scaledSolution(envelope, factors, root, x);
    const size = y.reduce((sum, value) => sum + Math.abs(value), 0);
    if (size <= estimate) break;
    estimate = size;
    const z = scaledSolution(
      envelope,
      factors,
      root,
      y.map((value) => (value < 0 ? -1 : 1)),
    );
    const most = z.reduce((best, value, i) => (Math.abs(value) > Math.abs(z[best] ?? 0) ? i : best), 0);
    if (Math.abs(z[most] ?? 0) <= z.reduce((sum, value, i) => sum + value * (x[i] ?? 0), 0)) break;
    x = new Float64Array(n);
    x[most] = 1;
  }
  return estimate;
}

/** (S K S)⁻¹ x */
function scaledSolution(
  envelope: Envelope,
  factors: Float64Array,
  root: Float64Array,
  x: Float64Array,
): Float64Array<ArrayBuffer> {
  const y = x.map((value, i) => value * (root[i] ?? 1));
  solveFactored(envelope, factors, y);
  return y.map((value, i) => value * (root[i] ?? 1));
}
