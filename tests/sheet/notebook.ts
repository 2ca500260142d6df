// A stand-in for a runner: attaches a host before each cell and ends the cell after it.

import { attachHost, forgetLedger, type Head, type Ledger, openLedger } from "../../lib/sheet/index.ts";

export const head: Head = {
  title: "Store roof frame, line 6",
  job: "2031",
  preparedBy: "RT",
  basis: "EN 1990:2002, recommended values",
  units: "kN, m",
  status: "preliminary",
};

/** A fresh ledger without a runner. */
export function freshLedger(units = "kN, m"): Ledger {
  forgetLedger();
  attachHost();
  return openLedger({ ...head, units });
}

export interface Notebook {
  /** Runs a cell; its number is its place, its id "c" and the number unless given. */
  readonly run: (number: number, cell: (sheet: Ledger) => void, id?: string) => void;
  readonly sheet: Ledger;
}

/** A fresh notebook with an open ledger and the givens set from outside. */
export function notebook(overrides: Readonly<Record<string, string>> = {}): Notebook {
  const sheet = freshLedger();
  const set = new Map(Object.entries(overrides));
  return {
    sheet,
    run: (number, cell, id = `c${number}`) => {
      attachHost({ cell: { number, id }, overrides: set });
      cell(sheet);
      sheet.endCell(id);
    },
  };
}
