// The parts of the synonym engine by themselves: clusters, comparison of terms, abbreviations, link targets, the score.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { lin, sparseVector } from '../../../server/src/corpus/statistics/similarity.js';
import { isAbbreviated } from '../../../server/src/mining/synonyms/apart.js';
import { clusterPairs } from '../../../server/src/mining/synonyms/clusters.js';
import { isGeneralNoun, isGeneralVerb } from '../../../server/src/mining/synonyms/generalWords.js';
import { resolveTarget } from '../../../server/src/mining/synonyms/linkTargets.js';
import { selfSimilarity, termsToHalve } from '../../../server/src/mining/synonyms/likeness.js';
import { compareTerms } from '../../../server/src/mining/synonyms/neighbours.js';
import { bestScoreOf, confidenceOf, isGrounded, scoreOf } from '../../../server/src/mining/synonyms/score.js';
import type { Known } from '../../../server/src/mining/synonyms/score.js';

describe('clusters by complete link', () => {
  it('joins terms of which every two hold', () => {
    const pairs = [
      { a: 0, b: 1, score: 3 },
      { a: 0, b: 2, score: 1 },
      { a: 1, b: 2, score: 2 },
    ];
    expect(clusterPairs(pairs, 3)).toEqual([{ members: [0, 1, 2], weakest: 1 }]);
  });

  it('does not chain: a term that holds to one member alone stays out', () => {
    const pairs = [
      { a: 0, b: 1, score: 3 },
      { a: 1, b: 2, score: 2 },
    ];
    expect(clusterPairs(pairs, 3)).toEqual([{ members: [0, 1], weakest: 3 }]);
  });
});

describe('comparison of terms', () => {
  const vectors = [
    sparseVector([
      [1, 2],
      [2, 1],
      [5, 4],
    ]),
    sparseVector([
      [1, 1],
      [2, 3],
      [6, 1],
    ]),
    sparseVector([
      [5, 4],
      [1, 2],
    ]),
    sparseVector([[9, 1]]),
  ];

  it('agrees with the measure computed pair by pair, and ranks by it', () => {
    const { likeness } = finish(
      compareTerms(
        vectors,
        [
          { a: 0, b: 1 },
          { a: 0, b: 2 },
          { a: 0, b: 3 },
        ],
        [],
        0,
      ),
    );
    for (const b of [1, 2, 3]) expect(likeness.get(b)!.similarity).toBeCloseTo(lin(vectors[0]!, vectors[b]!), 12);
    expect(likeness.get(2)).toMatchObject({ rankOfB: 1, rankOfA: 1 });
    expect(likeness.get(1)).toMatchObject({ rankOfB: 2, rankOfA: 1 });
    expect(likeness.get(3)!.rankOfB).toBe(3);
  });

  it('lists the nearest, most alike first', () => {
    const { nearest } = finish(compareTerms(vectors, [], [0], 5));
    expect(nearest.get(0)).toEqual([2, 1]);
    expect(finish(compareTerms(vectors, [], [0], 1)).nearest.get(0)).toEqual([2]);
  });
});

describe('the yardstick of similarity', () => {
  it('grows with use along a fitted line', () => {
    const halves = [8, 32, 128].map((uses, i) => ({
      one: sparseVector([
        [1, 1],
        [2, 4 - i],
      ]),
      other: sparseVector([
        [1, 1],
        [3, 4 - i],
      ]),
      uses,
    }));
    const self = selfSimilarity(halves);
    expect(self(64)).toBeGreaterThan(self(4));
    expect(selfSimilarity([])(10)).toBeGreaterThan(0);
  });

  it('halves terms of all frequencies that are used often enough', () => {
    expect(termsToHalve(Uint32Array.from([500, 3, 20, 10, 9]))).toEqual([0, 2, 3]);
  });
});

describe('abbreviations', () => {
  it.each([
    ['pr', 'pull request', true],
    ['query dsl', 'query domain-specific language', true],
    ['uuid', 'unique identifier', true],
    ['search bar', 'search box', false],
    ['port', 'tcp port', false],
    ['ui', 'web interface', false],
  ])('%s, %s: %s', (one, other, expected) => {
    expect(isAbbreviated(one.split(' '), other.split(' '))).toBe(expected);
    expect(isAbbreviated(other.split(' '), one.split(' '))).toBe(expected);
  });
});

describe('link targets', () => {
  it.each([
    ['file:///docs/a/page.md', '../b/keys.md', 'file:///docs/b/keys'],
    ['file:///docs/a/page.md', './keys.html#rotate', 'file:///docs/a/keys#rotate'],
    ['file:///docs/a/page.md', '#rotate', 'file:///docs/a/page#rotate'],
    ['file:///docs/a/page.md', 'b/index.md', 'file:///docs/a/b'],
    ['file:///docs/a/page.md', 'https://example.org/x/', 'https://example.org/x'],
  ])('%s → %s', (uri, target, expected) => {
    expect(resolveTarget(uri, target)).toBe(expected);
  });
});

