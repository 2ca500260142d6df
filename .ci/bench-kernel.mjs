// npm run bench:kernel: how fast a notebook runs, beside the stock TypeScript kernel of the tslab package on the same
// machine in the same run. Needs Debian's jupyter-nbconvert and python3-nbclient, and the build in dist/.
//
// The notebook has 20 cells: 15 of code, four figures, one table, five of text. The stock kernel cannot load the charts'
// and the library's packages as they are, so its cells import plain CommonJS stand-ins that do the same work: the
// library bundled for it, and the figures drawn by the very functions ours uses.
import { spawn, spawnSync } from "node:child_process";
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { cpus, tmpdir } from "node:os";
import { join } from "node:path";
import { build } from "esbuild";

const top = new URL("..", import.meta.url).pathname;
const python = "/usr/bin/python3";
const command = join(top, "dist/cli.js");
const rounds = Number(process.argv[2] ?? 5);
const folder = mkdtempSync(join(tmpdir(), "hingebook-bench-"));
process.on("exit", () => rmSync(folder, { recursive: true, force: true }));

const code = [
  'import { openSheet, portal, uniform, hinge } from "hingebook";',
  'const sheet = openSheet({ title: "Bench frame", job: "1", preparedBy: "KL", basis: "trial", units: "kN, m", status: "preliminary" });',
  'const L = sheet.given("L", "12 m", "span"); const h = sheet.given("h", "5 m", "height");',
  'const g = sheet.given("g", "4.0 kN/m", "roof, permanent"); const s = sheet.given("s", "6 kN/m", "snow");',
  'const frame = portal({ span: L, height: h, bases: "pinned" });',
  "sheet.determinacy(frame)",
  'const G = sheet.loadCase("G", "permanent", uniform("BC", g)); const S = sheet.loadCase("S", "snow", uniform("BC", s));',
  'const gravity = sheet.hinges(frame, [G, S], [hinge("BC", { from: "B", at: "0.115 L", because: "stiff beam" }), hinge("BC", { from: "C", at: "0.115 L", symmetry: true, because: "symmetry" })]);\ngravity',
  "const hand = sheet.freeBodies(gravity);",
  "sheet.reactions(hand)",
  'sheet.diagrams(hand, { moments: "tension side" })',
  'const M_B = sheet.result("M_B", hand.moment("BC", { at: "B" }), "beam end moment", { governing: true });',
  'const M_0 = sheet.calc("M_0 = (g + s)*L^2/8", "kN m", "moment of the simple span");',
  'sheet.check("abs(M_B) <= M_0", "no more than the simple span")',
  'sheet.conclude("The knees govern.")',
];
const text = { 0: "# Bench frame", 2: "## Given", 5: "## Frame", 8: "## Free bodies", 12: "## Checks" };

function notebook(kernel, cells) {
  const all = cells.flatMap((source, i) => [
    ...(text[i] ? [{ cell_type: "markdown", metadata: {}, source: text[i] }] : []),
    { cell_type: "code", metadata: {}, source, outputs: [], execution_count: null },
  ]);
  const kernelspec = { name: kernel, display_name: kernel, language: "typescript" };
  return JSON.stringify({ nbformat: 4, nbformat_minor: 4, metadata: { kernelspec }, cells: all });
}

mkdirSync(join(folder, "node_modules/hingebook"), { recursive: true });
await build({
  entryPoints: [join(top, "lib/index.ts")],
  outfile: join(folder, "node_modules/hingebook/index.js"),
  bundle: true,
  format: "cjs",
  platform: "node",
  target: "node20",
  external: ["vega", "vega-lite"],
  logLevel: "error",
});
writeFileSync(
  join(folder, "node_modules/hingebook/index.d.ts"),
  readFileSync(join(top, "dist/hingebook.d.ts")),
);
writeFileSync(
  join(folder, "node_modules/hingebook/package.json"),
  '{ "name": "hingebook", "main": "index.js", "types": "index.d.ts" }',
);
const ours = join(folder, "ours/bench.ipynb");
const stock = join(folder, "stock.ipynb");
mkdirSync(join(folder, "ours"));
writeFileSync(ours, notebook("hingebook", code));
// The stock kernel shows no last value: its figures are drawn and shown by hand, as its users do.
const shows = /^(?:sheet\.(?:determinacy|reactions|diagrams|check|conclude)\(.*\)|gravity)$/m;
const stockCells = code.map((source) =>
  source
    .replace(
      shows,
      (last) =>
        `{ const shown: any = ${last}; const forms = shown[Symbol.for("Jupyter.display")]?.(); if (forms) display.raw(forms["image/svg+xml"] ? "image/svg+xml" : "text/html", forms["image/svg+xml"] ?? forms["text/html"] ?? forms["text/plain"]); }`,
    )
    .replace(/^import /, 'import { display } from "tslab";\nimport '),
);
writeFileSync(stock, notebook("stock", stockCells));

