// The statistics against values printed in textbooks and papers; "from memory" marks a figure not read in the source itself.
import { describe, expect, it } from 'vitest';
import {
  cellsOf,
  chiSquared,
  dice,
  logLikelihoodRatio,
  marginalsOf,
  npmi,
  pmi,
  ppmi,
  tScore,
} from '../../server/src/corpus/statistics/association.js';
import { agreement } from '../../server/src/corpus/statistics/agreement.js';
import {
  conditionalEntropy,
  entropy,
  jointEntropy,
  mutualInformation,
  perplexity,
  presenceInformation,
  smoothedEstimates,
} from '../../server/src/corpus/statistics/probability.js';
import { cosine, sparseVector } from '../../server/src/corpus/statistics/similarity.js';
import { cValue, cValues } from '../../server/src/corpus/statistics/termhood.js';
import { bm25Score, ppmiWeight, usualBm25 } from '../../server/src/corpus/statistics/weights.js';

const dense = (weights: readonly number[]) => sparseVector(weights.map((weight, id) => [id, weight] as const));

describe('Manning & Schütze 1999, chapter 5 (N = 14 307 668)', () => {
  const n = 14307668;

  it('gives the t of "new companies" (§5.3.1: 0.999932)', () => {
    expect(tScore({ c1: 15828, c2: 4675, c12: 8, n })).toBeCloseTo(0.9999319894802036, 12);
    expect(tScore({ c1: 15828, c2: 4675, c12: 8, n })).toBeCloseTo(0.999932, 6);
  });

  it('gives the χ² of "new companies" (Table 5.8: 1.55) and of cow/vache (Table 5.9: 456400)', () => {
    const companies = { both: 8, onlyFirst: 15820, onlySecond: 4667, neither: 14287173 };
    expect(chiSquared(companies)).toBeCloseTo(1.55, 2);
    expect(chiSquared(companies)).toBeCloseTo(1.5488692067282201, 10);
    const cow = { both: 59, onlyFirst: 6, onlySecond: 8, neither: 570934 };
    expect(Math.abs(chiSquared(cow) - 456400)).toBeLessThan(1);
    expect(chiSquared(cow)).toBeCloseTo(456399.76190356724, 6);
  });

  // Tables 5.6 (t) and 5.14 (mutual information), c12 = 20; the first and last rows as printed, the others from memory.
  const rows: [pair: string, c1: number, c2: number, t: number, bits: number][] = [
    ['Ayatollah Ruhollah', 42, 20, 4.472123, 18.377968],
    ['Bette Midler', 41, 27, 4.472119, 17.979774],
    ['Agatha Christie', 30, 117, 4.472081, 16.314958],
    ['videocassette recorder', 77, 59, 4.472065, 15.942784],
    ['unsalted butter', 24, 320, 4.472016, 15.185323],
    ['first made', 14907, 9017, 2.371415, 1.090079],
    ['over many', 13484, 10570, 2.244676, 1.005565],
    ['into them', 14734, 13478, 1.368561, 0.527033],
    ['like people', 14093, 14776, 1.217694, 0.458554],
    ['time last', 15019, 15629, 0.803637, 0.285774],
  ];
  it.each(rows)('gives t and PMI of "%s" (Tables 5.6 and 5.14)', (_pair, c1, c2, t, bits) => {
    expect(tScore({ c1, c2, c12: 20, n })).toBeCloseTo(t, 5);
    expect(pmi({ c1, c2, c12: 20, n })).toBeCloseTo(bits, 5);
    expect(ppmi({ c1, c2, c12: 20, n })).toBe(pmi({ c1, c2, c12: 20, n }));
  });

  it('gives NPMI, Dice and G² of the first row (recomputed independently; not in the book)', () => {
    const counts = { c1: 42, c2: 20, c12: 20, n };
    expect(npmi(counts)).toBeCloseTo(0.944962, 6);
    expect(dice(counts)).toBeCloseTo(0.645161, 6);
    expect(logLikelihoodRatio(cellsOf(counts))).toBeCloseTo(521.0938, 4);
  });
});

describe('Dunning 1993, Table 1: G² from cells', () => {
  // The first and "balance sheet" as printed, the rest from memory.
  const rows: [pair: string, cells: [number, number, number, number], g2: number][] = [
    ['the swiss', [110, 2442, 111, 29114], 270.7219],
    ['can be', [29, 13, 123, 31612], 263.8966],
    ['previous year', [31, 23, 139, 31584], 256.8365],
    ['mineral water', [10, 0, 3, 31764], 167.2298],
    ['natural gas', [9, 0, 5, 31763], 146.7952],
    ['qualified personnel', [8, 5, 24, 31740], 95.2858],
    ['balance sheet', [5, 13, 0, 31759], 76.2995],
    ['terms of', [24, 43, 1316, 30394], 68.6096],
  ];
  it.each(rows)('"%s"', (_pair, [both, onlyFirst, onlySecond, neither], g2) => {
    const cells = { both, onlyFirst, onlySecond, neither };
    expect(marginalsOf(cells).n).toBe(31777);
    expect(logLikelihoodRatio(cells)).toBeCloseTo(g2, 4);
    expect(cellsOf(marginalsOf(cells))).toEqual(cells);
  });
});

