// The capitals of a replacement: as the words it replaces stood, at the start of a sentence, in a title, in capitals.
import { startsSentence } from './sentence.js';

/** Words that stay small inside a title. Common practice, no single source. */
const SMALL_WORDS = new Set('a an the and but or nor for of in on at by to from with as per via vs into'.split(' '));

/** True for a word whose capitals are its own: iOS, eBPF, PostgreSQL, API; it never follows the case around it. */
export function hasFixedCase(word: string): boolean {
  return (
    /\p{L}\p{Lu}/u.test(word) ||
    /^\p{Ll}\p{Lu}/u.test(word) ||
    /^[b-df-hj-np-tv-xz]{2,}$/.test(word) ||
    /[\p{L}\d]\.\p{L}|[_/]/u.test(word)
  );
}

/** The first letter as a capital, unless the first word has a case of its own. */
export function capitalise(text: string): string {
  const first = /^[^\s-]+/.exec(text)?.[0] ?? '';
  return hasFixedCase(first) ? text : text.charAt(0).toUpperCase() + text.slice(1);
}

/** Every word with a capital but the small ones; hyphenated parts too. */
export function titleCase(text: string): string {
  return text.replace(/[\p{L}\p{N}.'’]+/gu, (word, at: number) => {
    if (hasFixedCase(word) || (at > 0 && SMALL_WORDS.has(word.toLowerCase()))) return word;
    return word.charAt(0).toUpperCase() + word.slice(1);
  });
}

/** Everything in capitals but the words with a case of their own, save initialisms in the plural (APIs). */
export function allCapitals(text: string): string {
  return text.replace(/[\p{L}\p{N}.'’]+/gu, (word) => (/\p{Ll}\p{Lu}/u.test(word) ? word : word.toUpperCase()));
}

/** What a replacement is cased by. */
export interface CaseModel {
  /** The block's text before the edit, and the range that is replaced. */
  readonly text: string;
  readonly start: number;
  readonly end: number;
  /** The replaced term as its termbase writes it, in the form that stands in the text. */
  readonly written: string;
}

/** The replacement (in its termbase's writing) with the capitals that its place asks for. */
export function matchCase(replacement: string, { text, start, end, written }: CaseModel): string {
  const surface = text.slice(start, end);
  const letters = surface.replace(/[^\p{L}]/gu, '');
  if (letters.length > 1 && isCapitals(surface, written, text, start, end)) return allCapitals(replacement);
  const follows = /^\p{L}/u.test(surface) ? capitalsOfWords(surface) : [];
  const own = capitalsOfWords(written);
  // A later word that is capitalised here and small in the termbase: the writer wrote a title.
  const titled = follows.length > 1 && follows.slice(1).some((capital, k) => capital && own[k + 1] === false);
  if (titled) return titleCase(replacement);
  const raised = follows[0] === true && own[0] === false;
  if (startsSentence(text, start)) {
    const upper = raised || (own[0] === true && follows[0] === true);
    return upper ? (inTitle(text, start, end) ? titleCase(replacement) : capitalise(replacement)) : replacement;
  }
  if (raised || (follows[0] === true && inTitle(text, start, end))) {
    return inTitle(text, start, end) || follows.length === 1 ? titleCase(replacement) : capitalise(replacement);
  }
  return replacement;
}

function isCapitals(surface: string, written: string, text: string, start: number, end: number): boolean {
  if (/\p{Ll}/u.test(surface)) return false;
  // An initialism is in capitals anyway: the words around it tell.
  if (/\p{Ll}/u.test(written)) return /\p{Lu}/u.test(surface);
  const around = text.slice(0, start) + text.slice(end);
  const words = around.match(/\p{L}{2,}/gu) ?? [];
  return words.length > 1 && words.every((word) => word === word.toUpperCase() && word !== word.toLowerCase());
}

function capitalsOfWords(text: string): boolean[] {
  return (text.match(/[\p{L}\p{N}]+/gu) ?? []).map((word) => /^\p{Lu}/u.test(word));
}

/** True where the text is a title in capitals: no full stop, and every longer word behind the first has one, in the range as around it. */
function inTitle(text: string, start: number, end: number): boolean {
  if (/[.!?:;]\s*$/.test(text)) return false;
  const isSmall = (word: string): boolean => SMALL_WORDS.has(word.toLowerCase());
  const wordsOf = (part: string): string[] =>
    (part.match(/\p{L}[\p{L}\p{N}'’]*/gu) ?? []).filter((word) => !isSmall(word));
  if (wordsOf(text.slice(start, end)).some((word) => !/\p{Lu}/u.test(word))) return false;
  const before = wordsOf(text.slice(0, start));
  const around = [...before.slice(1), ...wordsOf(text.slice(end))];
  return around.length > 0 && around.length < 15 && [...before, ...around].every((word) => /\p{Lu}/u.test(word));
}
