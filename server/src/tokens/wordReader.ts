// Reads one word from its first unit to its last: which signs join its parts, and what kind of word it makes.
import { CharClass, classAt, isWordAt, pairClassAt } from './charClass.js';
import { IS_CONTRACTIONS } from './closedWords.js';
import { isPath, pathEnd, trimmedEnd } from './paths.js';
import { isCamel, isQuantity, isUpper, touchesDigit } from './wordShape.js';
import { TokenKind } from './tokenColumns.js';
import { TokenFlag } from './tokens.js';

const COLON = 0x3a;
const COMMA = 0x2c;
const PLUS = 0x2b;
const HASH = 0x23;
const AT = 0x40;
const AMPERSAND = 0x26;
const EQUALS = 0x3d;
const BACKSLASH = 0x5c;
const LEFT_PARENTHESIS = 0x28;
const RIGHT_PARENTHESIS = 0x29;

/** Signs that end a word wherever they end a run: , . ; : ! ? ) " */
const CLOSING = new Set([0x2c, 0x2e, 0x3b, 0x3a, 0x21, 0x3f, 0x29, 0x22]);

/** Reads words of the text it was given; the result of a reading stands in its fields until the next. */
export class WordReader {
  /** The offset after the word. */
  end = 0;
  /** The offset after the word and a possessive ending. */
  next = 0;
  /** Token flags, all but the sentence's and the space's. */
  flags = 0;
  kind: number = TokenKind.word;

  private text = '';
  /** Slashes before this offset are known to separate words. */
  private plainSlashesUntil = 0;

  private letters = false;
  private digits = false;
  /** A sign was met that words of prose do not have inside: the whole is an identifier. */
  private code = false;
  private invisible = false;

  /** Takes a new text. */
  begin(text: string): void {
    this.text = text;
    this.plainSlashesUntil = 0;
  }

  /** Reads the word that starts at an offset of an unbroken run which ends at `to`. */
  read(from: number, to: number, quoteOpen: boolean): void {
    this.letters = this.digits = this.code = this.invisible = false;
    this.flags = 0;
    let at = plainWordEnd(this.text, from, to);
    if (at > from) {
      this.letters = true;
      if (this.endsPlainly(at, to)) return;
    } else at = this.skipPrefix(from, to);
    while (at < to) {
      const step = this.advance(from, at, to);
      if (step === 0) break;
      at += step;
    }
    this.end = this.next = at;
    if (this.isDottedAbbreviation(from, at, to)) {
      this.code = false;
      this.end = this.next = at + 1;
    } else this.takePossessive(from, at, to, quoteOpen);
    this.settle(from, to);
  }

  /** Settles a word of mere letters that nothing but one closing sign follows, as most words are. */
  private endsPlainly(at: number, to: number): boolean {
    if (at < to && (at + 1 < to || !CLOSING.has(this.text.charCodeAt(at)))) return false;
    this.end = this.next = at;
    this.kind = TokenKind.word;
    this.flags = TokenFlag.word;
    return true;
  }

  /** Passes the signs that open an identifier or a signed number. */
  private skipPrefix(from: number, to: number): number {
    const { text } = this;
    let at = from;
    while (at < to && isPrefixSign(text, at)) at++;
    if (at > from) this.code = at - from > 1 || !isSign(text.charCodeAt(from)) || classAt(text, at) !== CharClass.digit;
    return at;
  }

  /** How many units from `at` on belong to the word: 0 where it ends. */
  private advance(from: number, at: number, to: number): number {
    const { text } = this;
    let found = classAt(text, at);
    let width = 1;
    if (found === CharClass.pair) {
      found = pairClassAt(text, at);
      width = 2;
    }
    switch (found) {
      case CharClass.letter:
        this.letters = true;
        return width;
      case CharClass.digit:
        this.digits = true;
        return width;
      case CharClass.mark:
        return width;
      case CharClass.invisible:
        return this.overInvisible(at, to);
      case CharClass.underscore:
        this.code = true;
        return 1;
      case CharClass.hyphen:
        return this.wordFollows(at + 1, to) ? 1 : 0;
      case CharClass.apostrophe:
        return this.overApostrophe(from, at, to);
      case CharClass.dot:
        if (!this.wordFollows(at + 1, to)) return 0;
        if (this.letters || classAt(text, at + 1) !== CharClass.digit) this.code = true;
        return 1;
      case CharClass.slash:
        return this.overSlash(from, at, to);
      case CharClass.punctuation:
      case CharClass.symbol:
        return this.overSign(from, at, to);
      default:
        return 0;
    }
  }

