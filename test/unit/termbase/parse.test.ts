// Reading termbase.yaml: what it means, and what each mistake is told as.
import { describe, expect, it } from 'vitest';
import { parseTermbase } from '../../../server/src/termbase/parse.js';
import { LineIndex } from '../../../server/src/text/lineIndex.js';

const URI = 'file:///docs/termbase.yaml';

/** Reads a file; each problem as `line:column severity code`, one-based. */
function problemsOf(text: string): string[] {
  const lines = new LineIndex(text);
  return parseTermbase(text, URI).problems.map(({ span, severity, code }) => {
    const { line, character } = lines.positionAt(span.start);
    return `${line + 1}:${character + 1} ${severity} ${code}`;
  });
}

describe('a sound file', () => {
  const text = [
    '# House terms',
    'evenword: 1',
    'language: en-GB',
    'concepts:',
    '  - preferred: access key',
    '    admitted: [key pair]',
    '    deprecated:',
    '      - API key',
    '      - { term: AK, termType: abbreviation, caseSensitive: true, note: in screens, source: style guide 4.2 }',
    '    id: access-key',
    '    partOfSpeech: noun',
    '    subject: security',
    '    definition: >',
    '      Text that identifies',
    '      a program.',
    '    x-owner: docs',
    '  - preferred: start',
    '    deprecated: launch',
    '    with: [job, session]',
    'apart:',
    '  - [sampling interval, reporting interval]',
    '  - { terms: [node, host], note: a host carries nodes }',
    'later:',
    '  - [page, screen]',
    '  - { terms: [drop-down, dropdown], uses: 12 }',
    '',
  ].join('\n');
  const { termbase, problems, usable } = parseTermbase(text, URI);

  it('has no problems', () => {
    expect(problems).toEqual([]);
    expect(usable).toBe(true);
  });

  it('gives the concepts with all that is said of them', () => {
    const [key, start] = termbase.concepts;
    expect(termbase.language).toBe('en-GB');
    expect(key).toMatchObject({
      id: 'access-key',
      partOfSpeech: 'noun',
      subject: 'security',
      definition: 'Text that identifies a program.',
      with: [],
    });
    expect(key!.terms.map((term) => `${term.status} ${term.text}`)).toEqual([
      'preferred access key',
      'admitted key pair',
      'deprecated API key',
      'deprecated AK',
    ]);
    expect(key!.preferred).toBe(key!.terms[0]);
    expect(key!.terms[3]).toMatchObject({
      termType: 'abbreviation',
      caseSensitive: true,
      note: 'in screens',
      source: 'style guide 4.2',
      partOfSpeech: 'noun',
    });
    expect(start).toMatchObject({ partOfSpeech: 'verb' });
    expect(start!.terms.map((term) => term.text)).toEqual(['start', 'launch']);
    expect(start!.with.map(({ text: object }) => object)).toEqual(['job', 'session']);
  });

  it('gives the groups', () => {
    expect(termbase.apart.map(({ terms }) => terms.map(({ text: term }) => term))).toEqual([
      ['sampling interval', 'reporting interval'],
      ['node', 'host'],
    ]);
    expect(termbase.apart[1]!.note).toBe('a host carries nodes');
    expect(termbase.later.map(({ uses }) => uses)).toEqual([undefined, 12]);
  });

  it('knows where each term stands', () => {
    const spans = termbase.concepts.flatMap(({ terms }) => terms.map(({ span }) => text.slice(span.start, span.end)));
    expect(spans).toEqual(['access key', 'key pair', 'API key', 'AK', 'start', 'launch']);
    const { span } = termbase.concepts[0]!;
    expect(text.slice(span.start, span.end)).toMatch(/^preferred: access key[^]*x-owner: docs\s*$/u);
  });
});

describe('files that say nothing', () => {
  it.each(['', '# only a comment\n', '---\n', '\uFEFF', 'concepts:\n', 'concepts: []\napart: ~\n', '{}'])(
    '%j is sound',
    (text) => {
      expect(parseTermbase(text, URI)).toEqual({
        termbase: { uri: URI, concepts: [], apart: [], later: [] },
        problems: [],
        usable: true,
      });
    },
  );
});

