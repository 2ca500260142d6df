// In a determinate structure equilibrium alone gives the forces.
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { determinacy } from "../../lib/statics/index.ts";
import { type Change, expectSame, seed } from "./checks.ts";
import { anyModel, model, type Plainload, section, weakened } from "./random.ts";

describe("exact(determinate structure)", () => {
  test("forces do not depend on E, I, A, and temperature and settlement make none", () => {
    let counted = 0;
    fc.assert(
      fc.property(
        anyModel(weakened, false),
        fc.array(section, { minLength: 5, maxLength: 5 }),
        (data, others) => {
          const { structure } = model(data);
          if (structure.supports.some((support) => support.springs !== undefined)) return;
          if (determinacy(structure).verdict !== "determinate") return;
          counted += 1;
          const members = data.members.map((m, i) => ({ ...m, section: others[i % 5] ?? m.section }));
          const warm: Plainload = {
            kind: "temperature",
            member: data.members[0]?.name ?? "",
            uniform: 30,
            difference: 12,
            label: "",
            from: [],
          };
          const change: Change = {
            data: { ...data, members, loads: [...data.loads, warm] },
            member: (name, x) => ({ name, x }),
            signs: [1, 1, 1],
          };
          expectSame(data, change);
        },
      ),
      { seed, numRuns: 700 },
    );
    expect(counted).toBeGreaterThanOrEqual(60);
  });
});
