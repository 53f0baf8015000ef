// Pairs of noun terms before the judge: what must not be asked is refused, the rest gets its facts and a score.
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { singularOf } from '../../lexicon/plurals.js';
import { usageMeasures } from '../options.js';
import type { UsageMeasures } from '../options.js';
import { isRefused, readSeparations } from './apart.js';
import type { Separations } from './apart.js';
import { gatherContexts } from './contexts.js';
import type { Contexts } from './contexts.js';
import { countSideBySide } from './coordination.js';
import type { Pair } from './evidence.js';
import { formulaShare } from './formulas.js';
import { isGeneralNoun } from './generalWords.js';
import { SIMILARITY_OF, selfSimilarity, termsToHalve } from './likeness.js';
import { compareTerms, invert } from './neighbours.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import type { Neighbours, VectorIndex } from './neighbours.js';
import type { Occurrences } from './occurrences.js';
import { properShare } from './properNames.js';
import { bestScoreOf, confidenceOf, isGrounded, scoreOf } from './score.js';
import type { Known, Shape } from './score.js';
import type { Segments } from './segment.js';
import type { Siblings } from './siblings.js';
import type { Term } from './terms.js';

/** A pair with all that is known of it. */
export interface JudgedPair extends Pair {
  readonly known: Known;
  readonly score: number;
}

/**
 * Why a pair is not judged: used too seldom on its own, an entry or heading each, too little evidence whatever usage says, too
 * unlike in use, or opposites and the like by the lexicon.
 */
export type Refusal = 'rare' | 'separate' | 'evidence' | 'usage' | 'lexicon';

/** Fewest uses of a term outside longer terms, … */
const FEWEST_USES = 3;
/** … as a share of all its uses. */
const LEAST_ALONE = 0.15;
/** From this share of capitalised uses a term is a proper name. */
const PROPER = 0.5;
/** From this share of uses between the same two words a term stands in a formula. */
const FORMULA = 0.75;
/** So many pairs at most that can only be asked about on request are compared with all other terms, which costs most. */
const MOST_ON_REQUEST = 90;
/** Least score of a pair that is asked about by default, … */
export const THRESHOLD = 0.3;
/** … and of one that is asked about on request. */
export const THRESHOLD_ON_REQUEST = -0.8;

const EMPTY: SparseVector = { ids: new Uint32Array(0), weights: new Float64Array(0) };

/** Judges pairs of one corpus; contexts are gathered once, with the first call. */
export class Judge {
  private gathered: Contexts | undefined;
  private index: VectorIndex | undefined;
  private readonly separations: Separations;
  private readonly proper = new Map<number, boolean>();
  private readonly formulas = new Map<number, boolean>();
  private self: (uses: number) => number = () => 1;

  constructor(
    private readonly corpus: Corpus,
    readonly terms: readonly Term[],
    readonly segments: Segments,
    private readonly occurrences: Occurrences,
    private readonly siblings: Siblings,
    private readonly measures: UsageMeasures = usageMeasures({}),
  ) {
    this.separations = readSeparations(corpus, segments);
  }

  /** The contexts of all terms, by which pairs were judged. */
  get contexts(): Contexts {
    return this.gathered!;
  }

  /** Judges the pairs that are not refused outright, in their order. */
  *judge(pairs: readonly Pair[]): Work<JudgedPair[]> {
    if (this.gathered === undefined) yield* this.gather();
    const able = pairs.filter((pair) => this.refusalOf(pair) === undefined);
    yield;
    return yield* this.weighUp(this.mostPromising(able));
  }

  /** Pairs that may be asked about by default, and of those that can only be on request the ones most worth, in their order. */
  private mostPromising(pairs: readonly Pair[]): Pair[] {
    const nearest = { similarity: 1, rankOfA: 1, rankOfB: 1 };
    const bounded = pairs.map((pair, at) => {
      const words = this.wordsOf(pair);
      const score = pair.evidence[0]?.kind === 'neighbours' ? 0 : bestScoreOf(words, this.shareOf(pair.a, pair.b));
      const fewest = Math.min(this.segments.uses[pair.a]!, this.segments.uses[pair.b]!);
      const maySure =
        score >= THRESHOLD && isGrounded({ ...words, likeness: nearest, self: 1, fewest, formula: false });
      return { pair, at, maySure, worth: confidenceOf(score) * fewest };
    });
    const onRequest = bounded.filter(({ maySure }) => !maySure).sort((x, y) => y.worth - x.worth || x.at - y.at);
    const dropped = new Set(onRequest.slice(MOST_ON_REQUEST));
    return bounded.filter((each) => !dropped.has(each)).map(({ pair }) => pair);
  }

  /** All that is known of pairs, in their order, of refused ones too. */
  *weighUp(pairs: readonly Pair[]): Work<JudgedPair[]> {
    if (this.gathered === undefined) yield* this.gather();
    const { vectors } = this.gathered!;
    this.index ??= invert(vectors);
    const { likeness } = yield* compareTerms(vectors, pairs, [], 0, this.measures.similarity, this.index);
    const wanted = new Set(pairs.map((pair) => this.keyOf(pair)));
    const sideBySide = countSideBySide(this.corpus, this.segments, this.terms, wanted);
    yield;
    return pairs.map((pair) => {
      const key = this.keyOf(pair);
      const fewest = Math.min(this.segments.uses[pair.a]!, this.segments.uses[pair.b]!);
      const known: Known = {
        ...this.wordsOf(pair),
        likeness: likeness.get(key)!,
        self: this.self(fewest),
        sideBySide: sideBySide.get(key) ?? { coordinated: 0, contrasted: 0 },
        siblings: this.separations.siblings(pair.a, pair.b) + this.siblings.ofTerms(pair.a, pair.b),
        properNames: Number(this.isProper(pair.a)) + Number(this.isProper(pair.b)),
        fewest,
        formula: this.isFormula(pair.a) || this.isFormula(pair.b),
      };
      return { ...pair, known, score: scoreOf(known) };
    });
  }

