// Answers written into files of many styles: the file before, the answer, the file after.
import { describe, expect, it } from 'vitest';
import type { Answer } from '../../../server/src/termbase/answer.js';
import { answerEdits } from '../../../server/src/termbase/edit.js';
import { applyEdits } from '../../../server/src/text/edits.js';

const PREFER: Answer = { kind: 'prefer', terms: ['access key', 'API key'], preferred: 'access key' };

/** Writes the answer, or shows the refusal as `code: message`. Checks that answering again changes nothing. */
function answered(text: string, answer: Answer): string {
  const result = answerEdits(text, answer);
  if (result.kind === 'refused') return `${result.code}: ${result.message}`;
  const after = applyEdits(text, result.edits);
  expect(answerEdits(after, answer)).toEqual({ kind: 'edits', edits: [] });
  return after;
}

function lines(...all: string[]): string {
  return all.join('\n') + '\n';
}

const CONCEPT = ['concepts:', '  - preferred: access key', '    deprecated: [API key]'];

describe('a file that holds no entry yet', () => {
  const opening = '# What this documentation calls things. Edited by hand or by Evenword.';
  it.each<[what: string, before: string, after: string]>([
    ['empty', '', lines(opening, 'evenword: 1', ...CONCEPT)],
    ['a byte order mark', '\uFEFF', '\uFEFF' + lines(opening, 'evenword: 1', ...CONCEPT)],
    ['comments', '# ours\n', lines('# ours', 'evenword: 1', ...CONCEPT)],
    ['a comment without line end', '# ours', lines('# ours', 'evenword: 1', ...CONCEPT)],
    ['CRLF', '# ours\r\n', lines('# ours', 'evenword: 1', ...CONCEPT).replaceAll('\n', '\r\n')],
    ['a document start', '---\n', lines('---', 'evenword: 1', ...CONCEPT)],
    ['a version', 'evenword: 1\n', lines('evenword: 1', ...CONCEPT)],
    ['no line end', 'evenword: 1', lines('evenword: 1', ...CONCEPT).trimEnd()],
    [
      'the key alone',
      'concepts: # ours\nlanguage: en\n',
      lines('concepts: # ours', ...CONCEPT.slice(1), 'language: en'),
    ],
    ['null', 'concepts: ~ # ours\n', lines('concepts: # ours', ...CONCEPT.slice(1))],
    ['brackets', 'concepts: [] # ours\n', lines('concepts: # ours', ...CONCEPT.slice(1))],
    ['braces', '{}', '{concepts: [{preferred: access key, deprecated: [API key]}]}'],
    ['other keys', 'apart:\n- [a, b]\n', lines('apart:', '- [a, b]', ...CONCEPT)],
  ])('%s', (_, before, after) => expect(answered(before, PREFER)).toBe(after));
});

