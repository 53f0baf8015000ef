// The termbase as data: concepts with their terms by status, pairs kept apart, and questions put off.
import type { Span } from '../base/span.js';
import { primaryLanguage } from '../text/language.js';

/** The version of the file format that this program reads and writes. */
export const FORMAT_VERSION = 1;

/** The statuses of ISO 10241-1 and ISO 30042, in the order in which an entry lists them. */
export const TERM_STATUSES = ['preferred', 'admitted', 'deprecated'] as const;
export type TermStatus = (typeof TERM_STATUSES)[number];

/** The values of `partOfSpeech` (ISO 30042, module Min). */
export const PARTS_OF_SPEECH = ['noun', 'verb', 'adjective', 'adverb', 'other'] as const;
export type PartOfSpeech = (typeof PARTS_OF_SPEECH)[number];

/** The values of `termType` (ISO 30042, module Basic). */
export const TERM_TYPES = ['fullForm', 'acronym', 'abbreviation', 'shortForm', 'variant', 'phrase'] as const;
export type TermType = (typeof TERM_TYPES)[number];

/** A name as it stands in the file. */
export interface TermRef {
  /** As written, NFC, white space collapsed. */
  readonly text: string;
  /** `termKey(text)`. */
  readonly key: string;
  /** The term's own characters in the file, quotes included. */
  readonly span: Span;
}

/** One term of a concept. */
export interface TermEntry extends TermRef {
  readonly status: TermStatus;
  /** The term's own part of speech, else its concept's. */
  readonly partOfSpeech?: PartOfSpeech;
  readonly termType?: TermType;
  /** True where only this very spelling is meant: `Job` the object, not every job. */
  readonly caseSensitive: boolean;
  readonly note?: string;
  readonly source?: string;
}

/** One concept and what it is called (a "concept entry" of ISO 30042). */
export interface ConceptEntry {
  /** The id written in the file. */
  readonly id?: string;
  /** All terms: preferred, then admitted, then deprecated, each in the order of the file. */
  readonly terms: readonly TermEntry[];
  /** The one preferred term; it is also the first of `terms`. */
  readonly preferred: TermEntry;
  /** The language of the terms (BCP 47), where it is stated for this concept. */
  readonly language?: string;
  readonly partOfSpeech?: PartOfSpeech;
  readonly subject?: string;
  readonly definition?: string;
  readonly note?: string;
  readonly source?: string;
  /** For verbs: the objects that the decision is about (`start a job`); empty where it holds for every object. */
  readonly with: readonly TermRef[];
  /** The whole entry in the file. */
  readonly span: Span;
}

/** Terms that look alike but name different concepts: every two of them are kept apart. */
export interface ApartEntry {
  readonly terms: readonly TermRef[];
  readonly note?: string;
  readonly span: Span;
}

/**
 * A question put off ("not now"). It is asked again when a further name joins the mix, when the entry is removed, or,
 * where `uses` is written, when the terms have come to twice that number of uses.
 */
export interface LaterEntry {
  readonly terms: readonly TermRef[];
  /** The uses of all the terms together when the question was put off. */
  readonly uses?: number;
  readonly note?: string;
  readonly span: Span;
}

/** What one `termbase.yaml` says. */
export interface Termbase {
  readonly uri: string;
  /** The language of the terms (BCP 47), where the file says it. */
  readonly language?: string;
  readonly concepts: readonly ConceptEntry[];
  readonly apart: readonly ApartEntry[];
  readonly later: readonly LaterEntry[];
}

/** What is wrong in a termbase file, by a stable short name. */
export type TermbaseProblemCode =
  | 'yaml-syntax'
  | 'format-version'
  | 'unknown-key'
  | 'wrong-type'
  | 'unknown-value'
  | 'empty-term'
  | 'no-preferred-term'
  | 'two-preferred-terms'
  | 'duplicate-term'
  | 'contradiction'
  | 'too-few-terms'
  | 'duplicate-id'
  | 'no-verb';

/** A problem at a place of the file. The message says what is wrong, why that matters and what to do. */
export interface TermbaseProblem {
  /** An error makes the file unusable as law; a warning does not. */
  readonly severity: 'error' | 'warning';
  readonly code: TermbaseProblemCode;
  readonly span: Span;
  readonly message: string;
  /** The other place of a clash. */
  readonly related?: Span;
}

/** A termbase that says nothing. */
export function emptyTermbase(uri: string): Termbase {
  return { uri, concepts: [], apart: [], later: [] };
}

/**
 * Whether two entries of one spelling may stand side by side as homonyms (ISO 1087): their languages differ; both give a part
 * of speech or a subject, and these differ; or both are case-sensitive and spelt differently; or they are verbs decided for
 * different objects, where a decision for some objects is an exception to one for all.
 * @param usual the language of concepts that state none (BCP 47)
 */
export function areHomonyms(
  a: { readonly term: TermEntry; readonly concept: ConceptEntry },
  b: { readonly term: TermEntry; readonly concept: ConceptEntry },
  usual?: string,
): boolean {
  const languageOf = ({ language = usual }: ConceptEntry): string | undefined => primaryLanguage(language);
  const differ = (x: string | undefined, y: string | undefined): boolean =>
    x !== undefined && y !== undefined && x !== y;
  if (differ(a.term.partOfSpeech, b.term.partOfSpeech)) return true;
  if (differ(a.concept.subject, b.concept.subject) || languageOf(a.concept) !== languageOf(b.concept)) return true;
  if (a.term.caseSensitive && b.term.caseSensitive && a.term.text !== b.term.text) return true;
  if (a.concept.with.length === 0 && b.concept.with.length === 0) return false;
  return !a.concept.with.some((object) => b.concept.with.some((other) => other.key === object.key));
}
