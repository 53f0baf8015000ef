// The hover of words that the documents' own glossary explains.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import { hoverAt } from '../../../server/src/ide/hover.js';
import type { Format } from '../../../server/src/text/sourceText.js';

const root = 'file:///docs/';
const long = 'It sends what it has measured to the station on the shore. '.repeat(4);
const PAGES: Readonly<Record<string, string>> = {
  'start.md': `Moor the *buoy* first. Buoys float; set \`buoy\` later. A watch is kept over the mast. Two relay stations listen.\n`,
  'glossary (terms).rst': `Glossary
========

.. glossary::

   Buoy
      Floats & carries *instruments* in [the] harbour, see \`\`kind\`\`.
      ${long}

   Relay station
      ${'A very long sentence that goes on and on without a stop, '.repeat(9)}and ends.

   Mast
      See beam.

   Watch
      See relay station.
`,
  'fr/debut.md':
    'La bouée flotte dans le port, et elle est reliée à la station par une ligne qui est sur le fond de la mer. La Buoy est un mot dans une autre langue.\n',
};
const engine = new Engine(new Profiles());
engine.apply({
  documents: Object.entries(PAGES).map(([name, text]) => {
    const uri = root + encodeURIComponent(name).replaceAll('%2F', '/');
    const format: Format = name.endsWith('.rst') ? 'restructuredtext' : 'markdown';
    return { uri, source: { uri, format, text, ...(name.startsWith('fr/') && { pathLanguage: 'fr' }) } };
  }),
  termbases: [
    {
      uri: `${root}termbase.yaml`,
      text: 'evenword: 1\nconcepts:\n  - preferred: relay station\n    deprecated: [repeater]\n',
    },
  ],
});
finish(engine.settle());

function hover(page: string, word: string, from = 0): string | undefined {
  return hoverAt(engine.snapshot, root + page, PAGES[page]!.indexOf(word, from) + 1)?.markdown;
}

describe('the hover of a headword', () => {
  it('has the first sentences of its definition as plain text, and a link to the entry', () => {
    const expected = [
      '**Buoy**',
      '',
      `Floats \\& carries instruments in \\[the\\] harbour, see kind. ${long.trim()}`,
      '',
      '[Glossary: glossary \\(terms\\).rst](<file:///docs/glossary%20(terms).rst#L6>)',
    ].join('\n');
    expect(hover('start.md', 'buoy')).toBe(expected);
    expect(hover('start.md', 'Buoys')).toBe(expected);
  });

  it('cuts a long sentence at a word', () => {
    const card = hover('start.md', 'relay')!;
    const text = card.split('\n\n').find((part) => part.startsWith('A very'))!;
    expect(text.length).toBeLessThanOrEqual(310);
    expect(text).toMatch(/ …$/);
  });

  it('stands on the card of a decided term too', () => {
    expect(hover('start.md', 'relay')).toMatch(
      /^\*\*relay station\*\* is the preferred term\.[^]*A very long[^]*Glossary:/,
    );
  });

  it('is silent in code, where nothing is explained, and in another language', () => {
    expect(hover('start.md', 'buoy`')).toBeUndefined();
    expect(hover('start.md', 'mast')).toBeUndefined();
    expect(hover('fr/debut.md', 'Buoy')).toBeUndefined();
  });

  it('follows an entry that only sends the reader to another', () => {
    expect(hover('start.md', 'watch')).toMatch(
      /^\*\*Watch\*\*: the glossary sends you to \*\*Relay station\*\*\.\n\nA very long/,
    );
  });

  it('is silent once the entry is gone', () => {
    const uri = `${root}glossary%20(terms).rst`;
    const source = { uri, format: 'restructuredtext', text: 'Nothing here.\n' } as const;
    const without = engine.apply({ documents: [{ uri, source }] });
    expect(hoverAt(without, `${root}start.md`, PAGES['start.md']!.indexOf('buoy') + 1)).toBeUndefined();
  });
});
