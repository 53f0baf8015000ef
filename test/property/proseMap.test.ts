// The map between a block's text and its source holds for any mixture of markup, in every format.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPAQUE, SourceCursor, sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { markdownSoup } from '../fuzz/markdown.js';

function expectSoundMap(text: string, format: Format): void {
  let before = 0;
  for (const block of read({ uri: 'file:///soup', format, text }).blocks) {
    const { content, start } = block;
    expect(start).toBeGreaterThanOrEqual(before);
    expect(start + content.sourceLength).toBeLessThanOrEqual(text.length);
    before = start;
    let to = start;
    const cursor = new SourceCursor(block);
    for (let i = 0; i < content.text.length; i++) {
      const from = sourceStart(block, i);
      const unit = content.text[i]!;
      const slice = text.slice(from, sourceEnd(block, i + 1));
      // Units of one decoded reference share its place; all others follow one another.
      expect(from >= to || slice.startsWith('&')).toBe(true);
      to = sourceEnd(block, i + 1);
      expect([cursor.start(i), cursor.end(i + 1)]).toEqual([from, to]);
      expect(to).toBeLessThanOrEqual(start + content.sourceLength);
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
    expect([...content.links].every((link) => link.start < link.end && link.end <= content.text.length)).toBe(true);
  }
}

describe.each<Format>(['markdown', 'mdx', 'plaintext'])('the prose of any %s', (format) => {
  it('maps unit by unit to its source', () => {
    fc.assert(
      fc.property(markdownSoup, (text) => expectSoundMap(text, format)),
      { numRuns: 600 },
    );
  });
});
