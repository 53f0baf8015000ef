// A development runner: reads a folder of documents, asks the synonym questions and prints them with their sentences.
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { basename, join, resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { deserialize, serialize } from 'node:v8';
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { gatherFacts } from '../../server/src/facts/documentFacts.js';
import type { DocumentFacts } from '../../server/src/facts/documentFacts.js';
import type { Question, UsePlace } from '../../server/src/mining/question.js';
import { askSynonyms } from '../../server/src/mining/synonyms/ask.js';
import { singularKey } from '../../server/src/mining/wording.js';
import { read } from '../../server/src/prose/read.js';
import { createEnglishProfile } from '../../server/src/tokens/english.js';

interface GoldSet {
  readonly folder: string;
  readonly positives: readonly (Record<string, unknown> & { a: string; b: string; count_a: number; count_b: number })[];
  readonly negatives: readonly { a: string; b: string }[];
}
type Documents = { readonly uri: string; readonly facts: DocumentFacts }[];

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: {
    show: { type: 'string', default: '50' },
    brief: { type: 'boolean', default: false },
    cache: { type: 'string' },
    gold: { type: 'string', default: '../shared/data/gold-dev.json' },
    looks: { type: 'boolean', default: false },
  },
});
const gold = existsSync(values.gold) ? (JSON.parse(readFileSync(values.gold, 'utf8')) as GoldSet[]) : [];
for (const folder of positionals) report(folder);

function report(folder: string): void {
  const documents = values.cache === undefined ? gather(folder) : cached(folder, values.cache);
  const corpus = finish(Corpus.create().apply(documents));
  const words = corpus.words;
  const started = process.cpuUsage();
  const all = finish(askSynonyms(corpus));
  const { user, system } = process.cpuUsage(started);
  const questions = all.filter((question) => values.looks || question.kind !== 'look-alike');
  const rate = (count: number): string => ((count / words) * 1e5).toFixed(1);
  console.log(
    `# ${basename(folder)}: ${documents.length} documents, ${words} words, asked in ${((user + system) / 1e6).toFixed(2)} s of CPU`,
  );
  for (const kind of ['synonym', 'verb-object', 'look-alike'] as const) {
    const count = all.filter((question) => question.kind === kind).length;
    console.log(`${kind}: ${count} questions, ${rate(count)} per 100,000 words`);
  }
  questions.slice(0, Number(values.show)).forEach((question, index) => print(corpus, question, index + 1));
  recall(folder, questions);
}

function gather(folder: string): Documents {
  const profile = createEnglishProfile();
  const names = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) =>
    /\.(md|rst|adoc)$/.test(name),
  );
  return names.sort().map((uri) => {
    const text = readFileSync(join(folder, uri), 'utf8');
    return {
      uri,
      facts: gatherFacts(read({ uri, format: uri.endsWith('.md') ? 'markdown' : 'plaintext', text }), profile),
    };
  });
}

/** Reading takes most of the time: facts are kept in a folder of the caller's. Remove it when the readers change. */
function cached(folder: string, cache: string): Documents {
  mkdirSync(cache, { recursive: true });
  const file = join(cache, `${basename(resolve(folder))}.facts`);
  if (existsSync(file)) return deserialize(readFileSync(file)) as Documents;
  const documents = gather(folder);
  writeFileSync(file, serialize(documents));
  return documents;
}

function print(corpus: Corpus, question: Question, number: number): void {
  const terms = question.terms.map(
    (term) =>
      `${term.text} ${term.uses}/${term.documents} [${term.forms.map((form) => `${form.text} ${form.uses}`).join(', ')}]`,
  );
  console.log(
    `${number}. ${question.kind}  ${terms.join('  |  ')}  conf ${question.confidence.toFixed(2)} worth ${question.worth.toFixed(1)}`,
  );
  if (values.brief) {
    console.log(`      ${question.reasons.map(({ kind, value }) => `${kind} ${value.toFixed(2)}`).join(', ')}`);
    return;
  }
  for (const reason of question.reasons)
    console.log(`      (${reason.kind} ${reason.value.toFixed(2)}) ${reason.text}`);
  for (const place of question.places) console.log(`      ${place.term}: ${sentenceAt(corpus, place)}`);
}

function sentenceAt(corpus: Corpus, place: UsePlace): string {
  const { facts } = corpus.documents[place.document]!;
  const block = facts.blockFirst.findIndex((first) => first > place.firstToken) - 1;
  const from = Math.max(facts.blockFirst[block]!, place.firstToken - 14);
  const until = Math.min(facts.blockFirst[block + 1]! - 1, place.lastToken + 14);
  const shown: string[] = [];
  for (let row = from; row <= until; row++) {
    const open = row === place.firstToken ? '[[' : '';
    shown.push(`${open}${facts.words[facts.word[row]!]!}${row === place.lastToken ? ']]' : ''}`);
  }
  return shown.join(' ').replaceAll('\uFFFC', '`…`');
}

function recall(folder: string, questions: readonly Question[]): void {
  const set = gold.find((each) => basename(each.folder) === basename(resolve(folder)));
  if (set === undefined) return;
  const tally = { found: 0, all: 0 };
  for (const pair of set.positives) {
    if (
      !['synonym', 'phrase-verb', 'rename'].includes(pair['kind'] as string) ||
      Math.min(pair.count_a, pair.count_b) < 5
    )
      continue;
    if (['residual', 'pos_dependent', 'sense_limited', 'function_phrase'].some((flag) => pair[flag] === true)) continue;
    const at = placeOf(questions, pair.a, pair.b);
    tally.all++;
    if (at > 0) tally.found++;
    console.log(`  ${at > 0 ? `found at ${at}` : 'missed'}: ${pair.a} ${pair.count_a} | ${pair.b} ${pair.count_b}`);
  }
  console.log(`  recall ${tally.found} of ${tally.all}`);
  for (const { a, b } of set.negatives) {
    const at = placeOf(questions, a, b);
    if (at > 0) console.log(`  NEGATIVE ASKED at ${at}: ${a} | ${b}`);
  }
}

/** The place, from 1, of the first question that holds both as different terms, or 0. */
function placeOf(questions: readonly Question[], a: string, b: string): number {
  const fold = (text: string): string =>
    text
      .toLowerCase()
      .split(/[\s-]+/)
      .map(singularKey)
      .join(' ');
  return (
    1 +
    questions.findIndex(({ terms }) => {
      const holders = [a, b].map((wanted) =>
        terms.findIndex((term) =>
          [term.text, ...term.forms.map((form) => form.text)].some((text) => fold(text) === fold(wanted)),
        ),
      );
      return holders[0]! >= 0 && holders[1]! >= 0 && holders[0] !== holders[1];
    })
  );
}
