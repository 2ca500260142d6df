// The one ledger that is open: a runner finds it here when the notebook has run.

import { showIn } from "../quantity/index.ts";
import { Book } from "./book.ts";
import type { Ledger } from "./ledger.ts";
import type { Head } from "./record.ts";

let open: Book | undefined;

/** Opens the ledger of a calculation. Opened again, it keeps its entries and takes the new head.
 *  `figures` are the significant figures results are printed with, three by default.
 *  Throws on a field of the head that is missing, unknown or no text, and on units that cannot be read. */
export function openLedger(head: Head, options: { readonly figures?: number } = {}): Ledger {
  const figures = options.figures ?? 3;
  if (open === undefined) open = new Book(head, figures);
  else open.reopen(head, figures);
  return open;
}

/** The ledger that is open, if one is. */
export function currentLedger(): Ledger | undefined {
  return open;
}

/** Closes the ledger; values are printed in kN and m again. */
export function forgetLedger(): void {
  open = undefined;
  showIn("kN, m");
}
