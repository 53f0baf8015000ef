// Comments `evenword: keep` in every format that has comments: which lines they speak for.
import { describe, expect, it } from 'vitest';
import { readKept } from '../../../server/src/findings/suppression.js';
import type { Format } from '../../../server/src/text/sourceText.js';

/** The lines (from 1) on which a finding of “buoy” is kept. */
function keptLines(format: Format, lines: readonly string[], term = 'buoy'): number[] {
  const text = lines.join('\n');
  const kept = readKept({ uri: 'a', format, text });
  expect(kept.problems).toEqual([]);
  let start = 0;
  return lines.flatMap((line, index) => {
    const span = { start, end: start + line.length };
    start += line.length + 1;
    return kept.isKept(span, { term, surface: term }) ? [index + 1] : [];
  });
}

describe('a comment that keeps', () => {
  it('speaks for the next paragraph in formats of lines', () => {
    expect(keptLines('markdown', ['a', '<!-- evenword: keep -->', '', 'b', 'c', '', 'd'])).toEqual([2, 3, 4, 5]);
    expect(keptLines('mdx', ['{/* evenword: keep */}', 'b', '', 'c'])).toEqual([1, 2]);
    expect(keptLines('restructuredtext', ['a', '', '.. evenword: keep', '', 'b', 'c', '', 'd'])).toEqual([3, 4, 5, 6]);
    expect(keptLines('asciidoc', ['a', '', '// evenword: keep', 'b', 'c', '', 'd'])).toEqual([3, 4, 5]);
    expect(keptLines('latex', ['a', '', '% evenword: keep', 'b', '', 'c'])).toEqual([3, 4]);
  });

  it('speaks for its own line beside text', () => {
    expect(keptLines('latex', ['b % evenword: keep', 'c'])).toEqual([1]);
    expect(keptLines('html', ['<p>b <!-- evenword: keep --></p>', '<p>c</p>'])).toEqual([1]);
    expect(keptLines('apiDescription', ['summary: b # evenword: keep', 'title: c'])).toEqual([1]);
  });

  it('speaks for the next element in HTML and XML', () => {
    expect(
      keptLines('html', ['<!-- evenword: keep -->', '<div class="a">', '<div>b</div>', '</div>', '<p>c</p>']),
    ).toEqual([1, 2, 3, 4]);
    expect(keptLines('xml', ['<!-- evenword: keep -->', '<image alt="b"/>', '<p>c</p>'])).toEqual([1, 2]);
    // Without an element behind it, to the next blank line.
    expect(keptLines('html', ['<p>', '<!-- evenword: keep -->', 'b', '</p>', '', '<p>c</p>'])).toEqual([2, 3, 4]);
  });

  it('speaks for the next node in YAML', () => {
    expect(
      keptLines('apiDescription', [
        'info:',
        '  # evenword: keep',
        '  description: |',
        '    b',
        '',
        '    c',
        '  title: d',
      ]),
    ).toEqual([2, 3, 4, 5, 6]);
  });

  it('speaks for the rest of the paragraph in a notebook’s cell', () => {
    expect(
      keptLines('notebook', [
        '   "source": [',
        '    "<!-- evenword: keep \\"buoy\\" -->\\n",',
        '    "\\n",',
        '    "b\\n",',
        '    "\\n",',
        '    "c"',
        '   ]',
      ]),
    ).toEqual([2, 3, 4]);
  });

  it('keeps the named terms only', () => {
    const lines = ['// evenword: keep "buoy", "data centre"', 'b'];
    expect(keptLines('asciidoc', lines, 'Data centre')).toEqual([1, 2]);
    expect(keptLines('asciidoc', lines, 'float')).toEqual([]);
  });

  it('is told to be wrong where a slip follows many names, without trying every way to part them', () => {
    const text = `<!-- evenword: keep ${'"buoy" '.repeat(60)}slip -->\n`;
    const { problems } = readKept({ uri: 'a', format: 'markdown', text });
    expect(problems.map(({ span }) => [span.start, span.end])).toEqual([[0, text.length - 1]]);
  });

  it('is no directive, no escaped sign and nothing in plain text', () => {
    expect(keptLines('restructuredtext', ['.. evenword:: keep', 'b'])).toEqual([]);
    expect(keptLines('latex', ['5\\% evenword: keep', 'b'])).toEqual([]);
    expect(keptLines('plaintext', ['<!-- evenword: keep -->', 'b'])).toEqual([]);
  });
});
