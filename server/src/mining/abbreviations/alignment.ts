// Aligning a short form with the words that it may stand for, letter by letter.

/** Words that an abbreviation may pass over or take a letter of. */
const SMALL = new Set('a an the of and or for to in on at by with from per as vs via'.split(' '));

/** Marks a part that stands behind a hyphen: it is no small word of its own (single sign-on). */
export const JOINED = '-';

/** Words that begin with an x in abbreviations (Extensible Markup Language). */
const SOUNDS_X = /^ex|^cross|^trans/;

/**
 * Whether a short form is made of these words, each of which gives its first letter, small words save. The letters are
 * matched in order, a word may give more than its first; after Schwartz & Hearst 2003 (A simple algorithm for identifying
 * abbreviation definitions in biomedical text), but from left to right and with no content word left out.
 * @param letters the short form's letters and digits in lower case
 * @param words the parts of the long form in lower case, hyphens resolved, those behind one marked with {@link JOINED}
 */
export function aligns(letters: string, words: readonly string[]): boolean {
  if (words.length === 0 || SMALL.has(words[0]!) || SMALL.has(words[words.length - 1]!)) return false;
  return alignsFrom(letters, 0, words, 0);
}

function alignsFrom(letters: string, at: number, words: readonly string[], word: number): boolean {
  if (word === words.length) return at === letters.length;
  if (at === letters.length) return false;
  const part = words[word]!;
  const text = part.startsWith(JOINED) ? part.slice(1) : part;
  if (SMALL.has(part) && alignsFrom(letters, at, words, word + 1)) return true;
  const first = text[0]!;
  if (letters[at] !== first && !(letters[at] === 'x' && SOUNDS_X.test(text))) return false;
  // The rest of the word gives as many further letters as it can or as few: try every number of them.
  let inWord = 1;
  for (let taken = 1; ; taken++) {
    if (alignsFrom(letters, at + taken, words, word + 1)) return true;
    const next = letters[at + taken];
    if (next === undefined) return false;
    inWord = text.indexOf(next, inWord) + 1;
    if (inWord === 0) return false;
  }
}

/**
 * The number of words at the end of `words` that the short form is made of, or 0: the longest alignment within the bounds
 * of Schwartz & Hearst 2003, min(|A| + 5, 2 |A|) words.
 */
export function longestAlignment(letters: string, words: readonly (readonly string[])[]): number {
  const most = Math.min(letters.length + 5, letters.length * 2, words.length);
  for (let length = most; length > 0; length--) {
    const parts = words.slice(words.length - length).flat();
    if (parts.length > 1 && aligns(letters, parts)) return length;
  }
  return 0;
}
