// Tables: where cells begin and end between the delimiter lines, and by which style each is read.
import { namedAttribute, type BlockAttributes } from './attributes.js';
import { isBlank, isComment, isInclude, type Line } from './lines.js';

/** One cell: its lines as stretches of the source, and its style: `a` holds blocks, `l` and `m` code, others text. */
export interface Cell {
  readonly lines: Line[];
  readonly style: string;
}

interface RawCell {
  readonly lines: Line[];
  readonly spec: Spec;
}

interface Spec {
  readonly copies: number;
  readonly columns: number;
  readonly rows: number;
  readonly style: string;
}

const SPEC = /^(?:(\d{1,3})?(?:\.(\d{1,3}))?([*+]))?(?:[<^>]?(?:\.[<^>])?)([a-z])?$/;
const PLAIN: Spec = { copies: 1, columns: 1, rows: 1, style: '' };
const LONGEST_SPEC = 16;
/** Columns beyond these have no style of their own. */
const MOST_COLUMNS = 200;
const COLUMN = /^\s*(?:(\d{1,3})\*)?[<^>]?(?:\.[<^>])?\s*(?:\d{1,3}%?|~)?\s*([a-z])?\s*$/;

/** The cells of a table whose lines are `[from, to)`, in source order; none where the data is separated by other marks. */
export function cellsOf(
  text: string,
  lines: readonly Line[],
  from: number,
  to: number,
  opening: string,
  attributes: BlockAttributes,
): Cell[] {
  const format = namedAttribute(attributes.written, 'format') ?? 'psv';
  if (opening === ',' || opening === ':' || format !== 'psv') return [];
  const separator = namedAttribute(attributes.written, 'separator') ?? opening;
  if (separator.length !== 1) return [];
  const styles = columnStyles(namedAttribute(attributes.written, 'cols') ?? '');
  const raw = split(text, lines, from, to, separator);
  return styled(raw, styles, hasHeader(attributes, lines, from, to));
}

/** The first row is a header where the attributes say so, or where a blank line follows the table's first line. */
function hasHeader({ written }: BlockAttributes, lines: readonly Line[], from: number, to: number): boolean {
  if (/(?:^|[,%"\s])header\b/.test(written)) return true;
  if (/(?:^|[,%"\s])noheader\b/.test(written)) return false;
  const blank = (at: number): boolean => at < to && lines[at]!.start === lines[at]!.end;
  return from < to && !blank(from) && blank(from + 1);
}

function split(text: string, lines: readonly Line[], from: number, to: number, separator: string): RawCell[] {
  const cells: RawCell[] = [];
  for (let i = from; i < to; i++) {
    const line = lines[i]!;
    if (isComment(text, line) || isInclude(text, line)) continue;
    let start = line.start;
    for (let at = text.indexOf(separator, start); at >= 0 && at < line.end; at = text.indexOf(separator, at + 1)) {
      if (text.charCodeAt(at - 1) === 92) continue;
      const { spec, specStart } = specBefore(text, start, at, start === line.start);
      cells.at(-1)?.lines.push(trimmed(text, start, specStart));
      cells.push({ spec, lines: [] });
      start = at + 1;
    }
    cells.at(-1)?.lines.push(trimmed(text, start, line.end));
  }
  return cells;
}

function trimmed(text: string, start: number, end: number): Line {
  let to = end;
  while (to > start && isBlank(text.charCodeAt(to - 1))) to--;
  return { start, end: to };
}

/** The specification right before a separator, such as `2+^.>a`: it stands alone or behind a blank. */
function specBefore(text: string, from: number, at: number, first: boolean): { spec: Spec; specStart: number } {
  let start = at;
  while (start > from && at - start <= LONGEST_SPEC && !isBlank(text.charCodeAt(start - 1))) start--;
  const none = { spec: PLAIN, specStart: at };
  if (start === at || (start === from && !first) || at - start > LONGEST_SPEC) return none;
  const found = SPEC.exec(text.slice(start, at));
  if (!found) return none;
  const count = Number(found[1] ?? 1);
  const repeats = found[3] === '*';
  return {
    specStart: start,
    spec: {
      copies: repeats ? count : 1,
      columns: repeats ? 1 : Math.max(1, count),
      rows: Math.max(1, Number(found[2] ?? 1)),
      style: found[4] ?? '',
    },
  };
}

/** The style letters of the columns that `cols` describes. */
function columnStyles(cols: string): string[] {
  const styles: string[] = [];
  if (/^\s*\d{1,3}\s*$/.test(cols)) return Array.from({ length: Math.min(MOST_COLUMNS, Number(cols)) }, () => '');
  for (const column of cols === '' ? [] : cols.split(/[,;]/)) {
    const found = COLUMN.exec(column);
    for (let i = 0; i < Number(found?.[1] ?? 1) && styles.length < MOST_COLUMNS; i++) styles.push(found?.[2] ?? '');
  }
  return styles;
}

/**
 * Gives each cell its own style or its column's. As in Asciidoctor, which column that is goes by the number of cells before it in the
 * row, and a row is full when the columns of its cells and of cells that reach into it from above make up the table's.
 */
function styled(raw: readonly RawCell[], styles: readonly string[], hasHeader: boolean): Cell[] {
  const width = styles.length;
  /** Columns that cells from above take up in this row and those below. */
  const reaching: number[] = [];
  let cells = 0;
  let columns = 0;
  let row = 0;
  return raw.map(({ lines, spec }) => {
    if (width === 0) return { lines, style: spec.style };
    const style = spec.style || (hasHeader && row === 0 ? '' : (styles[cells] ?? ''));
    for (let copy = 0; copy < spec.copies; copy++) {
      cells++;
      columns += spec.columns;
      for (let below = 1; below < spec.rows; below++) reaching[below] = (reaching[below] ?? 0) + spec.columns;
      if (columns + (reaching[0] ?? 0) < width) continue;
      reaching.shift();
      cells = columns = 0;
      row++;
    }
    return { lines, style };
  });
}
