// What can be wrong with a model or its loads: the data, and the words for it in one place.

export type StructureFault =
  | {
      readonly kind: "unknown joint";
      readonly what: string;
      readonly joint: string;
      readonly known: readonly string[];
    }
  | {
      readonly kind: "unknown member";
      readonly what: string;
      readonly member: string;
      readonly known: readonly string[];
    }
  | { readonly kind: "name used twice"; readonly what: string; readonly name: string }
  | { readonly kind: "bad name"; readonly what: string; readonly name: string }
  | { readonly kind: "not finite"; readonly what: string; readonly value: number }
  | { readonly kind: "not positive"; readonly what: string; readonly value: number; readonly unit: string }
  | { readonly kind: "zero length"; readonly member: string; readonly joints: readonly [string, string] }
  | {
      readonly kind: "same joints";
      readonly members: readonly [string, string];
      readonly joints: readonly [string, string];
    }
  | { readonly kind: "wrong number"; readonly what: string; readonly wanted: number; readonly got: number }
  | { readonly kind: "no supports" }
  | { readonly kind: "pieces"; readonly pieces: readonly (readonly string[])[] }
  | { readonly kind: "spinning support"; readonly joint: string }
  | {
      readonly kind: "unknown choice";
      readonly what: string;
      readonly value: string;
      readonly choices: readonly string[];
    }
  | {
      readonly kind: "not on member";
      readonly what: string;
      readonly joint: string;
      readonly member: string;
      readonly ends: readonly string[];
    }
  | { readonly kind: "place"; readonly what: string; readonly text: string }
  | {
      readonly kind: "outside";
      readonly what: string;
      readonly member: string;
      readonly at: number;
      readonly length: number;
      readonly open: boolean;
    }
  | { readonly kind: "hinge at end"; readonly what: string; readonly member: string; readonly joint: string }
  | {
      readonly kind: "hinge twice";
      readonly hinges: readonly [string, string];
      readonly member: string;
      readonly at: number;
    }
  | {
      readonly kind: "empty stretch";
      readonly what: string;
      readonly member: string;
      readonly begin: number;
      readonly end: number;
    }
  | { readonly kind: "reversed"; readonly what: string; readonly begin: string; readonly end: string }
  | { readonly kind: "off member"; readonly what: string; readonly place: string }
  | { readonly kind: "couple at hinge"; readonly what: string; readonly hinge: string }
  | { readonly kind: "couple on pin"; readonly what: string; readonly joint: string }
  | { readonly kind: "no load"; readonly what: string }
  | { readonly kind: "loose member"; readonly member: string; readonly motion: string }
  | { readonly kind: "held spring"; readonly joint: string; readonly axis: string }
  | { readonly kind: "no section"; readonly member: string; readonly missing: string; readonly why: string }
  | {
      readonly kind: "no such member";
      readonly what: string;
      readonly name: string;
      readonly known: readonly string[];
    }
  | { readonly kind: "ratio key"; readonly key: string }
  | { readonly kind: "ratio"; readonly key: string; readonly value: string }
  | { readonly kind: "ratio twice"; readonly key: string; readonly member: string }
  | { readonly kind: "ratio circle"; readonly keys: readonly string[] }
  | { readonly kind: "ratio of unlike"; readonly key: string; readonly members: readonly string[] }
  | { readonly kind: "not held"; readonly what: string; readonly joint: string; readonly axis: string }
  | { readonly kind: "level load"; readonly what: string; readonly member: string; readonly per: string }
  | { readonly kind: "not a model"; readonly where: string; readonly found: string; readonly wanted: string };

/** An error of the model; `fault` holds the data the words were made from. */
export class StructureError extends Error {
  readonly fault: StructureFault;

  constructor(fault: StructureFault) {
    super(wordsOf(fault));
    this.name = "StructureError";
    this.fault = fault;
  }
}

const list = (names: readonly string[]): string => (names.length === 0 ? "none" : names.join(", "));
const metres = (x: number): string => `${Number(x.toPrecision(6))} m`;

