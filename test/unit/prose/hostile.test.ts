// Hostile input: what would make a parser slow or deep is read in a bounded multiple of the time that prose takes.
import { describe, expect, it } from 'vitest';
import { read } from '../../../server/src/prose/read.js';
import type { Format } from '../../../server/src/text/sourceText.js';

const SIZE = 100_000;
/** Reading 100 KB of prose takes about 12 ms, so this stands for about 300 ms; what is quadratic takes seconds. */
const MOST = 25;

function fill(unit: string): string {
  return unit.repeat(Math.ceil(SIZE / unit.length)).slice(0, SIZE);
}

const HOSTILE: Record<string, string> = {
  base64: fill('QUJDREVGR0hJSktMTU5PUFFSU1RVVldYWVphYmNkZWZnaGlqa2xtbm9wcXJzdHV2d3h5ejAxMjM0NTY3ODkrLw'),
  'one word': fill('a'),
  'one accented word': fill('é'),
  dashes: fill('-'),
  'opening brackets': fill('['),
  'balanced brackets': fill('[').slice(0, SIZE / 2) + fill(']').slice(0, SIZE / 2),
  'opening emphasis': fill('*a '),
  'emphasis that closes nothing': fill('*a_ '),
  'nested emphasis': '*_'.repeat(12_000) + 'a' + '_*'.repeat(12_000),
  pipes: fill('|'),
  'a table of pipes': `${fill('|')}\n${fill('|-')}`,
  'a bracket before a table': `[|\n|-|-\n${fill('a|\n')}`,
  comments: fill('<!--'),
  'processing instructions': fill('<?'),
  'a tag full of blanks': `<a${fill(' ')}`,
  'code elements': fill('<code>'),
  'code spans': Array.from({ length: 440 }, (_, i) => '`'.repeat(i + 1)).join(' '),
  'titles that never end': fill('[a](b "c'),
  'images in images': '!['.repeat(20_000) + '](x)'.repeat(15_000),
  'deep quotations': fill('> '),
  'many deep quotations': fill(`${'>'.repeat(40)} a\n`),
  'deep lists': fill('- * '),
  'lists ever deeper': Array.from({ length: 440 }, (_, i) => `${'  '.repeat(i)}- a`).join('\n'),
  templates: fill('{%'),
  addresses: fill('a@'),
  'a local part': fill('a.'),
  blanks: `a${fill(' ')}b`,
  'line breaks': fill('\n'),
  definitions: fill('[a]: b\n'),
  'a label that never ends': `[${fill('a\n')}`,
  'opening quotation marks': fill('"a '),
  'open containers': fill(':::a\n'),
  'front matter that never ends': `---\n${fill('a: b\n')}`,
  'an unclosed title': `---\ntitle: "${fill('x\\')}\n---\n`,
  'directives in directives': Array.from({ length: 440 }, (_, i) => `${'`'.repeat(443 - i)}{note}\n`).join(''),
  hints: fill('{% hint %}\n'),
  'bold terms in a glossary': `# Glossary\n\n${fill('**a**: b\n\n')}`,
  'rows of a glossary': `# Glossary\n\n| Term | b |\n|--|--|\n${fill('| c | d |\n')}`,
  'one row of a glossary': `# Glossary\n\n| Term | b |\n|--|--|\n${fill('| c ')}`,
  'terms before colons': fill('a\n: b\n'),
  'colons behind blank lines': fill('a\n\n: b\n\n'),
  'template blocks that never end': fill('{% highlight %}\n'),
  'tags of HTML blocks': fill('<div>\n\n'),
  'attributes that never end': fill('<div "\n'),
  'elements in elements': fill('<div><b>'),
  'end tags': fill('</div>\n\n'),
  'elements around blocks':
    fill('<div class="warning">\n\na\n\n').slice(0, SIZE * 0.75) + fill('</div>\n\n').slice(0, SIZE * 0.25),
  'end tags among blocks': `<div>\n${fill('</x><p>a</p>\n')}`,
  cells: fill('<td>a'),
  braces: fill('{'),
  'braces on lines': fill('{\n\n'),
  'templates on lines': fill('{`a\n\n'),
  'comments in braces': fill('{/*\n\n'),
  'tags that never end': fill('<A\n\n'),
  'attributes of components': fill('<A b="\n\n'),
  'one tag': `<A ${fill('b ')}`,
  'module code that never ends': fill('export const a = {\n\n'),
  'module code with strings': fill("import 'a\n\n"),
  'components in lines': fill('<A b="c">d</A>'),
  'NUL units': fill('\0'),
  'lone surrogates': fill('\ud800'),
  'byte order marks': fill('\uFEFF'),
};

const PROSE = fill('The key opens the gateway, and *every* owner has [one](x.md) of `them`.\n\n');

function milliseconds(text: string, format: Format): number {
  const before = process.cpuUsage();
  read({ uri: 'file:///hostile', format, text });
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}

describe('reading a notebook', () => {
  const cell = '{"cell_type":"markdown","source":"two words"';
  const nested = (depth: number): string => `${'[{"a":'.repeat(depth)}1${'}]'.repeat(depth)}`;

  it('of deep data takes about as long as of shallow data', () => {
    const deep = `{"cells":[${cell},"metadata":${nested(20_000)}}]}`;
    const shallow = `{"cells":[${cell},"metadata":[${Array.from({ length: 2000 }, () => nested(10)).join(',')}]}]}`;
    const [taken, usual] = [deep, shallow].map((text) =>
      Math.min(...Array.from({ length: 4 }, () => milliseconds(text, 'notebook'))),
    );
    expect(taken! / Math.max(4, usual!)).toBeLessThan(MOST);
  });
});

describe.each<Format>(['markdown', 'mdx', 'plaintext'])('reading 100 KB as %s', (format) => {
  for (let i = 0; i < 10; i++) milliseconds(PROSE, format);
  const usual = Math.max(4, Array.from({ length: 5 }, () => milliseconds(PROSE, format)).sort((a, b) => a - b)[2]!);

  it.each(Object.entries(HOSTILE))('of %s stays within bounds', (_name, text) => {
    const taken = Math.min(...Array.from({ length: 3 }, () => milliseconds(text, format)));
    expect(taken / usual).toBeLessThan(MOST);
  });
});