describe('joining a concept', () => {
  it.each<[what: string, before: string, after: string]>([
    [
      'no list yet: after the terms, before what is said of them',
      lines('concepts:', '  - preferred: access key # main', '    note: x'),
      lines('concepts:', '  - preferred: access key # main', '    deprecated: [API key]', '    note: x'),
    ],
    [
      'a list in brackets',
      lines('concepts:', '  - preferred: access key', '    deprecated: [ AK ] # old'),
      lines('concepts:', '  - preferred: access key', '    deprecated: [ AK, API key ] # old'),
    ],
    [
      'brackets over lines, with a last comma',
      lines('concepts:', '  - preferred: access key', '    deprecated: [', '      AK, # old', '    ]'),
      lines('concepts:', '  - preferred: access key', '    deprecated: [', '      AK, API key, # old', '    ]'),
    ],
    [
      'a list of lines, its quotes and its spacing',
      lines('concepts:', '- preferred: access key', '  deprecated:', "  -   'AK' # old", '', '# end'),
      lines(
        'concepts:',
        '- preferred: access key',
        '  deprecated:',
        "  -   'AK' # old",
        "  -   'API key'",
        '',
        '# end',
      ),
    ],
    [
      'comments that belong to the list',
      lines(
        'concepts:',
        '  - preferred: access key',
        '    deprecated:',
        '      - AK',
        '      # not KEY',
        'language: en',
      ),
      lines(
        ...['concepts:', '  - preferred: access key', '    deprecated:', '      - AK', '      # not KEY'],
        ...['      - API key', 'language: en'],
      ),
    ],
    [
      'a single term',
      lines('concepts:', '  - preferred: access key', '    deprecated: AK # old'),
      lines('concepts:', '  - preferred: access key', '    deprecated: [AK, API key] # old'),
    ],
    [
      'a single term with a comma',
      lines('concepts:', '  - preferred: access key', '    deprecated: key, access'),
      lines('concepts:', '  - preferred: access key', '    deprecated: ["key, access", API key]'),
    ],
    [
      'a key without value',
      lines('concepts:', '  - preferred: access key', '    deprecated: # none', '    admitted: [k]'),
      lines('concepts:', '  - preferred: access key', '    deprecated: [API key] # none', '    admitted: [k]'),
    ],
    [
      'one line',
      lines('concepts:', '  - { preferred: access key, note: x }'),
      lines('concepts:', '  - { preferred: access key, deprecated: [API key], note: x }'),
    ],
    [
      'JSON',
      '{"concepts": [{"preferred": "access key", "deprecated": ["AK"]}]}',
      '{"concepts": [{"preferred": "access key", "deprecated": ["AK", "API key"]}]}',
    ],
    [
      'lists of lines elsewhere in the file',
      lines('concepts:', '  - preferred: access key', '  - preferred: b', '    admitted:', '    - c'),
      lines(
        'concepts:',
        '  - preferred: access key',
        '    deprecated:',
        '    - API key',
        '  - preferred: b',
        '    admitted:',
        '    - c',
      ),
    ],
    [
      'a term written as a mapping',
      lines('concepts:', '  - preferred:', '      term: access key', '      termType: fullForm', '# end'),
      lines(
        'concepts:',
        '  - preferred:',
        '      term: access key',
        '      termType: fullForm',
        '    deprecated: [API key]',
        '# end',
      ),
    ],
    [
      'a block text before',
      lines('concepts:', '  - note: |', '      # no comment', '', '    preferred: access key'),
      lines(
        'concepts:',
        '  - note: |',
        '      # no comment',
        '',
        '    preferred: access key',
        '    deprecated: [API key]',
      ),
    ],
  ])('%s', (_, before, after) => {
    expect(answered(before, PREFER)).toBe(after);
    const crlf = (text: string): string => text.replaceAll('\n', '\r\n');
    expect(answered(crlf(before), PREFER)).toBe(crlf(after));
    expect(answered(before.trimEnd(), PREFER)).toBe(after.trimEnd());
  });

  it('tells spellings apart by capitals', () => {
    const answer: Answer = { kind: 'prefer', terms: ['GitHub', 'Github'], preferred: 'GitHub' };
    expect(answered('concepts:\n  - preferred: GitHub\n', answer)).toBe(
      'concepts:\n  - preferred: GitHub\n    deprecated: [Github]\n',
    );
  });

  it('quotes what YAML would misread', () => {
    const terms = [
      'yes',
      'no',
      '1.0',
      'C#',
      'key: value',
      '- dash',
      '~',
      'null',
      "it's",
      'a, b',
      'größe',
      '🛟',
      '"',
      '@x',
    ];
    expect(answered('', { kind: 'prefer', preferred: 'word', terms })).toContain(
      `deprecated: ["yes", "no", "1.0", "C#", "key: value", "- dash", "~", "null", it's, "a, b", größe, "🛟", "\\"", "@x"]`,
    );
  });
});

describe('a new concept', () => {
  it('stands after the last, with the blank line its neighbours have', () => {
    const before = lines(
      'concepts:',
      '  - preferred: a',
      '',
      '  # b',
      '  - preferred: b',
      '    # of b',
      '',
      '# Two',
      'apart:',
      '  - [c, d]',
    );
    expect(answered(before, { kind: 'either', terms: ['e', 'f'] })).toBe(
      before.replace('    # of b\n', '    # of b\n\n  - preferred: e\n    admitted: [f]\n'),
    );
  });

  it('keeps what the answer says of verbs', () => {
    const answer: Answer = {
      kind: 'prefer',
      terms: ['launch'],
      preferred: 'start',
      partOfSpeech: 'verb',
      with: ['job'],
    };
    const after = answered('concepts:\n', answer);
    expect(after).toBe(
      lines(
        'concepts:',
        '  - preferred: start',
        '    deprecated: [launch]',
        '    partOfSpeech: verb',
        '    with: [job]',
      ),
    );
    expect(answered(after, { ...answer, with: ['session'] })).toBe(after.replace('[job]', '[job, session]'));
  });
});

