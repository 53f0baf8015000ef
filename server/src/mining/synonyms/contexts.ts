// The contexts of terms: neighbouring words and grammatical relations, counted into one sparse vector a term.
import { compareCodeUnits } from '../../base/order.js';
import { PairTable } from '../../base/pairTable.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import { isContent } from '../../corpus/stream.js';
import type { TokenStream } from '../../corpus/stream.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import { usageMeasures } from '../options.js';
import type { UsageMeasures, Weighting } from '../options.js';
import { MetFeatures, addUp } from './contextCells.js';
import type { ContextCells } from './contextCells.js';
import { weigher } from './contextWeights.js';
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
  near: 10,
} as const;

/** Stands for the start or end of a sentence among neighbouring words. */
const EDGE = 0;
/** The largest share of terms that a feature may have. */
const COMMONEST = 0.1;
/** In a small corpus so many terms may share a feature all the same. */
const ALWAYS_TOLD = 25;
/** Adjacent and syntactic contexts of one occurrence, at most. */
const MOST_RELATIONS = 8;
/** How far to the left of a noun its verb may stand, in words. */
const REACH = 5;

/** Context vectors of terms, with the counts they come from. */
export interface Contexts {
  /** One vector a term, then one for each half of the halved terms; empty where the term was never met. */
  readonly vectors: readonly SparseVector[];
  /** In words, what a feature is, for showing: “rotate ___”; undefined where it says nothing to a reader. */
  describe(feature: number): string | undefined;
}

/**
 * Gathers the contexts of every occurrence of every term. Usual weights: ln(1 + c) · ln(n/df) over the terms met.
 * @param halved terms that get two more vectors each, in this order: of their uses in every other of their documents, and
 *   of the rest; they show how alike two names of one thing are used here. They count in no df.
 */
export function* gatherContexts(
  corpus: Corpus,
  segments: Segments,
  terms: number,
  halved: readonly number[] = [],
  measures: UsageMeasures = usageMeasures({}),
): Work<Contexts> {
  const { stream } = corpus;
  const features = new PairTable();
  const pairs = new PairTable();
  const met = yield* readFeatures(stream, segments, features, pairs, measures);
  const halves = halvesOf(stream, segments, terms, halved);
  const cells = addUp(met, features.size, segments, terms + 2 * halved.length, (i) => halves.of(i));
  yield;
  const vectors = weigh(cells, features.size, terms, measures.weighting);
  yield;
  return { vectors, describe: describer(corpus, features, pairs) };
}

/**
 * Reads what stands around every occurrence.
 * @param features takes each feature: its relation and its word, or its pair of words
 * @param pairs takes each pair of neighbouring words
 */
function* readFeatures(
  stream: TokenStream,
  segments: Segments,
  features: PairTable,
  pairs: PairTable,
  measures: UsageMeasures,
): Work<MetFeatures> {
  const isAdjacent = measures.contexts === 'all' || measures.contexts === 'adjacent';
  const isSyntactic = measures.contexts === 'all' || measures.contexts === 'syntactic';
  const isWindow = measures.contexts === 'window';
  const met = new MetFeatures(segments.count, isWindow ? measures.windowWords : MOST_RELATIONS);
  const put = (relation: number, word: number): void => met.add(features.idOf(relation, word));
  const putNear = (word: number): void => put(Relation.near, word);
  for (let i = 0; i < segments.count; i++) {
    const first = segments.first[i]!;
    const end = first + segments.length[i]!;
    if (isAdjacent) {
      const before = neighbour(stream, first, -1);
      const after = neighbour(stream, end - 1, 1);
      put(Relation.before, before);
      put(Relation.after, after);
      if (before !== EDGE) put(Relation.twoBefore, pairs.idOf(neighbour(stream, first - 1, -1), before));
      if (after !== EDGE) put(Relation.twoAfter, pairs.idOf(after, neighbour(stream, end, 1)));
    }
    if (isSyntactic) relate(stream, first, end, put);
    if (isWindow) visitWindow(stream, first, end, measures.windowWords, putNear);
    met.endOccurrence();
    if (i % 20_000 === 0) yield;
  }
  return met;
}

function describer(corpus: Corpus, features: PairTable, pairs: PairTable): Contexts['describe'] {
  let shown: Uint32Array | undefined;
  const word = (id: number): string => {
    shown ??= commonForms(corpus);
    return id === EDGE ? '' : corpus.vocabulary.textOf(shown[id - 1]!);
  };
  return (feature) => {
    const relation = features.leftOf(feature);
    const code = features.rightOf(feature);
    switch (relation) {
      case Relation.near:
        return frame(`${word(code)} …`, '');
      case Relation.twoBefore:
        return frame(`${word(pairs.leftOf(code))} ${word(pairs.rightOf(code))}`, '');
      case Relation.twoAfter:
        return frame('', `${word(pairs.leftOf(code))} ${word(pairs.rightOf(code))}`);
      case Relation.after:
      case Relation.modifies:
      case Relation.subjectOf:
        return frame('', word(code));
      default:
        return frame(word(code), '');
    }
  };
}

