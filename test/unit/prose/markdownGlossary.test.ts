// Glossaries in Markdown: entries by definition lists, bold terms, tables and headings, and what is no glossary.
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../../server/src/prose/prose.js';
import { reread, startReading } from '../../../server/src/prose/read.js';
import type { Format } from '../../../server/src/text/sourceText.js';
import { notebookOf } from './notebookFile.js';
import { prose } from './reading.js';

/** The blocks as `part: text`, with `-` for those that are no part of an entry; each must map to itself. */
function parts(text: string, format: Format = 'markdown'): string[] {
  return prose(text, format).blocks.map((block) => {
    const { content } = block;
    for (let i = 0; i < content.text.length; i++) {
      if (/\w/.test(content.text[i]!))
        expect(text.slice(sourceStart(block, i), sourceEnd(block, i + 1))).toBe(content.text[i]);
    }
    return `${content.glossary ?? '-'}: ${content.text}`;
  });
}

describe('an entry of a glossary', () => {
  it('is one of a definition list, under all its terms', () => {
    expect(
      parts(
        '## Glossary\n\nAccess key\nKey\n: What opens.\n: More.\n\n    And more.\n\nAPI key\n: See *access key*.\n\n## Next\n\nGate\n: A door.\n',
      ),
    ).toEqual([
      '-: Glossary',
      'headword: Access key',
      'headword: Key',
      'definition: What opens.',
      'definition: More.',
      'definition: And more.',
      'headword: API key',
      'see: See access key.',
      '-: Next',
      '-: Gate',
      '-: A door.',
    ]);
  });

  it('is a paragraph or list item that opens with its term in bold', () => {
    const text =
      '---\ntitle: Terms and definitions\n---\nThe words of the fleet.\n\n- **access key**: What *opens* a [gate](g.md).\n- **mast (tall)** – A pole.\n- **No definition**\n\n__Vault:__ See access key.\n\n<a id="x"></a>**gate** - A door.\n\n**Mind** the step.\n\n**Note**: No term.\n';
    expect(parts(text)).toEqual([
      '-: Terms and definitions',
      '-: The words of the fleet.',
      'headword: access key',
      'definition: What opens a gate.',
      'headword: mast (tall)',
      'definition: A pole.',
      '-: No definition',
      'headword: Vault',
      'see: See access key.',
      'headword: gate',
      'definition: A door.',
      '-: Mind the step.',
      '-: Note: No term.',
    ]);
    const [, , term, said] = prose(text).blocks.map(({ content }) => content);
    expect([term!.kind, said!.kind]).toEqual(['definedTerm', 'definition']);
    expect(said!.links).toEqual([{ start: 13, end: 17, target: 'g.md' }]);
    expect(said!.marks.map(({ start, end }) => said!.text.slice(start, end))).toEqual(['gate']);
  });

  it('is a row of a table whose first column holds terms', () => {
    const text =
      '# Terminology\n\n| Term | Meaning | Also called |\n|---|---|---|\n| gate | A door \\| hatch. | door |\n| key | | |\n| | of nothing | |\n| mast | See *pole*. | |\n\n| Field | Meaning |\n|---|---|\n| owner | Who |\n';
    expect(parts(text).slice(4)).toEqual([
      'headword: gate',
      'definition: A door | hatch.',
      'alsoCalled: door',
      '-: key',
      '-: of nothing',
      'headword: mast',
      'definition: See pole.',
      ...['-: Field', '-: Meaning', '-: owner', '-: Who'],
    ]);
  });

  it('is a heading with its first paragraph, where nothing else makes entries', () => {
    const text =
      '# Network glossary\n\nIntro.\n\n## A\n\n### Access key\n\nWhat opens.\n\nMore.\n\n### Code\n\n```\nx\n```\n\n## B\n\n### Buoy\n\nSee mast.\n';
    expect(parts(text)).toEqual([
      ...['-: Network glossary', '-: Intro.', '-: A', 'headword: Access key', 'definition: What opens.', '-: More.'],
      ...['-: Code', '-: B', 'headword: Buoy', 'see: See mast.'],
    ]);
    expect(parts(`${text}\n- **mast**: A pole.\n- **pole**: A mast.\n`)[3]).toBe('-: Access key');
    expect(parts(text.replace('Network glossary', 'Definitions'))[3]).toBe('-: Access key');
  });

  it('is none outside a glossary', () => {
    expect(
      parts('# Keys\n\n- **gate**: A door.\n- **key**: Opens it.\n\nTerm\n: Said.\n').every((part) =>
        part.startsWith('-'),
      ),
    ).toBe(true);
  });
});

describe('a glossary', () => {
  it('may lie in MDX and over the cells of a notebook', () => {
    expect(parts('## Glossary\n\n<List>\n\n- **gate**: A door.\n- **key**: Opens it.\n\n</List>\n', 'mdx')).toEqual([
      ...['-: Glossary', 'headword: gate', 'definition: A door.', 'headword: key', 'definition: Opens it.'],
    ]);
    const cells = [
      ['markdown', '# Glossary'],
      ['markdown', '**gate**: A door.\n\n**key**: Opens\nit.\n'],
      ['markdown', '| Term | Meaning |\n|--|--|\n| mast | A pole. |\n'],
      ['markdown', '# End\n\n**no**: No.\n'],
    ] as const;
    expect(
      prose(notebookOf(cells), 'notebook').blocks.map(
        ({ content: { glossary, text } }) => `${glossary ?? '-'}: ${text}`,
      ),
    ).toEqual([
      ...['-: Glossary', 'headword: gate', 'definition: A door.', 'headword: key', 'definition: Opens it.'],
      ...['-: Term', '-: Meaning', 'headword: mast', 'definition: A pole.', '-: End', '-: no: No.'],
    ]);
  });

  it('keeps the contents that an edit leaves alone, and gives up its parts with its title', () => {
    const text = '# Glossary\n\n- **gate**: A door.\n- **key**: Opens it.\n\n## End\n\nTerm\n: Said.\n';
    const file = (now: string): { uri: string; format: 'markdown'; text: string } => ({
      ...{ uri: 'file:///a.md', format: 'markdown', text: now },
    });
    const before = startReading(file(text));
    const after = reread(before, file(text.replace('Opens it', 'Opens')));
    const old = new Set(before.prose.blocks.map(({ content }) => content));
    expect(after.prose.blocks.filter(({ content }) => !old.has(content)).map(({ content }) => content.text)).toEqual([
      'Opens.',
    ]);
    const renamed = reread(after, file(text.replace('Glossary', 'Keys')));
    expect(renamed.prose.blocks.every(({ content }) => content.glossary === undefined)).toBe(true);
  });
});
