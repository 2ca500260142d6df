// Hinges at the true points of inflection, for tests of the statics: wherever the true moment is zero a hinge changes nothing,
// so any determinate choice of such hinges must give the true forces.

import { determinacy } from "../../lib/statics/index.ts";
import { type HingeAt, type Structure, withHinges } from "../../lib/structure/index.ts";

/** Zeros inside (0, L) of a moment with end values MA, MB (sagging positive) under a uniform load w: the quadratic formula. */
export function zerosUnderUniform(L: number, MA: number, MB: number, w: number): readonly number[] {
  const slope = (MB - MA) / L + (w * L) / 2; // shear at the left end
  if (w === 0) return inside(L, slope === 0 ? [] : [-MA / slope]);
  const root = Math.sqrt(Math.max(0, slope ** 2 + 2 * w * MA));
  return inside(L, [(slope - root) / w, (slope + root) / w]);
}

/** The same under a force P at x = a: two straight lines. */
export function zerosUnderForce(L: number, MA: number, MB: number, P: number, a: number): readonly number[] {
  const slope = (MB - MA) / L + (P * (L - a)) / L;
  const Ma = MA + slope * a;
  const left = slope === 0 ? [] : [-MA / slope].filter((x) => x <= a);
  const right = [a - Ma / (slope - P)].filter((x) => x > a);
  return inside(L, [...left, ...right]);
}

function inside(L: number, places: readonly number[]): readonly number[] {
  return places.filter((x) => x > 1e-6 * L && x < (1 - 1e-6) * L);
}

/** Every choice of as many of the places as the degree asks for that leaves the structure determinate. */
export function determinateChoices(
  structure: Structure,
  places: readonly (readonly [member: string, x: number])[],
): readonly Structure[] {
  const degree = determinacy(structure).selfStress;
  return subsets(places, degree)
    .map((chosen) =>
      withHinges(
        structure,
        chosen.map(([member, x]): HingeAt => {
          const from = structure.members.find((m) => m.name === member)?.start ?? "";
          return { member, from, at: `${x} m` };
        }),
      ),
    )
    .filter((hinged) => determinacy(hinged).verdict === "determinate");
}

function subsets<T>(list: readonly T[], size: number): readonly (readonly T[])[] {
  if (size === 0) return [[]];
  return list.flatMap((first, i) => subsets(list.slice(i + 1), size - 1).map((rest) => [first, ...rest]));
}
