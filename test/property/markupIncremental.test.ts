// Reading a page of HTML or XML again after edits gives what reading the whole gives, and costs what changed.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import type { Format, SourceText } from '../../server/src/text/sourceText.js';

const html = (i: number): string =>
  `<h${1 + (i % 3)} id="s${i}">Part ${i}${i % 4 === 0 ? '</h1><h2>Glossary' : ''}</h${1 + (i % 3)}>\n<p>The key opens <b>gate ${i}</b>, and <a href="x">every\n` +
  'owner</a> has <code>one</code> of them &mdash; see below.</p>\n<ul><li>First<li><p lang="fr">Deux <i lang="de">Wort</i></p></ul>\n<dl><dt>key<dd>It opens.<p>So.</dl>\n' +
  '<div class="warning"><p>Hot. <img alt="A mast" src=y><p>Cold.</div><table><tr><td>a<td>b <kbd>K</kbd></table><section><div>In <q>a</q> section.</div></section>\n';
const docbook = (i: number): string =>
  `<section xml:id="s${i}"><title>${i % 3 === 0 ? 'Glossary' : `Part ${i}`}</title><para>The key opens <emphasis>gate ${i}</emphasis>, see <xref linkend="x"/><footnote><para>A note.</para></footnote>.</para>\n` +
  '<variablelist><varlistentry><term>key</term><listitem><para>It opens.</para></listitem></varlistentry></variablelist>\n' +
  '<warning><para>Hot &amp; <link xlink:href="y">cold</link>.</para></warning><para xml:lang="de">Drei <guimenu>M</guimenu> <menuchoice><guimenu>A</guimenu><guimenuitem>B</guimenuitem></menuchoice></para></section>\n';
const dita = (i: number): string =>
  `<section><title>Part ${i}</title><p>The key <ph keyref="k"/> opens ${i}.<ul><li>First</li><li>Second <xref href="z"/></li></ul> After.</p><note type="danger">Hot.</note></section>\n` +
  '<fig><title>A mast</title><image href="m"><alt>Mast</alt></image></fig><p>Plain <![CDATA[text & more]]> here.</p>\n';
const times = (part: (i: number) => string, count: number): string =>
  Array.from({ length: count }, (_, i) => part(i)).join('');
const PAGES: readonly (readonly [string, Format, string])[] = [
  [
    'HTML',
    'html',
    `<!doctype html><html lang="en"><head><title>Keys</title></head><body>\n${times(html, 14)}</body></html>`,
  ],
  ['HTML without a head', 'html', times(html, 14)],
  ['HTML with front matter', 'html', `---\ntitle: Keys\nlang: en\n---\n${times(html, 8)}`],
  [
    'DocBook',
    'xml',
    `<?xml version="1.0"?>\n<article xmlns="http://docbook.org/ns/docbook" xmlns:xlink="x" xml:lang="en"><title>A</title>\n${times(docbook, 14)}</article>`,
  ],
  [
    'DITA',
    'xml',
    `<!DOCTYPE topic PUBLIC "-//OASIS//DTD DITA Topic//EN" "topic.dtd" [<!ENTITY e "&#233;">]>\n<topic xml:lang="en"><title>A</title><body>${times(dita, 20)}</body></topic>`,
  ],
  ['a topic known by its elements', 'xml', `<topic><title>A</title><body>${times(dita, 12)}</body></topic>`],
  [
    'another vocabulary',
    'xml',
    `<book><chapter><title>A</title>${times((i) => `<x><p>Key ${i}</p></x><y>no <z>text</z></y>${' '.repeat(300)}`, 12)}</chapter></book>`,
  ],
];
const SNIPPETS = [
  'word',
  ' ',
  '\n',
  '\r\n',
  '<p>',
  '</p>',
  '<div>',
  '</div>',
  '<div lang="de">',
  '<b>',
  '</b>',
  '<ul><li>',
  '</ul>',
  '<h1>Glossary</h1>',
]
  .concat([
    '<h2>Use</h2>',
    '<!--',
    '-->',
    '<pre>',
    '</pre>',
    '<code>',
    '<a href="q">',
    '</a>',
    '<table>',
    '</table>',
    '<script>',
    '</script>',
    '<svg>',
    '</svg>',
  ])
  .concat([
    '<title>',
    '</title>',
    '<section>',
    '</section>',
    '<para>',
    '</para>',
    '<footnote><para>',
    '</para></footnote>',
    '<note type="warning">',
    '</note>',
  ])
  .concat([
    '<![CDATA[',
    ']]>',
    '<?pi',
    '?>',
    '&amp;',
    '&',
    '<',
    '>',
    '"',
    "'",
    '=',
    '<dl>',
    '<dt>',
    '<dd>',
    '<dfn>term</dfn>',
    '<p><dfn>term</dfn> is',
    '<html lang="fr">',
  ])
  .concat([
    '<body lang="es">',
    '<meta http-equiv="content-language" content="it">',
    '<span translate="no">',
    '</span>',
    ' class="glossary"',
    ' lang="fr"',
    '<body>',
  ])
  .concat([
    '---\n',
    '<ph keyref="a">',
    '</ph>',
    '<menuchoice>',
    '</menuchoice>',
    '<image>',
    '<alt>',
    '<textarea>',
    '🙂',
    '\uFEFF',
    '\0',
    '</html>',
    '</article>',
    '</topic>',
    '<conbody>',
  ]);

