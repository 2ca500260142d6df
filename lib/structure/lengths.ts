// Lengths as the builders read them.

import { type Measure, type Quantity, readMeasure } from "../quantity/index.ts";
import { StructureError } from "./faults.ts";

/** A length more than zero. `what` names it in messages: "span 2". */
export function positiveLength(measure: Measure<"length">, what: string): Quantity<"length"> {
  const length = readMeasure(measure, "length", what);
  if (!(length.si > 0)) throw new StructureError({ kind: "not positive", what, value: length.si, unit: "m" });
  return length;
}
