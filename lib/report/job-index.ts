// The index page of a job: its calculations, each with status, revision, governing results and open queries.

import type { CalculationRecord } from "../sheet/index.ts";
import { statusWords } from "./cautions.ts";
import { policyDigest } from "./digest.ts";
import { type Html, h, joined, type Part, raw } from "./html.ts";
import { maths } from "./maths.ts";
import { unbroken } from "./words.ts";

/** One calculation of a job. `file` is the package, relative to the index; absent where none was written. */
export interface JobRow {
  readonly notebook: string;
  readonly file?: string;
  readonly record?: CalculationRecord;
  /** The last issue, from the register beside the notebook, with its file relative to the index. */
  readonly issued?: { readonly revision: string; readonly date: string; readonly file: string };
}

const STYLE = `
:root { --ink: #1c1b19; --quiet: #57534b; --rule: #cfcabd; --accent: #8a3a12; }
body { margin: 2rem auto; max-width: 72rem; padding: 0 1rem; color: var(--ink); font: 1rem/1.45 "Helvetica Neue", Arial, sans-serif; }
h1 { font-size: 1.5rem; } h2 { font-size: 1.1rem; margin: 2rem 0 .5rem; }
.scroll { overflow-x: auto; } table { border-collapse: collapse; width: 100%; border-top: 2px solid var(--ink); border-bottom: 2px solid var(--ink); }
th, td { padding: .4rem .6rem; text-align: left; vertical-align: top; border-top: 1px solid var(--rule); } thead th { font-size: .85rem; border-top: 0; }
p { margin: 0; } .quiet { color: var(--quiet); font-size: .88rem; } a { color: var(--accent); }
.fails { color: #fff; background: var(--ink); padding: 0 .35rem; font-weight: 700; } ul { margin: 0; padding-left: 1.1rem; }
@page { size: A4 landscape; margin: 15mm; } @media print { a { color: inherit; text-decoration: none; } tr { break-inside: avoid; } }
`;

const link = (file: string | undefined, words: string): Html =>
  file === undefined
    ? h`${words}`
    : h`<a href="${file.split("/").map(encodeURIComponent).join("/")}">${words}</a>`;

function statusOf({ record, file }: JobRow): Part {
  if (record === undefined)
    return h`<strong class="fails">${file === undefined ? "NO PACKAGE" : "UNREADABLE"}</strong>`;
  if (!record.complete) return h`<strong class="fails">INCOMPLETE</strong>`;
  return statusWords(record.head.status);
}

function checksOf(record: CalculationRecord): Part {
  const checks = record.entries.filter((entry) => entry.kind === "check");
  const failed = checks.filter(({ passed }) => !passed).length;
  if (checks.length === 0) return "none";
  return failed === 0
    ? `${checks.length} of ${checks.length} hold`
    : h`<strong class="fails">${failed} of ${checks.length} DO NOT HOLD</strong>`;
}

function governing({ entries }: CalculationRecord): Part {
  const lines = entries.flatMap((entry) =>
    entry.kind === "result" && entry.governing
      ? h`${maths(entry.tex)} = ${unbroken(entry.value.text)} <span class="quiet">${entry.description}</span>`
      : [],
  );
  return lines.length === 0 ? "none named" : joined(lines, h`<br>`);
}

function queries({ entries }: CalculationRecord): Part {
  const open = entries.flatMap((entry) => (entry.kind === "query" ? h`<li>${entry.text}</li>` : []));
  return open.length === 0 ? "none" : h`<ul>${open}</ul>`;
}

function rowOf(row: JobRow): Html {
  const { record, notebook, file, issued } = row;
  const revision = issued
    ? [link(issued.file, issued.revision), h`<p class="quiet">${issued.date}</p>`]
    : "not issued";
  const cells: readonly Part[] = record?.complete
    ? [governing(record), checksOf(record), queries(record)]
    : [
        record?.failure === undefined
          ? ""
          : h`<p class="quiet">cell ${record.failure.cell}: ${record.failure.message}</p>`,
        "",
        "",
      ];
  return h`<tr><th scope="row">${link(file, record?.head.title ?? notebook)}<p class="quiet">${notebook}</p></th><td>${statusOf(row)}</td><td>${revision}</td>${cells.map((cell) => h`<td>${cell}</td>`)}</tr>
`;
}

function jobTable(job: string, rows: readonly JobRow[]): Html {
  return h`<h2>${job === "" ? "Job not known" : `Job ${job}`}</h2>
<div class="scroll" tabindex="0" role="region" aria-label="Calculations of job ${job}"><table>
<thead><tr><th scope="col">calculation</th><th scope="col">status</th><th scope="col">last issue</th><th scope="col">governing results</th><th scope="col">checks</th><th scope="col">open queries</th></tr></thead>
<tbody>
${rows.map(rowOf)}</tbody>
</table></div>
`;
}

/** The index of a job as one HTML page that needs nothing else; calculations of several jobs stand in a table each. */
export async function renderIndex(rows: readonly JobRow[]): Promise<string> {
  const jobOf = ({ record }: JobRow): string => (record?.complete ? record.head.job : "");
  const jobs = [...new Set(rows.map(jobOf))].sort();
  const tables = jobs.map((job) =>
    jobTable(
      job,
      rows.filter((row) => jobOf(row) === job),
    ),
  );
  const policy = `default-src 'none'; style-src 'sha256-${await policyDigest(STYLE)}'; base-uri 'none'; form-action 'none'`;
  return h`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${policy}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="referrer" content="no-referrer">
<title>Register of calculations</title>
<style>${raw(STYLE)}</style>
</head>
<body>
<main>
<h1>Register of calculations</h1>
${tables}</main>
</body>
</html>
`.html;
}
