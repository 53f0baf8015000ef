// Reads plain text: paragraphs between blank lines, list items, underlined headings; indented and code-like lines stay out.
import type { SourceText } from '../text/sourceText.js';
import {
  gathered,
  readUnits,
  rereadUnits,
  type Blockwise,
  type BlockwiseReading,
  type Unit,
  type UnitWalk,
} from './blockwise.js';
import { ContentBuilder, type BlockRole } from './content.js';
import { normalise, textStart } from './normalise.js';
import type { ProseBlock } from './prose.js';
import { markQuotations } from './quotations.js';
import { changeBetween } from './reading.js';
import { Zone } from './zones.js';

const LIST_MARK = /^[ \t]*(?:[-*+•]|\(?(?:\d{1,3}|[a-zA-Z])[.)])[ \t]+(?=\S)/;
const UNDERLINE = /^[ \t]*([=\-~^"'`#*+_])\1{2,}[ \t]*$/;
const NO_WORD = /^[^\p{L}\p{N}]*$/u;
const OPAQUE_MATTER = new RegExp(
  [
    '``[^`]+``|`[^`]+`', // code, as most plain text formats mark it
    '(?<![a-z0-9+.-])(?:[a-z][a-z0-9+.-]{1,20}://|www\\.)[^\\s<>"]*[^\\s<>".,;:!?)\\]}\'’”]',
    '(?<![\\w.+-])[\\w.+-]{1,100}@[\\w-]+(?:\\.[\\w-]+)+',
  ].join('|'),
  'giu',
);
const CODE_LINE =
  /^[ \t]*(?:[$%#>][ \t]\S|\/\/|#!|>>>|\.\.[ \t]|:[\w-]+:(?:[ \t]|$))|[;{}][ \t]*$|^[ \t]*[\w.]+\(.*\)[ \t]*$|^[ \t]*[\w.$-]+[ \t]*[:+-]?=[ \t]/;
const LEVELS = '=-~^';

interface Line {
  readonly start: number;
  readonly end: number;
  /** Columns of white space before the first visible character; Infinity on a blank line. */
  readonly indent: number;
}

/** A plain text read; `margin` is the least indentation of its lines. */
export interface PlaintextReading extends BlockwiseReading<undefined> {
  readonly margin: number;
}

/**
 * Reads a plain text. The rules: a blank line ends a paragraph, and so does a list mark; a paragraph of which every line is
 * indented four columns or more beyond the text's own margin is code; a line of marks under a line makes that a
 * heading; a line that looks like a command, a directive, an assignment or the end of a statement is left out.
 */
export function readPlaintext(source: SourceText): PlaintextReading {
  const text = normalise(source.text);
  const start = textStart(text);
  const margin = leastIndent(text, start);
  return assemble(source, text, margin, readUnits(new Paragraphs(text, margin), text, start, undefined));
}

/** Reads a text again after an edit, with the same result as {@link readPlaintext} gives for the new one. */
export function rereadPlaintext(previous: PlaintextReading, source: SourceText): PlaintextReading {
  const text = normalise(source.text);
  const change = changeBetween(previous.text, text);
  if (!change) return { ...previous, source };
  const start = textStart(text);
  const margin = leastIndent(text, start);
  const same = margin === previous.margin && start === textStart(previous.text);
  const reread = same ? rereadUnits(new Paragraphs(text, margin), previous, text, change, start) : undefined;
  return assemble(source, text, margin, reread ?? readPlaintext(source), previous);
}

function assemble(
  source: SourceText,
  text: string,
  margin: number,
  { units, final }: Pick<PlaintextReading, 'units' | 'final'>,
  previous?: PlaintextReading,
): PlaintextReading {
  const prose = { ...gathered(units, [], previous?.prose.blocks), language: undefined };
  return { source, text, margin, units, final, prose };
}

/** The stretches between blank lines. Each depends on its own lines and on the margin of the text. */
class Paragraphs implements Blockwise<undefined> {
  constructor(
    private readonly text: string,
    private readonly margin: number,
  ) {}

  walk(from: number, to: number): UnitWalk<undefined> {
    const { text, margin } = this;
    const lines = linesOf(text, from, to);
    let at = 0;
    const next = (): number | undefined => {
      while (lines[at]?.indent === Number.POSITIVE_INFINITY) at++;
      return lines[at]?.start;
    };
    const step = (): Unit<undefined> => {
      const start = next()!;
      const first = at;
      while (at < lines.length && lines[at]!.indent !== Number.POSITIVE_INFINITY) at++;
      const blocks: ProseBlock[] = [];
      readParagraph(text, lines.slice(first, at), margin, blocks);
      const reach = at < lines.length ? lines[at]!.end + 1 : Number.POSITIVE_INFINITY;
      return { start, reach, state: undefined, blocks, problems: [] };
    };
    return { next, step, state: undefined };
  }

  sameState(): boolean {
    return true;
  }
}

/** Columns of white space before the first visible character of the line that has the fewest. */
function leastIndent(text: string, from: number): number {
  let least = Number.POSITIVE_INFINITY;
  for (let start = from; start < text.length && least > 0;) {
    const line = lineAt(text, start);
    least = Math.min(least, line.indent);
    start = line.end + 1;
  }
  return least;
}

/** The lines of `[from, to)`, which stand at a line's start or at the text's end. */
function linesOf(text: string, from: number, to: number): Line[] {
  const lines: Line[] = [];
  for (let start = from; start < to;) {
    const line = lineAt(text, start);
    lines.push(line);
    start = line.end + 1;
  }
  return lines;
}

function lineAt(text: string, start: number): Line {
  let end = text.indexOf('\n', start);
  if (end < 0) end = text.length;
  let indent = 0;
  let at = start;
  for (; at < end; at++) {
    const unit = text.charCodeAt(at);
    if (unit === 9) indent += 8 - (indent % 8);
    else if (unit === 32 || unit === 12) indent++;
    else break;
  }
  return { start, end, indent: at < end ? indent : Number.POSITIVE_INFINITY };
}

function readParagraph(text: string, lines: readonly Line[], margin: number, blocks: ProseBlock[]): void {
  if (lines.every((line) => line.indent >= margin + 4 && !LIST_MARK.test(text.slice(line.start, line.end)))) return;
  let pending: Line[] = [];
  let kind: BlockRole['kind'] = 'paragraph';
  const flush = (): void => {
    readLines(text, pending, { kind, level: 0, zones: Zone.prose }, blocks);
    pending = [];
    kind = 'paragraph';
  };
  for (const line of lines) {
    const written = text.slice(line.start, line.end);
    const underline = UNDERLINE.exec(written);
    if (underline) {
      const role = { kind: 'heading', level: LEVELS.indexOf(underline[1]!) + 1 || 3, zones: Zone.heading } as const;
      const title = pending.pop();
      flush();
      if (title) readLines(text, [title], role, blocks);
      continue;
    }
    if (CODE_LINE.test(written) || NO_WORD.test(written)) {
      flush();
      continue;
    }
    const mark = LIST_MARK.exec(written);
    if (!mark) {
      pending.push(line);
      continue;
    }
    flush();
    kind = 'listItem';
    pending.push({ ...line, start: line.start + mark[0].length });
  }
  flush();
}

function readLines(text: string, lines: readonly Line[], role: BlockRole, blocks: ProseBlock[]): void {
  const first = lines[0];
  if (!first) return;
  const start = first.start + /^[ \t\f]*/.exec(text.slice(first.start, first.end))![0].length;
  const end = lines[lines.length - 1]!.end;
  const out = new ContentBuilder(text, start);
  let before = start;
  for (const line of lines) {
    const written = text.slice(line.start, line.end);
    const from = line.start + /^\s*/.exec(written)![0].length;
    const to = line.start + written.trimEnd().length;
    if (from > before) out.space(before, from);
    readLine(text, from, to, out);
    before = to;
  }
  const content = out.finish(role, end);
  if (content) blocks.push({ start, content: markQuotations(content) });
}

function readLine(text: string, from: number, to: number, out: ContentBuilder): void {
  let at = from;
  for (const match of text.slice(from, to).matchAll(OPAQUE_MATTER)) {
    const found = from + match.index;
    out.run(at, found);
    at = found + match[0].length;
    out.opaque(found, at);
  }
  out.run(at, to);
}
