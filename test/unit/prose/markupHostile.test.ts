// Hostile HTML and XML: what would make a parser slow or deep is read in a bounded multiple of the time that prose takes.
import { describe, expect, it } from 'vitest';
import { read } from '../../../server/src/prose/read.js';
import type { Format } from '../../../server/src/text/sourceText.js';

const SIZE = 200_000;
/** Reading 200 KB of prose takes about 10 ms; what is quadratic takes seconds. */
const MOST = 25;

function fill(unit: string): string {
  return unit.repeat(Math.ceil(SIZE / unit.length)).slice(0, SIZE);
}

const ROOT = '<section xmlns="http://docbook.org/ns/docbook"><para>';
const HOSTILE: Record<string, string> = {
  'one word': fill('a'),
  'opening brackets': fill('<'),
  'start tags': fill('<b>'),
  'start tags of blocks': fill('<div>'),
  'start tags of items': fill('<li>'),
  'start tags of terms in lists': fill('<dl><dt>'),
  'start tags of links': fill('<a href=b>c '),
  'start tags of code': fill('<code>'),
  'footnotes in footnotes': ROOT + fill('<footnote>a '),
  'links without a text': ROOT + fill('<xref/>'),
  'end tags': fill('</b>'),
  'start and end tags apart': fill('<b>').slice(0, SIZE / 2) + fill('</i>').slice(0, SIZE / 2),
  'an end tag without an end': `<code>a${fill('</code ')}`,
  attributes: `<p ${fill('title=a ')}>`,
  'an attribute that never ends': `<p title="${fill('a ')}`,
  'one long attribute': `<p title="${fill('a ')}">`,
  comments: fill('<!--'),
  'CDATA sections': ROOT + fill('<![CDATA['),
  'processing instructions': fill('<?'),
  'a document type that never ends': `<!DOCTYPE a [${fill('<!ENTITY b "')}`,
  'entity declarations': `<!DOCTYPE a [${fill('<!ENTITY b "c">')}]>${ROOT}a`,
  ampersands: `<p>${fill('&')}`,
  'a reference that never ends': `<p>&${fill('a')}`,
  references: `<p>${fill('&amp;')}`,
  blanks: `<p>a${fill(' ')}b`,
  'blanks between tags': `<p>a${fill(' <b> </b>')}c`,
  'opening templates': `<p>${fill('{{')}`,
  'template marks': `<p>${fill('{%${')}`,
  addresses: `<p>${fill('a@')}`,
  'addresses before a long one': `<p>${fill('a@b.cc ')}http://${fill('a')}`,
  schemes: `<p>${fill('a://')}`,
  'schemes without a rest': `<p>${fill('a:// ')}`,
  'a local part': `<p>${fill('a.')}@`,
  'NUL units': `<p>${fill('\0')}`,
  'lone surrogates': `<p>${fill('\ud800')}`,
  'head tags': fill('<head><title>a</title>'),
  tables: fill('<table><tr><td>'),
  'elements of other namespaces': ROOT + fill('<x:y>'),
};
const PROSE: Record<'html' | 'xml', string> = {
  html: fill(
    '<p>The key opens the gateway, and <b>every</b> owner has <a href="x">one</a> of <code>them</code>.</p>\n',
  ),
  xml: `${ROOT}</para>${fill('<para>The key opens the <emphasis>gateway</emphasis>, and every owner has <command>one</command>.</para>\n')}`,
};

function milliseconds(text: string, format: Format): number {
  const before = process.cpuUsage();
  read({ uri: 'file:///hostile', format, text });
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}

describe.each(['html', 'xml'] as const)('reading 200 KB as %s', (format) => {
  for (let i = 0; i < 5; i++) milliseconds(PROSE[format], format);
  const usual = Math.max(
    5,
    Array.from({ length: 5 }, () => milliseconds(PROSE[format], format)).sort((a, b) => a - b)[2]!,
  );

  it.each(Object.entries(HOSTILE))('of %s stays within bounds', (_name, text) => {
    const taken = Math.min(...Array.from({ length: 2 }, () => milliseconds(text, format)));
    expect(taken / usual).toBeLessThan(MOST);
  });
});
