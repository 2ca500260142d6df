// How what a verb recorded shows itself in a notebook: its figures, equations and tables, one below the other.

import { drawSketch, type SketchSpec } from "../drawing/index.ts";
import {
  bandCellTexts,
  bandsOf,
  type Entry,
  escaped,
  formulaDisplay,
  type Ledger,
  type TableCell,
  tableBandNote,
} from "../sheet/index.ts";
import { type Bundle, figurePrefix, shownAs } from "./shown.ts";

const cellText = (cell: TableCell): string => {
  if (typeof cell === "string") return cell;
  const band = cell.band === undefined ? [] : bandCellTexts(cell.band);
  return band.length === 0 ? cell.value.text : `${cell.value.text} [${band.join(" ")}]`;
};

const cellHtml = (cell: TableCell): string => {
  if (typeof cell === "string") return escaped(cell);
  const band = cell.band === undefined ? [] : bandCellTexts(cell.band);
  return [escaped(cell.value.text), ...band.map((text) => `<small>${escaped(text)}</small>`)].join("<br>");
};

function tableHtml(entry: Extract<Entry, { kind: "table" }>): string {
  const head = entry.columns.map((column) => `<th scope="col">${escaped(column)}</th>`).join("");
  const rows = entry.rows.map(
    (row) => `<tr>${row.map((cell) => `<td>${cellHtml(cell)}</td>`).join("")}</tr>`,
  );
  const [band] = bandsOf(entry);
  const note = band === undefined ? "" : `<p><small>${escaped(tableBandNote(band.band.words))}.</small></p>`;
  return `<table><caption>${escaped(entry.caption)}</caption><thead><tr>${head}</tr></thead><tbody>${rows.join("")}</tbody></table>${note}`;
}

function figureHtml({ spec, caption }: Extract<Entry, { kind: "figure" }>): string {
  if (spec.kind === "line chart") return `<p>${escaped(caption)}</p>`; // drawn where there is time for it
  const svg = drawSketch(spec as SketchSpec, figurePrefix(spec));
  return `<figure>${svg}<figcaption>${escaped(caption)}</figcaption></figure>`;
}

function html(entry: Entry): string {
  switch (entry.kind) {
    case "figure":
      return figureHtml(entry);
    case "table":
      return tableHtml(entry);
    case "step":
      return formulaDisplay("", entry.lines, entry.body)["text/html"] ?? "";
    case "check":
      return (
        formulaDisplay("", entry.lines, `${entry.description}${entry.passed ? "" : ": DOES NOT HOLD"}`)[
          "text/html"
        ] ?? ""
      );
    default:
      return `<p>${escaped(plain(entry))}</p>`;
  }
}

/** An entry in one line of text. */
function plain(entry: Entry): string {
  switch (entry.kind) {
    case "step":
      return `${entry.body}: ${entry.value.text}`;
    case "check":
      return `${entry.formula}: ${entry.passed ? "holds" : "DOES NOT HOLD"}`;
    case "table":
      return [entry.caption, ...entry.rows.map((row) => `  ${row.map(cellText).join("  ")}`)].join("\n");
    case "figure":
      return entry.alternative;
    case "assumption":
      return `${entry.text} (${entry.because})`;
    case "note":
    case "query":
    case "conclusion":
      return entry.text;
    case "finding":
      return `${entry.title}: ${entry.verdict}`;
    default:
      return entry.id;
  }
}

function bundleOf(entries: readonly Entry[]): Bundle {
  return { "text/html": entries.map(html).join("\n"), "text/plain": entries.map(plain).join("\n") };
}

/** What a verb answers, showing itself by the entries it recorded. The verb is given a ledger that listens. */
export function shownByEntries<T extends object>(ledger: Ledger, verb: (ledger: Ledger) => T): T {
  const entries: Entry[] = [];
  const listening = new Proxy(ledger, {
    get(target, name) {
      const member = Reflect.get(target, name, target) as unknown;
      if (typeof member !== "function") return member;
      if (name !== "put") return member.bind(target);
      return (...given: Parameters<Ledger["put"]>) => {
        const entry = target.put(...given);
        entries.push(entry);
        return entry;
      };
    },
  });
  return shownAs(verb(listening), () => bundleOf(entries));
}

/** An entry that shows itself as its text. */
export const shownEntry = <T extends Entry>(entry: T): T => shownAs(entry, () => bundleOf([entry]));
