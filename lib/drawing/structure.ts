// The structure as the engineer sketches it first: members, supports, hinges, loads, dimensions.

import { dimensioned } from "./dimensions.ts";
import { loads } from "./loads.ts";
import { hinges, jointNames, memberLines, worldPoints } from "./members.ts";
import { fitted, type Laid } from "./scale.ts";
import { type Label, merge, PENS, scene } from "./scene.ts";
import type { StructureFigure } from "./spec.ts";
import { supports } from "./supports.ts";

const TALLEST = 300;

/** Layout of a structure figure. */
export function structurePanel(spec: StructureFigure): Laid {
  return fitted(
    worldPoints(spec.structure),
    (scale) => {
      const skeleton = merge(
        supports(spec.structure, scale),
        memberLines(spec.structure, scale, PENS.member),
      );
      const acting = loads(spec.structure, spec.loads, spec.loadTexts ?? [], scale, skeleton);
      const texts = (spec.labels ?? []).map(
        ({ at, text }): Label => ({ text, at: scale.page(...at), prefer: [1, -1], gap: 6 }),
      );
      const points = merge(hinges(spec.structure, scale), jointNames(spec.structure, scale));
      return dimensioned(spec.dimensions ?? [], scale, merge(skeleton, acting, points, scene([], texts)));
    },
    TALLEST,
  );
}
