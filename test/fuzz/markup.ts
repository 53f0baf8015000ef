// HTML and XML of any shape: tags, attributes and text in any order.
import fc from 'fast-check';

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

/** Mixtures of up to fifty pieces behind one of the format's beginnings. */
export function markupSoup(format: Markup): fc.Arbitrary<string> {
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
