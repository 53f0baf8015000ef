// Counting past replacements of terms, and what the counts say to the engine of synonyms.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { alignmentDistance } from '../../../server/src/base/editDistance.js';
import { heedPastEdits } from '../../../server/src/mining/heedPastEdits.js';
import { countReplacements, replacedBetween } from '../../../server/src/mining/pastEdits.js';
import type { PastEdits, Replacement } from '../../../server/src/mining/pastEdits.js';
import type { Question, QuestionTerm } from '../../../server/src/mining/question.js';
import { PairCollector } from '../../../server/src/mining/synonyms/evidence.js';
import { pairByPastEdits, pastEditKey } from '../../../server/src/mining/synonyms/pastEdits.js';
import { askSynonyms } from '../../../server/src/mining/synonyms/ask.js';
import type { Term } from '../../../server/src/mining/synonyms/terms.js';
import { corpusOf } from '../../support/corpusOf.js';

let sentence = 0;
const replacement = (from: string, to: string, more: Partial<Replacement> = {}): Replacement => ({
  ...{ from, to, before: '', after: '', mends: false, page: 1, sentences: [sentence++] },
  ...more,
});
const edits = (...commits: Replacement[][]): PastEdits => ({ commits });

describe('replacements are counted', () => {
  it('by direction, in commits, pages and sentences', () => {
    const past = edits(
      [replacement('folder', 'directory', { sentences: [-1, -2] }), replacement('folder', 'directory', { page: 2 })],
      [replacement('folder', 'directory'), replacement('directory', 'folder')],
    );
    const { aByB, bByA } = replacedBetween(past, ['folder', 'folders'], ['Directory']);
    expect(aByB).toMatchObject({ commits: 2, pages: 2, sentences: 4, mended: 0 });
    expect(bByA).toMatchObject({ commits: 1, pages: 1, sentences: 1, mended: 0 });
    expect(replacedBetween(past, ['page'], ['file']).aByB).toEqual({ commits: 0, pages: 0, sentences: 0, mended: 0 });
  });

  it('once where several commits changed the same sentence, and apart where a mistake was mended', () => {
    const same = replacement('folder', 'directory');
    const past = edits([same], [same], [replacement('folder', 'directory', { mends: true })]);
    expect(replacedBetween(past, ['folder'], ['directory']).aByB).toMatchObject({
      commits: 1,
      sentences: 1,
      mended: 1,
    });
  });

  it('between the longest terms that the words and those beside them make', () => {
    const past = edits([replacement('query', 'url', { before: 'set the', after: 'parameter of' })]);
    const terms = new Set(['query', 'url', 'query parameter', 'url parameter']);
    const pairs = countReplacements(past, (words) => (terms.has(words) ? words : undefined));
    expect(pairs).toMatchObject([{ from: 'query parameter', to: 'url parameter', commits: 1 }]);
    terms.delete('url parameter');
    expect(countReplacements(past, (words) => (terms.has(words) ? words : undefined))).toMatchObject([
      { from: 'query', to: 'url' },
    ]);
  });
});

describe('as evidence of synonyms', () => {
  const terms = ['folder', 'directory', 'worker', 'work', 'plug-in'].map((text): Term => ({
    key: pastEditKey(text),
    words: text.split(' '),
    forms: [],
    uses: 9,
  }));
  const evidenceOf = (past: PastEdits | undefined): object[] => {
    const pairs = new PairCollector(terms.length);
    pairByPastEdits(terms, past, pairs);
    return pairs.pairs();
  };

  it('speak the louder the more often they were made on their own', () => {
    const many = Array.from({ length: 6 }, () => [replacement('folders', 'directories')]);
    expect(evidenceOf(edits(...many))).toMatchObject([
      {
        a: 0,
        b: 1,
        evidence: [
          {
            kind: 'past-edit',
            strength: 0.75,
            value: 6,
            text: 'writers replaced “folder” by “directory” 6 times, never the other way round',
          },
        ],
      },
    ]);
    expect(evidenceOf(edits(many.flat()))).toMatchObject([{ evidence: [{ strength: 0.2, value: 1 }] }]);
    const onPages = many.flat().map((one, page) => ({ ...one, page }));
    expect(evidenceOf(edits(onPages))).toMatchObject([{ evidence: [{ value: 6 }] }]);
  });

  it('say nothing where writers went both ways or mended mistakes', () => {
    const there = [replacement('folder', 'directory')];
    expect(evidenceOf(edits(there, [replacement('directory', 'folder')]))).toEqual([]);
    expect(evidenceOf(edits(there, [replacement('folder', 'directory', { mends: true })]))).toEqual([]);
    expect(evidenceOf(undefined)).toEqual([]);
  });

  it('say nothing of two forms of a word, of slips, and of terms that are no longer used', () => {
    expect(evidenceOf(edits([replacement('worker', 'work'), replacement('plug-in', 'plugin')]))).toEqual([]);
    expect(evidenceOf(edits([replacement('folder', 'catalogue')]))).toEqual([]);
  });
});

