// Two terms compared: what speaks for one concept and against it, with figures, sentences, and what would be asked.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { compareTwoTerms } from '../../../server/src/engine/comparison.js';
import type { TermComparison } from '../../../server/src/engine/comparison.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import type { Snapshot } from '../../../server/src/engine/snapshot.js';

const profiles = new Profiles();
const ROOT = 'file:///docs/';

function document(name: string, text: string) {
  return { uri: ROOT + name, source: { uri: ROOT + name, format: 'markdown' as const, text } };
}

function snapshotOf(pages: Readonly<Record<string, string>>, termbase = ''): Snapshot {
  const engine = new Engine(profiles);
  engine.apply({
    documents: Object.entries(pages).map(([name, text]) => document(name, text)),
    termbases: [{ uri: `${ROOT}termbase.yaml`, text: termbase }],
  });
  return finish(engine.settle());
}

function compare(snapshot: Snapshot, a: string, b: string): TermComparison {
  const found = compareTwoTerms(snapshot, ROOT, a, b);
  if (found.kind !== 'known') throw new Error(`${a} and ${b}: ${found.kind}`);
  return found;
}

const kinds = (points: readonly { kind: string }[]): string[] => points.map(({ kind }) => kind);

/** Pages that use a noun in the same ways, in a folder of their own. */
const pagesOf = (folder: string, term: string): Record<string, string> =>
  Object.fromEntries(
    [
      `Type the name of the station into the ${term}. The page lists every match below it.`,
      `The ${term} stands at the top of the page. Click the ${term} and wait.`,
      `An empty ${term} shows all stations. The administrator hides the ${term} from guests.`,
      `Reset the ${term} before you go on. The colour of the ${term} follows the theme. Reset the ${term} at noon.`,
      `Your browser remembers what you typed into the ${term} last week. You reset the ${term} with a key.`,
      `Press the slash key and the ${term} takes the focus. Guests see no ${term} at night. They reset the ${term} often.`,
    ].map((text, at) => [`${folder}/page${at}.md`, text]),
  );
/** Pages about other things, so that words have uses apart from the two terms. */
const OTHERS = Object.fromEntries(
  ['logger', 'mast', 'hull', 'anchor', 'battery', 'antenna'].map((thing, at) => [
    `others/${thing}.md`,
    `Check the ${thing} of buoy ${at}. The ${thing} is made of steel. Open the ${thing} with care. A new ${thing} costs ${at}0 coins. The crew paints the ${thing} in spring. Store the ${thing} in a dry place.`,
  ]),
);
const MIXED = {
  ...OTHERS,
  ...pagesOf('web', 'search bar'),
  ...pagesOf('app', 'search box'),
};

