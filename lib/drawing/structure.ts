// The structure as the engineer sketches it first: members, supports, hinges, loads, dimensions.

import { dimensioned } from "./dimensions.ts";
import { extentOf } from "./extent.ts";
import { imposed } from "./imposed.ts";
import { loads } from "./loads.ts";
import { hinges, jointNames, memberLines, worldPoints } from "./members.ts";
import { fitted, type Laid } from "./scale.ts";
import { type Label, merge, PENS, scene } from "./scene.ts";
import type { StructureFigure } from "./spec.ts";
import { supports } from "./supports.ts";

const TALLEST = 300;

/** Layout of a structure figure. */
export function structurePanel(spec: StructureFigure): Laid {
  const extent = extentOf(spec.structure);
  return fitted(
    worldPoints(spec.structure),
    (scale) => {
      const skeleton = merge(
        supports(spec.structure, scale),
        memberLines(spec.structure, scale, PENS.member),
      );
      const acting = loads(spec.structure, spec.loads, spec.loadTexts ?? [], scale, skeleton);
      const ground = imposed(spec.structure, spec.imposed ?? [], spec.imposedTexts ?? [], scale);
      const texts = (spec.labels ?? []).map(
        ({ at, text }): Label => ({ text, at: scale.page(...at), prefer: [1, -1], gap: 6 }),
      );
      const points = merge(hinges(spec.structure, scale), jointNames(spec.structure, scale, extent.size));
      return dimensioned(
        spec.dimensions ?? [],
        scale,
        merge(skeleton, acting, ground, points, scene([], texts)),
      );
    },
    extent.tallest(TALLEST),
    extent.page,
  );
}
