// Substitutions at parallel places as counted evidence: for pairs of terms, and for pairs of verbs.
import type { Work } from '../../../base/work.js';
import type { Corpus } from '../../../corpus/corpus.js';
import { TAG } from '../../../tokens/tokens.js';
import { times } from '../../wording.js';
import type { PairCollector } from '../evidence.js';
import type { Segments } from '../segment.js';
import type { Term } from '../terms.js';
import { align } from './alignment.js';
import { findBlockParallels } from './blocks.js';
import { findLinkParallels } from './links.js';
import { lemmaOfUnit, PassageReader } from './passages.js';
import type { Substitution } from './passages.js';
import { findNearSentences } from './sentences.js';

/** All places at which the documents put one term or word for another, source by source, in document order. */
export function* findSubstitutions(corpus: Corpus, segments: Segments): Work<Substitution[]> {
  const reader = new PassageReader(corpus, segments);
  const parallels = [...(yield* findLinkParallels(corpus)), ...findBlockParallels(corpus)];
  yield;
  const named = parallels.map((parallel) => align(reader, parallel)).filter((each) => each !== undefined);
  yield;
  return [...named, ...(yield* findNearSentences(reader))].filter(({ one, other }) => one !== other);
}

/** Adds each pair of terms with the number of its places: links, titles and captions, and sentences apart. */
export function pairByParallels(
  corpus: Corpus,
  terms: readonly Term[],
  substitutions: readonly Substitution[],
  pairs: PairCollector,
): void {
  const groups = new Map<string, Substitution[]>();
  for (const substitution of substitutions) {
    const { one, other, source } = substitution;
    if (one < 0) continue;
    const key = `${Math.min(one, other)} ${Math.max(one, other)} ${source === 'sentence' ? 's' : 'n'}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [substitution]);
    else group.push(substitution);
  }
  const name = (term: number): string => `“${terms[term]!.words.join(' ')}”`;
  for (const group of groups.values()) {
    const first = group[0]!;
    const page = (row: number): string => {
      const { uri } = corpus.documents[corpus.stream.documentOf(row)]!;
      return uri.slice(uri.lastIndexOf('/') + 1);
    };
    const [one, other] = [page(first.rowOfOne), page(first.rowOfOther)];
    const where = one === other ? `twice on ${one}` : `on ${one} and ${other}`;
    const often = group.length > 1 ? ` (${times(group.length)} in all)` : '';
    const isSentence = first.source === 'sentence';
    pairs.add(first.one, first.other, {
      kind: isSentence ? 'near-sentence' : 'parallel-place',
      strength: isSentence ? 0.2 : 0.4,
      text: isSentence
        ? `one sentence stands ${where}, once with each name${often}`
        : `one place goes by ${name(first.one)} on ${one} and by ${name(first.other)} on ${other}${often}`,
      value: group.length,
    });
  }
}

/** How often the documents put one verb for another in an otherwise equal passage, by their dictionary forms in order. */
export function countVerbSubstitutions(
  { stream, vocabulary }: Corpus,
  substitutions: readonly Substitution[],
): (one: string, other: string) => number {
  const counts = new Map<string, number>();
  const keyOf = (one: string, other: string): string => (one < other ? `${one} ${other}` : `${other} ${one}`);
  for (const { one, other, rowOfOne, rowOfOther } of substitutions) {
    if (one >= 0 || stream.tag[rowOfOne] !== TAG.VERB || stream.tag[rowOfOther] !== TAG.VERB) continue;
    const key = keyOf(vocabulary.textOf(lemmaOfUnit(one)), vocabulary.textOf(lemmaOfUnit(other)));
    counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  return (one, other) => counts.get(keyOf(one, other)) ?? 0;
}
