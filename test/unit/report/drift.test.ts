// Drift and where it lives, against values computed by hand and published ones.
import { describe, expect, it } from 'vitest';
import { driftOf, meanDrift, whereDriftLives } from '../../../server/src/report/drift.js';

describe('drift of a concept', () => {
  it('is the entropy of its names and 2 to the power of it', () => {
    // Two names half and half: 1 bit, two names in effect (Shannon 1948, figure 7).
    expect(driftOf([7, 7])).toEqual({ bits: 1, names: 2 });
    // ¾ and ¼: 2 − ¾ log2 3 bits, by hand.
    expect(driftOf([30, 10])!.bits).toBeCloseTo(2 - 0.75 * Math.log2(3), 12);
    // ½ ¼ ⅛ ⅛: 1.75 bits (Cover & Thomas, Elements of Information Theory, example 2.1.1, from memory).
    expect(driftOf([8, 4, 2, 2])!.bits).toBeCloseTo(1.75, 12);
    expect(driftOf([8, 4, 2, 2])!.names).toBeCloseTo(3.363586, 6);
  });

  it('is nothing for one name, and unknown where none is used', () => {
    expect(driftOf([5, 0])).toEqual({ bits: 0, names: 1 });
    expect(driftOf([0, 0])).toBeUndefined();
    expect(driftOf([])).toBeUndefined();
  });

  it('averages over concepts by their uses', () => {
    // 20 uses with 1 bit and 60 with none: H(name | concept) = ¼ bit, by hand.
    const mean = meanDrift([
      [10, 10],
      [60, 0],
      [0, 0],
    ])!;
    expect(mean.bits).toBeCloseTo(0.25, 12);
    expect(mean.names).toBeCloseTo(2 ** 0.25, 12);
    expect(meanDrift([[0]])).toBeUndefined();
  });
});

describe('where drift lives', () => {
  const page = (path: string, ...uses: number[]): { path: string; folder: string; uses: number[] } => ({
    ...{ path, folder: path.slice(0, path.indexOf('/')), uses },
  });

  it('between folders, where each folder has its own name', () => {
    const where = whereDriftLives([page('a/1', 10, 0), page('a/2', 10, 0), page('b/1', 0, 10), page('b/2', 0, 10)])!;
    // The folder tells the name: I = H = 1 bit; chance alone gives (2 − 1)(2 − 1) / (2 · 40 · ln 2) of it.
    expect(where.information).toBeCloseTo(1, 12);
    expect(where.givenFolder).toBeCloseTo(0, 12);
    expect(where.shares.folders).toBeCloseTo(1 - 1 / (80 * Math.LN2), 12);
    expect(where.folders).toEqual([
      { folder: 'a', uses: [20, 0] },
      { folder: 'b', uses: [0, 20] },
    ]);
  });

  it('between pages, where each page has its own name', () => {
    const { shares } = whereDriftLives([
      page('a/1', 10, 0),
      page('a/2', 0, 10),
      page('b/1', 10, 0),
      page('b/2', 0, 10),
    ])!;
    expect(shares.folders).toBe(0);
    // I(name; page) = 1 bit, less (4 − 1)(2 − 1) / (2 · 40 · ln 2).
    expect(shares.pages).toBeCloseTo(1 - 3 / (80 * Math.LN2), 12);
    expect(shares.folders + shares.pages! + shares.inside!).toBeCloseTo(1, 12);
  });

  it('inside pages, where every page mixes alike', () => {
    const where = whereDriftLives([page('a/1', 6, 6), page('b/1', 6, 6)])!;
    expect(where.shares).toEqual({ folders: 0, pages: 0, inside: 1 });
    expect(where.givenPage).toBeCloseTo(1, 12);
  });

  it('is not said of few uses, of one folder, or where hardly anything is mixed', () => {
    expect(whereDriftLives([page('a/1', 5, 4), page('b/1', 4, 5)])).toBeUndefined();
    expect(whereDriftLives([page('a/1', 50, 50), page('a/2', 50, 50)])).toBeUndefined();
    expect(whereDriftLives([page('a/1', 500, 1), page('b/1', 500, 1)])).toBeUndefined();
    expect(whereDriftLives([])).toBeUndefined();
  });

  it('does not part pages from their insides on one use a page', () => {
    const pages = Array.from({ length: 24 }, (_, i) =>
      page(`${i % 2 === 0 ? 'a' : 'b'}/${i}`, i % 3 === 0 ? 1 : 0, i % 3 === 0 ? 0 : 1),
    );
    expect(whereDriftLives(pages)!.shares.pages).toBeUndefined();
  });
});
