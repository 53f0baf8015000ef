// Weights and likeness of contexts by choice: published values, and what is asked when nothing is chosen.
import { describe, expect, it } from 'vitest';
import { PairTable } from '../../../server/src/base/pairTable.js';
import { finish } from '../../../server/src/base/work.js';
import { sparseVector } from '../../../server/src/corpus/statistics/similarity.js';
import { CONTEXT_KINDS, SIMILARITIES, WEIGHTINGS } from '../../../server/src/mining/options.js';
import type { Weighting } from '../../../server/src/mining/options.js';
import { askSynonyms } from '../../../server/src/mining/synonyms/ask.js';
import { weigher } from '../../../server/src/mining/synonyms/contextWeights.js';
import { compareTerms } from '../../../server/src/mining/synonyms/neighbours.js';
import { corpusOf } from '../../support/corpusOf.js';

/** The weights of a table of counts, a row for each term, a column for each feature. */
function weights(weighting: Weighting, table: readonly (readonly number[])[]): number[][] {
  const cells = new PairTable();
  const counts: number[] = [];
  const features = table[0]!.length;
  const df = new Uint32Array(features);
  table.forEach((row, term) =>
    row.forEach((count, feature) => {
      if (count === 0) return;
      counts[cells.idOf(term, feature)] = count;
      df[feature]!++;
    }),
  );
  const rows = table.length;
  const totals = { features, terms: rows, rows, df, met: rows };
  const weight = weigher(weighting, cells, (cell) => counts[cell]!, totals);
  return table.map((row, term) => row.map((count, feature) => (count === 0 ? 0 : weight(cells.find(term, feature)!))));
}

describe('weights of contexts', () => {
  // Jurafsky & Martin, 3rd ed., ch. 6: cherry, strawberry, digital, information × computer, data, result, pie, sugar.
  const fruits = [
    [2, 8, 9, 442, 25],
    [0, 0, 1, 60, 19],
    [1670, 1683, 85, 5, 4],
    [3325, 3982, 378, 5, 13],
  ];

  it('by PPMI are the published values but for the smoothing of four pseudo-counts', () => {
    const found = weights('ppmi', fruits);
    // Published PPMI in bits; ½ and ¼ added to counts in the hundreds move the value by a few thousandths.
    expect(found[0]![3]).toBeCloseTo(4.379283, 2);
    expect(found[1]![3]).toBeCloseTo(4.101155, 1);
    expect(found[2]![0]).toBeCloseTo(0.183853, 2);
    expect(found[3]![2]).toBeCloseTo(0.281534, 2);
    expect(found[0]![0]).toBe(0);
  });

  it('by log-likelihood come from the published G²', () => {
    // Dunning 1993, Table 1: “the swiss”, G² 270.72; cells 110, 2442, 111, 29114.
    const [[theSwiss, other]] = weights('log-likelihood', [
      [110, 2442],
      [111, 29114],
    ]) as [number[], number[]];
    expect(Math.expm1(theSwiss!)).toBeCloseTo(270.721876936225, 6);
    // “The” with another word than “swiss” stands less often than chance: it says nothing.
    expect(other).toBe(0);
  });

  it('by tf-idf are ln(1 + c) · ln(n/df), by BM25 grow with the count but never beyond idf · (k1 + 1)', () => {
    const table = [
      [3, 1, 0],
      [0, 1, 2],
      [0, 0, 900],
      [0, 0, 1],
    ];
    expect(weights('tf-idf', table)[0]).toEqual([Math.log(4) * Math.log(4), Math.log(2) * Math.log(2), 0]);
    const bm25 = weights('bm25', [...table, [0, 0, 0], [0, 0, 0], [0, 0, 0], [0, 0, 0]]);
    const idf = Math.log((8 - 1 + 0.5) / 1.5);
    expect(bm25[0]![0]).toBeGreaterThan(0);
    expect(bm25[0]![0]).toBeLessThan(idf * 2.2);
  });
});

describe('likeness by choice', () => {
  // Jurafsky & Martin, 3rd ed., ch. 6: cosine of cherry, digital and information over pie, data, computer.
  const vectors = [
    [442, 8, 2],
    [5, 3982, 3325],
    [5, 1683, 1670],
  ].map((row) => sparseVector(row.map((weight, id) => [id, weight])));
  const pairs = [
    { a: 0, b: 1 },
    { a: 1, b: 2 },
  ];

  it('is the published cosine', () => {
    const { likeness } = finish(compareTerms(vectors, pairs, [], 0, 'cosine'));
    expect(likeness.get(1)!.similarity).toBeCloseTo(0.01775392946668344, 12);
    expect(likeness.get(5)!.similarity).toBeCloseTo(0.9963211738644715, 12);
  });

  it('is Lin’s measure where nothing is chosen, and Jaccard’s Σ min / Σ max', () => {
    const { likeness } = finish(compareTerms(vectors, pairs, [], 0));
    expect(likeness.get(1)!.similarity).toBeCloseTo(1, 12);
    const jaccard = finish(compareTerms(vectors, pairs, [], 0, 'jaccard')).likeness;
    expect(jaccard.get(1)!.similarity).toBeCloseTo((5 + 8 + 2) / (442 + 3982 + 3325), 12);
  });
});

describe('what is asked', () => {
  const pagesOf = (term: string): string[] => [
    `Type the name of the station into the ${term}. The page lists every match below it.`,
    `The ${term} stands at the top of the page. Click the ${term} and wait.`,
    `An empty ${term} shows all stations. The administrator hides the ${term} from guests.`,
    `Clear the ${term} before you go on. The colour of the ${term} follows the theme.`,
    `Your browser remembers what you typed into the ${term} last week.`,
    `Press the slash key and the ${term} takes the focus. Guests see no ${term} at night.`,
  ];
  const corpus = corpusOf([...pagesOf('search bar'), ...pagesOf('search box').map((text) => `Note. ${text}`)]);

  it('is the same with the usual choices named and without any', () => {
    const usual = { weighting: 'tf-idf', similarity: 'lin', contexts: 'all' } as const;
    const asked = finish(askSynonyms(corpus));
    expect(asked.length).toBeGreaterThan(0);
    expect(finish(askSynonyms(corpus, usual))).toEqual(asked);
  });

  it.each([
    ...WEIGHTINGS.map((weighting) => ({ weighting })),
    ...SIMILARITIES.map((similarity) => ({ similarity })),
    ...CONTEXT_KINDS.map((contexts) => ({ contexts })),
  ])('with %j is a confident question or none', (options) => {
    for (const { confidence } of finish(askSynonyms(corpus, options))) {
      expect(confidence).toBeGreaterThanOrEqual(0);
      expect(confidence).toBeLessThanOrEqual(1);
    }
  });
});
