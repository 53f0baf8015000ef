// The word scanner: cuts a block's text into tokens as a writer sees words, with exact offsets, in one pass.
import { CharClass, classAt, pairClassAt, pointClassAt } from './charClass.js';
import { WordReader } from './wordReader.js';
import { type TokenColumns, TokenKind } from './tokenColumns.js';
import { TokenFlag } from './tokens.js';

/** Unbroken runs longer than this are marked: their tokens after the first are hidden from a tagger. */
export const LONGEST_SHOWN_RUN = 64;

const AT = 0x40;
const HASH = 0x23;
const DOLLAR = 0x24;
const PLUS = 0x2b;
const TILDE = 0x7e;
const LEFT_SINGLE_QUOTE = 0x2018;
const INVISIBLE = /\p{Cf}/u;

/** A scanner; it keeps no state from one text to the next. */
export class Scanner {
  private readonly word = new WordReader();
  /** A single quotation mark has opened and not closed: an apostrophe after a final s closes it. */
  private quoteOpen = false;

  /** Replaces the columns' rows by the tokens of the text; tags are left 0 (X). */
  scan(text: string, into: TokenColumns): void {
    into.clear();
    this.quoteOpen = false;
    this.word.begin(text);
    let at = 0;
    let spaced = false;
    const { length } = text;
    while (at < length) {
      const found = classAt(text, at);
      if (found === CharClass.space) {
        spaced = true;
        at++;
      } else if (found === CharClass.opaque) {
        into.add(at, at + 1, TokenKind.opaque, spaced ? TokenFlag.spaceBefore : 0);
        spaced = false;
        at++;
      } else {
        const end = runEnd(text, at);
        this.scanRun(text, at, end, spaced, into);
        spaced = false;
        at = end;
      }
    }
  }

  /** Scans an unbroken run, which holds neither white space nor an opaque unit. */
  private scanRun(text: string, from: number, to: number, spaced: boolean, into: TokenColumns): void {
    const firstRow = into.length;
    let at = from;
    let space = spaced ? TokenFlag.spaceBefore : 0;
    let fresh = true;
    while (at < to) {
      const row = into.length;
      const found = pointClassAt(text, at);
      if (found === CharClass.letter || found === CharClass.digit || this.opensWord(text, at, to, found, fresh)) {
        at = this.readWord(text, at, to, space, into);
        fresh = false;
      } else if (found === CharClass.unspaced) {
        const end = unspacedEnd(text, at, to);
        const invisible = INVISIBLE.test(text.slice(at, end)) ? TokenFlag.invisible : 0;
        into.add(at, end, TokenKind.word, space | TokenFlag.word | invisible);
        at = end;
        fresh = false;
      } else if (found === CharClass.invisible) {
        at += width(text, at);
        continue;
      } else {
        at = this.readSign(text, at, to, found, space, into);
      }
      if (into.length > row) space = 0;
    }
    if (to - from > LONGEST_SHOWN_RUN) into.inLongRun.fill(1, firstRow + 1, into.length);
  }

  private readWord(text: string, at: number, to: number, space: number, into: TokenColumns): number {
    const { word } = this;
    word.read(at, to, this.quoteOpen);
    let { flags } = word;
    const sign = word.end < to ? text.charCodeAt(word.end) : 0;
    if (sign === 0x2122 || sign === 0xae || sign === 0xa9) flags |= TokenFlag.trademark;
    into.add(at, word.end, word.kind, flags | space);
    return word.next;
  }

  /** True where a sign belongs to the word that it stands before: `.NET`, `--flag`, `/etc`, `@scope`, `$HOME`, `-5`. */
  private opensWord(text: string, at: number, to: number, found: number, fresh: boolean): boolean {
    if (at + 1 >= to) return false;
    const next = classAt(text, at + 1);
    if (found === CharClass.underscore) return next === CharClass.letter || next === CharClass.digit || next === found;
    if (!fresh) return false;
    switch (found) {
      case CharClass.dot:
        if (next === CharClass.letter || next === CharClass.slash) return true;
        return next === CharClass.dot && at + 2 < to && classAt(text, at + 2) === CharClass.slash;
      case CharClass.hyphen:
        if (next === CharClass.letter || next === CharClass.digit) return true;
        return next === CharClass.hyphen && at + 2 < to && classAt(text, at + 2) === CharClass.letter;
      case CharClass.slash:
        return next === CharClass.letter || next === CharClass.dot || next === CharClass.underscore;
      default:
        break;
    }
    const unit = text.charCodeAt(at);
    if (unit === AT || unit === HASH || unit === DOLLAR) return next === CharClass.letter;
    if (unit === PLUS) return next === CharClass.digit;
    return unit === TILDE && next === CharClass.slash;
  }

  /** Reads a run of one sign, or one emoji with all that is joined to it; returns the offset after it. */
  private readSign(text: string, at: number, to: number, found: number, space: number, into: TokenColumns): number {
    const unit = text.charCodeAt(at);
    if (unit === LEFT_SINGLE_QUOTE) this.quoteOpen = true;
    else if (found === CharClass.apostrophe) this.quoteOpen = !this.quoteOpen && opensQuote(text, at);
    const step = width(text, at);
    let end = at + step;
    if (step === 1) while (end < to && text.charCodeAt(end) === unit) end++;
    for (;;) {
      const glued = end < to ? pointClassAt(text, end) : CharClass.unknown;
      if (glued === CharClass.mark || glued === CharClass.invisible) end += width(text, end);
      else if (glued === CharClass.symbol && joinsEmoji(text, end)) end += width(text, end);
      else break;
    }
    const isSymbol = found === CharClass.symbol || found === CharClass.mark;
    into.add(at, end, isSymbol ? TokenKind.symbol : TokenKind.punctuation, space);
    return end;
  }
}

function runEnd(text: string, from: number): number {
  let at = from + 1;
  for (; at < text.length; at++) {
    const found = classAt(text, at);
    if (found === CharClass.space || found === CharClass.opaque) break;
  }
  return at;
}

/** The end of a run of letters without spaces; invisible characters count only between them. */
function unspacedEnd(text: string, from: number, to: number): number {
  let end = from;
  for (let at = from; at < to;) {
    const found = pointClassAt(text, at);
    const isInvisible = found === CharClass.invisible;
    if (found !== CharClass.unspaced && found !== CharClass.mark && !isInvisible) break;
    at += width(text, at);
    if (!isInvisible) end = at;
  }
  return end;
}

function width(text: string, at: number): number {
  return classAt(text, at) === CharClass.pair ? 2 : 1;
}

/** True where a symbol continues the emoji before it: after a zero-width joiner, or a skin tone. */
function joinsEmoji(text: string, at: number): boolean {
  if (text.charCodeAt(at - 1) === 0x200d) return true;
  if (classAt(text, at) !== CharClass.pair || pairClassAt(text, at) !== CharClass.symbol) return false;
  const code = text.codePointAt(at)!;
  return code >= 0x1f3fb && code <= 0x1f3ff;
}

function opensQuote(text: string, at: number): boolean {
  if (at === 0) return true;
  const before = classAt(text, at - 1);
  return before === CharClass.space || before === CharClass.punctuation;
}
