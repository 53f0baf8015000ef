// How alike two terms are used, and their places among each other's neighbours: by their contexts, through an inverted index.
import type { Work } from '../../base/work.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import type { SimilarityName } from '../options.js';

/** How two terms compare. */
export interface Likeness {
  /** From 0 to 1. */
  readonly similarity: number;
  /** The place of `b` among the neighbours of `a`, from 1, and the other way round. */
  readonly rankOfB: number;
  readonly rankOfA: number;
}

/** What a comparison of terms yields. */
export interface Neighbours {
  /** By `a · terms + b`, a < b. */
  readonly likeness: ReadonlyMap<number, Likeness>;
  /** The nearest neighbours of the terms asked for, most alike first, ties by index. */
  readonly nearest: ReadonlyMap<number, readonly number[]>;
}

/**
 * Compares pairs of terms against all other terms, usually by Lin's measure (Lin 1998, eq. 4), one row a term that some pair holds.
 * Terms must come in an order that depends on their texts alone, since ties are broken by it.
 * @param listed terms for which the `keep` nearest neighbours are wanted
 * @param index the vectors inverted, where that was done before
 */
export function* compareTerms(
  vectors: readonly SparseVector[],
  pairs: readonly { readonly a: number; readonly b: number }[],
  listed: readonly number[],
  keep: number,
  similarity: SimilarityName = 'lin',
  index: VectorIndex = invert(vectors),
): Work<Neighbours> {
  const totals = Float64Array.from(vectors, ({ weights }) => sizeOf(weights, similarity));
  const shared = new Float64Array(vectors.length);
  const partners = new Map<number, number[]>();
  for (const { a, b } of pairs) {
    for (const [one, other] of [
      [a, b],
      [b, a],
    ] as const) {
      const known = partners.get(one);
      if (known === undefined) partners.set(one, [other]);
      else known.push(other);
    }
  }
  const touchedTerms = new Uint32Array(vectors.length);
  const isLin = similarity === 'lin';
  const wanted = new Set(listed);
  const rows = [...new Set([...partners.keys(), ...listed])].sort((x, y) => x - y);
  const places = new Map<number, { similarity: number; rank: number }>();
  const nearest = new Map<number, readonly number[]>();
  let steps = 0;
  for (const term of rows) {
    let met = 0;
    const { ids, weights } = vectors[term]!;
    for (let i = 0; i < ids.length; i++) {
      const from = index.first[ids[i]!]!;
      const until = index.first[ids[i]! + 1]!;
      for (let at = from; at < until; at++) {
        const other = index.terms[at]!;
        if (shared[other] === 0) touchedTerms[met++] = other;
        if (isLin) shared[other]! += weights[i]! + index.weights[at]!;
        else if (similarity === 'cosine') shared[other]! += weights[i]! * index.weights[at]!;
        else shared[other]! += Math.min(weights[i]!, index.weights[at]!);
      }
    }
    const touched = touchedTerms.subarray(0, met);
    for (const other of touched) {
      const sum = totals[term]! + totals[other]!;
      // Contexts that all terms share weigh nothing: nothing is shared.
      if (shared[other] === 0) continue;
      if (isLin) shared[other]! /= sum;
      else if (similarity === 'cosine') shared[other]! /= totals[term]! * totals[other]!;
      else shared[other]! /= sum - shared[other]!;
    }
    shared[term] = 0;
    for (const other of partners.get(term) ?? []) {
      const similarity = shared[other]!;
      let rank = 1;
      for (const third of touched) {
        if (third === term) continue;
        if (shared[third]! > similarity || (shared[third] === similarity && third < other)) rank++;
      }
      places.set(term * vectors.length + other, { similarity, rank });
    }
    if (wanted.has(term)) nearest.set(term, mostAlike(touched, shared, keep));
    for (const other of touched) shared[other] = 0;
    if (++steps % 64 === 0) yield;
  }
  const likeness = new Map<number, Likeness>();
  for (const { a, b } of pairs) {
    const here = places.get(a * vectors.length + b)!;
    const there = places.get(b * vectors.length + a)!;
    likeness.set(a * vectors.length + b, {
      similarity: here.similarity,
      rankOfB: here.rank,
      rankOfA: there.rank,
    });
  }
  return { likeness, nearest };
}

/** What a vector's weights come to in the denominator of a measure: their sum, or their length for the cosine. */
function sizeOf(weights: Float64Array, similarity: SimilarityName): number {
  if (similarity === 'cosine') return Math.sqrt(weights.reduce((sum, weight) => sum + weight * weight, 0));
  return weights.reduce((sum, weight) => sum + weight, 0);
}

/** The `keep` most alike, by insertion: few are kept of many. */
function mostAlike(touched: Uint32Array, score: Float64Array, keep: number): number[] {
  const best: number[] = [];
  for (const other of touched) {
    const at = best.findIndex((each) => score[other]! > score[each]! || (score[other] === score[each] && other < each));
    if (score[other] === 0 || (at < 0 && best.length === keep)) continue;
    best.splice(at < 0 ? best.length : at, 0, other);
    if (best.length > keep) best.pop();
  }
  return best;
}

/** Which vectors have a feature, and with what weight: feature `f` has the entries `[first[f], first[f + 1])`. */
export interface VectorIndex {
  readonly first: Uint32Array;
  readonly terms: Uint32Array;
  readonly weights: Float64Array;
}

/** Sorts the features of vectors by feature. */
export function invert(vectors: readonly SparseVector[]): VectorIndex {
  const largest = vectors.reduce((max, { ids }) => Math.max(max, ids[ids.length - 1] ?? 0), 0);
  const first = new Uint32Array(largest + 2);
  for (const { ids } of vectors) for (const id of ids) first[id + 1]!++;
  for (let id = 0; id <= largest; id++) first[id + 1]! += first[id]!;
  const next = first.slice();
  const terms = new Uint32Array(first[largest + 1]!);
  const weights = new Float64Array(terms.length);
  vectors.forEach((vector, term) => {
    for (let i = 0; i < vector.ids.length; i++) {
      const at = next[vector.ids[i]!]!++;
      terms[at] = term;
      weights[at] = vector.weights[i]!;
    }
  });
  return { first, terms, weights };
}
