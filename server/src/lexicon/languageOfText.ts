// The language of a text, told by its words of grammar and by its letters; no answer where that is not certain.
import { francAll } from 'franc';
import { hasStopWords, isStopWord } from './stopWords.js';

/** Fewest words of a text that is told; characters of scripts without spaces count as half a word each. */
const FEWEST_WORDS = 20;
/** No text of fewer UTF-16 units has so many words, in any script. */
const SHORTEST_TEXT = 2 * FEWEST_WORDS;
/** So many words say enough, … */
const MOST_WORDS = 150;
/** … and so many at the start where their share of English grammar is as high as English prose has it. */
const FIRST_WORDS = 24;
const PLAINLY_ENGLISH = 0.35;
const FIRST_GRAMMAR = Math.ceil(PLAINLY_ENGLISH * FIRST_WORDS);
/** So many UTF-16 units are shown to the detector. */
const MOST_UNITS = 1000;
/** From this share of words of grammar up a text is English: in other languages look-alikes (in, die, a) make up a tenth. */
const SURELY_ENGLISH = 0.25;
/** From this share up a text in plain letters is told by nothing else. */
const MAYBE_ENGLISH = 0.12;
/** Least share of words of grammar by which a language with spaces confirms what its letters say. */
const LEAST_GRAMMAR = 0.18;
/** From this share of letters beyond ASCII up a text is not English, and no further witness is wanted. */
const FOREIGN_LETTERS = 0.1;
/** By how much the best language must lead before the next, in the detector's scores from 0 to 1. */
const LEAST_LEAD = 0.01;

/** The languages that are told beside English, by their ISO 639-3 codes as the detector has them. */
const DETECTED: Readonly<Record<string, string>> = {
  ...{ arb: 'ar', azj: 'az', bel: 'be', ben: 'bn', bul: 'bg', cat: 'ca', ces: 'cs', cmn: 'zh', dan: 'da', deu: 'de' },
  ...{ ekk: 'et', ell: 'el', eng: 'en', fin: 'fi', fra: 'fr', guj: 'gu', heb: 'he', hin: 'hi', hrv: 'hr', hun: 'hu' },
  ...{ hye: 'hy', ind: 'id', ita: 'it', jpn: 'ja', kan: 'kn', kat: 'ka', khm: 'km', kor: 'ko', lao: 'lo', lit: 'lt' },
  ...{ lvs: 'lv', mal: 'ml', mar: 'mr', mya: 'my', nld: 'nl', nob: 'no', pan: 'pa', pes: 'fa', pol: 'pl', por: 'pt' },
  ...{ ron: 'ro', rus: 'ru', slk: 'sk', slv: 'sl', spa: 'es', srp: 'sr', swe: 'sv', tam: 'ta', tel: 'te', tha: 'th' },
  ...{ tur: 'tr', ukr: 'uk', urd: 'ur', vie: 'vi' },
};
const TOLD = new Set(Object.values(DETECTED));
const OPTIONS = { only: Object.keys(DETECTED) };

/** Stands for code and other things that are no prose. */
const OPAQUE_UNIT = 0xfffc;
const WORD = /\p{L}[\p{L}\p{M}]*/gu;
const UNSPACED = /[\p{sc=Han}\p{sc=Hira}\p{sc=Kana}\p{sc=Thai}\p{sc=Lao}\p{sc=Khmr}\p{sc=Mymr}]/gu;

/**
 * The language of a text as a BCP 47 primary subtag, or undefined where it is short or in doubt. Two witnesses must agree: the
 * share of words of grammar (after Grefenstette 1995, Comparing two language identification schemes) and the ranks of its
 * trigrams of letters (after Cavnar & Trenkle 1994, N-gram-based text categorization). Many letters that English does not have
 * are a witness as good as the first.
 * @param expected where its words of grammar fit this language well, the trigrams are not asked
 */
