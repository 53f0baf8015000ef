// Termbases of several folders: which hold for a document, and which of them wins.
import { describe, expect, it } from 'vitest';
import { decide } from '../../../server/src/decisions/decide.js';
import { scopeOf } from '../../../server/src/decisions/scope.js';
import { question, termbase } from './questions.js';

describe('the scope of a document', () => {
  const placed = [
    'file:///w/termbase.yaml',
    'file:///w/docs/termbase.yaml',
    'file:///w/docs/api%20v2/termbase.yaml',
    'vscode-vfs://github/w/termbase.yaml',
  ].map((uri) => ({ uri, termbase: termbase('', uri) }));
  it.each<[document: string, files: string[]]>([
    ['file:///w/readme.md', ['file:///w/termbase.yaml']],
    ['file:///w/docs/a/b.md', ['file:///w/docs/termbase.yaml', 'file:///w/termbase.yaml']],
    ['file:///w/docs2/a.md', ['file:///w/termbase.yaml']],
    [
      'file:///w/docs/api v2/a.md',
      ['file:///w/docs/api%20v2/termbase.yaml', 'file:///w/docs/termbase.yaml', 'file:///w/termbase.yaml'],
    ],
    ['file:///w%2Fdocs/a.md', []],
    ['file:///other/a.md', []],
    ['untitled:Untitled-1', []],
    ['vscode-vfs://github/w/a.md', ['vscode-vfs://github/w/termbase.yaml']],
  ])('%s', (document, files) => {
    const { id, chain } = scopeOf(document, placed);
    expect(chain.map(({ uri }) => uri)).toEqual(files);
    expect(id).toBe(files[0] ?? '');
  });

  it('takes drives as the systems write them', () => {
    const file = { uri: 'file:///C:/docs/termbase.yaml', termbase: termbase('') };
    expect(scopeOf('file:///c%3A/docs/a.md', [file]).chain).toHaveLength(1);
  });
});

describe('a chain of termbases', () => {
  const far = termbase(
    `
concepts:
  - { preferred: access key, deprecated: [API key, api-key] }
  - { preferred: start, deprecated: [launch] }
  - { preferred: log in, partOfSpeech: verb, deprecated: [sign in] }
  - { preferred: page, admitted: [screen] }
apart:
  - [node, host]
`,
    'file:///w/termbase.yaml',
  );
  const near = termbase(
    `
concepts:
  - { preferred: API key, deprecated: [access key] }
  - { preferred: sign in, partOfSpeech: noun }
  - { preferred: node, deprecated: [host] }
apart:
  - [page, screen]
`,
    'file:///w/api/termbase.yaml',
  );
  const { decisions } = decide([near, far], []);

  it('lets the nearest file decide about a term', () => {
    expect(decisions.statusOf('API key')).toBe('preferred');
    expect(decisions.statusOf('access key')).toBe('deprecated');
    expect(decisions.statusOf('launch')).toBe('deprecated');
  });

  it('follows a preferred term that a nearer file replaces', () => {
    const [old] = decisions.termsOf('api-key');
    expect([old!.entry.status, old!.preferred.text, old!.uri]).toEqual(['deprecated', 'API key', far.uri]);
  });

  it('keeps homonyms of both files', () => {
    expect(decisions.statusOf('sign in', 'verb')).toBe('deprecated');
    expect(decisions.statusOf('sign in', 'noun')).toBe('preferred');
  });

  it('answers questions by the nearest file that knows', () => {
    const asked = [
      ['api-key', 'access key'],
      ['page', 'screen'],
      ['node', 'host'],
      ['launch', 'start'],
    ];
    const settled = decide(
      [near, far],
      asked.map((terms) => question(terms)),
    ).settled.map((one) => one.settled);
    expect(settled).toEqual(['one-concept', 'two-concepts', 'one-concept', 'one-concept']);
  });

  it('leaves out what is overridden', () => {
    const shown = decisions.concepts.map(({ terms }) => terms.map(({ entry }) => entry.text).join(', '));
    expect(shown).toEqual([
      'API key, access key',
      'sign in',
      'node, host',
      'api-key',
      'start, launch',
      'log in, sign in',
      'page, screen',
    ]);
  });
});
