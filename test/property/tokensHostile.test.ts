// Hostile lines of 100 KB cost no more than a small multiple of ordinary prose of that size, measured in the same run.
import { describe, expect, test } from 'vitest';
import type { BlockContent } from '../../server/src/prose/prose.js';
import { createEnglishProfile } from '../../server/src/tokens/english.js';
import { createNeutralProfile } from '../../server/src/tokens/neutral.js';

const SIZE = 100 * 1024;
const fill = (piece: string): string => piece.repeat(Math.ceil(SIZE / piece.length)).slice(0, SIZE);

/** Base64-like text without a random source: a linear congruential sequence (Numerical Recipes constants). */
function base64(): string {
  const letters = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/';
  let state = 1;
  let text = '';
  while (text.length < SIZE) {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    text += letters.charAt(state >>> 26);
  }
  return text;
}

/** Five thousand words of which no two are the same. */
const distinctWords = Array.from({ length: SIZE / 8 }, (_, k) => `w${k.toString(36).padStart(6, 'x')}`).join(' ');

const HOSTILE: [string, string][] = [
  ['base64', base64()],
  ['dashes', fill('-')],
  ['dashes and letters', fill('a-')],
  ['one word', fill('a')],
  ['stops', fill('a.')],
  ['stops after letters', fill('ab.')],
  ['quotation marks', fill('"')],
  ['quotation marks of two kinds', fill('"\'')],
  ['brackets', fill('([{<')],
  ['slashes', fill('a/')],
  ['slashes between words', fill('and/or/')],
  ['slashes and stops', fill('/.')],
  ['slashes alone', fill('/')],
  ['commas', fill('a,')],
  ['underscores', fill('_')],
  ['underscores and letters', fill('a_')],
  ['colons', fill('a::')],
  ['at signs', fill('a@')],
  ['apostrophes', fill("a'")],
  ['possessives', fill("a's")],
  ['digits', fill('9')],
  ['digits and commas', fill('9,')],
  ['digits and letters', fill('9a')],
  ['hash signs', fill('#a')],
  ['backslashes', fill('\\a')],
  ['emoji', fill('👍🏽')],
  ['joined emoji', fill('👩\u200D')],
  ['combining marks', 'a' + fill('\u0301')],
  ['combining marks alone', fill('\u0301')],
  ['zero-width characters', fill('\u200B')],
  ['zero-width characters in a word', fill('a\u200B')],
  ['soft hyphens', fill('\u00AD') + 'a'],
  ['lone surrogates', fill('\uD800')],
  ['ideographs', fill('漢字')],
  ['Thai', fill('สวัสดี')],
  ['opaque units', fill('\uFFFC')],
  ['addresses', fill('https://')],
  ['white space', fill(' ')],
  ['line ends', fill('\r\n')],
  ['single letters', fill('a ')],
  ['single signs', fill('! ')],
  ['distinct words', distinctWords],
];

const japanese = fill('端末を起動する。次に設定を開き、サーバーの名前を入力する。');
const english = fill(
  'The server keeps a record of every request, and the client may read it later. Restart the service to clear it. ',
);
const paragraph = (text: string): BlockContent => ({
  kind: 'paragraph',
  level: 0,
  text,
  zones: 0,
  marks: [],
  links: [],
  pieces: new Uint32Array(),
  sourceLength: 0,
});

describe.each([
  ['en', createEnglishProfile(), english],
  // The segmentation of scripts without spaces is the platform's, and dearer than ours: the neutral profile is held against such prose.
  ['ja', createNeutralProfile('ja'), japanese],
] as const)('profile %s', (language, profile, prose) => {
  /** Processor time in milliseconds, the smaller of two runs: on a busy machine the clock on the wall says little. */
  const cost = (text: string): number => {
    const content = paragraph(text);
    const runs = [0, 1].map(() => {
      const from = process.cpuUsage();
      profile.tokens([content]);
      const { user, system } = process.cpuUsage(from);
      return (user + system) / 1000;
    });
    return Math.min(...runs);
  };
  for (let run = 0; run < 4; run++) cost(prose);

  test('no hostile line costs more than a few times as much as prose', () => {
    const ordinary = Math.min(cost(prose), cost(prose), cost(prose));
    const costs = HOSTILE.map(([name, text]): [string, number] => [name, cost(text)]).sort((a, b) => b[1] - a[1]);
    const shown = costs.slice(0, 5).map(([name, ms]) => `${name} ${(ms / ordinary).toFixed(1)} (${ms.toFixed(0)} ms)`);
    console.log(
      `${language}: 100 KB of prose ${ordinary.toFixed(1)} ms; dearest hostile lines, against it: ${shown.join(', ')}`,
    );
    // Two units a token is the densest that text can be, about three times as dense as prose. The floor of 20 ms keeps a fast machine from failing.
    for (const [name, ms] of costs) expect(ms, name).toBeLessThan(Math.max(20, ordinary * 5));
  });
});
