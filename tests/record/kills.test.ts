// Runs and issues that are ended at a random moment, and disks that do not take what is written: what was there before
// is still there, whole.
import { spawn, spawnSync } from "node:child_process";
import { mkdirSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { readRegister } from "../../kernel/record/register.ts";
import { sealOf } from "../../lib/report/index.ts";
import { sha256 } from "../../lib/sheet/index.ts";
import { cli, hingebook, jobFolder, recordOf } from "./command.ts";

/** Starts a command and ends it with all it has started, as a machine that stops would, after some milliseconds; answers
 *  whether it was still running. */
async function killed(folder: string, after_ms: number, words: readonly string[]): Promise<boolean> {
  const child = spawn(process.execPath, [cli, ...words], {
    cwd: folder,
    stdio: "ignore",
    detached: true, // a group of its own, so that its compiler is not left behind
  });
  const ended = new Promise<void>((resolve) => child.once("exit", () => resolve()));
  const timer = setTimeout(() => {
    if (child.pid !== undefined) process.kill(-child.pid, "SIGKILL");
  }, after_ms);
  await ended;
  clearTimeout(timer);
  return child.signalCode === "SIGKILL";
}

async function isWhole(path: string): Promise<boolean> {
  return (await sealOf(Uint8Array.from(readFileSync(path)))).state === "unbroken";
}

describe("50 kills at random moments", () => {
  test.concurrent("25 during run: the package of before is there, whole, or the new one", async () => {
    const job = jobFolder();
    expect(hingebook(job, "run", "frame.ipynb").code).toBe(0);
    const [started, path] = [Date.now(), join(job, "out/frame.html")];
    const before = readFileSync(path);
    expect(hingebook(job, "run", "frame.ipynb").code).toBe(0);
    const takes = Date.now() - started;
    let ended = 0;
    for (let i = 0; i < 25; i++) {
      const after = ((i * 7 + 3) % 25) * (takes / 25);
      if (await killed(job, after, ["run", "frame.ipynb"])) ended++;
      expect(readFileSync(path).equals(before)).toBe(true);
      expect(readdirSync(join(job, "out")).filter((name) => name.endsWith(".html"))).toEqual(["frame.html"]);
    }
    expect(ended).toBeGreaterThan(10);
    expect(hingebook(job, "run", "frame.ipynb").code).toBe(0);
    expect(readdirSync(join(job, "out"))).toEqual(["frame.html"]);
  });

  test.concurrent("25 during issue: every issue in the register is there, whole; the register can be read; issuing goes on", async () => {
    const job = jobFolder();
    const issue = (rev: string): readonly string[] => [
      "issue",
      "frame.ipynb",
      "--rev",
      rev,
      "--why",
      "trial",
    ];
    const started = Date.now();
    expect(hingebook(job, ...issue("P0")).code).toBe(0);
    const takes = Date.now() - started;
    const folder = join(job, "issued");
    const first = readFileSync(join(folder, "frame-P0.html"));
    let ended = 0;
    for (let i = 1; i <= 25; i++) {
      // Half of them towards the end, where files are written.
      const after = takes * (i % 2 === 0 ? i / 25 : 0.8 + (i / 25) * 0.25);
      if (await killed(job, after, issue(`P${i}`))) ended++;
      const { rows } = await readRegister(join(folder, "register.json"));
      for (const row of rows) {
        const bytes = Uint8Array.from(readFileSync(join(folder, row.file)));
        expect(await sha256(bytes)).toBe(row.fileDigest);
      }
      for (const name of readdirSync(folder).filter((one) => /^frame-P\d+\.html$/.test(one)))
        expect(await isWhole(join(folder, name))).toBe(true);
    }
    expect(ended).toBeGreaterThan(5);
    expect(readFileSync(join(folder, "frame-P0.html")).equals(first)).toBe(true);
    expect(hingebook(job, ...issue("Q1")).code).toBe(0);
    expect(readdirSync(folder).filter((one) => one.includes("register.json"))).toEqual(["register.json"]);
    expect(recordOf(join(folder, "frame-Q1.html")).issue?.revision).toBe("Q1");
  });
});

/** Whether this process may mount a file system. */
function mounted(kind: "full" | "read-only", folder: string): boolean {
  const words =
    kind === "full"
      ? ["-t", "tmpfs", "-o", "size=600k", "tmpfs", folder]
      : ["--bind", "-o", "ro", folder, folder];
  if (process.getuid?.() !== 0 || spawnSync("mount", words).status !== 0) return false;
  if (kind === "read-only") spawnSync("mount", ["-o", "remount,bind,ro", folder]);
  mounts.push(folder);
  return true;
}
const mounts: string[] = [];
afterAll(() => {
  for (const folder of mounts) spawnSync("umount", [folder]);
});

describe("disks that do not take it", () => {
  test("a full disk: a clear error, the package of before untouched", ({ skip }) => {
    const job = jobFolder();
    const out = join(job, "out");
    mkdirSync(out);
    if (!mounted("full", out)) skip("NOT TESTED: a small disk cannot be mounted here");
    expect(hingebook(job, "run", "frame.ipynb").code).toBe(0);
    const before = readFileSync(join(out, "frame.html"));
    // Room for a part of the file, so that its beginning can be written and its end cannot.
    const { code, err } = hingebook(job, "run", "frame.ipynb");
    expect(err).toMatch(/out\/frame\.html could not be written: the disk is full \(ENOSPC\)/);
    expect(code).toBe(1);
    expect(readFileSync(join(out, "frame.html")).equals(before)).toBe(true);
    expect(readdirSync(out).sort()).toEqual(["frame.html"]);
  });

  test("a read-only folder: a clear error, the issues in it untouched", ({ skip }) => {
    const job = jobFolder();
    const issue = (rev: string): readonly string[] => [
      "issue",
      "frame.ipynb",
      "--rev",
      rev,
      "--why",
      "trial",
    ];
    expect(hingebook(job, ...issue("P1")).code).toBe(0);
    const folder = join(job, "issued");
    const before = readdirSync(folder).map((name) => readFileSync(join(folder, name), "utf8"));
    if (!mounted("read-only", folder)) skip("NOT TESTED: a folder cannot be made read-only here");
    const { code, err } = hingebook(job, ...issue("P2"));
    expect(err).toMatch(/frame-P2\.html could not be written: the folder is on a read-only disk \(EROFS\)/);
    expect(code).toBe(1);
    expect(readdirSync(folder).map((name) => readFileSync(join(folder, name), "utf8"))).toEqual(before);
  });

  test("an output folder that is a file", () => {
    const job = jobFolder();
    writeFileSync(join(job, "out"), "a file");
    const { code, err } = hingebook(job, "run", "frame.ipynb");
    expect(err).toMatch(/out could not be written: a file of that name is there already \(EEXIST\)/);
    expect(code).toBe(1);
  });
});
