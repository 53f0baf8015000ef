// The words that go with a term more often than chance: by relation and by segment, strongest first, accidents left out.
import { describe, expect, it } from 'vitest';
import { companionsOf, findCompanions } from '../../../server/src/mining/companions/companions.js';
import type { CompanionRelation, SegmentKind } from '../../../server/src/mining/companions/companions.js';
import { corpusOf } from '../../support/corpusOf.js';

const filler = Array.from(
  { length: 60 },
  (_, at) =>
    `Station ${at} sends readings of wind and water. The crew reads the log at noon. A diver checks the hull. The rusty lamp was painted in spring. The lamp was painted in spring. A rusty nail was painted in spring. The lamp is stored in a crate.`,
);
const pages = Array.from(
  { length: 8 },
  (_, at) =>
    `Rotate the access key of buoy ${at}. You must rotate the access key twice. The access keys expire. The access keys were revoked. You log in to the archive with the access key. Set up the access key.`,
);
const corpus = corpusOf([...pages, ...filler]);
const FORMS = ['access key', 'access keys'];
const words = (relation: CompanionRelation, forms = FORMS): Record<string, number> =>
  Object.fromEntries(
    findCompanions(corpus, forms, 'sentence')
      .related.filter((each) => each.relation === relation)
      .map(({ word, count }) => [word, count]),
  );

describe('companions by relation', () => {
  it('are verbs that act on the term, in the active and the passive, with their particle', () => {
    expect(words('object-of')).toEqual({ rotate: 16, revoke: 8, 'set up': 8 });
  });

  it('are verbs of which it is the subject, and words that lead to it by a preposition', () => {
    expect(words('subject-of')).toEqual({ expire: 8 });
    expect(words('governed-by')).toEqual({ 'archive with': 8 });
    expect(words('governed-by', ['archive'])).toEqual({ 'log in to': 8 });
  });

  it('are the modifiers and the heads around a word', () => {
    expect(words('modified-by', ['lamp'])).toEqual({ rusty: 60 });
    expect(words('modifies', ['rusty'])).toEqual({ lamp: 60, nail: 60 });
  });

  it('are the objects of a verb', () => {
    expect(words('has-object', ['rotate'])).toEqual({ key: 16 });
    expect(words('has-object', ['paint', 'painted'])).toEqual({ lamp: 120, nail: 60 });
    // “Set up” is another verb than “set”.
    expect(words('has-object', ['set'])).toEqual({});
    expect(words('has-object', ['set up'])).toEqual({ key: 8 });
  });

  it('tell the strongest first, none for a term that is not used, and no more than were asked for', () => {
    const found = companionsOf(corpus, FORMS, 5);
    expect(found[0]).toMatchObject({ word: 'rotate', relation: 'object-of', count: 16, documents: 8 });
    expect(found.map(({ strength }) => strength)).toEqual(found.map(({ strength }) => strength).sort((a, b) => b - a));
    expect(companionsOf(corpus, ['anchor chain'], 5)).toEqual([]);
    expect(companionsOf(corpus, ['access key'], 1)).toHaveLength(1);
  });

  it('reach the floor of 5 uses on 3 pages where the documents allow it, and say which floor they reach', () => {
    expect(findCompanions(corpus, FORMS, 'sentence').floor).toEqual({ count: 5, documents: 3 });
    const small = corpusOf([`${pages[0]!} Rotate the access key.`, ...filler]);
    const { floor, related } = findCompanions(small, FORMS, 'sentence');
    expect(floor).toEqual({ count: 2, documents: 1 });
    expect(related.map(({ word }) => word)).toContain('rotate');
  });
});

