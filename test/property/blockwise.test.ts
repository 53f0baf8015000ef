// Reading again by outermost elements: whatever an edit does to what is above or behind it, the prose is that of reading whole.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { BlockwiseReading } from '../../server/src/prose/blockwise.js';
import { reread, startReading } from '../../server/src/prose/read.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { sourceOf, unlikeWhole, type Edit } from '../fuzz/sound.js';
import { ASCIIDOC_PAGE } from '../unit/prose/asciidocPage.js';

const RST_PAGE = `=====
Gates
=====

:lang: en

A gate *opens*; see \`the manual\`_, other_ and :term:\`key\`.

.. _other: http://b.example/
.. _the manual: c

Keys
----

- one

  - two::

      code
- three

key : string
  Opens it.

.. warning:: Mind
   the gap.

=====  =====
Key    Lock
=====  =====
brass  iron
       steel
=====  =====

+------+---------+
| Left | Right   |
+------+---------+

Locks
~~~~~

::

  no prose

Text after it.

    A quote.

    -- Somebody

Glossary
--------

lock
  Shuts.

bolt
  See *lock*.

.. class:: language-fr

La clé.

More
~~~~

The end.
`;

const PLAIN_PAGE = `  NOTES

  One paragraph of
  some lines.

      code = 1
      more code

  - an item
  - another
    that goes on

  Title
  -----

  The last words.
`;

/** What changes the meaning of other lines: adornments, delimiters, indentation, attributes, marks of lists. */
const DECISIVE: Partial<Record<Format, readonly string[]>> = {
  restructuredtext: [
    ...[
      '\n',
      '\n\n',
      '=====\n',
      '\n=====\n',
      '-----\n',
      '\n-----\n',
      '~~~~~\n',
      '^^^^\n',
      ' ',
      '  ',
      '    ',
      '- ',
      '1. ',
      'word',
    ],
    ...[
      '::',
      '::\n\n',
      '.. ',
      '..\n',
      '.. note::\n',
      '.. glossary::\n\n  ',
      '.. class:: language-de\n\n',
      '=====  =====\n',
      '+---+\n',
    ],
    ...[
      '.. _other: d\n',
      '.. _new: e\n',
      'new_',
      ':lang: fr\n',
      ':a: b\n',
      'Glossary\n',
      '| ',
      '-- Me\n',
      '>>> ',
      '__ x\n',
      '-a',
    ],
  ],
  asciidoc: [
    ...[
      '\n',
      '\n\n',
      '----\n',
      '====\n',
      '....\n',
      '****\n',
      '____\n',
      '////\n',
      '--\n',
      '|===\n',
      '```\n',
      '++++\n',
      '+\n',
      ' ',
    ],
    ...[
      '= T\n',
      '== S\n',
      '[glossary]\n',
      '== Glossary\n',
      '[qanda]\n',
      '[lang=fr]\n',
      '[source]\n',
      '[quote]\n',
      '[WARNING]\n',
    ],
    ...[
      ':lang: fr\n',
      ':a: b \\\n',
      ':!lang:\n',
      'ifdef::a[]\n',
      'ifdef::a[b]\n',
      'endif::[]\n',
      'include::a[]\n',
      '// c\n',
      'a:: ',
    ],
    ...[
      'a::\n',
      'b::: c\n',
      '* ',
      '. ',
      '<1> ',
      '.Title\n',
      '---\n',
      '---\na: b\n---\n',
      'A B <c@d>\n',
      'v1.0\n',
      '~~~~\n',
      'word',
    ],
  ],
  plaintext: ['\n', '\n\n', ' ', '  ', '    ', '\t', '- ', '1. ', '-----\n', 'word', 'x = 1\n', 'end;\n', ' \n', '\f'],
};
const PAGES: Partial<Record<Format, string>> = {
  restructuredtext: RST_PAGE,
  asciidoc: ASCIIDOC_PAGE,
  plaintext: PLAIN_PAGE,
};

