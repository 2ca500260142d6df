import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import {
  installedKernels,
  installKernel,
  kernelFolder,
  removeKernel,
  type System,
  userData,
} from "../../../kernel/jupyter/installation.ts";

let folder = "";
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "hingebook-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

const system = (env: System["env"] = {}): System => ({ platform: "linux", env, home: folder });
const starter = () => {
  const command = join(folder, "cli.js");
  writeFileSync(command, "");
  return { node: process.execPath, command, version: "0.0.1" };
};

describe("installKernel(place, starter)", () => {
  test("for this user: kernel.json that starts this very command, and a logo", () => {
    const where = installKernel({ kind: "user" }, starter(), system());
    expect(where).toBe(join(folder, ".local/share/jupyter/kernels/hingebook"));
    expect(readdirSync(where).sort()).toEqual([
      "kernel.json",
      "logo-32x32.png",
      "logo-64x64.png",
      "logo-svg.svg",
    ]);
    const spec = JSON.parse(readFileSync(join(where, "kernel.json"), "utf8"));
    expect(spec).toMatchObject({
      display_name: "hingebook",
      language: "typescript",
      interrupt_mode: "message",
    });
    expect(spec.argv[0]).toBe(process.execPath);
    expect(spec.argv.slice(-4)).toEqual([join(folder, "cli.js"), "kernel", "serve", "{connection_file}"]);
    expect(installedKernels(system())).toEqual([
      { folder: where, command: join(folder, "cli.js"), works: true },
    ]);
  });

  test("below a prefix, found through JUPYTER_PATH; again, and removed", () => {
    const place = { kind: "prefix", folder: join(folder, "env") } as const;
    const env = { JUPYTER_PATH: join(folder, "env/share/jupyter"), JUPYTER_DATA_DIR: join(folder, "none") };
    installKernel(place, starter(), system(env));
    const where = installKernel(place, starter(), system(env));
    expect(installedKernels(system(env)).map((one) => one.folder)).toEqual([where]);
    expect(removeKernel(place, system(env))).toBe(where);
    expect(existsSync(where)).toBe(false);
    expect(() => removeKernel(place, system(env))).toThrow(/there is no kernel in/);
  });

  test("what is not ours is left alone", () => {
    const where = kernelFolder({ kind: "user" }, system());
    mkdirSync(where, { recursive: true });
    writeFileSync(join(where, "kernel.json"), '{ "argv": ["other"] }');
    expect(() => installKernel({ kind: "user" }, starter(), system())).toThrow(/is not hingebook's/);
    expect(() => removeKernel({ kind: "user" }, system())).toThrow(/is not hingebook's/);
    expect(installedKernels(system())).toEqual([]);
  });

  test("a kernel whose command is gone is listed as such", () => {
    const made = starter();
    installKernel({ kind: "user" }, made, system());
    rmSync(made.command);
    expect(installedKernels(system()).map(({ works }) => works)).toEqual([false]);
  });
});

// Source: Jupyter core documentation, "Data files".
test.each([
  ["linux", {}, "/h/.local/share/jupyter"],
  ["linux", { XDG_DATA_HOME: "/x" }, "/x/jupyter"],
  ["darwin", {}, "/h/Library/Jupyter"],
  ["linux", { JUPYTER_DATA_DIR: "/d" }, "/d"],
] as const)("userData on %s with %j is %s", (platform, env, wanted) => {
  expect(userData({ platform, env, home: "/h" })).toBe(wanted);
});
