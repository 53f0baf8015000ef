// Whether a term is a proper name here: capitalised inside sentences.
import type { TokenStream } from '../../corpus/stream.js';
import type { Vocabulary } from '../../corpus/vocabulary.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { isRunningText } from '../places.js';
import type { Segments } from './segment.js';

/**
 * The share of a term's uses inside sentences in which every word opens with a capital; 0 where there are none.
 * @param occurrences indexes into the segments
 */
export function properShare(
  stream: TokenStream,
  vocabulary: Vocabulary,
  segments: Segments,
  occurrences: Uint32Array,
): number {
  const capitals = new Map<number, boolean>();
  const isCapital = (spelling: number): boolean => {
    let known = capitals.get(spelling);
    if (known === undefined) {
      const text = vocabulary.textOf(spelling);
      capitals.set(spelling, (known = /^\p{Lu}/u.test(text) && !/^\p{Lu}+s?$/u.test(text)));
    }
    return known;
  };
  let all = 0;
  let capital = 0;
  for (const at of occurrences) {
    const row = segments.first[at]!;
    if (!isRunningText(stream, row) || (stream.flags[row]! & TokenFlag.sentenceStart) !== 0) continue;
    all++;
    let every = true;
    for (let i = 0; i < segments.length[at]! && every; i++) every = isCapital(stream.spelling[row + i]!);
    if (every) capital++;
  }
  return all === 0 ? 0 : capital / all;
}
