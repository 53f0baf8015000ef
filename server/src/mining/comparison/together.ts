// Where two terms meet: in one sentence, and as whole texts of links to one place.
import { compareCodeUnits } from '../../base/order.js';
import type { Corpus } from '../../corpus/corpus.js';
import { presenceInformation } from '../../corpus/statistics/probability.js';
import { FactFlag } from '../../facts/flags.js';
import { countSegments, cutInto } from '../companions/segments.js';
import { resolveTarget } from '../synonyms/linkTargets.js';
import type { ComparedTerm } from './comparison.js';

/** A place to which links with either term lead. */
export interface SharedTarget {
  /** As an address without extension, with its anchor. */
  readonly target: string;
  readonly links: readonly [number, number];
}

/** Where both terms stand together. */
export interface Together {
  /** Sentences of the corpus that count, those with each of the two, and those with both. */
  readonly sentences: number;
  readonly withA: number;
  readonly withB: number;
  readonly withBoth: number;
  /** I(a; b) in bits, of the two terms' presence in a sentence, from the smoothed counts. */
  readonly mutualInformation: number;
  /** Rows of the first term's uses in sentences that hold both, ascending. */
  readonly rows: readonly number[];
  /** Most links first, ties by code units. */
  readonly targets: readonly SharedTarget[];
}

/** Reads the sentences and links of a corpus for two terms. */
export function readTogether(corpus: Corpus, terms: readonly [ComparedTerm, ComparedTerm]): Together {
  const of = cutInto(corpus.stream, 'sentence');
  const sentences = countSegments(corpus.stream, of);
  const sentencesOf = terms.map(({ uses }) => new Set(uses.map(({ row }) => of[row]!)));
  const rows = terms[0].uses.map(({ row }) => row).filter((row) => sentencesOf[1]!.has(of[row]!));
  const [c1, c2] = [sentencesOf[0]!.size, sentencesOf[1]!.size];
  const c12 = new Set(rows.map((row) => of[row]!)).size;
  const { mutual } = presenceInformation({ c1, c2, c12, n: Math.max(1, sentences) });
  return {
    ...{ sentences, withA: c1, withB: c2, withBoth: c12, mutualInformation: mutual, rows },
    targets: sharedTargets(corpus, terms),
  };
}

function sharedTargets(corpus: Corpus, terms: readonly [ComparedTerm, ComparedTerm]): SharedTarget[] {
  const { stream } = corpus;
  const starts = terms.map(({ uses }) => new Map(uses.map(({ row, length }) => [row, length])));
  const found = new Map<string, [number, number]>();
  corpus.documents.forEach(({ uri, facts }, document) => {
    const offset = stream.documentFirst[document]!;
    for (const { firstToken, endToken, target } of facts.links) {
      let first = offset + firstToken;
      const end = offset + endToken;
      while (first < end && (stream.flags[first]! & FactFlag.functionWord) !== 0) first++;
      const side = starts.findIndex((rows) => rows.get(first) === end - first);
      if (side < 0) continue;
      const address = resolveTarget(uri, target);
      const links = found.get(address) ?? [0, 0];
      links[side]!++;
      found.set(address, links);
    }
  });
  return [...found]
    .filter(([, [a, b]]) => a > 0 && b > 0)
    .map(([target, links]) => ({ target, links }))
    .sort((x, y) => y.links[0] + y.links[1] - x.links[0] - x.links[1] || compareCodeUnits(x.target, y.target));
}
