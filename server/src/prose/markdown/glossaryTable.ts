// Which row and column of a table a cell of Markdown stands in, by the signs on its line.

/** A cell's place. */
export interface CellPlace {
  readonly lineStart: number;
  /** From 0. */
  readonly column: number;
  readonly isHeader: boolean;
}

/** In a notebook a line is a string. */
const LINE_HEAD = /^[\s">]*\|/;
const DELIMITERS = /^[\s">]*\|?\s*:?-+:?\s*(?:[|\\"]|$)/;
const LONGEST_LINE = 4096;

/** The place of the cell that begins at `start`, or undefined where its line has none of a table's signs or is too long. */
export function cellOf(start: number, source: string): CellPlace | undefined {
  const lineStart = source.lastIndexOf('\n', start - 1) + 1;
  if (start - lineStart > LONGEST_LINE) return undefined;
  const found = source.indexOf('\n', start);
  const lineEnd = found < 0 ? source.length : found;
  const line = source.slice(lineStart, Math.min(lineEnd, lineStart + LONGEST_LINE));
  let column = LINE_HEAD.test(line) ? -1 : 0;
  let signs = 0;
  for (let i = 0; i < line.length; i++) {
    if (line[i] === '\\') i++;
    else if (line[i] === '|') {
      signs++;
      if (lineStart + i < start) column++;
    }
  }
  if (signs === 0) return undefined;
  const nextEnd = source.indexOf('\n', lineEnd + 1);
  const next = source.slice(lineEnd + 1, nextEnd < 0 ? undefined : Math.min(nextEnd, lineEnd + LONGEST_LINE));
  return { lineStart, column, isHeader: DELIMITERS.test(next) };
}
