// Definition lists and glossaries: terms with their definitions indented below.
import { definitionOrSee } from '../glossary.js';
import { Zone } from '../zones.js';
import { inside, roleOf, type DocumentContext, type Setting } from './context.js';
import { readPhrase } from './leaf.js';
import { indentedBlock, type Indented, type Lines } from './lines.js';

/** A longer line above an indented one is a sentence whose author only indented what follows. In words. */
const LONGEST_TERM = 8;
const SENTENCE = /[.:;?!]\s|[.:,;?!]$/;

/** Reads the term on `line` and the definition below it; the line behind both. */
export function definitionItem(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  base: number,
  setting: Setting,
): number {
  const at = lines.at[line]!;
  const end = classifierStart(cx.text, at, lines.end[line]!);
  const term = isTerm(cx.text.slice(at, end));
  const entry = term && cx.glossaryLevel > 0 && setting.glossary === undefined && setting.kind === 'paragraph';
  if (term) readTerm(cx, at, end, entry ? { ...setting, glossary: 'headword' } : setting);
  else readPhrase(cx, at, end, setting);
  const block = indentedBlock(lines, line + 1, to, base);
  if (entry) readMeaning(cx, lines, line + 1, block, setting);
  else cx.readBody(lines, line + 1, block.to, block.margin, inside(setting, { kind: 'definition' }));
  return block.next;
}

/** Reads what a glossary says of a headword: a definition, or no more than another headword to look at. */
function readMeaning(
  cx: DocumentContext,
  lines: Lines,
  from: number,
  { to, margin }: Pick<Indented, 'to' | 'margin'>,
  setting: Setting,
): void {
  const first = cx.blocks.length;
  cx.readBody(lines, from, to, margin, inside(setting, { kind: 'definition', glossary: 'definition' }));
  const only = cx.blocks.length === first + 1 ? cx.blocks[first]! : undefined;
  if (only) cx.blocks[first] = { ...only, content: definitionOrSee(only.content) };
}

/** Reads a `glossary` directive's body: one or more terms, each on a line, above each definition. */
export function readGlossary(
  cx: DocumentContext,
  lines: Lines,
  from: number,
  to: number,
  base: number,
  setting: Setting,
): void {
  for (let line = from; line < to;) {
    const block = indentedBlock(lines, line, to, base);
    if (block.to > line) readMeaning(cx, lines, line, block, setting);
    line = block.next;
    if (line >= to) break;
    const at = lines.at[line]!;
    if (cx.text.startsWith('.. ', at)) line = indentedBlock(lines, line + 1, to, base).next;
    else {
      readTerm(cx, at, classifierStart(cx.text, at, lines.end[line]!), { ...setting, glossary: 'headword' });
      line++;
    }
  }
}

function readTerm(cx: DocumentContext, start: number, end: number, setting: Setting): void {
  readPhrase(cx, start, end, roleOf(setting, 'definedTerm', Zone.definedTerm));
}

function isTerm(text: string): boolean {
  return text.length < 200 && !SENTENCE.test(text) && text.split(/\s+/, LONGEST_TERM + 1).length <= LONGEST_TERM;
}

/** Where `term : classifier` leaves the term, outside literals and roles; the line's end where it has no classifier. */
function classifierStart(text: string, at: number, end: number): number {
  let marks = 0;
  for (let i = at; i < end; i++) {
    const unit = text.charCodeAt(i);
    if (unit === 92) i++;
    else if (unit === 96) marks++;
    else if (unit === 58 && marks % 2 === 0 && i > at + 1 && i + 1 < end) {
      if (text.charCodeAt(i - 1) === 32 && text.charCodeAt(i + 1) === 32) return trimmed(text, at, i);
    }
  }
  return end;
}

function trimmed(text: string, at: number, end: number): number {
  let to = end;
  while (to > at && text.charCodeAt(to - 1) === 32) to--;
  return to;
}
