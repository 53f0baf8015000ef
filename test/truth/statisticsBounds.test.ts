// The statistics at their edges: impossible inputs are refused, and limits are what theory says.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  cellsOf,
  chiSquared,
  dice,
  logLikelihoodRatio,
  marginalsOf,
  npmi,
  pmi,
  tScore,
  type Cells,
} from '../../server/src/corpus/statistics/association.js';
import { entropy, mutualInformation } from '../../server/src/corpus/statistics/probability.js';
import { cosine, jaccard, lin, sparseVector } from '../../server/src/corpus/statistics/similarity.js';
import { cValue, cValues, rateRatio } from '../../server/src/corpus/statistics/termhood.js';
import {
  bm25Saturation,
  bm25Score,
  bm25Weight,
  dampedTfIdf,
  ppmiWeight,
  tfIdf,
} from '../../server/src/corpus/statistics/weights.js';

describe('impossible inputs are refused', () => {
  const impossible = [
    { c1: 3, c2: 9, c12: 4, n: 20 },
    { c1: 9, c2: 3, c12: 4, n: 20 },
    { c1: -1, c2: 3, c12: 0, n: 20 },
    { c1: 0, c2: 0, c12: 0, n: 0 },
    { c1: 21, c2: 3, c12: 0, n: 20 },
    { c1: 15, c2: 15, c12: 2, n: 20 },
    { c1: NaN, c2: 3, c12: 0, n: 20 },
    { c1: 3, c2: 3, c12: 0, n: Infinity },
  ];
  it.each(impossible)('margins %o', (counts) => {
    for (const measure of [pmi, npmi, tScore, dice, cellsOf]) expect(() => measure(counts)).toThrow(RangeError);
  });

  it('cells, vectors, weights, lengths', () => {
    expect(() => logLikelihoodRatio({ both: -1, onlyFirst: 1, onlySecond: 1, neither: 1 })).toThrow(RangeError);
    expect(() => chiSquared({ both: 0, onlyFirst: 0, onlySecond: 0, neither: 0 })).toThrow(RangeError);
    expect(() => pmi({ c1: 0, c2: 3, c12: 0, n: 20 })).toThrow(/never happens/);
    expect(() => entropy([])).toThrow(RangeError);
    expect(() => entropy([1, -1])).toThrow(RangeError);
    expect(() => mutualInformation([[1, 2], [3]])).toThrow(/equally long/);
    expect(() => mutualInformation([])).toThrow(RangeError);
    expect(() => sparseVector([[1, 1], [1, 2]])).toThrow(/given twice/); // prettier-ignore
    expect(() => sparseVector([[-1, 1]])).toThrow(RangeError);
    expect(() => sparseVector([[1, NaN]])).toThrow(RangeError);
    expect(() => lin(sparseVector([[1, -1]]), sparseVector([[1, 1]]))).toThrow(RangeError);
    expect(() => cValue({ length: 0, frequency: 1, nested: 0, containers: 0 })).toThrow(RangeError);
    expect(() => cValue({ length: 2, frequency: 1, nested: 3, containers: 0 })).toThrow(RangeError);
    expect(() => cValues([{ words: [], frequency: 1 }])).toThrow(RangeError);
    expect(() => rateRatio({ count: 5, size: 4 }, { count: 1, size: 4 })).toThrow(RangeError);
    expect(() => tfIdf(1, 0, 10)).toThrow(RangeError);
    expect(() => dampedTfIdf(1, 11, 10)).toThrow(RangeError);
    expect(() => bm25Weight(-1, 1, 10, 1)).toThrow(RangeError);
    expect(() => bm25Saturation(1, -1)).toThrow(RangeError);
    expect(() =>
      bm25Score([{ frequency: 1, queryFrequency: 1, documents: 3, relevant: 4 }], {
        documents: 9,
        relevant: 5,
        relativeLength: 1,
      }),
    ).toThrow(RangeError);
  });
});

