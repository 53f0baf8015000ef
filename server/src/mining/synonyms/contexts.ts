// The contexts of terms: neighbouring words and grammatical relations, counted into one sparse vector a term.
import { PairTable } from '../../base/pairTable.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import { dampedTfIdf } from '../../corpus/statistics/weights.js';
import type { TokenStream } from '../../corpus/stream.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import type { Segments } from './segment.js';

/** The kinds of context. Words are compared by their dictionary forms. */
const Relation = {
  before: 1,
  after: 2,
  twoBefore: 3,
  twoAfter: 4,
  objectOf: 5,
  subjectOf: 6,
  governedBy: 7,
  modifiedBy: 8,
  modifies: 9,
} as const;

/** Stands for the start or end of a sentence among neighbouring words. */
const EDGE = 0;
/** How far to the left of a noun its verb may stand, in words. */
const REACH = 5;

/** Context vectors of terms, with the counts they come from. */
export interface Contexts {
  /** One vector a term; empty where the term was never met. */
  readonly vectors: readonly SparseVector[];
  /** In words, what a feature is, for showing: “rotate ___”. */
  describe(feature: number): string;
}

/** Gathers the contexts of every occurrence of every term. Weights: ln(1 + c) · ln(n/df) over the terms met. */
export function* gatherContexts(corpus: Corpus, segments: Segments, terms: number): Work<Contexts> {
  const { stream, vocabulary } = corpus;
  const features = new PairTable();
  const pairs = new PairTable();
  const cells = new PairTable();
  const counts: number[] = [];
  const put = (term: number, relation: number, word: number): void => {
    const cell = cells.idOf(term, features.idOf(relation, word));
    counts[cell] = (counts[cell] ?? 0) + 1;
  };
  for (let i = 0; i < segments.count; i++) {
    const term = segments.term[i]!;
    const first = segments.first[i]!;
    const end = first + segments.length[i]!;
    const before = neighbour(stream, first, -1);
    const after = neighbour(stream, end - 1, 1);
    put(term, Relation.before, before);
    put(term, Relation.after, after);
    if (before !== EDGE) put(term, Relation.twoBefore, pairs.idOf(neighbour(stream, first - 1, -1), before));
    if (after !== EDGE) put(term, Relation.twoAfter, pairs.idOf(after, neighbour(stream, end, 1)));
    relate(stream, first, end, (relation, word) => put(term, relation, word));
    if (i % 20_000 === 0) yield;
  }
  const describe = (feature: number): string => {
    const relation = features.leftOf(feature);
    const code = features.rightOf(feature);
    const word = (id: number): string => (id === EDGE ? '' : vocabulary.textOf(id - 1));
    if (relation === Relation.twoBefore) return `${word(pairs.leftOf(code))} ${word(pairs.rightOf(code))} ___`.trim();
    if (relation === Relation.twoAfter) return `___ ${word(pairs.leftOf(code))} ${word(pairs.rightOf(code))}`.trim();
    if (relation === Relation.after || relation === Relation.modifies) return `___ ${word(code)}`.trim();
    if (relation === Relation.subjectOf) return `___ ${word(code)}`;
    return `${word(code)} ___`.trim();
  };
  return { vectors: weigh(cells, counts, features.size, terms), describe };
}

/** The dictionary form of the counted word beside a row plus 1, or {@link EDGE} at a sentence's or block's end. */
function neighbour(stream: TokenStream, row: number, step: -1 | 1): number {
  const at = row + step;
  const later = step === 1 ? at : row;
  if (at < 0 || at >= stream.length || (stream.flags[later]! & TokenFlag.sentenceStart) !== 0) return EDGE;
  return stream.lemma[at]! + 1;
}

/** Grammatical relations read off the tags around a noun phrase. */
function relate(stream: TokenStream, first: number, end: number, put: (relation: number, word: number) => void): void {
  const { tag, flags, lemma } = stream;
  const starts = (row: number): boolean => (flags[row]! & TokenFlag.sentenceStart) !== 0;
  let row = first - 1;
  if (row >= 0 && !starts(first)) {
    if (tag[row] === TAG.ADJ || isNoun(tag[row]!)) put(Relation.modifiedBy, lemma[row]! + 1);
    for (let steps = 0; steps < REACH && row >= 0 && !starts(row + 1) && isPhrasePart(tag[row]!); steps++) row--;
    if (row >= 0 && !starts(row + 1)) {
      if (tag[row] === TAG.VERB) put(Relation.objectOf, lemma[row]! + 1);
      else if (tag[row] === TAG.ADP && row > 0 && !starts(row) && isContentTag(tag[row - 1]!)) {
        put(Relation.governedBy, lemma[row - 1]! + 1);
      }
    }
  }
  if (end >= stream.length || starts(end)) return;
  if (isNoun(tag[end]!)) put(Relation.modifies, lemma[end]! + 1);
  let passive = false;
  for (let at = end; at < Math.min(end + REACH, stream.length) && !starts(at); at++) {
    if (tag[at] === TAG.VERB) {
      put(passive ? Relation.objectOf : Relation.subjectOf, lemma[at]! + 1);
      return;
    }
    if (tag[at] === TAG.AUX) passive = true;
    else if (tag[at] !== TAG.ADV && tag[at] !== TAG.PART) return;
  }
}

function isNoun(tag: number): boolean {
  return tag === TAG.NOUN || tag === TAG.PROPN;
}

function isContentTag(tag: number): boolean {
  return isNoun(tag) || tag === TAG.VERB || tag === TAG.ADJ;
}

/** Words that stand between a verb or preposition and the noun it governs. */
function isPhrasePart(tag: number): boolean {
  return tag === TAG.DET || tag === TAG.ADJ || tag === TAG.NUM || tag === TAG.PRON || isNoun(tag);
}

function weigh(cells: PairTable, counts: readonly number[], features: number, terms: number): SparseVector[] {
  const df = new Uint32Array(features);
  const sizes = new Uint32Array(terms);
  for (let cell = 0; cell < cells.size; cell++) df[cells.rightOf(cell)]!++;
  for (let cell = 0; cell < cells.size; cell++) if (df[cells.rightOf(cell)]! > 1) sizes[cells.leftOf(cell)]!++;
  const met = sizes.reduce((sum, size) => sum + (size > 0 ? 1 : 0), 0);
  const rows = Array.from(sizes, (size) => ({
    order: new Uint32Array(size),
    weight: new Float64Array(size),
    filled: 0,
  }));
  for (let cell = 0; cell < cells.size; cell++) {
    const feature = cells.rightOf(cell);
    // A feature of one term alone is shared by no two.
    if (df[feature]! < 2) continue;
    const row = rows[cells.leftOf(cell)]!;
    row.order[row.filled] = feature;
    row.weight[row.filled++] = dampedTfIdf(counts[cell]!, Math.min(df[feature]!, met), met);
  }
  return rows.map(({ order, weight }) => sortedVector(order, weight));
}

function sortedVector(ids: Uint32Array, weights: Float64Array): SparseVector {
  const order = Uint32Array.from(ids.keys()).sort((a, b) => ids[a]! - ids[b]!);
  return { ids: Uint32Array.from(order, (at) => ids[at]!), weights: Float64Array.from(order, (at) => weights[at]!) };
}
