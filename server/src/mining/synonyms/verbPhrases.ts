// Whether two verbs act on the same things: the objects as phrases, and the sentences in which both have the object.
import type { Corpus } from '../../corpus/corpus.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import type { VerbUse } from './verbUses.js';

/** How the uses of two verbs with one object compare. */
export interface SharedPhrases {
  /** The share, from 0 to 1, of the rarer verb's uses whose object has the same modifiers as a use of the other's. */
  readonly share: number;
  /** Sentences in which both verbs have the object: steps of one procedure. */
  readonly sameSentence: number;
  /** Pages on which both verbs have the object with the same modifiers. */
  readonly pages: number;
}

/** Compares two verbs by the phrases that their uses have as object (“an RDB file” is no “configuration file”). */
export function compareObjects(corpus: Corpus, one: readonly VerbUse[], other: readonly VerbUse[]): SharedPhrases {
  const left = countBy(one, (use) => phraseOf(corpus, use));
  const right = countBy(other, (use) => phraseOf(corpus, use));
  let shared = 0;
  for (const [phrase, count] of left) shared += Math.min(count, right.get(phrase) ?? 0);
  const onPage = (use: VerbUse): string => `${corpus.stream.documentOf(use.row)} ${phraseOf(corpus, use)}`;
  const ofOther = new Set(other.map(onPage));
  const together = new Set(one.map(onPage).filter((phrase) => ofOther.has(phrase)));
  const sentences = new Set(one.map(({ row }) => sentenceOf(corpus, row)));
  return {
    share: shared / Math.min(one.length, other.length),
    sameSentence: other.filter(({ row }) => sentences.has(sentenceOf(corpus, row))).length,
    pages: new Set([...together].map((phrase) => phrase.slice(0, phrase.indexOf(' ')))).size,
  };
}

/** The nouns and stand-ins for code right before the object's head, in their dictionary forms. */
function phraseOf({ stream, vocabulary }: Corpus, { row, length, object }: VerbUse): string {
  const words: string[] = [];
  for (let at = object - 1; at >= row + length; at--) {
    const tag = stream.tag[at]!;
    if (tag !== TAG.NOUN && tag !== TAG.PROPN && tag !== TAG.OPAQUE) break;
    words.unshift(vocabulary.textOf(stream.lemma[at]!));
  }
  return words.join(' ');
}

function sentenceOf({ stream }: Corpus, row: number): number {
  let first = row;
  while (first > 0 && (stream.flags[first]! & TokenFlag.sentenceStart) === 0) first--;
  return first;
}

function countBy<T>(items: readonly T[], keyOf: (item: T) => string): Map<string, number> {
  const counts = new Map<string, number>();
  for (const item of items) counts.set(keyOf(item), (counts.get(keyOf(item)) ?? 0) + 1);
  return counts;
}
