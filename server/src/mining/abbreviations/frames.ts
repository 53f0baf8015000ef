// Frames: the content words that stand right beside the uses of a form, and how far two forms share them.
import type { Corpus } from '../../corpus/corpus.js';
import { endRowOfBlock, firstRowOfBlock, followsOn, isContent } from '../../corpus/stream.js';
import type { Use } from '../places.js';

/** Kinds of frame with the number of uses in each: a neighbour's lower-case word, doubled, plus 1 where it follows. */
export type Frames = ReadonlyMap<number, number>;

/**
 * The frames of uses: a content word right before, and one right after, with nothing but white space between.
 * @param overGrammar whether a word of grammar between is passed over on the left ("open a ___")
 */
export function framesOf(corpus: Corpus, uses: readonly Use[], overGrammar = false): Frames {
  const { stream } = corpus;
  const frames = new Map<number, number>();
  const count = (row: number, side: 0 | 1): void => {
    if (!isContent(stream, row)) return;
    const frame = stream.fold[row]! * 2 + side;
    frames.set(frame, (frames.get(frame) ?? 0) + 1);
  };
  for (const { row, length } of uses) {
    const first = firstRowOfBlock(stream, row);
    if (row > first && followsOn(stream, row)) {
      const passes = overGrammar && row - 1 > first && !isContent(stream, row - 1) && followsOn(stream, row - 1);
      count(passes ? row - 2 : row - 1, 0);
    }
    const end = row + length;
    if (end < endRowOfBlock(stream, row) && followsOn(stream, end)) count(end, 1);
  }
  return frames;
}

/** What two forms share: the kinds of frame, most used first; the rarer form's uses in them, and their share in its framed uses. */
export interface SharedFrames {
  readonly kinds: readonly number[];
  readonly uses: number;
  readonly share: number;
}

/** Compares two forms by their frames; ties by the code units of the neighbour. */
export function sharedFrames(corpus: Corpus, a: Frames, b: Frames): SharedFrames {
  const total = (frames: Frames): number => [...frames.values()].reduce((sum, count) => sum + count, 0);
  const rarer = total(a) <= total(b) ? a : b;
  const other = rarer === a ? b : a;
  const kinds = [...rarer.keys()].filter((frame) => other.has(frame));
  const weight = (frame: number): number => Math.min(a.get(frame)!, b.get(frame)!);
  const text = (frame: number): string => `${corpus.vocabulary.textOf(frame >> 1)} ${frame & 1}`;
  kinds.sort((x, y) => weight(y) - weight(x) || (text(x) < text(y) ? -1 : 1));
  const inShared = kinds.reduce((sum, frame) => sum + rarer.get(frame)!, 0);
  return { kinds, uses: inShared, share: inShared === 0 ? 0 : inShared / total(rarer) };
}

/** A frame as a writer reads it: "___ file", "root ___". */
export function frameText(corpus: Corpus, frame: number): string {
  const word = corpus.vocabulary.textOf(frame >> 1);
  return (frame & 1) === 1 ? `___ ${word}` : `${word} ___`;
}