describe('limits', () => {
  it('never together: PMI −∞, NPMI −1, Dice 0, PPMI weight 0', () => {
    const counts = { c1: 4, c2: 5, c12: 0, n: 100 };
    expect(pmi(counts)).toBe(-Infinity);
    expect(npmi(counts)).toBe(-1);
    expect(tScore(counts)).toBe(-Infinity);
    expect(dice(counts)).toBe(0);
    expect(ppmiWeight(counts)).toBe(0);
    expect(ppmiWeight({ c1: 0, c2: 5, c12: 0, n: 100 })).toBe(0);
  });

  it('only ever together: NPMI 1, Dice 1', () => {
    expect(npmi({ c1: 7, c2: 7, c12: 7, n: 100 })).toBeCloseTo(1, 12);
    expect(dice({ c1: 7, c2: 7, c12: 7, n: 100 })).toBe(1);
  });

  it('an event that is always there tells nothing', () => {
    expect(npmi({ c1: 9, c2: 9, c12: 9, n: 9 })).toBe(0);
    expect(logLikelihoodRatio({ both: 9, onlyFirst: 0, onlySecond: 0, neither: 0 })).toBe(0);
    expect(chiSquared({ both: 3, onlyFirst: 5, onlySecond: 0, neither: 0 })).toBe(0);
  });

  it('identical vectors are alike, disjoint ones are not, empty ones are like nothing', () => {
    const a = sparseVector([[3, 1.5], [1, 2]]); // prettier-ignore
    const b = sparseVector([[2, 1], [4, 1]]); // prettier-ignore
    for (const measure of [cosine, lin, jaccard]) {
      expect(measure(a, a)).toBeCloseTo(1, 12);
      expect(measure(a, b)).toBe(0);
      expect(measure(a, sparseVector([]))).toBe(0);
      expect(measure(sparseVector([]), sparseVector([]))).toBe(0);
    }
    // By hand: shared feature 1 with weights 2 and 4; sums 3.5 and 5; min 2, max 1.5 + 4 + 1.
    const c = sparseVector([[1, 4], [2, 1]]); // prettier-ignore
    expect(lin(a, c)).toBeCloseTo(6 / 8.5, 12);
    expect(jaccard(a, c)).toBeCloseTo(2 / 6.5, 12);
  });

  it('BM25 saturates below k1 + 1; common features weigh nothing', () => {
    expect(bm25Saturation(1e9, 1)).toBeCloseTo(2.2, 6);
    expect(bm25Saturation(0, 0)).toBe(0);
    expect(bm25Weight(5, 60, 100, 1)).toBe(0);
    expect(bm25Weight(5, 6, 100, 1)).toBeGreaterThan(bm25Weight(4, 6, 100, 1));
    expect(tfIdf(3, 10, 10)).toBe(0);
    expect(dampedTfIdf(Math.E - 1, 1, Math.E)).toBeCloseTo(1, 12);
  });

  it('a rate is positive when a term is used more here than elsewhere', () => {
    expect(rateRatio({ count: 10, size: 1000 }, { count: 10, size: 100000 })).toBeCloseTo(Math.log(100), 1);
    expect(rateRatio({ count: 3, size: 500 }, { count: 3, size: 500 })).toBe(0);
  });
});

describe('for any table', () => {
  const count = fc.nat({ max: 50000 });
  const anyCells: fc.Arbitrary<Cells> = fc
    .record({ both: count, onlyFirst: count, onlySecond: count, neither: count })
    .filter((cells) => cells.both + cells.onlyFirst + cells.onlySecond + cells.neither > 0);

  it('cells and margins convert without loss; G² and χ² are finite and at least 0, and symmetric', () => {
    fc.assert(
      fc.property(anyCells, (cells) => {
        expect(cellsOf(marginalsOf(cells))).toEqual(cells);
        const swapped = { ...cells, onlyFirst: cells.onlySecond, onlySecond: cells.onlyFirst };
        for (const measure of [logLikelihoodRatio, chiSquared]) {
          expect(measure(cells)).toBeGreaterThanOrEqual(0);
          expect(measure(cells)).toBeLessThan(Infinity);
          expect(measure(swapped)).toBeCloseTo(measure(cells), 5);
        }
      }),
    );
  });

  it('NPMI stays within −1 and 1', () => {
    fc.assert(
      fc.property(anyCells, (cells) => {
        const counts = marginalsOf(cells);
        fc.pre(counts.c1 > 0 && counts.c2 > 0);
        expect(Math.abs(npmi(counts))).toBeLessThanOrEqual(1);
      }),
    );
  });
});
