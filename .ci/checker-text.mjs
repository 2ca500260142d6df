// The checker as the reader's browser gets it: the two files that import nothing, types stripped, each in a scope of its
// own. Writes lib/report/checker-text.ts; a test holds that the file is what this makes of the sources today.
import { readFileSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { transformSync } from "oxc-transform";

const top = new URL("..", import.meta.url);
const sources = ["lib/sheet/recheck-equations.ts", "lib/sheet/recheck-formula.ts"];
const wanted = ["recheckEquations", "recheckFormulas"];

function plain(path) {
  const { code, errors } = transformSync(path, readFileSync(new URL(path, top), "utf8"), {
    target: "es2022",
  });
  if (errors.length > 0) throw new Error(`${path}: ${errors[0].message}`);
  if (/^\s*import\b/m.test(code)) throw new Error(`${path} imports something; the checker must not`);
  return code.replace(/^export (?=function|const)/gm, "").replace(/^export \{\s*\};?\n?/gm, "");
}

export function checkerText() {
  const parts = sources.map(
    (path, i) => `const ${wanted[i]} = (() => {\n${plain(path)}return ${wanted[i]};\n})();\n`,
  );
  const text = parts.join("");
  if (/<\/script/i.test(text)) throw new Error("the checker holds the end of a script element");
  return text;
}

export function checkerFile() {
  return `// Made by .ci/checker-text.mjs from ${sources.join(" and ")}; not written by hand.

/** The checker as plain script. */
export const CHECKER: string = ${JSON.stringify(checkerText()).replaceAll("${", "\\u0024{")};
`;
}

if (process.argv[1] === fileURLToPath(import.meta.url))
  writeFileSync(new URL("lib/report/checker-text.ts", top), checkerFile());
