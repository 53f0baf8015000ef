// Reading again after an edit gives what reading the whole text gives, over random edits of Markdown.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { MDX_PAGE } from '../unit/prose/mdxPage.js';
import { PAGE } from '../unit/prose/page.js';

const SNIPPETS = [
  ...[
    '\n',
    '\n\n',
    ' ',
    '    ',
    '\t',
    '\r\n',
    '\r',
    '  \n',
    '\\\n',
    '-',
    '*',
    '**',
    '_',
    '`',
    '```\n',
    '~~~\n',
    '>',
    '> ',
    '#',
  ],
  ...[
    '## ',
    '- ',
    '1. ',
    '  - ',
    '+ ',
    '|',
    '| a | b |\n',
    '|---|---|\n',
    '---\n',
    '===\n',
    '[',
    ']',
    '](',
    '](x "y")',
    '[r]',
  ],
  ...[
    '[r]: /elsewhere\n',
    '[new]: /new\n',
    '[^1]: ',
    '[^1]',
    '<',
    '<!--',
    '-->',
    '<div>\n',
    '</div>',
    '<pre>',
    '</pre>\n',
    '<kbd>',
  ],
  ...[
    '</kbd>',
    '<code>',
    '{{ x }}',
    '{% if y %}',
    '{: .note }',
    '!!! warning "Take care"\n',
    '    body\n',
    ':::danger\n',
    ':::\n',
  ],
  ...[
    '=== "Tab"\n',
    '> [!CAUTION]\n',
    '"',
    'four words in quotes',
    '&amp;',
    '&#x41;',
    'https://a.example/b_c',
    'me@a.example',
    ':smile:',
  ],
  ...[
    'word',
    'API key',
    'naïve',
    '漢字かな',
    '🙂',
    '👩‍🚀',
    '\u0301',
    '\uFEFF',
    '\uFFFC',
    '\0',
    '\ud800',
    '---\ntitle: New\n---\n',
    'title: x\n',
  ],
  ...[
    '```{warning} Hot\n:class: x\n',
    '```\n',
    '{{< danger >}}\n',
    '{{< /danger >}}\n',
    '{% hint style="warning" %}\n',
    '{% endhint %}\n',
    '{: .warning}\n',
    '**Caution:** ',
    '# Glossary\n\n',
    '**term**: said\n',
    '- **one** – two\n',
    '| Term | Said |\n|--|--|\n| a | b |\n',
    'Term\n',
    ': definition\n',
    ':   more\n',
    '{% highlight c %}\n',
    '{% endhighlight %}\n',
    '{{< highlight >}}\n',
    '{{< /highlight >}}',
    '<div class="warning">\n\n',
    '<blockquote lang="de">\n',
    '</blockquote>\n\n',
    '<details><summary>Sum</summary>\n',
    '<td>`cell`',
  ],
];

/** What MDX adds. */
const MDX_SNIPPETS = [
  ...['import A from "a"\n', 'export const a = {\n', '};\n', '`', '{', '}', '{/* ', ' */}', "{' '}", '<Tabs>\n'],
  ...['</Tabs>\n', '<Tab label="One two">', '</Tab>', '<Warning>', '</Warning>\n', '<Card\n  title="A card"\n', '/>\n'],
  ...['>\n', "Don't", '        deep\n', '<td>cell</td>', '<CodeBlock>\n', '</CodeBlock>\n', '    ```\n', '// no\n'],
];

function markdown(text: string, format: Format = 'markdown'): SourceText {
  return { uri: 'file:///page.md', format, text };
}

interface Edit {
  readonly at: number;
  readonly remove: number;
  readonly insert: readonly string[];
}

const editsOf = (snippets: readonly string[]): fc.Arbitrary<Edit[]> =>
  fc.array(
    fc.record<Edit>({
      at: fc.double({ min: 0, max: 1, noNaN: true }),
      remove: fc.oneof(
        { weight: 3, arbitrary: fc.constant(0) },
        fc.integer({ min: 1, max: 12 }),
        fc.integer({ min: 1, max: 300 }),
      ),
      insert: fc.array(fc.constantFrom(...snippets), { maxLength: 4 }),
    }),
    { minLength: 1, maxLength: 8 },
  );
const edits = editsOf(SNIPPETS);
const mdxEdits = editsOf([...SNIPPETS, ...MDX_SNIPPETS, ...MDX_SNIPPETS]);

function apply(text: string, { at, remove, insert }: Edit): string {
  const offset = Math.floor(at * text.length);
  return text.slice(0, offset) + insert.join('') + text.slice(offset + remove);
}

function expectIncrementalEqualsWhole(start: string, script: readonly Edit[], format: Format = 'markdown'): void {
  let text = start;
  let reading = startReading(markdown(text, format));
  for (const edit of script) {
    text = apply(text, edit);
    const before = reading;
    const proseBefore = before.prose;
    reading = reread(reading, markdown(text, format));
    const fresh = JSON.stringify(read(markdown(text, format)));
    expect(JSON.stringify(reading.prose) === fresh, JSON.stringify({ text, edit })).toBe(true);
    expect(before.prose).toBe(proseBefore);
  }
}

