// The head of a sheet: what is calculated, for which job, by whom, on what basis, in which units.

import { displayUnits, nearest } from "../quantity/index.ts";
import type { Head } from "./record.ts";

const required = ["title", "job", "preparedBy", "basis", "units", "status"] as const;
const optional = ["checkedBy", "checkedOn", "approvedBy", "approvedOn", "date", "revision"] as const;
const known: readonly string[] = [...required, ...optional];

const meaning: Readonly<Record<(typeof required)[number], string>> = {
  title: 'what is calculated, such as "Store roof frame, line 6"',
  job: 'the job number, such as "2031"',
  preparedBy: "the engineer's initials",
  basis: 'the standards it rests on, such as "EN 1990:2002, recommended values"',
  units: 'the units results are shown in, such as "kN, m" or "kip, ft"',
  status: 'such as "preliminary"',
};

/** The head, checked and frozen. Throws naming a field that is missing, unknown or no text, and what would be right. */
export function checkedHead(head: Head): Head {
  const given: Readonly<Record<string, unknown>> = { ...head };
  for (const field of Object.keys(given)) {
    if (!known.includes(field)) {
      throw new Error(
        `head: "${field}" is not a field; did you mean "${nearest(field, known)}"? fields: ${known.join(", ")}`,
      );
    }
  }
  for (const field of required) {
    if (given[field] === undefined || given[field] === "") {
      throw new Error(`head: ${field} is missing; give ${meaning[field]}`);
    }
  }
  for (const [field, value] of Object.entries(given)) {
    if (typeof value !== "string") throw new Error(`head: ${field} is ${String(value)}; a text is wanted`);
  }
  displayUnits(head.units);
  return Object.freeze({ ...head });
}
