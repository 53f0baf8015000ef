// Which questions a termbase answers, and what of the others is still asked.
import { describe, expect, it } from 'vitest';
import { decide } from '../../../server/src/decisions/decide.js';
import { question, termbase } from './questions.js';

const FILE = termbase(`
concepts:
  - preferred: access key
    admitted: [key pair]
    deprecated: [API key, AK]
  - preferred: token
  - preferred: start
    deprecated: [launch]
    with: [job]
  - { preferred: log, partOfSpeech: noun, deprecated: [journal] }
  - { preferred: log, partOfSpeech: verb, deprecated: [record] }
  - preferred: GitHub
    deprecated: [Github]
apart:
  - [sampling interval, reporting interval, time span]
  - [access key, door key]
later:
  - [page, screen]
  - { terms: [drop-down, dropdown], uses: 10 }
`);

/** Decides one question; shows the terms of what is still asked, or the settlement. */
function outcome(terms: string[]): string[][] | string {
  const { open, settled } = decide([FILE], [question(terms)]);
  return settled[0]?.settled ?? open.map((rest) => rest.terms.map(({ text }) => text));
}

describe('questions', () => {
  it.each<[what: string, terms: string[], expected: string[][] | string]>([
    ['nothing decided', ['node', 'host'], [['node', 'host']]],
    ['one term decided', ['API key', 'secret'], [['API key', 'secret']]],
    ['one concept', ['access key', 'API key'], 'one-concept'],
    ['one concept, capitals aside', ['Access Key', 'api key', 'ak'], 'one-concept'],
    ['two concepts of the termbase', ['API key', 'token'], 'two-concepts'],
    ['kept apart', ['sampling interval', 'reporting interval'], 'two-concepts'],
    ['kept apart, three', ['time span', 'sampling interval', 'reporting interval'], 'two-concepts'],
    ['kept apart from the preferred term', ['API key', 'door key'], 'two-concepts'],
    ['some together, the rest apart', ['API key', 'access key', 'token'], 'one-and-two-concepts'],
    ['two of three in one concept', ['API key×9', 'access key×5', 'secret×2'], [['access key', 'secret']]],
    [
      'two of three apart: two questions',
      ['sampling interval', 'reporting interval', 'period'],
      [
        ['sampling interval', 'period'],
        ['reporting interval', 'period'],
      ],
    ],
    ['put off', ['screen', 'page'], 'later'],
    ['put off, a further name', ['screen', 'page', 'view'], [['screen', 'page', 'view']]],
    ['put off, grown but little', ['drop-down×12', 'dropdown×7'], 'later'],
    ['put off, grown to twice', ['drop-down×13', 'dropdown×7'], [['drop-down', 'dropdown']]],
    ['verbs with their object', ['start job/verb', 'launch job/verb'], 'one-concept'],
    ['verbs with another object', ['start race/verb', 'launch race/verb'], [['start race', 'launch race']]],
    ['bare verbs decided for an object', ['start/verb', 'launch/verb'], 'one-concept'],
    ['homonyms by part of speech', ['log/noun', 'record/noun'], [['log', 'record']]],
    ['homonyms by part of speech, decided', ['log/verb', 'record/verb'], 'one-concept'],
    ['capitals alone', ['GitHub', 'Github'], 'one-concept'],
    ['hyphen and space are distinct', ['access-key', 'access key'], [['access-key', 'access key']]],
  ])('%s', (_, terms, expected) => expect(outcome(terms)).toEqual(expected));

  it('are left as they are where nothing is decided about them', () => {
    const asked = question(['node', 'host']);
    expect(decide([FILE], [asked]).open[0]).toBe(asked);
  });

  it('are weighed and placed anew when narrowed', () => {
    const asked = question(['API key×9', 'access key×5', 'secret×2']);
    const [rest] = decide([FILE], [asked]).open;
    expect(rest!.worth).toBe(0.5 * 2);
    expect(rest!.places.map(({ term, firstToken }) => [term, firstToken])).toEqual([
      [0, 1],
      [1, 2],
    ]);
    expect(rest!.id).toMatch(/^synonym:API key\|access key\|secret-[0-9a-z]+$/u);
    expect(decide([FILE], [asked]).open[0]!.id).toBe(rest!.id);
  });

  it('come in order of worth', () => {
    const asked = [question(['a×3', 'b×1']), question(['c×9', 'd×8']), question(['e×3', 'f×1'])];
    expect(decide([], asked).open.map(({ terms }) => terms[0]!.text)).toEqual(['c', 'a', 'e']);
  });

  it('are found by any form of a term', () => {
    const asked = question(['access keys', 'API keys']);
    const terms = asked.terms.map((term) => ({
      ...term,
      forms: [...term.forms, { text: term.text.slice(0, -1), uses: 1 }],
    }));
    expect(decide([FILE], [{ ...asked, terms }]).settled[0]!.settled).toBe('one-concept');
  });
});

describe('look-ups', () => {
  const { decisions } = decide([FILE], []);
  it.each([
    ['access key', 'preferred'],
    ['Access  key', 'preferred'],
    ['key pair', 'admitted'],
    ['api key', 'deprecated'],
    ['access-key', undefined],
    ['Github', 'deprecated'],
    ['GitHub', 'preferred'],
    ['GITHUB', undefined],
    ['log', undefined],
  ])('%s is %s', (text, status) => expect(decisions.statusOf(text)).toBe(status));

  it('tells homonyms apart by part of speech', () => {
    expect(decisions.statusOf('record', 'verb')).toBe('deprecated');
    expect(decisions.statusOf('record', 'noun')).toBeUndefined();
    expect(decisions.conceptOf('log', 'noun')!.terms[1]!.text).toBe('journal');
    expect(decisions.termsOf('log')).toHaveLength(2);
  });

  it('lists the concepts', () => {
    expect(decisions.concepts.map(({ concept }) => concept.preferred.text)).toEqual([
      'access key',
      'token',
      'start',
      'log',
      'log',
      'GitHub',
    ]);
  });
});
