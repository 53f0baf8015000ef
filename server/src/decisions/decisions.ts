// What is decided for one part of the tree: statuses of terms, pairs kept apart, questions put off.
import type { Span } from '../base/span.js';
import type { Question, QuestionTerm } from '../mining/question.js';
import type { ApartEntry, ConceptEntry, LaterEntry, PartOfSpeech, Termbase, TermStatus } from '../termbase/termbase.js';
import { GroupIndex } from './groupIndex.js';
import { TermsInForce, type DecidedTerm } from './termsInForce.js';

/** How two terms stand to each other, where a termbase says it. */
export type Relation = 'one-concept' | 'two-concepts';

/** A decided concept under a chain of termbases, with those of its terms that no nearer file overrides. */
export interface DecidedConcept {
  readonly concept: ConceptEntry;
  readonly uri: string;
  /** Preferred, admitted, deprecated; in the order of the file. */
  readonly terms: readonly DecidedTerm[];
}

/** Where the file says what it says. */
export interface DecisionPlace {
  readonly uri: string;
  readonly span: Span;
}

/** A question is asked again when its terms have come to this many times the uses they had when it was put off. */
const GROWTH_TO_ASK_AGAIN = 2;

/** The decisions of a chain of termbases, nearest first; immutable. */
export class Decisions {
  private readonly inForce: TermsInForce;
  private readonly apart: GroupIndex<ApartEntry>;
  private readonly later: GroupIndex<LaterEntry>;
  /** All terms in force that finally name a concept, of whichever file. */
  private readonly namesOf = new Map<ConceptEntry, string[]>();
  /** Decided concepts, nearest file first, each file in its order; overridden terms and emptied concepts are left out. */
  readonly concepts: readonly DecidedConcept[];

  constructor(readonly chain: readonly Termbase[]) {
    this.inForce = new TermsInForce(chain);
    this.apart = new GroupIndex(chain, ({ apart }) => apart);
    this.later = new GroupIndex(chain, ({ later }) => later);
    const concepts = new Map<ConceptEntry, { concept: ConceptEntry; uri: string; terms: DecidedTerm[] }>();
    for (const term of this.inForce.terms) {
      const names = this.namesOf.get(term.names);
      if (names === undefined) this.namesOf.set(term.names, [term.entry.text]);
      else names.push(term.entry.text);
      const known = concepts.get(term.concept);
      if (known === undefined) concepts.set(term.concept, { concept: term.concept, uri: term.uri, terms: [term] });
      else known.terms.push(term);
    }
    this.concepts = [...concepts.values()];
  }

  /** Every term in force. */
  get terms(): readonly DecidedTerm[] {
    return this.inForce.terms;
  }

  /** The decisions about a text: one for each homonym that its part of speech, if given, leaves. */
  termsOf(text: string, partOfSpeech?: PartOfSpeech): readonly DecidedTerm[] {
    return this.inForce.termsOf(text, partOfSpeech);
  }

  /** The decision about a text, or undefined where there is none or homonyms leave it open. */
  termOf(text: string, partOfSpeech?: PartOfSpeech): DecidedTerm | undefined {
    const terms = this.termsOf(text, partOfSpeech);
    return terms.length === 1 ? terms[0] : undefined;
  }

  /** The status of a text as a term; undefined as for {@link termOf}. */
  statusOf(text: string, partOfSpeech?: PartOfSpeech): TermStatus | undefined {
    return this.termOf(text, partOfSpeech)?.entry.status;
  }

  /** The concept that a text names; undefined as for {@link termOf}. */
  conceptOf(text: string, partOfSpeech?: PartOfSpeech): ConceptEntry | undefined {
    return this.termOf(text, partOfSpeech)?.names;
  }

  /** The decisions about a question's term: those of its text, else those of the most used form that has any. */
  termsOfQuestionTerm(term: QuestionTerm): readonly DecidedTerm[] {
    for (const text of spellingsOf(term)) {
      const terms = this.termsOf(text, term.partOfSpeech);
      if (terms.length > 0) return terms;
    }
    return [];
  }

  /**
   * How two terms of a question stand to each other. Where files of the chain disagree, the nearest one that knows both wins.
   * Terms of two different concepts are two concepts without being listed under `apart`; what is kept apart from one term
   * of a concept is kept apart from all of them.
   */
  relationOf(a: QuestionTerm, b: QuestionTerm): Relation | undefined {
    const ofA = this.termsOfQuestionTerm(a);
    const ofB = this.termsOfQuestionTerm(b);
    const together = ofA.flatMap((x) => ofB.filter((y) => x.names === y.names).map((y) => Math.max(x.level, y.level)));
    const names = [a, b].map(spellingsOf);
    // A nearer file may split a concept; then its other terms say nothing about which half they belong to.
    if (together.length === 0) [ofA, ofB].forEach((terms, side) => names[side]!.push(...this.synonymsOf(terms)));
    const apart = this.apart.levelOf(names);
    if (apart !== undefined && together.every((level) => apart <= level)) return 'two-concepts';
    if (together.length > 0) return 'one-concept';
    return ofA.length > 0 && ofB.length > 0 ? 'two-concepts' : undefined;
  }

  private synonymsOf(terms: readonly DecidedTerm[]): string[] {
    return terms.flatMap(({ names }) => this.namesOf.get(names) ?? []);
  }

  /** The `later` entry that puts a question off, unless its terms have since come to twice the uses. */
  putOff(question: Question): DecisionPlace | undefined {
    const uses = question.terms.reduce((sum, term) => sum + term.uses, 0);
    for (const { uri, entry } of this.later.entriesWith(question.terms.map(spellingsOf))) {
      const grown = entry.uses !== undefined && uses >= GROWTH_TO_ASK_AGAIN * Math.max(1, entry.uses);
      if (!grown) return { uri, span: entry.span };
    }
    return undefined;
  }
}

/** A question's term as written: its text, then its forms, most used first as they come. */
function spellingsOf(term: QuestionTerm): string[] {
  return [term.text, ...term.forms.map(({ text }) => text)];
}
