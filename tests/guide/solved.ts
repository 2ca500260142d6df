// A pinned portal under a load on its beam, solved by two hinges, for the tests of bands.

import { type Hand, type HingeSet, hinge, openSheet, type Sheet } from "../../lib/guide/index.ts";
import type { Entry } from "../../lib/sheet/index.ts";
import { type PortalOptions, portal, uniform } from "../../lib/structure/index.ts";
import type { Structure } from "../../lib/structure/types.ts";

export const head = {
  title: "Kiln hall, frame 2",
  job: "K-9",
  preparedBy: "IK",
  basis: "EN 1990:2002",
  units: "kN, m",
  status: "preliminary",
};

export interface Started {
  readonly sheet: Sheet;
  readonly frame: Structure;
}

/** Span 10 m, height 5 m, pinned unless said otherwise. */
export function started(options: Partial<PortalOptions> = {}, units = "kN, m"): Started {
  const sheet = openSheet({ ...head, units });
  return { sheet, frame: portal({ span: "10 m", height: "5 m", bases: "pinned", ...options }) };
}

/** 12 kN/m on the beam, two hinges at `at` from the knees. */
export function twoHinges({ sheet, frame }: Started, at: `${number} L` = "0.12 L", key = "G"): HingeSet {
  const G = sheet.loadCase(key, "gravity", uniform("BC", "12 kN/m"));
  return sheet.hinges(
    frame,
    [G],
    [
      hinge("BC", { from: "B", at, because: "beam about three times the columns" }),
      hinge("BC", { from: "C", at, symmetry: true, because: "symmetry of frame and load" }),
    ],
  );
}

export interface Solved extends Started {
  readonly hand: Hand;
}

export function solved(
  stated?: Parameters<Sheet["unknowns"]>[1],
  options: Partial<PortalOptions> = {},
  units = "kN, m",
): Solved {
  const begun = started(options, units);
  if (stated !== undefined) begun.sheet.unknowns(begun.frame, stated, { because: "sizes are still open" });
  return { ...begun, hand: begun.sheet.freeBodies(twoHinges(begun)) };
}

export const ofKind = <K extends Entry["kind"]>(
  sheet: Sheet,
  kind: K,
): readonly Extract<Entry, { kind: K }>[] =>
  sheet.entries().filter((entry): entry is Extract<Entry, { kind: K }> => entry.kind === kind);
