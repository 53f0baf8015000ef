// HTML and XML of any shape: nothing throws, every unit maps to its source, reading again equals reading whole.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPAQUE, sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import type { SourceText } from '../../server/src/text/sourceText.js';

type Markup = 'html' | 'xml';

const TEXT = [
  ...[
    'word',
    'two words',
    'naïve',
    '漢字',
    '🙂',
    '\u0301',
    '“e f g h”',
    '"a b c d"',
    '.',
    ', ',
    ' ',
    '  ',
    '\n',
    '\r\n',
  ],
  ...[
    '\r',
    '\t',
    '&amp;',
    '&#65;',
    '&#x1F642;',
    '&nbsp;',
    '&no;',
    '&',
    '&#xD800;',
    '&#10;',
    '\uFEFF',
    '\uFFFC',
    '\0',
    '\ud800',
  ],
  ...[
    'https://a.example/b?c&amp;d',
    'www.a.example',
    'g@h.example',
    '{{ a }}',
    '{% b',
    '${c}',
    '://',
    '@',
    '<',
    '>',
    ']]>',
  ],
  ...[
    '<!-- c -->',
    '<!--',
    '<![CDATA[ d & <e> ]]>',
    '<![CDATA[',
    '<?pi f?>',
    '<?',
    '<!DOCTYPE x [ <!ENTITY y "z">',
    ']>',
  ],
];
const TAGS: Record<Markup, string[]> = {
  html: [
    ...['p', 'div', 'li', 'ul', 'td', 'tr', 'table', 'dt', 'dd', 'h2', 'b', 'code', 'kbd', 'q', 'pre', 'svg', 'title'],
    ...['head', 'body', 'blockquote', 'sup', 'textarea', 'script', 'select', 'summary', 'br', 'form', 'nav'],
  ],
  xml: [
    ...[
      'section',
      'title',
      'para',
      'info',
      'abstract',
      'listitem',
      'term',
      'varlistentry',
      'footnote',
      'warning',
      'screen',
    ],
    ...[
      'command',
      'guimenu',
      'menuchoice',
      'quote',
      'indexterm',
      'glossterm',
      'entry',
      'xref',
      'textobject',
      'alt',
      'm:x',
    ],
    ...['unknown', 'imageobject', 'bridgehead', 'link', 'blockquote', 'emphasis'],
  ],
};
const ATTRIBUTES = [
  ...[
    '',
    '',
    '',
    ' href="y&amp;z"',
    " title='a b'",
    ' alt="c&lt;d"',
    ' class="warning"',
    ' class="guilabel"',
    ' xlink:href="u"',
  ],
  ...[' lang="en"', ' title', ' alt=e', ' title="unclosed', ' type="danger"', ' xlink:title="f  g"', ' a="b"/'],
];

const HEADS: Record<Markup, string[]> = {
  html: ['', '', '<!doctype html><html lang="en"><head><title>T</title></head><body>', '---\ntitle: a\n---\n'],
  xml: [
    ...[
      '',
      '<section xmlns="http://docbook.org/ns/docbook">',
      '<?xml version="1.0"?><!DOCTYPE topic SYSTEM "topic.dtd"><topic>',
    ],
    ...['<page xmlns="http://projectmallard.org/1.0/">', '<html><body>', '<other><p>'],
  ],
};

function soups(format: Markup): fc.Arbitrary<string> {
  const tag = fc.tuple(fc.constantFrom(...TAGS[format]), fc.constantFrom(...ATTRIBUTES), fc.boolean());
  const part = fc.oneof(
    fc.constantFrom(...TEXT),
    tag.map(([name, attributes]) => `<${name}${attributes}>`),
    tag.map(([name, , empty]) => (empty ? `<${name}/>` : `</${name}>`)),
  );
  return fc
    .tuple(fc.constantFrom(...HEADS[format]), fc.array(part, { maxLength: 50 }))
    .map(([head, parts]) => head + parts.join(''));
}

const source = (format: Markup, text: string): SourceText => ({ uri: 'file:///soup', format, text });

function expectSoundMap(text: string, format: Markup): void {
  let before = 0;
  const prose = read(source(format, text));
  expect(prose.problems.filter(({ message }) => !message.startsWith('Text nested'))).toEqual([]);
  for (const block of prose.blocks) {
    const { content, start } = block;
    expect(start).toBeGreaterThanOrEqual(before);
    expect(start + content.sourceLength).toBeLessThanOrEqual(text.length);
    before = start;
    for (let i = 3; i < content.pieces.length; i += 3) {
      expect(content.pieces[i]!).toBeGreaterThan(content.pieces[i - 3]!);
      expect(content.pieces[i + 1]!).toBeGreaterThanOrEqual(content.pieces[i - 2]! + content.pieces[i - 1]!);
    }
    for (let i = 0; i < content.text.length; i++) {
      const from = sourceStart(block, i);
      const to = sourceEnd(block, i + 1);
      const unit = content.text[i]!;
      const slice = text.slice(from, to);
      expect(to).toBeGreaterThan(from);
      expect(to).toBeLessThanOrEqual(start + content.sourceLength);
      if (unit === OPAQUE || slice.startsWith('&')) continue;
      if (unit === ' ') expect(slice).toMatch(/^[\s<&]/);
      else if (unit === '\uFFFD') expect(['\0', '\uFFFC', '\uFFFD']).toContain(slice);
      else expect(slice).toBe(unit);
    }
    let at = 0;
    for (const mark of content.marks) {
      expect(mark.start).toBeGreaterThanOrEqual(at);
      expect(mark.end).toBeGreaterThan(mark.start);
      at = mark.end;
    }
    expect(at).toBeLessThanOrEqual(content.text.length);
    expect(content.links.every((link) => link.start < link.end && link.end <= content.text.length)).toBe(true);
    expect(content.text).not.toMatch(/^ | {2}/);
  }
}

describe.each<Markup>(['html', 'xml'])('the prose of any %s', (format) => {
  it('maps unit by unit to its source', () => {
    fc.assert(
      fc.property(soups(format), (text) => expectSoundMap(text, format)),
      { numRuns: 1500 },
    );
  });

  it('maps so for every beginning of a text', () => {
    fc.assert(
      fc.property(soups(format), fc.double({ min: 0, max: 1, noNaN: true }), (text, part) =>
        expectSoundMap(text.slice(0, Math.floor(part * text.length)), format),
      ),
      { numRuns: 500 },
    );
  });

  it('is the same when read again after an edit', () => {
    fc.assert(
      fc.property(soups(format), soups(format), fc.nat(400), fc.nat(20), (text, insert, at, remove) => {
        const edited = text.slice(0, at) + insert + text.slice(at + remove);
        const before = startReading(source(format, text));
        const old = before.prose;
        const again = reread(before, source(format, edited));
        expect(JSON.stringify(again.prose)).toBe(JSON.stringify(read(source(format, edited))));
        expect(before.prose).toBe(old);
      }),
      { numRuns: 400 },
    );
  });
});
