// Line numbers in short: what follows without a gap is named by its ends.

/** Numbers that follow one another, ascending. */
export type Run = readonly number[];

/** Numbers gathered into runs, each number once, ascending. Two that follow one another stay apart: "5, 6" is no longer
 *  than "5 to 6". */
export function runsOf(numbers: readonly number[]): readonly Run[] {
  const runs: number[][] = [];
  for (const n of [...new Set(numbers)].sort((a, b) => a - b)) {
    const last = runs.at(-1);
    if (last?.at(-1) === n - 1) last.push(n);
    else runs.push([n]);
  }
  return runs.flatMap((run) => (run.length === 2 ? run.map((n) => [n]) : [run]));
}
