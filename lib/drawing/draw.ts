import { diagramPanels } from "./diagrams.ts";
import { freeBodyPanel } from "./free-body.ts";
import { mechanismPanel } from "./mechanism.ts";
import type { SketchSpec } from "./spec.ts";
import { structurePanel } from "./structure.ts";
import { type Panel, writeSvg } from "./svg.ts";

/** The panels of a sketch with their labels placed. */
export function panelsOf(spec: SketchSpec): readonly Panel[] {
  switch (spec.kind) {
    case "structure":
      return [{ laid: structurePanel(spec) }];
    case "mechanism":
      return [{ laid: mechanismPanel(spec) }];
    case "free body":
      return [{ laid: freeBodyPanel(spec) }];
    case "diagrams":
      return diagramPanels(spec);
  }
}

/** A sketch as one SVG element, 480 units wide, that shows alone or inside a page. `prefix` starts every id in it, so
 *  that figures of one page do not clash. Throws where the spec names what the structure has not, or a number is not
 *  finite. */
export function drawSketch(spec: SketchSpec, prefix: string): string {
  return writeSvg(panelsOf(spec), spec, prefix);
}
