import { describe, expect, test } from "vitest";
import { CellIdentities, namesMade } from "../../../kernel/jupyter/cell-identity.ts";

const GIVEN = 'const q = sheet.given("q", "4 kN/m", "load on the beam");';

describe("CellIdentities.identify(text, given)", () => {
  test("the same text is the same cell", () => {
    const cells = new CellIdentities();
    expect(cells.identify(GIVEN)).toBe(cells.identify(GIVEN));
  });
  test("a cell edited is the same cell, again and again", () => {
    const cells = new CellIdentities();
    const first = cells.identify(GIVEN);
    expect(cells.identify(GIVEN.replace("4 kN/m", "8 kN/m"))).toBe(first);
    expect(cells.identify(GIVEN.replace("4 kN/m", "9 kN/m").replace("beam", "roof beam"))).toBe(first);
  });
  test("cells that look alike and make other names are two", () => {
    const cells = new CellIdentities();
    const one = cells.identify('sheet.calc("M_1 = q*L^2/8", "kN m", "at midspan")');
    expect(cells.identify('sheet.calc("M_2 = q*L^2/9", "kN m", "at midspan")')).not.toBe(one);
  });
  test("another cell that uses the same name for something else is another cell", () => {
    const cells = new CellIdentities();
    const one = cells.identify(GIVEN);
    expect(cells.identify("const q = frame.members.filter((m) => m.start === 'A').length;")).not.toBe(one);
  });
  test("the front end's own id is believed", () => {
    const cells = new CellIdentities();
    expect(cells.identify(GIVEN, "own")).toBe("own");
    expect(cells.identify(GIVEN)).not.toBe("own");
  });
  test("names made: declarations, and symbols given to the sheet", () => {
    expect([
      ...namesMade('const a = 1; sheet.calc("M_0 = q*L", "kN", ""); sheet.note("a text of words")'),
    ]).toEqual(["a", "symbol M_0"]);
  });
});