interface Edit {
  readonly at: number;
  readonly remove: number;
  readonly insert: readonly string[];
}

const edits = fc.array(
  fc.record<Edit>({
    at: fc.double({ min: 0, max: 1, noNaN: true }),
    remove: fc.oneof({ weight: 3, arbitrary: fc.constant(0) }, fc.nat(12), fc.nat(1500)),
    insert: fc.array(fc.constantFrom(...SNIPPETS), { maxLength: 4 }),
  }),
  { minLength: 1, maxLength: 8 },
);

function apply(text: string, { at, remove, insert }: Edit): string {
  const offset = Math.floor(at * text.length);
  return text.slice(0, offset) + insert.join('') + text.slice(offset + remove);
}

const source = (format: Format, text: string): SourceText => ({ uri: 'file:///page', format, text });

describe.each(PAGES)('reading %s again', (_name, format, page) => {
  it('equals reading the whole after any edits', () => {
    fc.assert(
      fc.property(edits, (script) => {
        let text = page;
        let reading = startReading(source(format, text));
        for (const edit of script) {
          text = apply(text, edit);
          const before = reading;
          const proseBefore = JSON.stringify(before.prose.blocks.length);
          reading = reread(reading, source(format, text));
          const whole = JSON.stringify(read(source(format, text)));
          expect(JSON.stringify(reading.prose) === whole, JSON.stringify({ text, edit })).toBe(true);
          expect(JSON.stringify(before.prose.blocks.length)).toBe(proseBefore);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('keeps the contents of all blocks but the one that a letter was put into', () => {
    const before = startReading(source(format, page));
    const old = new Set(before.prose.blocks.map(({ content }) => content));
    const at =
      page.indexOf('Key', page.length / 2) >= 0
        ? page.indexOf('Key', page.length / 2)
        : page.indexOf('key opens', page.length / 2);
    const after = reread(before, source(format, `${page.slice(0, at)}x${page.slice(at)}`));
    expect(after.prose.blocks.filter(({ content }) => !old.has(content)).length).toBeLessThanOrEqual(1);
    expect(after.prose.blocks.length).toBe(before.prose.blocks.length);
  });
});

describe('the cost of reading again', () => {
  it.each(PAGES.slice(0, 5))('%s is a part of that of reading the whole', (_name, format, page) => {
    const open = page.slice(0, page.length - 40);
    const text = open + open.slice(open.length / 2).repeat(40);
    const first = startReading(source(format, text));
    const milliseconds = (run: () => void): number => {
      const times: number[] = [];
      for (let i = 0; i < 9; i++) {
        const start = process.cpuUsage();
        run();
        const { user, system } = process.cpuUsage(start);
        times.push(user + system);
      }
      return Math.min(...times) / 1000;
    };
    const at = text.indexOf('opens', text.length / 2);
    const edited = source(format, `${text.slice(0, at)}x${text.slice(at)}`);
    const whole = milliseconds(() => startReading(edited));
    const again = milliseconds(() => reread(first, edited));
    console.info(`${text.length} units: ${whole.toFixed(2)} ms whole, ${again.toFixed(2)} ms again`);
    expect(again / whole).toBeLessThan(0.6);
  });
});
