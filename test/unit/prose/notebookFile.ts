// Notebooks as files, made for the tests of the reader.

/** A notebook (nbformat 4) of cells `[type, source]`, as Jupyter writes it: an item of the list for each line. */
export function notebookOf(cells: readonly (readonly [type: string, source: string])[], metadata: object = {}): string {
  const file = {
    cells: cells.map(([type, source]) => ({
      cell_type: type,
      metadata: { tags: ['source'], source: 'no prose' },
      ...(type === 'code' && {
        execution_count: 1,
        outputs: [{ output_type: 'display_data', data: { 'text/markdown': ['no *prose*'] }, source: ['none'] }],
      }),
      source: source.match(/[^\n]*\n|[^\n]+$/g) ?? [],
    })),
    metadata: { language_info: { name: 'python' }, ...metadata },
    nbformat: 4,
    nbformat_minor: 5,
  };
  return `${JSON.stringify(file, undefined, 1)}\n`;
}
