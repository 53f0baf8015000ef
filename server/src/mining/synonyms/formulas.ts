// Whether a term stands in one formula nearly always, as in titles and stock phrases: such uses say little of what it means.
import type { Corpus } from '../../corpus/corpus.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import type { Segments } from './segment.js';

/** Stands for a sentence's start or end, … */
const EDGE = -1;
/** … and for a number or a stand-in for code, which a formula has room for (“v1.2 release announcement”). */
const FIGURE = -2;

/**
 * The largest share, from 0 to 1, of a term's uses that stand between the same two words; dictionary forms are compared.
 * @param occurrences indexes into the segments
 */
export function formulaShare({ stream, vocabulary }: Corpus, segments: Segments, occurrences: Uint32Array): number {
  const startsSentence = (row: number): boolean =>
    row >= stream.length || (stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
  const neighbour = (row: number): number => {
    if (stream.tag[row] === TAG.NUM || stream.tag[row] === TAG.OPAQUE) return FIGURE;
    return /\d/.test(vocabulary.textOf(stream.fold[row]!)) ? FIGURE : stream.lemma[row]!;
  };
  const counts = new Map<string, number>();
  let most = 0;
  for (const at of occurrences) {
    const first = segments.first[at]!;
    const end = first + segments.length[at]!;
    const before = startsSentence(first) ? EDGE : neighbour(first - 1);
    const frame = `${before} ${startsSentence(end) ? EDGE : neighbour(end)}`;
    const count = (counts.get(frame) ?? 0) + 1;
    counts.set(frame, count);
    most = Math.max(most, count);
  }
  return occurrences.length === 0 ? 0 : most / occurrences.length;
}
