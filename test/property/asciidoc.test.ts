// AsciiDoc of any shape: nothing throws, every unit of prose has its source, and reading again equals reading anew.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPAQUE, sourceEnd, sourceStart, type Prose } from '../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { ASCIIDOC_PAGE } from '../unit/prose/asciidocPage.js';

const WORDS = [
  'word',
  'two words',
  'naïve',
  '漢字',
  '🙂',
  '\u0301',
  'a b c d',
  '.',
  ',',
  ' ',
  '  ',
  '\t',
  '\0',
  '\uFFFC',
  '\ud800',
  '\uFEFF',
];
const BREAKS = ['\n', '\n\n', '\n\n', '\r\n', '\r\n\r\n', '\r', ' +\n'];
const LINES = [
  ...[
    '= T\n',
    '== S\n',
    '=== S ===\n',
    'T\n-\n',
    '----\n',
    '....\n',
    '++++\n',
    '====\n',
    '****\n',
    '____\n',
    '--\n',
    '```\n',
    '////\n',
  ],
  ...[
    '|===\n',
    '!===\n',
    '| ',
    'a| ',
    '2+|',
    '\\|',
    '// c\n',
    ':a: b\n',
    ':a: b \\\n',
    '.Title\n',
    '[NOTE]\n',
    '[source]\n',
    '[[id]]\n',
  ],
  ...[
    '[cols="1a,2m"]\n',
    'WARNING: ',
    '* ',
    '** ',
    '. ',
    '- [ ] ',
    't:: ',
    't::\n',
    '<1> ',
    '+\n',
    '> ',
    '-- me\n',
    'include::a[]\n',
  ],
  ...[
    'ifdef::a[]\n',
    'ifdef::a[b]\n',
    'endif::[]\n',
    '\\ifdef::a[]\n',
    'image::a[b,title="c"]\n',
    "'''\n",
    '---\n',
    '---\ntitle: x\n---\n',
  ],
];
const INLINE = [
  ...[
    '*',
    '**',
    '_',
    '__',
    '#',
    '##',
    '`',
    '``',
    '"`',
    '`"',
    "'`",
    "`'",
    '^',
    '~',
    '+',
    '++',
    '+++',
    '$$',
    '[.r]',
    '\\',
    '&amp;',
    '&#1;',
  ],
  ...[
    '{a}',
    '{nbsp}',
    '{',
    '}',
    '[',
    ']',
    '((',
    '))',
    '(((',
    ')))',
    '(C)',
    '<<',
    '>>',
    '<<a,',
    '[[b]]',
    '@',
    'me@a.example',
    'pass:[',
  ],
  ...[
    'link:a[',
    'https://a.b',
    'https://a.b[',
    '{u}/a[',
    'xref:a[',
    'image:a[',
    'kbd:[',
    'menu:a[',
    'footnote:[',
    'footnoteref:[a,',
  ],
  ...['indexterm:[', 'stem:[', 'x:y[', 'alt=', '"', ',', '=', '^]', ':', '::', ';;'],
];

const soup = fc
  .array(
    fc.oneof(
      fc.constantFrom(...WORDS),
      fc.constantFrom(...BREAKS),
      fc.constantFrom(...LINES),
      fc.constantFrom(...INLINE),
    ),
    {
      maxLength: 60,
    },
  )
  .map((parts) => parts.join(''));

function source(text: string): SourceText {
  return { uri: 'file:///page.adoc', format: 'asciidoc', text };
}

/** What is written, with blanks where blanks stand for other white space or for the bracket between two labels. */
function asShown(written: string, said: string): string {
  return written
    .replace(/[\0\uFFFC]/g, '\uFFFD')
    .replace(/[\s[]/g, (unit, at: number) => (said[at] === ' ' ? ' ' : unit));
}

/** White space is one blank, odd units are replaced, markup inside a stretch is gone: all else stands where it is said to. */
function expectTrueOffsets(text: string, { blocks, problems }: Prose): void {
  expect(problems.filter(({ message }) => message.includes('could not be read'))).toEqual([]);
  let before = -1;
  for (const block of blocks) {
    const { text: shown, pieces, marks, links, sourceLength } = block.content;
    expect(block.start).toBeGreaterThanOrEqual(before);
    before = block.start;
    expect(block.start + sourceLength).toBeLessThanOrEqual(text.length);
    for (let at = 0; at < pieces.length; at += 3) {
      const next = at + 3 < pieces.length ? pieces[at + 3]! : shown.length;
      const length = next - pieces[at]!;
      expect(length).toBeGreaterThan(0);
      if (at > 0) expect(pieces[at + 1]!).toBeGreaterThanOrEqual(pieces[at - 2]! + pieces[at - 1]!);
      expect(pieces[at + 1]! + pieces[at + 2]!).toBeLessThanOrEqual(sourceLength);
      const written = text.slice(sourceStart(block, pieces[at]!), sourceEnd(block, next));
      const said = shown.slice(pieces[at], next);
      if (said === OPAQUE || length !== pieces[at + 2]!) expect(written.length).toBe(pieces[at + 2]);
      else expect(asShown(written, said)).toBe(said);
    }
    let end = 0;
    for (const mark of marks) {
      expect(mark.start).toBeGreaterThanOrEqual(end);
      end = mark.end;
      expect(end).toBeGreaterThan(mark.start);
    }
    expect(end).toBeLessThanOrEqual(shown.length);
    for (const link of links) expect(link.end).toBeLessThanOrEqual(shown.length);
  }
}

describe('the AsciiDoc reader', () => {
  it('maps all prose of any mixture of markup to its source', () => {
    fc.assert(
      fc.property(soup, (text) => expectTrueOffsets(text, read(source(text)))),
      { numRuns: 1500 },
    );
  }, 60_000);

  it('reads every prefix of a page', () => {
    for (const page of [ASCIIDOC_PAGE, ASCIIDOC_PAGE.replaceAll('\n', '\r\n')]) {
      for (let end = 0; end <= page.length; end += 5) {
        const text = page.slice(0, end);
        expectTrueOffsets(text, read(source(text)));
      }
    }
  }, 60_000);

  it('reads again after any edit what reading anew gives', () => {
    const edit = fc.record({
      at: fc.double({ min: 0, max: 1, noNaN: true }),
      remove: fc.integer({ min: 0, max: 200 }),
      insert: soup,
    });
    fc.assert(
      fc.property(fc.array(edit, { minLength: 1, maxLength: 5 }), (edits) => {
        let text = ASCIIDOC_PAGE;
        let reading = startReading(source(text));
        for (const { at, remove, insert } of edits) {
          const offset = Math.floor(at * text.length);
          text = text.slice(0, offset) + insert + text.slice(offset + remove);
          reading = reread(reading, source(text));
          expect(JSON.stringify(reading.prose)).toBe(JSON.stringify(read(source(text))));
        }
      }),
      { numRuns: 100 },
    );
  }, 60_000);
});
