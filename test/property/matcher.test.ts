// The matcher against a plain implementation that tries every term at every word.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { TermMatcher, type MatchableTerm } from '../../server/src/findings/termMatcher.js';
import { FORMS, termForms } from '../../server/src/rewrite/inflect.js';

interface Match {
  readonly term: number;
  readonly start: number;
  readonly end: number;
  readonly form: number;
}

const WORD = /[\p{L}\p{M}\p{N}\p{Pc}]+/gu;
const fold = (word: string): string => word.toLowerCase().normalize('NFC');
const separator = (raw: string): string =>
  /^\s+$/.test(raw)
    ? ' '
    : raw
        .replace(/’/g, "'")
        .replace(/[\u2010\u2011]/g, '-')
        .replace(/\s+/g, ' ');

interface Cut {
  readonly words: readonly { text: string; start: number; end: number }[];
  readonly separators: readonly string[];
}

function cut(text: string): Cut {
  const words = [...text.matchAll(WORD)].map((match) => ({
    text: match[0],
    start: match.index,
    end: match.index + match[0].length,
  }));
  return { words, separators: words.slice(1).map((word, k) => separator(text.slice(words[k]!.end, word.start))) };
}

/** Every spelling of every term at every word; the furthest end wins, then the next word behind it. */
function plainScan(terms: readonly MatchableTerm[], text: string): Match[] {
  const spellings = terms.flatMap(({ text: base, partOfSpeech, caseSensitive }, term) => {
    const seen = new Set<string>();
    return termForms(base, partOfSpeech).flatMap(({ form, text: spelling }) => {
      const trimmed = spelling.trim();
      const own = cut(trimmed);
      if (seen.has(spelling) || own.words.length === 0) return [];
      seen.add(spelling);
      const lead = trimmed.slice(0, own.words[0]!.start);
      const tail = trimmed.slice(own.words[own.words.length - 1]!.end);
      return [
        {
          term,
          form: FORMS.indexOf(form),
          own,
          lead,
          tail,
          exact: caseSensitive ? trimmed.replace(/\s+/g, ' ') : undefined,
        },
      ];
    });
  });
  const { words, separators } = cut(text);
  const matches: Match[] = [];
  let free = 0;
  for (let k = 0; k < words.length; k++) {
    if (words[k]!.start < free) continue;
    const found = spellings.flatMap(({ term, form, own, lead, tail, exact }): Match[] => {
      const last = k + own.words.length - 1;
      if (last >= words.length) return [];
      if (!own.words.every((word, j) => fold(word.text) === fold(words[k + j]!.text))) return [];
      if (!own.separators.every((one, j) => one === separators[k + j])) return [];
      const start = words[k]!.start - lead.length;
      const end = words[last]!.end + tail.length;
      if (start < free || !text.startsWith(lead, start) || !text.startsWith(tail, words[last]!.end)) return [];
      if (exact !== undefined && text.slice(start, end).replace(/\s+/g, ' ') !== exact) return [];
      return [{ term, form, start, end }];
    });
    if (found.length === 0) continue;
    const end = Math.max(...found.map((match) => match.end));
    matches.push(...found.filter((match) => match.end === end));
    free = end;
  }
  return matches;
}

const WORDS = [
  'log',
  'in',
  'key',
  'API',
  'access',
  'keys',
  'Logging',
  'C',
  'net',
  'data',
  'center',
  'straße',
  'naïve',
  'nai\u0308ve',
  'Ключ',
  '鍵',
  '𝒳y',
  'foo_bar',
  'x2',
];
const GAPS = [
  ' ',
  '  ',
  '\n',
  '-',
  '\u2011',
  '/',
  '.',
  "'",
  '’',
  ', ',
  ' \u00a0',
  '\u2028',
  ' 😀 ',
  '++ ',
  ' .',
  '\ufffc',
  '—',
  '\ud800 ',
];

const word = fc.constantFrom(...WORDS);
const textOf = (most: number): fc.Arbitrary<string> =>
  fc
    .array(
      fc.tuple(
        fc.oneof({ weight: 8, arbitrary: word }, fc.string({ unit: 'grapheme', maxLength: 4 })),
        fc.constantFrom(...GAPS),
      ),
      { maxLength: most },
    )
    .map((parts) => parts.flat().join(''));
const term: fc.Arbitrary<MatchableTerm> = fc
  .record({
    first: fc.constantFrom('', '', '', '.', '@'),
    words: fc.array(fc.tuple(word, fc.constantFrom(' ', ' ', '-', '/', "'", '\n')), { minLength: 1, maxLength: 4 }),
    tail: fc.constantFrom('', '', '', '++', '#'),
    partOfSpeech: fc.constantFrom('noun' as const, 'verb' as const, undefined),
    caseSensitive: fc.boolean(),
  })
  .map(({ first, words, tail, partOfSpeech, caseSensitive }) => ({
    text: first + words.map(([one, gap], k) => one + (k < words.length - 1 ? gap : '')).join('') + tail,
    caseSensitive,
    ...(partOfSpeech ? { partOfSpeech } : {}),
  }));

function ours(terms: readonly MatchableTerm[], text: string): Match[] {
  const matches: Match[] = [];
  new TermMatcher(terms).scan(text, 0, text.length, (index, start, end, form) =>
    matches.push({ term: index, start, end, form }),
  );
  return matches;
}

describe('the matcher', () => {
  it('finds what the plain implementation finds', () => {
    fc.assert(
      fc.property(fc.array(term, { maxLength: 12 }), textOf(40), (terms, text) => {
        expect(ours(terms, text)).toEqual(plainScan(terms, text));
      }),
      { numRuns: 1500 },
    );
  });

  it('finds the same across the bounds of its chunks', () => {
    fc.assert(
      fc.property(fc.array(term, { minLength: 3, maxLength: 12 }), textOf(60), fc.nat(300), (terms, text, shift) => {
        const filler = 'lorem ipsum '.repeat(680);
        const long = filler.slice(0, 8192 - 300 + shift) + ' ' + text + ' ' + filler + text;
        expect(ours(terms, long)).toEqual(plainScan(terms, long));
      }),
      { numRuns: 60 },
    );
  });

  it('scans a range as if it were the whole text', () => {
    const terms: MatchableTerm[] = [{ text: 'API key' }, { text: '.net' }];
    const text = 'API key .net API key';
    const matches: [number, number][] = [];
    new TermMatcher(terms).scan(text, 4, 12, (_, start, end) => matches.push([start, end]));
    expect(matches).toEqual([[8, 12]]);
  });
});
