// The verb `unknowns`: what is not known of a frame before its sizes are chosen, and how far.

import type { UnknownRow } from "../accuracy/index.ts";
import { host, type Ledger } from "../sheet/index.ts";
import type { Structure } from "../structure/types.ts";
import { frameKeys, type SheetState } from "./sheet-state.ts";
import { plainStatement } from "./stated-numbers.ts";
import { recordStatement } from "./statement.ts";
import type { StatedRanges } from "./types.ts";
import { structureName } from "./words.ts";

/** Records what is not known as an assumption with its reason, and the ranges as a table; answers with the ranges. Throws on what
 *  it cannot read, and where bands were worked out before with ranges taken by default. */
export function recordUnknowns(
  ledger: Ledger,
  state: SheetState,
  frame: Structure,
  stated: StatedRanges,
  because: unknown,
): readonly UnknownRow[] {
  if (typeof because !== "string" || because.trim() === "")
    throw new Error(
      'unknowns: the reason is missing; say why no more and no less is known, sheet.unknowns(frame, {…}, { because: "…" })',
    );
  refuseLate(ledger, state, frame);
  const { plain, from } = plainStatement(stated);
  const { rows, ...statement } = recordStatement(ledger, frame, plain, because, { from });
  for (const key of frameKeys(frame)) state.statements.set(key, statement);
  return rows;
}

/** A statement after results that took the default would leave two on the sheet that contradict each other. */
function refuseLate(ledger: Ledger, { statements }: SheetState, frame: Structure): void {
  const cell = host().cell?.number ?? 0;
  for (const key of frameKeys(frame)) {
    const found = statements.get(key);
    const entry = found?.byDefault === undefined ? undefined : ledger.entry(found.id);
    if (entry !== undefined && (entry.cell < cell || found?.byDefault?.run === host()))
      throw new Error(
        `unknowns: the ${structureName(frame)} was solved before${entry.cell > 0 ? `, in cell ${entry.cell}` : ""}, and its bands took the default; ` +
          "say what is unknown before its free bodies",
      );
  }
}
