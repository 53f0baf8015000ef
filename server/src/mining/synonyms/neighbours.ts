// The nearest neighbours of every term by their contexts: all pairs, through an inverted index.
import type { Work } from '../../base/work.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';

/** How many neighbours are kept for each term; a rank beyond it counts as this. */
export const KEPT_NEIGHBOURS = 50;

/** Neighbour lists: term `t` has the neighbours `lists[t]`, most alike first, ties by term number. */
export interface Neighbours {
  readonly lists: readonly Uint32Array[];
  /** The place of `b` among the neighbours of `a`, from 1; {@link KEPT_NEIGHBOURS} + 1 where it is not among them. */
  rank(a: number, b: number): number;
}

/**
 * Ranks all terms for each term by Lin's measure (Lin 1998, eq. 4). Terms must come in an order that depends on their
 * texts alone, since ties are broken by it. Features that more than `commonest` terms have add to no pair: they say
 * next to nothing, and their pairs are most of the work.
 */
export function* rankNeighbours(vectors: readonly SparseVector[], commonest: number): Work<Neighbours> {
  const totals = vectors.map(({ weights }) => weights.reduce((sum, weight) => sum + weight, 0));
  const index = invert(vectors);
  const shared = new Float64Array(vectors.length);
  const lists: Uint32Array[] = [];
  for (let term = 0; term < vectors.length; term++) {
    const touched: number[] = [];
    const { ids, weights } = vectors[term]!;
    for (let i = 0; i < ids.length; i++) {
      const from = index.first[ids[i]!]!;
      const until = index.first[ids[i]! + 1]!;
      if (until - from > commonest) continue;
      for (let at = from; at < until; at++) {
        const other = index.terms[at]!;
        if (shared[other] === 0) touched.push(other);
        shared[other]! += weights[i]! + index.weights[at]!;
      }
    }
    const alike = (other: number): number => shared[other]! / (totals[term]! + totals[other]!);
    lists.push(nearest(touched, term, alike));
    for (const other of touched) shared[other] = 0;
    if (term % 64 === 0) yield;
  }
  const rank = (a: number, b: number): number => {
    const at = lists[a]!.indexOf(b);
    return at < 0 ? KEPT_NEIGHBOURS + 1 : at + 1;
  };
  return { lists, rank };
}

function nearest(touched: readonly number[], self: number, alike: (other: number) => number): Uint32Array {
  const scored = touched.filter((other) => other !== self).map((other) => ({ other, score: alike(other) }));
  scored.sort((a, b) => b.score - a.score || a.other - b.other);
  return Uint32Array.from(scored.slice(0, KEPT_NEIGHBOURS), ({ other }) => other);
}

function invert(vectors: readonly SparseVector[]): { first: Uint32Array; terms: Uint32Array; weights: Float64Array } {
  const largest = vectors.reduce((max, { ids }) => Math.max(max, ids[ids.length - 1] ?? 0), 0);
  const first = new Uint32Array(largest + 2);
  for (const { ids } of vectors) for (const id of ids) first[id + 1]!++;
  for (let id = 0; id <= largest; id++) first[id + 1]! += first[id]!;
  const next = first.slice();
  const terms = new Uint32Array(first[largest + 1]!);
  const weights = new Float64Array(terms.length);
  vectors.forEach((vector, term) => {
    vector.ids.forEach((id, i) => {
      const at = next[id]!++;
      terms[at] = term;
      weights[at] = vector.weights[i]!;
    });
  });
  return { first, terms, weights };
}
