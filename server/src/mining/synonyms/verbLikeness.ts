// How alike verbs are used: by the objects they act on and the prepositions that follow those objects.
import { PairTable } from '../../base/pairTable.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import { sparseVector } from '../../corpus/statistics/similarity.js';
import { dampedTfIdf } from '../../corpus/statistics/weights.js';
import { TAG } from '../../tokens/tokens.js';
import { compareTerms } from './neighbours.js';
import type { Likeness } from './neighbours.js';
import type { VerbUses } from './verbUses.js';

/** Compares pairs of verbs, given by their numbers, the smaller first; the result has the key `a · verbs + b`. */
export function* compareVerbs(
  corpus: Corpus,
  read: VerbUses,
  pairs: readonly { readonly a: number; readonly b: number }[],
): Work<ReadonlyMap<number, Likeness>> {
  const vectors = yield* vectorsOf(corpus, read);
  const { likeness } = yield* compareTerms(vectors, pairs, [], 0);
  return likeness;
}

function* vectorsOf({ stream }: Corpus, { verbs, pairs, uses }: VerbUses): Work<SparseVector[]> {
  const features = new PairTable();
  const cells = new Map<number, Map<number, number>>();
  for (let pair = 0; pair < uses.length; pair++) {
    const verb = pairs.leftOf(pair);
    const row = cells.get(verb) ?? new Map<number, number>();
    cells.set(verb, row);
    const add = (feature: number, count: number): void => void row.set(feature, (row.get(feature) ?? 0) + count);
    add(features.idOf(0, pairs.rightOf(pair)), uses[pair]!.length);
    for (const { object } of uses[pair]!) {
      const next = object + 1;
      if (next < stream.length && stream.tag[next] === TAG.ADP) add(features.idOf(1, stream.fold[next]!), 1);
    }
    if (pair % 10_000 === 0) yield;
  }
  const df = new Uint32Array(features.size);
  for (const row of cells.values()) for (const feature of row.keys()) df[feature]!++;
  return Array.from({ length: verbs.size }, (_, verb) => {
    const row = cells.get(verb) ?? new Map<number, number>();
    const shared = [...row].filter(([feature]) => df[feature]! > 1);
    return sparseVector(shared.map(([feature, count]) => [feature, dampedTfIdf(count, df[feature]!, cells.size)]));
  });
}
