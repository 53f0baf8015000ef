// Simple tables: borders of `=` mark the columns, and text in the first column begins a row.
import type { DocumentContext, Setting } from './context.js';
import { lineCells, readCells, type Cell, type LineCells } from './cells.js';
import { isBlank, paragraphEnd, type Lines } from './lines.js';

const BORDER = /^=[= ]*$/;
const COLUMN = /[=-]+/g;

/** True where a line is a simple table's border: two runs of `=` or more. */
export function isSimpleBorder(text: string, at: number, end: number): boolean {
  const line = text.slice(at, end);
  return line.includes(' ') && BORDER.test(line);
}

/** Reads the simple table that begins on `line`; the line behind it. */
export function simpleTable(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  setting: Setting,
): number {
  const bottom = lastBorder(cx.text, lines, line, to, base);
  if (bottom === undefined) {
    if (setting.depth === 0) cx.reach = Number.POSITIVE_INFINITY;
    const end = paragraphEnd(lines, line, to);
    const span = { start: lines.at[line]!, end: lines.end[end - 1]! };
    cx.problems.push({ span, message: 'This table has no line of “=” at its end, so it is not read.' });
    return end;
  }
  const rows: LineCells[] = [];
  for (let i = line; i <= bottom; i++) {
    // A line that is indented, its first column being empty, is taken from the table's margin on.
    let at = lines.at[i]!;
    let indent = lines.isBlank(i) ? 0 : lines.column[i]! - base;
    while (indent-- > 0 && at > 0 && isBlank(cx.text.charCodeAt(at - 1))) at--;
    rows.push(lineCells(cx.text, at, lines.end[i]!));
  }
  const cells: Cell[] = [];
  const outer = columnsOf(cx.text.slice(lines.at[line], lines.end[line]));
  let start = 1;
  let found = false;
  for (let row = 1; row < rows.length; row++) {
    const at = lines.at[line + row]!;
    const written = lines.column[line + row] === base ? cx.text.slice(at, lines.end[line + row]) : '';
    if (/^(?:-[- ]*|=[= ]*)$/.test(written)) {
      addRow(cells, start, row, columnsOf(written), rows);
      start = row + 1;
      found = false;
    } else if (hasText(rows[row]!, outer[0]!)) {
      if (found && row !== start) addRow(cells, start, row, outer, rows);
      start = row;
      found = true;
    } else if (!found) start = row + 1;
  }
  readCells(cx, rows, cells, setting);
  return bottom + 1;
}

/** The second border behind the first, or an earlier one above a blank line or the end; all are of one length. */
function lastBorder(text: string, lines: Lines, line: number, to: number, base: number): number | undefined {
  const length = lines.end[line]! - lines.at[line]!;
  let found = 0;
  for (let i = line + 1; i < to; i++) {
    if (lines.isBlank(i) || lines.column[i] !== base || text.charCodeAt(lines.at[i]!) !== 61) continue;
    if (!BORDER.test(text.slice(lines.at[i], lines.end[i]))) continue;
    if (lines.end[i]! - lines.at[i]! !== length) return undefined;
    if (++found === 2 || i + 1 === to || lines.isBlank(i + 1)) return i;
  }
  return undefined;
}

interface Column {
  readonly from: number;
  readonly to: number;
}

function columnsOf(border: string): Column[] {
  return [...border.matchAll(COLUMN)].map((match) => ({ from: match.index, to: match.index + match[0].length }));
}

function hasText(row: LineCells, { from, to }: Column): boolean {
  for (let column = from; column < to && column < row.width; column++) {
    const unit = row.unit(column);
    if (unit !== 32 && unit !== 9) return true;
  }
  return false;
}

/** One cell for each column; text in the last may run on beyond the border. */
function addRow(cells: Cell[], from: number, to: number, columns: readonly Column[], rows: readonly LineCells[]): void {
  if (from >= to) return;
  const widest = rows.slice(from, to).reduce((most, row) => Math.max(most, row.width), 0);
  for (const [i, column] of columns.entries()) {
    if (column.from >= widest) break;
    const right = i === columns.length - 1 ? Math.max(widest, column.to) : column.to;
    cells.push({ top: from - 1, left: column.from - 1, bottom: to, right });
  }
}
