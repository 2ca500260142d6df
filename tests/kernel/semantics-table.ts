// What a programmer may expect of cells that follow one another, as one table: rows of cells and what each must do.
// Every way of running a notebook (the session, the headless runner, the Jupyter kernel) is held to the same table.

/** What a cell must do: show a text, show nothing, print a text, or be refused or throw with a message. */
export type Expected =
  | { readonly shows: string }
  | { readonly nothing: true }
  | { readonly prints: string }
  | { readonly refused: RegExp; readonly line?: number; readonly column?: number }
  | { readonly throws: RegExp; readonly line?: number; readonly column?: number };

export interface Row {
  readonly name: string;
  readonly cells: readonly (readonly [code: string, expected: Expected])[];
}

const shows = (text: string): Expected => ({ shows: text });
const prints = (text: string): Expected => ({ prints: text });
const nothing: Expected = { nothing: true };
const refused = (message: RegExp, line?: number, column?: number): Expected => ({
  refused: message,
  ...(line === undefined ? {} : { line }),
  ...(column === undefined ? {} : { column }),
});
const throws = (message: RegExp, line?: number, column?: number): Expected => ({
  throws: message,
  ...(line === undefined ? {} : { line }),
  ...(column === undefined ? {} : { column }),
});

const row = (name: string, ...cells: Row["cells"]): Row => ({ name, cells });