describe('mistakes', () => {
  it.each<[what: string, text: string, problems: string[]]>([
    ['a syntax error', 'concepts:\n  - preferred: [a\n', ['3:1 error yaml-syntax']],
    ['a tab as indentation', 'concepts:\n\t- preferred: a\n', ['2:1 error yaml-syntax']],
    ['an open quote', 'concepts:\n  - preferred: "a\n', ['3:1 error yaml-syntax']],
    ['a colon in plain text', 'concepts:\n  - preferred: a: b\n', ['2:16 error yaml-syntax']],
    ['a key twice', 'concepts:\n  - preferred: a\n    preferred: b\n', ['3:5 error yaml-syntax']],
    ['an unknown tag', 'concepts:\n  - preferred: !a b\n', ['2:16 error yaml-syntax']],
    ['two documents', 'evenword: 1\n---\nconcepts:\n', ['2:1 error yaml-syntax']],
    ['a newer format', 'evenword: 2\nconcepts:\n  - b\n', ['1:11 error format-version']],
    ['a version that is none', 'evenword: "1"\n', ['1:11 error format-version']],
    ['a list at the top', '- preferred: a\n', ['1:1 error wrong-type']],
    ['a mistyped key', 'concepts:\n  - preferred: a\n    depricated: [b]\n', ['3:5 error unknown-key']],
    ['an unknown key', 'concepts:\n  - preferred: a\n    colour: red\n', ['3:5 warning unknown-key']],
    ['a mistyped key at the top', 'concept:\n', ['1:1 error unknown-key']],
    ['a bare number', 'concepts:\n  - preferred: 1.0\n', ['2:16 error wrong-type']],
    ['a bare truth value', 'concepts:\n  - preferred: a\n    deprecated: [true]\n', ['3:18 error wrong-type']],
    ['no preferred term', 'concepts:\n  - deprecated: [a]\n', ['2:5 error no-preferred-term']],
    ['an empty preferred term', 'concepts:\n  - preferred:\n', ['2:5 error no-preferred-term']],
    ['two preferred terms', 'concepts:\n  - preferred: [a, b]\n', ['2:16 error two-preferred-terms']],
    ['an empty string', 'concepts:\n  - preferred: a\n    deprecated: [" "]\n', ['3:18 error empty-term']],
    ['a missing item', 'concepts:\n  - preferred: a\n    deprecated:\n      -\n', ['4:8 error empty-term']],
    ['a term mapping without term', 'concepts:\n  - preferred: { note: x }\n', ['2:16 error empty-term']],
    [
      'a part of speech that is none',
      'concepts:\n  - preferred: a\n    partOfSpeech: nuon\n',
      ['3:19 error unknown-value'],
    ],
    ['an id with a blank', 'concepts:\n  - preferred: a\n    id: a b\n', ['3:9 error unknown-value']],
    ['a language that is none', 'language: British English\n', ['1:11 error unknown-value']],
    ['an alias', 'concepts:\n  - &a { preferred: a }\n  - *a\n', ['3:5 error wrong-type']],
    [
      'one term twice in a list',
      'concepts:\n  - preferred: a\n    deprecated: [b, b]\n',
      ['3:21 warning duplicate-term'],
    ],
    ['preferred and deprecated', 'concepts:\n  - preferred: a\n    deprecated: [a]\n', ['3:18 error contradiction']],
    [
      'in two concepts',
      'concepts:\n  - preferred: a\n  - preferred: b\n    deprecated: [A]\n',
      ['4:18 error duplicate-term'],
    ],
    [
      'two ids alike',
      'concepts:\n  - { preferred: a, id: x }\n  - { preferred: b, id: x }\n',
      ['3:5 error duplicate-id'],
    ],
    [
      'objects of a noun',
      'concepts:\n  - preferred: a\n    partOfSpeech: noun\n    with: [b]\n',
      ['4:5 warning no-verb'],
    ],
    ['a group of one', 'apart:\n  - [a]\n', ['2:5 error too-few-terms']],
    ['a group of the same', 'apart:\n  - [a, a]\n', ['2:5 error too-few-terms']],
    [
      'together and apart',
      'concepts:\n  - { preferred: a, admitted: [b] }\napart:\n  - [a, b]\n',
      ['4:9 error contradiction'],
    ],
    ['uses that are no number', 'later:\n  - { terms: [a, b], uses: many }\n', ['2:28 error wrong-type']],
  ])('%s', (_, text, problems) => {
    expect(problemsOf(text)).toEqual(problems);
    expect(parseTermbase(text, URI).usable).toBe(!problems.some((problem) => problem.includes('error')));
  });

  it('says what, why and what to do', () => {
    const [problem] = parseTermbase('concepts:\n  - preferred: a\n    depricated: [b]\n', URI).problems;
    expect(problem!.message).toBe(
      'A concept has no key “depricated”, so what stands under it has no effect. Write “deprecated” if you mean that.',
    );
  });

  it('points to both places of a clash', () => {
    const text = 'concepts:\n  - preferred: alpha\n  - preferred: beta\n    deprecated: [Alpha]\n';
    const { span, related } = parseTermbase(text, URI).problems[0]!;
    expect([span, related!].map(({ start, end }) => text.slice(start, end))).toEqual(['Alpha', 'alpha']);
  });

  it('keeps the sound entries beside a broken one', () => {
    const text = 'concepts:\n  - preferred: a\n  - deprecated: [x]\n  - preferred: b\n    admitted: [3, c]\n';
    const { termbase, usable } = parseTermbase(text, URI);
    expect(usable).toBe(false);
    expect(termbase.concepts.map(({ terms }) => terms.map(({ text: term }) => term))).toEqual([['a'], ['b', 'c']]);
  });
});