export function languageOfText(text: string, expected = 'en'): string | undefined {
  if (text.length < SHORTEST_TEXT) return undefined;
  const first = atFirstSight(text);
  if (first !== 'open') return first === 'en' ? 'en' : undefined;
  const { words, size, unspaced } = wordsOf(text);
  if (size < FEWEST_WORDS) return undefined;
  const english = shareOfGrammar(words, 'en');
  if (english >= SURELY_ENGLISH) return 'en';
  // Lists and names thin English out; what has so much of it is not in another language of plain letters.
  if (english >= MAYBE_ENGLISH && unspaced === 0 && shareBeyondAscii(words) === 0) return undefined;
  const mostlyUnspaced = unspaced * 2 > size;
  if (!mostlyUnspaced && expected !== 'en' && shareOfGrammar(words, expected) >= 2 * LEAST_GRAMMAR) return expected;
  const language = byTrigrams(text);
  if (language === undefined || language === 'en' || mostlyUnspaced || !hasStopWords(language)) return language;
  if (shareBeyondAscii(words) >= FOREIGN_LETTERS) return language;
  const own = shareOfGrammar(words, language);
  return own >= LEAST_GRAMMAR && own > english ? language : undefined;
}

/** The quick answer for nearly every block of English documents: so few words, or the first of them as English prose has them. */
function atFirstSight(text: string): 'short' | 'en' | 'open' {
  let words = 0;
  let grammar = 0;
  let isAscii = true;
  for (let at = 0; at < text.length && words < FIRST_WORDS;) {
    const start = at;
    while (at < text.length && isAsciiLetter(text.charCodeAt(at))) at++;
    if (at === start) {
      const unit = text.charCodeAt(at++);
      // Dashes, quotation marks and the like (U+2000 to U+206F) are of no script.
      if (unit > 0x7f && (unit < 0x2000 || unit > 0x206f) && unit !== OPAQUE_UNIT) isAscii = false;
    } else {
      words++;
      if (grammar >= FIRST_GRAMMAR) continue;
      if (isStopWord(text.slice(start, at).toLowerCase(), 'en')) grammar++;
    }
  }
  if (words === FIRST_WORDS && grammar >= FIRST_GRAMMAR) return 'en';
  return isAscii && words < FEWEST_WORDS ? 'short' : 'open';
}

function isAsciiLetter(unit: number): boolean {
  return (unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90);
}

function wordsOf(text: string): { words: readonly string[]; size: number; unspaced: number } {
  const words: string[] = [];
  let unspaced = 0;
  for (const [word] of text.matchAll(WORD)) {
    const characters = word.charCodeAt(0) < 0xe00 ? 0 : (word.match(UNSPACED)?.length ?? 0);
    if (characters > 0) unspaced += characters / 2;
    else words.push(word.toLowerCase());
    if (words.length + unspaced >= MOST_WORDS) break;
  }
  return { words, size: words.length + unspaced, unspaced };
}

/** True where a text has at least as many words of a language's grammar as of English, or the language's are not known. */
export function mayBeIn(language: string, text: string): boolean {
  const { words } = wordsOf(text);
  return !hasStopWords(language) || shareOfGrammar(words, language) >= shareOfGrammar(words, 'en');
}

/** True for a language that {@link languageOfText} can tell. */
export function canBeTold(language: string): boolean {
  return TOLD.has(language);
}

function shareOfGrammar(words: readonly string[], language: string): number {
  let count = 0;
  for (const word of words) if (isStopWord(word, language)) count++;
  return count / Math.max(1, words.length);
}

function shareBeyondAscii(words: readonly string[]): number {
  const text = words.join('');
  let count = 0;
  for (let at = 0; at < text.length; at++) if (text.charCodeAt(at) > 0x7f) count++;
  return count / Math.max(1, text.length);
}

function byTrigrams(text: string): string | undefined {
  const [best, next] = francAll(text.slice(0, MOST_UNITS), OPTIONS);
  if (best === undefined || best[1] - (next?.[1] ?? 0) < LEAST_LEAD) return undefined;
  return DETECTED[best[0]];
}
