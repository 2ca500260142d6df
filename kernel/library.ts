// The library as the runner uses it: loaded once, shared with the cells.
import { existsSync } from "node:fs";
import { join } from "node:path";
import type { CalculationRecord, CellRef, Failure, Head, Host } from "../lib/sheet/index.ts";
import type { UnitsOf } from "./check/index.ts";
import { ownFolder } from "./folders.ts";

/** The part of an open ledger a runner needs. */
export interface OpenLedger {
  text(cell: CellRef, markdown: string): unknown;
  endCell(cellId: string): void;
  entry(id: string):
    | {
        readonly version: number;
        readonly outOfDate: boolean;
        readonly cell?: number;
        readonly uses?: readonly string[];
      }
    | undefined;
  unusedOverrides(): readonly string[];
  record(about: {
    readonly complete: boolean;
    readonly failure?: Failure;
    readonly notebook: { readonly name: string; readonly source: string };
    readonly versions: Readonly<Record<string, string>>;
  }): CalculationRecord;
}

/** What the runner needs of the library. */
export interface Library {
  /** What cells get for "hingebook". */
  readonly module: object;
  readonly unitsOf: UnitsOf;
  attachHost(host?: Host): void;
  currentLedger(): OpenLedger | undefined;
  /** Opens a ledger for a notebook that has not come to do so. */
  openLedger(head: Head): OpenLedger;
  forgetLedger(): void;
  /** A record as a package, sealed. */
  renderPackage(record: CalculationRecord): Promise<string>;
  /** What a template left to be written, in words; empty where nothing is left. */
  promptsLeft(record: CalculationRecord): string;
}

/** Load the library. It is the same one for every caller and for the cells. */
export async function loadLibrary(): Promise<Library> {
  const [module, sheet, report, quantity] = await Promise.all([
    import("../lib/index.ts"),
    import("../lib/sheet/index.ts"),
    import("../lib/report/index.ts"),
    import("../lib/quantity/index.ts"),
  ]);
  const { attachHost, currentLedger, forgetLedger, openLedger } = sheet;
  const { isNamedDimension, someUnits } = quantity;
  return Object.freeze({
    module,
    unitsOf: (dimension: string) => (isNamedDimension(dimension) ? someUnits(dimension) : []),
    attachHost,
    currentLedger,
    openLedger,
    forgetLedger,
    renderPackage: async (record: CalculationRecord) => report.sealed(await report.renderPackage(record)),
    promptsLeft: report.promptsLeftWords,
  });
}

/** The file that declares the library's types: the built one, or the sources where nothing is built. */
export function libraryTypes(): string {
  const built = join(ownFolder(), "dist", "hingebook.d.ts");
  return existsSync(built) ? built : join(ownFolder(), "lib", "index.ts");
}
