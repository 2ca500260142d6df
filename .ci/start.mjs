// npm start: the main job on the demonstration notebooks, without Jupyter.
import { spawnSync } from "node:child_process";
import { readdirSync } from "node:fs";
import { join } from "node:path";

const top = new URL("..", import.meta.url).pathname;
const notebooks = readdirSync(join(top, "notebooks"))
  .filter((name) => name.endsWith(".ipynb"))
  .sort()
  .map((name) => `notebooks/${name}`);
const done = spawnSync(
  process.execPath,
  ["dist/cli.js", "run", ...notebooks, "--out", "out", ...process.argv.slice(2)],
  {
    cwd: top,
    stdio: "inherit",
  },
);
process.exit(done.status ?? 1);
