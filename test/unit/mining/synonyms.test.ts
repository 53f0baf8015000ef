// Synonyms: what is asked, what is refused, and that the same documents give the same questions whatever came before.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Corpus } from '../../../server/src/corpus/corpus.js';
import type { Question } from '../../../server/src/mining/question.js';
import { askSynonyms } from '../../../server/src/mining/synonyms/ask.js';
import { corpusOf } from '../../support/corpusOf.js';

function ask(...documents: string[]): Question[] {
  return finish(askSynonyms(corpusOf(documents))).filter(({ kind }) => kind !== 'look-alike');
}

const idsOf = (questions: readonly Question[]): string[] => questions.map(({ id }) => id);

/** Six pages that use a noun in the same six ways, each in words of its own. */
function pagesOf(term: string): string[] {
  return [
    `Type the name of the station into the ${term}. The page lists every match below it.`,
    `The ${term} stands at the top of the page. Click the ${term} and wait.`,
    `An empty ${term} shows all stations. The administrator hides the ${term} from guests.`,
    `Clear the ${term} before you go on. The colour of the ${term} follows the theme.`,
    `Your browser remembers what you typed into the ${term} last week.`,
    `Press the slash key and the ${term} takes the focus. Guests see no ${term} at night.`,
  ];
}

/** Pages that use a verb with an object, several times. */
function pagesWith(verb: string, object: string): string[] {
  return [
    `You can ${verb} the ${object} at any time. Wait until the page is loaded.`,
    `Before you leave the yard, ${verb} the ${object} once. The crew notes the time.`,
    `They ${verb} the ${object} when the weather is calm. It takes an hour.`,
    `We ${verb} the ${object} in spring. The report says who was there.`,
    `Guests never ${verb} the ${object} themselves. The watch tells them why.`,
  ];
}

describe('nouns', () => {
  it('asks about two terms that our list calls one and that are used alike', () => {
    const [question, ...rest] = ask(...pagesOf('search bar'), ...pagesOf('search box').map((text) => `Note. ${text}`));
    expect(rest).toEqual([]);
    expect(question).toMatchObject({ kind: 'synonym', id: 'synonym:search bar|search box' });
    expect(
      question!.terms.map(({ text, uses, documents, partOfSpeech }) => [text, uses, documents, partOfSpeech]),
    ).toEqual([
      ['search bar', 10, 6, 'noun'],
      ['search box', 10, 6, 'noun'],
    ]);
    expect(question!.confidence).toBeGreaterThan(0.5);
    expect(question!.worth).toBeCloseTo(question!.confidence * 10, 10);
    expect(question!.reasons.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['list', 'shared-frames']));
  });

  it('shows places of different documents, each on its term', () => {
    const corpus = corpusOf([...pagesOf('search bar'), ...pagesOf('search box').map((text) => `Note. ${text}`)]);
    const [question] = finish(askSynonyms(corpus));
    for (const term of [0, 1]) {
      const places = question!.places.filter((place) => place.term === term);
      expect(new Set(places.map(({ document }) => document)).size).toBe(3);
      for (const { document, firstToken, lastToken } of places) {
        const { facts } = corpus.documents[document]!;
        const shown = [firstToken, lastToken].map((token) => facts.words[facts.word[token]!]!).join(' ');
        expect(shown).toBe(question!.terms[term]!.text);
      }
    }
  });

  it('asks about terms that differ in one word whose two forms name one thing', () => {
    const questions = ask(...pagesOf('remote machine'), ...pagesOf('remote host').map((text) => `Note. ${text}`));
    expect(idsOf(questions)).toEqual(['synonym:remote host|remote machine']);
    expect(questions[0]!.reasons[0]).toMatchObject({ kind: 'component' });
    expect(questions[0]!.reasons[0]!.text).toContain('“host”');
  });

  it('says of three terms once what they differ in and where all are used', () => {
    const [question] = ask(
      ...pagesOf('remote machine'),
      ...pagesOf('remote host').map((text) => `Note. ${text}`),
      ...pagesOf('remote node').map((text) => `Hint. ${text}`),
    );
    expect(question!.terms).toHaveLength(3);
    const texts = question!.reasons.map(({ text }) => text);
    const told = texts.filter((text) => text.startsWith('they differ only in'));
    expect(told).toHaveLength(1);
    for (const word of ['machine', 'host', 'node']) expect(told[0]).toContain(`“${word}”`);
    expect(texts.filter((text) => text.includes('are used in the same places'))).toEqual([
      expect.stringMatching(/^all are used in the same places: /),
    ]);
  });

  it('asks what the documents themselves say: “A, also called B”', () => {
    const questions = ask(
      'The thrash pen, also called the holding cell, is closed at night.',
      ...pagesOf('thrash pen'),
      ...pagesOf('holding cell').map((text) => `Note. ${text}`),
    );
    expect(idsOf(questions)).toEqual(['synonym:holding cell|thrash pen']);
    expect(questions[0]!.reasons[0]).toMatchObject({ kind: 'definition' });
    expect(questions[0]!.reasons[0]!.text).toContain('thrash pen, also called the holding cell');
  });

  it.each([
    ['minimum value', 'maximum value'],
    ['input file', 'output file'],
    ['primary cell', 'secondary cell'],
    ['type 1', 'type 2'],
    ['user group', 'blue lantern'],
  ])('refuses opposites, closed sets, digits and the merely alike: %s, %s', (one, other) => {
    expect(idsOf(ask(...pagesOf(one), ...pagesOf(other).map((text) => `Note. ${text}`)))).toEqual([]);
  });

  it('leaves abbreviations and clippings to those who ask about them', () => {
    expect(idsOf(ask(...pagesOf('pull request'), ...pagesOf('PR').map((text) => `Note. ${text}`)))).toEqual([]);
    expect(
      idsOf(ask(...pagesOf('config file'), ...pagesOf('configuration file').map((text) => `Note. ${text}`))),
    ).toEqual([]);
  });

  it('takes side by side for two things', () => {
    const beside = [
      'Use the search bar or the search box. Both the search bar and the search box are wide.',
      'The search bar and the search box stand apart. Hide the search box and the search bar.',
      'Colour the search bar, the search box and the frame. A search bar or a search box suffices.',
    ];
    expect(
      idsOf(ask(...pagesOf('search bar'), ...pagesOf('search box').map((text) => `Note. ${text}`), ...beside)),
    ).toEqual([]);
  });

  it.each(['is not to be confused with', 'is different from', 'differs from', ', unlike', ', as opposed to'])(
    'takes “%s” for two things',
    (words) => {
      const apart = ['In spring', 'At sea', 'On land'].map(
        (where) => `${where} the search bar ${words} the search box.`,
      );
      expect(
        idsOf(ask(...pagesOf('search bar'), ...pagesOf('search box').map((text) => `Note. ${text}`), ...apart)),
      ).toEqual([]);
    },
  );

  it('takes separate headings for two things', () => {
    const pages = [...pagesOf('search bar'), ...pagesOf('search box').map((text) => `Note. ${text}`)];
    const separate = ['one', 'two', 'three'].map(
      (n) => `# Part ${n}\n\n## Search bar\n\nWide.\n\n## Search box\n\nNarrow.\n`,
    );
    expect(idsOf(ask(...pages, ...separate))).toEqual([]);
  });
});

