// HTML, XML and LaTeX of any shape: every unit stands for itself, but for those that a sequence of the format writes.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPAQUE, sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { sourceOf } from '../fuzz/sound.js';
import { TEXTS } from '../fuzz/texts.js';

/** What begins a sequence that stands for other units, and what a single blank may stand for. */
interface Sequences {
  readonly decoded: RegExp;
  readonly blank: RegExp;
}

const MARKUP: Sequences = { decoded: /^&/, blank: /^[\s<&]/ };
const SEQUENCES: Partial<Record<Format, Sequences>> = {
  html: MARKUP,
  xml: MARKUP,
  latex: { decoded: /^[\\`'"~-]/, blank: /^[\s{}[\]&%]/ },
};

function expectUnits(text: string, format: Format): void {
  const { decoded, blank } = SEQUENCES[format]!;
  for (const block of read(sourceOf(text, format)).blocks) {
    const { content, start } = block;
    for (let i = 0; i < content.text.length; i++) {
      const from = sourceStart(block, i);
      const to = sourceEnd(block, i + 1);
      const unit = content.text[i]!;
      const slice = text.slice(from, to);
      expect(to).toBeGreaterThan(from);
      expect(to).toBeLessThanOrEqual(start + content.sourceLength);
      if (unit === OPAQUE || decoded.test(slice)) continue;
      if (unit === ' ') expect(slice).toMatch(blank);
      else if (unit === '\uFFFD') expect(['\0', '\uFFFC', '\uFFFD']).toContain(slice);
      else expect(slice).toBe(unit);
    }
    expect(content.text).not.toMatch(/^ | {2}/);
  }
}

// That maps are in order, also of texts cut off and read again, is checked for all formats in everyFormat.test.ts.
describe.each(Object.keys(SEQUENCES) as Format[])('the prose of any %s', (format) => {
  it('maps unit by unit to its source', () => {
    fc.assert(
      fc.property(TEXTS[format], (text) => expectUnits(text, format)),
      { numRuns: 2500 },
    );
  });

  it('maps so for every beginning of a text', () => {
    fc.assert(
      fc.property(TEXTS[format], fc.double({ min: 0, max: 1, noNaN: true }), (text, part) =>
        expectUnits(text.slice(0, Math.floor(part * text.length)), format),
      ),
      { numRuns: 500 },
    );
  });
});
