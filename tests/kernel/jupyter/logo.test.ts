import { crc32, inflateSync } from "node:zlib";
import { describe, expect, test } from "vitest";
import { logoPng, logoSvg } from "../../../kernel/jupyter/logo.ts";

describe("logoPng(size)", () => {
  test.each([32, 64])(
    "%i: signature, checks of every chunk and rows as the PNG specification has them",
    (size) => {
      const png = logoPng(size);
      expect([...png.subarray(0, 8)]).toEqual([137, 80, 78, 71, 13, 10, 26, 10]);
      const kinds: string[] = [];
      let pixels = 0;
      for (let at = 8; at < png.length; ) {
        const length = png.readUInt32BE(at);
        const body = png.subarray(at + 4, at + 8 + length);
        kinds.push(body.toString("latin1", 0, 4));
        expect(png.readUInt32BE(at + 8 + length)).toBe(crc32(body));
        if (kinds.at(-1) === "IDAT") pixels = inflateSync(body.subarray(4)).length;
        at += 12 + length;
      }
      expect(kinds).toEqual(["IHDR", "IDAT", "IEND"]);
      expect(pixels).toBe(size * (1 + 4 * size));
    },
  );
  test("the SVG names itself", () =>
    expect(logoSvg()).toMatch(/^<svg .*<title>hingebook<\/title>.*<\/svg>$/));
});
