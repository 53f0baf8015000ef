// How often each feature was met with each term: the features of all occurrences first, then added up term by term.
import type { Segments } from './segment.js';
import { indexOccurrences } from './occurrences.js';

/** The features of each occurrence, in the order in which the occurrences are read. */
export class MetFeatures {
  /** Occurrence `i` has `features[first[i], first[i + 1])`. */
  readonly first: Uint32Array;
  features: Uint32Array;
  private count = 0;
  private occurrence = 0;

  /** @param usual how many features an occurrence mostly has at most */
  constructor(occurrences: number, usual: number) {
    this.first = new Uint32Array(occurrences + 1);
    this.features = new Uint32Array(occurrences * usual);
  }

  /** Adds a feature to the occurrence that is being read. */
  add(feature: number): void {
    if (this.count === this.features.length) {
      const longer = new Uint32Array(this.count * 2 + 16);
      longer.set(this.features);
      this.features = longer;
    }
    this.features[this.count++] = feature;
  }

  /** Ends the occurrence that is being read. */
  endOccurrence(): void {
    this.first[++this.occurrence] = this.count;
  }
}

/** A sparse matrix of counts, row by row, each in rising order of its features. */
export interface ContextCells {
  readonly size: number;
  /** Row `r` has the cells `[rowFirst[r], rowFirst[r + 1])`. */
  readonly rowFirst: Uint32Array;
  /** The row of a cell. */
  leftOf(cell: number): number;
  /** The feature of a cell. */
  rightOf(cell: number): number;
  countOf(cell: number): number;
}

/**
 * Adds up the features of each term's occurrences, one row a term, then those of each half of the halved terms.
 * @param halfOf the row of an occurrence among the halves, where it has one; asked once for each, in order of a term's occurrences
 */
export function addUp(
  met: MetFeatures,
  features: number,
  segments: Segments,
  rows: number,
  halfOf: (occurrence: number) => number | undefined,
): ContextCells {
  const terms = segments.uses.length;
  const occurrences = indexOccurrences(segments);
  const halves: number[][] = Array.from({ length: rows - terms }, () => []);
  for (let i = 0; i < segments.count; i++) {
    const half = halfOf(i);
    if (half !== undefined) halves[half - terms]!.push(i);
  }
  const occurrencesOf = (row: number): ArrayLike<number> => (row < terms ? occurrences.of(row) : halves[row - terms]!);
  const rowFirst = new Uint32Array(rows + 1);
  const seen = new Uint32Array(features);
  for (let row = 0; row < rows; row++) {
    let distinct = 0;
    const own = occurrencesOf(row);
    for (let k = 0; k < own.length; k++) {
      const end = met.first[own[k]! + 1]!;
      for (let at = met.first[own[k]!]!; at < end; at++) {
        const feature = met.features[at]!;
        if (seen[feature] === row + 1) continue;
        seen[feature] = row + 1;
        distinct++;
      }
    }
    rowFirst[row + 1] = rowFirst[row]! + distinct;
  }
  const size = rowFirst[rows]!;
  const featureOf = new Uint32Array(size);
  const counts = new Uint32Array(size);
  const rowOf = new Uint32Array(size);
  const sums = seen.fill(0);
  for (let row = 0; row < rows; row++) {
    const from = rowFirst[row]!;
    const until = rowFirst[row + 1]!;
    let next = from;
    const own = occurrencesOf(row);
    for (let k = 0; k < own.length; k++) {
      const end = met.first[own[k]! + 1]!;
      for (let at = met.first[own[k]!]!; at < end; at++) {
        const feature = met.features[at]!;
        if (sums[feature]!++ === 0) featureOf[next++] = feature;
      }
    }
    featureOf.subarray(from, until).sort();
    for (let cell = from; cell < until; cell++) {
      counts[cell] = sums[featureOf[cell]!]!;
      sums[featureOf[cell]!] = 0;
    }
    rowOf.fill(row, from, until);
  }
  return {
    ...{ size, rowFirst },
    leftOf: (cell) => rowOf[cell]!,
    rightOf: (cell) => featureOf[cell]!,
    countOf: (cell) => counts[cell]!,
  };
}
