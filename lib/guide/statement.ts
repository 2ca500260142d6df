// What is taken as unknown of a frame as it stands on the sheet: the assumption in words, and the ranges in a table.

import { endShare, type StatedText, type UnknownRow } from "../accuracy/index.ts";
import type { Ledger } from "../sheet/index.ts";
import type { Sources, Structure } from "../structure/types.ts";
import type { Statement } from "./sheet-state.ts";
import { samples, seed } from "./truth.ts";
import { type UnknownFrame, unknownFrame } from "./unknown-frame.ts";
import { structureName } from "./words.ts";

/** Records the assumption and its table; answers with the ranges too. `byDefault` when nobody stated any of it. */
export function recordStatement(
  ledger: Ledger,
  frame: Structure,
  stated: StatedText,
  because: string,
  { from = [], byDefault = false }: { readonly from?: Sources; readonly byDefault?: boolean } = {},
): Statement & { readonly rows: readonly UnknownRow[] } {
  const name = structureName(frame);
  const found = unknownFrame(frame, stated);
  const rows = found.rows.map((row) => ({ ...row, stated: row.stated && !byDefault }));
  const unknown = { ...found, rows };
  const { id, version } = ledger.put({
    kind: "assumption",
    id: `unknowns of ${name}`,
    uses: from,
    text: statementText(name, unknown),
    because,
  });
  const use = `${id}@${version}`;
  if (unknown.rows.length > 0)
    ledger.put({
      kind: "table",
      id: `ranges of unknowns, ${name}`,
      uses: [use],
      caption:
        `What is tried for the bands of the ${name}: ${samples} frames (seed ${seed}) solved exactly, ` +
        `${Math.round(endShare * 100)} % of them with every unknown at one end or the other of its range; ` +
        "I and A without a ratio as multiples of the nominal ones",
      columns: ["unknown", "nominal", "least", "greatest", "taken"],
      rows: unknown.rows.map((row) => [
        row.name,
        shortNumber(row.nominal),
        shortNumber(row.least),
        shortNumber(row.most),
        row.stated ? row.law : `${row.law}; by default`,
      ]),
    });
  return { id, use, stated, rows: unknown.rows };
}

function statementText(name: string, { rows, nominal, sizesKnown }: UnknownFrame): string {
  const list = (own: readonly UnknownRow[]): string =>
    own.map((row) => `${row.name} ${rangeText(row)}`).join(", ");
  const [stated, usual] = [rows.filter((row) => row.stated), rows.filter((row) => !row.stated)];
  const parts = [
    ...(stated.length === 0 ? [] : [list(stated)]),
    ...(usual.length === 0 ? [] : [`taken by default: ${list(usual)}`]),
  ];
  const ranges = rows.length === 0 ? "nothing; stiffnesses and bases as given" : parts.join("; ");
  const basis = sizesKnown ? "sections as given" : `nominal: ${nominal.join("; ")}`;
  return `Not known of the ${name}: ${ranges}. Tried about these (${basis})`;
}

/** "1 to 4", "0.5 to 2 times nominal", "fixity 0 to 0.5". */
export function rangeText({ measure, least, most }: UnknownRow): string {
  const range = `${shortNumber(least)} to ${shortNumber(most)}`;
  return measure === "fixity" ? `fixity ${range}` : measure === "ratio" ? range : `${range} times nominal`;
}

const shortNumber = (x: number): string => String(Number(x.toPrecision(3)));
