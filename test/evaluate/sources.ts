// A development runner: reads folders of documents and prints what each source of evidence for synonyms finds, alone, for reading.
import { basename } from 'node:path';
import { parseArgs } from 'node:util';
import { finish } from '../../server/src/base/work.js';
import type { Corpus } from '../../server/src/corpus/corpus.js';
import { isRefused } from '../../server/src/mining/synonyms/apart.js';
import { pairByComponents } from '../../server/src/mining/synonyms/components.js';
import { pairByContainment } from '../../server/src/mining/synonyms/containment.js';
import { pairByStatements } from '../../server/src/mining/synonyms/definitions.js';
import { PairCollector } from '../../server/src/mining/synonyms/evidence.js';
import { pairByLists } from '../../server/src/mining/synonyms/lexical.js';
import { pairByLinkTargets } from '../../server/src/mining/synonyms/linkTargets.js';
import { readNouns } from '../../server/src/mining/synonyms/nouns.js';
import { indexOccurrences } from '../../server/src/mining/synonyms/occurrences.js';
import { readUses } from '../../server/src/mining/synonyms/wordUse.js';
import { TokenFlag } from '../../server/src/tokens/tokens.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { ask, sourcesUnder } from './asked.js';

/** Two terms that a source pairs, with the rows at which they are shown. */
interface Found {
  readonly names: readonly [string, string];
  readonly rows: readonly [number, number];
  readonly text: string;
}

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: { source: { type: 'string' }, show: { type: 'string', default: '12' } },
});

void Promise.all(positionals.map(async (folder) => report(folder, (await sourcesUnder(folder)).sources)));

function report(folder: string, sources: readonly SourceText[]): void {
  const { corpus } = ask(sources);
  if (corpus === undefined) return;
  console.log(`# ${basename(folder)}: ${corpus.words} words`);
  for (const [source, found] of findBySource(corpus)) {
    const rate = ((1e5 * found.length) / corpus.words).toFixed(1);
    console.log(`${source}: ${found.length} pairs, ${rate} per 100,000 words`);
    if (values.source !== source) continue;
    const step = Math.max(1, Math.floor(found.length / Number(values.show)));
    for (const { names, rows, text } of found.filter((_, at) => at % step === 0).slice(0, Number(values.show))) {
      console.log(
        `  ${names.join(' | ')}  ${text}\n     ${rows.map((row) => sentenceAt(corpus, row)).join('\n     ')}`,
      );
    }
  }
}

/** The pairs of each source that the lexicon does not refuse, each pair once. */
function findBySource(corpus: Corpus): Map<string, Found[]> {
  const { terms, segments, substitutions } = finish(readNouns(corpus, readUses(corpus)));
  const occurrences = indexOccurrences(segments);
  const collector = new PairCollector(terms.length);
  pairByLists(terms, collector);
  pairByComponents(terms, collector);
  pairByStatements(corpus, segments, collector);
  pairByLinkTargets(corpus, segments, collector);
  pairByContainment(corpus, terms, segments, occurrences, collector);
  const sources = new Map<string, Found[]>();
  const seen = new Set<string>();
  const put = (source: string, a: number, b: number, rows: readonly [number, number], text: string): void => {
    const key = `${source} ${Math.min(a, b)} ${Math.max(a, b)}`;
    const [one, other] = [terms[a]!, terms[b]!];
    if (seen.has(key) || isRefused(one, other) || Math.min(segments.uses[a]!, segments.uses[b]!) < 3) return;
    seen.add(key);
    const found = sources.get(source) ?? [];
    sources.set(source, found);
    found.push({ names: [one.words.join(' '), other.words.join(' ')], rows, text });
  };
  const rowOf = (term: number): number => occurrences.usesOf(term)[0]?.row ?? 0;
  for (const { a, b, evidence } of collector.pairs()) {
    for (const { kind, text, strength } of evidence) {
      const source = kind === 'definition' ? (strength >= 0.8 ? 'definition, outright' : 'definition, loose') : kind;
      put(source, a, b, [rowOf(a), rowOf(b)], text);
    }
  }
  for (const { source, one, other, rowOfOne, rowOfOther } of substitutions) {
    if (one >= 0) put(source, one, other, [rowOfOne, rowOfOther], '');
  }
  return sources;
}

function sentenceAt({ stream, vocabulary }: Corpus, row: number): string {
  const starts = (at: number): boolean => (stream.flags[at]! & TokenFlag.sentenceStart) !== 0;
  let first = row;
  while (first > 0 && row - first < 16 && !starts(first)) first--;
  let text = '';
  for (let at = first; at < Math.min(stream.length, row + 16) && (at === first || !starts(at)); at++) {
    text += `${at === row ? '[[' : ''}${vocabulary.textOf(stream.spelling[at]!)} `;
  }
  return text.replaceAll('\uFFFC', '`…`');
}
