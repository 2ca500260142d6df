// Rank, null space and solutions of systems of equations by sparse Gauss elimination. Among the entries at least a tenth of
// the largest left, the pivot is the one that fills in least (Markowitz), so pivots fall nearly as with complete pivoting and
// reveal the rank: those below the tolerance are zero.
// Source: H. M. Markowitz, Management Science 3 (1957) 255-269; threshold pivoting: Duff, Erisman & Reid,
// Direct Methods for Sparse Matrices (both from memory).

/** Pivots below this part of the largest are zero; columns are brought to unit length before. */
const tolerance = 1e-10;
/** A pivot is at least this part of the largest entry left. */
const threshold = 0.1;
/** Entries below this, of at most 1 at first, are rounding and dropped. */
const dropped = 1e-15;

export interface Elimination {
  readonly rank: number;
  /** Smallest pivot kept over the largest: how far the rank is from being one less. */
  readonly margin: number;
  /** Basis of the x with A x = 0, one array per vector. */
  readonly nullSpace: readonly Float64Array[];
  /** For each right-hand side, one x with A x = b as far as b lies in the range; free components are zero. */
  readonly solutions: readonly Float64Array[];
}

/** The entries of a row that are not zero, and its right-hand sides. */
interface Row {
  columns: number[];
  values: number[];
  readonly sides: Float64Array;
}

/** A row that served as pivot; its pivot comes first. */
interface Pivot {
  readonly row: Row;
  readonly column: number;
  readonly value: number;
}

/** Eliminates A (an array of rows) with right-hand sides. `columns` is needed when A has no rows. */
export function eliminate(
  matrix: readonly Float64Array[],
  columns: number,
  sides: readonly Float64Array[] = [],
): Elimination {
  const { pivots, widths } = forward(matrix, columns, sides);
  const bound = new Set(pivots.map((p) => p.column));
  const free = Array.from({ length: columns }, (_, k) => k).filter((k) => !bound.has(k));
  const sizes = pivots.map((p) => Math.abs(p.value));
  const largest = Math.max(0, ...sizes);
  const unscaled = (x: Float64Array): Float64Array => x.map((v, k) => v / (widths[k] ?? 1));
  return {
    rank: pivots.length,
    margin: largest === 0 ? 0 : Math.min(...sizes) / largest,
    nullSpace: free.map((k) => unscaled(backward(pivots, columns, { free: k }))),
    solutions: sides.map((_, k) => unscaled(backward(pivots, columns, { side: k }))),
  };
}

/** The rank alone. */
export function rankOf(matrix: readonly Float64Array[], columns: number): number {
  return forward(matrix, columns, []).pivots.length;
}

/** The transposed matrix; `columns` is the number of columns of the original. */
export function transposed(matrix: readonly Float64Array[], columns: number): Float64Array[] {
  return Array.from({ length: columns }, (_, k) => Float64Array.from(matrix, (row) => row[k] ?? 0));
}

/** The same space with a basis in which each vector has a component of its own (reduced echelon form), so that vectors come apart. */
export function separated(vectors: readonly Float64Array[]): readonly Float64Array[] {
  const rows = vectors.map((v) => v.slice());
  rows.forEach((_, done) => {
    let best = { row: done, column: 0, size: 0 };
    for (let i = done; i < rows.length; i++)
      rows[i]?.forEach((value, column) => {
        if (Math.abs(value) > best.size) best = { row: i, column, size: Math.abs(value) };
      });
    const [one, other] = [rows[done], rows[best.row]];
    if (one === undefined || other === undefined || best.size === 0) return;
    [rows[done], rows[best.row]] = [other, one];
    clear(rows, done, best.column);
  });
  return rows;
}

function forward(
  matrix: readonly Float64Array[],
  columns: number,
  sides: readonly Float64Array[],
): { readonly pivots: readonly Pivot[]; readonly widths: Float64Array } {
  const widths = columnLengths(matrix, columns);
  let left = matrix.map((row, i) =>
    sparse(
      row,
      widths,
      Float64Array.from(sides, (side) => side[i] ?? 0),
    ),
  );
  const work = new Float64Array(columns);
  const pivots: Pivot[] = [];
  let first = 0;
  while (left.length > 0 && pivots.length < columns) {
    const found = nextPivot(left, columns);
    if (found === undefined || found.largest <= tolerance * first) break;
    first = Math.max(first, found.largest);
    const { row, place } = found;
    const [column, value] = [row.columns[place] ?? 0, row.values[place] ?? 1];
    pivots.push({ row, column, value });
    left = left.filter((other) => other !== row);
    for (const other of left) {
      const at = other.columns.indexOf(column);
      if (at >= 0) subtract(other, row, (other.values[at] ?? 0) / value, column, work);
    }
  }
  return { pivots, widths };
}

