// Under which key a term is looked up in our lists: case, spelling, hyphens, spaces and plural make no difference.
import { singularOf } from './plurals.js';
import { spellingKey } from './spelling.js';

/** The words of a term in lower case, split at spaces and hyphens. */
export function splitWords(term: string): string[] {
  return term
    .toLowerCase()
    .replaceAll('’', "'")
    .split(/[\s-]+/)
    .filter((word) => word !== '');
}

/** The same with the last one singular. */
export function plainWords(term: string): string[] {
  const words = splitWords(term);
  const last = words.pop();
  return last === undefined ? [] : [...words, singularOf(last)];
}

/** The same, and all in one spelling. */
function termWords(term: string): string[] {
  return plainWords(term).map(spellingKey);
}

/** One key for all forms of a term: "Drop-down lists" and "dropdown list" → "dropdownlist". */
export function termKey(term: string): string {
  return termWords(term).join('');
}
