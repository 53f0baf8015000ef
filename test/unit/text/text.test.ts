// Lines and edits of a text.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyEdits } from '../../../server/src/text/edits.js';
import { LineIndex } from '../../../server/src/text/lineIndex.js';

describe('LineIndex', () => {
  const text = 'one\r\ntwo🙂\rthree\n';
  const index = new LineIndex(text);

  it('ends lines at \\n, \\r\\n and \\r', () => {
    expect(index.lineCount).toBe(4);
    expect([0, 1, 2, 3].map((line) => index.lineText(line))).toEqual(['one', 'two🙂', 'three', '']);
  });

  it('counts UTF-16 code units', () => {
    expect(index.positionAt(text.indexOf('\rthree'))).toEqual({ line: 1, character: 5 });
  });

  it('clamps what lies outside', () => {
    expect(index.offsetAt({ line: 0, character: 99 })).toBe(3);
    expect(index.offsetAt({ line: -1, character: 5 })).toBe(0);
    expect(index.offsetAt({ line: 99, character: 0 })).toBe(text.length);
    expect(index.positionAt(999)).toEqual({ line: 3, character: 0 });
  });

  it('comes back from every offset that is not inside a line break', () => {
    const texts = fc
      .array(fc.constantFrom('a', '🙂', '\n', '\r\n', '漢', '\r'), { maxLength: 30 })
      .map((p) => p.join(''));
    fc.assert(
      fc.property(texts, fc.nat(60), (body, at) => {
        const lines = new LineIndex(body);
        const offset = Math.min(at, body.length);
        fc.pre(!(body[offset - 1] === '\r' && body[offset] === '\n'));
        expect(lines.offsetAt(lines.positionAt(offset))).toBe(offset);
      }),
    );
  });
});

describe('applyEdits', () => {
  it('applies edits that refer to one text, in any order', () => {
    const edits = [
      { span: { start: 4, end: 7 }, newText: 'B' },
      { span: { start: 0, end: 1 }, newText: 'AA' },
      { span: { start: 7, end: 7 }, newText: '!' },
    ];
    expect(applyEdits('one two three', edits)).toBe('AAne B! three');
  });

  it('refuses edits that overlap or lie outside', () => {
    const edit = (start: number, end: number): { span: { start: number; end: number }; newText: string } => ({
      span: { start, end },
      newText: '',
    });
    expect(() => applyEdits('abc', [edit(0, 2), edit(1, 3)])).toThrow(RangeError);
    expect(() => applyEdits('abc', [edit(2, 4)])).toThrow(RangeError);
  });
});
