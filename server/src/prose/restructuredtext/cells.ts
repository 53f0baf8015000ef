// Cells of tables that are drawn in columns: rectangles of a few lines, each read as a body.
import { Zone } from '../zones.js';
import { inside, type DocumentContext, type Setting } from './context.js';
import { columnsOf, isBlank, Lines } from './lines.js';

/** A cell's outline, in lines and columns of its table; what lies between is the cell's. */
export interface Cell {
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

/** One line of a table by columns. */
export interface LineCells {
  /** Columns that the line takes. */
  readonly width: number;
  /** The code unit in a column, NaN behind the end, 0 in the second column of a wide character. */
  unit(column: number): number;
  /** The source offset of a column; the line's end for columns behind it. */
  offset(column: number): number;
}

/** The columns of `[at, end)` of a text. A wide character takes two columns (Unicode Standard Annex 11). */
export function lineCells(text: string, at: number, end: number): LineCells {
  const offsets: number[] = [];
  let plain = true;
  for (let i = at; i < end; i++) {
    const unit = text.charCodeAt(i);
    if (unit < 0x300) {
      offsets.push(i);
      continue;
    }
    plain = false;
    const codePoint = text.codePointAt(i)!;
    offsets.push(i);
    const next = codePoint > 0xffff ? i + 2 : i + 1;
    if (columnsOf(codePoint) === 2) offsets.push(next);
    i = next - 1;
  }
  if (plain) {
    return {
      width: end - at,
      unit: (column) => (at + column < end ? text.charCodeAt(at + column) : Number.NaN),
      offset: (column) => Math.min(end, at + column),
    };
  }
  return {
    width: offsets.length,
    unit: (column) => {
      const here = offsets[column];
      if (here === undefined) return Number.NaN;
      return offsets[column - 1] !== undefined && isSecond(offsets, column) ? 0 : text.charCodeAt(here);
    },
    offset: (column) => offsets[column] ?? end,
  };
}

/** The second column of a wide character shares its offset with the column behind. */
function isSecond(offsets: readonly number[], column: number): boolean {
  return offsets[column + 1] === offsets[column];
}

/** Reads cells; their blocks are put into the order of the source. */
export function readCells(
  cx: DocumentContext,
  rows: readonly LineCells[],
  cells: readonly Cell[],
  setting: Setting,
): void {
  const first = cx.blocks.length;
  for (const cell of cells) readCell(cx, rows, cell, setting);
  const sorted = cx.blocks.splice(first).sort((a, b) => a.start - b.start);
  for (const block of sorted) cx.blocks.push(block);
}

function readCell(cx: DocumentContext, rows: readonly LineCells[], cell: Cell, setting: Setting): void {
  const { text } = cx;
  const lines = new Lines();
  let margin = Number.POSITIVE_INFINITY;
  for (let row = cell.top + 1; row < cell.bottom; row++) {
    const from = rows[row]!.offset(cell.left + 1);
    let end = rows[row]!.offset(cell.right);
    let at = from;
    while (at < end && isBlank(text.charCodeAt(at))) at++;
    while (end > at && isBlank(text.charCodeAt(end - 1))) end--;
    lines.push(at, end, at - from);
    if (at < end) margin = Math.min(margin, at - from);
  }
  if (margin === Number.POSITIVE_INFINITY) return;
  cx.readBody(
    lines,
    0,
    lines.count,
    margin,
    inside(setting, { kind: 'tableCell', zones: setting.zones | Zone.tableCell }),
  );
}
