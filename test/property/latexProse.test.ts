// LaTeX of any shape: nothing throws, every unit maps to its source, reading again equals reading whole.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPAQUE, sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { latexSoup } from '../fuzz/latex.js';

const source = (text: string): SourceText => ({ uri: 'file:///soup.tex', format: 'latex', text });

function expectSoundMap(text: string): void {
  let before = 0;
  const prose = read(source(text));
  expect(prose.problems.filter(({ message }) => message.includes('could not be read'))).toEqual([]);
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
      if (unit === OPAQUE || /^[\\`'"~-]/.test(slice)) continue;
      if (unit === ' ') expect(slice).toMatch(/^[\s{}[\]&%]/);
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

describe('the prose of any LaTeX', () => {
  it('maps unit by unit to its source', () => {
    fc.assert(fc.property(latexSoup, expectSoundMap), { numRuns: 2500 });
  });

  it('maps so for every beginning of a text', () => {
    fc.assert(
      fc.property(latexSoup, fc.double({ min: 0, max: 1, noNaN: true }), (text, part) =>
        expectSoundMap(text.slice(0, Math.floor(part * text.length))),
      ),
      { numRuns: 800 },
    );
  });

  it('is the same when read again after an edit', () => {
    fc.assert(
      fc.property(latexSoup, latexSoup, fc.nat(400), fc.nat(20), (text, insert, at, remove) => {
        const edited = text.slice(0, at) + insert + text.slice(at + remove);
        const before = startReading(source(text));
        const old = before.prose;
        const again = reread(before, source(edited));
        expect(JSON.stringify(again.prose)).toBe(JSON.stringify(read(source(edited))));
        expect(before.prose).toBe(old);
      }),
      { numRuns: 500 },
    );
  });
});
