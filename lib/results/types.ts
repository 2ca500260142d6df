// What every method answers with. SI: N, N·m, m, rad.
//
// Internal forces at a section of a member, seen on the part towards the member's start:
//   N  axial force, tension positive
//   V  shear, positive when it pushes the part towards the start along the member's local -y,
//      i.e. dM/dx = V with M positive as in structure/types.ts (a simply supported beam drawn left to right has V > 0 at its left end)
//   M  bending moment, positive with tension on the reference fibre
// Reactions act on the structure: x to the right, y up, moment counter-clockwise.

/** A function of x on [breaks[0], breaks[last]], polynomial between breaks: on piece i,
 *  f(x) = sum of pieces[i][k] * (x - breaks[i])^k. It may jump at a break. */
export interface Piecewise {
  readonly breaks: readonly number[];
  readonly pieces: readonly (readonly number[])[];
}

/** N, V, M along one member, x in m from its start. `uses` are indices of the steps the functions follow from. */
export interface MemberForces {
  readonly member: string;
  readonly length: number;
  readonly N: Piecewise;
  readonly V: Piecewise;
  readonly M: Piecewise;
  readonly uses: readonly number[];
  /** Indices of the loads that act on this member between its ends. */
  readonly loads?: readonly number[];
}

/** A member of an elastic solution: how it moves besides. Along the member towards its end and across it towards the left
 *  of the walk (away from the reference fibre) in m, rotation counter-clockwise in rad; `inflection` are the places inside
 *  where the moment changes sign. */
export interface ElasticMember extends MemberForces {
  readonly along: Piecewise;
  readonly deflection: Piecewise;
  readonly rotation: Piecewise;
  readonly inflection: readonly number[];
}

/** Displacement of a joint, m and rad; `rotation` is absent where nothing takes a moment (a pin of a truss). */
export interface JointDisplacement {
  readonly joint: string;
  readonly x: number;
  readonly y: number;
  readonly rotation?: number;
}

/** What an elastic solution answers with. */
export interface ElasticSolution {
  readonly joints: readonly JointDisplacement[];
  readonly reactions: readonly Reaction[];
  readonly members: readonly ElasticMember[];
  /** Largest force or moment left over at a joint, over the largest that meets there anywhere. */
  readonly residual: number;
  /** Estimate of the condition of the scaled stiffness matrix: about this many times the rounding error, 1e-16, can be lost. */
  readonly condition: number;
}

/** Reaction components at a support; a component the support does not hold is absent.
 *  `steps` gives, per component, the index of the step that found it. */
export interface Reaction {
  readonly joint: string;
  readonly x?: number;
  readonly y?: number;
  readonly moment?: number;
  readonly steps: { readonly x?: number; readonly y?: number; readonly moment?: number };
}

/** A stretch of a member belonging to a body, metres from the member's start. */
export interface Piece {
  readonly member: string;
  readonly begin: number;
  readonly end: number;
}

export interface Point {
  readonly name: string;
  readonly x: number;
  readonly y: number;
  /** The two forces whose lines of action meet here, where the point is no joint and no hinge. */
  readonly meets?: readonly [string, string];
}

/** An inclined direction forces are summed along: "along BC", "across BC". */
export interface ForceDirection {
  readonly name: string;
  readonly x: number;
  readonly y: number;
}

/** One named unknown of the free bodies: a reaction, a force through a hinge, or an internal force at a cut. */
export interface ForceName {
  /** Plain name, unique in the solution: "A_x", "A_M", "h1_x", "BC_B_M". */
  readonly name: string;
  readonly kind: "reaction" | "hinge" | "cut";
  /** Shape as TeX: "A_x", "X_{h1}", "M_{BC,B}". */
  readonly tex: string;
  readonly dimension: "force" | "moment";
}

/** A force or couple on a body at a point. `direction` is the unit vector along which a positive value acts on this
 *  body ([0, 0] for a couple, whose positive sense on this body is `turn`, +1 counter-clockwise). */
export interface Action {
  readonly at: Point;
  readonly direction: readonly [number, number];
  readonly turn: 0 | 1 | -1;
  /** An unknown by name, or the index of a load with the part of it on this body. */
  readonly source: { readonly force: string } | { readonly load: number };
  /** Value in N or N·m along `direction`/`turn`; absent while unknown. For a load: its resultant on this body. */
  readonly value?: number;
}

/** A part of the structure cut free. */
export interface FreeBody {
  /** Words: "beam between h1 and h2", "column AB with beam to h1", "joint B". */
  readonly name: string;
  readonly pieces: readonly Piece[];
  readonly joints: readonly string[];
  readonly actions: readonly Action[];
}

/** One term of an equation: coefficient (lever arm in m, or direction cosine) times value. */
export interface Term {
  readonly coefficient: number;
  readonly source: { readonly force: string; readonly step: number } | { readonly load: number };
  readonly value: number;
  /** True where the value is a couple, so that the coefficient is a sense and not a lever arm. */
  readonly couple?: true;
}

