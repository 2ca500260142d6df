// What can be wrong with a question about points of inflection: the data, and the words for it in one place.

export type InflectionFault =
  | { readonly kind: "fixity"; readonly end: string; readonly value: number }
  | { readonly kind: "restraint"; readonly value: number }
  | { readonly kind: "length"; readonly value: number }
  | { readonly kind: "unloaded" }
  | { readonly kind: "no inflection"; readonly end: string }
  | { readonly kind: "both or neither"; readonly member: string }
  | {
      readonly kind: "not an end";
      readonly member: string;
      readonly joint: string;
      readonly ends: readonly string[];
    }
  | { readonly kind: "outside"; readonly member: string; readonly distance: number; readonly length: number }
  | { readonly kind: "pinned end"; readonly member: string; readonly joint: string };

/** An error of this room; `fault` holds the data the words were made from. */
export class InflectionError extends Error {
  readonly fault: InflectionFault;

  constructor(fault: InflectionFault) {
    super(wordsOf(fault));
    this.name = "InflectionError";
    this.fault = fault;
  }
}

const short = (x: number): string => String(Number(x.toPrecision(6)));

function wordsOf(fault: InflectionFault): string {
  switch (fault.kind) {
    case "fixity":
      return `the end fixity at ${fault.end} is ${fault.value}; from 0 (free to turn) to 1 (fixed) is wanted`;
    case "restraint":
      return `the restraint is ${fault.value}; a ratio of stiffnesses from 0 (free to turn) upwards is wanted`;
    case "length":
      return `the span is ${fault.value} m; more than zero is wanted`;
    case "unloaded":
      return "no load acts across the span, so its own loads give no point of inflection; load it or place the hinge by a fraction";
    case "no inflection":
      return `under these loads the moment does not change sign near ${fault.end}: restraint there gives no point of inflection`;
    case "both or neither":
      return `place the hinge in ${fault.member} either by a distance ("at") or by end fixity ("fixity"), one of the two`;
    case "not an end":
      return `the hinge is measured from "${fault.joint}", which is not an end of member ${fault.member}; its ends are ${fault.ends.join(" and ")}`;
    case "outside":
      return `a hinge ${short(fault.distance)} m along is not inside member ${fault.member}; between 0 and ${short(fault.length)} m is wanted`;
    case "pinned end":
      return `member ${fault.member} is free to turn at ${fault.joint}, where its moment is zero already; no hinge is needed near that end`;
  }
}
