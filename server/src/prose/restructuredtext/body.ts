// Body elements, one after the other: what each line begins is decided as docutils does (its states.py).
import { Zone } from '../zones.js';
import { DEEPEST, inside, type DocumentContext, type Setting } from './context.js';
import { definitionItem } from './definitionList.js';
import { readExplicit } from './explicit.js';
import { readFieldBody } from './fields.js';
import { gridTable } from './gridTable.js';
import { readLeaf } from './leaf.js';
import { columnAt, indentedBlock, indentedLinesEnd, isBlank, paragraphEnd, skipBlank, type Lines } from './lines.js';
import { bulletEnd, enumeratorEnd, fieldMarkEnd, isAdorning, isAdornment, optionsEnd } from './markers.js';
import { isSimpleBorder, simpleTable } from './simpleTable.js';
import { overlinedTitle, underlinedTitle } from './titles.js';

const ATTRIBUTION = /^(?:---?(?!-)|—) *(?=[^ ])/;

/** Reads the body elements of `[from, to)`, whose margin is column `base`. */
export function readBody(
  cx: DocumentContext,
  lines: Lines,
  from: number,
  to: number,
  base: number,
  setting: Setting,
): void {
  if (setting.depth > DEEPEST) {
    const span = { start: lines.at[from]!, end: lines.end[to - 1]! };
    cx.problems.push({ span, message: `Text nested more than ${DEEPEST} levels deep is not read.` });
    return;
  }
  const outer = cx.nextLanguage;
  cx.nextLanguage = undefined;
  for (let line = from; line < to;) {
    if (lines.isBlank(line)) line++;
    else line = readElement(cx, lines, line, to, base, setting);
  }
  cx.nextLanguage = outer;
}

/** Reads the element that begins on `line`, which is not blank; the line behind it. */
export function readElement(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  around: Setting,
): number {
  const language = cx.nextLanguage;
  const setting = language === undefined ? around : { ...around, language };
  const { length } = cx.blocks;
  const silent = language !== undefined && cx.text.startsWith('..', lines.at[line]);
  cx.nextLanguage = undefined;
  const behind =
    lines.column[line]! > base
      ? blockQuote(cx, lines, line, to, base, setting)
      : (element(cx, lines, line, to, base, setting) ?? textElement(cx, lines, line, to, base, setting));
  // Comments and targets do not use up what was said of the element below them.
  if (silent && cx.blocks.length === length) cx.nextLanguage ??= language;
  return behind;
}

/** The line behind the element that begins with a mark on `line`, or undefined where the line is text. */
function element(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  setting: Setting,
): number | undefined {
  const { text } = cx;
  const at = lines.at[line]!;
  const end = lines.end[line]!;
  const unit = text.charCodeAt(at);
  const bullet = bulletEnd(text, at, end);
  if (bullet >= 0) return listItem(cx, lines, line, to, base, bullet, setting);
  // Most lines begin with a letter that no list mark follows.
  const second = text.charCodeAt(at + 1);
  if (
    unit !== 58 &&
    !isAdorning(unit) &&
    second !== 46 &&
    second !== 41 &&
    second > 57 &&
    second < 0x80 &&
    !isEnumeratorLetter(unit)
  ) {
    return undefined;
  }
  const enumerator = enumeratorEnd(text, lines, line, to, base);
  if (enumerator >= 0) return listItem(cx, lines, line, to, base, enumerator, setting);
  if (!isAdorning(unit)) return undefined;
  const field = fieldMarkEnd(text, at, end);
  if (field >= 0) return fieldItem(cx, lines, line, to, base, field, setting);
  const options = optionsEnd(text, at, end);
  if (options >= 0) {
    const block = indentedBlock(lines, line + 1, to, base);
    const inLine = options < end;
    if (inLine || block.to > line + 1) {
      readIndentedFrom(cx, lines, line, block.to, options, block.margin, inside(setting, { kind: 'listItem' }));
      return block.next;
    }
  }
  const written = text.slice(at, Math.min(end, at + 3));
  if (written === '>>>' && (end === at + 3 || isBlank(text.charCodeAt(at + 3)))) return paragraphEnd(lines, line, to);
  if (unit === 124 && (end === at + 1 || isBlank(second))) return lineBlock(cx, lines, line, to, base, setting);
  if (unit === 43) {
    const table = gridTable(cx, lines, line, to, base, setting);
    if (table !== undefined) return table;
  }
  if (unit === 61 && isSimpleBorder(text, at, end)) return simpleTable(cx, lines, line, to, base, setting);
  const doubled = unit === second && (end === at + 2 || isBlank(text.charCodeAt(at + 2)));
  if (doubled && unit === 46) return readExplicit(cx, lines, line, to, base, setting);
  if (doubled && unit === 95) return indentedLinesEnd(lines, line + 1, to, base);
  return isAdornment(text, at, end) ? overlinedTitle(cx, lines, line, to, base, setting) : undefined;
}

function isEnumeratorLetter(unit: number): boolean {
  const lower = unit | 32;
  return (
    lower === 105 || lower === 118 || lower === 120 || lower === 108 || lower === 99 || lower === 100 || lower === 109
  );
}