const kernels = join(folder, "share/jupyter/kernels");
mkdirSync(join(kernels, "stock"), { recursive: true });
writeFileSync(
  join(kernels, "stock/kernel.json"),
  JSON.stringify({
    argv: [
      process.execPath,
      join(top, "node_modules/tslab/bin/tslab"),
      "kernel",
      "--config-path={connection_file}",
    ],
    display_name: "stock",
    language: "typescript",
  }),
);
const env = {
  ...process.env,
  JUPYTER_PATH: join(folder, "share/jupyter"),
  PYDEVD_DISABLE_FILE_VALIDATION: "1",
};
const call = (words, program = python) => {
  const begun = performance.now();
  const done = spawnSync(program, words, { env, cwd: folder, encoding: "utf8" });
  if (done.status !== 0) throw new Error(`${words.join(" ")}\n${done.stdout}${done.stderr}`);
  return { seconds: (performance.now() - begun) / 1000, out: done.stdout };
};
call([command, "kernel", "install", "--prefix", folder], process.execPath);

const convert = (file, kernel) =>
  call([
    "-m",
    "nbconvert",
    "--execute",
    "--to",
    "html",
    `--ExecutePreprocessor.kernel_name=${kernel}`,
    "--output-dir",
    folder,
    "--output",
    "converted",
    file,
  ]).seconds;
const cold = () => call([command, "run", ours, "--out", join(folder, "out")], process.execPath).seconds;

const CLIENT = `
import json, sys, time
from jupyter_client.manager import start_new_kernel
begun = time.time()
km, kc = start_new_kernel(kernel_name=sys.argv[1])
kc.execute_interactive("1 + 1", timeout=60, output_hook=lambda m: None)
first = time.time() - begun
times = []
for i in range(12):
    begun = time.time()
    kc.execute_interactive("const a%d = %d; console.log(a%d)" % (i, i, i), timeout=60, output_hook=lambda m: None)
    times.append(time.time() - begun)
kc.stop_channels(); km.shutdown_kernel()
print(json.dumps({"first": first, "later": sorted(times)[len(times) // 2]}))
`;
writeFileSync(join(folder, "client.py"), CLIENT);
const client = (kernel) =>
  JSON.parse(
    call([join(folder, "client.py"), kernel])
      .out.trim()
      .split("\n")
      .at(-1),
  );

/** From a save to the package written, with everything warm: the median of the later ones. */
async function rerun() {
  const out = join(folder, "watched");
  const watching = spawn(process.execPath, [command, "run", "--watch", ours, "--out", out], {
    stdio: "ignore",
  });
  const html = join(out, "bench.html");
  const stamp = () => (existsSync(html) ? statSync(html).mtimeMs : 0);
  const wait = async (before) => {
    while (stamp() === before) await new Promise((done) => setTimeout(done, 1));
  };
  await wait(0);
  const times = [];
  for (let i = 0; i < 10; i++) {
    await new Promise((done) => setTimeout(done, 300));
    const before = stamp();
    const begun = performance.now();
    writeFileSync(ours, notebook("hingebook", code).replace("4.0 kN/m", `4.${i + 1} kN/m`));
    await wait(before);
    times.push((performance.now() - begun) / 1000);
  }
  watching.kill("SIGINT");
  await new Promise((done) => watching.once("exit", done));
  writeFileSync(ours, notebook("hingebook", code));
  return times.slice(3);
}

const median = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)];
const found = {
  stock: [],
  converted: [],
  cold: [],
  watch: [],
  ourFirst: [],
  stockFirst: [],
  ourLater: [],
  stockLater: [],
};
for (let i = 0; i < rounds; i++) {
  found.stock.push(convert(stock, "stock"));
  found.converted.push(convert(ours, "hingebook"));
  found.cold.push(cold());
  found.watch.push(median(await rerun()));
  const [a, b] = [client("hingebook"), client("stock")];
  found.ourFirst.push(a.first);
  found.ourLater.push(a.later);
  found.stockFirst.push(b.first);
  found.stockLater.push(b.later);
}
const of = Object.fromEntries(Object.entries(found).map(([name, values]) => [name, median(values)]));
const row = (what, value, against, most) =>
  console.log(
    `${what.padEnd(58)} ${value.toFixed(3).padStart(8)} s  ratio ${(value / against).toFixed(3)}  (at most ${most})`,
  );
console.log(
  `${cpus().length} processors, median of ${rounds}; stock nbconvert --execute: ${of.stock.toFixed(2)} s = 1`,
);
row("nbconvert --execute with hingebook's kernel", of.converted, of.stock, "-");
row("hingebook run, cold, with check and package", of.cold, of.stock, 0.2);
row("--watch: one load changed, from save to package", of.watch, of.stock, 0.03);
row(`kernel start to first result (stock ${of.stockFirst.toFixed(2)} s)`, of.ourFirst, of.stockFirst, 1);
row(`each later cell (stock ${(1000 * of.stockLater).toFixed(0)} ms)`, of.ourLater, of.stockLater, 0.5);
