// The ledger of one calculation: givens, assumptions, steps, checks; formulas; the record format; the runner's contract.

export { bandCellTexts, bandText, isSettled, tableBandNote } from "./band-words.ts";
export { canonicalDigest, canonicalJson, sha256 } from "./canonical.ts";
export { changesBetween, isUnchanged, shareOf } from "./changes.ts";
export { bandInShort, type ChangedGroup, condensed, wordDifference } from "./condensed.ts";
export { escaped, formulaDisplay, lineDisplay } from "./display.ts";
export type { Draft, Unique } from "./draft.ts";
export { attachHost, type CellRef, type Host, host } from "./host.ts";
export type { CheckResult, DimensionAsked, Ledger } from "./ledger.ts";
export { toMathML } from "./mathml.ts";
export { currentLedger, forgetLedger, openLedger } from "./open.ts";
export type { Overridden } from "./overrides.ts";
export {
  type EquationFault,
  type EquationRecheck,
  type RecheckedLine,
  type RecheckedTerm,
  recheckEquations,
} from "./recheck-equations.ts";
export {
  type FormulaFault,
  type FormulaRecheck,
  formulaValue,
  type RecheckedEntry,
  recheckFormulas,
} from "./recheck-formula.ts";
export * from "./record.ts";
export { shownAsWritten, shownValue } from "./shown.ts";
export { standingOn, usersOf } from "./standing.ts";
export { readUse } from "./store.ts";
export { checkedSymbol, symbolTex } from "./symbol.ts";
export { numberTex, unitTex, valueTex } from "./tex.ts";
export {
  allUses,
  bandsOf,
  bandUses,
  bandValues,
  type NamedBand,
  type NamedValue,
  readerName,
  valuesOf,
  valueUses,
} from "./values.ts";