/** A bullet or enumerated item: its body stands right of the mark. */
function listItem(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  markEnd: number,
  setting: Setting,
): number {
  const end = lines.end[line]!;
  const item = inside(setting, { kind: setting.kind === 'tableCell' ? 'tableCell' : 'listItem' });
  if (markEnd >= end) {
    const block = indentedBlock(lines, line + 1, to, base);
    if (block.to > line + 1) cx.readBody(lines, line + 1, block.to, block.margin, item);
    return block.next;
  }
  let at = markEnd;
  while (isBlank(cx.text.charCodeAt(at))) at++;
  const column = columnAt(cx.text, lines.at[line]!, lines.column[line]!, at);
  const block = indentedBlock(lines, line + 1, to, column - 1);
  lines.at[line] = at;
  lines.column[line] = column;
  cx.readBody(lines, line, Math.max(block.to, line + 1), column, item);
  return block.next;
}

/** Reads a body whose first line goes on behind a mark, and whose other lines have a margin of their own. */
function readIndentedFrom(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  markEnd: number,
  margin: number,
  setting: Setting,
): void {
  let at = markEnd;
  while (at < lines.end[line]! && isBlank(cx.text.charCodeAt(at))) at++;
  const base = margin === Number.POSITIVE_INFINITY ? 0 : margin;
  lines.at[line] = at;
  lines.column[line] = base;
  cx.readBody(lines, line, Math.max(to, line + 1), base, setting);
}

function fieldItem(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  colon: number,
  setting: Setting,
): number {
  const block = indentedBlock(lines, line + 1, to, base);
  if (readFieldBody(cx.text.slice(lines.at[line]! + 1, colon))) {
    readIndentedFrom(cx, lines, line, block.to, colon + 1, block.margin, inside(setting, { kind: 'listItem' }));
  }
  return block.next;
}

/** Each line of a line block is a block of its own; lines indented further go on the one before. */
function lineBlock(
  cx: DocumentContext,
  lines: Lines,
  first: number,
  to: number,
  base: number,
  setting: Setting,
): number {
  let line = first;
  while (line < to && !lines.isBlank(line) && lines.column[line] === base) {
    const end = lines.end[line]!;
    let at = lines.at[line]!;
    if (cx.text.charCodeAt(at) !== 124 || (end > at + 1 && !isBlank(cx.text.charCodeAt(at + 1)))) break;
    at++;
    while (at < end && isBlank(cx.text.charCodeAt(at))) at++;
    const next = indentedLinesEnd(lines, line + 1, to, base);
    lines.at[line] = at;
    if (at < end) readLeaf(cx, lines, line, next, setting);
    line = next;
  }
  return line;
}

/** An indented block. It quotes somebody where it says whom; else the indentation is mere layout. */
function blockQuote(
  cx: DocumentContext,
  lines: Lines,
  from: number,
  to: number,
  base: number,
  setting: Setting,
): number {
  const block = indentedBlock(lines, from, to, base);
  let start = from;
  for (let line = from + 1; line < block.to; line++) {
    if (!lines.isBlank(line - 1) || lines.isBlank(line) || lines.column[line] !== block.margin) continue;
    if (!ATTRIBUTION.test(cx.text.slice(lines.at[line], lines.at[line]! + 8))) continue;
    const quoted = inside(setting, { zones: setting.zones | Zone.quotation });
    cx.readBody(lines, start, line, block.margin, quoted);
    start = paragraphEnd(lines, line, block.to);
  }
  start = skipBlank(lines, start, block.to);
  if (start < block.to) cx.readBody(lines, start, block.to, block.margin, inside(setting));
  return block.next;
}

/** A title, a definition list's item or a paragraph, the latter with the literal block that it announces. */
function textElement(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  setting: Setting,
): number {
  const { text } = cx;
  const next = line + 1;
  if (next < to && !lines.isBlank(next)) {
    if (lines.column[next]! > base) {
      if (!announcesLiteral(text, lines.at[line]!, lines.end[line]!)) {
        return definitionItem(cx, lines, line, to, base, setting);
      }
    } else if (underlinedTitle(cx, lines, line, setting)) return next + 1;
  }
  let end = next;
  while (end < to && !lines.isBlank(end) && lines.column[end]! <= base) end++;
  const lastAt = lines.at[end - 1]!;
  const lastEnd = lines.end[end - 1]!;
  if (!announcesLiteral(text, lastAt, lastEnd)) {
    readLeaf(cx, lines, line, end, setting);
    return end;
  }
  // Of `text::` the colon is read that docutils shows; a lone `::` shows nothing.
  const before = lastEnd - 2;
  if (before > lastAt)
    readLeaf(cx, lines, line, end, setting, isBlank(text.charCodeAt(before - 1)) ? before : before + 1);
  else if (end - 1 > line) readLeaf(cx, lines, line, end - 1, setting);
  return literalEnd(cx, lines, end, to, base);
}

/** The line behind a literal block: an indented one, or lines that all begin with the same mark. */
function literalEnd(cx: DocumentContext, lines: Lines, from: number, to: number, base: number): number {
  const first = skipBlank(lines, from, to);
  if (first >= to) return first;
  if (lines.column[first]! > base) return indentedBlock(lines, first, to, base).next;
  const mark = cx.text.charCodeAt(lines.at[first]!);
  let line = first;
  if (isAdorning(mark))
    while (line < to && !lines.isBlank(line) && cx.text.charCodeAt(lines.at[line]!) === mark) line++;
  return line;
}

/** True where a line ends in `::` that no backslash escapes. */
function announcesLiteral(text: string, at: number, end: number): boolean {
  if (end - at < 2 || text.charCodeAt(end - 1) !== 58 || text.charCodeAt(end - 2) !== 58) return false;
  let slashes = end - 2;
  while (slashes > at && text.charCodeAt(slashes - 1) === 92) slashes--;
  return (end - 2 - slashes) % 2 === 0;
}
