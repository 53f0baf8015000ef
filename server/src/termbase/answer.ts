// A writer's answer to a question, and what it changes in a termbase: nothing, an addition, or a contradiction.
import type { Span } from '../base/span.js';
import { inLanguage } from './language.js';
import { TermIndex, type TermPlace } from './termIndex.js';
import type { ApartEntry, ConceptEntry, LaterEntry, PartOfSpeech, Termbase, TermRef, TermStatus } from './termbase.js';
import { termKey, termText } from './termKey.js';

interface ConceptAnswer {
  readonly terms: readonly string[];
  /** The language of the terms (BCP 47 primary subtag), where the answer is about pages in a language other than the file's. */
  readonly language?: string;
  readonly partOfSpeech?: PartOfSpeech;
  /** For verbs: the objects that the answer is about; none for all objects. */
  readonly with?: readonly string[];
}

/** *One concept, prefer X*: the other terms become deprecated. */
export interface PreferAnswer extends ConceptAnswer {
  readonly kind: 'prefer';
  readonly preferred: string;
}

/** *One concept, either is fine*: the first of the terms becomes the preferred one, the others admitted. */
export interface EitherAnswer extends ConceptAnswer {
  readonly kind: 'either';
}

/** *Different concepts*: every two of the terms. */
export interface ApartAnswer {
  readonly kind: 'apart';
  readonly terms: readonly string[];
}

/** *Not now*. */
export interface LaterAnswer {
  readonly kind: 'later';
  readonly terms: readonly string[];
  /** The uses of all the terms together at present: the question comes back when they have doubled. */
  readonly uses?: number;
}

export type Answer = PreferAnswer | EitherAnswer | ApartAnswer | LaterAnswer;

/** Why an answer is not written. */
export type RefusalCode =
  | 'broken-file'
  | 'too-few-terms'
  | 'several-concepts'
  | 'one-concept'
  | 'kept-apart'
  | 'other-preferred'
  | 'already-admitted'
  | 'already-deprecated'
  | 'cannot-write';

/** An answer that cannot be written, with the place of the clash. */
export interface Refusal {
  readonly code: RefusalCode;
  /** What clashes and what to do, without the line. */
  readonly message: string;
  readonly span?: Span;
}

/** One addition to a termbase. */
export type Change =
  | {
      readonly kind: 'new-concept';
      readonly status: TermStatus;
      readonly terms: readonly string[];
      readonly answer: ConceptAnswer;
    }
  | {
      readonly kind: 'add-terms';
      readonly concept: ConceptEntry;
      readonly status: TermStatus;
      readonly terms: readonly string[];
    }
  | { readonly kind: 'add-objects'; readonly concept: ConceptEntry; readonly objects: readonly string[] }
  | { readonly kind: 'new-apart'; readonly terms: readonly string[] }
  | { readonly kind: 'extend-apart'; readonly entry: ApartEntry; readonly terms: readonly string[] }
  | { readonly kind: 'new-later'; readonly terms: readonly string[]; readonly uses: number | undefined }
  | { readonly kind: 'set-uses'; readonly entry: LaterEntry; readonly uses: number };

/** The change that an answer asks for: undefined where the termbase says it already. */
export function planAnswer(termbase: Termbase, answer: Answer): Change | Refusal | undefined {
  const terms = distinct(answer.kind === 'prefer' ? [answer.preferred, ...answer.terms] : answer.terms);
  if (terms.length < 2) return { code: 'too-few-terms', message: 'An answer needs at least two different terms.' };
  if (answer.kind === 'prefer' || answer.kind === 'either') {
    const own = inLanguage(termbase, answer.language);
    return planConcept(own, terms, answer, new LookUp(own, terms));
  }
  const lookUp = new LookUp(termbase, terms);
  if (answer.kind === 'apart') return planApart(termbase, terms, lookUp);
  return planLater(termbase, terms, answer.uses, lookUp);
}

/** True for what {@link planAnswer} refuses. */
export function isRefusal(plan: Change | Refusal | undefined): plan is Refusal {
  return plan !== undefined && 'code' in plan;
}

