// How often each word stands in each relation in a whole corpus: the margins against which a companion is measured.
import type { Corpus } from '../../corpus/corpus.js';
import { Grammar } from './grammar.js';
import type { HeadRelation, Partner } from './grammar.js';
import { shownWord } from './shownWord.js';

/** The relations that are counted over a corpus; a verb's relations are the same pairs seen from the other side. */
export type CountedRelation = HeadRelation | 'pair';

/** All instances of one relation: how often each word is its first side, and its second. */
interface Margins {
  all: number;
  /** By lemma: verbs, governors or modifiers that come without particle and preposition. */
  readonly plain: Uint32Array;
  /** The others, by {@link RelationCounts.keyOf}. */
  readonly composed: Map<number, number>;
  /** By lemma of the noun. */
  readonly nouns: Uint32Array;
}

/** The relations of a corpus, counted. */
export class RelationCounts {
  readonly grammar: Grammar;
  private readonly margins: Readonly<Record<CountedRelation, Margins>>;
  private readonly size: number;

  constructor(private readonly corpus: Corpus) {
    const { stream, vocabulary } = corpus;
    this.size = vocabulary.size;
    this.grammar = new Grammar(corpus);
    const empty = (): Margins => {
      return { all: 0, plain: new Uint32Array(this.size), composed: new Map(), nouns: new Uint32Array(this.size) };
    };
    this.margins = { 'object-of': empty(), 'subject-of': empty(), 'governed-by': empty(), pair: empty() };
    const { grammar } = this;
    let head = 0;
    const visit = (relation: HeadRelation, partner: Partner): void =>
      this.count(relation, this.keyOf(partner), stream.lemma[head]!);
    for (let row = 0; row < stream.length; row++) {
      if (stream.counted[row] === 0) continue;
      if (grammar.isModifier(row)) this.count('pair', stream.lemma[row]!, stream.lemma[row + 1]!);
      if (!grammar.isHead(row)) continue;
      head = row;
      grammar.visitHead(row, visit);
    }
  }

  /** The identity of a partner: its dictionary form with its particle and preposition. */
  keyOf({ row, particle, preposition }: Partner): number {
    const { lemma, fold } = this.corpus.stream;
    const behind = particle === undefined ? 0 : fold[particle]! + 1;
    const before = preposition === undefined ? 0 : fold[preposition]! + 1;
    return lemma[row]! + (this.size + 1) * (behind + (this.size + 1) * before);
  }

  /** The words of a partner: “set up”, “store in”. */
  textOf(key: number): string {
    const { corpus } = this;
    const base = this.size + 1;
    const rest = Math.floor(key / base);
    const behind = [(rest % base) - 1, Math.floor(rest / base) - 1].filter((word) => word >= 0);
    return [shownWord(corpus, key % base), ...behind.map((word) => corpus.vocabulary.textOf(word))].join(' ');
  }

  /** Instances of a relation in the corpus. */
  all(relation: CountedRelation): number {
    return this.margins[relation].all;
  }

  ofPartner(relation: CountedRelation, key: number): number {
    const { plain, composed } = this.margins[relation];
    return key < this.size ? plain[key]! : (composed.get(key) ?? 0);
  }

  ofNoun(relation: CountedRelation, lemma: number): number {
    return this.margins[relation].nouns[lemma]!;
  }

  private count(relation: CountedRelation, partner: number, noun: number): void {
    const margins = this.margins[relation];
    margins.all++;
    margins.nouns[noun]!++;
    if (partner < this.size) margins.plain[partner]!++;
    else margins.composed.set(partner, (margins.composed.get(partner) ?? 0) + 1);
  }
}

const COUNTS = new WeakMap<Corpus, RelationCounts>();

/** The relations of a corpus, counted when first asked for. */
export function relationCounts(corpus: Corpus): RelationCounts {
  let counts = COUNTS.get(corpus);
  if (counts === undefined) COUNTS.set(corpus, (counts = new RelationCounts(corpus)));
  return counts;
}
