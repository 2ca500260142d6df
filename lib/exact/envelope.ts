// Symmetric matrices stored by rows from the first entry that is not zero up to the diagonal, and their factors L D Lᵀ.
// Rows are contiguous, so the inner loops are plain dot products. Source: A. Jennings, A compact storage scheme for the
// solution of symmetric linear simultaneous equations, Computer J. 9 (1966) 281-285.
// Entries of typed arrays within their length are numbers; `as number` says so to the compiler without a test at run time.

export interface Envelope {
  /** Number of rows. */
  readonly n: number;
  /** First column kept of each row. */
  readonly first: Int32Array;
  /** Entry (i, k) is at shift[i] + k. */
  readonly shift: Int32Array;
  /** Entries in all. */
  readonly size: number;
}

/** Pivots below this part of their diagonal entry are looked at. */
const suspect = 1e-8;

/** The envelope of a matrix from the first column of each row. */
export function envelopeOf(first: Int32Array): Envelope {
  const n = first.length;
  const shift = new Int32Array(n);
  let size = 0;
  for (let i = 0; i < n; i++) {
    shift[i] = size - (first[i] as number);
    size += i - (first[i] as number) + 1;
  }
  return { n, first, shift, size };
}

/** Factors A = L D Lᵀ in place: L below the diagonal, D on it. `look` is called with each row whose pivot is below 1e-8
 *  of its diagonal entry or not positive, all rows up to it being factored; it throws, or lets the pivot pass. */
export function factorize(envelope: Envelope, a: Float64Array, look: (row: number) => void): void {
  const { n, first } = envelope;
  let i = 0;
  while (i < n) {
    // The rows of one joint begin at one column: three at a time need fewer looks at the rows before them.
    const begin = first[i] as number;
    const together = i + 2 < n && begin === first[i + 1] && begin === first[i + 2];
    if (together) reduceThree(envelope, a, i);
    const done = together ? i : begin;
    const end = together ? i + 3 : i + 1;
    for (let row = i; row < end; row++) {
      reduceRow(envelope, a, row, Math.max(done, begin + 1));
      if (!finishRow(envelope, a, row)) look(row);
    }
    i = end;
  }
}

/** g_ij = a_ij - Σ g_ik l_jk for the columns j of a row from `column` on. */
function reduceRow({ first, shift }: Envelope, a: Float64Array, i: number, column: number): void {
  const si = shift[i] as number;
  const fi = first[i] as number;
  for (let j = column; j < i; j++) {
    const sj = shift[j] as number;
    const begin = Math.max(first[j] as number, fi);
    let sum = a[si + j] as number;
    for (let k = begin; k < j; k++) sum -= (a[si + k] as number) * (a[sj + k] as number);
    a[si + j] = sum;
  }
}

/** The same for the columns before row i of rows i, i + 1 and i + 2, which begin at one column. */
function reduceThree({ first, shift }: Envelope, a: Float64Array, i: number): void {
  const fi = first[i] as number;
  const s0 = shift[i] as number;
  const s1 = shift[i + 1] as number;
  const s2 = shift[i + 2] as number;
  for (let j = fi + 1; j < i; ) {
    const begin = first[j] as number;
    if (j + 2 < i && begin === first[j + 1] && begin === first[j + 2]) {
      threeByThree(
        a,
        [s0, s1, s2],
        [shift[j] as number, shift[j + 1] as number, shift[j + 2] as number],
        Math.max(begin, fi),
        j,
      );
      j += 3;
      continue;
    }
    const sj = shift[j] as number;
    let g0 = a[s0 + j] as number;
    let g1 = a[s1 + j] as number;
    let g2 = a[s2 + j] as number;
    for (let k = Math.max(begin, fi); k < j; k++) {
      const l = a[sj + k] as number;
      g0 -= (a[s0 + k] as number) * l;
      g1 -= (a[s1 + k] as number) * l;
      g2 -= (a[s2 + k] as number) * l;
    }
    a[s0 + j] = g0;
    a[s1 + j] = g1;
    a[s2 + j] = g2;
    j += 1;
  }
}

