// The verb `loadCase`: loads that come and go together.

import { type Quantity, quantity } from "../quantity/index.ts";
import { type Ledger, shownValue, type TableCell } from "../sheet/index.ts";
import type { Load } from "../structure/types.ts";
import { kindText, senseText, whereText } from "./load-words.ts";
import { shownAs } from "./shown.ts";
import { loadSources } from "./sources.ts";
import type { LoadCase } from "./types.ts";

/** Records a load case as a table of its loads; answers with it. `releases` is the hinge set whose holding forces it lets go.
 *  Throws on a key that is no short word or that another cell has given to a case, and on a case without loads. */
export function recordLoadCase(
  ledger: Ledger,
  key: string,
  title: string,
  loads: readonly Load[],
  releases?: string,
): LoadCase {
  if (!/^\p{L}[\p{L}\p{N}]*$/u.test(key))
    throw new Error(
      `load case "${key}": the key is one short word of letters and digits, such as "G" or "W1"`,
    );
  if (loads.length === 0)
    throw new Error(`load case ${key} has no loads; give some, such as uniform("BC", "5.2 kN/m")`);
  const called = `load case ${key}`;
  const { id, version } = ledger.put(
    {
      kind: "table",
      id: called,
      uses: loadSources(loads),
      caption: `Load case ${key}: ${title}`,
      columns: ["on", "load", "value", "acts"],
      rows: loads.map(row),
    },
    // the key of a case that lets forces go is made from a set's name, and the set's own entries are numbered
    releases === undefined ? { called, change: "key" } : undefined,
  );
  const lines = loads.map((load) =>
    row(load).map((cell) => (typeof cell === "string" ? cell : cell.value.text)),
  );
  const text = [`${called}: ${title}`, ...lines.map((line) => `  ${line.join(", ")}`)].join("\n");
  const found = { entry: `${id}@${version}`, key, title, loads: Object.freeze([...loads]) };
  return shownAs(releases === undefined ? found : { ...found, releases }, () => ({ "text/plain": text }));
}

function row(load: Load): readonly TableCell[] {
  return [whereText(load), kindText(load), ...values(load), senseText(load)];
}

function values(load: Load): readonly TableCell[] {
  const shown = magnitudes(load).map((value) => ({ value: shownValue(value), uses: load.from }));
  if (shown.length === 1) return shown;
  return [shown.map(({ value }) => value.text).join(load.kind === "distributed" ? " to " : ", ")];
}

function magnitudes(load: Load): readonly Quantity[] {
  if (load.kind === "distributed") {
    const ends = load.q1 === load.q2 ? [load.q1] : [load.q1, load.q2];
    return ends.map((q) => quantity(q, "force per length", { from: load.from }));
  }
  const forces = [load.fx, load.fy]
    .filter((f) => f !== 0)
    .map((f) => quantity(Math.abs(f), "force", { from: load.from }));
  return load.couple === 0
    ? forces
    : [...forces, quantity(Math.abs(load.couple), "moment", { from: load.from })];
}
