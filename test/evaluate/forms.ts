// A development runner: reads a folder of documents, asks the form questions and prints them with their sentences.
import { readdirSync, readFileSync, existsSync } from 'node:fs';
import { basename, join, resolve } from 'node:path';
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { factsOf, Profiles } from '../../server/src/engine/factsOf.js';
import { askAbbreviations } from '../../server/src/mining/abbreviations/ask.js';
import { askVariants } from '../../server/src/mining/variants/ask.js';
import type { Question } from '../../server/src/mining/question.js';
import { singularKey } from '../../server/src/mining/wording.js';

const FLAGS = ['residual', 'pos_dependent', 'sense_limited', 'function_phrase'] as const;

/** A pair that maintainers unified, with its counts in prose. */
interface Positive extends Partial<Record<(typeof FLAGS)[number], boolean>> {
  readonly a: string;
  readonly b: string;
  readonly count_a: number;
  readonly count_b: number;
  readonly kind: string;
}

const folder = process.argv[2]!;
const show = Number(process.argv[3] ?? 50);
const t0 = process.cpuUsage();
const files = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  .filter((f) => /\.(md|mdx|txt|rst|adoc|dita|xml)$/.test(f))
  .sort();
const profiles = new Profiles();
const facts = files.map((uri) => ({
  uri,
  facts: factsOf(
    { uri, format: uri.endsWith('.md') ? 'markdown' : 'plaintext', text: readFileSync(join(folder, uri), 'utf8') },
    profiles,
  )[0],
}));
const corpus = finish(Corpus.create().apply(facts));
const { stream } = corpus;
let words = 0;
for (let i = 0; i < stream.length; i++) if (stream.flags[i]! & 8) words++;
const cpu = (): number => {
  const u = process.cpuUsage(t0);
  return (u.user + u.system) / 1e6;
};
const before = cpu();
const variants = finish(askVariants(corpus));
const after = cpu();
const abbreviations = finish(askAbbreviations(corpus));
const last = cpu();
const questions: Question[] = [...variants, ...abbreviations];
console.error(
  `${files.length} files, ${words} words, reading ${before.toFixed(1)} s, variants ${(after - before).toFixed(2)} s, abbreviations ${(last - after).toFixed(2)} s`,
);
for (const kind of ['variant', 'abbreviation', 'ambiguous-abbreviation']) {
  const list = questions.filter((q) => q.kind === kind);
  console.log(`\n## ${kind}: ${list.length} (${((list.length / words) * 1e5).toFixed(1)} per 100k)`);
  list.slice(0, show).forEach((q, i) => {
    console.log(
      `${i + 1}. ${q.terms.map((t) => `${t.text} ${t.uses}/${t.documents}d [${t.forms.map((f) => `${f.text} ${f.uses}`).join(', ')}]`).join('  |  ')}  conf ${q.confidence.toFixed(2)} worth ${q.worth.toFixed(1)}`,
    );
    for (const r of q.reasons) console.log(`      (${r.kind}) ${r.text} = ${r.value}`);
    for (const p of q.places) {
      const d = corpus.documents[p.document]!;
      const words = d.facts;
      let s = '';
      for (let k = Math.max(0, p.firstToken - 7); k <= Math.min(words.word.length - 1, p.lastToken + 7); k++) {
        const w = words.words[words.word[k]!]!;
        s += `${k === p.firstToken ? ' [[' : ' '}${w}${k === p.lastToken ? ']]' : ''}`;
      }
      console.log(`      ${p.term}: ${s}`);
    }
  });
}
// recall
const goldFile = resolve('../shared/data/gold-dev.json');
if (existsSync(goldFile)) {
  const norm = (s: string): string =>
    s
      .toLowerCase()
      .split(' ')
      .map((w) => singularKey(w))
      .join(' ');
  const gold = JSON.parse(readFileSync(goldFile, 'utf8')) as {
    folder: string;
    positives: Positive[];
    negatives: { a: string; b: string }[];
  }[];
  const set = gold.find((g) => folder.includes(basename(g.folder)));
  const find = (a: string, b: string): number =>
    questions.findIndex((q) => {
      const has = (x: string): number[] =>
        q.terms.flatMap((t, i) =>
          [t.text, ...t.forms.map((f) => f.text)].some((f) => norm(f) === norm(x)) ? [i] : [],
        );
      const A = has(a),
        B = has(b);
      return A.length > 0 && B.length > 0 && (A[0] !== B[0] || A.length > 1 || B.length > 1);
    });
  const tally: Record<string, [number, number]> = {};
  for (const p of set?.positives ?? []) {
    const kind = p.kind;
    if (!['spelling', 'hyphenation', 'abbreviation'].includes(kind) || p.count_a < 5 || p.count_b < 5) continue;
    const flagged = FLAGS.some((flag) => p[flag] === true);
    const at = find(p.a, p.b);
    const t = (tally[`${kind}${flagged ? ' flagged' : ''}`] ??= [0, 0]);
    t[1]++;
    if (at >= 0) t[0]++;
    console.log(
      `  ${at >= 0 ? '+' : '-'} ${kind}${flagged ? ' flagged' : ''} ${p.a} | ${p.b} ${p.count_a} ${p.count_b} ${at >= 0 ? questions[at]!.id : ''}`,
    );
  }
  console.log(JSON.stringify(tally));
  for (const n of set?.negatives ?? []) if (find(n.a, n.b) >= 0) console.log('NEGATIVE ASKED', n.a, n.b);
}
