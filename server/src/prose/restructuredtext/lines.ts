// The lines of a text or of a table's cell, each with its column, so that nested bodies are ranges of lines with a margin.

/** Tabs stand for blanks up to the next multiple of this (docutils, "Whitespace"). */
const TAB = 8;

/** Lines in parallel columns. A blank line is one whose `at` is its `end`. */
export class Lines {
  /** Source offset of each line's first visible character. */
  readonly at: number[] = [];
  /** Source offset behind each line's last visible character. */
  readonly end: number[] = [];
  /** Column of each line's first visible character. */
  readonly column: number[] = [];

  get count(): number {
    return this.at.length;
  }

  push(at: number, end: number, column: number): void {
    this.at.push(at);
    this.end.push(end);
    this.column.push(column);
  }

  isBlank(line: number): boolean {
    return this.at[line]! >= this.end[line]!;
  }
}

/** The lines of `[from, to)` of a text, whose line breaks are `\n`; both stand at a line's start or at the text's end. */
export function linesOf(text: string, from: number, to: number): Lines {
  const lines = new Lines();
  for (let start = from; start < to;) {
    let stop = text.indexOf('\n', start);
    if (stop < 0) stop = text.length;
    let at = start;
    let column = 0;
    for (; at < stop; at++) {
      const unit = text.charCodeAt(at);
      if (!isBlank(unit)) break;
      column += unit === 9 ? TAB - (column % TAB) : 1;
    }
    let end = stop;
    while (end > at && isBlank(text.charCodeAt(end - 1))) end--;
    lines.push(at, end, column);
    start = stop + 1;
  }
  return lines;
}

/** True for white space within a line; form feeds and vertical tabs count as blanks. */
export function isBlank(unit: number): boolean {
  return unit === 32 || unit === 9 || unit === 12 || unit === 11;
}

/** The first line at or behind `from` that is not blank, or `to`. */
export function skipBlank(lines: Lines, from: number, to: number): number {
  let line = from;
  while (line < to && lines.isBlank(line)) line++;
  return line;
}

/** The line behind the run of visible lines that begins at `from`. */
export function paragraphEnd(lines: Lines, from: number, to: number): number {
  let line = from;
  while (line < to && !lines.isBlank(line)) line++;
  return line;
}

/** An indented block: `[from, to)` without the blank lines at its end, the column of its margin, and what lies behind. */
export interface Indented {
  readonly to: number;
  /** Least column of the block's lines; Infinity where it has none. */
  readonly margin: number;
  readonly next: number;
}

/** The lines from `from` on that are blank or stand right of column `base`. */
export function indentedBlock(lines: Lines, from: number, to: number, base: number): Indented {
  let end = from;
  let margin = Number.POSITIVE_INFINITY;
  let line = from;
  for (; line < to; line++) {
    if (lines.isBlank(line)) continue;
    const column = lines.column[line]!;
    if (column <= base) break;
    if (column < margin) margin = column;
    end = line + 1;
  }
  return { to: end, margin, next: line };
}

/** The line behind the indented lines that begin at `from`; the first blank line ends them. */
export function indentedLinesEnd(lines: Lines, from: number, to: number, base: number): number {
  let line = from;
  while (line < to && !lines.isBlank(line) && lines.column[line]! > base) line++;
  return line;
}

/** The column at which offset `to` stands in a line whose first visible character is at `at` in `column`. */
export function columnAt(text: string, at: number, column: number, to: number): number {
  let here = column;
  for (let i = at; i < to; i++) here += text.charCodeAt(i) === 9 ? TAB - (here % TAB) : 1;
  return here;
}

/** Columns that a character of this code point takes: two for wide ones (Unicode Standard Annex 11). */
export function columnsOf(codePoint: number): number {
  return codePoint >= 0x1100 && WIDE.test(String.fromCodePoint(codePoint)) ? 2 : 1;
}

const WIDE =
  /[\u1100-\u115F\u2E80-\u303E\u3041-\uA4CF\uA960-\uA97F\uAC00-\uD7A3\uF900-\uFAFF\uFE30-\uFE6F\uFF00-\uFF60\uFFE0-\uFFE6\u{1F300}-\u{1F64F}\u{1F680}-\u{1F6FF}\u{1F900}-\u{1F9FF}\u{20000}-\u{3FFFD}]/u;

/** Columns of `[from, to)` of a text. */
export function widthOf(text: string, from: number, to: number): number {
  let width = 0;
  for (let i = from; i < to; i++) {
    const unit = text.charCodeAt(i);
    if (unit < 0x300) width++;
    else {
      const codePoint = text.codePointAt(i)!;
      if (codePoint > 0xffff) i++;
      width += columnsOf(codePoint);
    }
  }
  return width;
}
