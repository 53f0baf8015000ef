// Inline macros, `name:target[list]`, and addresses: where one ends and what of it is read.
import { Zone } from '../zones.js';
import { firstPositional } from './attributes.js';
import type { InlineReader } from './inline.js';
import { isWord } from './marks.js';
import type { Passage } from './passage.js';

/** A macro found in a passage: `read` gives its prose to a reader. */
export interface Macro {
  readonly start: number;
  readonly end: number;
  readonly read: (reader: InlineReader) => void;
}

interface Parts extends Macro {
  readonly name: string;
  readonly target: string;
  /** `[from, to)` of the list in the brackets. */
  readonly from: number;
  readonly to: number;
}

type Bare = Omit<Parts, 'read'>;

const LONGEST_NAME = 24;
/** Lists longer or deeper than this are text: they would be looked through again and again. */
const LONGEST_LIST = 10_000;
const DEEPEST = 4;
const SCHEMES = new Set(['http', 'https', 'ftp', 'irc', 'file']);
const NESTED = /(?:image|icon|kbd|btn|menu|pass|stem|footnote):[^\s[\]]{0,300}$/;
const AFTER_ADDRESS = /[.,;:!?)'"*_`+~^]/;

/** Names whose targets may hold blanks. */
const TARGET_WITH_BLANKS = new Set(['menu', 'image', 'icon', 'xref']);

/**
 * The macro or address whose name ends right before the colon at `colon`, within `[from, to)`; undefined where there is none.
 */
export function macroAt(passage: Passage, from: number, colon: number, to: number): Macro | undefined {
  const { text } = passage;
  let start = colon;
  while (start > from && colon - start < LONGEST_NAME && isNameUnit(text, start - 1)) start--;
  if (start === colon || (start > 0 && isWord(text, start - 1))) return undefined;
  while (start < colon && !isWord(text, start)) start++;
  const name = text.slice(start, colon);
  if (SCHEMES.has(name) && text.startsWith('//', colon + 1)) return addressAt(passage, start, colon + 3, to);
  if (text[start - 1] === '\\') return undefined;
  const parts = partsAt(passage, name, start, colon, to);
  return parts && { ...parts, read: (reader) => readMacro(reader, parts) };
}

function isNameUnit(text: string, at: number): boolean {
  const unit = text.charCodeAt(at);
  return (unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90) || (unit >= 48 && unit <= 57) || unit === 45;
}

function partsAt(passage: Passage, name: string, start: number, colon: number, to: number): Bare | undefined {
  const { text } = passage;
  const first = text[colon + 1];
  if (colon + 1 >= to || first === ':' || first === undefined || /\s/.test(first)) return undefined;
  const open = passage.next('[', colon + 1);
  if (open >= to) return undefined;
  const blank = Math.min(passage.next(' ', colon + 1), passage.next('\n', colon + 1));
  if (blank < open && (!TARGET_WITH_BLANKS.has(name) || open > passage.next('\n', colon + 1))) return undefined;
  const close = closing(passage, open, to);
  if (close < 0) return undefined;
  const target = text.slice(colon + 1, open);
  if (/[\]<>"]/.test(target.slice(0, 500)) && blank < open) return undefined;
  return { name, target, start, end: close + 1, from: open + 1, to: close };
}

/** The bracket that closes the one at `open`: the first one not escaped that closes no macro inside. */
function closing(passage: Passage, open: number, to: number): number {
  const { text } = passage;
  let inner = passage.next('[', open + 1);
  let depth = 0;
  let close = passage.nextClosing(open + 1);
  while (close < to && close - open < LONGEST_LIST) {
    while (inner < close) {
      if (NESTED.test(text.slice(Math.max(open, inner - 310), inner)) && ++depth > DEEPEST) return -1;
      inner = passage.next('[', inner + 1);
    }
    if (--depth < 0) return close;
    close = passage.nextClosing(close + 1);
  }
  return -1;
}

function addressAt(passage: Passage, start: number, from: number, to: number): Macro | undefined {
  const { text } = passage;
  let end = from;
  while (end < to && !/[\s[\]<>|]/.test(text[end]!)) end++;
  if (text[end] === '[' && end < to) {
    const close = closing(passage, end, to);
    if (close >= 0) {
      const target = text.slice(start, end);
      return { start, end: close + 1, read: (reader) => readLink(reader, start, close + 1, target, end + 1, close) };
    }
  }
  while (end > from && AFTER_ADDRESS.test(text[end - 1]!)) end--;
  return end === from ? undefined : { start, end, read: (reader) => reader.opaque(start, end) };
}

function readMacro(reader: InlineReader, parts: Bare): void {
  const { name, start, end, from, to, target } = parts;
  switch (name) {
    case 'link':
    case 'xref':
    case 'mailto':
      readLink(reader, start, end, target, from, to);
      break;
    case 'kbd':
    case 'btn':
      reader.within(Zone.uiLabel, [from, to]);
      break;
    case 'menu':
      reader.within(Zone.uiLabel, [start + 5, from - 1], [from, to]);
      break;
    case 'footnote':
    case 'footnoteref':
      readFootnote(reader, parts);
      break;
    case 'image':
      readImage(reader, parts);
      break;
    case 'indexterm2':
      reader.within(Zone.prose, [from, to]);
      break;
    case 'indexterm':
    case 'anchor':
      break;
    default:
      reader.opaque(start, end);
  }
}

/** A link shows its text, or else its target, which is no prose. */
function readLink(reader: InlineReader, start: number, end: number, target: string, from: number, to: number): void {
  const shown = firstPositional(reader.text, from, to, target !== '' && reader.text.startsWith('mailto:', start));
  if (!shown) {
    reader.opaque(start, end);
    return;
  }
  // A caret at the end asks for a window of its own.
  const last = reader.text[shown.end - 1] === '^' ? shown.end - 1 : shown.end;
  reader.linkText(shown.start, last, target);
}

function readFootnote(reader: InlineReader, { name, from, to }: Bare): void {
  let start = from;
  if (name === 'footnoteref') {
    const comma = reader.text.indexOf(',', from);
    start = comma < 0 || comma >= to ? to : comma + 1;
  }
  if (start < to) reader.innerBlock(start, to, 'paragraph');
}

function readImage(reader: InlineReader, { start, end, from, to }: Bare): void {
  reader.opaque(start, end);
  const alternative = alternativeText(reader.text, from, to);
  if (alternative) reader.innerBlock(alternative.start, alternative.end, 'alternativeText');
}

const ALTERNATIVE = /(?:^|,)\s*alt\s*=\s*(?:"([^"]*)"|([^,"]*))/d;

/** Where the alternative text stands in an image's list, by position or by name. */
export function alternativeText(text: string, from: number, to: number): { start: number; end: number } | undefined {
  const first = firstPositional(text, from, to, true);
  if (first) return first;
  const found = ALTERNATIVE.exec(text.slice(from, to));
  const at = found?.indices?.[1] ?? found?.indices?.[2];
  return at && { start: from + at[0], end: from + at[1] };
}
