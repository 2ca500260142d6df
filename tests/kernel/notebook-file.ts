// Notebooks for tests, as text.

export type TestCell = string | { readonly markdown: string };

/** A notebook of format 4.4 (cells without ids) from code and text cells. */
export function notebookText(cells: readonly TestCell[], language = "typescript"): string {
  return JSON.stringify({
    nbformat: 4,
    nbformat_minor: 4,
    metadata: { language_info: { name: language } },
    cells: cells.map((cell) =>
      typeof cell === "string"
        ? { cell_type: "code", metadata: {}, outputs: [], execution_count: null, source: cell }
        : { cell_type: "markdown", metadata: {}, source: [cell.markdown] },
    ),
  });
}
