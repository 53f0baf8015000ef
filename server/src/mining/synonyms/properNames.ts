// Whether a term is a proper name here: capitalised inside sentences.
import type { TokenStream } from '../../corpus/stream.js';
import type { Vocabulary } from '../../corpus/vocabulary.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { isRunningText } from '../places.js';
import type { Use } from '../places.js';

/** The share of a term's uses inside sentences in which every word opens with a capital; 0 where there are none. */
export function properShare(stream: TokenStream, vocabulary: Vocabulary, uses: readonly Use[]): number {
  let all = 0;
  let capital = 0;
  for (const { row, length } of uses) {
    if (!isRunningText(stream, row) || (stream.flags[row]! & TokenFlag.sentenceStart) !== 0) continue;
    all++;
    let every = true;
    for (let i = 0; i < length && every; i++) {
      const text = vocabulary.textOf(stream.spelling[row + i]!);
      every = /^\p{Lu}/u.test(text) && !/^\p{Lu}+s?$/u.test(text);
    }
    if (every) capital++;
  }
  return all === 0 ? 0 : capital / all;
}
