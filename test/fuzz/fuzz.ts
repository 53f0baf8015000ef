// npm run fuzz [-- FORMAT … --runs N --seed N]: texts of any shape and torn real pages through every reader.
import { parseArgs } from 'node:util';
import fc from 'fast-check';
import { read } from '../../server/src/prose/read.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { pagesOf } from './pages.js';
import { sourceOf, unlikeWhole, unsound, type Edit } from './sound.js';
import { ALL_FORMATS, TEXTS } from './texts.js';

/** Milliseconds that one text may take, and milliseconds more for each unit: far beyond what any takes on an idle machine. */
const BUDGET = 500;
const BUDGET_PER_UNIT = 0.02;
const CUTS_PER_PAGE = 3;

interface Tally {
  inputs: number;
  units: number;
  milliseconds: number;
  slowest: { text: string; milliseconds: number };
}

class Failure extends Error {}

/** Reads a text within its budget and says what is wrong with its prose. */
function tryText(text: string, format: Format, tally: Tally): void {
  const before = performance.now();
  const prose = read(sourceOf(text, format));
  let milliseconds = performance.now() - before;
  tally.inputs++;
  tally.units += text.length;
  tally.milliseconds += milliseconds;
  for (let again = 0; again < 3 && milliseconds > tally.slowest.milliseconds; again++) {
    // What took long once may have waited for something else.
    const start = performance.now();
    read(sourceOf(text, format));
    milliseconds = Math.min(milliseconds, performance.now() - start);
  }
  if (milliseconds > tally.slowest.milliseconds) tally.slowest = { text, milliseconds };
  const wrong = unsound(text, prose);
  if (wrong !== undefined) throw new Failure(wrong);
  if (milliseconds > BUDGET + BUDGET_PER_UNIT * text.length) throw new Failure(`took ${milliseconds.toFixed(0)} ms`);
}

function check<T>(property: fc.IProperty<T>, numRuns: number, seed: number): string | undefined {
  const { failed, counterexample, errorInstance } = fc.check(property, { numRuns, seed, maxSkipsPerRun: 10 });
  return failed ? `${String(errorInstance)}\n  input: ${JSON.stringify(counterexample)}` : undefined;
}

/** What went wrong with a format, or undefined; counts into the tally. */
function fuzz(format: Format, runs: number, seed: number, tally: Tally): string | undefined {
  const soup = TEXTS[format];
  const edit: fc.Arbitrary<Edit> = fc.record({
    at: fc.double({ min: 0, max: 1, noNaN: true }),
    remove: fc.oneof(fc.constant(0), fc.nat(5), fc.nat(60)),
    insert: soup.map((text) => text.slice(0, 40)),
  });
  const texts = fc.property(soup, (text) => tryText(text, format, tally));
  const edits = fc.property(soup, fc.array(edit, { minLength: 1, maxLength: 3 }), (text, script) => {
    const wrong = unlikeWhole(text, script, format);
    if (wrong !== undefined) throw new Failure(`reading again differs: ${wrong}`);
  });
  const failed = check(texts, runs, seed) ?? check(edits, Math.ceil(runs / 10), seed);
  if (failed !== undefined) return failed;
  const pages = pagesOf(format);
  if (pages.length === 0) return undefined;
  const cut = fc.tuple(fc.constantFrom(...pages), fc.double({ min: 0, max: 1, noNaN: true }), soup);
  const torn = fc.property(cut, ([{ text }, part, behind]) => {
    const head = text.slice(0, Math.floor(part * text.length));
    tryText(head, format, tally);
    tryText(head + behind, format, tally);
  });
  return check(torn, Math.min(runs, pages.length * CUTS_PER_PAGE), seed);
}

function wholeNumber(name: string, written: string): number {
  const value = Number(written);
  if (Number.isInteger(value) && value >= 0) return value;
  throw new RangeError(`--${name} needs a whole number, not ${written}`);
}

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: {
    runs: { type: 'string', default: '10000' },
    seed: { type: 'string', default: String(Date.now() % 1_000_000) },
  },
});
const wanted = positionals.map((name) => {
  const format = ALL_FORMATS.find((one) => one === name);
  if (format === undefined) throw new RangeError(`no such format: ${name}; there are ${ALL_FORMATS.join(', ')}`);
  return format;
});
const runs = wholeNumber('runs', values.runs);
const seed = wholeNumber('seed', values.seed);
console.log(`${runs} texts of any shape for each format, a tenth as many edits, torn pages; --seed ${seed}`);
let failures = 0;
for (const format of wanted.length > 0 ? wanted : ALL_FORMATS) {
  const tally: Tally = { inputs: 0, units: 0, milliseconds: 0, slowest: { text: '', milliseconds: 0 } };
  const failed = fuzz(format, runs, seed, tally);
  const { text, milliseconds } = tally.slowest;
  const seconds = tally.milliseconds / 1000;
  console.log(
    `${format.padEnd(16)} ${String(tally.inputs).padStart(7)} texts, ${(tally.inputs / seconds).toFixed(0)} a second, ` +
      `${(tally.units / 1e6 / seconds).toFixed(1)} MB/s; slowest ${milliseconds.toFixed(1)} ms for ${text.length} units: ` +
      JSON.stringify(text.slice(0, 60)),
  );
  if (failed === undefined) continue;
  failures++;
  console.log(`  FAILED: ${failed}`);
}
process.exitCode = failures > 0 ? 1 : 0;
