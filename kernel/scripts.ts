// The texts that have run, by the name they carry in stack traces, and the way from a stack trace back to them.
import type { Position } from "./position.ts";

/** A text that has run: the cell or file it came from. `locate` gives the place in what was written. */
export interface Script {
  readonly source: string;
  /** Cell number, when it was a cell. */
  readonly cell?: number;
  /** File name without folder, when it was a local module. */
  readonly file?: string;
  readonly locate: (place: Position) => Position | undefined;
}

/** One line of a stack trace, in what the engineer wrote. */
export interface Frame extends Position {
  readonly script: string;
  readonly caller?: string;
  readonly cell?: number;
  readonly file?: string;
}

const FRAME = /^\s*at (?:async )?(?:(.*?) \()?(hingebook:[^\s()]+?):(\d+):(\d+)\)?$/;

let texts = 0;

/** A new name for one run of a cell in stack traces, unlike any other in the process. */
export const nextCellScript = (): string => `hingebook:cell-${++texts}`;

/** A new name for one loading of a local module. */
export const nextFileScript = (): string => `hingebook:file-${++texts}`;

/** Texts whose places are kept: functions of a cell run longer ago are traced no more. */
const MOST = 1000;

export class Scripts {
  readonly #scripts = new Map<string, Script>();

  add(name: string, script: Script): void {
    this.#scripts.set(name, script);
    const [oldest] = this.#scripts.keys();
    if (this.#scripts.size > MOST && oldest !== undefined) this.#scripts.delete(oldest);
  }

  /** Where a place in a running text was written. */
  place(name: string, at: Position): Position | undefined {
    return this.#scripts.get(name)?.locate(at);
  }

  /** The frames of a stack that lie in cells and local modules, innermost first. */
  frames(stack: string): Frame[] {
    return stack.split("\n").flatMap((line) => {
      const match = FRAME.exec(line);
      if (!match) return [];
      const [, caller, name = "", lineText, columnText] = match;
      const script = this.#scripts.get(name);
      const at = script?.locate({ line: Number(lineText), column: Number(columnText) });
      if (!script || !at) return [];
      const { cell, file } = script;
      return [
        {
          script: name,
          ...at,
          ...(caller !== undefined && caller !== "eval" && caller !== "<anonymous>" ? { caller } : {}),
          ...(cell !== undefined ? { cell } : {}),
          ...(file !== undefined ? { file } : {}),
        },
      ];
    });
  }
}