describe('Jurafsky & Martin, Speech and Language Processing, 3rd ed. draft, chapter 6', () => {
  const counts: Record<string, number[]> = {
    cherry: [2, 8, 9, 442, 25],
    strawberry: [0, 0, 1, 60, 19],
    digital: [1670, 1683, 85, 5, 4],
    information: [3325, 3982, 378, 5, 13],
  };
  // The counts are the book's; the six-digit values were recomputed and agree with its two printed digits.
  const expected: Record<string, number[]> = {
    cherry: [0, 0, 0, 4.379283, 3.304499],
    strawberry: [0, 0, 0, 4.101155, 5.511455],
    digital: [0.183853, 0.01199, 0, 0, 0],
    information: [0.01728, 0.094369, 0.281534, 0, 0],
  };
  const rows = Object.values(counts);
  const n = rows.flat().reduce((sum, c) => sum + c, 0);

  it('has the total of the book', () => {
    expect(n).toBe(11716);
  });

  it.each(Object.keys(counts))('PPMI of %s with computer, data, result, pie, sugar', (word) => {
    const row = counts[word] ?? [];
    row.forEach((c12, j) => {
      const c1 = row.reduce((sum, c) => sum + c, 0);
      const c2 = rows.reduce((sum, other) => sum + (other[j] ?? 0), 0);
      expect(ppmiWeight({ c1, c2, c12, n })).toBeCloseTo(expected[word]?.[j] ?? NaN, 5);
      if (c12 > 0) expect(ppmi({ c1, c2, c12, n })).toBeCloseTo(expected[word]?.[j] ?? NaN, 5);
    });
  });

  it('cosine of cherry and information .018, digital and information .996', () => {
    expect(cosine(dense([442, 8, 2]), dense([5, 3982, 3325]))).toBeCloseTo(0.01775392946668344, 12);
    expect(cosine(dense([5, 1683, 1670]), dense([5, 3982, 3325]))).toBeCloseTo(0.9963211738644715, 12);
  });
});

describe('Frantzi, Ananiadou & Mima 2000: C-value', () => {
  // The paper's example with its frequencies and C-values.
  const example: [term: string, frequency: number, value: number][] = [
    ['adenoid cystic basal cell carcinoma', 5, Math.log2(5) * 5],
    ['cystic basal cell carcinoma', 11, 12],
    ['ulcerated basal cell carcinoma', 7, 14],
    ['recurrent basal cell carcinoma', 5, 10],
    ['circumscribed basal cell carcinoma', 3, 6],
    ['basal cell carcinoma', 984, 1551.361296],
  ];
  const candidates = example.map(([term, frequency]) => ({ words: term.split(' '), frequency }));

  it('gives log2(3) · (984 − 26/5) for "basal cell carcinoma" from net nested counts', () => {
    expect(cValue({ length: 3, frequency: 984, nested: 5 + 6 + 7 + 5 + 3, containers: 5 })).toBeCloseTo(1551.361296, 6);
  });

  it('gives the whole list, in whatever order it comes', () => {
    cValues(candidates).forEach((value, i) => expect(value).toBeCloseTo(example[i]?.[2] ?? NaN, 5));
    const reversed = cValues([...candidates].reverse()).reverse();
    reversed.forEach((value, i) => expect(value).toBeCloseTo(example[i]?.[2] ?? NaN, 5));
  });

  it('scores single words 0 as published, and above 0 with log2(length + 0.1)', () => {
    expect(cValue({ length: 1, frequency: 50, nested: 0, containers: 0 })).toBe(0);
    expect(cValue({ length: 1, frequency: 50, nested: 0, containers: 0 }, 'smoothed')).toBeCloseTo(
      50 * Math.log2(1.1),
      12,
    );
  });
});

