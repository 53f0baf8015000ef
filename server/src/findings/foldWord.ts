// How the matcher reads characters: which belong to a word, and their case-folded unit.

/** For ASCII: the folded unit of a word character, 0 for any other. Words are letters, digits and the underscore. */
export const ASCII_FOLD = new Uint8Array(128);
for (let unit = 0; unit < 128; unit++) {
  if ((unit >= 97 && unit <= 122) || (unit >= 48 && unit <= 57) || unit === 95) ASCII_FOLD[unit] = unit;
  else if (unit >= 65 && unit <= 90) ASCII_FOLD[unit] = unit + 32;
}

const UNKNOWN = 0;
const WORD = 1;
const OTHER = 2;
const kinds = new Uint8Array(0x10000);
const WORD_CHARACTER = /[\p{L}\p{M}\p{N}\p{Pc}]/u;

/** True where a character belongs to a word: letters, marks, numbers, connectors. */
export function isWordPoint(point: number): boolean {
  if (point < 128) return ASCII_FOLD[point]! !== 0;
  if (point > 0xffff) return WORD_CHARACTER.test(String.fromCodePoint(point));
  if (kinds[point] === UNKNOWN) kinds[point] = WORD_CHARACTER.test(String.fromCharCode(point)) ? WORD : OTHER;
  return kinds[point] === WORD;
}

/** True where the unit at `at` belongs to a word; either half of a surrogate pair stands for the pair. */
export function isWordUnit(text: string, at: number): boolean {
  const unit = text.charCodeAt(at);
  if (unit < 0xd800 || unit > 0xdfff) return isWordPoint(unit);
  const point = text.codePointAt(unit >= 0xdc00 ? at - 1 : at);
  return point !== undefined && point > 0xffff && isWordPoint(point);
}

/** The folded spelling of a word that has units beyond ASCII: lower case without locale, canonically composed. */
export function foldSlow(word: string): string {
  return word.toLowerCase().normalize('NFC');
}

/** The folded spelling of any text by the matcher's rules, with white space runs as one space. */
export function foldText(text: string): string {
  return foldSlow(text)
    .replace(/\s+/g, ' ')
    .replace(/\u2019/g, "'")
    .replace(/[\u2010\u2011]/g, '-');
}
