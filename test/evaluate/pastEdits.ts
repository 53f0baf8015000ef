// What the history of a repository tells of the terms of a folder: node build/run.mjs test/evaluate/pastEdits.ts REPOSITORY DIR.
import { resolve } from 'node:path';
import { compareCodeUnits } from '../../server/src/base/order.js';
import { finish } from '../../server/src/base/work.js';
import type { Corpus } from '../../server/src/corpus/corpus.js';
import { countReplacements } from '../../server/src/mining/pastEdits.js';
import type { Replacement } from '../../server/src/mining/pastEdits.js';
import { pastEditKey } from '../../server/src/mining/synonyms/pastEdits.js';
import { findNounTerms } from '../../server/src/mining/synonyms/terms.js';
import { countWordUses, readUses } from '../../server/src/mining/synonyms/wordUse.js';
import { changesOf, listCommits } from '../../server/src/node/history/commits.js';
import { readContents } from '../../server/src/node/history/contents.js';
import type { ReadObject } from '../../server/src/node/history/contents.js';
import { Git } from '../../server/src/node/history/git.js';
import { RevisionReader } from '../../server/src/revisions/replacements.js';
import type { ReplacedInSentence } from '../../server/src/revisions/replacements.js';
import { formatOf } from '../../server/src/text/sourceText.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { TAG } from '../../server/src/tokens/tokens.js';
import { ask, sourcesUnder } from './asked.js';

/** Sentences that are printed of a pair, at most. */
const SHOWN = 4;

interface Told extends ReplacedInSentence {
  readonly commit: string;
  readonly path: string;
}

const [repository = '.', folder = '.'] = process.argv.slice(2);
void main();

async function main(): Promise<void> {
  const told = await sentencesOf(resolve(repository));
  const commits = new Map<string, Replacement[]>();
  for (const one of told) commits.set(one.commit, [...(commits.get(one.commit) ?? []), replacementOf(one)]);
  const { corpus } = ask((await sourcesUnder(folder)).sources);
  if (corpus === undefined) return;
  const edits = { commits: [...commits.values()] };
  console.log(`${commits.size} commits with ${told.length} sentences in which one term was replaced`);
  for (const [what, termOf] of [
    ['noun terms', nounOf(corpus)],
    ['verbs', verbOf(corpus)],
  ] as const) {
    const counts = countReplacements(edits, termOf);
    counts.sort((a, b) => b.commits - a.commits || b.sentences - a.sentences || compareCodeUnits(a.from, b.from));
    console.log(`\n${what}: ${counts.length} pairs by direction`);
    for (const { from, to, commits: times, pages, sentences, mended } of counts) {
      console.log(`\n${times} commits, ${pages} pages, ${sentences} sentences (${mended} mended): ${from} → ${to}`);
      const shown = told.filter((one) => {
        const [same] = countReplacements({ commits: [[replacementOf(one)]] }, termOf);
        return same?.from === from && same.to === to;
      });
      for (const { earlier, later } of shown.slice(0, SHOWN)) {
        console.log(`    - ${earlier.map(({ text }) => text).join(' ')}`);
        console.log(`    + ${later.map(({ text }) => text).join(' ')}`);
      }
    }
  }
}

function replacementOf({ from, to, before, after, mends, earlier, path }: Told): Replacement {
  return {
    from,
    to,
    before,
    after,
    mends,
    page: hash(path),
    sentences: [hash(earlier.map(({ text }) => text).join(' '))],
  };
}

const hashes = new Map<string, number>();
function hash(text: string): number {
  if (!hashes.has(text)) hashes.set(text, hashes.size);
  return hashes.get(text)!;
}

function nounOf(corpus: Corpus): (words: string) => string | undefined {
  const terms = finish(findNounTerms(corpus, countWordUses(corpus, readUses(corpus))));
  const byKey = new Map(terms.map(({ key, words, uses }) => [key, `${words.join(' ')} (${uses})`]));
  return (words) => byKey.get(pastEditKey(words));
}

function verbOf({ stream, vocabulary }: Corpus): (words: string) => string | undefined {
  const verbs = new Map<string, Map<string, number>>();
  for (let row = 0; row < stream.length; row++) {
    if (stream.tag[row] !== TAG.VERB || stream.counted[row] === 0) continue;
    const word = vocabulary.textOf(stream.fold[row]!);
    const lemma = vocabulary.textOf(stream.lemma[row]!);
    const lemmas = verbs.get(word) ?? new Map<string, number>();
    lemmas.set(lemma, (lemmas.get(lemma) ?? 0) + 1);
    verbs.set(word, lemmas);
  }
  return (word) => [...(verbs.get(word) ?? [])].filter(([, n]) => n >= 3).sort((a, b) => b[1] - a[1])[0]?.[0];
}

async function sentencesOf(root: string): Promise<Told[]> {
  const { signal } = new AbortController();
  const git = Git.find(root)!;
  const changes = await changesOf(git, await listCommits(git, 5000, signal), signal);
  const queue = changes.flatMap(({ commit, documents }) => documents.map((each) => ({ ...each, commit })));
  const reader = new RevisionReader();
  const told: Told[] = [];
  const started = performance.now();
  let bytes = 0;
  const source = (path: string, text: string): SourceText => ({
    uri: `file:///${path}`,
    format: formatOf(path)!,
    text,
  });
  const take = async (next: () => Promise<ReadObject>): Promise<void> => {
    for (const { path, commit } of queue) {
      const [before, after] = [await next(), await next()];
      bytes += before.bytes + after.bytes;
      if (before.contents === undefined || after.contents === undefined) continue;
      for (const each of reader.sentences(source(path, before.contents), source(path, after.contents)))
        told.push({ ...each, commit, path });
    }
  };
  await readContents(
    git,
    queue.flatMap((each) => [each.before, each.after]),
    1 << 20,
    take,
    signal,
  );
  console.log(
    `${changes.length} commits, ${queue.length} changed documents, ${bytes} bytes, ${Math.round(performance.now() - started)} ms`,
  );
  return told;
}
