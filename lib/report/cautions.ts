// What every calculation of this kind has to say about itself.

/** Printed unless the record says what was left out. */
export const NOT_CONSIDERED: readonly string[] = [
  "Unless a line of this calculation says otherwise: second-order effects, cracking, creep, temperature, settlement of supports, dynamic effects, fire, connections and foundations.",
];

export const CAUTIONS: readonly string[] = [
  "The method is approximate: hinges are put where the moment is expected to be zero, and the rest follows from equilibrium.",
  "For preliminary sizing and for checking another analysis; not a substitute for final design.",
  "Subject to the local code and to review by an engineer licensed where the structure is built.",
];

/** The status as printed; a preliminary calculation is never for construction. */
export function statusWords(status: string): string {
  const plain = status.trim();
  return plain === "" || plain.toLowerCase() === "preliminary"
    ? "PRELIMINARY, NOT FOR CONSTRUCTION"
    : plain.toUpperCase();
}
