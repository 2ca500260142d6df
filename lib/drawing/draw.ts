import { diagramPanels } from "./diagrams.ts";
import { freeBodyPanel } from "./free-body.ts";
import { mechanismPanel } from "./mechanism.ts";
import { rangePanels } from "./ranges.ts";
import { selfStressPanels } from "./self-stress.ts";
import { deflectionPanel, shapePanel } from "./shape.ts";
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
    case "self-stress":
      return selfStressPanels(spec);
    case "shape":
      return [shapePanel(spec)];
    case "deflection":
      return [deflectionPanel(spec)];
    case "ranges":
      return rangePanels(spec);
  }
}

/** A sketch as one SVG element, as wide as it needs up to 480 units (760 for frames of many bays), that shows alone or inside a page. `prefix` starts every id in it, so
 *  that figures of one page do not clash. Throws where the spec names what the structure has not, or a number is not
 *  finite. */
export function drawSketch(spec: SketchSpec, prefix: string): string {
  return writeSvg(panelsOf(spec), spec, prefix);
}
