// Texts of any shape in every format: offsets are exact, reading again equals reading whole. `npm run fuzz` tries many more.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { read } from '../../server/src/prose/read.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { pagesOf } from '../fuzz/pages.js';
import { sourceOf, unlikeWhole, unsound, type Edit } from '../fuzz/sound.js';
import { ALL_FORMATS, TEXTS } from '../fuzz/texts.js';
import { ASCIIDOC_PAGE } from '../unit/prose/asciidocPage.js';

function expectSound(text: string, format: Format): void {
  expect(unsound(text, read(sourceOf(text, format)))).toBeUndefined();
}

describe.each(ALL_FORMATS)('any text in %s', (format) => {
  const soup = TEXTS[format];

  it('is read with every unit mapped to its source', () => {
    fc.assert(
      fc.property(soup, (text) => {
        expectSound(text, format);
      }),
      { numRuns: 1000 },
    );
  });

  it('is read so where it is cut off', () => {
    fc.assert(
      fc.property(soup, fc.double({ min: 0, max: 1, noNaN: true }), (whole, part) => {
        const text = whole.slice(0, Math.floor(part * whole.length));
        expectSound(text, format);
      }),
      { numRuns: 300 },
    );
  });

  it('is read again after edits as if for the first time', () => {
    const edit = fc.record<Edit>({
      at: fc.double({ min: 0, max: 1, noNaN: true }),
      remove: fc.oneof(fc.constant(0), fc.nat(5), fc.nat(60)),
      insert: soup.map((text) => text.slice(0, 40)),
    });
    fc.assert(
      fc.property(soup, fc.array(edit, { minLength: 1, maxLength: 4 }), (text, edits) => {
        expect(unlikeWhole(text, edits, format)).toBeUndefined();
      }),
      { numRuns: 150 },
    );
  });

  const pages = pagesOf(format);
  it.skipIf(pages.length === 0)('is read where a real page is cut off anywhere (needs ../shared)', () => {
    const cut = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...pages.slice(0, 40)), cut, ({ text }, part) => {
        expectSound(text.slice(0, Math.floor(part * text.length)), format);
      }),
      { numRuns: 40 },
    );
  });
});

describe('a page with every construct', () => {
  it('is read wherever it is cut off', () => {
    for (const page of [ASCIIDOC_PAGE, ASCIIDOC_PAGE.replaceAll('\n', '\r\n')]) {
      for (let end = 0; end <= page.length; end += 11) expectSound(page.slice(0, end), 'asciidoc');
    }
  });
});

describe('half of a pair of surrogates at the text’s end', () => {
  it.each(ALL_FORMATS)('is read in %s, behind whatever may take a letter', (format) => {
    for (const before of ['', 'a', '\\^', "\\'", '\\', '*', '`', '&', ':', '[', '<', '{']) {
      for (const half of ['\ud800', '\udc00']) expectSound(before + half, format);
    }
  });
});
