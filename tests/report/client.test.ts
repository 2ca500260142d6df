import ts from "typescript";
import { describe, expect, it } from "vitest";
import { CLIENT } from "../../lib/report/client.ts";

/** Complaints of the type checker about JavaScript for a browser. */
function complaints(code: string): string[] {
  const options: ts.CompilerOptions = {
    allowJs: true,
    checkJs: true,
    strict: true,
    noEmit: true,
    target: ts.ScriptTarget.ES2022,
    lib: ["lib.es2022.d.ts", "lib.dom.d.ts", "lib.dom.iterable.d.ts"],
    types: [],
  };
  const host = ts.createCompilerHost(options);
  const read = host.getSourceFile.bind(host);
  host.getSourceFile = (name, version) =>
    name === "client.js"
      ? ts.createSourceFile(name, code, version, true, ts.ScriptKind.JS)
      : read(name, version);
  const program = ts.createProgram(["client.js"], options, host);
  return ts.getPreEmitDiagnostics(program).map((d) => ts.flattenDiagnosticMessageText(d.messageText, " "));
}

describe("CLIENT", () => {
  it("CLIENT passes the strict type checker as browser JavaScript", () => {
    expect(complaints(CLIENT)).toEqual([]);
    expect(complaints(`${CLIENT}\ndocument.titel = 1;`)).not.toEqual([]);
  });

  it("CLIENT cannot end its own script element, and asks the network nothing", () => {
    expect(CLIENT).not.toMatch(/<\/script|<!--/i);
    expect(CLIENT).not.toMatch(/fetch|XMLHttpRequest|WebSocket|import\(|eval|Function\(/);
  });
});