describe('for one concept', () => {
  const found = compare(snapshotOf(MIXED), 'search bar', 'search box');

  it('speak list, shared companions, shared frames and likeness in use, in plain words with figures', () => {
    expect(kinds(found.speaksFor)).toEqual(
      expect.arrayContaining(['list', 'shared-companions', 'shared-frames', 'similarity']),
    );
    expect(found.speaksAgainst).toEqual([]);
    expect(found.speaksFor.find(({ kind }) => kind === 'shared-companions')!.text).toMatch(
      /“reset ___” \(4 and 4 times\)/,
    );
    for (const { text, value } of [...found.speaksFor, ...found.speaksAgainst]) {
      expect(text).not.toMatch(/undefined|NaN/);
      expect(Number.isFinite(value)).toBe(true);
    }
  });

  it('tell the folder from the choice inside pages, in bits', () => {
    const { choice } = found.figures;
    const uses = found.terms.map((term) => term.uses.length);
    expect(uses).toEqual([13, 13]);
    // Two names as often as one another, each in its folder alone: H = 1 bit, all of it told by the folder (Shannon 1948).
    expect(choice).toMatchObject({
      entropy: 1,
      byFolder: 1,
      withinFolders: 0,
      withinDocuments: 0,
      documentsWithBoth: 0,
    });
    expect(choice.folders).toEqual([
      { folder: `${ROOT}app/`, uses: [0, 13] },
      { folder: `${ROOT}web/`, uses: [13, 0] },
    ]);
  });

  it('ends with the question that is asked, or that the termbase has decided', () => {
    expect(found.verdict).toMatchObject({ stage: 'asked', question: { kind: 'synonym' } });
    const one = 'concepts:\n  - preferred: search bar\n    deprecated: [search box]\n';
    expect(compare(snapshotOf(MIXED, one), 'search bar', 'search box').verdict).toEqual({
      ...{ stage: 'decided', text: 'The termbase has decided: one concept.' },
    });
    const two = 'apart:\n  - [search bar, search box]\n';
    expect(compare(snapshotOf(MIXED, two), 'search box', 'search bar').verdict.text).toBe(
      'The termbase has decided: two concepts.',
    );
  });

  it('show sentences in which either stands in the other’s place', () => {
    expect(found.alternating.filter(({ term }) => term === 'search bar')).toHaveLength(3);
    for (const { term, text, uri } of found.alternating) {
      expect(text.toLowerCase()).toContain(term);
      expect(uri).toContain(term === 'search bar' ? '/web/' : '/app/');
    }
  });

  it('is the same from either side', () => {
    const turned = compare(snapshotOf(MIXED), 'search box', 'search bar');
    expect(turned.figures.usage.similarity).toBeCloseTo(found.figures.usage.similarity, 12);
    expect(turned.figures.companions.shared.map(({ word, counts }) => [word, [...counts].reverse()])).toEqual(
      found.figures.companions.shared.map(({ word, counts }) => [word, [...counts]]),
    );
    expect(kinds(turned.speaksFor).sort()).toEqual(kinds(found.speaksFor).sort());
  });
});

describe('against one concept', () => {
  it('speak opposites, and nothing is asked', () => {
    const pages = { ...OTHERS, ...pagesOf('web', 'minimum value'), ...pagesOf('app', 'maximum value') };
    const found = compare(snapshotOf(pages), 'minimum value', 'maximum value');
    expect(kinds(found.speaksAgainst)).toContain('opposite');
    expect(found.verdict.stage).not.toMatch(/asked/);
  });

  it('speak sentences that set them side by side, which are shown', () => {
    const beside = {
      ...MIXED,
      'both.md':
        'The page has a search bar and a search box. Use the search bar or the search box. Hide the search bar, not the search box.',
    };
    const found = compare(snapshotOf(beside), 'search bar', 'search box');
    expect(found.figures.usage).toMatchObject({ coordinated: 2, contrasted: 1 });
    expect(kinds(found.speaksAgainst)).toEqual(expect.arrayContaining(['coordinated', 'contrasted']));
    expect(found.together.map(({ text }) => text)).toContain('The page has a search bar and a search box.');
    expect(found.figures.together).toMatchObject({ withBoth: 3 });
  });

  it('speak headings of their own on one page', () => {
    const headed = {
      ...MIXED,
      'both.md': '# Search bar\n\nThe bar is at the top.\n\n# Search box\n\nThe box is below.',
    };
    const found = compare(snapshotOf(headed), 'search bar', 'search box');
    expect(found.verdict.stage).toBe('separate');
    expect(kinds(found.speaksAgainst)).toContain('separate');
  });

  it('speak companions that one has alone though the other should have them', () => {
    const alone = {
      ...MIXED,
      'a.md':
        'Polish the search bar. Then polish the search bar. They polish the search bar. We polish the search bar.',
    };
    const found = compare(snapshotOf(alone), 'search bar', 'search box');
    expect(found.speaksAgainst.map(({ text }) => text)).toEqual(['only “search bar” goes with “polish ___” (4 times)']);
  });
});

describe('a sentence that is repeated', () => {
  it('counts once among all sentences, as it does among those with a term', () => {
    const repeated = { ...MIXED, 'copy.md': `${MIXED['web/page0.md']!}\n` };
    const { together } = compare(snapshotOf(repeated), 'search bar', 'search box').figures;
    expect(together).toEqual(compare(snapshotOf(MIXED), 'search bar', 'search box').figures.together);
    const sentences = Object.values(MIXED).flatMap((text) => text.match(/\.(?= |$)/g)!);
    expect(together.sentences).toBe(sentences.length);
  });
});

