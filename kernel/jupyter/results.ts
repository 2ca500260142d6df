// The results a front end shows. When a given is changed by a later cell, results that stood on it are shown anew in
// their place, marked as out of date, until their own cells are run again.
import type { MimeBundle } from "../display.ts";
import { marked } from "../out-of-date.ts";
import type { Outputs } from "./outputs.ts";

interface Shown {
  readonly value: WeakRef<object>;
  readonly data: MimeBundle;
  readonly cell: string;
  wasMarked: string;
}

const MOST = 500;

export class Results {
  readonly #outputs: Outputs;
  readonly #changed: (value: unknown) => readonly string[];
  readonly #shown = new Map<string, Shown>();
  #count = 0;

  /** `changed` tells what a value stands on that has changed since. */
  constructor(outputs: Outputs, changed: (value: unknown) => readonly string[]) {
    this.#outputs = outputs;
    this.#changed = changed;
  }

  /** Publish a cell's result. Throws where it cannot be written. */
  show(cell: string, value: unknown, data: MimeBundle, execution_count: number): void {
    for (const [id, shown] of this.#shown) if (shown.cell === cell) this.#shown.delete(id);
    const content = { execution_count, data, metadata: {} };
    const traced = typeof value === "object" && value !== null && "from" in value;
    if (!traced || this.#changed(value).length > 0) {
      this.#outputs.publish("execute_result", content);
      return;
    }
    const display_id = `hingebook-result-${++this.#count}`;
    this.#outputs.publish("execute_result", { ...content, transient: { display_id } });
    this.#shown.set(display_id, { value: new WeakRef(value), data, cell, wasMarked: "" });
    const [oldest] = this.#shown.keys();
    if (this.#shown.size > MOST && oldest !== undefined) this.#shown.delete(oldest);
  }

  /** Show anew what has gone out of date, or is right again. */
  review(): void {
    for (const [display_id, shown] of this.#shown) {
      const value = shown.value.deref();
      if (value === undefined) {
        this.#shown.delete(display_id);
        continue;
      }
      const changed = this.#changed(value);
      const mark = changed.join();
      if (mark === shown.wasMarked) continue;
      shown.wasMarked = mark;
      const data = marked(shown.data, changed);
      this.#outputs.publish("update_display_data", { data, metadata: {}, transient: { display_id } });
    }
  }
}
