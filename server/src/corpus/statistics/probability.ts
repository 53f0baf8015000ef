// Smoothed probabilities, entropies in bits and what one variable tells about another, all from counts.
import { checkedMarginals, type Marginals } from './association.js';

/** Probabilities of meeting the first term, the second, and both in one segment. */
export interface SegmentEstimates {
  readonly p1: number;
  readonly p2: number;
  readonly p12: number;
}

/** What the presence of two terms in segments amounts to, in bits. */
export interface PresenceInformation {
  readonly entropy1: number;
  readonly entropy2: number;
  readonly joint: number;
  /** H(1 | 2): what stays uncertain about the first term when the second is known. */
  readonly conditional1: number;
  /** H(2 | 1). */
  readonly conditional2: number;
  readonly mutual: number;
}

/**
 * Smoothed estimates from segment counts: four pseudo-segments of weight ¼, one for each combination of
 * present and absent, so p(1) = (c1 + ½)/(n + 1) and p(1,2) = (c12 + ¼)/(n + 1). No estimate is ever 0 or 1.
 * Common practice, no source.
 * @throws RangeError when the counts contradict each other.
 */
export function smoothedEstimates(counts: Marginals): SegmentEstimates {
  const { c1, c2, c12, n } = checkedMarginals(counts);
  return { p1: (c1 + 0.5) / (n + 1), p2: (c2 + 0.5) / (n + 1), p12: (c12 + 0.25) / (n + 1) };
}

/**
 * Entropies and mutual information, in bits, of the two yes-or-no variables "term 1 is in the segment" and
 * "term 2 is in the segment", by the smoothed estimates. (Cover & Thomas, Elements of Information Theory, ch. 2.)
 */
export function presenceInformation(counts: Marginals): PresenceInformation {
  const { p1, p2, p12 } = smoothedEstimates(counts);
  const entropy1 = entropyOfProbabilities([p1, 1 - p1]);
  const entropy2 = entropyOfProbabilities([p2, 1 - p2]);
  const joint = entropyOfProbabilities([p12, p1 - p12, p2 - p12, 1 - p1 - p2 + p12]);
  return {
    entropy1,
    entropy2,
    joint,
    conditional1: Math.max(0, joint - entropy2),
    conditional2: Math.max(0, joint - entropy1),
    mutual: Math.max(0, entropy1 + entropy2 - joint),
  };
}

/**
 * Entropy H in bits of a distribution given as counts: log2 N − (1/N) Σ c log2 c (Shannon 1948). Zero counts add nothing.
 * @throws RangeError for a negative or infinite count, or when all are zero.
 */
export function entropy(counts: ArrayLike<number>): number {
  let total = 0;
  let sum = 0;
  for (let i = 0; i < counts.length; i++) {
    const c = checkedCount(counts[i]);
    total += c;
    if (c > 0) sum += c * Math.log2(c);
  }
  if (total <= 0) throw new RangeError('entropy: the counts are all zero');
  return Math.max(0, Math.log2(total) - sum / total);
}

/** Perplexity 2^H: the number of equally likely choices that would be as uncertain as these counts. */
export function perplexity(counts: ArrayLike<number>): number {
  return 2 ** entropy(counts);
}

/** Joint entropy H(X,Y) in bits of a table of counts, one row for each value of X. */
export function jointEntropy(table: readonly ArrayLike<number>[]): number {
  const cells: number[] = [];
  for (const row of rectangular(table)) for (let j = 0; j < row.length; j++) cells.push(row[j] ?? 0);
  return entropy(cells);
}

/** H(column | row) in bits: what stays uncertain about the column once the row is known. */
export function conditionalEntropy(table: readonly ArrayLike<number>[]): number {
  const { rows } = sums(table);
  return Math.max(0, jointEntropy(table) - entropy(rows));
}

/** Mutual information I(row; column) in bits, Σ p(x,y) log2 p(x,y)/(p(x) p(y)) (Cover & Thomas, eq. 2.28). */
export function mutualInformation(table: readonly ArrayLike<number>[]): number {
  const { rows, columns, total } = sums(table);
  if (total <= 0) throw new RangeError('mutualInformation: the counts are all zero');
  let sum = 0;
  table.forEach((row, i) => {
    for (let j = 0; j < row.length; j++) {
      const c = row[j] ?? 0;
      if (c > 0) sum += (c / total) * Math.log2((c * total) / ((rows[i] ?? 0) * (columns[j] ?? 0)));
    }
  });
  return Math.max(0, sum);
}

function entropyOfProbabilities(probabilities: readonly number[]): number {
  let sum = 0;
  for (const p of probabilities) if (p > 0) sum -= p * Math.log2(p);
  return sum;
}

function checkedCount(count: number | undefined): number {
  if (count === undefined || !Number.isFinite(count) || count < 0) {
    throw new RangeError(`a count must be a finite number of at least 0, not ${String(count)}`);
  }
  return count;
}

function rectangular(table: readonly ArrayLike<number>[]): readonly ArrayLike<number>[] {
  const width = table[0]?.length ?? 0;
  if (width === 0) throw new RangeError('a table of counts needs at least one row and one column');
  if (table.some((row) => row.length !== width))
    throw new RangeError('the rows of a table of counts must be equally long');
  return table;
}

function sums(table: readonly ArrayLike<number>[]): { rows: number[]; columns: number[]; total: number } {
  const width = rectangular(table)[0]?.length ?? 0;
  const columns = new Array<number>(width).fill(0);
  let total = 0;
  const rows = table.map((row) => {
    let rowSum = 0;
    for (let j = 0; j < width; j++) {
      const c = checkedCount(row[j]);
      rowSum += c;
      columns[j] = (columns[j] ?? 0) + c;
    }
    total += rowSum;
    return rowSum;
  });
  return { rows, columns, total };
}
