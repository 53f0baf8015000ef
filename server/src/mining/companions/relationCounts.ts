// How often each word stands in each relation in a whole corpus: the margins against which a companion is measured.
import type { Corpus } from '../../corpus/corpus.js';
import { readUses } from '../synonyms/wordUse.js';
import { Grammar } from './grammar.js';
import type { HeadRelation, Partner } from './grammar.js';
import { PartnerKeys } from './partnerKeys.js';

/** The relations that are counted over a corpus; a verb's relations are the same pairs seen from the other side. */
export type CountedRelation = HeadRelation | 'pair';

/** All instances of one relation: how often each word is its first side, and its second. */
interface Margins {
  all: number;
  /** By lemma: verbs, governors or modifiers that come without particle and preposition. */
  readonly plain: Uint32Array;
  /** The others, by {@link PartnerKeys.of}. */
  readonly composed: Map<number, number>;
  /** By lemma of the noun. */
  readonly nouns: Uint32Array;
}

/** What companions are measured against. */
export interface RelationMargins {
  readonly grammar: Grammar;
  readonly keys: PartnerKeys;
  /** True for a row that ends a noun phrase and can have relations. */
  isHead(row: number): boolean;
  /** Instances of a relation in the corpus, or what stands for them. */
  all(relation: CountedRelation): number;
  /** Those with a partner, by {@link PartnerKeys.of}; and those with a noun, by its lemma. */
  ofPartner(relation: CountedRelation, key: number): number;
  ofNoun(relation: CountedRelation, lemma: number): number;
}

/** The relations of a corpus, counted. */
class RelationCounts implements RelationMargins {
  readonly grammar: Grammar;
  readonly keys: PartnerKeys;
  private readonly margins: Readonly<Record<CountedRelation, Margins>>;
  private readonly size: number;

  constructor(corpus: Corpus) {
    const { stream } = corpus;
    this.keys = new PartnerKeys(corpus);
    this.size = this.keys.size;
    this.grammar = new Grammar(corpus, readUses(corpus));
    const empty = (): Margins => {
      return { all: 0, plain: new Uint32Array(this.size), composed: new Map(), nouns: new Uint32Array(this.size) };
    };
    this.margins = { 'object-of': empty(), 'subject-of': empty(), 'governed-by': empty(), pair: empty() };
    const { grammar } = this;
    let head = 0;
    const visit = (relation: HeadRelation, partner: Partner): void =>
      this.count(relation, this.keys.of(partner), stream.lemma[head]!);
    for (let row = 0; row < stream.length; row++) {
      if (stream.counted[row] === 0) continue;
      if (grammar.isModifier(row)) this.count('pair', stream.lemma[row]!, stream.lemma[row + 1]!);
      if (!grammar.isHead(row)) continue;
      head = row;
      grammar.visitHead(row, visit);
    }
  }

  isHead(row: number): boolean {
    return this.grammar.isHead(row);
  }

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

const COUNTS = new WeakMap<Corpus, RelationMargins>();

/** The relations of a corpus, counted when first asked for. */
export function relationCounts(corpus: Corpus): RelationMargins {
  let counts = COUNTS.get(corpus);
  if (counts === undefined) COUNTS.set(corpus, (counts = new RelationCounts(corpus)));
  return counts;
}
