// Fixes in formats that draw with characters: nothing that is drawn is broken.
import { describe, expect, it } from 'vitest';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import { preferredEdits } from '../../../server/src/engine/fixing.js';
import { formatOf } from '../../../server/src/text/sourceText.js';

const TERMBASE =
  'evenword: 1\nconcepts:\n  - preferred: access token\n    deprecated: [API token]\n  - preferred: hut\n    deprecated: [hat]\n';

const PAGE = `API token
=========

Use the API token.

=========  ====
Name       Use
=========  ====
API token  one
hat        two
=========  ====
`;

describe('a fix in reStructuredText', () => {
  const engine = new Engine(new Profiles());
  const uri = 'file:///docs/page.rst';
  const snapshot = engine.apply({
    documents: [{ uri, source: { uri, format: 'restructuredtext', text: PAGE } }],
    termbases: [{ uri: 'file:///docs/termbase.yaml', text: TERMBASE }],
  });

  it('changes running text, and cells where the columns stay', () => {
    const fixes = snapshot.findingsIn(uri).map((finding) => {
      const fix = preferredEdits(snapshot, uri, finding);
      return [PAGE.slice(0, finding.span.start).split('\n').length, fix.kind === 'edits' ? fix.kind : fix.reason];
    });
    expect(fixes).toEqual([
      [1, 'The line under the title would not fit: change both by hand.'],
      [4, 'edits'],
      [9, 'A word of another length could break the columns of the table: change it by hand.'],
      [10, 'edits'],
    ]);
  });
});

describe('a fix in a table of reStructuredText that is written as a list', () => {
  it('may be of any length, unless a drawn table stands in the cell', () => {
    const text = `.. list-table:: Names
   :header-rows: 1

   * - Name
     - Use
   * - API token
     - one

       The API token again.
   * - two
     - +-----------+
       | API token |
       +-----------+

+-----------+
| API token |
+-----------+
`;
    const engine = new Engine(new Profiles());
    const uri = 'file:///docs/list.rst';
    const snapshot = engine.apply({
      documents: [{ uri, source: { uri, format: 'restructuredtext', text } }],
      termbases: [{ uri: 'file:///docs/termbase.yaml', text: TERMBASE }],
    });
    const fixes = snapshot
      .findingsIn(uri)
      .map((each) => [text.slice(0, each.span.start).split('\n').length, preferredEdits(snapshot, uri, each).kind]);
    expect(fixes).toEqual([
      [6, 'edits'],
      [9, 'edits'],
      [12, 'refused'],
      [16, 'refused'],
    ]);
  });
});

describe('a fix in a title with a line of marks under it', () => {
  // Docutils: “the title underline must be at least as long as the title text”; Asciidoctor: as long, give or take one.
  it.each([
    ['rst', 'API token\n=========\n', 'refused'],
    ['rst', '============\n API token\n============\n', 'edits'],
    ['rst', 'API token\n============\n', 'edits'],
    ['rst', 'API token 令\n=============\n', 'refused'],
    ['adoc', 'API token\n---------\n', 'refused'],
    ['adoc', 'API token\n----------\n', 'refused'],
    ['adoc', 'API token now\n--------------\n', 'refused'],
    ['adoc', 'The hat\n-------\n', 'edits'],
    ['adoc', '== API token\n', 'edits'],
    ['md', 'API token\n---------\n', 'edits'],
  ])('%s: %j is %s', (extension, heading, kind) => {
    const engine = new Engine(new Profiles());
    const uri = `file:///docs/page.${extension}`;
    const format = formatOf(uri)!;
    const snapshot = engine.apply({
      documents: [{ uri, source: { uri, format, text: `${heading}\nText.\n` } }],
      termbases: [{ uri: 'file:///docs/termbase.yaml', text: TERMBASE }],
    });
    expect(snapshot.findingsIn(uri).map((finding) => preferredEdits(snapshot, uri, finding).kind)).toEqual([kind]);
  });
});

describe('a fix in XML', () => {
  it('writes no sign that acts as markup', () => {
    const engine = new Engine(new Profiles());
    const uri = 'file:///docs/topic.dita';
    const text =
      '<topic id="t"><title>Parts</title><body><p>Ask the workshop, then the research team.</p></body></topic>';
    const termbase =
      'evenword: 1\nconcepts:\n  - preferred: R&D\n    deprecated: [research team]\n  - preferred: yard\n    deprecated: [workshop]\n';
    const snapshot = engine.apply({
      documents: [{ uri, source: { uri, format: 'xml', text } }],
      termbases: [{ uri: 'file:///docs/termbase.yaml', text: termbase }],
    });
    expect(snapshot.findingsIn(uri).map((finding) => preferredEdits(snapshot, uri, finding).kind)).toEqual([
      'edits',
      'refused',
    ]);
  });
});
