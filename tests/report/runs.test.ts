import { describe, expect, it } from "vitest";
import { runsOf } from "../../lib/report/runs.ts";

describe("runsOf", () => {
  it.each([
    [[], []],
    [[7], [[7]]],
    [
      [5, 6],
      [[5], [6]],
    ],
    [[5, 6, 7], [[5, 6, 7]]],
    [
      [48, 10, 12, 11, 11, 49],
      [[10, 11, 12], [48], [49]],
    ],
  ])("runsOf(%j) is %j", (numbers, runs) => {
    expect(runsOf(numbers)).toEqual(runs);
  });
});
