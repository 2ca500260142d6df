// What is not known, for a table: each unknown with its nominal value, its range and its law; and the nominal ratios in lines.

import type { Member, Structure } from "../structure/index.ts";
import { isBar } from "./matters.ts";
import type { Part } from "./parts.ts";
import type { Unknown } from "./unknowns.ts";
import { laws } from "./words.ts";

/** One unknown as it is printed. Values are the ratio itself where one was stated, to another group or to the plain nominal value; otherwise multiples of the nominal stiffness, or
 *  fixities (0 free to turn, 1 fixed; their nominal value is the middle of the range). */
export interface UnknownRow {
  readonly name: string;
  readonly measure: "ratio" | "times nominal" | "fixity";
  readonly nominal: number;
  readonly least: number;
  readonly most: number;
  /** In words. */
  readonly law: string;
  readonly stated: boolean;
}

/** A row per unknown, in their order. */
export function unknownRows(unknowns: readonly Unknown[]): readonly UnknownRow[] {
  return Object.freeze(unknowns.map((unknown) => Object.freeze(rowOf(unknown))));
}

function rowOf({ name, kind, least, most, ratio, byDefault }: Unknown): UnknownRow {
  const stated = byDefault === undefined;
  if (kind === "fixity")
    return { name, measure: "fixity", nominal: (least + most) / 2, least, most, law: laws.fixity, stated };
  const nominal = ratio?.nominal ?? 1;
  const measure = ratio === undefined ? "times nominal" : "ratio";
  return { name, measure, nominal, least: nominal * least, most: nominal * most, law: laws.multiple, stated };
}

/** Nominal I and A of each part beside those of the first, one line each: "I of beams 2 times I of columns, A of beams 1.4 times
 *  A of columns". */
export function nominalLines({ members }: Structure, parts: readonly Part[]): readonly string[] {
  const kinds = members.every(isBar) ? (["A"] as const) : (["I", "A"] as const);
  const [first] = parts;
  const measure = first?.members[0] ?? 0;
  const shareOf = (part: Part, kind: "I" | "A"): string => {
    const values = part.members.map((i) => rigidity(members[i], kind) / rigidity(members[measure], kind));
    const [least, most] = [short(Math.min(...values)), short(Math.max(...values))];
    return least === most ? least : `${least} to ${most}`;
  };
  const alike = first !== undefined && kinds.every((kind) => shareOf(first, kind) === "1");
  const to = alike ? first.name : (members[measure]?.name ?? "");
  if (alike && parts.length === 1) return Object.freeze([`${kinds.join(" and ")} of ${to} all alike`]);
  const ofPart = (part: Part): string =>
    kinds
      .map((kind) => {
        const share = shareOf(part, kind);
        return `${kind} of ${part.name} ${share === "1" ? "equal to" : `${share} times`} ${kind} of ${to}`;
      })
      .join(", ");
  return Object.freeze(parts.filter((part) => !(alike && part === first)).map(ofPart));
}

function rigidity(member: Member | undefined, kind: "I" | "A"): number {
  return member?.section === undefined ? Number.NaN : member.section.E * member.section[kind];
}

function short(x: number): string {
  return String(Number(x.toPrecision(3)));
}
