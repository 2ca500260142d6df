// What can be wrong with a question about accuracy: the data, and the words for it in one place.

export type AccuracyFault =
  | { readonly kind: "bad range"; readonly what: string; readonly least: number; readonly most: number }
  | { readonly kind: "bad fixity"; readonly joint: string; readonly least: number; readonly most: number }
  | { readonly kind: "no such group"; readonly group: string; readonly known: readonly string[] }
  | { readonly kind: "varied twice"; readonly member: string; readonly what: string }
  | {
      readonly kind: "not a base";
      readonly joint: string;
      readonly why: string;
      readonly known: readonly string[];
    }
  | {
      readonly kind: "no such case";
      readonly value: string;
      readonly loadCase: number;
      readonly count: number;
    }
  | { readonly kind: "outside"; readonly member: string; readonly at: number; readonly length: number }
  | { readonly kind: "no reaction"; readonly joint: string; readonly component: string }
  | { readonly kind: "no section"; readonly member: string }
  | { readonly kind: "bad value"; readonly what: string; readonly value: number }
  | { readonly kind: "too few"; readonly samples: number; readonly least: number };

/** An error of this room; `fault` holds the data the words were made from. */
export class AccuracyError extends Error {
  readonly fault: AccuracyFault;

  constructor(fault: AccuracyFault) {
    super(wordsOf(fault));
    this.name = "AccuracyError";
    this.fault = fault;
  }
}

const short = (x: number): string => String(Number(x.toPrecision(6)));

function wordsOf(fault: AccuracyFault): string {
  switch (fault.kind) {
    case "bad range":
      return `${fault.what} is to lie between ${fault.least} and ${fault.most} times its nominal value; two numbers more than zero, the smaller first, are wanted`;
    case "bad fixity":
      return `the fixity at ${fault.joint} is to lie between ${fault.least} and ${fault.most}; two numbers from 0 (free to turn) to 1 (fixed), the smaller first, are wanted`;
    case "no such group":
      return `"${fault.group}" is no group and no member; there are ${fault.known.join(", ")}`;
    case "varied twice":
      return `${fault.what} of member "${fault.member}" is varied by two unknowns; let it stand in one of them`;
    case "not a base":
      return `the fixity at "${fault.joint}" cannot be varied: ${fault.why}; joints with a support are ${fault.known.join(", ")}`;
    case "no such case":
      return `${fault.value} belongs to load case ${fault.loadCase}; there are ${fault.count}, counted from 0`;
    case "outside":
      return `a place ${short(fault.at)} m along is not on member "${fault.member}"; between 0 and ${short(fault.length)} m is wanted`;
    case "no reaction":
      return `nothing at joint "${fault.joint}" gives a reaction "${fault.component}"; ask for one that its support holds`;
    case "no section":
      return `member "${fault.member}" has no section; give it nominal A, I and E (ratios will do) by withSections`;
    case "bad value":
      return `the hand value of ${fault.what} is ${fault.value}; a finite number is wanted`;
    case "too few":
      return `${fault.samples} samples are too few; at least ${fault.least} are wanted for an interval that holds 90 %`;
  }
}
