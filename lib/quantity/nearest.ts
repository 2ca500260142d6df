import { distance } from "fastest-levenshtein";

/** The name of the list nearest to a text by spelling, the first of equals; capitals count half as much as letters. */
export function nearest(text: string, names: readonly string[]): string {
  let best = "";
  let least = Number.POSITIVE_INFINITY;
  for (const name of names) {
    const apart = distance(text, name) + distance(text.toLowerCase(), name.toLowerCase());
    if (apart < least) {
      least = apart;
      best = name;
    }
  }
  return best;
}
