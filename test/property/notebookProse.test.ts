// Notebooks read as their Markdown does, wherever JSON puts it; held against JSON.parse.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import { isRefusal } from '../../server/src/rewrite/replaceTerm.js';
import { sourceEdits } from '../../server/src/rewrite/sourceEdits.js';
import { applyEdits } from '../../server/src/text/edits.js';
import type { SourceText } from '../../server/src/text/sourceText.js';

const PARTS = [
  ...[
    'word',
    'two words',
    'naïve',
    '漢字',
    '🙂',
    '"a b c d"',
    '.',
    ', ',
    ' ',
    '  ',
    '\t',
    '\n',
    '\n\n',
    '\r\n',
    '  \n',
    '\\\n',
  ],
  ...[
    '*',
    '**',
    '`',
    '[',
    '](x)',
    '<b>',
    '<kbd>',
    '</kbd>',
    '&amp;',
    '&#65;',
    '\\*',
    '\\',
    '# ',
    '> ',
    '- ',
    '    ',
    '| ',
  ],
  ...[
    '|-|-|\n',
    '```\n',
    '---\n',
    '{{ a }}',
    '${c}',
    'https://e.f',
    '<div>',
    '\uFFFC',
    '\0',
    '\ud800',
    '\u2028',
    '/',
    '\b',
  ],
];
const cellTexts = fc.array(fc.constantFrom(...PARTS), { maxLength: 25 }).map((parts) => parts.join(''));
const notebooks = fc.array(fc.tuple(fc.constantFrom('markdown', 'markdown', 'code'), cellTexts), { maxLength: 5 });

/** A JSON string in which some characters are escaped that need not be. */
function jsonString(text: string, seed: number): string {
  let state = seed;
  const inner = Array.from({ length: text.length }, (_, i) => {
    const unit = text[i]!;
    state = (state * 1103515245 + 12345) % 2147483648;
    const escaped = `\\u${unit.charCodeAt(0).toString(16).padStart(4, '0')}`;
    if (unit === '/' && state % 3 === 0) return '\\/';
    if (state % 11 === 0 || unit < ' ' || (unit >= '\ud800' && unit <= '\udfff' && state % 2 === 0)) {
      return unit === '\n' && state % 5 !== 0 ? '\\n' : escaped;
    }
    return unit === '"' || unit === '\\' ? `\\${unit}` : unit;
  });
  return `"${inner.join('')}"`;
}

function fileOf(cells: readonly (readonly [string, string])[], seed: number): string {
  const shown = cells.map(([type, text], i) => {
    const lines = text.match(/[^\n]*\n|[^\n]+$/g) ?? [];
    const list = lines.map((line, j) => jsonString(line, seed + i + j)).join(',\n   ');
    const source = (seed + i) % 4 === 0 ? jsonString(text, seed + i) : `[\n   ${list}\n  ]`;
    return ` {\n  "cell_type": "${type}",\n  "source": ${source}\n }`;
  });
  return `{"cells": [\n${shown.join(',\n')}\n], "nbformat": 4}`;
}

function notebook(text: string): SourceText {
  return { uri: 'file:///page.ipynb', format: 'notebook', text };
}

/** What JSON.parse makes of a piece of the file that lies inside the strings of one source. */
function decoded(slice: string): string {
  const value: unknown = JSON.parse(`["${slice}"]`);
  return (value as string[]).join('');
}

describe('the prose of any notebook', () => {
  it('is that of its Markdown, and every unit maps to the JSON that makes it', () => {
    fc.assert(
      fc.property(notebooks, fc.nat({ max: 9999 }), (cells, seed) => {
        // Front matter is that of the first cell alone.
        fc.pre(!cells.some(([, cell]) => cell.startsWith('---')));
        const text = fileOf(cells, seed);
        const blocks = [...read(notebook(text)).blocks];
        let before = 0;
        cells.forEach(([type, cell]) => {
          if (type !== 'markdown') return;
          const plain = read({ uri: 'file:///cell.md', format: 'markdown', text: cell }).blocks;
          for (const expected of plain) {
            const block = blocks.shift()!;
            expect({ ...block.content, pieces: 0, sourceLength: 0 }).toEqual({
              ...expected.content,
              ...{ pieces: 0, sourceLength: 0 },
            });
            expect(block.start).toBeGreaterThanOrEqual(before);
            before = block.start;
            for (let i = 0; i < block.content.text.length; i++) {
              const slice = text.slice(sourceStart(block, i), sourceEnd(block, i + 1));
              expect(decoded(slice)).toBe(cell.slice(sourceStart(expected, i), sourceEnd(expected, i + 1)));
            }
          }
        });
        expect(blocks).toEqual([]);
      }),
      { numRuns: 300 },
    );
  });

  it('stays valid JSON when words of it are replaced', () => {
    fc.assert(
      fc.property(notebooks, fc.nat({ max: 9999 }), (cells, seed) => {
        const text = fileOf(cells, seed);
        for (const block of read(notebook(text)).blocks) {
          for (const { 0: words, index } of block.content.text.matchAll(/\p{L}+(?: \p{L}+)?/gu)) {
            const span = { start: index, end: index + words.length };
            const edits = sourceEdits(block, span, [{ span, newText: 'other one' }], text);
            if (isRefusal(edits)) continue;
            const replaced: unknown = JSON.parse(applyEdits(text, edits));
            const sources = (replaced as { cells: { source: string | string[] }[] }).cells.map(({ source }) => source);
            expect(sources.some((source) => [source].flat().join('').includes('other one'))).toBe(true);
          }
        }
      }),
      { numRuns: 60 },
    );
  });

  it('is the same read again after edits, of the JSON itself too', () => {
    const edits = fc.array(
      fc.tuple(
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.nat({ max: 30 }),
        fc.constantFrom(
          '',
          'word',
          '"',
          ',',
          '\\n',
          '"a",',
          ']',
          '{}',
          '"source": ["b"],',
          '\n',
          '# ',
          '\\u0041',
          '[',
          ': ',
        ),
      ),
      { maxLength: 6 },
    );
    fc.assert(
      fc.property(notebooks, fc.nat({ max: 9999 }), edits, (cells, seed, script) => {
        let text = fileOf(cells, seed);
        let reading = startReading(notebook(text));
        for (const [at, remove, insert] of script) {
          const offset = Math.floor(at * text.length);
          text = text.slice(0, offset) + insert + text.slice(offset + remove);
          reading = reread(reading, notebook(text));
          expect(reading.prose).toEqual(read(notebook(text)));
        }
      }),
      { numRuns: 300 },
    );
  });
});