/** Three rows by three columns j, j + 1, j + 2 at once: half the loads from memory for each product. */
function threeByThree(
  a: Float64Array,
  [s0, s1, s2]: readonly [number, number, number],
  [t0, t1, t2]: readonly [number, number, number],
  begin: number,
  j: number,
): void {
  let g00 = a[s0 + j] as number;
  let g01 = a[s0 + j + 1] as number;
  let g02 = a[s0 + j + 2] as number;
  let g10 = a[s1 + j] as number;
  let g11 = a[s1 + j + 1] as number;
  let g12 = a[s1 + j + 2] as number;
  let g20 = a[s2 + j] as number;
  let g21 = a[s2 + j + 1] as number;
  let g22 = a[s2 + j + 2] as number;
  for (let k = begin; k < j; k++) {
    const l0 = a[t0 + k] as number;
    const l1 = a[t1 + k] as number;
    const l2 = a[t2 + k] as number;
    const x0 = a[s0 + k] as number;
    g00 -= x0 * l0;
    g01 -= x0 * l1;
    g02 -= x0 * l2;
    const x1 = a[s1 + k] as number;
    g10 -= x1 * l0;
    g11 -= x1 * l1;
    g12 -= x1 * l2;
    const x2 = a[s2 + k] as number;
    g20 -= x2 * l0;
    g21 -= x2 * l1;
    g22 -= x2 * l2;
  }
  // Columns j + 1 and j + 2 still lack the products with the columns of this block before them.
  const m1 = a[t1 + j] as number;
  const m2 = a[t2 + j] as number;
  const n2 = a[t2 + j + 1] as number;
  g01 -= g00 * m1;
  g11 -= g10 * m1;
  g21 -= g20 * m1;
  a[s0 + j] = g00;
  a[s0 + j + 1] = g01;
  a[s0 + j + 2] = g02 - g00 * m2 - g01 * n2;
  a[s1 + j] = g10;
  a[s1 + j + 1] = g11;
  a[s1 + j + 2] = g12 - g10 * m2 - g11 * n2;
  a[s2 + j] = g20;
  a[s2 + j + 1] = g21;
  a[s2 + j + 2] = g22 - g20 * m2 - g21 * n2;
}

/** l_ij = g_ij / d_j and d_i = a_ii - Σ l_ij g_ij; whether the pivot d_i is beyond suspicion. */
function finishRow({ first, shift }: Envelope, a: Float64Array, i: number): boolean {
  const si = shift[i] as number;
  const diagonal = a[si + i] as number;
  let d = diagonal;
  for (let j = first[i] as number; j < i; j++) {
    const g = a[si + j] as number;
    const l = g / (a[(shift[j] as number) + j] as number);
    d -= l * g;
    a[si + j] = l;
  }
  a[si + i] = d;
  return d > suspect * diagonal;
}

/** Solves L D Lᵀ x = b in place. */
export function solveFactored({ n, first, shift }: Envelope, a: Float64Array, b: Float64Array): void {
  for (let i = 0; i < n; i++) {
    const si = shift[i] as number;
    let sum = b[i] as number;
    for (let k = first[i] as number; k < i; k++) sum -= (a[si + k] as number) * (b[k] as number);
    b[i] = sum; // L y = b
  }
  for (let i = 0; i < n; i++) b[i] = (b[i] as number) / (a[(shift[i] as number) + i] as number); // D z = y
  backSubstitute(first, shift, a, b, n);
}

/** x with A x = 0 when pivot `row` is zero: x_row = 1, and Lᵀ x = 0 in the rows before it; zero after it. */
export function nullVector({ n, first, shift }: Envelope, a: Float64Array, row: number): Float64Array {
  const x = new Float64Array(n);
  const s = shift[row] as number;
  for (let k = first[row] as number; k < row; k++) x[k] = -(a[s + k] as number);
  backSubstitute(first, shift, a, x, row);
  x[row] = 1;
  return x;
}

/** Lᵀ x = z over the first `n` rows, in place. */
function backSubstitute(
  first: Int32Array,
  shift: Int32Array,
  a: Float64Array,
  x: Float64Array,
  n: number,
): void {
  for (let i = n - 1; i > 0; i--) {
    const si = shift[i] as number;
    const xi = x[i] as number;
    for (let k = first[i] as number; k < i; k++) x[k] = (x[k] as number) - (a[si + k] as number) * xi;
  }
}
