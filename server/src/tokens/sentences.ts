// Finds where sentences start among scanned tokens: by terminal punctuation, what follows it and what stands before it.
import { CharClass, classAt } from './charClass.js';
import { NUMBERED_ABBREVIATIONS, STOPPED_ABBREVIATIONS } from './closedWords.js';
import { TokenKind, type TokenColumns } from './tokenColumns.js';
import { TokenFlag } from './tokens.js';

/** Sets the sentence-start flag of each token that opens a sentence; the block's first token always does. */
export function markSentenceStarts(text: string, columns: TokenColumns): void {
  const { length, flags } = columns;
  if (length === 0) return;
  let start = 0;
  flags[0]! |= TokenFlag.sentenceStart;
  for (let row = 0; row < length - 1; row++) {
    const strength = terminal(text, columns, row, start);
    if (strength === Terminal.none) continue;
    let next = row + 1;
    while (next < length && closes(text, columns, next)) next++;
    if (next >= length) return;
    const spaced = (flags[next]! & TokenFlag.spaceBefore) !== 0;
    if ((spaced || strength === Terminal.wide) && opens(text, columns, next, strength)) {
      flags[next]! |= TokenFlag.sentenceStart;
      start = next;
    }
    row = next - 1;
  }
}

const Terminal = { none: 0, stop: 1, abbreviation: 2, wide: 3 } as const;

function terminal(text: string, columns: TokenColumns, row: number, sentence: number): number {
  const { start, end, kind } = columns;
  if (kind[row] === TokenKind.word) {
    const dotted = text.charCodeAt(end[row]! - 1) === 0x2e;
    if (!dotted) return Terminal.none;
    return STOPPED_ABBREVIATIONS.has(text.slice(start[row], end[row]! - 1).toLowerCase())
      ? Terminal.none
      : Terminal.abbreviation;
  }
  if (kind[row] !== TokenKind.punctuation) return Terminal.none;
  switch (text.charCodeAt(start[row]!)) {
    case 0x21:
    case 0x3f:
    case 0x2026:
    case 0x203d:
      return Terminal.stop;
    case 0x3002:
    case 0xff01:
    case 0xff1f:
    case 0x0964:
      return Terminal.wide;
    case 0x2e:
      return stopAfter(text, columns, row, sentence);
    default:
      return Terminal.none;
  }
}

/** What a full stop means by the word that it follows without a space. */
function stopAfter(text: string, columns: TokenColumns, row: number, sentence: number): number {
  const { start, end, kind, flags } = columns;
  const before = row - 1;
  if (end[row]! - start[row]! > 1) return Terminal.stop;
  if (before < 0 || end[before] !== start[row]) return before < 0 ? Terminal.none : Terminal.stop;
  const length = end[before]! - start[before]!;
  if (kind[before] === TokenKind.number) {
    // "1. Do this": the number of a list item, not a sentence.
    return before === sentence && length <= 3 ? Terminal.none : Terminal.stop;
  }
  if (kind[before] !== TokenKind.word || length > 6) return Terminal.stop;
  if (length === 1) return isInitial(text, columns, before, sentence) ? Terminal.none : Terminal.stop;
  const word = text.slice(start[before], end[before]).toLowerCase();
  if (STOPPED_ABBREVIATIONS.has(word)) return Terminal.none;
  const next = row + 1;
  if (NUMBERED_ABBREVIATIONS.has(word) && next < columns.length && kind[next] === TokenKind.number) {
    return (flags[next]! & TokenFlag.spaceBefore) !== 0 ? Terminal.none : Terminal.stop;
  }
  return Terminal.stop;
}

/** A single capital before a stop is an initial at a sentence's start or after a capitalised word; "plan B." is not. */
function isInitial(text: string, columns: TokenColumns, row: number, sentence: number): boolean {
  const char = text.charAt(columns.start[row]!);
  if (char === 'I' || char === char.toLowerCase()) return row === sentence;
  if (row === sentence) return true;
  return isCapital(text, columns.start[row - 1]!);
}

function isCapital(text: string, at: number): boolean {
  const char = text.charAt(at);
  return char !== char.toLowerCase();
}

/** True for closing quotation marks and brackets, which belong to the sentence that ends. */
function closes(text: string, columns: TokenColumns, row: number): boolean {
  if (columns.kind[row] !== TokenKind.punctuation) return false;
  const unit = text.charCodeAt(columns.start[row]!);
  if (unit === 0x29 || unit === 0x5d || unit === 0x7d || unit === 0x201d || unit === 0xbb) return true;
  if (unit === 0x300d || unit === 0xff09) return true;
  const spaced = (columns.flags[row]! & TokenFlag.spaceBefore) !== 0;
  return !spaced && (unit === 0x22 || unit === 0x27 || unit === 0x2019 || unit === 0x21 || unit === 0x3f);
}

/** True where a token may open a sentence: a capital, a number, code, an opening bracket or quotation mark. */
function opens(text: string, columns: TokenColumns, row: number, strength: number): boolean {
  const at = columns.start[row]!;
  switch (columns.kind[row]) {
    case TokenKind.word:
      if (strength === Terminal.wide || classAt(text, at) === CharClass.unspaced) return true;
      return isCapital(text, at) || (strength === Terminal.stop && startsNoCase(text, at));
    case TokenKind.identifier:
    case TokenKind.number:
    case TokenKind.opaque:
      return strength !== Terminal.abbreviation;
    case TokenKind.punctuation: {
      if (strength === Terminal.abbreviation) return false;
      const unit = text.charCodeAt(at);
      return unit !== 0x2c && unit !== 0x3b && unit !== 0x3a && unit !== 0x2e && unit !== 0x29 && unit !== 0x2f;
    }
    default:
      return strength !== Terminal.abbreviation;
  }
}

/** A letter of a script that has no capitals, such as Arabic or Hebrew. */
function startsNoCase(text: string, at: number): boolean {
  const char = text.charAt(at);
  return char.toLowerCase() === char.toUpperCase();
}
