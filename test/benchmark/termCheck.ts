// Term check against `grep -F`: one text, N terms drawn from its own word sequences, ratios within one run.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { TermMatcher } from '../../server/src/findings/termMatcher.js';
import { cpuMs, median } from './measure.js';

/** One line of the result: times are medians of processor milliseconds; the ratio is ours over grep's. */
export interface TermCheckRow {
  readonly terms: number;
  readonly scanMs: number;
  readonly grepMs: number;
  readonly ratio: number;
  readonly matches: number;
  readonly compileMs: number;
}

/** All rows, and the time of 10,000 terms over that of 100. */
export interface TermCheckResult {
  readonly characters: number;
  readonly rows: readonly TermCheckRow[];
  readonly growth: number;
}

/** Runs the measurement: `repetitions` rounds, each timing every N with ours and with grep in turn. */
export function measureTermCheck(repetitions = 7): TermCheckResult {
  const text = corpusText().toLowerCase();
  const folder = mkdtempSync(join(tmpdir(), 'evenword-'));
  try {
    const file = join(folder, 'text');
    writeFileSync(file, text);
    const cases = [100, 1_000, 10_000].map((count) => {
      const terms = drawTerms(text, count);
      const list = join(folder, `terms${count}`);
      writeFileSync(list, terms.join('\n') + '\n');
      let matcher = new TermMatcher([]);
      const compileMs = cpuMs(() => (matcher = new TermMatcher(terms.map((term) => ({ text: term })))));
      return {
        count,
        list,
        matcher,
        compileMs,
        ours: [] as number[],
        grep: [] as number[],
        matches: 0,
      };
    });
    for (const one of cases) one.matcher.scan(text.slice(0, 2_000_000), 0, 2_000_000, () => undefined);
    for (let round = 0; round < repetitions; round++) {
      for (const one of cases) {
        one.matches = 0;
        one.ours.push(cpuMs(() => one.matcher.scan(text, 0, text.length, () => one.matches++)));
        one.grep.push(grepMs(one.list, file));
      }
    }
    const rows = cases.map(({ count, ours, grep, matches, compileMs }) => {
      const scanMs = median(ours);
      return { terms: count, scanMs, grepMs: median(grep), ratio: scanMs / median(grep), matches, compileMs };
    });
    return { characters: text.length, rows, growth: rows[2]!.scanMs / rows[0]!.scanMs };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** The Markdown of the shared documentation, or where that is absent the READMEs of the installed packages. */
function corpusText(): string {
  const shared = resolve(import.meta.dirname, '../../../shared/data/docs/opensearch');
  const root = existsSync(shared) ? shared : resolve(import.meta.dirname, '../../node_modules');
  const files = readdirSync(root, { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.md$/i.test(name))
    .sort()
    .slice(0, 4_000);
  return files.map((name) => readFileSync(join(root, name), 'utf8')).join('\n');
}

/** Words that no term begins or ends with. */
const FUNCTION_WORDS = new Set(
  (
    'the a an and or but if of in on at to for from by with as is are was were be been can will may must should would could not no ' +
    'this that these those it its you your we our they their has have had do does did when where which who what how than then so such ' +
    'all any each other more most also only into over under between after before during per via see use using used one two new following'
  ).split(' '),
);

/** Distinct sequences of two or three words that occur at least three times and have no function word at either end, spread evenly. */
function drawTerms(text: string, count: number): string[] {
  const uses = new Map<string, number>();
  const words = /[a-z]+/g;
  for (let match = words.exec(text), recent: { text: string; end: number }[] = []; match; match = words.exec(text)) {
    const before = recent[recent.length - 1];
    if (before && (match.index !== before.end + 1 || text[before.end] !== ' ')) recent = [];
    recent.push({ text: match[0], end: words.lastIndex });
    if (recent.length > 3) recent.shift();
    if (match[0].length < 3 || FUNCTION_WORDS.has(match[0])) continue;
    for (let length = 2; length <= recent.length; length++) {
      const term = recent.slice(-length).map((word) => word.text);
      if (term[0]!.length > 2 && !FUNCTION_WORDS.has(term[0]!))
        uses.set(term.join(' '), (uses.get(term.join(' ')) ?? 0) + 1);
    }
  }
  const candidates = [...uses]
    .filter(([, times]) => times >= 3)
    .map(([term]) => term)
    .sort();
  const step = candidates.length / count;
  if (step < 1) throw new Error(`the text yields only ${candidates.length} terms, ${count} are wanted`);
  return Array.from({ length: count }, (_, index) => candidates[Math.floor(index * step)]!);
}

/** Runs grep and returns the processor time of the whole process, user and system, in milliseconds. */
function grepMs(list: string, file: string): number {
  // A file takes the count: with /dev/null as its output grep stops at the first match.
  const script = 'TIMEFORMAT="%3U %3S"; time grep -F -c -f "$0" "$1" > "$1.count"';
  const { stderr } = spawnSync('bash', ['-c', script, list, file], {
    env: { ...process.env, LC_ALL: 'C' },
    encoding: 'utf8',
  });
  const [user, system] = stderr.trim().split(' ').map(Number);
  return (user! + system!) * 1000;
}

if (process.argv[1] !== undefined && /termCheck\.\w+$/.test(process.argv[1])) {
  const { characters, rows, growth } = measureTermCheck();
  for (const { terms, scanMs, grepMs, ratio, matches, compileMs } of rows) {
    console.log(
      `${terms} terms: scan ${scanMs.toFixed(0)} ms (${(characters / 1e3 / scanMs).toFixed(0)} MB/s), grep ${grepMs.toFixed(0)} ms, ` +
        `ratio ${ratio.toFixed(2)} (goal 1.1); ${matches} matches; compiled in ${compileMs.toFixed(0)} ms`,
    );
  }
  console.log(`10,000 terms over 100: ${growth.toFixed(2)} (goal 1.4)`);
}