describe('what cannot be compared', () => {
  const snapshot = snapshotOf(MIXED);
  it('is an unknown term, with names that are near, and forms of one term', () => {
    expect(compareTwoTerms(snapshot, ROOT, 'search bar', 'serch box')).toEqual({
      ...{ kind: 'unknown', term: 'serch box', nearest: ['search box'] },
    });
    expect(compareTwoTerms(snapshot, ROOT, 'search bar', 'Search  Bar').kind).toBe('same');
  });

  it('is a term that stands within the other alone', () => {
    const within = snapshotOf({ 'a.md': 'Rotate the access key. The access key expires. Store the access key.' });
    expect(compareTwoTerms(within, ROOT, 'key', 'access key')).toEqual({
      ...{ kind: 'within', term: 'key', whole: 'access key' },
    });
  });

  it('is not a term that another language uses more', () => {
    const pages = snapshotOf({
      'a.md':
        'Put the badge of the harbour on the mast of the buoy, and keep the insigne dry. You can find a badge in the box that came with it. The insigne is there.',
      'b.md':
        'La station a une insigne, et cette insigne est sur le mât de la bouée. Il y a une insigne dans la boîte, et une insigne dans le port de la ville.',
    });
    expect(pages.relations.languages.map(({ language }) => language)).toEqual(['en', 'fr']);
    const found = compare(pages, 'badge', 'insigne');
    expect([found.language, ...found.terms.map(({ uses }) => uses.length)]).toEqual(['en', 2, 2]);
    expect(compareTwoTerms(pages, ROOT, 'badge', 'bouée').kind).toBe('two-languages');
  });

  it('is not a verb, and not a term too rare to be asked about', () => {
    const verbs = snapshotOf({
      ...MIXED,
      'v.md': 'Restart the logger. We reboot the logger. They restart the logger at noon.',
    });
    const found = compare(verbs, 'restart', 'reboot');
    expect(found.terms.map(({ partOfSpeech, uses }) => [partOfSpeech, uses.length])).toEqual([
      ['verb', 2],
      ['verb', 1],
    ]);
    expect(found.verdict.stage).toBe('verbs');
  });

  it('tells what past edits did', () => {
    const replacement = (from: string, to: string, sentence: number) => {
      return { from, to, before: 'the', after: '', mends: false, page: 1, sentences: [sentence] };
    };
    const pastEdits = {
      commits: [[replacement('search box', 'search bar', 1)], [replacement('search box', 'search bar', 2)]],
    };
    const found = compareTwoTerms(snapshot, ROOT, 'search bar', 'search box', { pastEdits });
    if (found.kind !== 'known') throw new Error(found.kind);
    expect(found.figures.pastEdits).toMatchObject({ aByB: { commits: 0 }, bByA: { commits: 2, sentences: 2 } });
    expect(kinds(found.speaksFor)).toContain('past-edit');
  });
});

describe('a comparison', () => {
  it('depends on the documents alone, whatever their order and history', () => {
    const names = Object.keys(MIXED);
    const whole = compare(snapshotOf(MIXED), 'search bar', 'search box');
    fc.assert(
      fc.property(
        fc.shuffledSubarray(names, { minLength: names.length }),
        fc.constantFrom(...names),
        (order, edited) => {
          const engine = new Engine(profiles);
          engine.apply({ documents: [document(edited, 'The search bar is red. A search box is blue.')] });
          finish(engine.settle());
          for (const name of order)
            engine.apply({ documents: [document(name, (MIXED as Readonly<Record<string, string>>)[name]!)] });
          engine.apply({ termbases: [{ uri: `${ROOT}termbase.yaml`, text: '' }] });
          expect(compare(finish(engine.settle()), 'search bar', 'search box')).toEqual(whole);
        },
      ),
      { numRuns: 4 },
    );
  }, 30_000);
});
