// Rank, null space and solutions of small dense systems by Gauss-Jordan elimination with complete pivoting,
// which reveals the rank: pivots fall, and those below the tolerance are zero.

/** Pivots below this part of the largest are zero; columns are brought to unit length before. */
const tolerance = 1e-10;

export interface Elimination {
  readonly rank: number;
  /** Smallest pivot kept over the largest: how far the rank is from being one less. */
  readonly margin: number;
  /** Basis of the x with A x = 0, one array per vector. */
  readonly nullSpace: readonly Float64Array[];
  /** For each right-hand side, one x with A x = b as far as b lies in the range; free components are zero. */
  readonly solutions: readonly Float64Array[];
}

/** Eliminates A (an array of rows) with right-hand sides. `columns` is needed when A has no rows. */
export function eliminate(
  matrix: readonly Float64Array[],
  columns: number,
  sides: readonly Float64Array[] = [],
): Elimination {
  const widths = columnLengths(matrix, columns);
  const rows = matrix.map((row, i) =>
    Float64Array.from({ length: columns + sides.length }, (_, k) =>
      k < columns ? (row[k] ?? 0) / (widths[k] ?? 1) : (sides[k - columns]?.[i] ?? 0),
    ),
  );
  const order = Array.from({ length: columns }, (_, k) => k);
  let rank = 0;
  let largest = 0;
  let smallest = 0;
  while (rank < Math.min(rows.length, columns)) {
    const pivot = largestEntry(rows, order, rank);
    if (rank === 0) largest = pivot.size;
    if (pivot.size <= tolerance * largest || pivot.size === 0) break;
    smallest = pivot.size;
    swap(rows, rank, pivot.row);
    swap(order, rank, pivot.place);
    clear(rows, rank, order[rank] ?? 0);
    rank += 1;
  }
  return {
    rank,
    margin: rank === 0 ? 0 : smallest / largest,
    nullSpace: order.slice(rank).map((free) => nullVector(rows, order, rank, free, widths)),
    solutions: sides.map((_, k) => solution(rows, order, rank, columns + k, widths)),
  };
}

/** The transposed matrix; `columns` is the number of columns of the original. */
export function transposed(matrix: readonly Float64Array[], columns: number): Float64Array[] {
  return Array.from({ length: columns }, (_, k) => Float64Array.from(matrix, (row) => row[k] ?? 0));
}

/** The same space with a basis in which each vector has a component of its own (reduced echelon form), so that motions come apart. */
export function separated(vectors: readonly Float64Array[]): readonly Float64Array[] {
  const rows = vectors.map((v) => v.slice());
  const order = Array.from({ length: rows[0]?.length ?? 0 }, (_, k) => k);
  for (let done = 0; done < rows.length; done++) {
    const pivot = largestEntry(rows, order, done);
    swap(rows, done, pivot.row);
    swap(order, done, pivot.place);
    clear(rows, done, order[done] ?? 0);
  }
  return rows;
}

function columnLengths(matrix: readonly Float64Array[], columns: number): Float64Array {
  const squares = new Float64Array(columns);
  for (const row of matrix)
    for (let k = 0; k < columns; k++) squares[k] = (squares[k] ?? 0) + (row[k] ?? 0) ** 2;
  return squares.map((square) => (square === 0 ? 1 : Math.sqrt(square)));
}

function largestEntry(
  rows: readonly Float64Array[],
  order: readonly number[],
  done: number,
): { readonly row: number; readonly place: number; readonly size: number } {
  let best = { row: done, place: done, size: 0 };
  for (let i = done; i < rows.length; i++)
    for (let k = done; k < order.length; k++) {
      const size = Math.abs(rows[i]?.[order[k] ?? 0] ?? 0);
      if (size > best.size) best = { row: i, place: k, size };
    }
  return best;
}

function swap<T>(list: T[], i: number, k: number): void {
  const [one, other] = [list[i], list[k]];
  if (one === undefined || other === undefined) return;
  list[i] = other;
  list[k] = one;
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

function nullVector(
  rows: readonly Float64Array[],
  order: readonly number[],
  rank: number,
  free: number,
  widths: Float64Array,
): Float64Array {
  const x = new Float64Array(order.length);
  x[free] = 1 / (widths[free] ?? 1);
  for (let i = 0; i < rank; i++) {
    const column = order[i] ?? 0;
    x[column] = -(rows[i]?.[free] ?? 0) / (widths[column] ?? 1);
  }
  return x;
}

function solution(
  rows: readonly Float64Array[],
  order: readonly number[],
  rank: number,
  side: number,
  widths: Float64Array,
): Float64Array {
  const x = new Float64Array(order.length);
  for (let i = 0; i < rank; i++) {
    const column = order[i] ?? 0;
    x[column] = (rows[i]?.[side] ?? 0) / (widths[column] ?? 1);
  }
  return x;
}
