// How much one feature says about one term: BM25, tf-idf, logarithmic and PPMI weights.
import { ppmi, type Marginals } from './association.js';

/** The three constants of BM25; `k2` matters only where a query repeats a term. */
export interface Bm25Constants {
  readonly k1: number;
  readonly b: number;
  readonly k2: number;
}

/** The usual constants of Croft, Metzler & Strohman 2010, §7.2.2. */
export const usualBm25: Bm25Constants = { k1: 1.2, b: 0.75, k2: 100 };

/** What BM25 knows of one query term and one document. */
export interface Bm25Term {
  /** Occurrences in the document. */
  readonly frequency: number;
  /** Occurrences in the query, usually 1. */
  readonly queryFrequency: number;
  /** Documents that have the term. */
  readonly documents: number;
  /** Relevant documents that have the term; 0 where nothing is known. */
  readonly relevant: number;
}

/** What BM25 knows of the collection and of the document that is scored. */
export interface Bm25Setting {
  readonly documents: number;
  /** Documents known to be relevant; 0 where nothing is known. */
  readonly relevant: number;
  /** Length of the document over the average length. */
  readonly relativeLength: number;
}

/**
 * BM25 score of a document for a query, natural logarithm, as in Croft, Metzler & Strohman 2010, §7.2.2: the sum over
 * terms of ln[((r+½)/(R−r+½)) / ((n−r+½)/(N−n−R+r+½))] · (k1+1)f/(K+f) · (k2+1)q/(k2+q), K = k1((1−b) + b·dl/avdl).
 * @throws RangeError when counts contradict each other.
 */
export function bm25Score(
  terms: readonly Bm25Term[],
  setting: Bm25Setting,
  constants: Bm25Constants = usualBm25,
): number {
  const { documents: total, relevant: allRelevant, relativeLength } = setting;
  let score = 0;
  for (const { frequency, queryFrequency, documents, relevant } of terms) {
    if (!(
      relevant >= 0 &&
      relevant <= allRelevant &&
      relevant <= documents &&
      documents - relevant <= total - allRelevant
    )) {
      throw new RangeError(
        `${documents} documents with the term, ${relevant} relevant, do not fit ${total} and ${allRelevant}`,
      );
    }
    const odds =
      ((relevant + 0.5) / (allRelevant - relevant + 0.5)) *
      ((total - documents - allRelevant + relevant + 0.5) / (documents - relevant + 0.5));
    const inQuery = ((constants.k2 + 1) * queryFrequency) / (constants.k2 + queryFrequency);
    score += Math.log(odds) * bm25Saturation(frequency, relativeLength, constants) * inQuery;
  }
  return score;
}

/**
 * BM25 weight of one feature in one term's contexts, treating each term's contexts as a document: idf · saturation.
 * A feature that more than half of the terms have would weigh negatively and weighs 0 instead.
 * @param count how often the feature goes with the term
 * @param df how many of the `n` terms have the feature
 * @param relativeLength the term's number of contexts over the average
 */
export function bm25Weight(
  count: number,
  df: number,
  n: number,
  relativeLength: number,
  constants: Bm25Constants = usualBm25,
): number {
  checkFrequencies(count, df, n);
  const idf = Math.log((n - df + 0.5) / (df + 0.5));
  return Math.max(0, idf) * bm25Saturation(count, relativeLength, constants);
}

/** The part of BM25 that grows with the count c but never beyond k1 + 1. */
export function bm25Saturation(count: number, relativeLength: number, constants: Bm25Constants = usualBm25): number {
  const { k1, b } = constants;
  if (!(count >= 0) || !(relativeLength >= 0) || !(k1 >= 0) || !(b >= 0 && b <= 1)) {
    throw new RangeError(`BM25 cannot weigh count ${count}, relative length ${relativeLength}, k1 ${k1}, b ${b}`);
  }
  if (count === 0) return 0;
  return ((k1 + 1) * count) / (k1 * (1 - b + b * relativeLength) + count);
}

/** tf-idf with the raw count: c · ln(n/df) (Spärck Jones 1972; Salton & Buckley 1988). */
export function tfIdf(count: number, df: number, n: number): number {
  checkFrequencies(count, df, n);
  return count * Math.log(n / df);
}

/** tf-idf with a damped count: ln(1 + c) · ln(n/df). */
export function dampedTfIdf(count: number, df: number, n: number): number {
  checkFrequencies(count, df, n);
  return Math.log1p(count) * Math.log(n / df);
}

/** PPMI in bits of a feature with a term: `c1` and `c2` are their totals, `n` all pairs counted. 0 for a pair never met. */
export function ppmiWeight(counts: Marginals): number {
  return counts.c12 === 0 ? 0 : ppmi(counts);
}

function checkFrequencies(count: number, df: number, n: number): void {
  if (!(count >= 0) || !(df > 0) || !(df <= n) || !Number.isFinite(n)) {
    throw new RangeError(`count ${count}, document frequency ${df} of ${n}: impossible`);
  }
}
