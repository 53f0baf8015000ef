// Terms whose parts do not predict the whole (“cold start”): the words attract one another, and their contexts tell another thing.
import { compareCodeUnits } from '../../base/order.js';
import { rowsOfSequence } from '../../corpus/concordance.js';
import type { Corpus } from '../../corpus/corpus.js';
import { LONGEST_GRAM } from '../../corpus/grams.js';
import { npmi } from '../../corpus/statistics/association.js';
import { cosine, sparseVector } from '../../corpus/statistics/similarity.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import { ppmiWeight } from '../../corpus/statistics/weights.js';
import { followsOn, isContent } from '../../corpus/stream.js';
import { TokenFlag } from '../../tokens/tokens.js';
import type { Use } from '../places.js';
import { WINDOW } from './coOccurrence.js';
import { relationCounts } from './relationCounts.js';

/** How far the parts of a term of several words predict the whole. */
export interface Wholeness {
  /** In lower case. */
  readonly text: string;
  readonly uses: number;
  /** NPMI of the beginning and the rest, at the place where they hold together least (Bouma 2009), from −1 to 1. */
  readonly attraction: number;
  /**
   * Cosine of the term's contexts with the sum of its parts' contexts elsewhere (Katz & Giesbrecht 2006; Mitchell & Lapata 2008,
   * eq. 5), as a share of the cosine of two halves of the term's own uses: about 1 where the parts predict the whole.
   */
  readonly predicted: number;
  /** True where it is kept whole: the words of a use are not uses of its parts. */
  readonly keptWhole: boolean;
}

/** Below so many uses contexts tell nothing. */
const FEWEST_USES = 12;
/** The least attraction, and … */
const LEAST_ATTRACTION = 0.4;
/** … the most prediction of a term that is kept whole. */
const MOST_PREDICTED = 0.3;
/** Below this two halves of one term's uses are too unlike to be a yardstick. */
const LEAST_SELF = 0.05;

/** Measures a term given by the lower-case words of one form; undefined for one word, or too few uses. */
export function wholenessOf(corpus: Corpus, words: readonly number[]): Wholeness | undefined {
  const { stream, vocabulary } = corpus;
  if (words.length < 2) return undefined;
  const rows = rowsOfSequence(stream, words);
  if (rows.length < FEWEST_USES) return undefined;
  const contexts = contextsOf(corpus);
  const length = words.length;
  const own = new Set(rows.flatMap((row) => words.map((_, at) => row + at)));
  const parts = words.map((word) =>
    contexts.vector(
      [...stream.rowsOf(word)].filter((row) => !own.has(row)),
      1,
    ),
  );
  const whole = contexts.vector(rows, length);
  const self = Math.max(
    LEAST_SELF,
    selfCosine(rows, (some) => contexts.vector(some, length)),
  );
  const predicted = cosine(whole, sumOf(parts)) / self;
  const attraction = leastAttraction(corpus, words, rows.length);
  return {
    text: words.map((word) => vocabulary.textOf(word)).join(' '),
    uses: rows.length,
    attraction,
    predicted,
    keptWhole: attraction >= LEAST_ATTRACTION && predicted <= MOST_PREDICTED,
  };
}

/** The longer terms that hold some uses of a term and are kept whole, most used first, ties by code units. */
export function wholesAround(corpus: Corpus, uses: readonly Use[]): Wholeness[] {
  const { stream } = corpus;
  const { grammar } = relationCounts(corpus);
  const isPart = (row: number): boolean => row >= 0 && grammar.isNominal(row) && isContent(stream, row);
  const counts = new Map<string, { words: number[]; count: number }>();
  for (const { row, length } of uses) {
    for (let before = 0; length + before <= LONGEST_GRAM; before++) {
      if (before > 0 && !(isPart(row - before) && followsOn(stream, row - before + 1))) break;
      for (let after = before === 0 ? 1 : 0; length + before + after <= LONGEST_GRAM; after++) {
        const last = row + length + after - 1;
        if (after > 0 && !(last < stream.length && followsOn(stream, last) && isPart(last))) break;
        if (!grammar.isNoun(last)) continue;
        const words = [...stream.fold.subarray(row - before, last + 1)];
        const key = words.join(' ');
        const known = counts.get(key);
        if (known === undefined) counts.set(key, { words, count: 1 });
        else known.count++;
      }
    }
  }
  return [...counts.values()]
    .filter(({ count }) => count >= FEWEST_USES)
    .flatMap(({ words }) => wholenessOf(corpus, words) ?? [])
    .filter(({ keptWhole }) => keptWhole)
    .sort((a, b) => b.uses - a.uses || compareCodeUnits(a.text, b.text));
}

