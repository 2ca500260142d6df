// What a cell shows before it ends: display(value) and clearOutput().
import { displayForms, type MimeBundle } from "./display.ts";

/** Something shown, shown anew in the place of what carries the same id, or all output cleared. */
export type DisplayEvent =
  | { readonly kind: "display"; readonly data: MimeBundle; readonly id: string; readonly update: boolean }
  | { readonly kind: "clear"; readonly wait: boolean };

/** A place in the output that can be filled anew. */
export interface Shown {
  update(value: unknown): void;
}

export interface CellDisplay {
  readonly globals: { readonly display: (value: unknown) => Shown; readonly clearOutput: Clear };
  /** Settles when everything shown so far has been sent; rejects with what kept one from showing itself. */
  settled(): Promise<void>;
}

type Clear = (options?: { readonly wait?: boolean }) => void;

/** The functions of one session. Values whose forms are there at once are sent at once, others in turn. */
export function cellDisplay(emit: (event: DisplayEvent) => void): CellDisplay {
  let count = 0;
  let last: Promise<void> | undefined;
  const send = (value: unknown, id: string, update: boolean): void => {
    const forms = displayForms(value) ?? Object.freeze({ "text/plain": "undefined" });
    if (!(forms instanceof Promise) && !last) {
      emit({ kind: "display", data: forms, id, update });
      return;
    }
    const before = last ?? Promise.resolve();
    last = before.then(async () => {
      const data = (await forms) ?? {};
      emit({ kind: "display", data, id, update });
    });
    last.catch(() => undefined); // `settled` reports it
  };
  const display = (value: unknown): Shown => {
    const id = `hingebook-${++count}`;
    send(value, id, false);
    return Object.freeze({ update: (other: unknown) => send(other, id, true) });
  };
  const clearOutput: Clear = (options) => emit({ kind: "clear", wait: options?.wait === true });
  return {
    globals: { display, clearOutput },
    settled: async () => {
      const pending = last;
      last = undefined;
      await pending;
    },
  };
}
