// Small dense least squares, for shapes that are drawn and not computed with.

/** One equation: coefficients by unknown, right-hand side, and how much it counts. */
export interface Row {
  readonly terms: readonly (readonly [unknown: number, coefficient: number])[];
  readonly value: number;
  readonly weight: number;
}

/** The unknowns that satisfy all rows best, by the normal equations; every unknown must stand in a row. */
export function leastSquares(count: number, rows: readonly Row[]): Float64Array {
  const A = Array.from({ length: count }, () => new Float64Array(count + 1));
  for (const { terms, value, weight } of rows) {
    for (const [i, p] of terms) {
      const row = A[i];
      if (row === undefined) throw new Error(`least squares: unknown ${i} of ${count}`);
      for (const [j, q] of terms) row[j] = (row[j] ?? 0) + weight * weight * p * q;
      row[count] = (row[count] ?? 0) + weight * weight * p * value;
    }
  }
  return eliminated(A);
}

/** Solution of a symmetric positive definite system with its right-hand side as last column. */
function eliminated(A: readonly Float64Array[]): Float64Array {
  const n = A.length;
  for (let k = 0; k < n; k++) {
    const pivot = A[k]?.[k] ?? 0;
    if (!(pivot > 0)) throw new Error(`least squares: unknown ${k} is in no equation`);
    for (let i = k + 1; i < n; i++) {
      const [upper, lower] = [A[k], A[i]];
      const factor = (lower?.[k] ?? 0) / pivot;
      if (factor === 0 || !upper || !lower) continue;
      for (let j = k; j <= n; j++) lower[j] = (lower[j] ?? 0) - factor * (upper[j] ?? 0);
    }
  }
  const x = new Float64Array(n);
  for (let k = n - 1; k >= 0; k--) {
    let sum = A[k]?.[n] ?? 0;
    for (let j = k + 1; j < n; j++) sum -= (A[k]?.[j] ?? 0) * (x[j] ?? 0);
    x[k] = sum / (A[k]?.[k] ?? 1);
  }
  return x;
}
