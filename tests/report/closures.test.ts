import { describe, expect, it } from "vitest";
import { commonWords } from "../../lib/report/closures.ts";

describe("commonWords", () => {
  it("commonWords(several) parts what all say from what each says", () => {
    const texts = ["G + S: column CD: closes", "G + S: beam from B to h1: closes"];
    expect(commonWords(texts)).toEqual({
      common: ["G + S", "closes"],
      own: ["column CD", "beam from B to h1"],
    });
  });

  it("commonWords(one) leaves it whole", () => {
    expect(commonWords(["G: joint B: closes"])).toEqual({ common: [], own: ["G: joint B: closes"] });
  });
});
