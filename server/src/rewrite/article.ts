// *A* or *an*: by the sound that the next word begins with.
import { SPOKEN_AS_WORDS, SPOKEN_EITHER_WAY, SPOKEN_NAMES } from './data/spokenForms.js';

export type Article = 'a' | 'an';

/** Letters whose English names begin with a vowel sound (an F, an S3 bucket, an x-axis). */
const VOWEL_NAMES = /^[AEFHILMNORSX]/i;
const SILENT_H = /^(?:hono(?:u?r|rar)|hones|hour|heir(?!o))/;

/** A *u* or *eu* spoken "you", and *one*, *once*: a user, a unique key, a European site, a one-time password. */
const CONSONANT_VOWELS =
  /^(?:eu(?!ler|ch)|ew[^b]|one(?:$|[^ir])|once|oui|ouag|uni|unanim|us[aeiu]|ut[aeio]|ubi|ug[ar]|uk[aeiru]|ur[aeiou]|uku|uvu|ufo)/;
/** *Un-* before a word in *i*: an unimportant, an uninstalled, an unidentified thing. */
const NEGATED = /^un(?:im(?:p|ag|m)|in|ident|idio|iss|illum|iron)/;
const EITHER = /^(?:herb(?:s|al|als|aceous|alists?)?|homages?)$/;

/**
 * The articles that a phrase may take: one, or both where usage is divided (an SQL / a SQL), the likelier first.
 * The rules are those of general practice, without a single source; the exceptions are closed lists.
 */
export function articlesFor(phrase: string): readonly Article[] {
  const word = /[\p{L}\p{N}][\p{L}\p{N}\p{M}'’]*/u.exec(phrase)?.[0];
  if (word === undefined) return ['a', 'an'];
  if (/^\d/.test(word)) return [numberArticle(word)];
  const lower = word.toLowerCase();
  const named = SPOKEN_NAMES.get(lower.replace(/s$/, '')) ?? SPOKEN_NAMES.get(lower);
  if (named !== undefined) return [named === 'vowel' ? 'an' : 'a'];
  if (word.length === 1 || /^\p{L}\d/u.test(word)) return [letterArticle(word)];
  if (/^\p{Lu}[\p{Lu}\d]+(?:s|es)?$/u.test(word)) return capitalsArticles(word.replace(/e?s$/, ''));
  // mTLS, xHTML: a small letter before capitals is spoken by its name; iOS and eBPF likewise.
  if (/^\p{Ll}\p{Lu}/u.test(word)) return [letterArticle(word)];
  if (/^[b-df-hj-np-tv-xz]+$/.test(lower)) return [letterArticle(word)];
  return EITHER.test(lower) ? ['an', 'a'] : [wordArticle(lower)];
}

/** The likelier article for a phrase. */
export function articleFor(phrase: string): Article {
  return articlesFor(phrase)[0]!;
}

function letterArticle(word: string): Article {
  return VOWEL_NAMES.test(word) ? 'an' : 'a';
}

function capitalsArticles(word: string): readonly Article[] {
  if (SPOKEN_EITHER_WAY.has(word)) return [letterArticle(word), letterArticle(word) === 'an' ? 'a' : 'an'];
  if (SPOKEN_AS_WORDS.has(word)) return [wordArticle(word.toLowerCase())];
  // Long runs of capitals with vowels are words in capitals, short ones are spelt out.
  if (word.length > 5 && /[AEIOUY]/.test(word)) return [wordArticle(word.toLowerCase())];
  return [letterArticle(word)];
}

/** 8, 11, 18, 80 to 89, 800, 8 000, 11 000, 18 500 … begin with a vowel sound. */
function numberArticle(word: string): Article {
  const digits = /^\d+/.exec(word)![0];
  if (digits.startsWith('8')) return 'an';
  return /^1[18]$/.test(digits.slice(0, 2)) && digits.length % 3 === 2 ? 'an' : 'a';
}

function wordArticle(lower: string): Article {
  if (SILENT_H.test(lower)) return 'an';
  // XPath, Xbox: the letter's name; xylophone: a "z". Yttrium, Yves: an "i".
  if (/^(?:x[^aeiouy]|y[^aeiou])/.test(lower)) return 'an';
  if (!/^[aeiou\u00e0-\u00ef\u00f2-\u00fc]/.test(lower)) return 'a';
  return CONSONANT_VOWELS.test(lower) && !NEGATED.test(lower) ? 'a' : 'an';
}