function wordsOf(fault: StructureFault): string {
  switch (fault.kind) {
    case "unknown joint":
      return `${fault.what} "${fault.joint}", which is not defined; joints are ${list(fault.known)}`;
    case "unknown member":
      return `${fault.what} is on member "${fault.member}", which is not defined; members are ${list(fault.known)}`;
    case "name used twice":
      return `${fault.what} "${fault.name}" is defined twice; give each its own name`;
    case "bad name":
      return `${fault.what} name "${fault.name}" is refused; use letters and digits, a letter first, e.g. "B2"`;
    case "not finite":
      return `${fault.what} is ${fault.value}; a finite number is wanted`;
    case "not positive":
      return `${fault.what} is ${Number(fault.value.toPrecision(6))} ${fault.unit}; more than zero is wanted`;
    case "zero length":
      return `member "${fault.member}" has no length: joints ${fault.joints.join(" and ")} are at the same place; move one`;
    case "same joints":
      return `members ${fault.members.join(" and ")} both join ${fault.joints.join(" and ")}; keep one`;
    case "wrong number":
      return `${fault.what}: ${fault.got} given, ${fault.wanted} wanted, one per joint`;
    case "no supports":
      return "the structure has no supports; support at least one joint";
    case "pieces":
      return `the structure is in ${fault.pieces.length} pieces: ${fault.pieces.map((p) => p.join(" ")).join(" | ")}; join them by members, or model one`;
    case "spinning support":
      return `the support at ${fault.joint} holds rotation, but every member end there is released; make the support pinned or drop a release`;
    case "unknown choice":
      return `${fault.what} is "${fault.value}"; it is one of ${fault.choices.map((c) => `"${c}"`).join(", ")}`;
    case "not on member":
      return `${fault.what} is measured from "${fault.joint}", which is not an end of member ${fault.member}; its ends are ${fault.ends.join(" and ")}`;
    case "place":
      return `${fault.what}: "${fault.text}" is no place on a member; write a length such as "1.75 m" or a part of the member's length such as "0.125 L"`;
    case "outside":
      return `${fault.what} is at ${metres(fault.at)} on member ${fault.member}, outside it; ${fault.open ? "between" : "from"} 0 ${fault.open ? "and" : "to"} ${metres(fault.length)} is wanted`;
    case "hinge at end":
      return `${fault.what} on member ${fault.member} is at joint ${fault.joint}; a hinge lies inside its member, between the joints (release the member end for a pin at ${fault.joint})`;
    case "hinge twice":
      return `hinges ${fault.hinges.join(" and ")} are at the same place, ${metres(fault.at)} along member ${fault.member}; keep one`;
    case "empty stretch":
      return `${fault.what} on member ${fault.member} runs from ${metres(fault.begin)} to ${metres(fault.end)}; its end must lie beyond its beginning`;
    case "reversed":
      return `${fault.what} runs from ${fault.begin} to ${fault.end}; its end must lie beyond its beginning, both measured from the member's start`;
    case "off member":
      return `${fault.what} is at ${fault.place}, outside its member; from 0 L to 1 L is wanted, measured from the member's start`;
    case "couple at hinge":
      return `${fault.what} acts exactly at hinge ${fault.hinge}, which takes no moment; move it to one side of the hinge`;
    case "couple on pin":
      return `${fault.what} acts on joint ${fault.joint}, where every member end is released and nothing takes a couple; put it on a member`;
    case "no load":
      return `${fault.what} has no force or couple; give one of right, left, down, up, couple`;
    case "loose member":
      return `member "${fault.member}" is released at both ends so far that it ${fault.motion} by itself; drop one of the releases`;
    case "held spring":
      return `the support at ${fault.joint} both holds ${fault.axis} and has a spring there; keep one`;
    case "no section":
      return `member "${fault.member}" has no ${fault.missing}; ${fault.why}`;
    case "no such member":
      return `${fault.what} "${fault.name}" is no member and no group of members; there are ${list(fault.known)}`;
    case "ratio key":
      return `stiffness ratio "${fault.key}" cannot be read; write "I of beams / I of columns", "I of BC / I of AB" or "I of columns"`;
    case "ratio":
      return `stiffness ratio "${fault.key}" is ${fault.value}; a number more than zero is wanted, such as 2.5`;
    case "ratio twice":
      return `stiffness ratio "${fault.key}" sets the I of member "${fault.member}" a second time; keep one ratio for it`;
    case "ratio circle":
      return `stiffness ratios ${fault.keys.map((key) => `"${key}"`).join(" and ")} are measured by each other; measure both by a third`;
    case "ratio of unlike":
      return `stiffness ratio "${fault.key}" is measured by members of unlike I (${list(fault.members)}); name one of them`;
    case "not held":
      return `${fault.what} moves joint ${fault.joint} in ${fault.axis}, where no support holds it; support it there, or drop the movement`;
    case "level load":
      return `${fault.what} is per ${fault.per} projection, but member ${fault.member} has none; give it per length of the member`;
    case "not a model":
      return `${fault.where} is ${fault.found}; ${fault.wanted} is wanted`;
  }
}
