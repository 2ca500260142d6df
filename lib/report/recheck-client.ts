// The part of the page's script that works every equation and formula out again from the record in the page, in the
// reader's own browser, and says how many hold. Plain JavaScript as text, like the rest of the page's script.

import { CHECKER } from "./checker-text.ts";
import { type Html, h } from "./html.ts";

/** What stands on the page until the script has run, and stays where none may run. */
export const recheckLine: Html = h`<p id="recheck" role="status">Where scripts may run, every equation and formula is worked out again here.</p>
`;

export const RECHECK_CLIENT: string = `"use strict";
(() => {
${CHECKER}
  const place = document.getElementById("recheck");
  const holder = document.getElementById("record");
  if (!place || !holder) return;
  const counted = (words, { count, faults }) => {
    const wrong = new Set(faults.map((one) => one.id)).size;
    return wrong === 0
      ? "all " + words + ": " + count + " of " + count
      : "NOT ALL " + words + ": " + (count - wrong) + " of " + count;
  };
  try {
    const { entries } = JSON.parse(holder.textContent || "");
    const [equations, formulas] = [recheckEquations(entries), recheckFormulas(entries)];
    place.textContent =
      counted("equations re-added here", equations) + "; " + counted("formulas worked out again", formulas) + ".";
    const faults = [...equations.faults, ...formulas.faults];
    if (faults.length === 0) return;
    place.className = "fails";
    const list = document.createElement("ul");
    for (const { id, words } of faults.slice(0, 50)) {
      const line = document.createElement("li");
      line.textContent = id + ": " + words;
      list.append(line);
    }
    place.append(list);
  } catch (error) {
    place.textContent = "The record in this page cannot be read: " + error;
    place.className = "fails";
  }
})();
`;
