// What can be wrong with a question about relative stiffness: the data, and the words for it in one place.

export type NetFault =
  | { readonly kind: "no stiffness"; readonly member: string }
  | { readonly kind: "not carried"; readonly joint: string }
  | { readonly kind: "inclined"; readonly member: string }
  | { readonly kind: "hinged"; readonly hinges: readonly string[] }
  | { readonly kind: "ratio"; readonly what: string; readonly value: number }
  | { readonly kind: "sideways"; readonly where: string }
  | { readonly kind: "couple"; readonly where: string }
  | { readonly kind: "no sign change"; readonly member: string; readonly words: string }
  | { readonly kind: "not uniform"; readonly member: string }
  | { readonly kind: "places"; readonly first: number; readonly second: number; readonly length: number };

/** An error about relative stiffness; `fault` holds the data the words were made from. */
export class NetError extends Error {
  readonly fault: NetFault;

  constructor(fault: NetFault) {
    super(wordsOf(fault));
    this.name = "NetError";
    this.fault = fault;
  }
}

function wordsOf(fault: NetFault): string {
  switch (fault.kind) {
    case "no stiffness":
      return `member "${fault.member}" has no section; placing by relative stiffness needs its E and I, by withSections, or ratios: { "I of beams / I of columns": 2.5 }`;
    case "inclined":
      return `member "${fault.member}" is neither level nor upright; these formulas are for beams and columns`;
    case "not carried":
      return `joint "${fault.joint}" stands on no column and no support, so its sinking does not follow from column loads`;
    case "hinged":
      return `relative stiffness is asked for in a structure with hinges (${fault.hinges.join(", ")}); ask for it before hinges are placed`;
    case "ratio":
      return `${fault.what} is ${fault.value}; a finite number more than zero is wanted`;
    case "not uniform":
      return `moment coefficients hold for a uniform load along all of a beam; the load of "${fault.member}" is another`;
    case "sideways":
      return `a load on ${fault.where} pushes the frame sideways; these formulas are for gravity, give it a hinge set of its own`;
    case "couple":
      return `a couple acts on ${fault.where}; these formulas take loads across the beams and forces down, place its hinges yourself`;
    case "no sign change":
      return `by relative stiffness (${fault.words}) the moment of member "${fault.member}" does not change sign; place the hinge in another member`;
    case "places":
      return `hinges at ${fault.first} m and ${fault.second} m of a span of ${fault.length} m; two different places on it are wanted`;
  }
}

/** Throws unless a ratio is finite and more than zero. */
export function checkRatio(what: string, value: number): void {
  if (!(value > 0 && Number.isFinite(value))) throw new NetError({ kind: "ratio", what, value });
}
