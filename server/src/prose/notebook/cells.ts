// The cells of a Jupyter notebook (nbformat 3 and 4) by the places of their sources in the JSON file.
import type { Span } from '../../base/span.js';

/** One cell. */
export interface Cell {
  /** `markdown`, `code`, `raw`; in nbformat 3 also `heading`. */
  readonly type: string;
  /** Of a heading cell, else 0. */
  readonly level: number;
  /** The JSON strings, quotation marks included, that make up its source in their order. */
  readonly source: readonly Span[];
}

/** What a notebook holds for the reader. */
export interface Notebook {
  /** Undefined where the file has none, and so is no notebook. */
  readonly cells: readonly Cell[] | undefined;
  /** The JSON string of the notebook's own title (nbformat 4, `metadata.title`). */
  readonly title: Span | undefined;
}

interface Frame {
  readonly isArray: boolean;
  key: string;
}

/** A backslash and what it escapes, or the end of a string. */
const STRING_STOP = /\\[^]|"/g;

/** Finds the cells in a text that is valid JSON. */
export function findCells(text: string): Notebook {
  const open: Frame[] = [];
  const cells: Cell[] = [];
  let hasCells = false;
  let title: Span | undefined;
  let cell: { type: string; level: number; source: Span[] } | undefined;
  for (let i = 0; i < text.length; i++) {
    const top = open[open.length - 1];
    switch (text[i]) {
      case '{':
      case '[':
        if (text[i] === '[' && isCellList(open, open.length)) hasCells = true;
        else if (text[i] === '{' && top?.isArray === true && isCellList(open, open.length - 1))
          cell = { type: '', level: 0, source: [] };
        open.push({ isArray: text[i] === '[', key: '' });
        break;
      case '}':
      case ']':
        open.pop();
        if (cell !== undefined && text[i] === '}' && isCellList(open, open.length - 1)) {
          cells.push(cell);
          cell = undefined;
        }
        break;
      case '"': {
        const end = stringEnd(text, i);
        const isKey = top?.isArray === false && isBeforeColon(text, end);
        if (isKey) top.key = text.slice(i + 1, end - 1);
        else if (cell !== undefined) takeString(cell, open, text, { start: i, end });
        else if (open.length === 2 && open[0]!.key === 'metadata' && top?.key === 'title') title = { start: i, end };
        i = end - 1;
        break;
      }
      default:
        if (cell !== undefined && top?.key === 'level' && isCellList(open, open.length - 2) && /[1-6]/.test(text[i]!))
          cell.level = Number(text[i]);
    }
  }
  return { cells: hasCells ? cells : undefined, title };
}

/** True where the innermost of the first `depth` open containers holds the list of cells. */
function isCellList(open: readonly Frame[], depth: number): boolean {
  if (depth === 1) return open[0]!.key === 'cells';
  return depth === 3 && open[0]!.key === 'worksheets' && open[1]!.isArray && open[2]!.key === 'cells';
}

/** A string that is a value right in the cell, or an item of a list that is. */
function takeString(
  cell: { type: string; source: Span[] },
  open: readonly Frame[],
  text: string,
  { start, end }: Span,
): void {
  const top = open[open.length - 1]!;
  const owner = top.isArray ? open[open.length - 2]! : top;
  if (!isCellList(open, open.length - (top.isArray ? 3 : 2))) return;
  if (owner.key === 'source') cell.source.push({ start, end });
  else if (owner.key === 'cell_type' && !top.isArray) cell.type = text.slice(start + 1, end - 1);
}

function stringEnd(text: string, from: number): number {
  STRING_STOP.lastIndex = from + 1;
  for (let stop = STRING_STOP.exec(text); stop; stop = STRING_STOP.exec(text)) {
    if (stop[0] === '"') return stop.index + 1;
  }
  return text.length;
}

function isBeforeColon(text: string, at: number): boolean {
  while (text[at] === ' ' || text[at] === '\t' || text[at] === '\n' || text[at] === '\r') at++;
  return text[at] === ':';
}
