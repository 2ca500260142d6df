import { describe, expect, it } from "vitest";
import { drawFigureParts } from "../../lib/report/figure.ts";
import { portalDiagrams } from "../drawing/fixtures.ts";
import { twelve } from "../drawing/twelve.ts";

describe("drawFigureParts", () => {
  it("drawFigureParts(diagrams of a portal) is one drawing", async () => {
    expect(await drawFigureParts(portalDiagrams, "f")).toHaveLength(1);
  });

  it("drawFigureParts(diagrams of a six-storey frame) is one drawing per quantity, with ids of their own", async () => {
    const parts = await drawFigureParts(twelve[11]?.diagrams ?? portalDiagrams, "f");
    expect(parts).toHaveLength(3);
    parts.forEach((svg, i) => {
      const quantity = "NVM"[i];
      expect(svg).toContain(
        `<title id="f-${quantity}-title">six-storey frame, internal forces: ${quantity}</title>`,
      );
      // Letters of 11 px need the drawing at its own size: it must go on an A4 page (about 815 px between the margins).
      expect(Number(/ height="([\d.]+)"/.exec(svg)?.[1])).toBeLessThan(815);
    });
  });
});