  /** Soft hyphens and zero-width characters count only between units of the word. */
  private overInvisible(at: number, to: number): number {
    const { text } = this;
    let end = at + 1;
    while (end < to && classAt(text, end) === CharClass.invisible) end++;
    if (end >= to) return 0;
    const found = classAt(text, end);
    const inside =
      found === CharClass.pair || (found >= CharClass.letter && found <= CharClass.mark) || found === CharClass.hyphen;
    if (!inside || !this.wordFollows(found === CharClass.hyphen ? end + 1 : end, to)) return 0;
    this.invisible = true;
    return end - at;
  }

  private overApostrophe(from: number, at: number, to: number): number {
    if (at + 1 >= to || classAt(this.text, at + 1) !== CharClass.letter) return 0;
    if (!this.isPossessiveEnding(at, to)) return 1;
    return IS_CONTRACTIONS.has(this.text.slice(from, at).toLowerCase()) ? 2 : 0;
  }

  /** True where `'s` stands at the offset and no unit of a word after it. */
  private isPossessiveEnding(at: number, to: number): boolean {
    const { text } = this;
    if (at + 1 >= to || (text.charCodeAt(at + 1) | 0x20) !== 0x73) return false;
    return at + 2 >= to || !isWordAt(text, at + 2);
  }

  /** A slash joins a path (`a/b.txt`, `src/`), and single letters (`I/O`, `A/B`); elsewhere it separates. */
  private overSlash(from: number, at: number, to: number): number {
    const { text } = this;
    if (this.code && at > from && this.isPathFrom(from)) return 1;
    if (at < this.plainSlashesUntil) return 0;
    if (at - from === 1 && this.letters && at + 1 < to && classAt(text, at + 1) === CharClass.letter) {
      const ends = at + 2 >= to || (!isWordAt(text, at + 2) && classAt(text, at + 2) !== CharClass.slash);
      if (ends) return 1;
    }
    if (!this.letters && this.wordFollows(at + 1, to)) return 0;
    const end = pathEnd(text, at, to);
    if (isPath(text, from, at, end)) {
      this.code = true;
      return end - at;
    }
    this.plainSlashesUntil = end;
    return 0;
  }

  private isPathFrom(from: number): boolean {
    const found = classAt(this.text, from);
    return found === CharClass.slash || found === CharClass.dot || this.text.charCodeAt(from) === 0x7e;
  }

  private overSign(from: number, at: number, to: number): number {
    const { text } = this;
    const next = at + 1 < to ? classAt(text, at + 1) : CharClass.space;
    switch (text.charCodeAt(at)) {
      case COMMA:
        return !this.letters && next === CharClass.digit && this.digits ? 1 : 0;
      case COLON:
        return this.overColon(from, at, to, next);
      case AT:
        if (next !== CharClass.letter && next !== CharClass.digit) return 0;
        this.code = true;
        return 1;
      case EQUALS:
        return classAt(text, from) === CharClass.hyphen && this.code && this.wordFollows(at + 1, to) ? 1 : 0;
      case BACKSLASH:
        if (next !== CharClass.letter && next !== CharClass.digit) return 0;
        this.code = true;
        return 1;
      case AMPERSAND:
        return next === CharClass.letter && at - from <= 3 && isUpper(text, from) && isUpper(text, at + 1) ? 1 : 0;
      case PLUS: {
        const twice = at + 1 < to && text.charCodeAt(at + 1) === PLUS;
        return twice && this.letters && !(at + 2 < to && isWordAt(text, at + 2)) ? 2 : 0;
      }
      case HASH:
        return at - from === 1 && isUpper(text, from) && !this.wordFollows(at + 1, to) ? 1 : 0;
      default:
        return 0;
    }
  }