/** The commonest written form of each dictionary form: readers know “qualified”, not “qualify”, where that is what stands. */
function commonForms({ stream, vocabulary }: Corpus): Uint32Array {
  const uses = new Uint32Array(vocabulary.size);
  for (let row = 0; row < stream.length; row++) uses[stream.fold[row]!]!++;
  const shown = Uint32Array.from({ length: vocabulary.size }, (_, word) => word);
  const most = new Uint32Array(vocabulary.size);
  for (let row = 0; row < stream.length; row++) {
    const fold = stream.fold[row]!;
    const lemma = stream.lemma[row]!;
    const better =
      uses[fold]! - most[lemma]! || compareCodeUnits(vocabulary.textOf(shown[lemma]!), vocabulary.textOf(fold));
    if (better <= 0) continue;
    shown[lemma] = fold;
    most[lemma] = uses[fold]!;
  }
  return shown;
}

/** A frame to show, or undefined where it holds signs or stand-ins for code. */
function frame(before: string, after: string): string | undefined {
  const words = `${before} ${after}`.trim();
  if (!/^[\p{L}][\p{L}'’ -]*$/u.test(words)) return undefined;
  return before === '' ? `___ ${words}` : `${words} ___`;
}

/** Which half, as a term beyond the last, an occurrence of a halved term belongs to: its documents by turns. */
function halvesOf(
  stream: TokenStream,
  segments: Segments,
  terms: number,
  halved: readonly number[],
): { of(occurrence: number): number | undefined } {
  const placeOf = new Map(halved.map((term, place) => [term, place]));
  const last = new Map<number, { document: number; turn: 0 | 1 }>();
  return {
    of: (occurrence) => {
      const term = segments.term[occurrence]!;
      const place = placeOf.get(term);
      if (place === undefined) return undefined;
      const document = stream.documentOf(segments.first[occurrence]!);
      let state = last.get(term);
      if (state === undefined) last.set(term, (state = { document, turn: 0 }));
      else if (state.document !== document) {
        state.document = document;
        state.turn = state.turn === 0 ? 1 : 0;
      }
      return terms + 2 * place + state.turn;
    },
  };
}

/** The dictionary form of the counted word beside a row plus 1, or {@link EDGE} at a sentence's or block's end. */
function neighbour(stream: TokenStream, row: number, step: -1 | 1): number {
  const at = row + step;
  const later = step === 1 ? at : row;
  if (at < 0 || at >= stream.length || (stream.flags[later]! & TokenFlag.sentenceStart) !== 0) return EDGE;
  return stream.lemma[at]! + 1;
}

/** The words of content within so many words of a term, in its sentence. */
function visitWindow(
  stream: TokenStream,
  first: number,
  end: number,
  width: number,
  visit: (word: number) => void,
): void {
  const starts = (row: number): boolean => (stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
  for (let row = first, steps = 0; steps < width && row > 0 && !starts(row); steps++)
    if (isContent(stream, --row)) visit(stream.lemma[row]! + 1);
  for (let row = end, steps = 0; steps < width && row < stream.length && !starts(row); row++, steps++)
    if (isContent(stream, row)) visit(stream.lemma[row]! + 1);
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

/** Weighs the cells row by row; the first `terms` rows are terms and make the df. */
function weigh(cells: ContextCells, features: number, terms: number, weighting: Weighting): SparseVector[] {
  const { rowFirst } = cells;
  const rows = rowFirst.length - 1;
  const df = new Uint32Array(features);
  for (let cell = 0; cell < rowFirst[terms]!; cell++) df[cells.rightOf(cell)]!++;
  let met = 0;
  for (let term = 0; term < terms; term++) if (rowFirst[term + 1]! > rowFirst[term]!) met++;
  // A feature of one term alone is shared by no two; one that most terms have says next to nothing and costs the most.
  const most = Math.max(ALWAYS_TOLD, met * COMMONEST);
  const says = (feature: number): boolean => df[feature]! >= 2 && df[feature]! <= most;
  const weight = weigher(weighting, cells, (cell) => cells.countOf(cell), { features, terms, rows, df, met });
  const vectors: SparseVector[] = [];
  for (let row = 0; row < rows; row++) {
    let size = 0;
    for (let cell = rowFirst[row]!; cell < rowFirst[row + 1]!; cell++) if (says(cells.rightOf(cell))) size++;
    const vector = { ids: new Uint32Array(size), weights: new Float64Array(size) };
    let at = 0;
    for (let cell = rowFirst[row]!; cell < rowFirst[row + 1]!; cell++) {
      const feature = cells.rightOf(cell);
      if (!says(feature)) continue;
      vector.ids[at] = feature;
      vector.weights[at++] = weight(cell);
    }
    vectors.push(vector);
  }
  return vectors;
}
