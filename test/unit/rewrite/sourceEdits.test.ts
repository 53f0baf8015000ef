// From prose edits to source edits: markup beside a term stays, markup inside it is a reason to refuse.
import { describe, expect, it } from 'vitest';
import type { ProseBlock } from '../../../server/src/prose/prose.js';
import { isRefusal, replaceTerm } from '../../../server/src/rewrite/replaceTerm.js';
import { sourceEdits } from '../../../server/src/rewrite/sourceEdits.js';
import { applyEdits } from '../../../server/src/text/edits.js';

/** A block whose prose is the source without the stretches in `markup`, which the reader would have taken out. */
function read(source: string, markup: RegExp): ProseBlock {
  const pieces: number[] = [];
  let text = '';
  let at = 0;
  const add = (end: number): void => {
    if (end > at) pieces.push(text.length, at, end - at);
    text += source.slice(at, end);
  };
  for (const match of source.matchAll(markup)) {
    add(match.index);
    at = match.index + match[0].length;
  }
  add(source.length);
  const content = {
    kind: 'paragraph' as const,
    level: 0,
    text,
    zones: 0,
    marks: [],
    links: [],
    pieces: Uint32Array.from(pieces),
    sourceLength: source.length,
  };
  return { start: 0, content };
}

function replaced(source: string, markup: RegExp, from: string, to: string): string {
  const block = read(source, markup);
  const { text } = block.content;
  const start = text.search(new RegExp(from.replace(/ /g, '\\s+'), 'i'));
  const end = start + new RegExp(from.replace(/ /g, '\\s+'), 'i').exec(text)![0].length;
  const replacement = replaceTerm({ text, span: { start, end }, from, to, partOfSpeech: 'noun' });
  if (isRefusal(replacement)) return replacement.refused;
  const edits = sourceEdits(block, replacement.span, replacement.edits, source);
  return isRefusal(edits) ? edits.refused : applyEdits(source, edits);
}

describe('edits of the source', () => {
  it.each([
    ['Use **an API key** here.', /\*\*/g, 'Use **a service key** here.'],
    ['Use an **API key** here.', /\*\*/g, 'Use a **service key** here.'],
    ['Use an [API key](a.md) here.', /\[|\]\([^)]*\)/g, 'Use a [service key](a.md) here.'],
    ['Use an API\n  key here.', /(?<=\n) {2}/g, 'Use a service\n  key here.'],
    ['Use an API\r\n  key here.', /\r(?=\n)|(?<=\n) {2}/g, 'Use a service\r\n  key here.'],
    ['> an API\n> key here.', /^> /gm, '> a service\n> key here.'],
    ['Use an **API** key here.', /\*\*/g, 'Markup stands inside the term: change it by hand.'],
    ['Use an API **key** here.', /\*\*/g, 'Markup stands inside the term: change it by hand.'],
    ['Use an API <b>key</b> here.', /<\/?b>/g, 'Markup stands inside the term: change it by hand.'],
    ['Use a*n* API key here.', /\*/g, 'Markup stands inside the words that would change: change them by hand.'],
  ])('%j', (source, markup, expected) => expect(replaced(source, markup, 'API key', 'service key')).toBe(expected));

  it('keeps a wrapped line wrapped where the number of words changes', () => {
    expect(replaced('- the virtual\n  machine runs', /^- |(?<=\n) {2}/g, 'virtual machine', 'guest')).toBe(
      '- the guest runs',
    );
    expect(replaced('- the API\n  key runs', /^- |(?<=\n) {2}/g, 'API key', 'service access key')).toBe(
      '- the service\n  access key runs',
    );
  });
});
