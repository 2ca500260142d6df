// Girders of rectangular panels without diagonals: chords and posts rigidly connected.

import { assemble } from "./assemble.ts";
import { withSections } from "./section.ts";
import { heldCount, support } from "./support.ts";
import { chordJoints, chords, type TrussOptions, verticals } from "./truss.ts";
import type { Structure } from "./types.ts";

/** Panels, depth, supports and sections as for a truss; groups "bottom chord", "top chord" and "posts". */
export type PanelGirderOptions = Omit<TrussOptions, "diagonals">;

/** A girder with joints L0, L1 ... below and U0, U1 ... above, all connections rigid. */
export function panelGirder(options: PanelGirderOptions): Structure {
  const count = options.panels.length;
  const posts = verticals(count, false).map((post) => ({ ...post, group: "posts" }));
  const supports = options.supports ?? { L0: "pinned", [`L${count}`]: "roller" };
  const plain = assemble({
    family: "general",
    form: "panel girder",
    joints: chordJoints(options),
    members: [...chords(count, false), ...posts],
    supports: Object.entries(supports)
      .map(([joint, choice]) => support(joint, choice))
      .filter((s) => heldCount(s) > 0),
    hinges: [],
  });
  return withSections(plain, options.sections ?? {});
}
