// The Markdown grammar: CommonMark and GFM by @lezer/markdown, the generators' additions, and guards against hostile input.
import {
  GFM,
  parser as commonMark,
  type BlockContext,
  type Element,
  type LeafBlock,
  type Line,
  type MarkdownConfig,
  type MarkdownParser,
} from '@lezer/markdown';
import { brackets } from './brackets.js';
import { containers } from './containers.js';
import { definitionLists } from './definitionLists.js';
import { mdx } from './mdx.js';
import { parsePlainRun } from './plainRun.js';
import { templateBlocks } from './templateBlocks.js';
import { templateTags } from './templateTags.js';
import { templates } from './templates.js';

/**
 * Inline markup is resolved within stretches of about this many units. The parser's cost can grow with the square of
 * what it is given at once; real paragraphs stay far below.
 */
const LONGEST_INLINE = 2048;
/** A paragraph is cut at the next line once it is this long. */
const LONGEST_LEAF = 16384;
/** Likewise where it opens with a bracket: each further line may be tried as part of a link reference definition. */
const LONGEST_BRACKETED_LEAF = 2048;
const TABLE_START = /^[^\n]*\n[>\s]*\|?\s*:?-+:?\s*(?:\||$|\n)/;

const guards: MarkdownConfig = {
  defineNodes: [{ name: 'LongHtml', block: true }],
  parseBlock: [
    { name: 'LongLeaf', endLeaf: isTooLong },
    { name: 'LongHtml', parse: parseLongHtml, before: 'HTMLBlock' },
  ],
  parseInline: [{ name: 'PlainRun', parse: parsePlainRun, before: 'Escape' }],
};

/** The limit of a leaf that has grown past the shorter limit: looked up once a leaf, since looking costs its length. */
const limits = new WeakMap<LeafBlock, number>();

function isTooLong(_cx: unknown, _line: unknown, leaf: LeafBlock): boolean {
  if (leaf.content.length <= LONGEST_BRACKETED_LEAF) return false;
  let limit = limits.get(leaf);
  if (limit === undefined) {
    limit = limitOf(leaf.content);
    limits.set(leaf, limit);
  }
  return leaf.content.length > limit;
}

function limitOf(content: string): number {
  const table = TABLE_START.test(content);
  if (content.startsWith('[') && !(table && /^[^\n]*\]/.test(content))) return LONGEST_BRACKETED_LEAF;
  return table ? Number.POSITIVE_INFINITY : LONGEST_LEAF;
}

/** A long line that opens with a tag is taken for HTML at once: telling for sure costs the square of its length. */
function parseLongHtml(cx: BlockContext, line: Line): boolean {
  if (line.next !== 60 || line.text.length - line.pos <= LONGEST_INLINE) return false;
  cx.addElement(cx.elt('LongHtml', cx.lineStart + line.pos, cx.lineStart + line.text.length));
  cx.nextLine();
  return true;
}

/** The configured parsers. They are stateless: parsing one text never affects another. */
export const markdownParser = inStretches(
  commonMark.configure([
    ...[GFM, templates, templateBlocks, templateTags, brackets, guards, containers, definitionLists],
  ]),
);
export const mdxParser = inStretches(markdownParser.configure(mdx));

/** The parser, with the inline markup of long blocks resolved by stretches. */
function inStretches(parser: MarkdownParser): MarkdownParser {
  const parseWhole = parser.parseInline.bind(parser);
  parser.parseInline = (text: string, offset: number): Element[] => {
    if (text.length <= LONGEST_INLINE) return parseWhole(text, offset);
    const elements: Element[] = [];
    for (let from = 0; from < text.length;) {
      const to = cut(text, from);
      for (const element of parseWhole(text.slice(from, to), offset + from)) elements.push(element);
      from = to;
    }
    return elements;
  };
  return parser;
}

/**
 * Where the stretch that begins at `from` ends: in its second half behind the last blank or line break at which no bracket,
 * code span or emphasis seems to be open; else behind the last blank; else at its full length.
 */
function cut(text: string, from: number): number {
  const limit = from + LONGEST_INLINE;
  if (limit >= text.length) return text.length;
  let brackets = 0;
  let odd = 0;
  let blank = limit;
  let settled = -1;
  for (let i = from; i < limit; i++) {
    const unit = text.charCodeAt(i);
    if (unit === 91 || unit === 40) brackets++;
    else if (unit === 93 || unit === 41) brackets--;
    else if (unit === 96) odd ^= 1;
    else if (unit === 42) odd ^= 2;
    else if ((unit === 32 || unit === 10) && i >= from + LONGEST_INLINE / 2) {
      blank = i + 1;
      if (brackets === 0 && odd === 0) settled = i + 1;
    }
  }
  return settled > 0 ? settled : blank;
}
