import { describe, expect, test } from "vitest";
import { changesBetween, isUnchanged } from "../../lib/sheet/index.ts";
import { notebook } from "./record-fixture.ts";

const base = notebook();

describe("changesBetween", () => {
  test("two runs of the same notebook: nothing", () => {
    expect(isUnchanged(changesBetween(base, notebook()))).toBe(true);
  });

  test("one load: that given and what stands on it, nothing else", () => {
    const changes = changesBetween(base, notebook({ s: "8.2 kN/m" }));
    expect(changes.grounds).toEqual([
      {
        id: "s",
        name: "s",
        kind: "given",
        value: { before: "7.60 kN/m", after: "8.20 kN/m", percent: expect.closeTo(7.894736842, 6) },
        standing: ["w", "M_0", "V_0", "check M_0 <= M_R"],
      },
    ]);
    expect(changes.results.map(({ id }) => id)).toEqual(["w", "M_0", "V_0"]);
    // M = wL²/8 with w from 12.8 to 13.4 kN/m: 313.6 to 328.3 kN·m, + 4.6875 %
    expect(changes.results[1]).toMatchObject({
      kind: "calc",
      value: { before: "314 kN·m", after: "328 kN·m" },
    });
    expect(changes.results[1]?.value.percent).toBeCloseTo(4.6875, 9);
    expect(changes.checks.map(({ id, turned }) => [id, turned])).toEqual([["check M_0 <= M_R", false]]);
    const { head, raised, settled, words, added, removed } = changes;
    expect([head, raised, settled, words, added, removed].flat()).toEqual([]);
  });

  test("a drawing with a new revision and the same span: the source, with every line that stands on it", () => {
    const changes = changesBetween(base, notebook({ sourceOfL: "drawing S-102 rev C" }));
    expect(changes.grounds).toEqual([
      {
        id: "L",
        name: "L",
        kind: "given",
        source: { before: "drawing S-102 rev B", after: "drawing S-102 rev C" },
        standing: ["M_0", "V_0", "G_0", "check M_0 <= M_R"],
      },
    ]);
    expect(isUnchanged({ ...changes, grounds: [] })).toBe(true);
  });

  test("a reason, a check that turns, lines added and a query raised; removed and settled the other way round", () => {
    const later = notebook({ reasonOfK: "calculated", limit: "310 kN m", more: true });
    const changes = changesBetween(base, later);
    expect(changes.grounds.map(({ id }) => id)).toEqual(["M_R", "k"]);
    expect(changes.grounds[1]?.source).toEqual({ before: "first guess", after: "calculated" });
    expect(changes.checks).toEqual([
      {
        id: "check M_0 <= M_R",
        name: "bending",
        before: "holds, utilisation 0.784",
        after: "DOES NOT HOLD, utilisation 1.01",
        turned: true,
      },
    ]);
    expect(changes.added.map(({ kind, name }) => [kind, name])).toEqual([["note", "Ponding was looked at."]]);
    expect(changes.raised.map(({ name }) => name)).toEqual(["Is the snow drifting?"]);
    expect(changes.results).toEqual([]);
    const back = changesBetween(later, base);
    expect(back.removed.map(({ kind }) => kind)).toEqual(["note"]);
    expect(back.settled.map(({ kind }) => kind)).toEqual(["query"]);
    expect(back.added.concat(back.raised)).toEqual([]);
  });

  test("another title is a change of the head; revision, date and names of an issue are not", () => {
    const head = { ...base.head, title: "Canopy", revision: "P2", date: "2031-04-30", checkedBy: "K. Ume" };
    expect(changesBetween(base, { ...base, head })).toMatchObject({
      head: [{ field: "title", before: "Canopy beam", after: "Canopy" }],
      results: [],
    });
  });

  test("what another order of adding does to the last digits is no change", () => {
    const entries = base.entries.map((entry) =>
      entry.kind === "calc"
        ? { ...entry, value: { ...entry.value, si: entry.value.si * (1 + 4e-16) } }
        : entry,
    );
    expect(isUnchanged(changesBetween(base, { ...base, entries }))).toBe(true);
  });
});
