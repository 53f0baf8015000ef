// The lines of an AsciiDoc text as blocks see them, and what a line by itself can be.

/** `[start, end)` of a text, without blanks at the end. A blank line has `start === end`. */
export interface Line {
  readonly start: number;
  readonly end: number;
}

/** What a delimiter line opens. */
export type Delimited = 'verbatim' | 'comment' | 'example' | 'sidebar' | 'open' | 'quote' | 'table';

/**
 * The lines of `[from, to)` of a text, which stand at a line's start or at the text's end. Preprocessor conditionals
 * (`ifdef::`, `endif::` …) are left out, so that every branch is read; of the one-line form `ifdef::name[content]` the content
 * is left.
 */
export function linesOf(text: string, from: number, to: number): Line[] {
  const lines: Line[] = [];
  for (let start = from; start < to;) {
    let next = text.indexOf('\n', start);
    if (next < 0) next = text.length;
    let end = next;
    while (end > start && isBlank(text.charCodeAt(end - 1))) end--;
    const line = conditional(text, start, end);
    if (line) lines.push(line);
    start = next + 1;
  }
  return lines;
}

const DIRECTIVE = /\\?(?:(ifn?def)|ifeval|endif|include)::[^\s[]*\[/y;

/** The line itself, or what a preprocessor directive leaves of it. */
function conditional(text: string, start: number, end: number): Line | undefined {
  const first = text.charCodeAt(start);
  if ((first !== 105 && first !== 101 && first !== 92) || text.charCodeAt(end - 1) !== 93) return { start, end };
  DIRECTIVE.lastIndex = start;
  const found = DIRECTIVE.exec(text);
  if (!found || start + found[0].length >= end) return { start, end };
  if (first === 92) return { start: start + 1, end };
  if (found[0].startsWith('include')) return { start, end };
  const inner = start + found[0].length;
  return found[1] !== undefined && inner < end - 1 ? { start: inner, end: end - 1 } : undefined;
}

/** True for white space within a line. */
export function isBlank(unit: number): boolean {
  return unit === 32 || unit === 9 || unit === 12 || unit === 11;
}

/** The offset of the first visible unit of a line. */
export function visibleStart(text: string, line: Line): number {
  let at = line.start;
  while (at < line.end && isBlank(text.charCodeAt(at))) at++;
  return at;
}

/** `// …` but not `///…`. */
export function isComment(text: string, line: Line): boolean {
  return text.startsWith('//', line.start) && line.end - line.start !== 1 && text.charCodeAt(line.start + 2) !== 47;
}

/** `include::file[…]`: other text stands here once the document is converted. */
export function isInclude(text: string, line: Line): boolean {
  return text.startsWith('include::', line.start) && text.charCodeAt(line.end - 1) === 93 && !isEscaped(text, line);
}

/** True where a backslash before the line takes its meaning away. */
export function isEscaped(text: string, line: Line): boolean {
  return text.charCodeAt(line.start - 1) === 92;
}

const ENTRY = /:!?[\p{L}\p{N}_][^:\n]*:(?=\s|$)/uy;

/** The name of an attribute entry (`:name: value`) and where its value starts, or undefined. */
export function attributeEntry(text: string, line: Line): { name: string; value: number } | undefined {
  if (text.charCodeAt(line.start) !== 58) return undefined;
  ENTRY.lastIndex = line.start;
  const found = ENTRY.exec(text);
  if (!found) return undefined;
  const value = line.start + found[0].length;
  return { name: found[0].slice(1, -1), value };
}

const KINDS: Partial<Record<string, Delimited>> = {
  '-': 'verbatim',
  '.': 'verbatim',
  '+': 'verbatim',
  '/': 'comment',
  '=': 'example',
  '*': 'sidebar',
  _: 'quote',
};
const TABLES = '|,:!';

/** What a line opens if it delimits a block, else undefined. `closing` is the line that ends the block. */
export function delimiter(text: string, line: Line): { kind: Delimited; closing: string } | undefined {
  const length = line.end - line.start;
  const mark = text[line.start];
  if (length < 2 || mark === undefined) return undefined;
  if (mark === '`') return text.startsWith('```', line.start) ? fence(text.slice(line.start, line.end)) : undefined;
  if (length === 2) return mark === '-' && text[line.start + 1] === '-' ? { kind: 'open', closing: '--' } : undefined;
  if (length < 4) return undefined;
  const table = TABLES.includes(mark);
  const kind = table ? 'table' : KINDS[mark];
  if (!kind) return undefined;
  const repeated = table ? 61 : mark.charCodeAt(0);
  for (let i = line.start + 1; i < line.end; i++) if (text.charCodeAt(i) !== repeated) return undefined;
  return { kind, closing: text.slice(line.start, line.end) };
}

function fence(line: string): { kind: Delimited; closing: string } | undefined {
  const marks = /^`+/.exec(line)![0];
  return line.includes('`', marks.length) ? undefined : { kind: 'verbatim', closing: marks };
}

const ATTRIBUTE_LINE = /\[(?:\]|[\p{L}\p{N}_.#%{,"'])/uy;
const ANCHOR_LINE = /\[\[[\p{L}_:][^\]\n]*\]\]$/u;

/** `[…]` or `[[id]]`: a line about the block that follows. */
export function isAttributeLine(text: string, line: Line): boolean {
  if (text.charCodeAt(line.start) !== 91 || text.charCodeAt(line.end - 1) !== 93) return false;
  ATTRIBUTE_LINE.lastIndex = line.start;
  return (
    ATTRIBUTE_LINE.test(text) ||
    (text.charCodeAt(line.start + 1) === 91 && ANCHOR_LINE.test(text.slice(line.start, line.end)))
  );
}

/** `.Title` of the block that follows. */
export function isBlockTitle(text: string, line: Line): boolean {
  if (text.charCodeAt(line.start) !== 46) return false;
  let at = line.start + 1;
  if (text.charCodeAt(at) === 46) at++;
  const unit = text.charCodeAt(at);
  return at < line.end && !isBlank(unit) && unit !== 46;
}

const TITLE = /(={1,6}|#{1,6})[ \t]+(?=\S)/y;

/** A section title on one line: its level from 1, and `[start, end)` of its text; else undefined. */
export function sectionTitle(text: string, line: Line): (Line & { level: number }) | undefined {
  const first = text.charCodeAt(line.start);
  if (first !== 61 && first !== 35) return undefined;
  TITLE.lastIndex = line.start;
  const found = TITLE.exec(text);
  if (!found) return undefined;
  const marks = found[1]!;
  const start = line.start + found[0].length;
  const tail = line.end - marks.length;
  const closed = tail - 1 > start && text.startsWith(marks, tail) && isBlank(text.charCodeAt(tail - 1));
  return { start, end: closed ? tail - 1 : line.end, level: marks.length };
}

const UNDERLINES = '=-~^+';
const HAS_WORD = /[\p{L}\p{N}]/u;

/** The level (from 1) of a title that the next line underlines with as many marks, give or take one; else 0. */
export function underlinedLevel(text: string, line: Line, next: Line): number {
  const level = UNDERLINES.indexOf(text[next.start] ?? ' ') + 1;
  const length = next.end - next.start;
  if (level === 0 || length < 2 || Math.abs(length - (line.end - line.start)) > 1) return 0;
  for (let i = next.start + 1; i < next.end; i++) if (text[i] !== UNDERLINES[level - 1]) return 0;
  return HAS_WORD.test(text.slice(line.start, line.end)) ? level : 0;
}

const BREAK = /^(?:'{3,}|<{3,}| {0,3}([-*_])( *)\1\2\1)$/;

/** A thematic break (`'''`, `---`, `* * *`) or a page break (`<<<`). */
export function isBreak(text: string, line: Line): boolean {
  return line.end - line.start < 40 && BREAK.test(text.slice(line.start, line.end));
}