  /** For each of some terms, the nearest of the others of them. */
  *nearestAmong(some: readonly number[], keep: number): Work<Neighbours['nearest']> {
    if (this.gathered === undefined) yield* this.gather();
    const wanted = new Set(some);
    const vectors = this.gathered!.vectors.map((vector, term) => (wanted.has(term) ? vector : EMPTY));
    return (yield* compareTerms(vectors, [], some, keep, this.measures.similarity)).nearest;
  }

  /** The similarity of two terms as a share of what two names of one thing have here; once contexts are gathered. */
  shareOf(a: number, b: number): number {
    const { vectors } = this.gathered!;
    const similarity = SIMILARITY_OF[this.measures.similarity];
    return similarity(vectors[a]!, vectors[b]!) / this.self(Math.min(this.segments.uses[a]!, this.segments.uses[b]!));
  }

  private *gather(): Work<void> {
    const { corpus, segments, terms } = this;
    const halved = termsToHalve(segments.uses);
    const contexts = yield* gatherContexts(corpus, segments, terms.length, halved, this.measures);
    const half = (at: number) => contexts.vectors[terms.length + at]!;
    this.self = selfSimilarity(
      halved.map((term, at) => ({ one: half(2 * at), other: half(2 * at + 1), uses: segments.uses[term]! })),
      SIMILARITY_OF[this.measures.similarity],
    );
    this.gathered = { ...contexts, vectors: contexts.vectors.slice(0, terms.length) };
  }

  /** Why a pair is not judged, or undefined where it is; once contexts are gathered. */
  refusalOf(pair: Pair): Refusal | undefined {
    const { a, b } = pair;
    if (!this.isOften(a) || !this.isOften(b)) return 'rare';
    if (this.separations.areSeparate(a, b)) return 'separate';
    if (pair.evidence[0]?.kind !== 'neighbours') {
      const words = this.wordsOf(pair);
      if (bestScoreOf(words, 1) < THRESHOLD_ON_REQUEST) return 'evidence';
      // Likeness costs little; the places among all neighbours, which the judgement also needs, cost much.
      if (bestScoreOf(words, this.shareOf(a, b)) < THRESHOLD_ON_REQUEST) return 'usage';
    }
    return isRefused(this.terms[a]!, this.terms[b]!) ? 'lexicon' : undefined;
  }

  private isOften(term: number): boolean {
    return this.segments.uses[term]! >= Math.max(FEWEST_USES, LEAST_ALONE * this.terms[term]!.uses);
  }

  private isProper(term: number): boolean {
    let proper = this.proper.get(term);
    if (proper === undefined) {
      const { stream, vocabulary } = this.corpus;
      proper = properShare(stream, vocabulary, this.segments, this.occurrences.of(term)) >= PROPER;
      this.proper.set(term, proper);
    }
    return proper;
  }

  private isFormula(term: number): boolean {
    let formula = this.formulas.get(term);
    if (formula === undefined) {
      formula = formulaShare(this.corpus, this.segments, this.occurrences.of(term)) >= FORMULA;
      this.formulas.set(term, formula);
    }
    return formula;
  }

  private wordsOf({ a, b, evidence }: Pair): Pick<Known, 'evidence' | 'shape' | 'general' | 'sharesWord'> {
    const [one, other] = [this.terms[a]!, this.terms[b]!];
    const general = Number(differsGenerally(one, other)) + Number(differsGenerally(other, one));
    const sharesWord = one.words.some((word) => other.words.includes(word));
    return { evidence, shape: shapeOf(one, other), general, sharesWord };
  }

  private keyOf({ a, b }: { readonly a: number; readonly b: number }): number {
    return a * this.terms.length + b;
  }
}

function shapeOf({ words: a }: Term, { words: b }: Term): Shape {
  const [short, long] = a.length < b.length || a.join('').length < b.join('').length ? [a, b] : [b, a];
  const isWhole = ` ${long.join(' ')} `.includes(` ${short.join(' ')} `);
  // A compound written as one word holds its parts as much as one written as two.
  const isEnd = short.length === 1 && long.length === 1 && long[0]!.endsWith(short[0]!);
  if (isWhole || isEnd) return 'contained';
  return a.length > 1 && b.length > 1 ? 'multiword' : 'words';
}

/**
 * True where what a term has and the other lacks ends in a word of general English (data, as in sensitive data). Singular and
 * plural of one word (detail page, details page) are no choice of words.
 */
function differsGenerally({ words }: Term, { words: others }: Term): boolean {
  const singulars = others.map(singularOf);
  const last = words.filter((word) => !singulars.includes(singularOf(word))).at(-1);
  return last !== undefined && isGeneralNoun(last);
}
