// The units a measure may be written in, as the trade writes them, by dimension.
// A product is written with a space, a dot or (US) a hyphen; powers with ^ or as raised figures.

type Dot = " " | "·";
type Bar = " " | "·" | "-";
type Squared<L extends string> = `${L}${"^2" | "²"}`;
type Cubed<L extends string> = `${L}${"^3" | "³"}`;
type Fourth<L extends string> = `${L}${"^4" | "⁴"}`;
type Kip = "kip" | "k";

export type LengthUnit = "m" | "mm" | "cm" | "ft" | "in";
export type ForceUnit = "N" | "kN" | "MN" | "lb" | "lbf" | "kip" | "kips" | "k";

export type LineLoadUnit =
  | `${"N" | "kN" | "MN"}/m`
  | `${"N" | "kN"}/mm`
  | `${"lb" | "lbf" | Kip}/${"ft" | "in"}`
  | "plf"
  | "klf";

export type StressUnit =
  | "Pa"
  | "kPa"
  | "MPa"
  | "GPa"
  | `${"N" | "kN"}/${Squared<"mm" | "m">}`
  | `MN/${Squared<"m">}`
  | `${"lb" | Kip}/${Squared<"ft" | "in">}`
  | "psi"
  | "ksi"
  | "psf"
  | "ksf";

export type VolumeLoadUnit =
  | `${"N" | "kN"}/${Cubed<"m">}`
  | `${"lb" | Kip}/${Cubed<"ft">}`
  | "pcf"
  | `kg/${Cubed<"m">}`;

export type MomentUnit =
  | `${"N" | "kN" | "MN"}${Dot | ""}m`
  | `${"N" | "kN"}${Dot | ""}mm`
  | `${"lb" | "lbf" | Kip}${Bar}${"ft" | "in"}`
  | `${"ft" | "in"}-${"lb" | Kip}`;

export type RotationalStiffnessUnit =
  | `${"N" | "kN" | "MN"}${Dot}m/rad`
  | `${"N" | "kN"}${Dot}mm/rad`
  | `${"lb" | Kip}${Bar}${"ft" | "in"}/rad`;

export type RigidityUnit =
  | `${"N" | "kN" | "MN"}${Dot}${Squared<"m" | "mm">}`
  | `${"lb" | Kip}${Bar}${Squared<"ft" | "in">}`;

/** A change by 1 °C is a change by 1 K. */
export type TemperatureUnit = "K" | "°C";

/** Units by dimension. A pure number is written without a unit, or with "%". */
export interface UnitsOf {
  "pure number": "%";
  angle: "rad" | "mrad" | "deg" | "°";
  length: LengthUnit;
  area: Squared<LengthUnit>;
  "section modulus": Cubed<LengthUnit>;
  "second moment of area": Fourth<LengthUnit>;
  force: ForceUnit;
  "force per length": LineLoadUnit;
  "force per area": StressUnit;
  "force per volume": VolumeLoadUnit;
  moment: MomentUnit;
  "moment per angle": RotationalStiffnessUnit;
  "flexural rigidity": RigidityUnit;
  "temperature change": TemperatureUnit;
  "per temperature": `1/${TemperatureUnit}`;
}

export type AnyUnit = UnitsOf[keyof UnitsOf];

/** The dimension a unit belongs to. */
export type DimensionOfUnit<U extends AnyUnit> = {
  [D in keyof UnitsOf]: U extends UnitsOf[D] ? D : never;
}[keyof UnitsOf];
