// Rows of a long table read again by themselves, since a table is one block to the parser however long it is.
import type { Format } from '../../text/sourceText.js';
import type { Change } from '../reading.js';
import { parseStretch, readUnits, shifted, type Unit } from './units.js';

/**
 * The table with the rows that an edit touched read anew, below its unchanged head; undefined where the edit leaves the rows, or
 * makes of them something else. Each row is read by its own line alone.
 */
export function rereadRows(
  table: Unit,
  format: Format,
  before: string,
  text: string,
  { start, oldEnd, newEnd }: Change,
  definitions: ReadonlyMap<string, string>,
): Unit | undefined {
  const { rowsStart } = table;
  const shift = newEnd - oldEnd;
  if (rowsStart === undefined || start < rowsStart || oldEnd > table.end || !isPlain(table)) return undefined;
  const from = before.lastIndexOf('\n', start - 1) + 1;
  const found = before.indexOf('\n', oldEnd);
  const to = found < 0 ? before.length : found;
  if (from < rowsStart || to > table.end) return undefined;
  const head = text.slice(table.lineStart, rowsStart);
  // A paragraph that opens with a bracket is cut sooner, whatever it is.
  if (head.trimStart().startsWith('[')) return undefined;
  const part = head + text.slice(from, to + shift);
  const stretch = parseStretch(part, format, 0, part.length);
  const [fresh] = stretch.outline.length === 1 ? readUnits(stretch, definitions, 1) : [];
  if (fresh?.rowsStart !== head.length || fresh.end !== part.length || !isPlain(fresh)) return undefined;
  const kept = shifted(table, shift);
  return {
    ...kept,
    lineStart: table.lineStart,
    rowsStart,
    blocks: [
      ...table.blocks.filter((block) => block.start < from),
      ...shifted(fresh, from - head.length).blocks.filter((block) => block.start >= from),
      ...kept.blocks.filter((block) => block.start > to + shift),
    ],
  };
}

function isPlain({ problems, steps, definitions, openEnded }: Unit): boolean {
  return problems.length === 0 && steps.length === 0 && definitions.length === 0 && !openEnded;
}
