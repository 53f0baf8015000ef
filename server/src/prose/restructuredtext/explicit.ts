// Explicit markup, the blocks that begin with `..`: footnotes, citations, directives; targets, substitutions and comments are no prose.
import { inside, type DocumentContext, type Setting } from './context.js';
import { readDirective } from './directive.js';
import { indentedBlock, indentedLinesEnd, isBlank, type Lines } from './lines.js';

const NAME = '[\\p{L}\\p{N}]+(?:[-._+:][\\p{L}\\p{N}]+)*';
const FOOTNOTE = new RegExp(`\\[(?:#(?:${NAME})?|\\*|[0-9]+|${NAME})\\](?=[ \\t\\n]|$)`, 'yu');
const SUBSTITUTE_IMAGE = /\|[^|\n]+\|[ \t]+image::(?=[ \t])/y;
const DIRECTIVE = new RegExp(`(${NAME}) ?::(?=[ \\t\\n\\f\\v]|$)`, 'yu');

/** Reads the explicit markup block that begins on `line`; the line behind it. */
export function readExplicit(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  setting: Setting,
): number {
  const { text } = cx;
  const end = lines.end[line]!;
  let at = lines.at[line]! + 2;
  while (at < end && isBlank(text.charCodeAt(at))) at++;
  if (at >= end) {
    // Two dots alone above a blank line are an empty comment: what is indented below is no part of it.
    if (line + 1 >= to || lines.isBlank(line + 1)) return line + 1;
    return indentedBlock(lines, line + 1, to, base).next;
  }
  const unit = text.charCodeAt(at);
  const second = text.charCodeAt(at + 1);
  const named = at + 1 < end && !isBlank(second);
  if (unit === 95 && named) return indentedLinesEnd(lines, line + 1, to, base);
  const block = indentedBlock(lines, line + 1, to, base);
  if (unit === 124 && named) {
    SUBSTITUTE_IMAGE.lastIndex = at;
    const image = SUBSTITUTE_IMAGE.exec(text);
    const parts = { lines, line, to: Math.max(block.to, line + 1), margin: block.margin };
    if (image) readDirective(cx, 'image', at + image[0].length, parts, setting);
    return block.next;
  }
  if (unit === 91) {
    FOOTNOTE.lastIndex = at;
    const label = FOOTNOTE.exec(text);
    if (label) readFrom(cx, lines, line, block.to, at + label[0].length, block.margin, setting);
    return block.next;
  }
  DIRECTIVE.lastIndex = at;
  const directive = DIRECTIVE.exec(text);
  if (directive && at + directive[0].length <= end) {
    const parts = { lines, line, to: Math.max(block.to, line + 1), margin: block.margin };
    readDirective(cx, directive[1]!.toLowerCase(), at + directive[0].length, parts, setting);
  }
  return block.next;
}

function readFrom(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  at: number,
  margin: number,
  setting: Setting,
): void {
  moveStart(cx.text, lines, line, at, margin);
  cx.readBody(lines, line, Math.max(to, line + 1), lines.column[line]!, inside(setting));
}

/** Lets a line begin at the first visible character at or behind `at`, in the margin of the lines below it. */
export function moveStart(text: string, lines: Lines, line: number, at: number, margin: number): void {
  let start = at;
  while (start < lines.end[line]! && isBlank(text.charCodeAt(start))) start++;
  lines.at[line] = start;
  lines.column[line] = margin === Number.POSITIVE_INFINITY ? 0 : margin;
}