function planConcept(
  termbase: Termbase,
  terms: readonly string[],
  answer: PreferAnswer | EitherAnswer,
  lookUp: LookUp,
): Change | Refusal | undefined {
  const status = answer.kind === 'prefer' ? 'deprecated' : 'admitted';
  const objects = distinct(answer.with ?? []);
  const places = terms.map((term) => lookUp.placesOf(term, answer.partOfSpeech, objects));
  const concept = commonConcept(terms, places);
  // What is kept apart from any term of a concept is kept apart from the concept.
  const others = concept && !('code' in concept) ? concept.terms.map(({ text }) => text) : [];
  const clash = keptApart(termbase, distinct([...terms, ...others]), lookUp);
  if (clash !== undefined) return clash;
  if (concept === undefined) return planNewConcept(termbase, terms, answer, status, lookUp);
  if ('code' in concept) return concept;
  const missing: string[] = [];
  for (const [index, term] of terms.entries()) {
    const place = places[index]!.find((found) => found.concept === concept);
    if (place === undefined) missing.push(term);
    if (answer.kind === 'prefer' && index === 0 && place?.term !== concept.preferred) {
      return otherPreferred(term, concept, places.flat());
    }
    const refusal = place && index > 0 ? statusClash(place, status) : undefined;
    if (refusal !== undefined) return refusal;
  }
  const unlisted = objects.filter((object) => !concept.with.some(({ key }) => key === termKey(object)));
  if (missing.length === 0)
    return unlisted.length > 0 ? { kind: 'add-objects', concept, objects: unlisted } : undefined;
  if (unlisted.length === 0) return { kind: 'add-terms', concept, status, terms: missing };
  const message = `“${concept.preferred.text}” is decided for some of the objects already. Answer for one object at a time.`;
  return { code: 'several-concepts', message, span: concept.preferred.span };
}

/** A concept of its own, unless one says all this already for every object, or just this for other objects. */
function planNewConcept(
  termbase: Termbase,
  terms: readonly string[],
  answer: PreferAnswer | EitherAnswer,
  status: TermStatus,
  lookUp: LookUp,
): Change | undefined {
  const objects = distinct(answer.with ?? []);
  const saying = termbase.concepts.filter((concept) => {
    if (answer.partOfSpeech && concept.partOfSpeech && answer.partOfSpeech !== concept.partOfSpeech) return false;
    return terms.every((term, index) => {
      const wanted = index === 0 ? 'preferred' : status;
      return concept.terms.some((entry) => entry.status === wanted && lookUp.isSame(entry, term));
    });
  });
  if (objects.length > 0) {
    if (saying.some((concept) => concept.with.length === 0)) return undefined;
    const concept = saying.find((other) => other.terms.length === terms.length);
    if (concept !== undefined) return { kind: 'add-objects', concept, objects };
  }
  return { kind: 'new-concept', status, terms, answer };
}

/** The one concept that all the terms found have in common; undefined where none is found. */
function commonConcept(
  terms: readonly string[],
  places: readonly (readonly TermPlace[])[],
): ConceptEntry | Refusal | undefined {
  const found = places.filter((list) => list.length > 0);
  if (found.length === 0) return undefined;
  const common = found[0]!
    .map(({ concept }) => concept)
    .filter((concept) => found.every((list) => list.some((place) => place.concept === concept)));
  if (common.length === 1) return common[0];
  const [first] = found[0]!;
  const other = found.flat().find(({ concept }) => concept !== first!.concept)!;
  const names = terms.map((term) => `“${term}”`).join(', ');
  const message =
    `${names} cannot be one concept: “${first!.term.text}” belongs to “${first!.concept.preferred.text}” and “${other.term.text}” to ` +
    `“${other.concept.preferred.text}”. Join the two concepts in the termbase first.`;
  return { code: 'several-concepts', message, span: other.term.span };
}

function otherPreferred(wanted: string, concept: ConceptEntry, places: readonly TermPlace[]): Refusal {
  const { text, span } = concept.preferred;
  const known = places.find((place) => place.concept === concept)!.term.text;
  const why = known === text ? `“${text}” is a preferred term already` : `“${known}” already belongs to “${text}”`;
  const message = `${why}, so “${wanted}” cannot be preferred to it. Change the concept in the termbase first.`;
  return { code: 'other-preferred', message, span };
}

function statusClash({ term }: TermPlace, wanted: TermStatus): Refusal | undefined {
  if (wanted === 'deprecated' && term.status === 'admitted') {
    const message = `“${term.text}” cannot be deprecated: it is an admitted term of this concept. Move it in the termbase first.`;
    return { code: 'already-admitted', message, span: term.span };
  }
  if (wanted === 'admitted' && term.status === 'deprecated') {
    const message = `“${term.text}” cannot be admitted: it is a deprecated term of this concept. Move it in the termbase first.`;
    return { code: 'already-deprecated', message, span: term.span };
  }
  return undefined;
}