describe('homonyms and capitals', () => {
  it.each([
    [
      'different parts of speech',
      '- { preferred: log in, partOfSpeech: verb }\n- { preferred: log in, partOfSpeech: noun }',
    ],
    ['different subjects', '- { preferred: port, subject: network }\n- { preferred: port, subject: ships }'],
    [
      'different objects',
      '- { preferred: run, with: [job] }\n- { preferred: carry out, deprecated: run, with: [test] }',
    ],
    [
      'a name and a word',
      '- { preferred: { term: Job, caseSensitive: true } }\n- { preferred: { term: job, caseSensitive: true } }',
    ],
    ['different languages', '- { preferred: chat, language: en }\n- { preferred: chat, language: fr }'],
    ['capitals within one concept', '- { preferred: GitHub, deprecated: [Github, github] }'],
  ])('%s may stand side by side', (_, concepts) => {
    expect(problemsOf(`concepts:\n${concepts}\n`)).toEqual([]);
  });

  it.each([
    ['two tags of one language', 'en', '- { preferred: chat, language: fr }\n- { preferred: chat, language: fr-CA }'],
    ['the language of the file, stated and not', 'fr-CA', '- { preferred: chat }\n- { preferred: chat, language: fr }'],
  ])('%s may not', (_, language, concepts) => {
    expect(problemsOf(`language: ${language}\nconcepts:\n${concepts}\n`)).toEqual(['4:16 error duplicate-term']);
  });
});

describe('hostile files', () => {
  it.each([
    ['open brackets', '['.repeat(50_000)],
    ['open braces', '{a: '.repeat(20_000)],
    ['nested dashes', '- '.repeat(20_000) + 'a'],
    ['nested keys', Array.from({ length: 500 }, (_, i) => ' '.repeat(i) + 'a:').join('\n')],
  ])('%s are refused, not run into', (_, text) => {
    expect(problemsOf(text)).toEqual(['1:1 error yaml-syntax']);
  });

  it('reads binary without throwing', () => {
    const bytes = Array.from({ length: 4096 }, (_, i) => String.fromCharCode((i * 7919) % 256)).join('');
    expect(parseTermbase(bytes, URI).usable).toBe(false);
  });
});
