// The ledger at work. What an entry says is put together here; versions, cells and order are the store's.

import {
  type AnyMeasure,
  type AnyUnit,
  type Dimension,
  displayedAs,
  isQuantity,
  type Quantity,
  quantity,
  readMeasure,
  showIn,
} from "../quantity/index.ts";
import { basisOf, quantityOf, useOf } from "./basis.ts";
import { calculate, type SymbolEntry } from "./calculate.ts";
import { compare } from "./compare.ts";
import { displayOf, formulaDisplay } from "./display.ts";
import { type Draft, symbolOf, type Unique } from "./draft.ts";
import { checkedHead } from "./head.ts";
import type { CellRef } from "./host.ts";
import type { CheckResult, Ledger } from "./ledger.ts";
import { Overrides } from "./overrides.ts";
import { parseComparison, parseDefinition } from "./parse.ts";
import {
  type AssumptionEntry,
  type CalculationRecord,
  type Entry,
  type Head,
  RECORD_FORMAT,
  RECORD_VERSION,
  type ResultBand,
  type ShownValue,
} from "./record.ts";
import { Sentences } from "./sentences.ts";
import { shownAsWritten, shownGiven, shownValue } from "./shown.ts";
import { EntryStore, readUse } from "./store.ts";
import { checkedSymbol, symbolTex, unknownSymbol } from "./symbol.ts";
import { checkedText, idFromText, percent } from "./words.ts";

export class Book implements Ledger {
  head: Head;
  figures: number;
  readonly #store = new EntryStore();
  readonly #overrides = new Overrides();
  readonly #notConsidered = new Sentences();

  constructor(head: Head, figures: number) {
    this.head = checkedHead(head);
    this.figures = figures;
    showIn(head.units, figures);
  }

  /** Takes a new head and keeps the entries: the first cell has been run again. */
  reopen(head: Head, figures: number): void {
    this.head = checkedHead(head);
    this.figures = figures;
    showIn(head.units, figures);
  }