function keptApart(termbase: Termbase, terms: readonly string[], lookUp: LookUp): Refusal | undefined {
  for (const entry of termbase.apart) {
    // Spellings that differ in capitals can share one name of the entry, which keeps nothing apart.
    const [one, other] = entry.terms.flatMap((name) => terms.find((term) => lookUp.isSame(name, term)) ?? []);
    if (one === undefined || other === undefined || one === other) continue;
    const message = `“${one}” and “${other}” are kept apart as two concepts. Remove that entry from the termbase first.`;
    return { code: 'kept-apart', message, span: entry.span };
  }
  return undefined;
}

function planApart(termbase: Termbase, terms: readonly string[], lookUp: LookUp): Change | Refusal | undefined {
  let settled = true;
  for (const [index, term] of terms.entries()) {
    for (const other of terms.slice(0, index)) {
      const places = lookUp.placesOf(term);
      const others = lookUp.placesOf(other);
      const shared = places.find(({ concept }) => others.some((place) => place.concept === concept));
      if (shared !== undefined) {
        const message = `“${other}” and “${term}” cannot be two concepts: both are terms of “${shared.concept.preferred.text}”. Take one of them out first.`;
        return { code: 'one-concept', message, span: shared.term.span };
      }
      const listed = termbase.apart.some((entry) => [term, other].every((name) => lookUp.isAmong(entry.terms, name)));
      if (!listed && (places.length === 0 || others.length === 0)) settled = false;
    }
  }
  if (settled) return undefined;
  const entry = termbase.apart.find((group) => lookUp.areAllAmong(group.terms, terms));
  if (entry === undefined) return { kind: 'new-apart', terms };
  return { kind: 'extend-apart', entry, terms: terms.filter((term) => !lookUp.isAmong(entry.terms, term)) };
}

function planLater(
  termbase: Termbase,
  terms: readonly string[],
  uses: number | undefined,
  lookUp: LookUp,
): Change | undefined {
  const entries = termbase.later.filter((entry) => terms.every((term) => lookUp.isAmong(entry.terms, term)));
  const [entry] = entries;
  if (entry === undefined) return { kind: 'new-later', terms, uses };
  const lasts = entries.some((other) => other.uses === undefined || uses === undefined || other.uses >= uses);
  return lasts ? undefined : { kind: 'set-uses', entry, uses: uses! };
}

/** Terms of one answer looked up in a termbase; those that differ in capitals alone are told apart by them. */
class LookUp {
  private readonly index: TermIndex;
  private readonly exactKeys = new Set<string>();

  constructor(termbase: Termbase, terms: readonly string[]) {
    this.index = new TermIndex(termbase);
    const seen = new Set<string>();
    for (const key of terms.map(termKey)) (seen.has(key) ? this.exactKeys : seen).add(key);
  }

  /** Entries for all objects; where objects are given, the entries that hold for one of them. */
  placesOf(term: string, partOfSpeech?: PartOfSpeech, objects: readonly string[] = []): readonly TermPlace[] {
    const texts = objects.length === 0 ? [term] : objects.map((object) => `${term} ${object}`);
    const found = new Map<TermRef, TermPlace>();
    for (const place of texts.flatMap((text) => this.index.placesOf(text, partOfSpeech))) {
      const isScoped = place.object !== undefined;
      const fits = objects.length === 0 ? !isScoped && place.concept.with.length === 0 : isScoped;
      if (fits && this.isSame(place.term, term)) found.set(place.term, place);
    }
    return [...found.values()];
  }

  isAmong(names: readonly TermRef[], term: string): boolean {
    return names.some((name) => this.isSame(name, term));
  }

  areAllAmong(names: readonly TermRef[], terms: readonly string[]): boolean {
    return names.every((name) => terms.some((term) => this.isSame(name, term)));
  }

  isSame(name: TermRef, term: string): boolean {
    return this.exactKeys.has(name.key) ? name.text === term : name.key === termKey(term);
  }
}

function distinct(texts: readonly string[]): string[] {
  return [...new Set(texts.map(termText))].filter((text) => text !== '');
}
