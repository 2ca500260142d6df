// Connected sets of bodies, small ones first.

import type { Body } from "./bodies.ts";
import { forcesOn } from "./equations.ts";

/** Beyond this many sets only the whole structure is tried, so that a large frame stays quick. */
const most = 4000;

/** Connected sets of two or more of the bodies, by size, then in the order of the bodies; at last all of them.
 *  Only forces not found yet connect: there is no reason to join bodies across a known one. */
export function* unionsOf(
  bodies: readonly Body[],
  which: readonly number[],
  isOpen: (force: string) => boolean,
): Generator<readonly number[]> {
  const neighbours = neighboursOf(bodies, which, isOpen);
  const seen = new Set<string>();
  let count = 0;
  let layer: readonly (readonly number[])[] = which
    .filter((i) => (neighbours.get(i) ?? []).length > 0)
    .map((i) => [i]);
  while (layer.length > 0 && count < most) {
    const grown: number[][] = [];
    for (const set of layer)
      for (const next of set.flatMap((i) => neighbours.get(i) ?? [])) {
        if (set.includes(next) || count + grown.length >= most) continue;
        const larger = [...set, next].sort((a, b) => a - b);
        const key = larger.join(" ");
        if (seen.has(key)) continue;
        seen.add(key);
        grown.push(larger);
      }
    grown.sort(byOrder);
    count += grown.length;
    yield* grown;
    layer = grown;
  }
  if (count >= most) yield [...which];
}

function neighboursOf(
  bodies: readonly Body[],
  which: readonly number[],
  isOpen: (force: string) => boolean,
): ReadonlyMap<number, readonly number[]> {
  const holders = new Map<string, number[]>();
  for (const i of which)
    for (const name of forcesOn(bodies, [i])) {
      if (!isOpen(name)) continue;
      const list = holders.get(name);
      if (list === undefined) holders.set(name, [i]);
      else list.push(i);
    }
  const sets = new Map(which.map((i) => [i, new Set<number>()]));
  for (const list of holders.values())
    for (const i of list) for (const k of list) if (i !== k) sets.get(i)?.add(k);
  return new Map([...sets].map(([i, set]) => [i, [...set].sort((a, b) => a - b)]));
}

function byOrder(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return (a[i] ?? 0) - (b[i] ?? 0);
  return 0;
}
