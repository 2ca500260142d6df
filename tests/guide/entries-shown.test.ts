import { beforeEach, describe, expect, test } from "vitest";
import { hinge, openSheet, portal, uniform } from "../../lib/index.ts";
import { forgetLedger } from "../../lib/sheet/index.ts";

const displayOf = (value: object): Record<string, string> =>
  (value as Record<symbol, () => Record<string, string>>)[Symbol.for("Jupyter.display")]?.() ?? {};

function solved() {
  const sheet = openSheet({
    title: "Bench frame",
    job: "1",
    preparedBy: "KL",
    basis: "trial",
    units: "kN, m",
    status: "preliminary",
  });
  const frame = portal({ span: "10 m", height: "4 m", bases: "pinned" });
  const G = sheet.loadCase("G", "permanent", uniform("BC", "6 kN/m"));
  const set = sheet.hinges(
    frame,
    [G],
    [
      hinge("BC", { from: "B", at: "0.12 L", because: "stiff beam" }),
      hinge("BC", { from: "C", at: "0.12 L", symmetry: true, because: "symmetry" }),
    ],
  );
  return { sheet, hand: sheet.freeBodies(set) };
}

beforeEach(() => forgetLedger());

describe("what verbs answer shows itself by what they recorded", () => {
  test("freeBodies: figures, equations and their results, and no object's insides", () => {
    const { hand } = solved();
    const { "text/html": html = "", "text/plain": plain = "" } = displayOf(hand);
    expect(html.match(/<figure><svg/g)?.length).toBeGreaterThanOrEqual(3);
    expect(html.match(/<math/g)?.length).toBeGreaterThan(20);
    expect(plain).toMatch(/30\.0 kN/); // 6 · 10 / 2 on each support
    expect(`${html}${plain}`).not.toMatch(/\[object Object\]|undefined|NaN/);
  });

  test("figures of one page share no id", () => {
    const { hand } = solved();
    const ids = [...(displayOf(hand)["text/html"] ?? "").matchAll(/ id="([^"]+)"/g)].map((match) => match[1]);
    expect(ids.length).toBeGreaterThan(3);
    expect(new Set(ids).size).toBe(ids.length);
  });

  test("reactions: a table, and still a list of supports", () => {
    const { sheet, hand } = solved();
    const reactions = sheet.reactions(hand);
    expect(Array.isArray(reactions)).toBe(true);
    expect(reactions.map(({ joint }) => joint)).toEqual(["A", "D"]);
    expect(displayOf(reactions)["text/html"]).toMatch(
      /<table><caption>Reactions under G[\s\S]*<td>30\.0 kN<br><small>same in all<\/small><\/td>/,
    );
  });

  test("what was not considered is shown as it was said", () => {
    const { sheet } = solved();
    const said = sheet.notConsidered("fire", "drift");
    expect(displayOf(said)).toEqual({ "text/plain": "not considered:\n  fire\n  drift" });
    expect([...said]).toEqual(["fire", "drift"]);
  });

  test("a conclusion is its words, escaped where they are shown as HTML", () => {
    const { sheet } = solved();
    expect(displayOf(sheet.conclude("M <= 10 & no more"))).toEqual({
      "text/html": "<p>M &lt;= 10 &amp; no more</p>",
      "text/plain": "M <= 10 & no more",
    });
  });
});
