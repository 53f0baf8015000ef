// Words of grammar in many languages: English by our own closed list, others by lists of stop words.
import stopWords from 'stopwords-iso';
import { isFunctionWord } from './functionWords.js';

const LISTS = stopWords as Readonly<Record<string, readonly string[]>>;
const known = new Map<string, ReadonlySet<string>>();
const NONE: ReadonlySet<string> = new Set();

/**
 * True for a word that carries grammar rather than content in a language. Where no list is known, no word does.
 * @param word in lower case
 * @param language BCP 47 primary subtag
 */
export function isStopWord(word: string, language: string): boolean {
  return language === 'en' ? isFunctionWord(word) : listOf(language).has(word);
}

/** True for a language whose stop words are known. */
export function hasStopWords(language: string): boolean {
  return language === 'en' || listOf(language).size > 0;
}

function listOf(language: string): ReadonlySet<string> {
  let list = known.get(language);
  if (list === undefined) {
    list = Object.hasOwn(LISTS, language) ? new Set(LISTS[language]) : NONE;
    known.set(language, list);
  }
  return list;
}
