// Under which key a term is looked up in our lists: case, spelling, hyphens, spaces and plural make no difference.
import { singularOf } from './plurals.js';
import { spellingKey } from './spelling.js';

/** The words of a term in lower case and one spelling, split at spaces and hyphens, the last one singular. */
export function termWords(term: string): string[] {
  const words = term
    .toLowerCase()
    .replaceAll('’', "'")
    .split(/[\s-]+/)
    .filter((word) => word !== '')
    .map(spellingKey);
  const last = words.pop();
  return last === undefined ? [] : [...words, singularOf(last)];
}

/** One key for all forms of a term: "Drop-down lists" and "dropdown list" → "dropdownlist". */
export function termKey(term: string): string {
  return termWords(term).join('');
}