/** One equation of one body with one unknown: sum of terms + coefficient * result = 0. */
export interface Step {
  /** Stable name, unique in the solution: body, equation and point, "beam between h1 and h2: sum M about h1". */
  readonly id: string;
  /** Index into `FreeBodySolution.bodies`; several when bodies were joined. */
  readonly bodies: readonly number[];
  readonly equation: "sum Fx" | "sum Fy" | "sum M" | "sum F";
  /** The point moments are taken about. */
  readonly about?: Point;
  /** The direction of "sum F". */
  readonly along?: ForceDirection;
  /** Where bodies were joined: index into `bodies` of what they are together. */
  readonly joined?: number;
  readonly terms: readonly Term[];
  readonly unknown: string;
  readonly coefficient: number;
  readonly result: number;
  /** Indices of steps whose equations had to be solved together with this one (empty: a single unknown). */
  readonly together: readonly number[];
  /** True when nothing with a value enters the equation, so that the unknown is zero: such steps may be shown together. */
  readonly idle?: boolean;
  /** What the equation stands on: indices of loads, coordinates of joints and places of hinges that enter its coefficients
   *  and resultants, indices of earlier steps; supports whose angle enters. `joints` are those of `coordinates`. */
  readonly uses: {
    readonly loads: readonly number[];
    /** Those of the loads whose places along their members enter too. */
    readonly places?: readonly number[];
    readonly joints: readonly string[];
    readonly coordinates?: readonly { readonly joint: string; readonly axis: "x" | "y" }[];
    readonly steps: readonly number[];
    readonly hinges: readonly string[];
    readonly supports?: readonly string[];
  };
}

/** An equation left over after every unknown is found: it must close by itself. */
export interface Closure {
  /** Stable name, made as a step's. */
  readonly id?: string;
  readonly bodies: readonly number[];
  readonly equation: Step["equation"];
  readonly about?: Point;
  readonly along?: ForceDirection;
  readonly terms: readonly Term[];
  /** As a step's; absent for closures of other methods. */
  readonly uses?: Step["uses"];
  /** Sum of terms, N or N·m; near zero where the load is balanced. */
  readonly sum: number;
  /** Largest |term|, the scale the sum is judged by. */
  readonly scale: number;
}

export interface FreeBodySolution {
  readonly forces: readonly ForceName[];
  readonly bodies: readonly FreeBody[];
  readonly steps: readonly Step[];
  readonly closures: readonly Closure[];
  readonly reactions: readonly Reaction[];
  readonly members: readonly MemberForces[];
  /** What was settled without an equation, in words: an axial reaction that is zero because no load acts along the line. */
  readonly notes?: readonly string[];
}

/** A motion the structure can make without straining any member: displacement of each joint and hinge (unit: arbitrary,
 *  largest component 1), rotation of each member, and the words for it. */
export interface Mechanism {
  readonly points: readonly { readonly name: string; readonly ux: number; readonly uy: number }[];
  readonly turns: readonly {
    readonly member: string;
    readonly begin: number;
    readonly end: number;
    readonly rotation: number;
  }[];
  readonly words: string;
}

/** Forces that balance with no load: the redundant part of an indeterminate structure. Scaled so that the largest force, or
 *  moment over the structure's size, is 1. Members and supports at rest are left out. */
export interface SelfStress {
  readonly members: readonly MemberForces[];
  readonly reactions: readonly Reaction[];
  /** "line": axial force along one straight line, such as a beam pinned at both ends; "bars": axial forces that run through
   *  several lines, as in a braced panel; "bending": with moments. */
  readonly kind: "line" | "bars" | "bending";
  readonly words: string;
}

/** Determinacy by the trade's count and by the rank of the equilibrium matrix (Pellegrino & Calladine 1986). */
export interface Determinacy {
  readonly count: {
    readonly reactions: number;
    readonly members: number;
    readonly joints: number;
    readonly conditions: number;
    /** 3m + r - 3j - c */
    readonly degree: number;
  };
  readonly rank: number;
  readonly unknowns: number;
  readonly equations: number;
  /** Independent states of self-stress: the degree of static indeterminacy by rank. */
  readonly selfStress: number;
  /** A basis of them, those without moments first. */
  readonly selfStresses: readonly SelfStress[];
  readonly mechanisms: readonly Mechanism[];
  /** What the count does not see: so many redundant restraints stand against as many free motions in it. */
  readonly hidden: number;
  readonly verdict: "indeterminate" | "determinate" | "mechanism" | "mechanism with self-stress";
  /** One sentence in the trade's words. */
  readonly words: string;
}

/** Whether a load lies in the range of the equilibrium matrix: can the structure carry it, mechanism or not? */
export interface LoadBalance {
  readonly balanced: boolean;
  /** The motion the load drives, when it is not balanced. */
  readonly driven: readonly Mechanism[];
  readonly words: string;
}
