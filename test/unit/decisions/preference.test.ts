// The suggested term, its reason, and the answers on offer.
import { describe, expect, it } from 'vitest';
import { decide } from '../../../server/src/decisions/decide.js';
import { answersOf, preferenceOf } from '../../../server/src/decisions/preference.js';
import type { Answer } from '../../../server/src/termbase/answer.js';
import { question, term, termbase } from './questions.js';

const FILE = termbase(`
concepts:
  - { preferred: access key, deprecated: [API key] }
  - { preferred: sign in, deprecated: [log in] }
  - { preferred: data center, deprecated: [datacenter] }
  - { preferred: file name, deprecated: [filename] }
  - { preferred: setup page, deprecated: [set-up page] }
  - { preferred: certificate authority, deprecated: [CA] }
`);

function suggestion(terms: string[]): string {
  const { decisions, precedents } = decide([FILE], []);
  const { text, reason } = preferenceOf(question(terms), decisions, precedents);
  return `${text}: ${reason.text}`;
}

describe('the suggestion', () => {
  it.each([
    ['the preferred term', ['secret×9', 'access key×2'], 'access key: “access key” is already the preferred term'],
    [
      'in place of a deprecated one',
      ['secret×9', 'API key×2'],
      'access key: the termbase prefers “access key” to “API key”',
    ],
    ['a word within', ['log in page×9', 'sign in page×2'], 'sign in page: you prefer “sign in” to “log in”'],
    ['a habit', ['webpage×9', 'web page×2'], 'web page: 2 of 2 earlier decisions prefer open to closed'],
    ['no habit from one case', ['start-up×9', 'startup×2'], 'start-up: it is the most used (9 times)'],
    ['no habit from one abbreviation', ['VM×9', 'virtual machine×2'], 'VM: it is the most used (9 times)'],
    ['the most used', ['node×2', 'host×9'], 'host: it is the most used (9 times)'],
    ['a tie by code units', ['node', 'host'], 'host: used as often as the other (once)'],
  ])('%s', (_, terms, expected) => expect(suggestion(terms)).toBe(expected));

  it('takes the more widespread of two terms used alike', () => {
    const { decisions, precedents } = decide([], []);
    const asked = { ...question(['a×4', 'b×4']), terms: [term('a×4'), { ...term('b×4'), documents: 3 }] };
    expect(preferenceOf(asked, decisions, precedents)).toEqual({
      text: 'b',
      reason: { kind: 'documents', text: 'as often used as the other (4 times), but in more documents (3)', value: 3 },
    });
  });
});

describe('the answers on offer', () => {
  it.each<[what: string, terms: string[], answers: Answer[]]>([
    [
      'nothing decided',
      ['node×2', 'host×9'],
      [
        { kind: 'prefer', terms: ['node', 'host'], preferred: 'host' },
        { kind: 'prefer', terms: ['node', 'host'], preferred: 'node' },
        { kind: 'either', terms: ['node', 'host'] },
        { kind: 'apart', terms: ['node', 'host'] },
        { kind: 'later', terms: ['node', 'host'], uses: 11 },
      ],
    ],
    [
      'a preferred term',
      ['secret×9', 'access key×2'],
      [
        { kind: 'prefer', terms: ['access key', 'secret'], preferred: 'access key' },
        { kind: 'either', terms: ['access key', 'secret'] },
        { kind: 'apart', terms: ['access key', 'secret'] },
        { kind: 'later', terms: ['secret', 'access key'], uses: 11 },
      ],
    ],
    [
      'a deprecated term',
      ['secret×9', 'API key×2'],
      [
        { kind: 'prefer', terms: ['access key', 'secret'], preferred: 'access key' },
        { kind: 'apart', terms: ['access key', 'secret'] },
        { kind: 'later', terms: ['secret', 'API key'], uses: 11 },
      ],
    ],
    [
      'verbs',
      ['boot/verb×2', 'power up/verb'],
      [
        { kind: 'prefer', terms: ['boot', 'power up'], preferred: 'boot', partOfSpeech: 'verb' },
        { kind: 'prefer', terms: ['boot', 'power up'], preferred: 'power up', partOfSpeech: 'verb' },
        { kind: 'either', terms: ['boot', 'power up'], partOfSpeech: 'verb' },
        { kind: 'apart', terms: ['boot', 'power up'] },
        { kind: 'later', terms: ['boot', 'power up'], uses: 3 },
      ],
    ],
  ])('%s', (_, terms, answers) => {
    const { decisions, precedents } = decide([FILE], []);
    expect(answersOf(question(terms), decisions, precedents)).toEqual(answers);
  });
});
