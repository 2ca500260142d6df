// One model, said in two ways, has one answer.
import fc from "fast-check";
import { describe, test } from "vitest";
import { inOtherUnits, mirrored, reversed, split } from "./changes.ts";
import { expectSame, seed } from "./checks.ts";
import { anyModel, anyStructure } from "./random.ts";

/** Pinned at both ends a member cut in two would be a mechanism. */
const rigid = anyStructure.filter((data) =>
  data.members.every((m) => !(m.releases.start.moment && m.releases.end.moment)),
);

describe("exact: one model, said in two ways", () => {
  const runs = { seed, numRuns: 150 };
  test("mirrored: the same forces, shear and moment turned", () => {
    fc.assert(
      fc.property(anyModel(), (data) => expectSame(data, mirrored(data))),
      runs,
    );
  });
  test("members walked the other way: the same forces, moment turned", () => {
    fc.assert(
      fc.property(anyModel(), (data) => expectSame(data, reversed(data))),
      runs,
    );
  });
  test("members in two pieces: the same forces", () => {
    fc.assert(
      fc.property(anyModel(rigid), fc.double({ min: 0.2, max: 0.8, noNaN: true }), (data, share) =>
        expectSame(data, split(data, share)),
      ),
      runs,
    );
  });
  test("feet and pounds: the same forces", () => {
    fc.assert(
      fc.property(anyModel(), (data) =>
        expectSame(data, inOtherUnits(data, 1 / 0.3048, 1 / 4.4482216152605)),
      ),
      runs,
    );
  });
});
