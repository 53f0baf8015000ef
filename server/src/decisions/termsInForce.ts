// Terms in force under a chain of termbases: the nearest file that knows a term decides about it.
import { TermIndex, type TermPlace } from '../termbase/termIndex.js';
import {
  areHomonyms,
  type ConceptEntry,
  type PartOfSpeech,
  type Termbase,
  type TermEntry,
} from '../termbase/termbase.js';

/** A term with the decision in force about it. */
export interface DecidedTerm {
  readonly entry: TermEntry;
  /** The concept that names the term, in the nearest file that knows it. */
  readonly concept: ConceptEntry;
  /** The file of that concept. */
  readonly uri: string;
  /**
   * The preferred term in force: the concept's own, unless a nearer file deprecates that in favour of another.
   * It is the entry itself where the term is preferred.
   */
  readonly preferred: TermEntry;
  /** The concept of `preferred`: what the term finally names. */
  readonly names: ConceptEntry;
  /** How near the deciding file is: 0 for the nearest. */
  readonly level: number;
}

/** Look-ups over a chain of termbases, nearest first; it never changes. */
export class TermsInForce {
  private readonly indexes: readonly TermIndex[];
  private readonly decided = new Map<TermEntry, DecidedTerm>();
  /** Every term in force, nearest file first, each file in its order. */
  readonly terms: readonly DecidedTerm[];

  constructor(readonly chain: readonly Termbase[]) {
    this.indexes = chain.map((termbase) => new TermIndex(termbase));
    const terms: DecidedTerm[] = [];
    for (const [level, { concepts }] of chain.entries()) {
      for (const concept of concepts) {
        for (const term of concept.terms) {
          if (this.isOverridden({ term, concept }, level)) continue;
          const decided = this.decide({ term, concept }, level);
          this.decided.set(term, decided);
          terms.push(decided);
        }
      }
    }
    this.terms = terms;
  }

  /** The decisions in force about a text: none, one, or one for each homonym. */
  termsOf(text: string, partOfSpeech?: PartOfSpeech): readonly DecidedTerm[] {
    const found: DecidedTerm[] = [];
    for (const index of this.indexes) {
      for (const { term } of index.placesOf(text, partOfSpeech)) {
        const decided = this.decided.get(term);
        if (decided !== undefined && !found.includes(decided)) found.push(decided);
      }
    }
    return found;
  }

  /** True where a nearer file has an entry of the same spelling that is no homonym. */
  private isOverridden(place: TermPlace, level: number): boolean {
    return this.indexes.slice(0, level).some((index) => {
      return index
        .placesOfKey(place.term.key)
        .some((nearer) => nearer.object === undefined && !areHomonyms(nearer, place));
    });
  }

  private decide(place: TermPlace, level: number): DecidedTerm {
    const { term: entry, concept } = place;
    const base = { entry, concept, uri: this.chain[level]!.uri, level };
    if (entry.status === 'preferred') return { ...base, preferred: entry, names: concept };
    let preferred = concept.preferred;
    let names = concept;
    // Each step goes to a strictly nearer file, so that the walk ends.
    for (let above = level - 1; above >= 0; above--) {
      const next = this.indexes[above]!.placesOf(preferred.text, preferred.partOfSpeech)[0];
      // A nearer decision that leads back to the term itself would make it its own replacement.
      if (next === undefined || next.concept.preferred.text === entry.text) continue;
      preferred = next.concept.preferred;
      names = next.concept;
    }
    return { ...base, preferred, names };
  }
}
