// How each word is used in a corpus: as noun, verb, adjective, by its tag and, where the tagger is known to err, its place.
import type { Corpus } from '../../corpus/corpus.js';
import { isKnown } from '../../lexicon/synonyms.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';

/** The classes of use that terms are built from. */
export const WORD_USES = ['noun', 'verb', 'adjective', 'other'] as const;
export type WordUse = (typeof WORD_USES)[number];

const NOUN = 0;
const OTHER = 3;
const USE_OF_TAG = new Uint8Array(32).fill(OTHER);
USE_OF_TAG[TAG.NOUN] = NOUN;
USE_OF_TAG[TAG.PROPN] = NOUN;
USE_OF_TAG[TAG.VERB] = 1;
USE_OF_TAG[TAG.ADJ] = 2;

const POSSESSIVES = new Set(['my', 'your', 'its', 'our', 'their', 'his', 'her']);
const ARTICLES = new Set(['a', 'an', 'the', 'this', 'that', 'each', 'every', 'no', 'any', 'another']);

/** The class of each row of the stream, as an index into {@link WORD_USES}. */
export function readUses(corpus: Corpus): Uint8Array {
  const { stream, vocabulary } = corpus;
  const { tag, flags, fold } = stream;
  const uses = new Uint8Array(tag.length);
  for (let row = 0; row < tag.length; row++) uses[row] = USE_OF_TAG[tag[row]!]!;
  const nouns = new Int8Array(vocabulary.size);
  const isNoun = (word: number): boolean => {
    if (nouns[word] === 0) nouns[word] = isKnown(vocabulary.textOf(word), 'noun') ? 1 : -1;
    return nouns[word] === 1;
  };
  const startsSentence = (row: number): boolean => (flags[row]! & TokenFlag.sentenceStart) !== 0;
  for (let row = 1; row < stream.length; row++) {
    if (tag[row] !== TAG.ADJ && tag[row] !== TAG.VERB) continue;
    if (startsSentence(row) || (flags[row]! & TokenFlag.word) === 0) continue;
    const before = vocabulary.textOf(fold[row - 1]!);
    const determined = ARTICLES.has(before) || POSSESSIVES.has(before);
    // The head of a phrase that no noun follows: “the token is”, “access token”; a verb only right after an article.
    if (!determined && (tag[row] === TAG.VERB || uses[row - 1] !== NOUN)) continue;
    if (row + 1 < stream.length && !startsSentence(row + 1) && continuesPhrase(tag[row + 1]!)) continue;
    if (isNoun(fold[row]!)) uses[row] = NOUN;
  }
  return uses;
}

function continuesPhrase(tag: number): boolean {
  return (
    tag === TAG.NOUN ||
    tag === TAG.PROPN ||
    tag === TAG.ADJ ||
    tag === TAG.NUM ||
    tag === TAG.OPAQUE ||
    tag === TAG.VERB
  );
}

/** Uses of words by class; words are lower-case vocabulary numbers. */
export interface WordUses {
  /** The share, from 0 to 1, of a word's uses in a class. */
  share(word: number, use: WordUse): number;
  /** The number of a word's uses in a class. */
  count(word: number, use: WordUse): number;
}

/** Counts the uses of every word of a corpus, given the class of each row. */
export function countWordUses({ stream, vocabulary }: Corpus, uses: Uint8Array): WordUses {
  const width = WORD_USES.length;
  const counts = new Int32Array(vocabulary.size * width);
  for (let row = 0; row < stream.length; row++) {
    if (stream.counted[row] === 0 || (stream.flags[row]! & TokenFlag.word) === 0) continue;
    counts[stream.fold[row]! * width + uses[row]!]!++;
  }
  const count = (word: number, use: WordUse): number => counts[word * width + WORD_USES.indexOf(use)]!;
  return {
    count,
    share: (word, use) =>
      count(word, use) /
      Math.max(
        1,
        WORD_USES.reduce((sum, each) => sum + count(word, each), 0),
      ),
  };
}
