// Parallel places: what each source finds on pages about a network of weather buoys, and what the documents' own vetoes refuse.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import type { Corpus } from '../../../server/src/corpus/corpus.js';
import type { Question } from '../../../server/src/mining/question.js';
import { askSynonyms } from '../../../server/src/mining/synonyms/ask.js';
import { PairCollector } from '../../../server/src/mining/synonyms/evidence.js';
import { readNouns } from '../../../server/src/mining/synonyms/nouns.js';
import { findSubstitutions, pairByParallels } from '../../../server/src/mining/synonyms/parallel/evidence.js';
import { readDestinations } from '../../../server/src/mining/synonyms/parallel/destinations.js';
import { compareObjects } from '../../../server/src/mining/synonyms/verbPhrases.js';
import { readVerbUses } from '../../../server/src/mining/synonyms/verbUses.js';
import { readUses } from '../../../server/src/mining/synonyms/wordUse.js';
import { corpusOf } from '../../support/corpusOf.js';

/** Six pages that use a noun often enough to make it a term, each in words of its own. */
function pagesOf(term: string): Record<string, string> {
  const texts = [
    `The crew lifts the ${term} onto the deck. Every ${term} has a number.`,
    `A storm can tear the ${term} from its chain. Paint the ${term} in spring.`,
    `The ${term} reports at noon. When the ${term} is silent, call the harbour.`,
  ];
  return Object.fromEntries(texts.map((text, at) => [`file:///buoys/uses/${term.replace(' ', '-')}-${at}.md`, text]));
}

const BUOYS = { ...pagesOf('drifting buoy'), ...pagesOf('free floater'), ...pagesOf('anchor chain') };

/** The substitutions of terms of a corpus, as “source: a / b”. */
function substitutionsIn(corpus: Corpus): string[] {
  const nouns = finish(readNouns(corpus, readUses(corpus)));
  const name = (unit: number): string => (unit < 0 ? '–' : nouns.terms[unit]!.words.join(' '));
  return nouns.substitutions
    .filter(({ one }) => one >= 0)
    .map(({ source, one, other }) => `${source}: ${[name(one), name(other)].sort().join(' / ')}`);
}

function found(documents: Record<string, string>): string[] {
  return substitutionsIn(corpusOf({ ...BUOYS, ...documents }));
}

describe('links', () => {
  const heading = '# Recovering a drifting buoy\n\nIt takes a calm day.\n';

  it('and the heading they lead to', () => {
    const link = 'Read [recovering a free floater](recover.md) before you sail.';
    expect(found({ 'file:///buoys/recover.md': heading, 'file:///buoys/plan.md': link })).toEqual([
      'link-heading: drifting buoy / free floater',
    ]);
  });

  it('and an anchor on a page, whatever its slug looks like', () => {
    const page = '# Work at sea\n\n## Recovering a drifting buoy\n\nIt takes a calm day.\n';
    for (const anchor of ['recovering-a-drifting-buoy', '_recovering_a_drifting_buoy']) {
      const link = `Read [recovering a free floater](../buoys/sea.md#${anchor}) before you sail.`;
      expect(found({ 'file:///buoys/sea.md': page, 'file:///buoys/plan.md': link })).toEqual([
        'link-heading: drifting buoy / free floater',
      ]);
    }
  });

  it('and other links to the same place', () => {
    const links = [
      'Read [how to recover a free floater](https://example.org/recover) first.',
      'See [how to recover a drifting buoy](https://example.org/recover).',
    ];
    expect(found({ 'file:///buoys/a.md': links[0]!, 'file:///buoys/b.md': links[1]! })).toEqual([
      'same-target: drifting buoy / free floater',
    ]);
  });

  it('say nothing where they differ in more, or not at all, or are bare names', () => {
    for (const text of ['painting the free floater', 'recovering a drifting buoy', 'free floater']) {
      const link = `Read [${text}](recover.md) before you sail.`;
      expect(found({ 'file:///buoys/recover.md': heading, 'file:///buoys/plan.md': link })).toEqual([]);
    }
  });

  it('lead to pages by their path from the root of a site, unless two share it', () => {
    const pages = { 'file:///site/_guide/recover.md': heading, 'file:///site/plan.md': 'Nothing here.' };
    const count = (documents: Record<string, string>): number =>
      readDestinations(corpusOf(documents)).of('file:///site/plan.md', '{{site.url}}/guide/recover/').length;
    expect(count(pages)).toBe(1);
    expect(count({ ...pages, 'file:///site/old/guide/recover.md': heading })).toBe(0);
  });
});

describe('titles', () => {
  it('and their descriptions and headings', () => {
    const page =
      '---\ntitle: Recover a drifting buoy\ndescription: Recover a free floater in calm water\n---\n\n# Recover a free floater\n\nWait.\n';
    expect(found({ 'file:///buoys/recover.md': page })).toEqual([
      'title: drifting buoy / free floater',
      'title: drifting buoy / free floater',
    ]);
  });
});

