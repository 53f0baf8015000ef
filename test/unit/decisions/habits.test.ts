// Habits of writing: many words, one question at a time.
import { describe, expect, it, test } from 'vitest';
import { decide } from '../../../server/src/decisions/decide.js';
import { habitOf } from '../../../server/src/decisions/habits.js';
import { question, termbase } from './questions.js';

const variant = (...terms: string[]): ReturnType<typeof question> => question(terms, 'variant');

describe('a habit', () => {
  // British and American endings as in VarCon; prefixes with and without a hyphen: common practice, no source.
  test.each([
    ['customise', 'customize', '-ise and -ize'],
    ['Recognised', 'recognized', '-ise and -ize'],
    ['colour', 'color', '-or and -our'],
    ['behavioural', 'behavioral', '-or and -our'],
    ['labelled', 'labeled', '-l- and -ll-'],
    ['centres', 'centers', '-er and -re'],
    ['centred', 'centered', '-er and -re'],
    ['defence', 'defense', '-ce and -se'],
    ['re-use', 'reuse', '“re-” with and without a hyphen'],
    ['subpage', 'sub-page', '“sub-” with and without a hyphen'],
  ])('is seen in %s and %s', (a, b, habit) => {
    expect(habitOf(variant(a, b))).toBe(habit);
  });

  test.each([
    ['plug-in', 'plugin'],
    ['data set', 'dataset'],
    ['artefact', 'artifact'],
    ['GitHub', 'Github'],
    ['moors', 'moor'],
  ])('is none in %s and %s', (a, b) => {
    expect(habitOf(variant(a, b))).toBeUndefined();
  });

  it('is none where three ways are asked, or another kind', () => {
    expect(habitOf(variant('re-use', 'reuse', 're use'))).toBeUndefined();
    expect(habitOf(question(['customise', 'customize'], 'synonym'))).toBeUndefined();
  });
});

describe('questions about one habit', () => {
  const questions = [
    variant('moor×9', 'mooring×2'),
    variant('optimise×6', 'optimize×4'),
    variant('customize×8', 'customise×6'),
    variant('recognised×5', 'recognized×2'),
  ];
  const texts = (list: readonly { terms: readonly { text: string }[] }[]): string[] =>
    list.map(({ terms }) => terms.map(({ text }) => text).join(' | '));

  it('are asked as one, which names the other words and is worth all', () => {
    const { open, waiting } = decide([termbase('')], questions);
    expect(texts(open)).toEqual(['customize | customise', 'moor | mooring']);
    expect(texts(waiting)).toEqual(['optimise | optimize', 'recognised | recognized']);
    expect(open[0]).toMatchObject({ worth: 6, alike: [questions[1]!.terms, questions[3]!.terms] });
    expect(open[0]!.reasons.map(({ text }) => text)).toEqual([
      '-ise and -ize in 2 more words: “optimise” and “optimize”, “recognised” and “recognized”',
    ]);
  });

  it('come up one by one as the first is answered', () => {
    const answered = termbase('concepts:\n  - preferred: customize\n    deprecated: [customise]\n');
    const { open } = decide([answered], questions);
    expect(texts(open)).toEqual(['optimise | optimize', 'moor | mooring']);
    expect(open[0]!.reasons.map(({ text }) => text)).toEqual([
      '-ise and -ize in another word: “recognised” and “recognized”',
    ]);
  });

  it('are asked in each language', () => {
    const english = { ...variant('anti-virus×4', 'antivirus×3'), language: 'en' };
    const french = { ...variant('anti-gel×2', 'antigel×2'), language: 'fr' };
    expect(decide([termbase('')], [english, french])).toMatchObject({ open: [english, french], waiting: [] });
  });

  it('wait together when the first is put off', () => {
    const putOff = termbase('later:\n  - { terms: [customize, customise], uses: 14 }\n');
    const { open, waiting } = decide([putOff], questions);
    expect(texts(open)).toEqual(['moor | mooring']);
    expect(waiting).toHaveLength(2);
  });
});
