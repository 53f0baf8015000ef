// Brackets in a link's text: `[array[0]](target)` is one link, whose text has brackets in it.
import { InlineContext, type MarkdownConfig } from '@lezer/markdown';

const OPENING = 91;
const CLOSING = 93;
const BACKSLASH = 92;
const PARENTHESIS = 40;
const LONGEST = 1000;

/**
 * The parser does not know which labels are defined and would take the inner `[0]` for a link, which keeps the outer
 * brackets from being one. So an inner pair without a target stays text where the pair around it has a target.
 */
function keepInnerBracketsText(cx: InlineContext, next: number, pos: number): number {
  if (next !== CLOSING) return -1;
  const after = cx.char(pos + 1);
  if (after === PARENTHESIS || after === OPENING) return -1;
  const inner = cx.findOpeningDelimiter(InlineContext.linkStart);
  if (inner === null || !outerHasTarget(cx.text, pos - cx.offset + 1, outerPairs(cx, inner))) return -1;
  const delimiter = cx.getDelimiterAt(inner) as { side: number } | null;
  if (delimiter) delimiter.side = 0;
  return -1;
}

/** How many brackets stand open around the one at `inner`. */
function outerPairs(cx: InlineContext, inner: number): number {
  let open = 0;
  for (let i = inner - 1; i >= 0; i--) {
    const delimiter = cx.getDelimiterAt(i) as { type: unknown; side: number } | null;
    if (delimiter?.type === InlineContext.linkStart && delimiter.side !== 0) open++;
  }
  return open;
}

/** True where one of the `pairs` of brackets that `from` lies in is closed and followed by a target in parentheses. */
function outerHasTarget(text: string, from: number, pairs: number): boolean {
  const end = Math.min(text.length, from + LONGEST);
  for (let i = from, depth = pairs; depth > 0 && i < end; i++) {
    const unit = text.charCodeAt(i);
    if (unit === BACKSLASH) i++;
    else if (unit === OPENING) depth++;
    else if (unit === CLOSING) {
      if (depth <= pairs && text.charCodeAt(i + 1) === PARENTHESIS) return true;
      depth--;
    }
  }
  return false;
}

/** The extension of the Markdown grammar. */
export const brackets: MarkdownConfig = {
  parseInline: [{ name: 'InnerBrackets', parse: keepInnerBracketsText, before: 'LinkEnd' }],
};
