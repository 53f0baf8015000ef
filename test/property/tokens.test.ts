// Properties of tokens over any text: exact places, nothing lost, nothing depending on neighbours or on what was read before.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { BlockContent } from '../../server/src/prose/prose.js';
import { createEnglishProfile } from '../../server/src/tokens/english.js';
import { createNeutralProfile } from '../../server/src/tokens/neutral.js';
import { type BlockTokens, type LanguageProfile, TAG, TokenFlag } from '../../server/src/tokens/tokens.js';

const english = createEnglishProfile();
const profiles: [string, LanguageProfile][] = [
  ['en', english],
  ['de', createNeutralProfile('de')],
  ['ja', createNeutralProfile('ja')],
  ['und', createNeutralProfile('und')],
];

function paragraph(text: string): BlockContent {
  return {
    kind: 'paragraph',
    level: 0,
    text,
    zones: 0,
    marks: [],
    links: [],
    pieces: new Uint32Array(),
    sourceLength: 0,
  };
}

/** Pieces that writers and hostile files put side by side. */
const PIECES =
  `the a server click Click API's users' isn't can't it’s let's command-line foo_bar node.js .NET C++ C# --flag=x -5 10ms 1,000 3.14
  e.g. i.e. vs. No. 5 etc. https://a.b/c x@y.org /etc/hosts a/b and/or I/O — – -- ... . , ; : ! ? ( ) [ ] " ' “ ” ‘ ’ ™ ® % $ & # @ * _ \\ /
  你好 世界 こんにちは カタカナ สวัสดี 한국어 مرحبا שלום नमस्ते 👩‍👩‍👧 👍🏽 🇩🇪 ☕️ e\u0301 \u0301 \u00AD \u200B \u200D \uFEFF \u200E \u202B \u2066
  \uFFFC \uD800 \uDC00 𝒳 𐐀 ½ Ⅳ ② \r\n \n \t \u00A0 \u3000 \u2028 \u0085 \u000B \u0000 ﬁ ß İ ı ǅ Zqx zqx $%^oov^%$ constructor __proto__ toString`
    .split(/[ \n]+/)
    .filter((piece) => piece !== '')
    .concat([' ', ' ', ' ', ' ', '\r\n', '\n']);

const anyText = fc.oneof(
  fc.string({ unit: 'binary', maxLength: 60 }),
  fc.string({ unit: 'grapheme', maxLength: 60 }),
  fc.array(fc.constantFrom(...PIECES), { maxLength: 40 }).map((pieces) => pieces.join('')),
  fc.array(fc.constantFrom(...PIECES), { maxLength: 40 }).map((pieces) => pieces.join(' ')),
  fc.array(fc.integer({ min: 0, max: 0xffff }), { maxLength: 40 }).map((units) => String.fromCharCode(...units)),
);

