// How each word is used in a corpus: as noun, verb, adjective, and under which dictionary form.
import type { Corpus } from '../../corpus/corpus.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';

/** The classes of use that terms are built from. */
export const WORD_USES = ['noun', 'verb', 'adjective', 'other'] as const;
export type WordUse = (typeof WORD_USES)[number];

const USE_OF_TAG = new Uint8Array(32).fill(3);
USE_OF_TAG[TAG.NOUN] = 0;
USE_OF_TAG[TAG.PROPN] = 0;
USE_OF_TAG[TAG.VERB] = 1;
USE_OF_TAG[TAG.ADJ] = 2;

/** The class of a token's tag, as an index into {@link WORD_USES}. */
export function useOfTag(tag: number): number {
  return USE_OF_TAG[tag]!;
}

/** Uses of words by class; words are lower-case vocabulary numbers. */
export interface WordUses {
  /** The share, from 0 to 1, of a word's uses in a class. */
  share(word: number, use: WordUse): number;
  /** The number of a word's uses in a class. */
  count(word: number, use: WordUse): number;
}

/** Counts the uses of every word of a corpus. */
export function countWordUses(corpus: Corpus): WordUses {
  const { stream, vocabulary } = corpus;
  const width = WORD_USES.length;
  const counts = new Int32Array(vocabulary.size * width);
  for (let row = 0; row < stream.length; row++) {
    if (stream.counted[row] === 0 || (stream.flags[row]! & TokenFlag.word) === 0) continue;
    const use = useOfTag(stream.tag[row]!);
    const word = stream.fold[row]!;
    counts[word * width + use]!++;
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
