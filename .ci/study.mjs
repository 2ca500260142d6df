// npm run study: how far each method is off, family by family (90th percentile of |error| in %, signed median in brackets), and how
// often the bands hold. A number as argument takes that part of the structures: `npm run study -- 0.1`.
import { mkdirSync, rmSync } from "node:fs";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { build } from "esbuild";

const top = new URL("..", import.meta.url).pathname;
const work = join(top, "out/study");
const share = Number(process.argv[2] ?? 1);
if (!(share > 0 && share <= 1)) {
  console.error(
    `the part of the structures to take is ${process.argv[2]}; a number above 0, at most 1, is wanted`,
  );
  process.exit(2);
}

mkdirSync(work, { recursive: true });
await build({
  absWorkingDir: top,
  entryPoints: ["lib/accuracy/index.ts"],
  outfile: join(work, "accuracy.mjs"),
  bundle: true,
  format: "esm",
  platform: "node",
  target: "node20",
  external: ["mathjs"],
  logLevel: "warning",
});
const { coverage, populationNames, populationStudy } = await import(
  pathToFileURL(join(work, "accuracy.mjs"))
);

const percent = (x) => (100 * x).toFixed(1);

for (const population of populationNames) {
  const rows = populationStudy({ share, only: [population] });
  const measures = [...new Set(rows.map((r) => r.measure))];
  const methods = [...new Set(rows.map((r) => r.method))];
  const wide = Math.max(...methods.map((m) => m.length)) + 2;
  console.log(`\n${population}`);
  console.log("".padEnd(wide) + measures.map((m) => m.padStart(17)).join(""));
  for (const method of methods) {
    const cells = measures.map((measure) => {
      const row = rows.find((r) => r.method === method && r.measure === measure);
      return row === undefined ? "-" : `${percent(row.most)} (${percent(row.middle)})`;
    });
    console.log(method.padEnd(wide) + cells.map((c) => c.padStart(17)).join(""));
  }
}

const frames = Math.max(60, Math.round(1000 * share));
console.log(
  `\nbands on ${frames} random frames: % of true values inside the 90 % interval (between least and greatest)`,
);
const rows = coverage({ frames });
const kinds = ["beam M", "column M", "shear", "axial"];
console.log("".padEnd(56) + kinds.map((k) => k.padStart(16)).join(""));
for (const family of new Set(rows.map((r) => r.family)))
  for (const law of new Set(rows.map((r) => r.law))) {
    const cells = kinds.map((kind) => {
      const row = rows.find((r) => r.family === family && r.law === law && r.kind === kind);
      return row === undefined ? "-" : `${percent(row.inside)} (${percent(row.within)})`;
    });
    console.log(`${family}, ${law}`.padEnd(56) + cells.map((c) => c.padStart(16)).join(""));
  }
rmSync(work, { recursive: true, force: true });