function sparse(row: Float64Array, widths: Float64Array, sides: Float64Array): Row {
  const columns: number[] = [];
  const values: number[] = [];
  for (let k = 0; k < row.length; k++) {
    const value = row[k] ?? 0;
    if (value === 0) continue;
    columns.push(k);
    values.push(value / (widths[k] ?? 1));
  }
  return { columns, values, sides };
}

function nextPivot(
  rows: readonly Row[],
  columns: number,
): { readonly row: Row; readonly place: number; readonly largest: number } | undefined {
  const count = new Int32Array(columns);
  let largest = 0;
  for (const row of rows)
    for (let k = 0; k < row.columns.length; k++) {
      const at = row.columns[k] ?? 0;
      count[at] = (count[at] ?? 0) + 1;
      const size = Math.abs(row.values[k] ?? 0);
      if (size > largest) largest = size;
    }
  if (largest === 0) return undefined;
  let best: { row: Row; place: number; fill: number; size: number } | undefined;
  for (const row of rows)
    for (let place = 0; place < row.columns.length; place++) {
      const size = Math.abs(row.values[place] ?? 0);
      if (size < threshold * largest) continue;
      const fill = (row.columns.length - 1) * ((count[row.columns[place] ?? 0] ?? 1) - 1);
      if (best === undefined || fill < best.fill || (fill === best.fill && size > best.size))
        best = { row, place, fill, size };
    }
  return best === undefined ? undefined : { row: best.row, place: best.place, largest };
}

/** Takes `factor` times the pivot row from a row; its entry in the pivot's column goes. */
function subtract(row: Row, pivot: Row, factor: number, column: number, work: Float64Array): void {
  for (let k = 0; k < row.columns.length; k++) work[row.columns[k] ?? 0] = row.values[k] ?? 0;
  const own = row.columns;
  const columns: number[] = [];
  const values: number[] = [];
  const keep = (k: number): void => {
    const value = work[k] ?? 0;
    work[k] = 0;
    if (k === column || Math.abs(value) <= dropped) return;
    columns.push(k);
    values.push(value);
  };
  for (let k = 0; k < pivot.columns.length; k++) {
    const at = pivot.columns[k] ?? 0;
    work[at] = (work[at] ?? 0) - factor * (pivot.values[k] ?? 0);
  }
  for (const k of own) keep(k);
  for (const k of pivot.columns) if (work[k] !== 0) keep(k);
  row.columns = columns;
  row.values = values;
  for (let k = 0; k < row.sides.length; k++)
    row.sides[k] = (row.sides[k] ?? 0) - factor * (pivot.sides[k] ?? 0);
}

/** Solves the pivot rows from the last to the first: with one free component 1, or with a right-hand side. */
function backward(
  pivots: readonly Pivot[],
  columns: number,
  { free, side }: { readonly free?: number; readonly side?: number },
): Float64Array {
  const x = new Float64Array(columns);
  if (free !== undefined) x[free] = 1;
  for (let i = pivots.length - 1; i >= 0; i--) {
    const pivot = pivots[i];
    if (pivot === undefined) continue;
    let sum = side === undefined ? 0 : (pivot.row.sides[side] ?? 0);
    for (let k = 0; k < pivot.row.columns.length; k++) {
      const at = pivot.row.columns[k] ?? 0;
      if (at !== pivot.column) sum -= (pivot.row.values[k] ?? 0) * (x[at] ?? 0);
    }
    x[pivot.column] = sum / pivot.value;
  }
  return x;
}

function columnLengths(matrix: readonly Float64Array[], columns: number): Float64Array {
  const squares = new Float64Array(columns);
  for (const row of matrix)
    for (let k = 0; k < columns; k++) squares[k] = (squares[k] ?? 0) + (row[k] ?? 0) ** 2;
  return squares.map((square) => (square === 0 ? 1 : Math.sqrt(square)));
}

/** Makes the pivot of row `i` one and its column zero elsewhere. */
function clear(rows: readonly Float64Array[], i: number, column: number): void {
  const row = rows[i];
  if (row === undefined) return;
  const pivot = row[column] ?? 1;
  for (let k = 0; k < row.length; k++) row[k] = (row[k] ?? 0) / pivot;
  rows.forEach((other, j) => {
    const factor = other[column] ?? 0;
    if (j === i || factor === 0) return;
    for (let k = 0; k < row.length; k++) other[k] = (other[k] ?? 0) - factor * (row[k] ?? 0);
    other[column] = 0;
  });
}