  /** A colon joins times (`10:30`), ports (`host:80`), scopes (`a::b`) and addresses (`https://…`). */
  private overColon(from: number, at: number, to: number, next: number): number {
    const { text } = this;
    if (next === CharClass.digit) {
      if (this.letters) this.code = true;
      return 1;
    }
    if (!this.letters) return 0;
    const after = at + 2 < to ? classAt(text, at + 2) : CharClass.space;
    if (next === CharClass.slash && after === CharClass.slash) {
      this.code = true;
      return trimmedEnd(text, at + 3, to) - at;
    }
    if (at - from === 1 && at + 2 < to && text.charCodeAt(at + 1) === BACKSLASH) {
      this.code = true;
      return trimmedEnd(text, at + 2, to) - at;
    }
    if (at + 1 < to && text.charCodeAt(at + 1) === COLON && after === CharClass.letter) {
      this.code = true;
      return 2;
    }
    return 0;
  }

  private wordFollows(at: number, to: number): boolean {
    return at < to && isWordAt(this.text, at);
  }

  /** `e.g.`, `U.S.`: single letters with a stop after each, the last stop included. */
  private isDottedAbbreviation(from: number, at: number, to: number): boolean {
    const { text } = this;
    const length = at - from;
    if (length < 3 || length > 9 || length % 2 === 0 || at >= to || classAt(text, at) !== CharClass.dot) return false;
    for (let k = from; k < at; k++) {
      if (classAt(text, k) !== ((k - from) % 2 === 0 ? CharClass.letter : CharClass.dot)) return false;
    }
    return true;
  }

  private takePossessive(from: number, at: number, to: number, quoteOpen: boolean): void {
    const { text } = this;
    if (at >= to || classAt(text, at) !== CharClass.apostrophe || at === from) return;
    if (this.isPossessiveEnding(at, to)) {
      this.next = at + 2;
      this.flags |= TokenFlag.possessive;
    } else if (!quoteOpen && this.letters && (text.charCodeAt(at - 1) | 0x20) === 0x73) {
      this.next = at + 1;
      this.flags |= TokenFlag.possessive;
    }
  }

  private settle(from: number, to: number): void {
    const { text, end } = this;
    if (this.invisible) this.flags |= TokenFlag.invisible;
    if (this.code) {
      this.kind = TokenKind.identifier;
      this.flags |= TokenFlag.identifier;
    } else if (!this.letters || isQuantity(text, from, end)) {
      this.kind = TokenKind.number;
    } else {
      this.kind = TokenKind.word;
      this.flags |= TokenFlag.word;
      if (this.isCodeLike(from, to)) this.flags |= TokenFlag.identifier;
    }
  }

  /** Camel case, a digit touching a letter, or an empty call `()` after the word. */
  private isCodeLike(from: number, to: number): boolean {
    const { text, end } = this;
    if (end + 1 < to && text.charCodeAt(end) === LEFT_PARENTHESIS && text.charCodeAt(end + 1) === RIGHT_PARENTHESIS)
      return true;
    if (this.digits && touchesDigit(text, from, end)) return true;
    return isCamel(text, from, end);
  }
}

/** The end of the small ASCII letters, after a first letter in any case. */
function plainWordEnd(text: string, from: number, to: number): number {
  const first = text.charCodeAt(from) | 0x20;
  if (first < 0x61 || first > 0x7a) return from;
  let at = from + 1;
  for (; at < to; at++) {
    const unit = text.charCodeAt(at);
    if (unit < 0x61 || unit > 0x7a) break;
  }
  return at;
}

function isPrefixSign(text: string, at: number): boolean {
  const found = classAt(text, at);
  if (
    found === CharClass.dot ||
    found === CharClass.hyphen ||
    found === CharClass.slash ||
    found === CharClass.underscore
  )
    return true;
  const unit = text.charCodeAt(at);
  return unit === AT || unit === HASH || unit === 0x24 || unit === 0x7e || unit === PLUS;
}

function isSign(unit: number): boolean {
  return unit === PLUS || unit === 0x2d || unit === 0x2010 || unit === 0x2011;
}
