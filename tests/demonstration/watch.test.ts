// What is kept from run to run must not show: a package written again and again is the one a new process writes.
import { spawn } from "node:child_process";
import { readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { expect, test } from "vitest";
import { newFolder, run, top, variant } from "./command.ts";

const with_g = (load: string): string => variant((source) => source.replace('"4.6 kN/m"', `"${load}"`));

const FIRST = "4.6 kN/m";
const LOADS = ["5.2 kN/m", FIRST, "9.9 kN/m", "5.2 kN/m", FIRST];

test("hingebook run --watch: after each of five changes the package is, to the byte, that of a cold run", async () => {
  const file = with_g(FIRST);
  const folder = newFolder();
  const watching = spawn(process.execPath, [
    join(top, "dist/cli.js"),
    "run",
    "--watch",
    file,
    "--out",
    folder,
  ]);
  let said = "";
  let heard = (): void => undefined;
  watching.stdout.on("data", (text: Buffer) => {
    said += text.toString();
    heard();
  });
  const ran = (times: number): Promise<void> =>
    new Promise((settle) => {
      heard = () => said.split("waiting for a change").length > times && settle();
      heard();
    });
  const ended = new Promise((settle) => watching.once("exit", settle));
  try {
    const packageIn = (where: string): string => readFileSync(join(where, "boat-shed-frame.html"), "utf8");
    const cold = new Map([...new Set(LOADS)].map((load) => [load, packageIn(run(with_g(load)).folder)]));
    expect(new Set(cold.values()).size).toBe(3);
    await ran(1);
    expect(packageIn(folder) === cold.get(FIRST), "at the start").toBe(true);
    for (const [index, load] of LOADS.entries()) {
      writeFileSync(file, readFileSync(with_g(load)));
      await ran(index + 2);
      expect(packageIn(folder) === cold.get(load), `change ${index + 1}, ${load}`).toBe(true);
    }
  } finally {
    watching.kill("SIGINT");
    await ended;
  }
});
