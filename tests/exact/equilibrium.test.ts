// Equilibrium and compatibility of any structure under any load.
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ExactError, exact } from "../../lib/exact/index.ts";
import type { ElasticSolution } from "../../lib/results/index.ts";
import { determinacy } from "../../lib/statics/index.ts";
import type { Structure } from "../../lib/structure/index.ts";
import { expectCompatible, expectJointsBalance, expectWholeBalances, seed } from "./checks.ts";
import { anyModel, model, weakened } from "./random.ts";

let solutions = 0;
let refused = 0;

describe("exact(any structure)", () => {
  test("joints and the whole are in equilibrium, members move with their joints", () => {
    fc.assert(
      fc.property(anyModel(), (data) => {
        const read = model(data);
        const solution = exact(read.structure, read.loads);
        expectJointsBalance(read, solution);
        expectWholeBalances(read, solution);
        expectCompatible(read, solution);
        expect(solution.residual).toBeLessThan(1e-9);
        expect(solution.condition).toBeGreaterThanOrEqual(1);
        solutions += 1;
      }),
      { seed, numRuns: 1300 },
    );
  });

  test("with hinges and releases: refused exactly where the rank of the equilibrium equations finds a mechanism", () => {
    fc.assert(
      fc.property(anyModel(weakened), (data) => {
        const read = model(data);
        let solution: ElasticSolution;
        try {
          solution = exact(read.structure, read.loads);
        } catch (error) {
          if (!(error instanceof ExactError)) throw error;
          expect(error.fault.kind).toBe("free motion");
          refused += 1;
          expectMechanism(read.structure, true);
          return;
        }
        expectMechanism(read.structure, false);
        expectJointsBalance(read, solution);
        expectWholeBalances(read, solution);
        expectCompatible(read, solution);
        solutions += 1;
      }),
      { seed, numRuns: 1000 },
    );
    expect(refused).toBeGreaterThan(20);
  });

  test("at least 2000 structures were solved", () => {
    expect(solutions).toBeGreaterThanOrEqual(2000);
  });
});

/** The verdict of the other room, which knows no stiffness. */
function expectMechanism(structure: Structure, is: boolean): void {
  const { verdict, words } = determinacy(structure);
  expect(verdict.startsWith("mechanism"), words).toBe(is);
}
