// Notebooks: which cells are prose, and where their words stand in the JSON file.
import { describe, expect, it } from 'vitest';
import { reread, startReading } from '../../../server/src/prose/read.js';
import { notebookOf } from './notebookFile.js';
import { outline as outlineOf, prose as proseOf, sourceOf as source } from './reading.js';

const outline = (text: string): string[] => outlineOf(text, 'notebook');
const prose = (text: string): ReturnType<typeof proseOf> => proseOf(text, 'notebook');
const sourceOf = (text: string, words: string): string => source(text, words, 'notebook');

// Structure by the schemas of nbformat, "The Notebook file format" (versions 4.5 and 3).
describe('the cells of a notebook', () => {
  it('are prose where they are Markdown; code, its outputs and raw text are not', () => {
    const text = notebookOf([
      ['markdown', '# Keys\n\nA *key* opens\na "gate" of `code`.\n\n- one\n'],
      ['code', 'print("no prose")\n# none'],
      ['raw', 'none'],
      ['markdown', 'Last.'],
    ]);
    expect(outline(text)).toEqual([
      'heading1[heading]: Keys',
      'paragraph: A key opens a "gate" of @.',
      'listItem: one',
      'paragraph: Last.',
    ]);
    expect(prose(text).language).toBeUndefined();
  });

  it('may have one string as source, and the title of the notebook is read', () => {
    const text =
      '{"metadata": {"title": "All keys", "kernelspec": {"title": "no"}}, "cells": [{"source": "One\\ntwo", "cell_type": "markdown"}]}';
    expect(outline(text)).toEqual(['title[frontMatter]: All keys', 'paragraph: One two']);
  });

  it('lie in worksheets in nbformat 3, where headings are cells', () => {
    const text = JSON.stringify({
      nbformat: 3,
      worksheets: [
        {
          cells: [
            { cell_type: 'heading', level: 2, source: ['Gate keys'] },
            { cell_type: 'markdown', source: ['Body.'] },
            { cell_type: 'code', input: ['no'], outputs: [{ text: 'no' }] },
          ],
        },
      ],
    });
    expect(outline(text)).toEqual(['heading2[heading]: Gate keys', 'paragraph: Body.']);
  });

  it('may begin with front matter', () => {
    const matter = '---\ntitle: Keys\nlang: de\n---\n';
    const raw = notebookOf([
      ['raw', `${matter}none`],
      ['markdown', '---\ntitle: none\n---\n'],
    ]);
    expect(outline(raw)).toEqual(['title[frontMatter]: Keys', 'heading2[heading]: title: none']);
    expect(prose(raw).language).toBe('de');
    expect(outline(notebookOf([['markdown', `${matter}Body.`]]))).toEqual([
      'title[frontMatter]: Keys',
      'paragraph: Body.',
    ]);
  });

  it('keep their own link definitions', () => {
    const text = notebookOf([
      ['markdown', '[a]: /x\n\n[a]'],
      ['markdown', '[a] b'],
    ]);
    expect(outline(text)).toEqual(['paragraph: <linkText:a>', 'paragraph: [a] b']);
  });
});

describe('the map to the JSON file', () => {
  it('reaches through escapes, lines and markup', () => {
    const text = notebookOf([['markdown', 'A "quoted" word\nand a\ttab, **bo**ld &amp; 🙂 end.\n']]);
    expect(sourceOf(text, 'quoted')).toBe('quoted');
    expect(sourceOf(text, '"quoted"')).toBe('\\"quoted\\"');
    expect(sourceOf(text, 'word and')).toBe('word\\n",\n    "and');
    expect(sourceOf(text, 'bold')).toBe('bo**ld');
    expect(sourceOf(text, '🙂 end')).toBe('🙂 end');
    expect(sourceOf(text, '&')).toBe('&amp;');
  });

  it('reaches through escaped letters', () => {
    const text = '{"cells": [{"cell_type": "markdown", "source": ["caf\\u00e9s \\ud83d\\ude42 \\/ x\\r\\ny"]}]}';
    expect(outline(text)).toEqual(['paragraph: cafés 🙂 / x y']);
    expect(sourceOf(text, 'cafés')).toBe('caf\\u00e9s');
    expect(sourceOf(text, '🙂')).toBe('\\ud83d\\ude42');
    expect(sourceOf(text, 'y')).toBe('y');
  });

  it('is that of a file with a byte order mark and CRLF', () => {
    const text = `\uFEFF${notebookOf([['markdown', 'one\ntwo']]).replaceAll('\n', '\r\n')}`;
    expect(sourceOf(text, 'two')).toBe('two');
  });
});

describe('a broken notebook', () => {
  const problem = (text: string): string => {
    const { blocks, problems } = prose(text);
    expect(blocks).toEqual([]);
    expect(problems).toHaveLength(1);
    const { span, message } = problems[0]!;
    return `${text.slice(0, span.start).split('\n').length}: ${message}`;
  };

  it('is not read, and says where and why', () => {
    expect(problem('{\n "cells": [\n  {"source": "a" "b": 1}\n ]\n}')).toMatch(
      /^3: .* no valid JSON.*a comma is missing\.$/,
    );
    expect(problem('{"cells": [],\n}')).toMatch(/^2: /);
    expect(problem('{"cells": [\n"a')).toMatch(/^2: .*a string does not end/);
    expect(problem('// no\n{"cells": []}')).toMatch(/^1: .*no comments/);
    expect(problem('<<<<<<< HEAD\n{}')).toMatch(/^1: /);
    expect(problem('')).toMatch(/^1: .*a value is missing/);
    expect(problem('{}')).toMatch(/^1: .*no notebook/);
    expect(problem('['.repeat(50_000))).toMatch(/^1: /);
  });

  it('with odd parts is read as far as they are cells', () => {
    const cells = [
      1,
      null,
      {},
      { cell_type: 'markdown' },
      { cell_type: 'markdown', source: [1, ['a'], 'B.'] },
      { source: 'x' },
    ];
    expect(outline(JSON.stringify({ cells, metadata: null }))).toEqual(['paragraph: B.']);
  });
});

describe('reading a notebook again', () => {
  it('keeps the contents of cells that an edit leaves alone', () => {
    const cells = Array.from({ length: 9 }, (_, i): [string, string] => ['markdown', `Cell ${i}.\n\nIts text.\n`]);
    const file = (text: string): { uri: string; format: 'notebook'; text: string } => ({
      ...{ uri: 'file:///a.ipynb', format: 'notebook', text },
    });
    const before = startReading(file(notebookOf(cells)));
    cells[4] = ['markdown', 'Other *words*.\n'];
    cells.splice(7, 1);
    const after = reread(before, file(notebookOf(cells)));
    const old = new Set(before.prose.blocks.map(({ content }) => content));
    expect(after.prose.blocks.filter(({ content }) => !old.has(content)).map(({ content }) => content.text)).toEqual([
      'Other words.',
    ]);
  });
});
