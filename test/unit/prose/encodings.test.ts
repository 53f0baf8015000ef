// Odd units inside the text of reStructuredText and AsciiDoc: blocks are found, and every word stands where it is said to.
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../../server/src/prose/prose.js';
import type { Format } from '../../../server/src/text/sourceText.js';
import { prose } from './reading.js';

/** Each word stands once in its page, in a heading, a paragraph of two lines, an item, a definition, a warning and a cell. */
const PAGES: Partial<Record<Format, string>> = {
  restructuredtext:
    'Alpha beta\n==========\n\nGamma *delta* ``code``\nepsilon.\n\n- zeta\n\n  eta\n\ntheta\n  Iota.\n\n' +
    '.. warning::\n\n   Kappa.\n\n=====  =====\nlamda  mu\n=====  =====\nnu     xi\n=====  =====\n\nOmicron `pi <a>`_.\n',
  asciidoc:
    '== Alpha beta\n\nGamma *delta* `code`\nepsilon.\n\n* zeta\n+\neta\n\ntheta:: Iota.\n\n' +
    'WARNING: Kappa.\n\n|===\n|lamda |mu\n\n|nu |xi\n|===\n\nOmicron link:a[pi].\n',
};
const WORDS = 'Alpha beta Gamma delta epsilon zeta eta theta Iota Kappa lamda mu nu xi Omicron pi'.split(' ');
const KINDS =
  'heading paragraph listItem listItem definedTerm definition paragraph tableCell tableCell tableCell tableCell paragraph';

/** The words of a page with the offsets that they are said to have; each must be there in the source. */
function wordsOf(text: string, format: Format): string[] {
  return prose(text, format).blocks.flatMap((block) =>
    [...block.content.text.matchAll(/[\p{L}\p{M}\p{N}\u00ad\u200b-\u200f\u2066-\u2069]+/gu)].map(
      ({ 0: word, index }) => {
        const written = text.slice(sourceStart(block, index), sourceEnd(block, index + word.length));
        expect(written).toBe(word);
        return word;
      },
    ),
  );
}

function kindsOf(text: string, format: Format): string {
  return prose(text, format)
    .blocks.map(({ content }) => content.kind)
    .join(' ');
}

describe.each<Format>(['restructuredtext', 'asciidoc'])('%s', (format) => {
  const page = PAGES[format]!;

  it.each([
    ['line feeds', '\n'],
    ['carriage returns with line feeds', '\r\n'],
    ['carriage returns alone', '\r'],
  ])('is read with %s', (_, lineBreak) => {
    const text = page.replaceAll('\n', lineBreak);
    expect(wordsOf(text, format)).toEqual(WORDS);
    expect(kindsOf(text, format)).toBe(KINDS);
    expect(
      prose(text, format)
        .blocks.map(({ content }) => content.text)
        .join('\n'),
    ).not.toMatch(/[\r\u00a0]/);
  });

  it('is read with mixed line breaks and a byte order mark', () => {
    let line = 0;
    const text = `\uFEFF${page.replace(/\n/g, () => ['\n', '\r\n', '\r'][line++ % 3]!)}`;
    expect(wordsOf(text, format)).toEqual(WORDS);
    expect(kindsOf(text, format)).toBe(KINDS);
  });

  it.each([
    ['letters beyond the basic plane', '𝐱𝐲'],
    ['ideographs beyond the basic plane', '𠮷'],
    ['combining marks', 'e\u0301\u0323'],
    ['soft hyphens', 'x\u00ady'],
    ['marks of writing direction', '\u200fx\u200e'],
    ['isolates of writing direction', '\u2067x\u2069'],
    ['joiners', 'x\u200dy\u200c'],
    ['decomposed syllables', '\u1112\u1161\u11ab'],
  ])('is exact behind and inside words with %s', (_, odd) => {
    // The title's adornment and the table's columns grow with what is put in, so that both stay what they are.
    const text = page
      .replace(/^(==+)$/m, (adornment) => adornment + '='.repeat(8 * odd.length))
      .replace(/\b(?:Alpha|Gamma|delta|epsilon|zeta|eta|theta|Iota|Kappa|Omicron|pi)\b/g, (word) => word + odd);
    const words = WORDS.map((word) => (/^(?:beta|lamda|mu|nu|xi)$/.test(word) ? word : word + odd));
    expect(wordsOf(text, format)).toEqual(words);
    expect(kindsOf(text, format)).toBe(KINDS);
  });

  it('takes form feeds and vertical tabs for blanks', () => {
    const text = page.replace('Gamma ', 'Gamma\f').replace('\n\nOmicron', '\n\f\v\nOmicron');
    expect(wordsOf(text, format)).toEqual(WORDS);
    expect(kindsOf(text, format)).toBe(KINDS);
  });

  it('parts lines at line breaks alone, not at other separators', () => {
    for (const separator of ['\u2028', '\u2029', '\u0085']) {
      const text = page.replace('Gamma ', `Gamma${separator}`);
      expect(wordsOf(text, format)).toEqual(WORDS);
      expect(kindsOf(text, format)).toBe(KINDS);
    }
  });
});
