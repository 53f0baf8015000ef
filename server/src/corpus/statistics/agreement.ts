// How well one grouping of things agrees with another: purity, normalised mutual information, Rand index, F measure.
import { entropy, mutualInformation } from './probability.js';

/** Agreement of found groups with true classes; each figure is between 0 and 1. */
export interface Agreement {
  readonly purity: number;
  readonly nmi: number;
  readonly rand: number;
  readonly precision: number;
  readonly recall: number;
  readonly f: number;
}

/**
 * Compares groups with classes, as in Manning, Raghavan & Schütze 2008, §16.3.
 * @param table counts, a row for each found group, a column for each true class
 * @param beta weight of recall against precision over pairs in F
 */
export function agreement(table: readonly (readonly number[])[], beta = 1): Agreement {
  const rows = table.map((row) => row.reduce((sum, c) => sum + c, 0));
  const columns = (table[0] ?? []).map((_, j) => table.reduce((sum, row) => sum + (row[j] ?? 0), 0));
  const n = rows.reduce((sum, c) => sum + c, 0);
  const information = mutualInformation(table);
  const meanEntropy = (entropy(rows) + entropy(columns)) / 2;
  const together = sumPairs(table.flat());
  const sameGroup = sumPairs(rows);
  const sameClass = sumPairs(columns);
  const all = pairs(n);
  const precision = sameGroup === 0 ? 0 : together / sameGroup;
  const recall = sameClass === 0 ? 0 : together / sameClass;
  const square = beta * beta;
  return {
    purity: table.reduce((sum, row) => sum + Math.max(...row), 0) / n,
    nmi: meanEntropy === 0 ? 1 : information / meanEntropy,
    rand: all === 0 ? 1 : (all - sameGroup - sameClass + 2 * together) / all,
    precision,
    recall,
    f: together === 0 ? 0 : ((square + 1) * precision * recall) / (square * precision + recall),
  };
}

function pairs(count: number): number {
  return (count * (count - 1)) / 2;
}

function sumPairs(counts: readonly number[]): number {
  return counts.reduce((sum, c) => sum + pairs(c), 0);
}
