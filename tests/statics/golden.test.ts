// Free bodies printed step by step, compared with files that were read by eye as an engineer would read them: each step has one
// unknown, or says which it was taken together with, and a person would choose it.

import { describe, expect, it } from "vitest";
import { freeBodies } from "../../lib/statics/index.ts";
import { expectGolden } from "../drawing/golden.ts";
import { goldenFrames } from "./golden-frames.ts";
import { printed } from "./printed.ts";

describe("free bodies as golden text", () => {
  it.each(goldenFrames)("$file", ({ file, title, of, loads }) => {
    expectGolden(import.meta.url, file, printed(title, freeBodies(of, loads)));
  });

  it("there are ten, the first five asked for by name", () => {
    expect(goldenFrames.map(({ file }) => file[0]).join("")).toBe("abcdefghij");
  });
});