describe('reread', () => {
  it('equals reading the whole page after random edits of a realistic page', () => {
    fc.assert(
      fc.property(edits, (script) => expectIncrementalEqualsWhole(PAGE, script)),
      { numRuns: 250 },
    );
  });

  it('equals reading the whole page with CRLF line breaks', () => {
    fc.assert(
      fc.property(edits, (script) => expectIncrementalEqualsWhole(PAGE.replaceAll('\n', '\r\n'), script)),
      { numRuns: 80 },
    );
  });

  it('equals reading the whole of texts made of markup alone', () => {
    const soup = fc.array(fc.constantFrom(...SNIPPETS), { maxLength: 60 }).map((parts) => parts.join(''));
    fc.assert(
      fc.property(soup, edits, (text, script) => expectIncrementalEqualsWhole(text, script)),
      { numRuns: 400 },
    );
  });

  it('equals reading the whole page after random edits of a realistic page of MDX', () => {
    fc.assert(
      fc.property(mdxEdits, (script) => expectIncrementalEqualsWhole(MDX_PAGE, script, 'mdx')),
      { numRuns: 250 },
    );
  });

  it('equals reading the whole of texts made of the markup of MDX alone', () => {
    const parts = fc.constantFrom(...SNIPPETS, ...MDX_SNIPPETS, ...MDX_SNIPPETS);
    const soup = fc.array(parts, { maxLength: 60 }).map((all) => all.join(''));
    fc.assert(
      fc.property(soup, mdxEdits, (text, script) => expectIncrementalEqualsWhole(text, script, 'mdx')),
      { numRuns: 400 },
    );
  });

  it('equals reading the whole of lists and tables, whose items and rows are read by themselves', () => {
    const items = [
      ...[
        '- a\n',
        '  b\n',
        '* c\n',
        '1. d\n',
        '2) e\n',
        '\n',
        '    f\n',
        '- - -\n',
        '---\n',
        '===\n',
        '   - g\n',
        '  ```\n',
      ],
      ...['h\n', '> i\n', '-\n', '\t- j\n', '7. k\n', '  [l]: /m\n', '- [l]\n', '+ n\n  : o\n', '-  - p\n', '  - q\n'],
    ];
    const cells = [
      ...[
        '| a | b |\n|--|--|\n',
        '| c | [l] |\n',
        '| d\n',
        'e\n',
        '\n',
        '|',
        ': f\n',
        '===\n',
        '# g\n',
        '- h\n',
        '{i}\n',
        '{',
      ],
      ...[
        '`',
        '\n| j | k |',
        ' \\| ',
        '> ',
        '| `x` | **y** |\n',
        '| ![z](w) | <b>v</b> |\n',
        '<div>',
        '[l]: /m\n',
        '\r\n',
        '[^1]:',
      ],
    ];
    for (const parts of [items, cells]) {
      const soup = fc.array(fc.constantFrom(...parts), { maxLength: 40 }).map((all) => all.join(''));
      const format = fc.constantFrom<Format>('markdown', 'mdx');
      fc.assert(fc.property(soup, editsOf(parts), format, expectIncrementalEqualsWhole), { numRuns: 400 });
    }
  });

  it('reads a row of a long table, or an item of a long list, by itself', () => {
    const rows = Array.from({ length: 400 }, (_, i) => `| key ${i} | opens ${i} |\n`).join('');
    const list = Array.from({ length: 400 }, (_, i) => `- item ${i}\n`).join('');
    const text = `| a | b |\n|---|---|\n${rows}\n${list}`;
    const before = startReading(markdown(text));
    const after = reread(
      before,
      markdown(text.replace('opens 200', 'opens no 200').replace('item 200', 'item no 200')),
    );
    const row = reread(before, markdown(text.replace('opens 200', 'opens no 200')));
    const old = new Set(before.prose.blocks.map(({ content }) => content));
    const fresh = (reading: typeof before): string[] =>
      reading.prose.blocks.filter(({ content }) => !old.has(content)).map(({ content }) => content.text);
    expect(fresh(row)).toEqual(['opens no 200']);
    expect(after.prose.blocks).toHaveLength(before.prose.blocks.length);
    expect('units' in row && (row.units as unknown[]).length).toBe(401);
  });

  it('keeps the content objects of the body when the title changes', () => {
    const before = startReading(markdown(PAGE));
    const after = reread(before, markdown(PAGE.replace('buoy gateway', 'new gateway')));
    const old = new Set(before.prose.blocks.map(({ content }) => content));
    const fresh = after.prose.blocks.filter(({ content }) => !old.has(content));
    expect(fresh.map(({ content }) => content.text)).toEqual(['Keys of the new gateway']);
  });

  it('keeps the content objects of the blocks that an edit leaves alone', () => {
    const before = startReading(markdown(PAGE));
    const at = PAGE.indexOf('wait for five');
    const after = reread(before, markdown(`${PAGE.slice(0, at)}always ${PAGE.slice(at)}`));
    const old = new Set(before.prose.blocks.map(({ content }) => content));
    const fresh = after.prose.blocks.filter(({ content }) => !old.has(content));
    expect(fresh.map(({ content }) => content.text)).toEqual([expect.stringContaining('always wait for five')]);
    expect(after.prose.blocks.length).toBe(before.prose.blocks.length);
  });
});
