// Reads lines of text as one block.
import { ContentBuilder, type BlockRole } from '../content.js';
import { markQuotations } from '../quotations.js';
import type { DocumentContext } from './context.js';
import { readInline } from './inline.js';
import type { Lines } from './lines.js';

/**
 * Reads `[from, to)`, none of them blank, as one block. `end` is where the last line's text ends, by default at its end.
 */
export function readLeaf(
  cx: DocumentContext,
  lines: Lines,
  from: number,
  to: number,
  role: BlockRole,
  end = lines.end[to - 1]!,
): void {
  const { text } = cx;
  const start = lines.at[from]!;
  if (end <= start) return;
  const joinedAt = [0];
  const sourceAt = [start];
  let joined = '';
  // Lines that follow one another without indentation are one slice.
  let sliceFrom = start;
  for (let line = from + 1; line < to; line++) {
    const at = lines.at[line]!;
    const before = lines.end[line - 1]!;
    if (at === before + 1 && text.charCodeAt(before) === 10) continue;
    joined += `${text.slice(sliceFrom, before)}\n`;
    sliceFrom = at;
    joinedAt.push(joined.length);
    sourceAt.push(at);
  }
  joined += text.slice(sliceFrom, end);
  const out = new ContentBuilder(text, start);
  readInline(cx, { text: joined, joinedAt, sourceAt }, out);
  const content = out.finish(role, end);
  if (content) cx.blocks.push({ start, content: markQuotations(content) });
}

/** Reads `[start, end)` of one line as one block. */
export function readPhrase(cx: DocumentContext, start: number, end: number, role: BlockRole): void {
  if (end <= start) return;
  const out = new ContentBuilder(cx.text, start);
  readInline(cx, { text: cx.text.slice(start, end), joinedAt: [0], sourceAt: [start] }, out);
  const content = out.finish(role, end);
  if (content) cx.blocks.push({ start, content: markQuotations(content) });
}
