// The examples of the CommonMark specification 0.31.2 (npm commonmark-spec): which words are prose, and where they stand.
import { characterEntities } from 'character-entities';
import { tests } from 'commonmark-spec';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';

const WORD = /[\p{L}\p{N}]+/gu;

/** Examples whose words we read otherwise, on purpose or by a known limit of the parser. */
const EXCEPTIONS: Record<number, string> = {
  569: 'which of two adjacent references is a link depends on the definitions, which the parser does not know',
  571: 'likewise',
  528: 'an inner pair of brackets without a target wins over an outer reference',
  602: 'a bare URL is a link by the GFM extension, and opaque',
  608: 'likewise',
  611: 'likewise',
  612: 'likewise, and so is a bare e-mail address',
};

/** The words of expected HTML: text and alternative texts, without code, comments, and links shown by their own address. */
function wordsOfHtml(html: string): string[] {
  const text = html
    .replace(/<!---?>|<!--[^]*?-->|<\?[^]*?\?>|<!\[CDATA\[[^]*?\]\]>|<![A-Z][^]*?>/g, ' ')
    .replace(/<(code|pre|script|style|textarea)\b[^]*?<\/\1>/gi, ' ')
    .replace(/<a href="[^"]*">(?:[A-Za-z][A-Za-z0-9.+-]*:|[^\s<]+@)[^\s<]*<\/a>/g, ' ')
    .replace(/<(\/?[A-Za-z][\w-]*)((?:"[^"]*"|'[^']*'|[^"'>])*)>/g, (_tag, name: string, attributes: string) => {
      if (name === 'img') return ` ${/\balt="([^"]*)"/.exec(attributes)?.[1] ?? ''} `;
      return /^\/?(?:em|strong|a)$/.test(name) ? '' : ' ';
    })
    .replace(/&(#x?[\da-f]+|\w+);/gi, (_reference, name: string) => characterEntities[name] ?? '');
  return text.match(WORD) ?? [];
}

/** Checks that a word's place in the source holds that word, perhaps with markup, a reference or an escape inside it. */
function expectInPlace(word: string, slice: string): void {
  if (slice === word) return;
  expect(slice, `at the place of “${word}”`).toMatch(/[*_&\\[\]]/);
  const letters = slice
    .replace(/[*_]|\]\[\w+\]\[/g, '')
    .replace(/&(?:#(?:[xX]([\da-f]+)|(\d+))|(\w+));/gi, (whole, hex?: string, decimal?: string, name?: string) => {
      if (name !== undefined) return characterEntities[name] ?? whole;
      return String.fromCodePoint(hex !== undefined ? parseInt(hex, 16) : parseInt(decimal!, 10));
    });
  expect(letters).toContain(word);
}

describe('CommonMark examples', () => {
  it('are the whole specification', () => expect(tests.length).toBe(652));

  for (const { number, section, markdown, html } of tests) {
    // Raw HTML blocks are not read yet, so their words are expected in no block.
    if (section === 'HTML blocks') continue;
    const reason = EXCEPTIONS[number];
    const text = markdown.replaceAll('→', '\t');
    it(`${number}: ${section}${reason === undefined ? '' : ` (places only: ${reason})`}`, () => {
      const words: string[] = [];
      for (const block of read({ uri: 'file:///example.md', format: 'markdown', text }).blocks) {
        for (const { 0: word, index } of block.content.text.matchAll(WORD)) {
          words.push(word);
          expectInPlace(word, text.slice(sourceStart(block, index), sourceEnd(block, index + word.length)));
        }
      }
      const expected = wordsOfHtml(html.replaceAll('→', '\t')).sort();
      if (reason === undefined) expect(words.sort()).toEqual(expected);
      else expect(words.sort(), 'the exception is needed no more').not.toEqual(expected);
    });
  }
});