describe('a habit of past edits', () => {
  const SAID = ['starts the job', 'reads its queue', 'writes a log', 'waits for the server', 'stops after a minute'];
  const pages = ['runner', 'worker'].flatMap((name) =>
    SAID.map((said, at) => `Every ${name} ${said}. Then the ${name} ${SAID[(at + 1) % SAID.length]!}.`),
  );
  const OTHERS = ['antenna', 'cable', 'battery', 'sensor', 'mast', 'hull'].flatMap((name) =>
    ['needs care', 'is checked once a year', 'has a number', 'came with a manual'].map(
      (said) => `The ${name} ${said}.`,
    ),
  );
  const corpus = corpusOf([...pages, ...OTHERS]);
  const asked = (past: PastEdits | undefined): string[] =>
    finish(askSynonyms(corpus, { pastEdits: past }))
      .filter(({ kind }) => kind === 'synonym')
      .map(({ terms }) => terms.map(({ text }) => text).join(' | '));
  const many = Array.from({ length: 8 }, () => [replacement('runner', 'worker')]);

  it('has two names asked about that no list knows, and one edit has not', () => {
    expect(asked(edits(...many))).toEqual(['runner | worker']);
    expect(asked(edits(many[0]!))).toEqual([]);
    expect(asked(undefined)).toEqual([]);
  });
});

describe('questions heed past edits', () => {
  const term = (text: string, uses: number, ...forms: string[]): QuestionTerm => ({
    ...{ text, uses, documents: 1 },
    forms: [text, ...forms].map((form) => ({ text: form, uses })),
  });
  const question = (...terms: QuestionTerm[]): Question => ({
    ...{ id: 'q', kind: 'variant', confidence: 0.9, worth: 1, terms, places: [] },
    reasons: [{ kind: 'spelling', text: 'one word, two spellings', value: 1 }],
  });
  const plugins = question(term('plug-in', 9, 'plug-ins'), term('plugin', 4, 'Plugins'));
  const moved = edits([replacement('plug-ins', 'plugins')], [replacement('plug-in', 'plugin')]);

  it('with a reason, and the name that writers moved to', () => {
    const [heeded] = heedPastEdits([plugins], moved);
    expect(heeded?.reasons.map(({ text }) => text)).toEqual([
      'one word, two spellings',
      'writers replaced “plug-in” by “plugin” twice, never the other way round',
    ]);
    expect(heeded?.preferred).toMatchObject({ text: 'plugin', reason: { kind: 'past-edit', value: 2 } });
  });

  it('without a name to prefer where it was done once, or something else prefers one', () => {
    const [once] = heedPastEdits([plugins], edits([replacement('plug-in', 'plugin')]));
    expect(once?.reasons[1]?.text).toBe('writers replaced “plug-in” by “plugin” once');
    expect(once?.preferred).toBeUndefined();
    const preferred = { text: 'plug-in', reason: { kind: 'glossary', text: 'it has an entry', value: 1 } };
    expect(heedPastEdits([{ ...plugins, preferred }], moved)[0]?.preferred).toBe(preferred);
  });

  it('of several names the one that none left', () => {
    const three = question(term('file', 9), term('page', 5), term('sheet', 3));
    const chain = edits(
      ...[1, 2, 3].map(() => [replacement('file', 'page')]),
      ...[1, 2].map(() => [replacement('page', 'sheet')]),
    );
    expect(heedPastEdits([three], chain)[0]?.preferred?.text).toBe('sheet');
  });

  it('and stay as they are where nothing was replaced, or both ways', () => {
    expect(heedPastEdits([plugins], undefined)).toEqual([plugins]);
    expect(heedPastEdits([plugins], edits([replacement('page', 'file')]))).toEqual([plugins]);
    const both = edits([replacement('plug-in', 'plugin')], [replacement('plugin', 'plug-in')]);
    expect(heedPastEdits([plugins], both)).toEqual([plugins]);
  });
});

describe('the alignment distance', () => {
  // Common examples of the measure (from memory): one swap, one substitution, and the textbook's kitten and sitting.
  it.each([
    ['from', 'form', 1],
    ['stat', 'start', 1],
    ['kitten', 'sitting', 3],
    ['', 'abc', 3],
    ['ca', 'abc', 3],
  ])('of %j and %j is %d', (a, b, expected) => {
    expect(alignmentDistance(a, b)).toBe(expected);
    expect(alignmentDistance(b, a)).toBe(expected);
  });
});
