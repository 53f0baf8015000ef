// The grammar of MDX on top of Markdown's: module code, elements of JSX, expressions; no code by indentation, no HTML.
import type { BlockContext, InlineContext, LeafBlock, Line, MarkdownConfig } from '@lezer/markdown';
import { passLinesTo, staysInside, wholeText } from './ahead.js';
import { scanTag } from './jsxTag.js';
import { expressionEnd, failedAt, failure, moduleEnd } from './script.js';

const OPENING = 60;
const BRACE = 123;
const IMPORT = /^import[ \t]+(?:["'{*]|[\w$]+[ \t]*(?:,|[ \t]from\b))/;
const EXPORT = /^export[ \t]+(?:[{*]|(?:default|const|let|var|function|class|async|type|interface)\b)/;
const FENCE = /^(`{3,}(?=[^`]*$)|~{3,})/;
/** What ends a paragraph however far it is indented, since no indentation makes code. */
const BLOCK_START = /^(?:`{3}[^`]*$|~{3}|#{1,6}(?:[ \t]|$)|(?:[-*+]|1[.)])[ \t]+\S|>)/;
const NEXT_ITEM = /^\d{1,9}[.)][ \t]+\S/;
/** A tag that opens attributes and goes wrong behind them. */
const BROKEN_TAG = /<\/?[A-Za-z][\w$.:-]*\s+[\w$:.-]+\s*=/y;
const BLANK_LINE = /\n[ \t]*\n/;
const LONGEST_COMMENT = 8192;
const HEADING_ID = /\{\s*#[\w-]+\s*\}/y;

interface Flow {
  readonly end: number;
  readonly tokens: readonly { readonly type: string; readonly from: number; readonly to: number }[];
}

/** Tags, expressions and comments from `from` on that fill their lines, or a {@link failure}. */
function scanFlow(text: string, from: number): Flow | number {
  const tokens: { type: string; from: number; to: number }[] = [];
  for (let at = from; ;) {
    const sign = text[at];
    if (sign === undefined || sign === '\n') return { end: at, tokens };
    if (sign === ' ' || sign === '\t') {
      at++;
      continue;
    }
    const token = sign === '<' || sign === '{' ? scanToken(text, at) : failure(at);
    if (typeof token === 'number') return token;
    tokens.push({ ...token, from: at });
    at = token.to;
  }
}

function scanToken(text: string, at: number): { type: string; to: number } | number {
  if (text.startsWith('<!--', at)) {
    const end = text.slice(at, at + LONGEST_COMMENT).indexOf('-->', 4);
    return end < 0 ? failure(text.length) : { type: 'Comment', to: at + end + 3 };
  }
  if (text[at] === '<') {
    const tag = scanTag(text, at);
    return typeof tag === 'number' ? tag : { type: 'JsxTag', to: tag.end };
  }
  const end = expressionEnd(text, at);
  return end < 0 ? end : { type: 'MdxExpression', to: end };
}

/**
 * What begins on the line at hand: `none` where its own paragraph shows that it fills no lines, `broken` where more than that
 * had to be looked at in vain.
 */
function flowAt(cx: BlockContext, line: Line): Flow | 'none' | 'broken' {
  if (line.next !== OPENING && line.next !== BRACE) return 'none';
  const at = cx.lineStart + line.pos;
  const text = wholeText(cx);
  for (let depth = 1; depth < cx.depth; depth++) {
    // Behind a line's end the text has marks of quotation, so one line must do.
    if (cx.parentType(depth).name !== 'Blockquote') continue;
    const flow = scanFlow(text.slice(0, cx.lineStart + line.text.length), at);
    return typeof flow === 'number' ? 'none' : flow;
  }
  const flow = scanFlow(text, at);
  if (typeof flow !== 'number') return flow;
  const seen = failedAt(flow);
  return seen >= text.length || BLANK_LINE.test(text.slice(at, seen)) ? 'broken' : 'none';
}

function parseFlow(cx: BlockContext, line: Line): boolean {
  const flow = flowAt(cx, line);
  if (flow === 'none') return false;
  const from = cx.lineStart + line.pos;
  if (flow === 'broken') return passBroken(cx, line, from);
  passLinesTo(cx, () => cx.lineStart + line.text.length, flow.end);
  const tokens = flow.tokens.map(({ type, from: start, to }) => cx.elt(type, start, to));
  cx.addElement(cx.elt('MdxFlow', from, flow.end, tokens));
  return true;
}

/** What nothing closes goes to the next blank line, as module code does. */
function passBroken(cx: BlockContext, line: Line, from: number): true {
  do cx.nextLine();
  while (line.next >= 0);
  cx.addElement(cx.elt('BrokenMdx', from, Math.max(from, cx.prevLineEnd())));
  return true;
}

function parseModule(cx: BlockContext, line: Line): boolean {
  if (cx.depth !== 1 || line.pos !== 0 || (line.next !== 105 && line.next !== 101)) return false;
  if (!IMPORT.test(line.text) && !EXPORT.test(line.text)) return false;
  const from = cx.lineStart;
  const end = moduleEnd(wholeText(cx), from);
  if (end < 0) return passBroken(cx, line, from);
  passLinesTo(cx, () => cx.lineStart + line.text.length, end);
  cx.addElement(cx.elt('MdxModule', from, end));
  return true;
}

/** As CommonMark's, but closed by a fence at any indentation. */
function parseFence(cx: BlockContext, line: Line): boolean {
  const fence = FENCE.exec(line.text.slice(line.pos))?.[1];
  if (fence === undefined) return false;
  const from = cx.lineStart + line.pos;
  const closing = new RegExp(`^\\${fence[0]!}{${fence.length},}[ \\t]*$`);
  while (cx.nextLine() && staysInside(cx, line)) {
    if (!closing.test(line.text.slice(line.pos))) continue;
    cx.nextLine();
    break;
  }
  cx.addElement(cx.elt('FencedCode', from, cx.prevLineEnd()));
  return true;
}

function opensFlow(cx: BlockContext, line: Line): boolean {
  return flowAt(cx, line) !== 'none';
}

/** Ends a paragraph at what stands too far in for the parser to look at it. */
const INDENTED_END = {
  nextLine(cx: BlockContext, line: Line, leaf: LeafBlock): boolean {
    if (line.indent < line.baseIndent + 4) return false;
    const rest = line.text.slice(line.pos);
    const isNextItem = cx.parentType().name === 'ListItem' && NEXT_ITEM.test(rest);
    if (!isNextItem && !BLOCK_START.test(rest) && !opensFlow(cx, line)) return false;
    const end = leaf.start + leaf.content.length;
    cx.addLeafElement(leaf, cx.elt('Paragraph', leaf.start, end, cx.parser.parseInline(leaf.content, leaf.start)));
    return true;
  },
  finish: () => false,
};

function parseTag(cx: InlineContext, next: number, pos: number): number {
  if (next !== OPENING) return -1;
  const at = pos - cx.offset;
  const tag = scanTag(cx.text, at);
  return typeof tag === 'number' ? -1 : cx.addElement(cx.elt('JsxTag', pos, tag.end + cx.offset));
}

function parseBrokenTag(cx: InlineContext, next: number, pos: number): number {
  if (next !== OPENING) return -1;
  BROKEN_TAG.lastIndex = pos - cx.offset;
  return BROKEN_TAG.test(cx.text) ? addBroken(cx, pos) : -1;
}

function parseExpression(cx: InlineContext, next: number, pos: number): number {
  if (next !== BRACE) return -1;
  const at = pos - cx.offset;
  HEADING_ID.lastIndex = at;
  if (HEADING_ID.test(cx.text)) return -1;
  const end = expressionEnd(cx.text, at);
  return end < 0 ? addBroken(cx, pos) : cx.addElement(cx.elt('MdxExpression', pos, end + cx.offset));
}

/** The rest of the line is not read. */
function addBroken(cx: InlineContext, pos: number): number {
  const end = cx.text.indexOf('\n', pos - cx.offset);
  return cx.addElement(cx.elt('BrokenInline', pos, end < 0 ? cx.end : end + cx.offset));
}

/** The extension of the Markdown grammar. */
export const mdx: MarkdownConfig = {
  defineNodes: [
    ...['MdxFlow', 'MdxModule', 'BrokenMdx'].map((name) => ({ name, block: true })),
    ...['JsxTag', 'MdxExpression', 'BrokenInline'],
  ],
  remove: ['HTMLBlock', 'LongHtml', 'IndentedCode'],
  parseBlock: [
    { name: 'MdxModule', parse: parseModule, before: 'TooDeep' },
    {
      name: 'MdxFlow',
      parse: parseFlow,
      endLeaf: (cx, line) => opensFlow(cx, line),
      leaf: () => INDENTED_END,
      before: 'TemplateTag',
    },
    { name: 'FencedCode', parse: parseFence },
  ],
  parseInline: [
    { name: 'JsxTag', parse: parseTag, before: 'PlainRun' },
    { name: 'MdxExpression', parse: parseExpression, before: 'PlainRun' },
    { name: 'BrokenTag', parse: parseBrokenTag, after: 'HTMLTag' },
  ],
};
