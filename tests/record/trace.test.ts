// The trace of every value of every demonstration notebook: no value without a source, and what a value stands on is
// what moves it.
import { mkdirSync, readdirSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { type CalculationRecord, type Entry, readUse, standingOn } from "../../lib/sheet/index.ts";
import { hingebook, newFolder, recordOf, top } from "./command.ts";

const folder = join(top, "notebooks");
const notebooks = readdirSync(folder).filter((name) => name.endsWith(".ipynb"));

function run(notebook: string, ...words: readonly string[]): CalculationRecord {
  const out = join(newFolder(), "out");
  mkdirSync(out);
  const { code, err } = hingebook(folder, "run", notebook, "--out", out, ...words);
  expect(err).toBe("");
  expect(code).toBe(0);
  return recordOf(join(out, notebook.replace(/ipynb$/, "html")));
}

interface Traced {
  readonly id: string;
  readonly name: string;
  readonly si: number;
  readonly uses: readonly string[];
}

/** Every number of a record with what it stands on. */
function traced(entry: Entry): readonly Traced[] {
  const { id } = entry;
  if (entry.kind === "table")
    return entry.rows.flatMap((row, i) =>
      row.flatMap((cell, j) =>
        typeof cell === "string"
          ? []
          : [{ id, name: `${id} [${i}, ${j}]`, si: cell.value.si, uses: cell.uses }],
      ),
    );
  return "value" in entry && entry.value ? [{ id, name: id, si: entry.value.si, uses: entry.uses }] : [];
}

/** Ids of everything under some uses. */
function under(entries: readonly Entry[], uses: readonly string[]): ReadonlySet<string> {
  const byId = new Map(entries.map((entry) => [entry.id, entry]));
  const seen = new Set<string>();
  const open = uses.map((use) => readUse(use).id);
  for (let id = open.pop(); id !== undefined; id = open.pop()) {
    if (seen.has(id)) continue;
    seen.add(id);
    open.push(...(byId.get(id)?.uses ?? []).map((use) => readUse(use).id));
  }
  return seen;
}

test("there is a notebook to trace", () => {
  expect(notebooks).toContain("boat-shed-frame.ipynb");
});

describe.each(notebooks)("%s", (notebook) => {
  const base = run(notebook);
  const byId = new Map(base.entries.map((entry) => [entry.id, entry]));
  const isGround = (id: string): boolean => ["given", "assumption"].includes(byId.get(id)?.kind ?? "");
  const values = base.entries.flatMap(traced);

  test("no value is without a source: each rests on givens or assumptions", () => {
    const loose = values.filter(
      ({ id, uses }) => !isGround(id) && ![...under(base.entries, uses)].some(isGround),
    );
    expect(loose.map(({ name }) => name)).toEqual([]);
    const checks = base.entries.filter(({ kind }) => kind === "check");
    expect(checks.filter(({ uses }) => ![...under(base.entries, uses)].some(isGround))).toEqual([]);
    expect(values.length).toBeGreaterThan(50);
  });

  const symbols = base.entries.flatMap((entry) =>
    (entry.kind === "given" || entry.kind === "assumption") &&
    entry.symbol !== undefined &&
    entry.value !== undefined
      ? [[entry.symbol, `${entry.value.text.replace("−", "-")}`] as const]
      : [],
  );

  test.each(symbols)(
    "%s changed in turn: what moves stands on it, and what stands on it moves",
    (symbol, written) => {
      const [number = "", ...unit] = written.split(/\s/);
      const set = `${Number(number) * 1.0371} ${unit.join(" ")}`.trim();
      const again = new Map(
        run(notebook, "--set", `${symbol}=${set}`)
          .entries.flatMap(traced)
          .map((one) => [one.name, one.si]),
      );
      const standing = new Set([symbol, ...standingOn(base.entries, symbol)]);
      const scale = Math.max(...values.map(({ si }) => Math.abs(si)));
      const hasMoved = ({ name, si }: Traced): boolean => {
        const now = again.get(name) ?? Number.NaN;
        return !(Math.abs(now - si) <= 1e-9 * Math.max(Math.abs(si), Math.abs(now), 1e-6 * scale));
      };
      const moved = values.filter(hasMoved);
      const isTraced = ({ id, uses }: Traced): boolean =>
        id === symbol || under(base.entries, uses).has(symbol);
      expect(moved.filter((one) => !isTraced(one)).map(({ name }) => name)).toEqual([]);
      expect(moved.filter(({ id }) => !standing.has(id)).map(({ name }) => name)).toEqual([]);
      // What is nought by the nature of the structure stays nought, and where two effects cancel nothing moves.
      const still = values.filter(
        (one) => isTraced(one) && !hasMoved(one) && Math.abs(one.si) > 1e-9 * scale,
      );
      expect(still.map(({ name }) => name).filter((name) => !cancels(notebook, symbol, name))).toEqual([]);
      expect(moved.length).toBeGreaterThan(1);
    },
  );
});

/** Values whose equations use a given that cancels out of them. In the boat shed: the hinge ranges and the probable points
 *  of inflection, parts of the span under two loads of one shape; the knee moment, which is height times a thrust that
 *  goes with one over the height, and what follows from it. */
function cancels(notebook: string, symbol: string, name: string): boolean {
  if (notebook !== "boat-shed-frame.ipynb") return false;
  if (symbol === "g" || symbol === "s") return /^(hinge ranges|probable points of inflection) /.test(name);
  return symbol === "h" && CANCELS_HEIGHT.has(name);
}

const CANCELS_HEIGHT: ReadonlySet<string> = new Set([
  "G + S: column AB: sum M about B",
  "G + S: joint B: sum M about B",
  "M_B",
  "M_m",
  // M_B and M_m by moved hinges and as chosen
  ...[0, 2].flatMap((row) => [3, 4, 5].map((column) => `spread G + S [${row}, ${column}]`)),
  // M at a knee and in the beam
  ...["[1, 4]", "[2, 4]", "[3, 4]"].map((cell) => `internal forces G + S ${cell}`),
]);
