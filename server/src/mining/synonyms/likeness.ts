// How alike two names of one thing are used in this corpus, by how often they are used: the yardstick of similarity.
import { cosine, jaccard, lin } from '../../corpus/statistics/similarity.js';
import type { Similarity, SparseVector } from '../../corpus/statistics/similarity.js';
import type { SimilarityName } from '../options.js';

/** The measures of likeness by name. */
export const SIMILARITY_OF: Readonly<Record<SimilarityName, Similarity>> = { lin, cosine, jaccard };

/** Terms that are halved for the yardstick, at most. */
const HALVED = 300;
/** Fewest uses of a halved term. */
const FEWEST_USES = 10;
/** Below this a similarity to oneself is not believed: few terms, or terms used a few times. */
const LEAST = 0.02;

/** Picks terms to halve, evenly from the most to the least used; indexes into `uses`, which falls mostly. */
export function termsToHalve(uses: Uint32Array): number[] {
  const able = Array.from(uses.keys()).filter((term) => uses[term]! >= FEWEST_USES);
  const step = Math.max(1, able.length / HALVED);
  const chosen: number[] = [];
  for (let at = 0; Math.floor(at) < able.length; at += step) chosen.push(able[Math.floor(at)]!);
  return chosen;
}

/**
 * The similarity that two halves of one term have, as a function of the uses of the rarer: a straight line over the
 * logarithm of uses, by least squares.
 * @param halves pairs of vectors with the uses in the whole term, in order
 */
export function selfSimilarity(
  halves: readonly { readonly one: SparseVector; readonly other: SparseVector; readonly uses: number }[],
  similarity: Similarity = lin,
): (uses: number) => number {
  const points = halves
    .filter(({ one, other }) => one.ids.length > 0 && other.ids.length > 0)
    .map(({ one, other, uses }) => ({ x: Math.log(uses / 2), y: similarity(one, other) }));
  const mean = (pick: (point: { x: number; y: number }) => number): number =>
    points.reduce((sum, point) => sum + pick(point), 0) / Math.max(1, points.length);
  const x = mean((point) => point.x);
  const y = mean((point) => point.y);
  const spread = points.reduce((sum, point) => sum + (point.x - x) ** 2, 0);
  const slope = spread === 0 ? 0 : points.reduce((sum, point) => sum + (point.x - x) * (point.y - y), 0) / spread;
  return (uses) => Math.max(LEAST, y + slope * (Math.log(Math.max(1, uses)) - x));
}
