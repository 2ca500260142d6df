// The checker's findings in plain words. A measure that does not fit is reworded from the syntax tree; for the rest the
// compiler's first sentence stands.
import type { Node } from "oxc-parser";
import { pathTo, type Tree } from "../syntax.ts";

/** Units a measure of a dimension may be written in, plainest first; empty for an unknown dimension. */
export type UnitsOf = (dimension: string) => readonly string[];

const article = (noun: string): string => (/^[aeiou]/i.test(noun) ? `an ${noun}` : `a ${noun}`);

/** The dimensions the compiler names as wanted: `Measure<"length">`. */
function wantedDimension(text: string): string | undefined {
  const target = /(?:to (?:parameter of )?type) '(.*)'/s.exec(text)?.[1] ?? "";
  return /^(?:undefined \| )?(?:Measure|Quantity)<"([^"]+)">/.exec(target)?.[1];
}

const wantsAnyMeasure = (text: string): boolean =>
  /to (?:parameter of )?type '(?:readonly )?AnyMeasure'/.test(text);

/** The literal or expression a finding is about, and what it is the value of. */
interface Subject {
  readonly node: Node;
  /** "span", or "argument 2 of uniform". */
  readonly role?: string;
}

function calleeName(node: Node): string | undefined {
  if (node.type === "Identifier") return node.name;
  if (node.type === "MemberExpression" && node.property.type === "Identifier") return node.property.name;
  return undefined;
}

function subjectAt({ program }: Tree, offset: number): Subject | undefined {
  const path = pathTo(program, offset);
  for (let depth = path.length - 1; depth > 0; depth--) {
    const node = path[depth];
    const parent = path[depth - 1];
    if (!node || !parent) return undefined;
    if (node.type === "Property" && node.key.type !== "Literal")
      return { node: node.value, ...(node.key.type === "Identifier" ? { role: node.key.name } : {}) };
    if (parent.type === "Property" && parent.value === node && parent.key.type === "Identifier")
      return { node, role: parent.key.name };
    if (parent.type === "CallExpression") {
      const index = parent.arguments.indexOf(node as (typeof parent.arguments)[number]);
      const name = calleeName(parent.callee);
      if (index >= 0)
        return { node, ...(name === undefined ? {} : { role: `argument ${index + 1} of ${name}` }) };
    }
    if (parent.type === "VariableDeclarator" && parent.id.type === "Identifier")
      return { node: parent.init ?? node, role: parent.id.name };
  }
  return undefined;
}

const numberIn = (text: string): string => /^\s*(-?\d+(?:\.\d+)?)/.exec(text)?.[1] ?? "1";

function example(written: string, units: readonly string[]): string {
  const [plainest] = units;
  if (plainest === undefined) return "";
  return `; write for example "${numberIn(written)} ${plainest}" (${units.join(", ")})`;
}

/** "Quantity<"force">" as the compiler names the type of what was given. */
const givenDimension = (text: string): string | undefined =>
  /Quantity<"([^"]+)">/.exec(/[Tt]ype '([^']*)'/.exec(text)?.[1] ?? "")?.[1];

function measureWords(text: string, tree: Tree, offset: number, unitsOf: UnitsOf): string | undefined {
  const wanted = wantedDimension(text);
  if (wanted === undefined && !wantsAnyMeasure(text)) return undefined;
  const subject = subjectAt(tree, offset);
  if (!subject) return undefined;
  const written = tree.source.slice(subject.node.start, subject.node.end);
  const role = subject.role === undefined ? "" : `${subject.role}: `;
  if (wanted === undefined)
    return `${role}${written} is not a measure; write a number, a space and a unit, for example "14 m" or "5.2 kN/m"`;
  const given = givenDimension(text);
  if (given !== undefined)
    return `${role}${written} is ${article(given)}, where ${article(wanted)} is needed`;
  const inner = subject.node.type === "Literal" ? String(subject.node.value) : written;
  return `${role}${written} is not ${article(wanted)}${example(inner, unitsOf(wanted))}`;
}

/** The words of a finding: the compiler's first line, or plainer ones where a measure does not fit. */
export function words(text: string, tree: Tree | undefined, offset: number, unitsOf: UnitsOf): string {
  const plain = tree && measureWords(text, tree, offset, unitsOf);
  if (plain) return plain;
  const [first = "", ...rest] = text.split("\n");
  const deepest = rest.at(-1)?.trim();
  return deepest !== undefined && deepest !== "" ? `${first} ${deepest}` : first;
}
