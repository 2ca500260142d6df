// npm run bench: how long exact solutions of building frames take, beside scipy.sparse assembling and solving the same
// system in the same run, and how the time grows with the number of members at fixed bays. Needs python3-scipy (Debian).
import { spawnSync } from "node:child_process";
import { mkdirSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { build } from "esbuild";

const top = new URL("..", import.meta.url).pathname;
const work = join(top, "out/bench");
const sizes = [
  [3, 3],
  [3, 10],
  [5, 10],
  [5, 20],
  [10, 20],
  [10, 40],
  [10, 60],
];

mkdirSync(work, { recursive: true });
await build({
  stdin: {
    contents: 'export * from "./lib/exact/index.ts"; export * from "./tests/exact/bench-frames.ts";',
    resolveDir: top,
  },
  outfile: join(work, "exact.mjs"),
  bundle: true,
  format: "esm",
  platform: "node",
  target: "node20",
  logLevel: "warning",
});
const { benchFrame, endForces, exact, plainFrame, prepare, solve, stiffnessOf } = await import(
  pathToFileURL(join(work, "exact.mjs"))
);

/** Time of a call in ms: the lower quartile of the later two thirds of as many calls as fit into half a second, so that
 *  neither the just-in-time compiler nor other work on the machine is measured. The Python side does the same. */
function timed(call) {
  const until = performance.now() + 500;
  let times = [];
  for (let runs = 0; runs < 5 || performance.now() < until; runs++) {
    const begun = performance.now();
    call();
    times.push(performance.now() - begun);
  }
  times = times.slice(Math.floor(times.length / 3)).sort((a, b) => a - b);
  return times[Math.floor(times.length / 4)];
}

const rows = sizes.map(([bays, storeys]) => {
  const { structure, loads } = benchFrame(bays, storeys);
  const forces = () => {
    const prepared = prepare(structure, loads);
    return endForces(prepared, solve(prepared, stiffnessOf(prepared)));
  };
  const prepared = prepare(structure, loads);
  const stiffness = stiffnessOf(prepared);
  const again = solve(prepared, stiffness);
  return {
    bays,
    storeys,
    members: structure.members.length,
    whole: timed(() => exact(structure, loads)),
    forces: timed(forces),
    again: timed(() => solve(prepared, stiffness, { room: again, refinements: 0 })),
    displacements: exact(structure, loads).joints.map((j) => [j.x, j.y, j.rotation ?? 0]),
    model: plainFrame(structure, loads),
  };
});

const file = join(work, "frames.json");
writeFileSync(file, JSON.stringify(rows.map((row) => row.model)));
const python = spawnSync("/usr/bin/python3", [join(top, "tests/exact/scipy_frames.py"), file, "0.5"], {
  encoding: "utf8",
  maxBuffer: 1e9,
});
if (python.status !== 0) {
  console.error(`the Python side failed (python3-scipy is needed): ${python.stderr || python.error}`);
  process.exit(1);
}
const other = JSON.parse(python.stdout);

let worst = 0;
console.log(
  "bays x storeys  members   exact   to forces   solved again   scipy.sparse   ratio exact  ratio to forces   largest difference",
);
rows.forEach((row, i) => {
  const { ms, displacements } = other[i];
  const size = Math.max(...displacements.flat().map(Math.abs));
  const gap =
    Math.max(
      ...row.displacements.map((joint, k) =>
        Math.max(...joint.map((u, axis) => Math.abs(u - displacements[k][axis]))),
      ),
    ) / size;
  worst = Math.max(worst, gap);
  const cells = [row.whole, row.forces, row.again, ms].map((t) => `${t.toFixed(2)} ms`.padStart(12));
  console.log(
    `${`${row.bays} x ${row.storeys}`.padEnd(15)} ${String(row.members).padStart(6)} ${cells.join("")} ${(row.whole / ms).toFixed(2).padStart(12)} ${(row.forces / ms).toFixed(2).padStart(14)} ${gap.toExponential(1).padStart(18)}`,
  );
});
const tall = rows.filter((row) => row.bays === 10);
const [low, high] = [tall[0], tall[tall.length - 1]];
for (const key of ["whole", "forces"]) {
  const growth = Math.log(high[key] / low[key]) / Math.log(high.members / low.members);
  console.log(`growth with the number of members at 10 bays, ${key}: exponent ${growth.toFixed(2)}`);
}
console.log(`results agree to ${worst.toExponential(1)} of the largest displacement`);
rmSync(work, { recursive: true, force: true });
if (worst > 1e-8) process.exit(1);
