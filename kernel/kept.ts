// What was made of a text, kept: cells are run, checked and named again and again, most of them unchanged.

/** A function of a text that makes each thing once while it is among the last `most` asked for. What it makes must be
 *  left as it is by all who get it; where it throws, nothing is kept. */
export function kept<T>(most: number, make: (text: string) => T): (text: string) => T {
  const known = new Map<string, { readonly made: T }>();
  return (text) => {
    const found = known.get(text) ?? { made: make(text) };
    known.delete(text);
    known.set(text, found);
    const [oldest] = known.keys();
    if (known.size > most && oldest !== undefined) known.delete(oldest);
    return found.made;
  };
}
