// What counts as one term replaced by another between two versions of a page, and what does not.
import { describe, expect, it } from 'vitest';
import { differingStretches } from '../../../server/src/revisions/wordDifference.js';
import { mayReplaceTerm } from '../../../server/src/revisions/changedText.js';
import { RevisionReader } from '../../../server/src/revisions/replacements.js';
import type { Format } from '../../../server/src/text/sourceText.js';

const reader = new RevisionReader();

/** The replacements as `from → to`, with a mark where a mistake was mended. */
function check(before: string, after: string, expected: readonly string[], format: Format = 'markdown'): void {
  const version = (text: string) => ({ uri: 'file:///page', format, text });
  const found = reader.replacements(version(before), version(after));
  expect(found.map(({ from, to, mends }) => `${from} → ${to}${mends ? ' (mends)' : ''}`)).toEqual(expected);
}

describe('a replacement', () => {
  it('is one term for another in an otherwise unchanged sentence', () => {
    check('Copy the files into the folder first.', 'Copy the files into the directory first.', ['folder → directory']);
    check('Open the log file of the server.', 'Open the journal of the server.', ['log file → journal']);
  });

  it('may be made several times in the sentence, with the articles that follow it', () => {
    check(
      'An image is built before the image is sent to the registry.',
      'A picture is built before the picture is sent to the registry.',
      ['image → picture'],
    );
  });

  it('is found in a paragraph that was wrapped anew, and beside other changes on the page', () => {
    check(
      '# Title\n\nEvery worker reads its queue and\nwrites what it finds.\n\nOld text that goes.\n',
      '# Title\n\nEvery runner reads\nits queue and writes what it finds.\n\nSomething quite different was written here.\n',
      ['worker → runner'],
    );
  });

  it('is told with the words beside it, and counts each sentence once', () => {
    const before = 'Set the query parameter of the call now.\n\n- Each query parameter has a name here.\n';
    const [first, second] = reader.replacements(
      { uri: 'file:///p', format: 'markdown', text: before },
      { uri: 'file:///p', format: 'markdown', text: before.replaceAll('query', 'URL') },
    );
    expect(first).toMatchObject({ from: 'query', to: 'url', before: 'each', after: 'parameter has' });
    expect(second).toMatchObject({ from: 'query', to: 'url', before: 'set the', after: 'parameter of' });
    expect(first?.sentences).toHaveLength(1);
  });

  it('keeps spellings and hyphens, which tell the direction', () => {
    check('Install the plug-in on the build server.', 'Install the plugin on the build server.', ['plug-in → plugin']);
    check('The colour of the button is shown.', 'The color of the button is shown.', ['colour → color']);
  });

  it('says where a sentence holds both terms: a mistake was mended', () => {
    check('The server sends the answer back to the server.', 'The server sends the answer back to the client.', [
      'server → client (mends)',
    ]);
    check('A replica follows only one replica at a time.', 'A replica follows only one primary at a time.', [
      'replica → primary (mends)',
    ]);
  });

  it('is read in every format', () => {
    check(
      'Open *the folder* of the project.\n',
      'Open *the directory* of the project.\n',
      ['folder → directory'],
      'asciidoc',
    );
    check(
      '<p>Open the <b>folder</b> of the new project.</p>',
      '<p>Open the <b>directory</b> of the new project.</p>',
      ['folder → directory'],
      'html',
    );
  });
});

describe('no replacement', () => {
  it.each([
    ['of grammar alone', 'Send the file to the server now.', 'Send the file from the server now.'],
    ['of number alone', 'Send the file to the big servers.', 'Send the file to the big server.'],
    ['of capitals or punctuation', 'Send the file to the Server, now.', 'Send the file to the server now.'],
    ['beside another change', 'Send the file to the server now.', 'Copy the page to the server now.'],
    ['that adds words', 'Send the file to the server now.', 'Send the file to the build server now.'],
    ['with too little around it', 'Send the file.', 'Send the page.'],
    ['in code', 'Run `deploy folder` before you start it.', 'Run `deploy directory` before you start it.'],
    [
      'in a link',
      'Read about [the folder](a.md) before you start.',
      'Read about [the directory](a.md) before you start.',
    ],
    [
      'in a code block',
      '```\ncopy the files into the folder first\n```\n',
      '```\ncopy the files into the directory first\n```\n',
    ],
    ['of numbers', 'It waits for 30 seconds before it starts.', 'It waits for 60 seconds before it starts.'],
    ['of names of code', 'It waits for max_wait before it starts.', 'It waits for maxDelay before it starts.'],
    [
      'of five words',
      'Use one two three four five here as always you do.',
      'Use six seven eight nine ten here as always you do.',
    ],
    [
      'across punctuation',
      'Use the folder, the page and the file as before.',
      'Use the directory: one page and the file as before.',
    ],
  ])('%s', (_, before, after) => {
    check(before, after, []);
  });

  it('is read from pages that only grew, shrank or were written anew', () => {
    expect(mayReplaceTerm('One line.\n', 'One line.\nAnother line.\n')).toBe(false);
    expect(mayReplaceTerm('One line.\nAnother line.\n', 'One line.\n')).toBe(false);
    expect(mayReplaceTerm('One line here.\n', 'Quite different words stand there.\n')).toBe(false);
    expect(mayReplaceTerm('Copy the folder.\nEnd.\n', 'Copy the directory.\nEnd.\n')).toBe(true);
    expect(mayReplaceTerm('', '')).toBe(false);
    expect(mayReplaceTerm('a b c\na b c', 'a b c\na b d')).toBe(true);
  });
});

describe('the difference of two sequences', () => {
  it('leaves a longest common subsequence, as Wagner & Fischer (1974) count it', () => {
    // Lengths by the textbook example of Cormen, Leiserson, Rivest & Stein, Introduction to Algorithms, ch. 15.4 (from memory):
    // ABCBDAB and BDCABA have a longest common subsequence of 4.
    const one = 'A B C B D A B'.split(' ');
    const other = 'B D C A B A'.split(' ');
    const stretches = differingStretches(one, other);
    const changed = stretches.reduce((sum, { start, end }) => sum + end - start, 0);
    expect(one.length - changed).toBe(4);
    const kept = (words: readonly string[], cut: readonly (readonly [number, number])[]): string =>
      words.filter((_, at) => !cut.some(([start, end]) => at >= start && at < end)).join('');
    expect(
      kept(
        one,
        stretches.map(({ start, end }) => [start, end]),
      ),
    ).toBe(
      kept(
        other,
        stretches.map(({ otherStart, otherEnd }) => [otherStart, otherEnd]),
      ),
    );
  });

  it('gives nothing for equal sequences and all for others', () => {
    expect(differingStretches(['a', 'b'], ['a', 'b'])).toEqual([]);
    expect(differingStretches([], ['a'])).toEqual([{ start: 0, end: 0, otherStart: 0, otherEnd: 1 }]);
    expect(differingStretches(['a'], ['b'])).toEqual([{ start: 0, end: 1, otherStart: 0, otherEnd: 1 }]);
  });
});
