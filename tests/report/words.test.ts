import { describe, expect, it } from "vitest";
import { unbroken, withMinus } from "../../lib/report/words.ts";

describe("unbroken", () => {
  it.each([
    ["1.45 m from B", "1.45\u00a0m from B"],
    ["5 kN and 3 kip", "5\u00a0kN and 3\u00a0kip"],
    ["2 members, 10 % more", "2 members, 10\u00a0% more"],
  ])("unbroken(%j) is %j", (text, expected) => {
    expect(unbroken(text)).toBe(expected);
  });
});

describe("withMinus", () => {
  it.each([
    ["9 - 4 = -1", "9 − 4 = −1"],
    ["three-hinged S-102", "three-hinged S-102"],
  ])("withMinus(%j) is %j", (text, expected) => {
    expect(withMinus(text)).toBe(expected);
  });
});
