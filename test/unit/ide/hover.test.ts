// The card of a term as a hover: statuses, counts, rivals, definition; and nothing where there is nothing to say.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import { hoverAt } from '../../../server/src/ide/hover.js';
import { PAGES } from '../../support/mixedPages.js';

const root = 'file:///docs/';
const termbase = `evenword: 1
concepts:
  - preferred: access key
    admitted: [key string]
    deprecated: [API key]
    definition: A *secret* string.
apart:
  - [hull, mast]
`;
const engine = new Engine(new Profiles());
engine.apply({
  documents: Object.entries(PAGES).map(([name, text]) => ({
    uri: root + name,
    source: { uri: root + name, format: 'markdown', text },
  })),
  termbases: [{ uri: `${root}termbase.yaml`, text: termbase }],
});
finish(engine.settle());

function hover(page: string, word: string): string | undefined {
  return hoverAt(engine.snapshot, root + page, PAGES[page]!.indexOf(word) + 1)?.markdown;
}

describe('the hover', () => {
  it('says what is preferred, who uses what, and the definition as plain text', () => {
    expect(hover('connecting.md', 'API key')).toBe(
      [
        '**API key** is a deprecated term. Preferred: **access key**.',
        '',
        '| Name | Status | Uses | Pages |',
        '|---|---|--:|--:|',
        '| access key | preferred | 1 | 1 |',
        '| key string | admitted | 0 | 0 |',
        '| API key | deprecated | 2 | 1 |',
        '',
        'A \\*secret\\* string.',
      ].join('\n'),
    );
    expect(hover('connecting.md', 'access key')).toMatch(/^\*\*access key\*\* is the preferred term\./);
  });

  it('says why a deprecated term has no quick fix, and nothing where it has one', () => {
    const text = 'Store the API key.\n\n+---------+\n| API key |\n+---------+\n';
    const uri = `${root}drawn.rst`;
    const own = new Engine(new Profiles());
    const snapshot = own.apply({
      documents: [{ uri, source: { uri, format: 'restructuredtext', text } }],
      termbases: [{ uri: `${root}termbase.yaml`, text: termbase }],
    });
    const drawn = hoverAt(snapshot, uri, text.lastIndexOf('API key') + 1)?.markdown;
    expect(drawn).toMatch(/\n\nNo quick fix here: A word of another length could break the columns/);
    expect(hoverAt(snapshot, uri, text.indexOf('API key') + 1)?.markdown).not.toContain('No quick fix');
  });

  it('asks where nobody has decided, with the reasons', () => {
    const card = hover('installing.md', 'datalogger')!;
    expect(card).toMatch(/^\*\*datalogger\*\*: one thing with \*\*data logger\*\*\? Nobody has decided yet\./);
    expect(card).toMatch(/\| datalogger \| undecided \| \d+ \| \d+ \|/);
    expect(card).toMatch(/^- written as /m);
  });

  it('says that a term is kept apart', () => {
    expect(hover('installing.md', 'hull')).toMatch(/^\*\*hull\*\* is kept apart/);
  });

  it('is silent on other words, in code and beyond the text', () => {
    expect(hover('quiet.md', 'archive')).toBeUndefined();
    expect(hover('connecting.md', '`API')).toBeUndefined();
    expect(hoverAt(engine.snapshot, `${root}connecting.md`, 1e6)).toBeUndefined();
    expect(hoverAt(engine.snapshot, `${root}nowhere.md`, 0)).toBeUndefined();
  });
});

describe('the counts of a card', () => {
  it('tell capitals apart, and verbs by the objects they were decided for', () => {
    const own = new Engine(new Profiles());
    const page = `${root}page.md`;
    const text = 'We use GitHub and GitHub, and he uses Github. Launch the job. You launch the rocket.\n';
    own.apply({
      documents: [{ uri: page, source: { uri: page, format: 'markdown', text } }],
      termbases: [
        {
          uri: `${root}termbase.yaml`,
          text: 'evenword: 1\nconcepts:\n  - preferred: GitHub\n    deprecated: [Github]\n  - preferred: start\n    deprecated: [launch]\n    with: [job]\n',
        },
      ],
    });
    finish(own.settle());
    const card = (word: string): string => hoverAt(own.snapshot, page, text.indexOf(word) + 1)!.markdown;
    expect(card('GitHub')).toMatch(/\| GitHub \| preferred \| 2 \| 1 \|\n\| Github \| deprecated \| 1 \| 1 \|/);
    expect(card('Launch')).toContain('| launch | deprecated | 1 | 1 |');
  });
});
