// What a line of a body may begin with: list marks, field marks, options, adornments (docutils, "reStructuredText Markup Specification").
import type { Lines } from './lines.js';
import { isBlank } from './lines.js';

const ENUMERATOR = /(\()?(?:(\d{1,9})|([ivxlcdm]{2,15}|[IVXLCDM]{2,15})|([a-zA-Z])|(#))([.)])/y;
const OPTION =
  /^(?:[-+][a-zA-Z0-9](?: ?(?:[a-zA-Z][\w-]*|<[^<>]+>))?|(?:--|\/)[a-zA-Z0-9][\w-]*(?:[ =](?:[a-zA-Z][\w-]*|<[^<>]+>))?)(?:, (?:[-+][a-zA-Z0-9](?: ?(?:[a-zA-Z][\w-]*|<[^<>]+>))?|(?:--|\/)[a-zA-Z0-9][\w-]*(?:[ =](?:[a-zA-Z][\w-]*|<[^<>]+>))?))*(?= {2}|$)/;
const LONGEST_OPTION = 300;
const BULLETS = '-+*•‣⁃';

/** True where a mark that ends at `end` is followed by a blank or by nothing on its line. */
function stands(text: string, end: number, lineEnd: number): boolean {
  return end === lineEnd || (end < lineEnd && isBlank(text.charCodeAt(end)));
}

/** The end of the bullet at the start of a line, or -1. */
export function bulletEnd(text: string, at: number, lineEnd: number): number {
  return BULLETS.includes(text[at]!) && stands(text, at + 1, lineEnd) ? at + 1 : -1;
}

/** The end of the mark of an enumerated item that begins on `line`, or -1. */
export function enumeratorEnd(text: string, lines: Lines, line: number, to: number, base: number): number {
  const mark = enumerator(text, lines.at[line]!, lines.end[line]!);
  if (!mark) return -1;
  const next = line + 1;
  if (next >= to || lines.isBlank(next) || lines.column[next]! > base) return mark.end;
  // A line that goes on at the margin is a list item only if another item begins there.
  const following = enumerator(text, lines.at[next]!, lines.end[next]!);
  return following && following.form === mark.form && mayFollow(mark, following) ? mark.end : -1;
}

interface Enumerator {
  readonly end: number;
  /** The punctuation around the ordinal. */
  readonly form: string;
  readonly ordinal: string;
  readonly kind: 'arabic' | 'roman' | 'letter' | 'auto';
}

function enumerator(text: string, at: number, lineEnd: number): Enumerator | undefined {
  ENUMERATOR.lastIndex = at;
  const match = ENUMERATOR.exec(text);
  if (!match) return undefined;
  const [all, open = '', arabic, roman, letter, auto, close] = match;
  const end = at + all.length;
  if ((open === '(') !== (close === ')') && open === '(') return undefined;
  if (!stands(text, end, lineEnd)) return undefined;
  const kind =
    arabic !== undefined ? 'arabic' : roman !== undefined ? 'roman' : letter !== undefined ? 'letter' : 'auto';
  return { end, form: open + close!, ordinal: arabic ?? roman ?? letter ?? auto!, kind };
}

function mayFollow(first: Enumerator, second: Enumerator): boolean {
  if (second.kind === 'auto') return true;
  if (first.kind === 'arabic') return second.kind === 'arabic' && Number(second.ordinal) === Number(first.ordinal) + 1;
  const roman = /^[ivxlcdm]+$/i;
  if (roman.test(first.ordinal) && roman.test(second.ordinal) && first.ordinal !== second.ordinal) {
    return (first.ordinal === first.ordinal.toLowerCase()) === (second.ordinal === second.ordinal.toLowerCase());
  }
  if (first.kind !== 'letter' || second.kind !== 'letter') return false;
  return second.ordinal.charCodeAt(0) === first.ordinal.charCodeAt(0) + 1;
}

/** The offset of the colon that ends the field mark at the start of a line, or -1. */
export function fieldMarkEnd(text: string, at: number, lineEnd: number): number {
  if (text.charCodeAt(at) !== 58 || at + 1 >= lineEnd) return -1;
  const first = text.charCodeAt(at + 1);
  if (first === 58 || isBlank(first)) return -1;
  for (let i = at + 1; i < lineEnd; i++) {
    const unit = text.charCodeAt(i);
    if (unit === 92) i++;
    else if (unit === 58) {
      if (i + 1 < lineEnd && text.charCodeAt(i + 1) === 96) return -1;
      if (stands(text, i + 1, lineEnd)) return isBlank(text.charCodeAt(i - 1)) ? -1 : i;
    }
  }
  return -1;
}

/** The end of the options (`-a, --all=FILE`) at the start of a line, or -1. */
export function optionsEnd(text: string, at: number, lineEnd: number): number {
  const match = OPTION.exec(text.slice(at, Math.min(lineEnd, at + LONGEST_OPTION)));
  return match ? at + match[0].length : -1;
}

/** True for the punctuation that adorns titles: ASCII's without letters, digits and blanks. */
export function isAdorning(unit: number): boolean {
  return (unit > 32 && unit < 48) || (unit > 57 && unit < 65) || (unit > 90 && unit < 97) || (unit > 122 && unit < 127);
}

/** True where the line is one mark of punctuation, repeated. */
export function isAdornment(text: string, at: number, end: number): boolean {
  const unit = text.charCodeAt(at);
  if (at >= end || !isAdorning(unit)) return false;
  for (let i = at + 1; i < end; i++) if (text.charCodeAt(i) !== unit) return false;
  return true;
}
