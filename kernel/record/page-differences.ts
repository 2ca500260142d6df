// Where a page does not show what its record says: the page made again from the record, compared line by line.

export interface PageDifference {
  /** The part of the page, in words: "line 12", "Givens", "the script". */
  readonly part: string;
  readonly shown: string;
  readonly due: string;
}

/** Lines of the page that differ from those due, each with the part it stands in. */
export function pageDifferences(shown: string, due: string): readonly PageDifference[] {
  if (shown === due) return [];
  const [a, b] = [shown.split("\n"), due.split("\n")];
  const names = partNames(b);
  if (a.length === b.length)
    return b.flatMap((line, i) => (line === a[i] ? [] : difference(names[i] ?? "", a[i] ?? "", line)));
  const from = b.findIndex((line, i) => line !== a[i]);
  const first = from === -1 ? b.length : from;
  const lines = `${a.length} lines where ${b.length} are due`;
  const { shown: here, due: there } = difference(
    names[first] ?? "the end of the file",
    a[first] ?? "",
    b[first] ?? "",
  );
  return [
    { part: `${names[first] ?? "the end of the file"} and after it, ${lines}`, shown: here, due: there },
  ];
}

/** The part of the page each of its lines belongs to. */
function partNames(lines: readonly string[]): readonly string[] {
  let part = "the head of the page";
  return lines.map((line) => {
    if (line.includes('id="record"')) return "the record";
    if (line.startsWith("<!-- SHA-256")) return "the seal";
    const label = /aria-label="((?:line|given|assumption) [^"]*)"/.exec(line)?.[1];
    const heading = /<h2 id="[^"]*">([^<]*)</.exec(line)?.[1];
    if (line.startsWith("<script>")) part = "the script";
    else if (label !== undefined) part = label;
    else if (heading !== undefined) part = `"${heading}"`;
    else if (line.startsWith("<style>")) part = "the style";
    else if (line.startsWith("<main>") || line.includes('class="cover"')) part = "the cover";
    return part;
  });
}

const AROUND = 30;

/** The two lines where they part, with a little before and after, markup left out. */
function difference(part: string, shown: string, due: string): PageDifference {
  let start = 0;
  while (start < due.length && shown[start] === due[start]) start++;
  const cut = (text: string): string =>
    text
      .slice(Math.max(0, start - AROUND), start + AROUND)
      .replace(/<[^>]*>|<[^>]*$|^[^<]*>/g, " ")
      .replace(/\s+/g, " ")
      .trim();
  return { part, shown: cut(shown), due: cut(due) };
}
