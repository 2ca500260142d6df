// What is kept of the frames tried: the states of all their load cases, so that any result can be asked for later.

import { solveVaried, type Varied } from "./varied.ts";

/** Numbers kept at most, 8 bytes each; of more the frames are solved again when they are asked for. */
const limit = 1e7;

/** States of frames by their row. */
export interface States {
  readonly array: Float64Array;
  /** Where those of a row begin. */
  begin(row: number): number;
}

/** Solves the frames of the rows, all at once where there is room to keep them, otherwise one at a time. */
export function statesOf(varied: Varied, values: Float64Array, rows: number, room: number = limit): States {
  const count = varied.unknowns.length;
  const width = varied.size * varied.prepared.cases.length;
  const solveRow = (row: number, array: Float64Array, begin: number): void =>
    solveVaried(varied, values.subarray(row * count, (row + 1) * count), array, begin);
  if (rows * width > room) {
    const one = new Float64Array(width);
    let held = -1;
    const begin = (row: number): number => {
      if (held !== row) solveRow(row, one, 0);
      held = row;
      return 0;
    };
    return { array: one, begin };
  }
  const array = new Float64Array(rows * width);
  for (let row = 0; row < rows; row++) solveRow(row, array, row * width);
  return { array, begin: (row) => row * width };
}

/** States of further corners, solved when first asked for. */
export function cornerStates(
  varied: Varied,
  valuesAt: (corner: bigint) => Float64Array,
): (corner: bigint) => Float64Array {
  const width = varied.size * varied.prepared.cases.length;
  const kept = new Map<bigint, Float64Array>();
  return (corner) => {
    const found = kept.get(corner);
    if (found !== undefined) return found;
    const states = new Float64Array(width);
    solveVaried(varied, valuesAt(corner), states);
    if (kept.size * width < limit) kept.set(corner, states);
    return states;
  };
}