  given(
    symbol: string,
    measure: AnyMeasure,
    description = "",
    options: { readonly from?: string } = {},
  ): never {
    const { value, shown, written } = this.#set(symbol, measure);
    const overridden = value === written ? {} : { overridden: shownGiven(written) };
    const source = options.from === undefined ? {} : { source: checkedText("from", options.from) };
    return this.#keep(value, {
      kind: "given",
      ...this.#named(symbol, shown),
      uses: written.from,
      description,
      ...source,
      ...overridden,
    });
  }

  assume(symbol: string, measure: AnyMeasure, because: string): never;
  assume(text: string, reason: { readonly because: string }): AssumptionEntry;
  assume(
    what: string,
    how: AnyMeasure | { readonly because: string },
    why?: string,
  ): AssumptionEntry | Quantity {
    if (typeof how === "object" && "because" in how) return this.#assumeText(what, how.because);
    const because = checkedText(`the reason for ${what}`, why);
    const { value, shown, written } = this.#set(what, how);
    const overridden = value === written ? {} : { overridden: shownGiven(written) };
    const text = `${what} = ${shown.text}`;
    const named = this.#named(what, shown);
    return this.#keep(value, {
      kind: "assumption",
      ...named,
      uses: written.from,
      text,
      because,
      ...overridden,
    });
  }

  #assumeText(text: string, because: string): AssumptionEntry {
    return this.put({
      kind: "assumption",
      id: idFromText("assumption", checkedText("the assumption", text)),
      uses: [],
      text,
      because: checkedText(`the reason for "${text}"`, because),
    }) as AssumptionEntry;
  }

  calc(formula: string, unit: AnyUnit | "", description = ""): never {
    const definition = parseDefinition(formula);
    const {
      formula: spelled,
      inputs,
      uses,
      lines,
      result,
    } = calculate(definition, unit, (name) => this.#symbol(name));
    this.#overrides.refuse(definition.symbol, () => basisOf(uses, this.#store));
    const shown = shownValue(result);
    return this.#keep(result, {
      kind: "calc",
      ...this.#named(definition.symbol, shown),
      uses,
      formula: spelled,
      lines,
      inputs,
      description,
    });
  }

  check(comparison: string, description = ""): CheckResult {
    const { formula, lines, inputs, uses, passed, utilisation } = compare(
      parseComparison(comparison),
      (name) => this.#symbol(name),
    );
    const outcome: CheckResult = { passed, ...(utilisation === undefined ? {} : { utilisation }) };
    this.put({
      kind: "check",
      id: `check ${formula}`,
      uses,
      formula,
      lines,
      inputs,
      description,
      ...outcome,
    });
    const share = utilisation === undefined ? "" : ` (${percent(utilisation)})`;
    const plain = `${formula}: ${passed ? "holds" : "DOES NOT HOLD"}${share}`;
    return Object.freeze(
      Object.defineProperty(outcome, Symbol.for("Jupyter.display"), {
        value: () =>
          formulaDisplay(plain, lines, `${description} ${passed ? "holds" : "DOES NOT HOLD"}${share}`.trim()),
      }),
    );
  }

  result<D extends Dimension>(
    symbol: string,
    value: Quantity<D>,
    description = "",
    options: { readonly governing?: boolean; readonly band?: ResultBand } = {},
  ): Quantity<D> {
    const read = readMeasure(value, undefined, symbol);
    this.#overrides.refuse(symbol, () => basisOf(read.from, this.#store));
    return this.#keep(read, {
      kind: "result",
      ...this.#named(symbol, shownValue(read)),
      uses: read.from,
      description,
      governing: options.governing ?? false,
      ...(options.band === undefined ? {} : { band: options.band }),
    });
  }

  note(text: string): Entry {
    return this.put({ kind: "note", id: idFromText("note", checkedText("the note", text)), uses: [], text });
  }

  conclude(text: string): Entry {
    const id = idFromText("conclusion", checkedText("the conclusion", text));
    return this.put({ kind: "conclusion", id, uses: [], text });
  }

  query(text: string, uses: readonly string[] = []): Entry {
    return this.put({ kind: "query", id: idFromText("query", checkedText("the query", text)), uses, text });
  }

  notConsidered(...sentences: readonly string[]): readonly string[] {
    if (sentences.length === 0)
      throw new Error(
        'notConsidered: nothing is named; write a sentence for each thing left out, sheet.notConsidered("wind on the gable")',
      );
    const checked = sentences.map((sentence) => checkedText("notConsidered: a sentence", sentence).trim());
    this.#notConsidered.add(checked);
    return Object.freeze(checked);
  }

  text(cell: CellRef, markdown: string): Entry {
    return this.#store.put({ kind: "text", id: `text ${cell.id}`, uses: [], markdown }, cell);
  }

  put(draft: Draft, unique?: Unique): Entry {
    for (const use of draft.uses) readUse(use);
    if (unique !== undefined) this.#store.refuseSecond(unique, draft.id);
    return this.#store.put(draft);
  }

  lookup(symbol: string): Quantity {
    return this.#symbol(symbol).quantity;
  }

  entry(id: string): Entry | undefined {
    return this.#store.get(id);
  }

  entries(): readonly Entry[] {
    return this.#store.all();
  }

  endCell(cellId: string): void {
    this.#store.endCell(cellId);
    this.#notConsidered.endCell(cellId);
  }

  setFromOutside<D extends Dimension>(
    name: string,
    value: Quantity<D>,
    written: string,
    span?: Quantity<D>,
  ): Quantity<D> {
    return this.#overrides.apply(name, value, written, span);
  }

  unusedOverrides(): readonly string[] {
    return this.#overrides.unused();
  }

  record(about: Parameters<Ledger["record"]>[0]): CalculationRecord {
    const notConsidered = this.#notConsidered.all();
    return Object.freeze({
      format: RECORD_FORMAT,
      version: RECORD_VERSION,
      complete: about.complete,
      ...(about.failure === undefined ? {} : { failure: about.failure }),
      head: this.head,
      ...(notConsidered.length === 0 ? {} : { notConsidered }),
      overrides: Object.freeze(this.#overrides.used()),
      entries: Object.freeze(this.entries()),
      notebook: Object.freeze({ ...about.notebook }),
      versions: Object.freeze({ ...about.versions }),
    });
  }

  /** The measure written, and the one to use: set from outside, where it is. */
  #set(symbol: string, measure: AnyMeasure): { value: Quantity; shown: ShownValue; written: Quantity } {
    const written = readMeasure(measure, undefined, checkedSymbol(symbol));
    const shownOf = isQuantity(measure) ? shownGiven : shownAsWritten;
    const value = this.#overrides.apply(symbol, written, shownOf(written).text);
    return { value, shown: value === written ? shownOf(value) : shownAsWritten(value), written };
  }

  #named(symbol: string, value: ShownValue): { id: string; symbol: string; tex: string; value: ShownValue } {
    return { id: checkedSymbol(symbol), symbol, tex: symbolTex(symbol), value };
  }

  // The types of what is kept are the Ledger's business; here every quantity is alike, hence `never`.
  /** Stores an entry that has a value and answers with the value standing on it. */
  #keep(value: Quantity, draft: Draft): never {
    const entry = this.put(draft);
    const kept = quantity(value.si, value.dimension, { unit: value.unit, from: [useOf(entry)] });
    return displayedAs(kept, () => displayOf(entry)) as never;
  }

  #symbol(name: string): SymbolEntry {
    const entry = this.#store.get(name);
    if (entry === undefined || !("symbol" in entry) || entry.value === undefined) {
      throw new Error(unknownSymbol(name, this.#knownSymbols()));
    }
    const use = useOf(entry);
    return { quantity: quantityOf(entry.value, [use]), shown: entry.value, use };
  }

  #knownSymbols(): readonly string[] {
    return this.entries().flatMap((entry) => symbolOf(entry) ?? []);
  }
}