/** The uses that stand in none of the terms that are kept whole: the longest match holds its words. */
export function outsideWholes(corpus: Corpus, uses: readonly Use[], wholes: readonly Wholeness[]): Use[] {
  const { stream, vocabulary } = corpus;
  const held = new Set<number>();
  for (const { text } of wholes) {
    const words = text.split(' ').map((word) => vocabulary.find(word)!);
    for (const row of rowsOfSequence(stream, words)) words.forEach((_, at) => held.add(row + at));
  }
  return uses.filter(({ row }) => !held.has(row));
}

/** How alike two halves of a term's uses are, on average over several ways to halve them. */
function selfCosine(rows: readonly number[], vector: (rows: readonly number[]) => SparseVector): number {
  const cosines = [1, 2, 4].map((stretch) => {
    const half = (turn: number): SparseVector => vector(rows.filter((_, at) => Math.floor(at / stretch) % 2 === turn));
    return cosine(half(0), half(1));
  });
  return cosines.reduce((sum, each) => sum + each, 0) / cosines.length;
}

function leastAttraction(corpus: Corpus, words: readonly number[], c12: number): number {
  const n = corpus.words;
  const usesOf = (some: readonly number[]): number => rowsOfSequence(corpus.stream, some).length;
  let least = 1;
  for (let cut = 1; cut < words.length; cut++) {
    const [c1, c2] = [usesOf(words.slice(0, cut)), usesOf(words.slice(cut))];
    least = Math.min(least, npmi({ c1, c2, c12, n }));
  }
  return least;
}

/** Contexts of uses by the words of content around them, weighed by PPMI. */
interface WordContexts {
  vector(rows: readonly number[], length: number): SparseVector;
}

const CONTEXTS = new WeakMap<Corpus, WordContexts>();

function contextsOf(corpus: Corpus): WordContexts {
  let known = CONTEXTS.get(corpus);
  if (known === undefined) CONTEXTS.set(corpus, (known = makeContexts(corpus)));
  return known;
}

function makeContexts({ stream, vocabulary }: Corpus): WordContexts {
  const totals = new Uint32Array(vocabulary.size);
  let all = 0;
  for (let row = 0; row < stream.length; row++) {
    if (!isContent(stream, row)) continue;
    totals[stream.lemma[row]!]!++;
    all++;
  }
  const isStart = (row: number): boolean => (stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
  return {
    vector: (rows, length) => {
      const counts = new Map<number, number>();
      let size = 0;
      const add = (row: number): void => {
        if (!isContent(stream, row)) return;
        counts.set(stream.lemma[row]!, (counts.get(stream.lemma[row]!) ?? 0) + 1);
        size++;
      };
      for (const first of rows) {
        for (let row = first, steps = 0; steps < WINDOW && row > 0 && !isStart(row); steps++) add(--row);
        for (let row = first + length, steps = 0; steps < WINDOW && row < stream.length && !isStart(row); steps++)
          add(row++);
      }
      return sparseVector(
        [...counts]
          .map(([word, c12]) => {
            const c2 = Math.max(totals[word]!, c12);
            return [word, ppmiWeight({ c1: size, c2, c12, n: Math.max(all, size) })] as const;
          })
          .filter(([, weight]) => weight > 0),
      );
    },
  };
}

/** The sum of vectors brought to one length each, so that a common part does not drown a rare one. */
function sumOf(vectors: readonly SparseVector[]): SparseVector {
  const sum = new Map<number, number>();
  for (const { ids, weights } of vectors) {
    const norm = Math.sqrt(weights.reduce((total, weight) => total + weight * weight, 0)) || 1;
    ids.forEach((id, at) => sum.set(id, (sum.get(id) ?? 0) + weights[at]! / norm));
  }
  return sparseVector(sum);
}
