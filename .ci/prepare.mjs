// Brings a checkout to a state in which it runs: packages from the lock file, the build, and with --tests what the
// tests use from Debian. Each part is done only where it is missing or older than what it is made from.
import { execFileSync, spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";

const top = new URL("..", import.meta.url).pathname;
const say = (words) => console.log(`hingebook: ${words}`);

function need(condition, words) {
  if (condition) return;
  console.error(`hingebook: ${words}`);
  process.exit(1);
}

function digest(paths) {
  const hash = createHash("sha256");
  for (const path of paths)
    hash
      .update(path)
      .update("\0")
      .update(readFileSync(join(top, path)));
  return hash.digest("hex");
}

function filesBelow(folder) {
  if (!existsSync(join(top, folder))) return [];
  return readdirSync(join(top, folder))
    .sort()
    .flatMap((name) => {
      const path = `${folder}/${name}`;
      return statSync(join(top, path)).isDirectory() ? filesBelow(path) : [path];
    });
}

function stamped(stamp, value) {
  const path = join(top, stamp);
  return existsSync(path) && readFileSync(path, "utf8") === value;
}

function packages() {
  const wanted = digest(["package-lock.json", "package.json"]);
  const stamp = "node_modules/.hingebook-lock";
  if (stamped(stamp, wanted)) return;
  say("installing packages (npm ci) ...");
  const started = Date.now();
  const done = spawnSync("npm", ["ci", "--no-audit", "--no-fund", "--loglevel=error"], {
    cwd: top,
    stdio: ["ignore", "ignore", "inherit"],
    shell: process.platform === "win32",
  });
  need(done.status === 0, "npm ci failed; see the lines above.");
  writeFileSync(join(top, stamp), wanted);
  say(`packages installed in ${((Date.now() - started) / 1000).toFixed(0)} s`);
}

function build() {
  const wanted = digest([
    ...filesBelow("lib"),
    ...filesBelow("kernel"),
    ".ci/build.mjs",
    "package-lock.json",
    "package.json",
    "tsconfig.json",
  ]);
  const stamp = "dist/.sources";
  if (stamped(stamp, wanted)) return;
  say("building ...");
  const started = Date.now();
  execFileSync(process.execPath, [join(top, ".ci/build.mjs")], { cwd: top, stdio: "inherit" });
  writeFileSync(join(top, stamp), wanted);
  say(`built in ${((Date.now() - started) / 1000).toFixed(1)} s`);
}

/** Debian packages by the file that shows they are there. */
const debian = [
  ["/usr/bin/chromium", "chromium"],
  ["/usr/bin/pdftotext", "poppler-utils"],
  ["/usr/lib/python3/dist-packages/jupyter_client", "jupyter-client"],
  ["/usr/lib/python3/dist-packages/nbclient", "python3-nbclient"],
  ["/usr/lib/python3/dist-packages/nbconvert", "jupyter-nbconvert"],
  ["/usr/lib/python3/dist-packages/notebook", "jupyter-notebook"],
  ["/usr/lib/python3/dist-packages/jupyter_kernel_test", "python3-jupyter-kernel-test"],
  ["/usr/lib/python3/dist-packages/sympy", "python3-sympy"],
  ["/usr/lib/python3/dist-packages/scipy", "python3-scipy"],
];

function fromDebian() {
  const missing = debian.filter(([file]) => !existsSync(file)).map(([, name]) => name);
  if (missing.length === 0) return;
  const may = process.getuid?.() === 0 && existsSync("/usr/bin/apt-get");
  if (!may) {
    say(
      `NOT INSTALLED, and apt may not be used here: ${missing.join(", ")}; the tests that need them are skipped`,
    );
    return;
  }
  say(`installing from Debian: ${missing.join(", ")} ...`);
  const apt = (...args) =>
    spawnSync("apt-get", args, {
      stdio: ["ignore", "ignore", "inherit"],
      env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
    });
  apt("update", "-qq");
  const done = apt("install", "-y", "-qq", "--no-install-recommends", ...missing);
  if (done.status !== 0)
    say(`apt-get could not install ${missing.join(", ")}; the tests that need them are skipped`);
}

const [major, minor] = process.versions.node.split(".").map(Number);
need(
  major > 20 || (major === 20 && minor >= 19),
  `Node 20.19 or newer is needed; this is ${process.versions.node}.`,
);
packages();
build();
if (process.argv.includes("--tests")) fromDebian();
