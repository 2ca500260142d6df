// Verbs refuse what is not theirs, saying what was given and what is wanted.

import { isQuantity } from "../quantity/index.ts";
import type { Structure } from "../structure/types.ts";
import type { Hand, HingeChoice, HingeSet, LoadCase } from "./types.ts";
import { structureName } from "./words.ts";

type Check = (verb: string, args: readonly unknown[]) => void;

const structureFirst: Check = (verb, [structure]) => {
  if (!isStructure(structure))
    refuse(
      verb,
      structure,
      "a structure is wanted, such as beam({ … }), portal({ … }) or buildingFrame({ … })",
    );
};

const casesSecond: Check = (verb, args) => {
  structureFirst(verb, args);
  const [, cases] = args;
  const wanted = `a list of load cases is wanted, what sheet.loadCase answered: sheet.${verb}(frame, [G]${verb === "shape" ? "" : ", …"})`;
  if (!Array.isArray(cases)) return refuse(verb, cases, wanted);
  for (const one of cases) if (!isLoadCase(one)) refuse(verb, one, wanted);
  const keys = (cases as readonly LoadCase[]).map(({ key }) => key);
  const twice = keys.find((key, i) => keys.indexOf(key) !== i);
  if (twice !== undefined) throw new Error(`${verb}: load case ${twice} is given twice; name it once`);
};

const choicesThird: Check = (verb, args) => {
  casesSecond(verb, args);
  const [, , choices] = args;
  const wanted = 'a list of hinges is wanted: [hinge("BC", { from: "B", at: "0.1 L", because: "…" })]';
  if (!Array.isArray(choices)) return refuse(verb, choices, wanted);
  for (const one of choices) if (!isChoice(one)) refuse(verb, one, wanted);
};

const onlySets: Check = (verb, sets) => {
  const call = verb === "beside" ? "beside(chosen, other)" : `${verb}(set)`;
  for (const one of sets)
    if (!isHingeSet(one))
      refuse(verb, one, `hinge sets are wanted, what sheet.hinges or sheet.gravity answered: sheet.${call}`);
};

const handFirst: Check = (verb, [hand]) => {
  if (!isHand(hand))
    refuse(verb, hand, `hand results are wanted, what sheet.freeBodies answered: sheet.${verb}(hand)`);
};

const onlyLoads: Check = (_, [key, , ...loads]) => {
  for (const one of loads)
    if (!isLoad(one))
      refuse(
        `load case ${String(key)}`,
        one,
        'loads are wanted one after another, such as uniform("BC", "5.2 kN/m") or atJoint("B", { right: "18 kN" })',
      );
};

const checks: Readonly<Record<string, Check>> = {
  determinacy: structureFirst,
  unknowns: structureFirst,
  loadCase: onlyLoads,
  shape: casesSecond,
  hinges: choicesThird,
  gravity: casesSecond,
  beside: onlySets,
  freeBodies: onlySets,
  reactions: handFirst,
  diagrams: handFirst,
  spread: handFirst,
  exact: handFirst,
};

/** The same verbs, which refuse in words what is no structure, load case, hinge set or hand result where one is wanted. */
export function guarded<V extends object>(verbs: V): V {
  return Object.fromEntries(
    Object.entries(verbs).map(([verb, run]: [string, (...args: unknown[]) => unknown]) => {
      const check = checks[verb];
      if (check === undefined) return [verb, run];
      return [
        verb,
        (...args: unknown[]): unknown => {
          check(verb, args);
          return run(...args);
        },
      ];
    }),
  ) as V;
}

function refuse(where: string, given: unknown, wanted: string): never {
  throw new Error(`${where}: ${inWords(given)} is given; ${wanted}`);
}

const has = (given: unknown, ...fields: readonly string[]): boolean =>
  typeof given === "object" && given !== null && fields.every((field) => field in given);

const isStructure = (given: unknown): given is Structure =>
  has(given, "joints", "members", "supports", "hinges", "family");
const isLoadCase = (given: unknown): given is LoadCase => has(given, "key", "title", "loads", "entry");
const isHingeSet = (given: unknown): given is HingeSet => has(given, "hinged", "cases", "determinacy");
const isChoice = (given: unknown): given is HingeChoice => has(given, "member", "because");
const isHand = (given: unknown): given is Hand => has(given, "solved", "reaction", "moment");
const isLoad = (given: unknown): given is { readonly label: string } =>
  has(given, "kind", "label") && (has(given, "member") || has(given, "joint"));

/** "load case G", "hinge set G + S", "beam ABC", "a list". */
function inWords(given: unknown): string {
  if (given === undefined || given === null) return "nothing";
  if (isLoadCase(given)) return `load case ${given.key}`;
  if (isHingeSet(given)) return `hinge set ${given.name}`;
  if (isHand(given)) return `results of ${given.name}`;
  if (isStructure(given)) return structureName(given);
  if (isChoice(given)) return `a hinge in ${given.member}`;
  if (isLoad(given)) return `a load${given.label === "" ? "" : ` (${given.label})`}`;
  if (Array.isArray(given))
    return `[${given.slice(0, 3).map(inWords).join(", ")}${given.length > 3 ? ", …" : ""}]`;
  if (isQuantity(given)) return String(given);
  if (typeof given === "string") return `"${given}"`;
  if (typeof given === "function") return "a function";
  return typeof given === "object" ? "an object of another kind" : String(given);
}
