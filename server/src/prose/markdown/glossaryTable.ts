// Which row and column of a table a cell of Markdown stands in, by the signs on its line.

/** A cell's place. */
export interface CellPlace {
  readonly lineStart: number;
  /** From 0. */
  readonly column: number;
  readonly isHeader: boolean;
}

interface TableLine {
  readonly start: number;
  readonly end: number;
  /** The offsets of its signs, ascending. */
  readonly signs: readonly number[];
  readonly isOpened: boolean;
  readonly isHeader: boolean;
}

/** In a notebook a line is a string. */
const LINE_HEAD = /^[\s">]*\|/;
const DELIMITERS = /^[\s">]*\|?\s*:?-+:?\s*(?:[|\\"]|$)/;
/** Longer lines are no rows of a glossary. */
const LONGEST_LINE = 4096;

/** Tells the places of cells; quick where they are asked for in their order. */
export class CellPlaces {
  private line: TableLine | undefined;

  constructor(private readonly source: string) {}

  /** The place of the cell that begins at `start`, or undefined where its line has none of a table's signs or is too long. */
  of(start: number): CellPlace | undefined {
    if (this.line === undefined || start < this.line.start || start > this.line.end) this.line = this.lineAt(start);
    const { start: lineStart, signs, isOpened, isHeader } = this.line;
    if (signs.length === 0) return undefined;
    let column = isOpened ? -1 : 0;
    while (column < signs.length && signs[isOpened ? column + 1 : column]! < start) column++;
    return { lineStart, column, isHeader };
  }

  private lineAt(at: number): TableLine {
    const { source } = this;
    const start = source.lastIndexOf('\n', at - 1) + 1;
    const end = endOfLine(source, at);
    const signs: number[] = [];
    if (end - start > LONGEST_LINE) return { start, end, signs, isOpened: false, isHeader: false };
    for (let i = start; i < end; i++) {
      if (source[i] === '\\') i++;
      else if (source[i] === '|') signs.push(i);
    }
    const next = source.slice(end + 1, Math.min(endOfLine(source, end + 1), end + LONGEST_LINE));
    const isOpened = LINE_HEAD.test(source.slice(start, end));
    return { start, end, signs, isOpened, isHeader: DELIMITERS.test(next) };
  }
}

function endOfLine(source: string, from: number): number {
  const end = source.indexOf('\n', from);
  return end < 0 ? source.length : end;
}