describe('apart and later', () => {
  it.each<[what: string, before: string, answer: Answer, after: string]>([
    ['a new group', 'concepts: []\n', { kind: 'apart', terms: ['a', 'b'] }, 'concepts: []\napart:\n  - [a, b]\n'],
    ['a further group', 'apart:\n- [a, b]\n', { kind: 'apart', terms: ['c', 'd'] }, 'apart:\n- [a, b]\n- [c, d]\n'],
    [
      'a group that grows',
      'apart:\n- [a, b] # two\n',
      { kind: 'apart', terms: ['c', 'b', 'a'] },
      'apart:\n- [a, b, c] # two\n',
    ],
    [
      'two concepts say it already',
      'concepts:\n- preferred: a\n- preferred: b\n',
      { kind: 'apart', terms: ['a', 'b'] },
      'concepts:\n- preferred: a\n- preferred: b\n',
    ],
    ['put off', 'apart:\n', { kind: 'later', terms: ['a', 'b'] }, 'apart:\nlater:\n  - [a, b]\n'],
    [
      'put off at a count',
      'later:\n',
      { kind: 'later', terms: ['a', 'b'], uses: 9 },
      'later:\n  - terms: [a, b]\n    uses: 9\n',
    ],
    [
      'put off again',
      'later:\n  - { terms: [a, b], uses: 9 }\n',
      { kind: 'later', terms: ['b', 'a'], uses: 20 },
      'later:\n  - { terms: [a, b], uses: 20 }\n',
    ],
  ])('%s', (_, before, answer, after) => expect(answered(before, answer)).toBe(after));
});

describe('refusals', () => {
  const file = lines(
    'concepts:',
    '  - preferred: start',
    '    admitted: [begin]',
    '    deprecated: [launch]',
    '  - preferred: stop',
    'apart:',
    '  - [page, screen]',
  );
  it.each<[answer: Answer, refusal: string]>([
    [
      { kind: 'prefer', preferred: 'run', terms: ['launch', 'run'] },
      'other-preferred: Line 2: “launch” already belongs to “start”',
    ],
    [{ kind: 'prefer', preferred: 'launch', terms: ['start', 'launch'] }, 'other-preferred: Line 2:'],
    [{ kind: 'prefer', preferred: 'start', terms: ['begin'] }, 'already-admitted: Line 3:'],
    [{ kind: 'either', terms: ['start', 'launch'] }, 'already-deprecated: Line 4:'],
    [{ kind: 'either', terms: ['start', 'stop'] }, 'several-concepts: Line 5:'],
    [{ kind: 'apart', terms: ['launch', 'start'] }, 'one-concept: Line'],
    [{ kind: 'prefer', preferred: 'page', terms: ['screen'] }, 'kept-apart: Line 7:'],
    [{ kind: 'prefer', preferred: 'page', terms: [' page '] }, 'too-few-terms: An answer needs'],
  ])('%j', (answer, refusal) => expect(answered(file, answer)).toContain(refusal));

  it('leaves a broken file alone', () => {
    expect(answered('concepts:\n  - preferred: [\n', PREFER)).toMatch(/^broken-file: Line 3: /u);
  });

  it('leaves a place alone that it cannot add to', () => {
    const text = lines('concepts:', '  - preferred: access key', '    deprecated:', '      term: AK', '      note: x');
    expect(answered(text, PREFER)).toMatch(/^cannot-write: Line 4: /u);
    expect(answered('--- {}\n...\n# end\n', { kind: 'apart', terms: ['a', 'b'] })).toBe(
      '--- {apart: [[a, b]]}\n...\n# end\n',
    );
    expect(answered('---\n...\n', PREFER)).toMatch(/^cannot-write: /u);
  });
});

it('does not take two spellings of one name for two names kept apart', () => {
  const before = lines('concepts:', '  - { preferred: Github, deprecated: [GitHub] }', 'apart:', '  - [Github, node]');
  const answer: Answer = { kind: 'prefer', terms: ['Github', 'hub'], preferred: 'Github' };
  expect(answered(before, answer)).toBe(before.replace('[GitHub]', '[GitHub, hub]'));
});
