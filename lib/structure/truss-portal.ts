// Portals with a truss for a beam: columns running through from the base to the top chord.

import type { Measure } from "../quantity/index.ts";
import { assemble } from "./assemble.ts";
import { positiveLength } from "./lengths.ts";
import { plainMember } from "./plain-member.ts";
import type { Base } from "./portal.ts";
import { withSections } from "./section.ts";
import { support } from "./support.ts";
import { chordJoints, chords, diagonalBars, type TrussOptions, verticals } from "./truss.ts";
import type { Joint, Structure } from "./types.ts";

export interface TrussPortalOptions extends Omit<TrussOptions, "supports"> {
  /** Base to bottom chord. */
  readonly height: Measure<"length">;
  readonly bases: Base | { readonly left: Base; readonly right: Base };
}

/** Bases A (left) and B (right), the truss as `truss` names it with its bars pinned, and columns AL0, L0U0 and BLn, LnUn
 *  in one piece each (group "columns"). */
export function trussPortal(options: TrussPortalOptions): Structure {
  const h = positiveLength(options.height, "height");
  const count = options.panels.length;
  const joints = chordJoints(options, h);
  const right = joints[count]?.x ?? 0;
  const fromX = joints[count]?.fromX ?? [];
  const feet: Joint[] = [
    { name: "A", x: 0, y: 0, fromX: [], fromY: [], from: [] },
    { name: "B", x: right, y: 0, fromX, fromY: [], from: fromX },
  ];
  const columns = [
    ["A", "L0"],
    ["L0", "U0"],
    ["B", `L${count}`],
    [`L${count}`, `U${count}`],
  ].map(([start = "", end = ""]) => plainMember(start, end, { group: "columns", from: h.from }));
  const { bases } = options;
  const plain = assemble({
    family: "general",
    form: "truss portal",
    joints: [...feet, ...joints],
    members: [
      ...columns,
      ...chords(count),
      ...verticals(count).slice(1, -1),
      ...diagonalBars(count, options.diagonals),
    ],
    supports: [
      support("A", typeof bases === "string" ? bases : bases.left),
      support("B", typeof bases === "string" ? bases : bases.right),
    ],
    hinges: [],
  });
  return withSections(plain, options.sections ?? {});
}
