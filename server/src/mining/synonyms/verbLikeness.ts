// How alike verbs are used: by the objects they act on and the prepositions that follow those objects.
import { PairTable } from '../../base/pairTable.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import { sparseVector } from '../../corpus/statistics/similarity.js';
import { TAG } from '../../tokens/tokens.js';
import type { UsageMeasures, Weighting } from '../options.js';
import { weigher } from './contextWeights.js';
import { compareTerms } from './neighbours.js';
import type { Likeness } from './neighbours.js';
import type { VerbUses } from './verbUses.js';

/** Compares pairs of verbs, given by their numbers, the smaller first; the result has the key `a · verbs + b`. */
export function* compareVerbs(
  corpus: Corpus,
  read: VerbUses,
  pairs: readonly { readonly a: number; readonly b: number }[],
  { weighting, similarity }: UsageMeasures,
): Work<ReadonlyMap<number, Likeness>> {
  const vectors = yield* vectorsOf(corpus, read, weighting);
  const { likeness } = yield* compareTerms(vectors, pairs, [], 0, similarity);
  return likeness;
}

function* vectorsOf(
  { stream }: Corpus,
  { verbs, pairs, timesOf, usesOf }: VerbUses,
  weighting: Weighting,
): Work<SparseVector[]> {
  const features = new PairTable();
  const cells = new PairTable();
  const counts: number[] = [];
  const add = (verb: number, feature: number, count: number): void => {
    const cell = cells.idOf(verb, feature);
    counts[cell] = (counts[cell] ?? 0) + count;
  };
  for (let pair = 0; pair < pairs.size; pair++) {
    const verb = pairs.leftOf(pair);
    add(verb, features.idOf(0, pairs.rightOf(pair)), timesOf(pair));
    for (const { object } of usesOf(pair)) {
      const next = object + 1;
      if (next < stream.length && stream.tag[next] === TAG.ADP) add(verb, features.idOf(1, stream.fold[next]!), 1);
    }
    if (pair % 10_000 === 0) yield;
  }
  const df = new Uint32Array(features.size);
  const rows: [feature: number, weight: number][][] = Array.from({ length: verbs.size }, () => []);
  for (let cell = 0; cell < cells.size; cell++) df[cells.rightOf(cell)]!++;
  // A verb is numbered with its first object.
  const met = verbs.size;
  const totals = { features: features.size, terms: verbs.size, rows: verbs.size, df, met };
  const weight = weigher(weighting, cells, (cell) => counts[cell]!, totals);
  for (let cell = 0; cell < cells.size; cell++) {
    const feature = cells.rightOf(cell);
    if (df[feature]! > 1) rows[cells.leftOf(cell)]!.push([feature, weight(cell)]);
  }
  return rows.map((row) => sparseVector(row));
}
