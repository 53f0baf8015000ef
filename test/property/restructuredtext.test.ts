// reStructuredText of any mixture of markup: reading never throws, every unit maps to its source, reading again gives the same.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPAQUE, sourceEnd, sourceStart, type Prose } from '../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../server/src/prose/read.js';

const PARTS = [
  ['word', 'two words', 'naïve', '漢字', '🙂', '\u0301', '"a b c d"', '“e f g h”', '.', ', ', ' ', '  ', '\t', '\f'],
  [
    '\n',
    '\n\n',
    '\n   ',
    '\n\n   ',
    '\n      ',
    '\r\n',
    '\r',
    '\\\n',
    '\\',
    '\\ ',
    '*',
    '**',
    '`',
    '``',
    '|',
    '_',
    '__',
  ],
  [
    '`_',
    '`__',
    ' <x>`_',
    '[1]_',
    '[#a]_',
    ':ref:`',
    ':guilabel:`&',
    ':file:`',
    '`:strong:',
    'http://a.b',
    'c@d.e',
    '_`',
  ],
  ['- ', '* ', '1. ', '#. ', '(a) ', 'i) ', ':field: ', '-a  ', '--bc=d  ', '>>> ', '| ', '::', '::\n\n   ', '-- '],
  [
    '\n=====\n',
    '\n-----\n',
    '=====\n',
    '~~~~\n',
    '+---+---+\n',
    '|   |   |\n',
    '| a | b |\n',
    '+===+===+\n',
    '| 漢| c |\n',
  ],
  [
    '===  ===\n',
    '---  ---\n',
    'a    b\n',
    '     c\n',
    '.. ',
    '.. note:: ',
    '.. warning::\n\n   ',
    '.. code-block:: x\n\n   ',
  ],
  [
    '.. figure:: a\n   :alt: b\n\n   ',
    '.. glossary::\n\n   ',
    '.. list-table:: t\n\n   * - ',
    '.. csv-table::\n\n   "a", ',
  ],
  [
    '.. versionadded:: 1 ',
    '.. tab:: x\n\n   ',
    '.. [1] ',
    '.. _t: u\n',
    '.. |s| replace:: x\n',
    '..\n',
    '\uFEFF',
    '\uFFFC',
    '\0',
  ],
  ['\ud800', 'term\n  ', 'term : x\n  ', '.. meta::\n   :description: d\n', '.. unknown::\n\n   Four words are here'],
].flat();

const soups = fc.array(fc.constantFrom(...PARTS), { maxLength: 40 }).map((parts) => parts.join(''));

function readRst(text: string): Prose {
  return read({ uri: 'file:///soup', format: 'restructuredtext', text });
}

function expectSound(text: string): void {
  const { blocks, problems } = readRst(text);
  expect(problems.filter(({ message }) => message.includes('could not be read'))).toEqual([]);
  let before = 0;
  for (const block of blocks) {
    const { content, start } = block;
    expect(start).toBeGreaterThanOrEqual(before);
    expect(start + content.sourceLength).toBeLessThanOrEqual(text.length);
    before = start;
    for (let i = 3; i < content.pieces.length; i += 3) {
      expect(content.pieces[i]!).toBeGreaterThan(content.pieces[i - 3]!);
      expect(content.pieces[i + 1]!).toBeGreaterThanOrEqual(content.pieces[i - 2]! + content.pieces[i - 1]!);
    }
    for (let i = 0; i < content.text.length; i++) {
      const slice = text.slice(sourceStart(block, i), sourceEnd(block, i + 1));
      const unit = content.text[i]!;
      expect(sourceEnd(block, i + 1)).toBeLessThanOrEqual(start + content.sourceLength);
      if (unit === OPAQUE || slice.length !== 1) expect(slice.length).toBeGreaterThan(0);
      else if (unit === ' ') expect(slice).toMatch(/\s/);
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
  }
}

describe('any reStructuredText', () => {
  it('is read with every unit mapped to its source', () => {
    fc.assert(fc.property(soups, expectSound), { numRuns: Number(process.env.FUZZ_RUNS ?? 1500) });
  });

  it('is read again after an edit as if for the first time', () => {
    const edits = fc.array(fc.tuple(fc.nat(), fc.nat(12), fc.constantFrom(...PARTS)), { minLength: 1, maxLength: 4 });
    fc.assert(
      fc.property(soups, edits, (text, changes) => {
        let now = text;
        let reading = startReading({ uri: 'file:///soup', format: 'restructuredtext', text: now });
        for (const [place, removed, added] of changes) {
          const at = place % (now.length + 1);
          now = now.slice(0, at) + added + now.slice(at + removed);
          reading = reread(reading, { uri: 'file:///soup', format: 'restructuredtext', text: now });
          expect(reading.prose).toEqual(readRst(now));
        }
      }),
      { numRuns: 300 },
    );
  });

  it('keeps the contents of blocks that an edit leaves alone', () => {
    const source = (text: string) => ({ uri: 'file:///page', format: 'restructuredtext' as const, text });
    const first = startReading(source('Title\n=====\n\nOne.\n\nTwo.\n\n- three\n'));
    const next = reread(first, source('Title\n=====\n\nOne.\n\nTwo and more.\n\n- three\n'));
    const kept = next.prose.blocks.map(({ content }, i) => content === first.prose.blocks[i]!.content);
    expect(kept).toEqual([true, true, false, true]);
  });

  const folder = path.resolve(import.meta.dirname, '../../../shared/data/docs/ansible/docs/docsite/rst/user_guide');
  it.skipIf(!existsSync(folder))('is read where a real page is cut off anywhere (needs ../shared)', () => {
    const pages = readdirSync(folder)
      .filter((name) => name.endsWith('.rst'))
      .slice(0, 20)
      .map((name) => readFileSync(path.join(folder, name), 'utf8').slice(0, 20_000));
    fc.assert(
      fc.property(fc.constantFrom(...pages), fc.nat(20_000), (page, cut) => {
        const { blocks, problems } = readRst(page.slice(0, cut));
        expect(problems.filter(({ message }) => message.includes('could not be read'))).toEqual([]);
        expect(blocks.every(({ start, content }) => start + content.sourceLength <= cut)).toBe(true);
      }),
      { numRuns: 60 },
    );
  });
});
