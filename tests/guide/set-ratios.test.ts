// Ratios given with hinges are where the default bands of their frame start from, when nobody states what is unknown.

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type HingeSet, hinge } from "../../lib/guide/index.ts";
import { attachHost, forgetLedger } from "../../lib/sheet/index.ts";
import { buildingFrame, type StiffnessRatios, uniform } from "../../lib/structure/index.ts";
import { ofKind, type Started, started, twoHinges } from "./solved.ts";

beforeEach(() => forgetLedger());
afterEach(() => {
  attachHost();
  forgetLedger();
});

const ratio = "I of beam / I of columns";

function byRatios({ sheet, frame }: Started, ratios: StiffnessRatios, name = "G"): HingeSet {
  const G = sheet.loadCase("G", "gravity", uniform("BC", "12 kN/m"));
  const by = { by: "relative stiffness", ratios, because: "like frames" } as const;
  const ends = [hinge("BC", { from: "B", ...by }), hinge("BC", { from: "C", ...by, symmetry: true })];
  return sheet.hinges(frame, [G], ends, { name });
}

const statement = ({ sheet }: Started) =>
  ofKind(sheet, "assumption").filter(({ id }) => id.startsWith("unknowns of"))[0];
const queries = ({ sheet }: Started) => ofKind(sheet, "query").map(({ text }) => text);
function bandOf({ sheet }: Started, set: HingeSet): unknown {
  sheet.result("M_B", sheet.freeBodies(set).moment("BC", { at: "B" }));
  const entry = sheet.entry("M_B");
  return entry?.kind === "result" ? entry.band?.against : undefined;
}

describe("the default bands of a frame whose hinges were placed by ratios", () => {
  test("start from those, printed, with what the ratio came from", () => {
    const begun = started();
    const r = begun.sheet.assume("r_I", 2.5, "two like halls");
    const band = bandOf(begun, byRatios(begun, { [ratio]: r }));
    const said = statement(begun);
    expect(said?.uses).toEqual(["r_I@1"]);
    expect(said?.text).toMatch(
      /^Not known of the frame ABCD: taken by default: A of columns 0\.5 to 2 times nominal, I of beam \/ I of columns 1\.25 to 5, /,
    );
    expect(said?.text).toContain("nominal: I of beam 2.5 times I of columns, A of beam ");
    expect(said?.because).toContain("about the ratios the hinges under G were placed by");
    const table = ofKind(begun.sheet, "table").find(({ id }) => id.startsWith("ranges of unknowns"));
    expect(table?.rows).toContainEqual([ratio, "2.5", "1.25", "5", expect.stringMatching(/; by default$/)]);
    expect(queries(begun)).toEqual([]);
    forgetLedger();
    const stating = started();
    stating.sheet.unknowns(stating.frame, { [ratio]: "2.5 within 2" }, { because: "the same, stated" });
    expect(bandOf(stating, byRatios(stating, { [ratio]: 2.5 }))).toEqual(band);
    forgetLedger();
    const plain = started();
    expect(bandOf(plain, twoHinges(plain))).not.toEqual(band);
  });

  test("of a building frame under gravity likewise", () => {
    const begun = started();
    const frame = buildingFrame({ bays: ["6 m", "7 m"], storeys: ["4 m"], bases: "fixed" });
    const beams = frame.members.filter(({ group }) => group === "beams").map(({ name }) => name);
    const G = begun.sheet.loadCase("G", "gravity", ...beams.map((name) => uniform(name, "20 kN/m")));
    const given = { place: "relative stiffness", ratios: { "I of beams / I of columns": 3 } } as const;
    const set = begun.sheet.gravity(frame, [G], { ...given, because: "like frames" });
    expect(set.ratios).toEqual([given.ratios]);
    begun.sheet.freeBodies(set);
    expect(statement(begun)?.text).toContain("I of beams / I of columns 1.5 to 6");
  });

  test("start from a set of the frame already on the sheet, though another is solved first", () => {
    const begun = started();
    byRatios(begun, { [ratio]: 2.5 });
    begun.sheet.freeBodies(twoHinges(begun, "0.12 L", "S"));
    expect(statement(begun)?.text).toContain("I of beam / I of columns 1.25 to 5");
    expect(queries(begun)).toEqual([]);
  });

  test("start from the first of several sets; one that disagrees is queried, one written the other way round is not", () => {
    const begun = started();
    const [first, other, same] = [
      byRatios(begun, { [ratio]: 2.5 }, "G"),
      byRatios(begun, { [ratio]: 4 }, "G, stiffer"),
      byRatios(begun, { "I of columns / I of beam": 0.4 }, "G again"),
    ];
    begun.sheet.freeBodies(first);
    begun.sheet.freeBodies(same);
    expect(queries(begun)).toEqual([]);
    begun.sheet.freeBodies(other);
    expect(statement(begun)?.text).toContain("I of beam / I of columns 1.25 to 5");
    expect(queries(begun)).toEqual([
      expect.stringMatching(
        /^Hinges under G, stiffer were placed by I of beam \/ I of columns = 4, but the bands of this frame start from other ratios \(I of beam 2\.5 times I of columns, A of beam .* One frame has one relative stiffness/,
      ),
    ]);
  });

  test("start from the alternative that was chosen, not from the one made first", () => {
    const begun = started();
    const [made, chosen] = [
      byRatios(begun, { [ratio]: 4 }, "G, stiffer"),
      byRatios(begun, { [ratio]: 2.5 }, "G"),
    ];
    begun.sheet.beside(chosen, made);
    expect(statement(begun)?.text).toContain("I of beam / I of columns 1.25 to 5");
  });

  test("are as stated where the engineer stated them, and no query is raised", () => {
    const begun = started();
    begun.sheet.unknowns(begun.frame, { [ratio]: "1 to 4" }, { because: "sizes are still open" });
    begun.sheet.freeBodies(byRatios(begun, { [ratio]: 2.5 }));
    expect(statement(begun)?.text).toContain("I of beam / I of columns 1 to 4;");
    expect(queries(begun)).toEqual([]);
  });

  test("start from sections given, and ratios that disagree with those are queried", () => {
    const sections = { columns: { E: 1, I: 1, A: 40 }, beams: { E: 1, I: 2, A: 50 } } as const;
    const begun = started({ sections });
    begun.sheet.freeBodies(byRatios(begun, { [ratio]: 2.5 }));
    expect(statement(begun)?.text).toContain("sections as given");
    expect(queries(begun)).toEqual([expect.stringContaining("start from the sections given")]);
  });

  test("follow a ratio changed in its cell, once the free bodies are solved again", () => {
    const at = (number: number) => attachHost({ cell: { number, id: `c${number}` }, overrides: new Map() });
    at(1);
    const begun = started();
    const run = (r: number): string | undefined => {
      at(2);
      const set = byRatios(begun, { [ratio]: r });
      begun.sheet.endCell("c2");
      at(3);
      begun.sheet.freeBodies(set);
      begun.sheet.endCell("c3");
      return statement(begun)?.text;
    };
    expect(run(2.5)).toContain("I of beam / I of columns 1.25 to 5");
    expect(run(4)).toContain("I of beam / I of columns 2 to 8");
    expect(queries(begun)).toEqual([]);
  });
});
