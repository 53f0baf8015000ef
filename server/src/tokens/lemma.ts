// Dictionary forms of English words: the tagger's lexicon first, then rules of detachment for words it does not have.
import type { Tag } from './tokens.js';
import type { WinkLexicon } from './winkLexicon.js';

const KEPT = new Set(['data', 'media', 'metadata', 'criteria']);
const PREFIX = /^(?:re|un|de|pre|auto|over|under|mis|sub|co|dis|out|super|multi|non|inter)-?(?=.{3})/;
const MAKES_E =
  /(?:[^aeiou](?:at|iv|ut|as|os)|[aeiou](?:iz|is|z)|iz|ys|yz|[bcdfgkptz]l|[aeiou]c|[nrd]g|rc|nc|rs|ns|rv|lv|ag|v)$/;

/**
 * The dictionary form, in lower case, of a lower-case word of this part of speech. A hyphenated word is inflected in its last part.
 * Rules of detachment after WordNet's morphology (Princeton University, morphy(7WN)), applied to unknown words with care.
 */
export function lemmaOf(word: string, tag: Tag, lexicon: WinkLexicon): string {
  if (KEPT.has(word)) return word;
  const asTag: Tag = tag === 'PROPN' ? 'NOUN' : tag;
  const known = lexicon.lemma(word, asTag);
  if (known !== undefined) return asTag === 'VERB' ? withFinalE(word, known, lexicon) : known;
  const hyphen = word.lastIndexOf('-');
  if (hyphen > 0 && hyphen < word.length - 1) {
    return word.slice(0, hyphen + 1) + lemmaOf(word.slice(hyphen + 1), tag, lexicon);
  }
  const prefix = PREFIX.exec(word);
  if (prefix !== null) {
    const rest = lexicon.lemma(word.slice(prefix[0].length), asTag);
    if (rest !== undefined && (asTag === 'NOUN' || asTag === 'VERB')) return prefix[0] + rest;
  }
  if (tag === 'NOUN') return singular(word);
  if (asTag === 'VERB') return baseVerb(word, lexicon);
  return word;
}

/**
 * *tuning* is of *tune*, not of *tun*, which would double its consonant: a single short syllable left undoubled has lost an e.
 */
function withFinalE(word: string, lemma: string, lexicon: WinkLexicon): string {
  if (!/^[^aeiou]*[aeiou][^aeiouwxy]$/.test(lemma) || !lexicon.isBaseForm(lemma + 'e', 'VERB')) return lemma;
  return word === lemma + 'ing' || word === lemma + 'ed' ? lemma + 'e' : lemma;
}

function singular(word: string): string {
  if (word.length < 4 || !word.endsWith('s') || /(?:ss|us|is|ous|'s)$/.test(word)) return word;
  if (word.endsWith('ies')) return word.length > 4 ? word.slice(0, -3) + 'y' : word.slice(0, -1);
  if (/(?:ch|sh|ss|x|zz)es$/.test(word)) return word.slice(0, -2);
  return word.slice(0, -1);
}

function baseVerb(word: string, lexicon: WinkLexicon): string {
  if (word.endsWith('s')) return singular(word);
  const ending = /(?:ed|ing)$/.exec(word);
  if (ending === null) return word;
  const stem = word.slice(0, ending.index);
  if (stem.length < 2 || !/[aeiouy]/.test(stem)) return word;
  if (word.endsWith('ied')) return stem.slice(0, -1) + 'y';
  const single = /([bdfgklmnprt])\1$/.test(stem) ? stem.slice(0, -1) : stem;
  for (const candidate of [stem, single, stem + 'e']) {
    if (lexicon.isBaseForm(candidate, 'VERB') || lexicon.isBaseForm(candidate, 'NOUN')) return candidate;
  }
  if (single !== stem && !/(?:ll|ff)$/.test(stem)) return single;
  return MAKES_E.test(stem) ? stem + 'e' : stem;
}