function editsOf(pieces: readonly string[]): fc.Arbitrary<Edit[]> {
  const edit = fc.record<Edit>({
    at: fc.double({ min: 0, max: 1, noNaN: true }),
    remove: fc.oneof(fc.constant(0), fc.nat(3), fc.nat(12), fc.nat(300)),
    insert: fc
      .array(fc.constantFrom(...pieces, '\r\n', '\r', '\uFEFF'), { maxLength: 3 })
      .map((parts) => parts.join('')),
  });
  return fc.array(edit, { minLength: 1, maxLength: 10 });
}

describe.each<Format>(['restructuredtext', 'asciidoc', 'plaintext'])('rereading %s', (format) => {
  const page = PAGES[format]!;
  const edits = editsOf(DECISIVE[format]!);

  it('equals reading whole after edits of a page', () => {
    fc.assert(
      fc.property(edits, (script) => {
        expect(unlikeWhole(page, script, format)).toBeUndefined();
      }),
      { numRuns: 100 },
    );
  });

  it('equals it with other line breaks', () => {
    for (const lineBreak of ['\r\n', '\r']) {
      fc.assert(
        fc.property(edits, (script) => {
          expect(unlikeWhole(page.replaceAll('\n', lineBreak), script, format)).toBeUndefined();
        }),
        { numRuns: 40 },
      );
    }
  });

  it('equals it for texts made of such pieces alone', () => {
    const soup = fc.array(fc.constantFrom(...DECISIVE[format]!), { maxLength: 60 }).map((parts) => parts.join(''));
    fc.assert(
      fc.property(soup, edits, (text, script) => {
        expect(unlikeWhole(text, script, format)).toBeUndefined();
      }),
      { numRuns: 100 },
    );
  });

  it('reads no more than what stands around the edit', () => {
    const long = Array.from({ length: 400 }, (_, i) => `Paragraph ${i} has\nsome words.\n\n`).join('');
    const before = startReading(sourceOf(long, format)) as BlockwiseReading<unknown>;
    const at = long.indexOf('Paragraph 200') + 5;
    const text = `${long.slice(0, at)}x${long.slice(at)}`;
    const after = reread(before, sourceOf(text, format)) as BlockwiseReading<unknown>;
    const known = new Set(before.prose.blocks.map(({ content }) => content));
    expect(after.prose.blocks.filter(({ content }) => !known.has(content)).map(({ content }) => content.text)).toEqual([
      'Paragxraph 200 has some words.',
    ]);
    // Units above the edit are the same objects: nothing there was read.
    const units = new Set(before.units);
    expect(after.units.filter((unit) => units.has(unit)).length).toBeGreaterThanOrEqual(198);
  });
});

describe('what holds for the whole document', () => {
  it('is read again where an edit changes it: a target', () => {
    const text = 'See a_.\n\nMore.\n\nMore.\n\n.. _a: b\n';
    const first = startReading(sourceOf(text, 'restructuredtext'));
    const next = reread(first, sourceOf(text.replace(': b', ': c'), 'restructuredtext'));
    expect(next.prose.blocks[0]!.content.links[0]!.target).toBe('c');
  });

  it('is read again where an edit changes it: the levels of titles', () => {
    const text = 'A\n===\n\nB\n---\n\nText.\n\nC\n~~~\n\nD\n---\n';
    const first = startReading(sourceOf(text, 'restructuredtext'));
    const next = reread(first, sourceOf(text.replace('B\n---\n\n', ''), 'restructuredtext'));
    expect(next.prose.blocks.map(({ content }) => content.level)).toEqual([1, 0, 2, 3]);
  });

  it('is read again where an edit opens a block', () => {
    const text = '= T\n\nOne.\n\nTwo.\n\nThree.\n';
    const first = startReading(sourceOf(text, 'asciidoc'));
    const next = reread(first, sourceOf(text.replace('Two', '----\nTwo'), 'asciidoc'));
    expect(next.prose.blocks.map(({ content }) => content.text)).toEqual(['T', 'One.']);
    const back = reread(next, sourceOf(text, 'asciidoc'));
    expect(back.prose.blocks.map(({ content }) => content.text)).toEqual(['T', 'One.', 'Two.', 'Three.']);
  });
});
