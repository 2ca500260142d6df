// What can be wrong with a question about accuracy: the data, and the words for it in one place.

export type AccuracyFault =
  | { readonly kind: "bad range"; readonly what: string; readonly least: number; readonly most: number }
  | { readonly kind: "bad fixity"; readonly joint: string; readonly least: number; readonly most: number }
  | { readonly kind: "bad words"; readonly key: string; readonly written: string; readonly wanted: string }
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
  | {
      readonly kind: "bad factor";
      readonly value: string;
      readonly loadCase: number;
      readonly factor: number;
    }
  | { readonly kind: "no cases"; readonly value: string; readonly count: number }
  | { readonly kind: "sizes wanted"; readonly because: string; readonly members: readonly string[] }
  | { readonly kind: "outside"; readonly member: string; readonly at: number; readonly length: number }
  | { readonly kind: "no reaction"; readonly joint: string; readonly component: string }
  | { readonly kind: "no section"; readonly member: string }
  | {
      readonly kind: "mixed sections";
      readonly without: readonly string[];
      readonly given: readonly string[];
    }
  | { readonly kind: "sizes known"; readonly what: readonly string[] }
  | { readonly kind: "springs"; readonly joints: readonly string[] }
  | { readonly kind: "bad ratio"; readonly what: string; readonly value: number }
  | { readonly kind: "no such part"; readonly name: string; readonly known: readonly string[] }
  | { readonly kind: "names meet"; readonly names: readonly string[]; readonly members: readonly string[] }
  | { readonly kind: "nothing left"; readonly name: string }
  | { readonly kind: "not a key"; readonly key: string; readonly known: readonly string[] }
  | { readonly kind: "not a range"; readonly key: string; readonly value: string }
  | { readonly kind: "not a fixity"; readonly key: string; readonly value: string }
  | { readonly kind: "stated twice"; readonly what: string; readonly keys: readonly string[] }
  | { readonly kind: "in a circle"; readonly keys: readonly string[] }
  | { readonly kind: "not one ratio"; readonly key: string; readonly least: number; readonly most: number }
  | {
      readonly kind: "sizes differ";
      readonly key: string;
      readonly given: number;
      readonly least: number;
      readonly most: number;
    }
  | { readonly kind: "no bases"; readonly key: string; readonly known: readonly string[] }
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
    case "bad words":
      return `"${fault.key}" is stated as ${fault.written}; wanted: ${fault.wanted}`;
    case "no such group":
      return `"${fault.group}" is no group and no member; there are ${fault.known.join(", ")}`;
    case "varied twice":
      return `${fault.what} of member "${fault.member}" is varied by two unknowns; let it stand in one of them`;
    case "not a base":
      return `the fixity at "${fault.joint}" cannot be varied: ${fault.why}; joints with a support are ${fault.known.join(", ")}`;
    case "no such case":
      return `${fault.value} belongs to load case ${fault.loadCase}; there are ${fault.count}, counted from 0`;
    case "bad factor":
      return `${fault.value} takes load case ${fault.loadCase} ${fault.factor} times; a finite number is wanted`;
    case "no cases":
      return `${fault.value} is asked of no load case at all; name one or more of ${fault.count}, counted from 0`;
    case "sizes wanted":
      return `"${fault.because}" makes forces in proportion to stiffness, but member ${fault.members.join(", ")} has a ratio for a section (E is 1); give sizes by withSections`;
    case "outside":
      return `a place ${short(fault.at)} m along is not on member "${fault.member}"; between 0 and ${short(fault.length)} m is wanted`;
    case "no reaction":
      return `nothing at joint "${fault.joint}" gives a reaction "${fault.component}"; ask for one that its support holds`;
    case "no section":
      return `member "${fault.member}" has no section; give it nominal A, I and E (ratios will do) by withSections`;
    case "mixed sections":
      return `member ${fault.without.join(", ")} has no section, but ${fault.given.join(", ")} has one; give all members sections, or none to work with nominal ratios`;
    case "sizes known":
      return `nominal ratios are stated for ${fault.what.join(", ")}, but every member has a section; leave the ratios out`;
    case "springs":
      return `the support at ${fault.joints.join(", ")} has a spring, which stands against the sizes of members themselves; give sizes by withSections`;
    case "bad ratio":
      return `the nominal ${fault.what} is ${fault.value} times the plain one; a number more than zero is wanted`;
    case "no such part":
      return `"${fault.name}" is no group and no member; there are ${fault.known.join(", ")}`;
    case "names meet":
      return `${fault.names.map((n) => `"${n}"`).join(" and ")} both mean member ${fault.members.join(", ")}; let one name be a part of the other, or let them have no member in common`;
    case "nothing left":
      return `"${fault.name}" means no member that is not named by itself; leave it out`;
    case "not a key":
      return `"${fault.key}" is nothing that can be unknown; wanted is "I of X", "A of X", "I of X / I of Y", "A of X / A of Y" with X and Y of ${fault.known.join(", ")}; "bases", or "base A"`;
    case "not a range":
      return `"${fault.key}" is stated as "${fault.value}"; wanted is a range such as "1 to 4", "within 2", "2 within 1.5", "about 2", a number, or "known"`;
    case "not a fixity":
      return `"${fault.key}" is stated as "${fault.value}"; wanted is a range such as "pinned to half fixed", "0.2 to 0.6", one of pinned, half fixed, fixed, a number from 0 to 1, or "as given"`;
    case "stated twice":
      return `${fault.what} is stated by ${fault.keys.map((k) => `"${k}"`).join(" and ")}; let it stand in one of them`;
    case "in a circle":
      return `${fault.keys.map((k) => `"${k}"`).join(", ")} lead in a circle; leave one of them out`;
    case "not one ratio":
      return `"${fault.key}" is no single ratio with the sections given, but from ${short(fault.least)} to ${short(fault.most)}; name members with one section, or state "within" a factor of each by itself`;
    case "sizes differ":
      return `"${fault.key}" is stated from ${short(fault.least)} to ${short(fault.most)}, but the sections given make it ${short(fault.given)}; change one or the other`;
    case "no bases":
      return `"${fault.key}" names no base; ${fault.known.length === 0 ? "no support can be more or less fixed" : `there are ${fault.known.map((j) => `"base ${j}"`).join(", ")}`}`;
    case "bad value":
      return `the hand value of ${fault.what} is ${fault.value}; a finite number is wanted`;
    case "too few":
      return `${fault.samples} samples are too few; at least ${fault.least} are wanted for an interval that holds 90 %`;
  }
}
