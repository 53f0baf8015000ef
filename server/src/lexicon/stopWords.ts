// Words of grammar in many languages: English by our own closed list, others by lists of stop words.
import * as lists from 'stopword';
import { isFunctionWord } from './functionWords.js';

/** The lists by BCP 47 primary subtag. Broader lists would take content words (mot, port) for grammar. */
const LISTS: Readonly<Record<string, readonly string[]>> = {
  ...{ af: lists.afr, ar: lists.ara, bg: lists.bul, bn: lists.ben, ca: lists.cat, cs: lists.ces, da: lists.dan },
  ...{ de: lists.deu, el: lists.ell, es: lists.spa, et: lists.est, eu: lists.eus, fa: lists.fas, fi: lists.fin },
  ...{ fr: lists.fra, ga: lists.gle, gl: lists.glg, gu: lists.guj, he: lists.heb, hi: lists.hin, hr: lists.hrv },
  ...{ hu: lists.hun, hy: lists.hye, id: lists.ind, it: lists.ita, ja: lists.jpn, ko: lists.kor, lt: lists.lit },
  ...{ lv: lists.lav, mr: lists.mar, ms: lists.msa, my: lists.mya, nl: lists.nld, no: lists.nob, pa: lists.panGu },
  ...{ pl: lists.pol, pt: lists.por, ro: lists.ron, ru: lists.rus, sk: lists.slk, sl: lists.slv, sv: lists.swe },
  ...{ sw: lists.swa, th: lists.tha, tl: lists.tgl, tr: lists.tur, uk: lists.ukr, ur: lists.urd, vi: lists.vie },
  zh: lists.zho,
};
const known = new Map<string, ReadonlySet<string>>();

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
    list = new Set(Object.hasOwn(LISTS, language) ? LISTS[language] : []);
    known.set(language, list);
  }
  return list;
}
