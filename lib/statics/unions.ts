// Connected sets of bodies, small ones first.

import type { Body } from "./bodies.ts";
import { forcesOn } from "./equations.ts";

/** Beyond this many sets only the whole structure is tried, so that a large frame stays quick. */
const most = 4000;

/** Connected sets of two or more of the bodies, by size, then in the order of the bodies; at last all of them. */
export function unionsOf(bodies: readonly Body[], which: readonly number[]): readonly (readonly number[])[] {
  const forces = new Map(which.map((i) => [i, new Set(forcesOn(bodies, [i]))]));
  const touch = (i: number, k: number): boolean =>
    [...(forces.get(i) ?? [])].some((name) => forces.get(k)?.has(name));
  const neighbours = new Map(which.map((i) => [i, which.filter((k) => k !== i && touch(i, k))]));
  const found: (readonly number[])[] = [];
  const seen = new Set<string>();
  let layer: readonly (readonly number[])[] = which.map((i) => [i]);
  while (layer.length > 0 && found.length < most) {
    const grown: number[][] = [];
    for (const set of layer)
      for (const next of set.flatMap((i) => neighbours.get(i) ?? [])) {
        if (set.includes(next)) continue;
        const larger = [...set, next].sort((a, b) => a - b);
        const key = larger.join(" ");
        if (seen.has(key) || found.length + grown.length >= most) continue;
        seen.add(key);
        grown.push(larger);
      }
    grown.sort(byOrder);
    found.push(...grown);
    layer = grown;
  }
  return found.length < most ? found : [...found, [...which]];
}

function byOrder(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return (a[i] ?? 0) - (b[i] ?? 0);
  return 0;
}
