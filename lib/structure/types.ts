// The model: joints, members, supports, hinges and loads as frozen plain data, SI throughout (m, N, rad).
//
// Axes: x to the right, y up, moments and rotations counter-clockwise positive.
// A member runs from its `start` joint to its `end` joint; positions along it are metres from the start.
// Its reference fibre lies on the right-hand side of the walk from start to end: the lower side of a member
// drawn left to right, the right side of a member going up. A positive bending moment puts that fibre in tension.

/** Ledger entries a value came from, each "entry@version"; carried along unread by the mechanics. */
export type Sources = readonly string[];

/** A point where members meet or are supported. Coordinates in m. `fromX` and `fromY` say what each coordinate came
 *  from, where that is known; `from` holds both. */
export interface Joint {
  readonly name: string;
  readonly x: number;
  readonly y: number;
  readonly fromX?: Sources;
  readonly fromY?: Sources;
  readonly from: Sources;
}

/** A moment hinge inside a member, `at` metres from the member's start. How it was placed, where that was otherwise:
 *  `part` of the member's length from its start, or metres `fromEnd` of the member. */
export interface Hinge {
  readonly name: string;
  readonly member: string;
  readonly at: number;
  readonly part?: number;
  readonly fromEnd?: true;
  readonly from: Sources;
}

/** What a released member end no longer transmits. */
export interface Release {
  readonly moment: boolean;
  readonly shear?: boolean;
  readonly axial?: boolean;
}

/** A prismatic cross-section: A in m², I in m⁴, E in N/m²; or ratios of them, when only forces are wanted.
 *  `alpha` is the thermal expansion in 1/K, `depth` the depth in m that a temperature difference acts over. */
export interface Section {
  readonly A: number;
  readonly I: number;
  readonly E: number;
  readonly alpha?: number;
  readonly depth?: number;
}

export interface Member {
  readonly name: string;
  readonly start: string;
  readonly end: string;
  readonly releases: { readonly start: Release; readonly end: Release };
  readonly section?: Section;
  /** Members that share sections and variations of them: "columns", "beams". */
  readonly group?: string;
  readonly from: Sources;
}

/** A support and the displacements it holds: x, y, rotation. `kind` is the nearest of four, for wording and drawing.
 *  With an `angle` (rad) x and y are axes turned counter-clockwise by it; `springs` resist along the same axes,
 *  N/m and N·m/rad, where nothing is held. */
export interface Support {
  readonly joint: string;
  readonly kind: "fixed" | "pinned" | "roller" | "free";
  readonly holds: { readonly x: boolean; readonly y: boolean; readonly rotation: boolean };
  readonly springs?: { readonly x?: number; readonly y?: number; readonly rotation?: number };
  readonly angle?: number;
  readonly from: Sources;
}

/** A plane skeleton of beams. `family` says which builder made it, for wording and drawing only. */
export interface Structure {
  readonly family: "beam" | "portal" | "general";
  /** What a "general" one is, when a builder made it. */
  readonly form?: "building frame" | "truss" | "panel girder" | "truss portal";
  readonly joints: readonly Joint[];
  readonly members: readonly Member[];
  readonly supports: readonly Support[];
  readonly hinges: readonly Hinge[];
}

/** A place along a member: metres from its start, or a fraction of its length. */
export type Place = { readonly metres: number } | { readonly fraction: number };

/** Load spread over part of a member, N per metre of member, varying linearly from `q1` at `begin` to `q2` at `end`;
 *  `direction` is a unit vector in global axes along which q is positive (gravity: [0, -1]).
 *  `fromSize` is the part of `from` that the intensity came from, where it is known apart from the places.
 *  With `axes: "member"` the direction is given as [along, towards the left of the walk]; with `per` q is per metre of
 *  the member's projection on the horizontal or the vertical (see `inGlobalAxes`). */
export interface DistributedLoad {
  readonly kind: "distributed";
  readonly member: string;
  readonly begin: Place;
  readonly end: Place;
  readonly q1: number;
  readonly q2: number;
  readonly direction: readonly [number, number];
  readonly axes?: "member";
  readonly per?: "horizontal" | "vertical";
  readonly label: string;
  readonly fromSize?: Sources;
  readonly from: Sources;
}

/** Force (fx, fy) in N and couple in N·m at one place of a member, `fromSize` as for a line load; with `axes: "member"` fx acts along the member
 *  and fy towards the left of the walk. */
export interface MemberPointLoad {
  readonly kind: "member point";
  readonly member: string;
  readonly at: Place;
  readonly fx: number;
  readonly fy: number;
  readonly axes?: "member";
  readonly couple: number;
  readonly label: string;
  readonly fromSize?: Sources;
  readonly from: Sources;
}

/** Force (fx, fy) in N and couple in N·m at a joint. */
export interface JointLoad {
  readonly kind: "joint";
  readonly joint: string;
  readonly fx: number;
  readonly fy: number;
  readonly couple: number;
  readonly label: string;
  readonly from: Sources;
}

export type Load = DistributedLoad | MemberPointLoad | JointLoad;

/** Change of temperature of a whole member, K: `uniform` at its axis, and `difference` = reference fibre less opposite
 *  fibre. Needs the section's alpha, the difference its depth too. */
export interface TemperatureLoad {
  readonly kind: "temperature";
  readonly member: string;
  readonly uniform: number;
  readonly difference: number;
  readonly label: string;
  readonly from: Sources;
}

/** Movement of the ground under a support, m and rad, along the support's own axes. */
export interface Settlement {
  readonly kind: "settlement";
  readonly joint: string;
  readonly x: number;
  readonly y: number;
  readonly rotation: number;
  readonly label: string;
  readonly from: Sources;
}

/** Deformations imposed from outside. They make no force in a determinate structure, so statics knows only `Load`. */
export type Imposed = TemperatureLoad | Settlement;