describe('verbs with their object', () => {
  it('asks about two verbs of one operation', () => {
    const questions = ask(
      ...pagesWith('throw', 'error'),
      ...pagesWith('raise', 'error').map((text) => `Note. ${text}`),
    );
    expect(questions).toHaveLength(1);
    expect(questions[0]).toMatchObject({
      kind: 'verb-object',
      id: 'verb-object:raise|throw:error',
      objects: ['error'],
    });
    expect(questions[0]!.terms.map(({ text, uses, partOfSpeech }) => [text, uses, partOfSpeech])).toEqual([
      ['raise', 5, 'verb'],
      ['throw', 5, 'verb'],
    ]);
    expect(questions[0]!.reasons[0]!.text).toContain('“throw … error”');
  });

  it('asks about a verb with its particle', () => {
    const questions = ask(
      ...pagesWith('set up', 'connection'),
      ...pagesWith('establish', 'connection').map((text) => `Note. ${text}`),
    );
    expect(idsOf(questions)).toEqual(['verb-object:establish|set up:connection']);
  });

  it.each([
    ['enable', 'disable', 'feature'],
    ['start', 'stop', 'service'],
    ['include', 'contain', 'value'],
    ['paint', 'fold', 'sheet'],
  ])('does not ask about opposites, style and strangers: %s, %s', (one, other, object) => {
    expect(idsOf(ask(...pagesWith(one, object), ...pagesWith(other, object).map((text) => `Note. ${text}`)))).toEqual(
      [],
    );
  });

  it('takes verbs set side by side for two operations', () => {
    const beside = ['Throw or raise the error. Throw and raise the error.', 'They throw or raise the error at noon.'];
    expect(
      idsOf(
        ask(...pagesWith('throw', 'error'), ...pagesWith('raise', 'error').map((text) => `Note. ${text}`), ...beside),
      ),
    ).toEqual([]);
  });
});

describe('the result', () => {
  it('depends on the documents alone, not on what was there before', () => {
    const pages = [
      ...pagesOf('search bar'),
      ...pagesOf('search box').map((text) => `Note. ${text}`),
      ...pagesWith('throw', 'error'),
      ...pagesWith('raise', 'error').map((text) => `Note. ${text}`),
    ];
    const whole = corpusOf(pages);
    const other = corpusOf(['Raise the error in the search box. A zebra throws the error.', ...pagesOf('search box')]);
    const changes = [
      ...other.documents.map(({ uri }) => ({ uri, facts: undefined })),
      ...[...whole.documents].reverse().map(({ uri, facts }) => ({ uri, facts })),
    ];
    const grown = finish(other.apply(changes));
    expect(finish(askSynonyms(grown))).toEqual(finish(askSynonyms(whole)));
  });

  it('is nothing for nothing', () => {
    expect(finish(askSynonyms(Corpus.create()))).toEqual([]);
  });
});
