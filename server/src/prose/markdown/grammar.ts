// The Markdown grammar: CommonMark and GFM by @lezer/markdown, the generators' additions, and guards against hostile input.
import { GFM, parser as commonMark, type Element, type LeafBlock, type MarkdownConfig } from '@lezer/markdown';
import { brackets } from './brackets.js';
import { containers } from './containers.js';
import { parsePlainRun } from './plainRun.js';
import { templates } from './templates.js';

/**
 * Inline markup is resolved within stretches of about this many units. The parser's cost can grow with the square of
 * what it is given at once; real paragraphs stay far below.
 */
const LONGEST_INLINE = 4096;
/** A paragraph is cut at the next line once it is this long, unless it is a table. */
const LONGEST_LEAF = 16384;
const TABLE_START = /^[^\n]*\n[>\s]*\|?\s*:?-+:?\s*(?:\||$|\n)/;

const guards: MarkdownConfig = {
  parseBlock: [{ name: 'LongLeaf', endLeaf: isTooLong }],
  parseInline: [{ name: 'PlainRun', parse: parsePlainRun, before: 'Escape' }],
};

function isTooLong(_cx: unknown, _line: unknown, leaf: LeafBlock): boolean {
  return leaf.content.length > LONGEST_LEAF && !TABLE_START.test(leaf.content);
}

/** The configured parser. It is stateless: parsing one text never affects another. */
export const markdownParser = commonMark.configure([GFM, templates, brackets, guards, containers]);

const parseWhole = markdownParser.parseInline.bind(markdownParser);

markdownParser.parseInline = (text: string, offset: number): Element[] => {
  if (text.length <= LONGEST_INLINE) return parseWhole(text, offset);
  const elements: Element[] = [];
  for (let from = 0; from < text.length;) {
    const to = cut(text, from);
    for (const element of parseWhole(text.slice(from, to), offset + from)) elements.push(element);
    from = to;
  }
  return elements;
};

/** Where the stretch that begins at `from` ends: at white space where there is any in its second half. */
function cut(text: string, from: number): number {
  const limit = from + LONGEST_INLINE;
  if (limit >= text.length) return text.length;
  for (let i = limit; i > from + LONGEST_INLINE / 2; i--) {
    const unit = text.charCodeAt(i - 1);
    if (unit === 32 || unit === 10) return i;
  }
  return limit;
}