describe('the score', () => {
  const known: Known = {
    evidence: [{ kind: 'list', strength: 1, text: '', value: 1 }],
    likeness: { similarity: 0.2, rankOfA: 2, rankOfB: 3 },
    self: 0.25,
    sideBySide: { coordinated: 0, contrasted: 0 },
    siblings: 0,
    shape: 'multiword',
    sharesWord: true,
    properNames: 0,
    general: 0,
    fewest: 20,
    formula: false,
  };

  it('asks where list and usage agree, and not without evidence of identity', () => {
    expect(scoreOf(known)).toBeGreaterThan(0.5);
    expect(scoreOf({ ...known, evidence: [] })).toBeLessThan(0);
  });

  it.each<Partial<Known>>([
    { sideBySide: { coordinated: 3, contrasted: 0 } },
    { siblings: 2 },
    { properNames: 2 },
    { general: 2 },
    { shape: 'contained' },
    { likeness: { similarity: 0.01, rankOfA: 600, rankOfB: 900 } },
  ])('falls with what speaks against: %o', (against) => {
    expect(scoreOf({ ...known, ...against })).toBeLessThan(scoreOf(known) - 0.5);
  });

  it('holds single words, and one term inside another, to a word of the documents', () => {
    const statement = { kind: 'definition' as const, strength: 0.3, text: '', value: 1 };
    expect(isGrounded(known)).toBe(true);
    expect(isGrounded({ ...known, shape: 'words' })).toBe(false);
    expect(isGrounded({ ...known, shape: 'words', evidence: [...known.evidence, statement] })).toBe(true);
    expect(isGrounded({ ...known, shape: 'contained' })).toBe(false);
    expect(isGrounded({ ...known, general: 2 })).toBe(false);
    expect(isGrounded({ ...known, likeness: { similarity: 0.05, rankOfA: 2, rankOfB: 3 } })).toBe(false);
    expect(isGrounded({ ...known, formula: true })).toBe(false);
  });

  it('holds a renaming to what the old name means today', () => {
    const renamed: Known = { ...known, evidence: [{ kind: 'renaming', strength: 0.9, text: '', value: 1 }] };
    expect(isGrounded(renamed)).toBe(true);
    expect(isGrounded({ ...renamed, likeness: { similarity: 0.05, rankOfA: 90, rankOfB: 80 } })).toBe(false);
  });

  it('holds what a list itself doubts to more uses, and single words to a second place', () => {
    const doubtful: Known = { ...known, evidence: [{ kind: 'list', strength: 0.65, text: '', value: 0.65 }] };
    expect(isGrounded(doubtful)).toBe(true);
    expect(isGrounded({ ...doubtful, fewest: 9 })).toBe(false);
    expect(isGrounded({ ...known, fewest: 9 })).toBe(true);
    const said = (value: number): Known => ({
      ...doubtful,
      shape: 'words',
      evidence: [...doubtful.evidence, { kind: 'definition', strength: 0.3, text: '', value }],
    });
    expect(isGrounded(said(1))).toBe(false);
    expect(isGrounded(said(2))).toBe(true);
  });

  it('counts a template once, and siblings of a template not at all', () => {
    const near = (value: number, sharesWord: boolean): number =>
      scoreOf({ ...known, sharesWord, evidence: [{ kind: 'near-sentence', strength: 0.2, text: '', value }] });
    expect(near(3, false)).toBeGreaterThan(near(1, false));
    expect(near(30, false)).toBe(near(3, false));
    expect(near(3, true)).toBe(scoreOf({ ...known, evidence: [] }));
  });

  it('never exceeds its bound', () => {
    expect(scoreOf(known)).toBeLessThanOrEqual(bestScoreOf(known, known.likeness.similarity / known.self));
    expect(bestScoreOf(known, 0.8)).toBeLessThanOrEqual(bestScoreOf(known, 1));
  });

  it('becomes a confidence between 0 and 1, a half at 0', () => {
    expect(confidenceOf(0)).toBe(0.5);
    expect(confidenceOf(20)).toBeLessThanOrEqual(1);
    expect(confidenceOf(-20)).toBeGreaterThanOrEqual(0);
  });
});

describe('words of general English', () => {
  it('are told from words of the field', () => {
    expect(isGeneralNoun('benefit')).toBe(true);
    expect(isGeneralNoun('folder')).toBe(false);
    expect(isGeneralVerb('utilize')).toBe(true);
    expect(isGeneralVerb('launch')).toBe(false);
  });
});
