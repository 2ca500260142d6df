import { describe, expect, test } from "vitest";
import { cellDisplay, type DisplayEvent } from "../../kernel/cell-display.ts";

const open = () => {
  const events: DisplayEvent[] = [];
  return { events, ...cellDisplay((event) => events.push(event)) };
};

describe("display(value) and clearOutput()", () => {
  test("a value is shown at once, and its place filled anew", () => {
    const { events, globals } = open();
    globals.display(1).update(2);
    globals.clearOutput({ wait: true });
    expect(events).toEqual([
      { kind: "display", data: { "text/plain": "1" }, id: "hingebook-1", update: false },
      { kind: "display", data: { "text/plain": "2" }, id: "hingebook-1", update: true },
      { kind: "clear", wait: true },
    ]);
  });
  test("forms that come later keep their turn", async () => {
    const { events, globals, settled } = open();
    const late = { [Symbol.for("Jupyter.display")]: async () => ({ "text/plain": "late" }) };
    globals.display(late);
    globals.display(2);
    expect(events).toEqual([]);
    await settled();
    expect(events.map((event) => event.kind === "display" && event.data["text/plain"])).toEqual([
      "late",
      "2",
    ]);
  });
  test("a display that fails later is reported once", async () => {
    const { globals, settled } = open();
    globals.display({ toHtml: async () => Promise.reject(new Error("no")) });
    await expect(settled()).rejects.toThrow("no");
    await settled();
  });
});
