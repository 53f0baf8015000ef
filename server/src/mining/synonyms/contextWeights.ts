// How much each context says about its term, by the weight that was chosen.
import type { PairTable } from '../../base/pairTable.js';
import { cellsOf, logLikelihoodRatio } from '../../corpus/statistics/association.js';
import type { Marginals } from '../../corpus/statistics/association.js';
import { smoothedEstimates } from '../../corpus/statistics/probability.js';
import { bm25Weight, dampedTfIdf } from '../../corpus/statistics/weights.js';
import type { Weighting } from '../options.js';

/** What a weight may draw on besides a cell's own count. */
export interface ContextTotals {
  readonly features: number;
  /** The first `terms` of the `rows` are terms; the others repeat a part of a term and add to no total. */
  readonly terms: number;
  readonly rows: number;
  /** How many terms have each feature, and how many have any. */
  readonly df: Uint32Array;
  readonly met: number;
}

/**
 * The weight of a cell, at least 0. `tf-idf` is damped: ln(1 + c) · ln(n/df). `ppmi` is the positive pointwise mutual
 * information, in bits, of the smoothed estimates. `bm25` takes a term's contexts for its document. `log-likelihood` is
 * ln(1 + G²) where a feature goes with the term more often than chance, else 0.
 * @param cells pairs of row and feature
 */
export function weigher(
  weighting: Weighting,
  cells: Pick<PairTable, 'size' | 'leftOf' | 'rightOf'>,
  countOf: (cell: number) => number,
  totals: ContextTotals,
): (cell: number) => number {
  const { df, met } = totals;
  if (weighting === 'tf-idf') return (cell) => dampedTfIdf(countOf(cell), df[cells.rightOf(cell)]!, met);
  const ofRow = new Float64Array(totals.rows);
  const ofFeature = new Float64Array(totals.features);
  let all = 0;
  for (let cell = 0; cell < cells.size; cell++) {
    const row = cells.leftOf(cell);
    const count = countOf(cell);
    ofRow[row]! += count;
    if (row >= totals.terms) continue;
    ofFeature[cells.rightOf(cell)]! += count;
    all += count;
  }
  if (weighting === 'bm25') {
    const average = all / Math.max(1, met);
    return (cell) => bm25Weight(countOf(cell), df[cells.rightOf(cell)]!, met, ofRow[cells.leftOf(cell)]! / average);
  }
  const marginals = (cell: number): Marginals => {
    return { c1: ofRow[cells.leftOf(cell)]!, c2: ofFeature[cells.rightOf(cell)]!, c12: countOf(cell), n: all };
  };
  if (weighting === 'ppmi') {
    return (cell) => {
      const { p1, p2, p12 } = smoothedEstimates(marginals(cell));
      return Math.max(0, Math.log2(p12 / (p1 * p2)));
    };
  }
  return (cell) => {
    const counts = marginals(cell);
    const attracts = counts.c12 * counts.n > counts.c1 * counts.c2;
    return attracts ? Math.log1p(logLikelihoodRatio(cellsOf(counts))) : 0;
  };
}
