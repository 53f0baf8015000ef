// Grid tables: each cell's outline is traced, as docutils does, and the lines inside are read as a body.
import type { DocumentContext, Setting } from './context.js';
import { lineCells, readCells, type Cell, type LineCells } from './cells.js';
import type { Lines } from './lines.js';

const TOP = /^\+-[-+]+-\+$/;
const PLUS = 43;
const MINUS = 45;
const BAR = 124;
const EQUALS = 61;
/** Steps of tracing allowed for each place of the table: an outline goes over a place a few times at most. */
const STEPS = 64;

/** Reads the grid table that begins on `line`; the line behind it, or undefined where none begins. */
export function gridTable(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  setting: Setting,
): number | undefined {
  const { text } = cx;
  if (!TOP.test(text.slice(lines.at[line], lines.end[line]))) return undefined;
  let end = line;
  while (end < to && !lines.isBlank(end) && lines.column[end] === base) {
    const unit = text.charCodeAt(lines.at[end]!);
    if (unit !== PLUS && unit !== BAR) break;
    end++;
  }
  const behind = end;
  while (end > line + 1 && !TOP.test(text.slice(lines.at[end - 1], lines.end[end - 1]).replaceAll('=', '-'))) end--;
  const rows: LineCells[] = [];
  for (let i = line; i < end; i++) rows.push(lineCells(text, lines.at[i]!, lines.end[i]!));
  const cells = rows.length < 3 ? undefined : new GridTracer(rows).cells();
  if (cells === undefined) {
    const span = { start: lines.at[line]!, end: lines.end[behind - 1]! };
    cx.problems.push({ span, message: 'The lines of this table do not meet, so it is not read.' });
    return behind;
  }
  readCells(cx, rows, cells, setting);
  return behind;
}

class GridTracer {
  private readonly bottom: number;
  private readonly right: number;
  private steps: number;

  constructor(private readonly rows: readonly LineCells[]) {
    this.bottom = rows.length - 1;
    this.right = rows[0]!.width - 1;
    this.steps = STEPS * rows.reduce((sum, row) => sum + row.width, 0);
  }

  /** All cells, or undefined where the outlines do not cover the table. */
  cells(): Cell[] | undefined {
    const done = new Int32Array(this.right + 1).fill(-1);
    const cells: Cell[] = [];
    for (let top = 0; top < this.bottom; top++) {
      const end = Math.min(this.right, this.rows[top]!.width);
      for (let left = 0; left < end; left++) {
        if (done[left]! !== top - 1 || this.unit(top, left) !== PLUS) continue;
        const cell = this.trace(top, left);
        if (this.steps < 0) return undefined;
        if (!cell) continue;
        for (let column = left; column < cell.right; column++) {
          if (done[column] !== top - 1) return undefined;
          done[column] = cell.bottom - 1;
        }
        cells.push(cell);
      }
    }
    for (let column = 0; column < this.right; column++) if (done[column] !== this.bottom - 1) return undefined;
    return cells;
  }

  /** The character at a place; a separator of `=` between head and body counts as one of `-`. */
  private unit(row: number, column: number): number {
    this.steps--;
    const unit = this.rows[row]!.unit(column);
    return unit === EQUALS ? MINUS : unit;
  }

  private trace(top: number, left: number): Cell | undefined {
    for (let right = left + 1; right <= this.right && this.steps >= 0; right++) {
      const unit = this.unit(top, right);
      if (unit === PLUS) {
        const bottom = this.down(top, left, right);
        if (bottom >= 0) return { top, left, bottom, right };
      } else if (unit !== MINUS) return undefined;
    }
    return undefined;
  }

  private down(top: number, left: number, right: number): number {
    for (let row = top + 1; row <= this.bottom && this.steps >= 0; row++) {
      const unit = this.unit(row, right);
      if (unit === PLUS) {
        if (this.closes(top, left, row, right)) return row;
      } else if (unit !== BAR) return -1;
    }
    return -1;
  }

  /** True where the cell's lower and left lines lead back to where it began. */
  private closes(top: number, left: number, bottom: number, right: number): boolean {
    for (let column = right - 1; column > left; column--) {
      const unit = this.unit(bottom, column);
      if (unit !== PLUS && unit !== MINUS) return false;
      if (this.steps < 0) return false;
    }
    if (this.unit(bottom, left) !== PLUS) return false;
    for (let row = bottom - 1; row > top; row--) {
      const unit = this.unit(row, left);
      if (unit !== PLUS && unit !== BAR) return false;
      if (this.steps < 0) return false;
    }
    return true;
  }
}
