// node build/run.mjs test/benchmark/reread.ts [FORMAT …]: milliseconds for each key, read again and read whole, in the same run.
import { read, reread, startReading } from '../../server/src/prose/read.js';
import { keepContents } from '../../server/src/prose/reading.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { pagesOf } from '../fuzz/pages.js';
import { sourceOf } from '../fuzz/sound.js';
import { ALL_FORMATS } from '../fuzz/texts.js';
import { median, quantile } from './measure.js';

const KEYS = 200;
const WORDS = [5_000, 50_000];

/** A page of so many words: real pages of the format one behind the other, else paragraphs. */
function pageOf(format: Format, words: number): string {
  const pages = pagesOf(format).map(({ text }) => text.replaceAll('\r', ''));
  if (pages.length === 0) pages.push('The access key of a gateway opens\nthe gate of its buoy.\n\n'.repeat(100));
  let text = '';
  for (let i = 0, count = 0; count < words; i = (i + 1) % pages.length) {
    const page = `${pages[i]!.trimEnd()}\n\n`;
    text += page;
    count += page.match(/\p{L}+/gu)?.length ?? 0;
  }
  return text;
}

/** Types letters one by one at places all over the page, each inside a word. */
function measure(format: Format, words: number): string {
  let text = pageOf(format, words);
  let reading = startReading(sourceOf(text, format));
  const again: number[] = [];
  const whole: number[] = [];
  for (let key = 0; key < KEYS; key++) {
    let at = Math.floor(((key * 7919) % KEYS) * (text.length / KEYS));
    while (at < text.length && !/[a-z][a-z]/.test(text.slice(at, at + 2))) at++;
    text = `${text.slice(0, at + 1)}e${text.slice(at + 1)}`;
    const source = sourceOf(text, format);
    const previous = reading.prose.blocks;
    const before = performance.now();
    reading = reread(reading, source);
    const between = performance.now();
    keepContents(previous, read(source).blocks);
    whole.push(performance.now() - between);
    again.push(between - before);
  }
  const figures = [median(again), quantile(again, 0.95), median(whole), quantile(whole, 0.95)];
  const [p50, p95, whole50, whole95] = figures.map((value) => value.toFixed(2));
  const ratio = (figures[2]! / figures[0]!).toFixed(1);
  return (
    `${format.padEnd(16)} ${String(words).padStart(6)} words, ${(text.length / 1000).toFixed(0)} kB: again ${p50} ms (p95 ${p95}), ` +
    `whole ${whole50} ms (p95 ${whole95}), ${ratio} × faster`
  );
}

const wanted = process.argv.slice(2);
for (const format of ALL_FORMATS.filter((one) => wanted.length === 0 || wanted.includes(one))) {
  for (const words of WORDS) console.log(measure(format, words));
}