describe.each(profiles)('any text, profile %s', (_, profile) => {
  test('tokens ascend, lie within the text, and split no pair of surrogates', () => {
    fc.assert(
      fc.property(anyText, (text) => {
        const tokens = profile.tokens([paragraph(text)])[0]!;
        let last = 0;
        for (let row = 0; row < tokens.start.length; row++) {
          const start = tokens.start[row]!;
          const end = tokens.end[row]!;
          expect(start).toBeGreaterThanOrEqual(last);
          expect(end).toBeGreaterThan(start);
          expect(end).toBeLessThanOrEqual(text.length);
          expect(splitsPair(text, start) || splitsPair(text, end)).toBe(false);
          last = end;
        }
        expect(tokens.end.length).toBe(tokens.start.length);
        expect(tokens.tag.length).toBe(tokens.start.length);
        expect(tokens.flags.length).toBe(tokens.start.length);
        expect(tokens.lemma.length).toBe(tokens.start.length);
      }),
      { numRuns: 400 },
    );
  });

  test('every letter and digit is in a token, save those of a possessive ending', () => {
    fc.assert(
      fc.property(anyText, (text) => {
        const tokens = profile.tokens([paragraph(text)])[0]!;
        const covered = coveredUnits(text, tokens);
        for (let at = 0; at < text.length; at += text.codePointAt(at)! > 0xffff ? 2 : 1) {
          if (/^[\p{L}\p{N}]$/u.test(String.fromCodePoint(text.codePointAt(at)!)))
            expect(covered[at], text.slice(at)).toBe(1);
        }
      }),
      { numRuns: 400 },
    );
  });

  test('a token claims no more than its text shows', () => {
    fc.assert(
      fc.property(anyText, (text) => {
        const tokens = profile.tokens([paragraph(text)])[0]!;
        for (let row = 0; row < tokens.start.length; row++) {
          const slice = text.slice(tokens.start[row], tokens.end[row]);
          const flags = tokens.flags[row]!;
          expect(/[\s\uFFFC]/.test(slice.replaceAll('\uFEFF', ''))).toBe(slice === '\uFFFC');
          expect(tokens.tag[row] === TAG.OPAQUE).toBe(slice === '\uFFFC');
          if ((flags & TokenFlag.word) !== 0) expect(/\p{L}/u.test(slice)).toBe(true);
          if (tokens.tag[row] === TAG.PUNCT || tokens.tag[row] === TAG.SYM)
            expect(/[\p{L}\p{Nd}]/u.test(slice)).toBe(false);
          if ((flags & TokenFlag.spaceBefore) !== 0)
            expect(/[\s\p{Cc}\p{Z}]\p{Cf}*$/u.test(text.slice(0, tokens.start[row]))).toBe(true);
          if ((flags & TokenFlag.possessive) !== 0) expect(/^['’]/.test(text.slice(tokens.end[row]))).toBe(true);
        }
        if (tokens.start.length > 0) expect(tokens.flags[0]! & TokenFlag.sentenceStart).not.toBe(0);
      }),
      { numRuns: 400 },
    );
  });
});

describe('a block by itself', () => {
  const words = fc
    .array(fc.constantFrom(...PIECES, ...SENTENCE_WORDS()), { maxLength: 30 })
    .map((list) => list.join(' '));

  test('has the same tokens in any company', () => {
    fc.assert(
      fc.property(fc.array(fc.oneof(words, anyText), { minLength: 2, maxLength: 12 }), (texts) => {
        const contents = texts.map(paragraph);
        const together = english.tokens(contents);
        contents.forEach((content, k) => expect(together[k]).toEqual(english.tokens([content])[0]));
      }),
      { numRuns: 200 },
    );
  });

  test('has the same tokens from a profile that has read nothing', () => {
    const texts = fc.sample(words, { numRuns: 300, seed: 20 });
    english.tokens(texts.map((text) => paragraph(text.toUpperCase())));
    const used = texts.map((text) => english.tokens([paragraph(text)])[0]);
    const fresh = createEnglishProfile();
    expect([...texts].reverse().map((text) => fresh.tokens([paragraph(text)])[0])).toEqual(used.reverse());
  });
});

function SENTENCE_WORDS(): string[] {
  return `you to not will have has been do this that it is are was of in out like most as mine had while my your we i run note use
    set file data frobnicate frobnicating Frobnicates quuxly quuxable kubectl Kubernetes zorbed antizorb postzorb running configured
    cannot dont wont gonna cant Cannot DON'T 1st 2nd half all both`
    .split(/\s+/)
    .filter((word) => word !== '');
}

function splitsPair(text: string, at: number): boolean {
  return at > 0 && at < text.length && /^[\uD800-\uDBFF][\uDC00-\uDFFF]$/.test(text.slice(at - 1, at + 1));
}

function coveredUnits(text: string, tokens: BlockTokens): Uint8Array {
  const covered = new Uint8Array(text.length);
  for (let row = 0; row < tokens.start.length; row++) {
    const end = tokens.end[row]!;
    covered.fill(1, tokens.start[row], end);
    const ending = /^['’][sS]/.test(text.slice(end)) ? 2 : 1;
    if ((tokens.flags[row]! & TokenFlag.possessive) !== 0) covered.fill(1, end, end + ending);
  }
  return covered;
}
