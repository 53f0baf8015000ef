// Plain text: paragraphs, lists, underlined headings, and what is left out as code.
import { describe, expect, it } from 'vitest';
import { reread, startReading } from '../../../server/src/prose/read.js';
import type { SourceText } from '../../../server/src/text/sourceText.js';
import { outline, sourceOf } from './reading.js';

describe('plain text', () => {
  it('has paragraphs, list items and underlined headings', () => {
    const text = 'The keys\n========\n\nOne line\nand another.\n\n- first\n  item\n- second\n\n1. third\n';
    expect(outline(text, 'plaintext')).toEqual([
      'heading1[heading]: The keys',
      'paragraph: One line and another.',
      'listItem: first item',
      'listItem: second',
      'listItem: third',
    ]);
  });

  it('leaves out indented paragraphs, commands, assignments and statements', () => {
    const text = 'Run this:\n\n    buoy keys new\n\n$ buoy list\nkey = value\nreturn key;\nThen wait.\n';
    expect(outline(text, 'plaintext')).toEqual(['paragraph: Run this:', 'paragraph: Then wait.']);
  });

  it('makes code, URLs and addresses opaque and marks quotations', () => {
    expect(outline('Use ``a b``, `c`, https://d.e/f. or g@h.ij. "one two three four"', 'plaintext')).toEqual([
      'paragraph: Use @, @, @. or @. <quotation:"one two three four">',
    ]);
  });

  it('maps to the source', () => {
    expect(sourceOf('  one\r\n  two 🙂 three', 'one two 🙂 three', 'plaintext')).toBe('one\r\n  two 🙂 three');
  });

  it('keeps the contents of untouched blocks when read again', () => {
    const text = (body: string): SourceText => ({ uri: 'file:///a.txt', format: 'plaintext', text: body });
    const before = startReading(text('One.\n\nTwo.\n\nThree.\n'));
    const after = reread(before, text('One.\n\nTwo and more.\n\nThree.\n'));
    expect(after.prose).toEqual(startReading(after.source).prose);
    expect(after.prose.blocks[0]!.content).toBe(before.prose.blocks[0]!.content);
    expect(after.prose.blocks[2]!.content).toBe(before.prose.blocks[2]!.content);
  });
});
