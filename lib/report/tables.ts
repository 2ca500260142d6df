// Tables, whose numbers lead to what they stand on like any other.

import { bandsOf, symbolTex, type TableCell, type TableEntry } from "../sheet/index.ts";
import { bandInCell, noteOnBands } from "./bands.ts";
import { type Html, h, type Part } from "./html.ts";
import { maths } from "./maths.ts";
import { cellLink } from "./references.ts";

/** Cells of a table that stand on the same entries. */
export interface CellGroup {
  readonly uses: readonly string[];
  readonly texts: readonly string[];
}

const keyOf = (cell: Exclude<TableCell, string>): string => JSON.stringify(cell.uses);

/** The numbers of a table grouped by what they stand on, in reading order. */
export function cellGroups(entry: TableEntry): readonly CellGroup[] {
  const groups = new Map<string, { uses: readonly string[]; texts: string[] }>();
  for (const cell of entry.rows.flat()) {
    if (typeof cell === "string") continue;
    const group = groups.get(keyOf(cell)) ?? { uses: cell.uses, texts: [] };
    group.texts.push(cell.value.text);
    groups.set(keyOf(cell), group);
  }
  return [...groups.values()];
}

/** A text longer than this is not set a word to the line on a telephone. */
const LONG = 40;

const textCell = (text: string): Html =>
  text.length > LONG ? h`<td class="words">${text}</td>` : h`<td>${text}</td>`;

/** The symbol of a result is set as it is in its own line. */
const heading = (text: string): Part =>
  /^[A-Za-z][A-Za-z0-9]*(_[A-Za-z0-9]+)+$/.test(text) ? maths(symbolTex(text)) : text;

/** More columns than this are not all seen on a telephone, and the page says so there. */
const SEEN = 3;

function rowOf(entry: TableEntry, row: readonly TableCell[], keys: readonly string[]): Html {
  return h`<tr>${row.map((cell, i): Part => {
    if (typeof cell === "string") return i === 0 ? h`<th scope="row">${heading(cell)}</th>` : textCell(cell);
    return h`<td class="figures">${cellLink(entry.id, keys.indexOf(keyOf(cell)), cell.value.text)}${bandInCell(cell.band)}</td>`;
  })}</tr>
`;
}

/** A table with its caption, in a frame that scrolls where the page is narrow. */
export function table(entry: TableEntry): Html {
  const keys = cellGroups(entry).map((g) => JSON.stringify(g.uses));
  return h`<div class="scroll${entry.columns.length > SEEN ? " broad" : ""}" tabindex="0" role="region" aria-label="${entry.caption}"><table>
<caption>${entry.caption}</caption>
<thead><tr>${entry.columns.map((c) => (c === "" ? h`<td></td>` : h`<th scope="col">${c}</th>`))}</tr></thead>
<tbody>
${entry.rows.map((row) => rowOf(entry, row, keys))}</tbody>
</table></div>
${noteOnBands(bandsOf(entry).map(({ band }) => band))}`;
}
