// From edits of a block's prose to edits of the source, refusing whatever would touch markup.
import type { Span } from '../base/span.js';
import { OPAQUE, sourceEnd, sourceStart, type ProseBlock } from '../prose/prose.js';
import type { TextEdit } from '../text/edits.js';
import type { Refusal } from './replaceTerm.js';

/** What may stand at a line's start inside a block: indentation and quotation marks are no part of the words. */
const LINE_START = /^[\s>]*$/;

/**
 * The edits in the source, ascending. Refused where the term at `term` or an edit has markup, character references or the like in it.
 * @param source the whole document, as the block was read from it.
 */
export function sourceEdits(
  block: ProseBlock,
  term: Span,
  edits: readonly TextEdit[],
  source: string,
): TextEdit[] | Refusal {
  if (!isPlain(block, term, source)) return { refused: 'Markup stands inside the term: change it by hand.' };
  const result: TextEdit[] = [];
  for (const { span, newText } of edits) {
    if (!isPlain(block, span, source))
      return { refused: 'Markup stands inside the words that would change: change them by hand.' };
    // An insertion stands right behind the unit before it, inside whatever markup that unit is in.
    const end = span.start === span.end && span.start === 0 ? sourceStart(block, 0) : sourceEnd(block, span.end);
    const start = span.start === span.end ? end : sourceStart(block, span.start);
    result.push({ span: { start, end }, newText: inSource(newText, source.slice(start, end)) });
  }
  return result.sort((a, b) => a.span.start - b.span.start);
}

/** True where the source of a span is its text, unit by unit, but for what stands at the starts of wrapped lines. */
function isPlain(block: ProseBlock, { start, end }: Span, source: string): boolean {
  const { text } = block.content;
  if (text.slice(start, end).includes(OPAQUE)) return false;
  let expected = start === end ? 0 : sourceStart(block, start);
  for (let at = start; at < end; at++) {
    const from = sourceStart(block, at);
    const betweenWords = /\s/.test(text.charAt(at)) || (at > start && /\s/.test(text.charAt(at - 1)));
    if (from !== expected && !(betweenWords && LINE_START.test(source.slice(expected, from)))) return false;
    const to = sourceEnd(block, at + 1);
    const unit = text.charAt(at);
    const written = source.slice(from, to);
    if (written !== unit && !(/\s/.test(unit) && LINE_START.test(written))) return false;
    expected = to;
  }
  return true;
}

/** A replacement that keeps a line break takes the break as the source writes it, with the indentation behind it. */
function inSource(newText: string, replaced: string): string {
  const written = /[^\S\n]*\r?\n[\s>]*/.exec(replaced)?.[0];
  return written === undefined ? newText : newText.replace(/\s*\n\s*/, () => written);
}
