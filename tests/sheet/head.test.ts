import { describe, expect, test } from "vitest";
import { checkedHead } from "../../lib/sheet/head.ts";
import { head } from "./notebook.ts";

describe("checkedHead", () => {
  test("checkedHead keeps who checked and approved, and when", () => {
    const signed = {
      ...head,
      checkedBy: "AB",
      checkedOn: "2026-03-04",
      approvedBy: "CD",
      approvedOn: "2026-03-05",
    };
    expect(checkedHead(signed)).toEqual(signed);
    expect(Object.isFrozen(checkedHead(signed))).toBe(true);
  });

  test("checkedHead(misspelt date) names the nearest field", () => {
    const wrong = { ...head, checkdOn: "2026-03-04" };
    expect(() => checkedHead(wrong)).toThrow('"checkdOn" is not a field; did you mean "checkedOn"?');
  });
});
