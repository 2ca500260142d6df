// What the tests of the live kernel share: the built command, Debian's Jupyter, and a kernel installed for one test.
import { spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";

export const top: string = resolve(import.meta.dirname, "../../..");

/** The built command; another build can be named for trying things out. */
export const command: string = join(top, process.env.HINGEBOOK_BUILD ?? "dist", "cli.js");

export const python = "/usr/bin/python3";

const wanted = ["jupyter_client", "nbclient", "nbconvert", "notebook", "jupyter_kernel_test"];

/** Debian packages of Jupyter the tests use that are not there. */
export const missing: readonly string[] = existsSync(python)
  ? wanted.filter((name) => !existsSync(`/usr/lib/python3/dist-packages/${name}`))
  : wanted;

export const hasJupyter: boolean = missing.length === 0;

if (!hasJupyter)
  process.stderr.write(
    `\nSKIPPED: tests with Jupyter; not installed: ${missing.join(", ")} (npm test installs them)\n`,
  );

export interface Jupyter {
  readonly prefix: string;
  /** For programs that are to find the kernel, and nothing of this account's own settings. */
  readonly env: NodeJS.ProcessEnv;
  remove(): void;
}

/** Install the kernel below a folder of its own. */
export function installed(): Jupyter {
  const prefix = mkdtempSync(join(tmpdir(), "hingebook-jupyter-"));
  const done = spawnSync(process.execPath, [command, "kernel", "install", "--prefix", prefix], {
    encoding: "utf8",
  });
  if (done.status !== 0) throw new Error(`the kernel could not be installed: ${done.stderr}`);
  const env = {
    ...process.env,
    JUPYTER_PATH: join(prefix, "share", "jupyter"),
    JUPYTER_CONFIG_DIR: join(prefix, "config"),
    JUPYTER_DATA_DIR: join(prefix, "data"),
    JUPYTER_RUNTIME_DIR: join(prefix, "runtime"),
    IPYTHONDIR: join(prefix, "ipython"),
    PYDEVD_DISABLE_FILE_VALIDATION: "1",
  };
  return { prefix, env, remove: () => rmSync(prefix, { recursive: true, force: true }) };
}