describe('Manning, Raghavan & Schütze 2008, Introduction to Information Retrieval', () => {
  it('§13.5: mutual information and χ² of "export" and the class poultry', () => {
    const cells = { both: 49, onlyFirst: 27652, onlySecond: 141, neither: 774106 };
    const table = [
      [49, 27652],
      [141, 774106],
    ];
    expect(mutualInformation(table)).toBeCloseTo(0.0001105, 7);
    expect(mutualInformation(table)).toBeCloseTo(0.00011053558610110261, 15);
    expect(chiSquared(cells)).toBeCloseTo(284.28631830257234, 8);
    // G² is 2 N ln 2 times the mutual information in bits: an identity that ties the two together.
    expect(logLikelihoodRatio(cells)).toBeCloseTo(2 * 801948 * Math.LN2 * mutualInformation(table), 6);
  });

  it('§16.3: purity, NMI, Rand index and F5 of three clusters (from memory)', () => {
    const table = [
      [5, 1, 0],
      [1, 4, 1],
      [2, 0, 3],
    ];
    const figures = agreement(table, 5);
    expect(figures.purity).toBeCloseTo(0.705882, 6);
    expect(figures.nmi).toBeCloseTo(0.364562, 6);
    expect(figures.rand).toBeCloseTo(0.676471, 6);
    expect(figures.f).toBeCloseTo(0.45614, 6);
  });
});

describe('Croft, Metzler & Strohman 2010, §7.2.2: BM25 of "president lincoln"', () => {
  // The book prints 20.66 and 15.66 for the first and the last row, from rounded parts; the others to two digits.
  const rows: [president: number, lincoln: number, score: number, printed: number][] = [
    [15, 25, 20.62519, 20.66],
    [15, 1, 12.735574, 12.74],
    [15, 0, 5.002922, 5.0],
    [1, 25, 18.168779, 18.2],
    [0, 25, 15.622267, 15.66],
  ];
  it.each(rows)('%i and %i occurrences', (president, lincoln, score, printed) => {
    const found = bm25Score(
      [
        { frequency: president, queryFrequency: 1, documents: 40000, relevant: 0 },
        { frequency: lincoln, queryFrequency: 1, documents: 300, relevant: 0 },
      ],
      { documents: 500000, relevant: 0, relativeLength: 0.9 },
      usualBm25,
    );
    expect(found).toBeCloseTo(score, 5);
    expect(Math.abs(found - printed)).toBeLessThan(0.05);
  });
});

describe('entropies', () => {
  it('Cover & Thomas, example 2.2.1 (from memory)', () => {
    // Rows are the values of Y, columns those of X, in 32nds.
    const table = [
      [4, 2, 1, 1],
      [2, 4, 1, 1],
      [2, 2, 2, 2],
      [8, 0, 0, 0],
    ];
    const transposed = [0, 1, 2, 3].map((j) => table.map((row) => row[j] ?? 0));
    expect(entropy([16, 8, 4, 4])).toBeCloseTo(1.75, 12);
    expect(entropy([8, 8, 8, 8])).toBeCloseTo(2, 12);
    expect(jointEntropy(table)).toBeCloseTo(3.375, 12);
    expect(conditionalEntropy(table)).toBeCloseTo(1.375, 12);
    expect(conditionalEntropy(transposed)).toBeCloseTo(1.625, 12);
    expect(mutualInformation(table)).toBeCloseTo(0.375, 12);
  });

  it('Manning & Schütze 1999, §2.2: Simplified Polynesian, 2.5 bits', () => {
    expect(entropy([1, 2, 1, 2, 1, 1])).toBeCloseTo(2.5, 12);
    expect(perplexity([1, 2, 1, 2, 1, 1])).toBeCloseTo(2 ** 2.5, 12);
  });

  it('Manning & Schütze 1999, §2.2: its syllables (from memory)', () => {
    // Rows are the consonants p, t, k; columns the vowels a, i, u; in 16ths.
    const table = [
      [1, 1, 0],
      [6, 3, 3],
      [1, 0, 1],
    ];
    expect(entropy([2, 12, 2])).toBeCloseTo(1.061278, 6);
    expect(conditionalEntropy(table)).toBeCloseTo(1.375, 12);
    expect(jointEntropy(table)).toBeCloseTo(2.436278, 6);
    expect(mutualInformation(table)).toBeCloseTo(0.125, 12);
  });
});

describe('smoothed estimates (common practice, no source)', () => {
  it('adds four pseudo-segments of weight ¼', () => {
    expect(smoothedEstimates({ c1: 0, c2: 3, c12: 0, n: 9 })).toEqual({ p1: 0.05, p2: 0.35, p12: 0.025 });
  });

  it('makes presence information finite, and what it is without smoothing as n grows', () => {
    const never = presenceInformation({ c1: 0, c2: 0, c12: 0, n: 1 });
    expect(never.entropy1).toBeGreaterThan(0);
    const scale = 1e6;
    const large = presenceInformation({ c1: 49e6 + 27652e6, c2: 49e6 + 141e6, c12: 49e6, n: 801948 * scale });
    expect(large.mutual).toBeCloseTo(0.00011053558610110261, 10);
    expect(large.conditional1).toBeCloseTo(large.joint - large.entropy2, 12);
    expect(large.conditional2).toBeCloseTo(large.joint - large.entropy1, 12);
  });
});