describe('companions by segment', () => {
  const text = `# Tides

The gauge rises. The pump stops.

The gauge falls.

## Winds

The gauge waits. A pump runs.`;
  const tiny = corpusOf([text, text.replaceAll('gauge', 'meter').replaceAll('pump', 'valve')]);
  const counts = (kind: SegmentKind): { all: number; withTerm: number } => {
    const { all, withTerm } = findCompanions(tiny, ['gauge'], kind).segments;
    return { all, withTerm };
  };

  it('count sentences, paragraphs, sections and documents; headings are segments of their own among the narrow ones', () => {
    expect(counts('sentence')).toEqual({ all: 12, withTerm: 3 });
    expect(counts('paragraph')).toEqual({ all: 8, withTerm: 3 });
    expect(counts('section')).toEqual({ all: 4, withTerm: 2 });
    expect(counts('document')).toEqual({ all: 2, withTerm: 1 });
  });

  it('measure log-likelihood and information from the smoothed counts of segments', () => {
    const { segments } = findCompanions(corpus, FORMS, 'sentence');
    const rotate = segments.companions.find(({ word }) => word === 'rotate')!;
    // Sentences: 60 of the filler's kinds that differ plus 4 that repeat on every page but count in each block: by hand.
    expect({ count: rotate.count, segments: rotate.segments, withTerm: segments.withTerm }).toEqual({
      ...{ count: 16, segments: 16, withTerm: 48 },
    });
    const { all } = segments;
    // Dunning 1993, eq. for G², and four pseudo-segments of weight ¼ (common practice, no source), worked out apart.
    const g2 =
      2 * cell(16, 48, 16, all) + 2 * cell(32, 48, all - 16, all) + 2 * cell(all - 48, all - 48, all - 16, all);
    expect(rotate.strength).toBeCloseTo(g2, 6);
    const p = [16.25, 32.25, 0.25, all - 48 + 0.25].map((count) => count / (all + 1));
    const h = (some: readonly number[]): number => some.reduce((sum, each) => sum - each * Math.log2(each), 0);
    const [term, word] = [48.5 / (all + 1), 16.5 / (all + 1)];
    expect(rotate.entropy).toBeCloseTo(h([word, 1 - word]), 9);
    expect(rotate.conditionalEntropy).toBeCloseTo(h(p) - h([term, 1 - term]), 9);
    expect(rotate.mutualInformation).toBeCloseTo(rotate.entropy - rotate.conditionalEntropy, 9);
    expect(rotate.lift).toBeCloseTo(Math.log2((16 * all) / (48 * 16)), 9);
  });

  it('in windows are the words near a use, within its sentence', () => {
    const near = findCompanions(corpus, ['hull'], 'window').segments.companions.map(({ word }) => word);
    expect(near).toEqual(['check', 'diver']);
  });
});

/** One cell of G²: observed · ln(observed / expected). */
function cell(observed: number, row: number, column: number, n: number): number {
  return observed * Math.log((observed * n) / (row * column));
}

describe('terms whose parts do not predict the whole', () => {
  // Every sentence in words of its own, so that only the words that stay tell of a context.
  const at = (list: string, index: number): string => list.split(' ')[index % list.split(' ').length]!;
  const THINGS = 'buoy mast hull pump winch lamp gauge anchor cable sensor';
  const cold = Array.from(
    { length: 20 },
    (_, n) =>
      `The cold start of a function loads code and costs ${at('latency memory time money', n)}. After a cold start the first ${at('call request query', n)} waits for code. The start of the ${at('race tour trip voyage', n)} is by the ${at(THINGS, n)} at dawn. We saw the start from a ${at('boat pier cliff', n)} in fog. Cold water damages the ${at(THINGS, n)} in winter. The cold sea numbs ${at('hands feet fingers', n)} in winter.`,
  );
  const warm = Array.from(
    { length: 20 },
    (_, n) =>
      `A steel rope holds the ${at(THINGS, n)} in wind. Splice the steel rope of the ${at(THINGS, n + 3)}. Another rope holds the ${at(THINGS, n + 5)} in wind. Splice the rope of the ${at(THINGS, n + 7)}. A steel bolt holds the ${at(THINGS, n + 2)} in wind.`,
  );
  const mixed = corpusOf([...cold, ...warm]);

  it('are kept whole, those that their parts predict are not', () => {
    expect(findCompanions(mixed, ['cold start', 'cold starts'], 'sentence').whole).toMatchObject({
      ...{ text: 'cold start', uses: 40, keptWhole: true },
    });
    expect(findCompanions(mixed, ['steel rope'], 'sentence').whole).toMatchObject({ keptWhole: false });
    expect(findCompanions(mixed, ['rope'], 'sentence').whole).toBeUndefined();
  });

  it('hold their words: a use inside one is no use of its part', () => {
    const start = findCompanions(mixed, ['start', 'starts'], 'sentence');
    expect(start.heldIn.map(({ text, uses }) => [text, uses])).toEqual([['cold start', 40]]);
    expect(start.uses).toHaveLength(40);
    const { uses, heldIn } = findCompanions(mixed, ['rope', 'ropes'], 'sentence');
    expect(heldIn).toEqual([]);
    expect(uses).toHaveLength(40);
  });
});