export const table: readonly Row[] = [
  // What is shown
  row("the last expression is shown", ["1 + 1", shows("2")]),
  row("a semicolon does not hide it", ["1 + 1;", shows("2")]),
  row("empty statements after it do not hide it", ["1 + 1;;", shows("2")]),
  row("a comment after it does not hide it", ["1 + 1 // two\n/* done */", shows("2")]),
  row("a declaration shows nothing", ["const w = 5", nothing]),
  row("an expression before a declaration is not shown", ["1 + 1; const w = 5", nothing]),
  row("an assignment shows nothing", ["let n = 1", nothing], ["n = 2", nothing], ["n += 2; n++", nothing]),
  row("undefined shows nothing", ["undefined", nothing], ["void 0", nothing]),
  row("null is shown", ["null", shows("null")]),
  row("a lone text is shown, not taken for a directive", ['"kN"', shows("'kN'")]),
  row("a comma expression shows its last part", ["let n = 0; n++, n + 1", shows("2")]),
  row("an object literal in brackets is shown", ["({ a: 1 })", shows("{ a: 1 }")]),
  row("braces alone are a block and show nothing", ["{ 1 + 1 }", nothing]),
  row(
    "a loop or a condition shows nothing",
    ["for (const i of [1, 2]) i", nothing],
    ["if (1 + 1) 3", nothing],
  ),
  row("a promise shows what it settles to", ["Promise.resolve(4)", shows("4")]),
  row("a rejected promise fails the cell", ["Promise.reject(new Error('no'))", throws(/^no$/, 1)]),
  row("an object of a class shows its fields", ["class P { x = 1 }\nnew P()", shows("P { x: 1 }")]),
  row("an object shows itself through Symbol.for('Jupyter.display')", [
    "({ [Symbol.for('Jupyter.display')]: () => ({ 'text/plain': 'mine' }) })",
    shows("mine"),
  ]),
  row("an empty cell does nothing", ["", nothing], ["// only a comment", nothing]),
  // Names from cell to cell
  row("a constant is seen in later cells", ["const w = 5", nothing], ["w * 2", shows("10")]),
  row(
    "object shorthand takes the name of an earlier cell",
    ["const w = 5", nothing],
    ["const f = (o: { w: number }) => o.w;\nf({ w })", shows("5")],
  ),
  row(
    "destructuring assigns to names of an earlier cell",
    ["let a = 1, b = 2", nothing],
    ["({ a, b } = { a: 3, b: 4 })", nothing],
    ["[a, b]", shows("[ 3, 4 ]")],
  ),
  row(
    "destructuring with a default assigns too",
    ["let a = 1", nothing],
    ["const o: { a?: number } = {};\n({ a = 5 } = o)", nothing],
    ["a", shows("5")],
  ),
  row(
    "renaming destructuring",
    ["const beam = { L: 6, id: 'B1' }", nothing],
    ["const { L: len } = beam;\nlen", shows("6")],
  ),
  row(
    "renaming in parameters and loops",
    ["const rows = [{ id: 1 }, { id: 2 }];\nfunction f({ id: x }: { id: number }) { return x }", nothing],
    ["let sum = 0; for (const { id: i } of rows) sum += f({ id: i });\nsum", shows("3")],
  ),
  row(
    "destructuring with rest and nesting",
    ["const { a, ...rest } = { a: 1, b: 2, c: { d: 3 } }; const { c: { d } } = rest", nothing],
    ["[a, d, rest.b]", shows("[ 1, 3, 2 ]")],
  ),
  row(
    "a function sees later changes of a variable",
    ["let n = 0;\nfunction inc() { n++; return n }", nothing],
    ["n = 10;\ninc()", shows("11")],
    ["n", shows("11")],
  ),
  row(
    "a function sees a redefined constant",
    ["const n = 1;\nfunction f() { return n }", nothing],
    ["const n = 2", nothing],
    ["f()", shows("2")],
  ),
  row(
    "a function of another cell sees it too",
    ["const n = 1", nothing],
    ["const f = () => n", nothing],
    ["const n = 2;\nf()", shows("2")],
  ),
  row("mutual recursion in one cell", [
    "function even(n: number): boolean { return n === 0 || odd(n - 1) }\nfunction odd(n: number): boolean { return n !== 0 && even(n - 1) }\neven(4)",
    shows("true"),
  ]),
  row(
    "a function may be called above its declaration",
    ["f();\nfunction f() { return 1 }", nothing],
    ["f()", shows("1")],
  ),
  row(
    "a recursive function calls the one that is current",
    ["function f(n: number): number { return n <= 0 ? 0 : f(n - 1) }", nothing],
    ["f.name", shows("'f'")],
    ["f(3)", shows("0")],
  ),
  row(
    "a variable of a loop stays in the loop",
    ["for (let i = 0; i < 3; i++) {}", nothing],
    ["i", refused(/Cannot find name 'i'/)],
  ),
  row("var of a loop is seen later", ["for (var i = 0; i < 3; i++) {}", nothing], ["i", shows("3")]),
  row("var of a block is seen later", ["{ var v = 7 }", nothing], ["v", shows("7")]),
  row("var in a condition without braces", ["if (1 > 0) var v: number | undefined = 7;\nv", shows("7")]),
  row(
    "var with destructuring",
    ["var { a, b: [c] } = { a: 1, b: [2] as [number] }", nothing],
    ["a + c", shows("3")],
  ),
  row(
    "names that other kernels keep for themselves are free",
    ["const exports = 1, module = 2, require = 3", nothing],
    ["exports + module + require", shows("6")],
  ),
  row("names of built-ins may be shadowed", ["const name = 'x', URL = 4", nothing], ["URL", shows("4")]),
  row(
    "writing to globalThis does not reach the kernel",
    ["(globalThis as { leak?: number }).leak = 1", nothing],
    ["'leak' in globalThis", shows("true")],
  ),
  row("the one name hingebook keeps is refused", [
    "const __hingebook = 1",
    refused(/__hingebook is kept for hingebook/),
  ]),
  // Declaring again
  row(
    "const again, with another type",
    ["const a = 1", nothing],
    ["const a = 'x'", nothing],
    ["a.length", shows("1")],
  ),
  row(
    "let, then const, then let",
    ["let a = 1", nothing],
    ["const a = 2", nothing],
    ["let a = 3; a", shows("3")],
  ),
  row(
    "function, then const",
    ["function f() { return 1 }", nothing],
    ["const f = () => 2", nothing],
    ["f()", shows("2")],
  ),
  row("const, then function", ["const f = () => 2", nothing], ["function f() { return 1 }\nf()", shows("1")]),
  row("class, then let", ["class C {}", nothing], ["let C = 5; C", shows("5")]),
  row(
    "class again",
    ["class C { a() { return 1 } }", nothing],
    ["class C { b() { return 2 } }\nnew C().b()", shows("2")],
  ),
  row(
    "var, then let, then var",
    ["var a = 1", nothing],
    ["let a = 2", nothing],
    ["var a = 3; a", shows("3")],
  ),
  row(
    "enum again starts afresh",
    ["enum E { A, B }", nothing],
    ["enum E { C }\nObject.keys(E).length", shows("2")],
  ),
  row(
    "interface again replaces the earlier one",
    ["interface I { a: number }", nothing],
    ["interface I { b: string }\nconst i: I = { b: 'x' }; i", shows("{ b: 'x' }")],
  ),
  row("type again", ["type T = number", nothing], ["type T = string; const t: T = 'x'; t", shows("'x'")]),
  row(
    "an imported name declared again",
    ["import { basename } from 'node:path'", nothing],
    ["const basename = 5; basename", shows("5")],
  ),
  row(
    "the same import again",
    ["import { basename } from 'node:path'", nothing],
    ["import { basename } from 'node:path';\nbasename('a/b')", shows("'b'")],
  ),
  row(
    "the same name imported from elsewhere",
    ["import { resolve } from 'node:path'", nothing],
    ["import { resolve } from 'node:dns';\ntypeof resolve", shows("'function'")],
    ["resolve.length > 1", shows("true")],
  ),
  row(
    "the earlier names stay beside the new one",
    ["const a = 1, b = 2", nothing],
    ["const a = 'x'", nothing],
    ["a + b", shows("'x2'")],
  ),
  row("a name twice in one cell is refused", [
    "const a = 1;\nconst a = 2",
    refused(/already been declared/, 2),
  ]),
  row(
    "a constant in terms of its earlier self is refused",
    ["const x = 1", nothing],
    ["const x = x + 1", refused(/used before|implicitly has type|referenced directly/i)],
  ),
  // Types
  row("a wrong type is refused with line and column", [
    "const a = 1;\nconst s: string = a",
    refused(/Type 'number' is not assignable to type 'string'/, 2, 7),
  ]),
  row("an assignment to a constant is refused", ["const a = 1", nothing], ["a = 2", refused(/constant/)]),
  row("null is not a text", ["const s: string = null", refused(/'null' is not assignable/)]),
  row("an element of a list may be missing", [
    "const list = [1]; list[3].toFixed()",
    refused(/possibly 'undefined'/),
  ]),
  row("an unknown name is refused", ["lenght", refused(/Cannot find name 'lenght'/, 1, 1)]),
  row(
    "types of an earlier cell hold in later ones",
    ["function f(a: number) { return a }", nothing],
    ["f('x')", refused(/'string' is not assignable to parameter of type 'number'/, 1, 3)],
  ),
  row(
    "a refused cell leaves no trace",
    ["const a = 1", nothing],
    ["const a: string = 5", refused(/not assignable/)],
    ["a", shows("1")],
  ),
  row("generics, satisfies, as const and assertions are stripped", [
    "const o = { a: [1, 2] } as const satisfies object;\nfunction id<T>(x: T): T { return x }\nid<number>(o.a[0]!)",
    shows("1"),
  ]),
  row("import type leaves nothing at run time", [
    "import type { ParsedPath } from 'node:path';\nimport { type PathLike } from 'node:fs';\nconst p: Partial<ParsedPath> = { base: 'x' }; const q: PathLike = 'y'; p.base",
    shows("'x'"),
  ]),
  row("a type imported without saying type", [
    "import { ParsedPath, basename } from 'node:path';\nconst p: Partial<ParsedPath> = {}; basename('/a/b')",
    shows("'b'"),
  ]),
  row("abstract, private, readonly and parameter properties", [
    "abstract class A { abstract f(): number }\nclass B extends A { constructor(private readonly n: number) { super() } f() { return this.n } }\nnew B(4).f()",
    shows("4"),
  ]),
  row("a field without a value is there", ["class A { x?: number }\n'x' in new A()", shows("true")]),
  row("private fields and static blocks", [
    "class C { #x = 1; static y: number; static { C.y = 2 } get x() { return this.#x } }\nnew C().x + C.y",
    shows("3"),
  ]),
  row("overloads", [
    "function f(a: string): string;\nfunction f(a: number): number;\nfunction f(a: unknown) { return a }\nf(3)",
    shows("3"),
  ]),
  row("enums, constant enums and namespaces", [
    "enum A { X = 4 } const enum B { Y = 5 }\nnamespace N { export const z = 6; export namespace M { export const q = z + 1 } }\nA.X + B.Y + N.z + N.M.q",
    shows("22"),
  ]),
  row(
    "a namespace is seen in later cells, also after a redeclaration",
    ["const a = 1", nothing],
    ["const a = 'x'; namespace N { export const z = 6 }", nothing],
    ["N.z", shows("6")],
  ),
  row("decorators", [
    "const seen: string[] = [];\nfunction mark(target: object, key: string) { seen.push(key) }\nclass C { @mark a = 1; @mark b() {} }\nseen",
    shows("[ 'a', 'b' ]"),
  ]),
  row("a class decorator may replace the class", [
    "function twice<T extends new (...a: any[]) => object>(c: T) { return class extends c { more = 2 } }\n@twice class D { a = 1 }\nObject.keys(new D())",
    shows("[ 'a', 'more' ]"),
  ]),
  row("text that is not TypeScript is refused at its place", [
    "const a = 1;\nlet b = (",
    refused(/Expected/, 2),
  ]),
  row("return outside a function is refused", ["return 5", refused(/return/)]),
  row("import.meta is refused in words", ["import.meta", refused(/import\.meta/)]),
  // Modules
  row("default, named and namespace imports", [
    "import path, { basename as b } from 'node:path';\nimport * as all from 'node:path';\n[path.basename('a/x'), b('a/y'), all.basename('a/z')]",
    shows("[ 'x', 'y', 'z' ]"),
  ]),
  row(
    "imports are seen in later cells though unused in their own",
    ["import { basename } from 'node:path'", nothing],
    ["basename('a/b')", shows("'b'")],
  ),
  row("imports may stand below their use", [
    "const x = basename('a/b');\nimport { basename } from 'node:path';\nx",
    shows("'b'"),
  ]),
  row("an import for its effect alone", ["import 'node:path'", nothing]),
  row("dynamic import", ["const p = await import('node:path');\np.basename('a/b')", shows("'b'")]),
  row("dynamic import of a name made up at run time", [
    "const name: string = 'node:' + 'path';\nconst p = await import(name);\np.basename('a/b')",
    shows("'b'"),
  ]),
  row(
    "export before declarations is taken off",
    [
      "export const a = 1;\nexport function f() { return a }\nexport class C {}\nexport interface I { x: number }\nexport type T = I;\nexport { a as b }",
      nothing,
    ],
    ["f() + a", shows("2")],
  ),
  row(
    "export default",
    ["export default function g() { return 3 }", nothing],
    ["g()", shows("3")],
    ["export default { a: 1 }", nothing],
    ["export default class {}", nothing],
  ),
  row("a missing package is refused", [
    "import { x } from 'no-such-package-here'",
    refused(/no-such-package-here/),
  ]),
  row("a name a module does not export is refused", [
    "import { basenam } from 'node:path'",
    refused(/basenam/),
  ]),
  row("an ES module package", ["import { z } from 'zod';\nz.number().parse(4)", shows("4")]),
  row("a CommonJS package, default and named", [
    "import writeFileAtomic, { sync } from 'write-file-atomic';\n[typeof writeFileAtomic, typeof sync]",
    shows("[ 'function', 'function' ]"),
  ]),
  // Waiting
  row("top-level await", ["const v = await Promise.resolve(5);\nv", shows("5")]),
  row("for await alone", [
    "let s = 0;\nasync function* g() { yield 1; yield 2 }\nfor await (const x of g()) s += x;\ns",
    shows("3"),
  ]),
  row(
    "names of a cell with await are seen later",
    ["const a = await Promise.resolve(1); let b = 2; function c() { return a + b }", nothing],
    ["b = 5;\nc()", shows("6")],
  ),
  row("a timer can be waited for", [
    "await new Promise<void>((done) => setTimeout(done, 5));\n'done'",
    shows("'done'"),
  ]),
  row("a timer that throws fails the cell it runs in", [
    "setTimeout(() => { throw new Error('late') }, 1);\nawait new Promise<void>((done) => setTimeout(done, 20))",
    throws(/^late$/),
  ]),
  // Strictness and faults
  row(
    "a write to a frozen object throws",
    ["const o: { a: number } = Object.freeze({ a: 1 })", nothing],
    ["o.a = 2", throws(/read only property 'a'/, 1)],
  ),
  row("also in a cell that waits", [
    "const o: { a: number } = Object.freeze({ a: 1 }); await 0;\no.a = 2",
    throws(/read only/, 2),
  ]),
  row("this is not a global object inside a function", [
    "function f(this: unknown) { return this }\nf()",
    nothing,
  ]),
  row("a thrown error names the line and column", [
    "const a = 1;\n\n  throw new RangeError('too long')",
    throws(/^too long$/, 3, 9),
  ]),
  row(
    "an error in a function called later names the call",
    ["function f() { throw new Error('inside') }", nothing],
    ["const x = 1;\n  f()", throws(/^inside$/, 2, 3)],
  ),
  row("what is thrown need not be an error", ["throw 'plain'", throws(/plain/, 1)]),
  row(
    "a failed cell keeps the value of before",
    ["const a = 1", nothing],
    ["const a = (() => { throw new Error('no') })() as number", throws(/^no$/)],
    ["a", shows("1")],
  ),
  row(
    "what came before the fault stays",
    ["const a = 1;\nconst b: number = JSON.parse('{')", throws(/JSON/, 2)],
    ["a", shows("1")],
  ),
  row(
    "a failed cell can be run again, mended",
    ["const a: number = JSON.parse('{')", throws(/JSON/)],
    ["const a: number = JSON.parse('4'); a", shows("4")],
  ),
  row("errors are caught and told apart by class", [
    "try { null as never; JSON.parse('{') } catch (e) { if (e instanceof SyntaxError && e instanceof Error) console.log('caught') }",
    prints("caught\n"),
  ]),
  row("an error of Node's own is an Error too", [
    "import { readFileSync } from 'node:fs';\ntry { readFileSync('/no/such/file') } catch (e) { console.log(e instanceof Error) }",
    prints("true\n"),
  ]),
  row("data of Node's own passes instanceof", [
    "import { Buffer } from 'node:buffer';\n[Buffer.from('a') instanceof Uint8Array, structuredClone([1]) instanceof Array]",
    shows("[ true, true ]"),
  ]),
  row(
    "an own error class",
    [
      "class LoadError extends Error { constructor(readonly load: string) { super('bad load ' + load) } }\nnew Error('x') instanceof LoadError",
      shows("false"),
    ],
    ["throw new LoadError('g')", throws(/^bad load g$/)],
  ),
  // What a cell finds
  row("console prints", ["console.log('a', 1, { b: 2 })", prints("a 1 { b: 2 }\n")]),
  row("console.log shows nothing besides", ["console.log('x'); undefined", prints("x\n")]),
  row("standard helpers are there", [
    "[new URL('https://example.org/a').pathname, new TextDecoder().decode(new TextEncoder().encode('é')), structuredClone({ a: 1 }).a, typeof performance.now()]",
    shows("[ '/a', 'é', 1, 'number' ]"),
  ]),
  row("the network is not", ["fetch('https://example.org')", refused(/Cannot find name 'fetch'/)]),
  row(
    "nor the process, but it can be imported",
    ["process.exit()", refused(/Cannot find name 'process'/)],
    ["import { platform } from 'node:process';\ntypeof platform", shows("'string'")],
  ),
  row(
    "loops over names of the top level",
    ["let sum = 0", nothing],
    ["for (let i = 1; i <= 100; i++) sum += i;\nsum", shows("5050")],
  ),
  row(
    "cells do not run into one another",
    ["let a = 5", nothing],
    ["[1, 2].map((x) => x + a)", shows("[ 6, 7 ]")],
    ["const b = a", nothing],
    ["(b)", shows("5")],
  ),
  row("windows line ends", ["const a = 1;\r\nconst b = 2;\r\na + b", shows("3")]),
  row("characters beyond the basic plane before an error", [
    "const s = '𝛼𝛽'; const n: number = 'x'",
    refused(/not assignable/, 1, 25),
  ]),
  // What a cell finds besides the language
  row("waiting for a timer needs no type", [
    "await new Promise((go) => setTimeout(go, 1));\nawait new Promise((go) => setImmediate(go));\n'done'",
    shows("'done'"),
  ]),
  row("a cell cannot ask for input", ["1;\ninput('load?')", throws(/cannot ask for input/, 2, 1)]),
  row("names of the notebook's own helpers are free to be declared", [
    "const input = 3, display = 4;\ninput + display",
    shows("7"),
  ]),
  row("display shows something on the way and is not the cell's value", [
    "display(1).update(2);\n3",
    shows("3"),
  ]),
  row("a display that fails fails the cell, at its line", [
    "1;\ndisplay({ toHtml() { throw new Error('no picture') } })",
    throws(/^no picture$/, 2),
  ]),
];