describe('near-duplicate sentences', () => {
  const sentence = (term: string): string => `Wait for calm water before you bring the ${term} alongside.`;

  it('put one term for another', () => {
    expect(
      found({ 'file:///buoys/a.md': sentence('drifting buoy'), 'file:///buoys/b.md': sentence('free floater') }),
    ).toEqual(['sentence: drifting buoy / free floater']);
  });

  it('are a template where three terms stand by turns', () => {
    expect(
      found({
        'file:///buoys/a.md': sentence('drifting buoy'),
        'file:///buoys/b.md': sentence('free floater'),
        'file:///buoys/c.md': sentence('anchor chain'),
      }),
    ).toEqual([]);
  });

  it('are counted in the evidence, with the pages', () => {
    const corpus = corpusOf({
      ...BUOYS,
      'file:///buoys/a.md': sentence('drifting buoy'),
      'file:///buoys/b.md': sentence('free floater'),
    });
    const { terms, segments } = finish(readNouns(corpus, readUses(corpus)));
    const pairs = new PairCollector(terms.length);
    pairByParallels(corpus, terms, finish(findSubstitutions(corpus, segments)), pairs);
    expect(pairs.pairs().map(({ evidence }) => evidence)).toEqual([
      [
        {
          kind: 'near-sentence',
          strength: 0.2,
          value: 1,
          text: 'one sentence stands on a.md and b.md, once with each name',
        },
      ],
    ]);
  });
});

describe('what is asked', () => {
  const asked = (documents: Record<string, string>): Question[] =>
    finish(askSynonyms(corpusOf({ ...BUOYS, ...documents })));
  const ids = (questions: readonly Question[], kind: string): string[] =>
    questions.filter((question) => question.kind === kind).map(({ id }) => id);

  it.each([
    'The free floater has been renamed to drifting buoy.',
    'The drifting buoy, formerly known as the free floater, needs no chain.',
    'The drifting buoy was previously called a free floater.',
  ])('is a renamed thing whose old name is still in use: %s', (statement) => {
    const questions = asked({ 'file:///buoys/names.md': statement });
    expect(ids(questions, 'synonym')).toEqual(['synonym:drifting buoy|free floater']);
    expect(questions[0]!.reasons[0]!.kind).toBe('renaming');
  });

  it('is not what gets another name in passing', () => {
    for (const statement of ['Every free floater is renamed by the crew.', 'The drifting buoy was a free floater.']) {
      expect(ids(asked({ 'file:///buoys/names.md': statement }), 'synonym')).toEqual([]);
    }
  });

  it('is not asked by default for sentences alone', () => {
    const sentences = {
      'file:///buoys/a.md': 'Wait for calm water before you bring the drifting buoy alongside.',
      'file:///buoys/b.md': 'Wait for calm water before you bring the free floater alongside.',
    };
    expect(ids(asked(sentences), 'synonym')).toEqual([]);
    expect(ids(asked(sentences), 'look-alike')).toContain('look-alike:drifting buoy|free floater');
  });

  it('is refused where headings are alike but for the two', () => {
    const headings = {
      'file:///buoys/work.md':
        '# Work\n\n## Painting a drifting buoy\n\nRed.\n\n## Painting a free floater\n\nYellow.\n\n## Lifting a drifting buoy\n\nBy crane.\n\n## Lifting a free floater\n\nBy hand.\n',
      'file:///buoys/a.md': 'Wait for calm water before you bring the drifting buoy alongside.',
      'file:///buoys/b.md': 'Wait for calm water before you bring the free floater alongside.',
    };
    expect(ids(asked(headings), 'look-alike')).not.toContain('look-alike:drifting buoy|free floater');
  });

  it('does not depend on the order of the documents', () => {
    const documents = {
      ...BUOYS,
      'file:///buoys/names.md': 'The free floater has been renamed to drifting buoy.',
      'file:///buoys/a.md': 'Wait for calm water before you bring the drifting buoy alongside.',
      'file:///buoys/b.md': 'Wait for calm water before you bring the free floater alongside.',
    };
    const turned = Object.fromEntries(Object.entries(documents).reverse());
    expect(finish(askSynonyms(corpusOf(turned)))).toEqual(finish(askSynonyms(corpusOf(documents))));
  });
});

describe('objects of verbs', () => {
  it('are the same where their modifiers are', () => {
    const corpus = corpusOf([
      'Save the log file. Save the log file at noon. Write the station file. Write the log file.',
      'Save the log file and write the log file.',
    ]);
    const read = finish(readVerbUses(corpus, readUses(corpus)));
    const usesOf = (verb: string) => read.usesOf(read.pairs.find(read.verbs.find(verb)!, read.objects.find('file')!)!);
    expect(compareObjects(corpus, usesOf('save'), usesOf('write'))).toEqual({
      share: 2 / 3,
      sameSentence: 1,
      pages: 2,
    });
  });
});
