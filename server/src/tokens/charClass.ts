// What a code unit is to the word scanner: one small number a unit, computed once.

/** Classes of code points. `unknown` marks a unit that has not been looked at. */
export const CharClass = {
  unknown: 0,
  space: 1,
  letter: 2,
  digit: 3,
  mark: 4,
  invisible: 5,
  opaque: 6,
  hyphen: 7,
  apostrophe: 8,
  dot: 9,
  slash: 10,
  underscore: 11,
  punctuation: 12,
  symbol: 13,
  /** A letter of a script written without spaces between words. */
  unspaced: 14,
  /** A high surrogate that begins a pair: the pair's own class has to be asked. */
  pair: 15,
} as const;

const LETTER = /^\p{L}$/u;
const NUMBER = /^\p{N}$/u;
const MARK = /^\p{M}$/u;
const PUNCTUATION = /^\p{P}$/u;
const SPACE = /^[\s\p{Z}]$/u;
const CONTROL = /^\p{Cc}$/u;
const FORMAT = /^\p{Cf}$/u;
const UNSPACED =
  /^[\p{Script=Han}\p{Script=Hiragana}\p{Script=Katakana}\p{Script=Thai}\p{Script=Lao}\p{Script=Khmer}\p{Script=Myanmar}\u30FC\uFF70]$/u;

const table = new Uint8Array(0x10000);
const pairs = new Map<number, number>();
const MOST_PAIRS = 4096;

/** The class of the code unit at an offset; {@link CharClass.pair} where a whole surrogate pair starts. */
export function classAt(text: string, offset: number): number {
  const unit = text.charCodeAt(offset);
  const known = table[unit]!;
  if (known !== CharClass.unknown) return known;
  if (unit >= 0xd800 && unit <= 0xdfff) return isPair(text, offset) ? CharClass.pair : CharClass.symbol;
  return (table[unit] = classify(String.fromCharCode(unit), unit));
}

/** The class of the pair of surrogates at an offset. */
export function pairClassAt(text: string, offset: number): number {
  const code = text.codePointAt(offset)!;
  const known = pairs.get(code);
  if (known !== undefined) return known;
  if (pairs.size >= MOST_PAIRS) pairs.clear();
  const found = classify(String.fromCodePoint(code), code);
  pairs.set(code, found);
  return found;
}

/** The class of the code point at an offset, pairs looked through. */
export function pointClassAt(text: string, offset: number): number {
  const found = classAt(text, offset);
  return found === CharClass.pair ? pairClassAt(text, offset) : found;
}

/** True where a letter, a digit or an underscore starts at the offset. */
export function isWordAt(text: string, offset: number): boolean {
  const found = pointClassAt(text, offset);
  return found === CharClass.letter || found === CharClass.digit || found === CharClass.underscore;
}

function isPair(text: string, offset: number): boolean {
  const unit = text.charCodeAt(offset);
  if (unit > 0xdbff || offset + 1 >= text.length) return false;
  const next = text.charCodeAt(offset + 1);
  return next >= 0xdc00 && next <= 0xdfff;
}

function classify(char: string, code: number): number {
  switch (code) {
    case 0xfffc:
      return CharClass.opaque;
    case 0x2d:
    case 0x2010:
    case 0x2011:
      return CharClass.hyphen;
    case 0x27:
    case 0x2019:
      return CharClass.apostrophe;
    case 0x2e:
      return CharClass.dot;
    case 0x2f:
      return CharClass.slash;
    case 0x5f:
      return CharClass.underscore;
    case 0xad:
    case 0xfeff:
      return CharClass.invisible;
  }
  if (SPACE.test(char) || CONTROL.test(char)) return CharClass.space;
  if (UNSPACED.test(char))
    return LETTER.test(char) ? CharClass.unspaced : NUMBER.test(char) ? CharClass.digit : markOr(char);
  if (LETTER.test(char)) return CharClass.letter;
  if (NUMBER.test(char)) return CharClass.digit;
  if (FORMAT.test(char)) return CharClass.invisible;
  return markOr(char);
}

function markOr(char: string): number {
  if (MARK.test(char)) return CharClass.mark;
  return PUNCTUATION.test(char) ? CharClass.punctuation : CharClass.symbol;
}
