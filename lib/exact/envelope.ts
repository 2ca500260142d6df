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

/** Pivots below this part of their diagonal entry are looked at before they are used. */
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

/** Factors A = L D Lᵀ in place from row `from` on (those before are factored): L below the diagonal, D on it.
 *  Stops after the first row whose pivot is below 1e-8 of its diagonal entry or not positive, and returns that row;
 *  n when all is done. */
export function factorize({ n, first, shift }: Envelope, a: Float64Array, from = 0): number {
  for (let i = from; i < n; i++) {
    const si = shift[i] as number;
    const fi = first[i] as number;
    for (let j = fi + 1; j < i; j++) {
      const sj = shift[j] as number;
      const from = Math.max(first[j] as number, fi);
      a[si + j] = (a[si + j] as number) - dot(a, si + from, sj + from, j - from); // g_ij = a_ij - Σ g_ik l_jk
    }
    const diagonal = a[si + i] as number;
    let d = diagonal;
    for (let j = fi; j < i; j++) {
      const g = a[si + j] as number;
      const l = g / (a[(shift[j] as number) + j] as number); // l_ij = g_ij / d_j
      d -= l * g; // d_i = a_ii - Σ l_ij g_ij
      a[si + j] = l;
    }
    a[si + i] = d;
    if (!(d > suspect * diagonal)) return i;
  }
  return n;
}

/** Σ a[p + k] a[q + k] over k < count; four sums at a time, so that additions need not wait for each other. */
function dot(a: Float64Array, p: number, q: number, count: number): number {
  let [s0, s1, s2, s3] = [0, 0, 0, 0];
  let k = 0;
  for (; k + 3 < count; k += 4) {
    s0 += (a[p + k] as number) * (a[q + k] as number);
    s1 += (a[p + k + 1] as number) * (a[q + k + 1] as number);
    s2 += (a[p + k + 2] as number) * (a[q + k + 2] as number);
    s3 += (a[p + k + 3] as number) * (a[q + k + 3] as number);
  }
  for (; k < count; k++) s0 += (a[p + k] as number) * (a[q + k] as number);
  return s0 + s1 + (s2 + s3);
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
