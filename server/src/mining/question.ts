// A question: terms that may name one concept, with the evidence for it.
import { compareCodeUnits } from '../base/order.js';

/** What kind of mix a question is about. */
export const QUESTION_KINDS = [
  'variant',
  'abbreviation',
  'ambiguous-abbreviation',
  'synonym',
  'verb-object',
  'look-alike',
] as const;
export type QuestionKind = (typeof QUESTION_KINDS)[number];

/** The kinds that are asked unless a caller selects others. */
export const DEFAULT_KINDS: readonly QuestionKind[] = QUESTION_KINDS.filter((kind) => kind !== 'look-alike');

/** One spelling of a term as it stands in the documents, with its number of uses. */
export interface TermForm {
  readonly text: string;
  readonly uses: number;
}

/** One of the names that a question is about. `text` is its most used form (lower case unless it is always capitalised). */
export interface QuestionTerm {
  readonly text: string;
  readonly uses: number;
  readonly documents: number;
  readonly forms: readonly TermForm[];
  /** `noun` or `verb` where usage says so. */
  readonly partOfSpeech?: 'noun' | 'verb' | 'adjective' | 'other';
}

/** Why a question is asked: a plain sentence fragment for a writer, with the figure behind it. */
export interface Reason {
  /** A stable short name of the evidence, such as `spelling`, `shared-frames`, `component`, `definition`. */
  readonly kind: string;
  readonly text: string;
  readonly value: number;
}

/** A place where one of the terms is used: document index in the corpus and token range in that document. */
export interface UsePlace {
  /** Index into the question's terms. */
  readonly term: number;
  readonly document: number;
  readonly firstToken: number;
  readonly lastToken: number;
}

/** An undecided mix. Ids are stable: they depend on the kind and the terms' texts alone. */
export interface Question {
  readonly id: string;
  readonly kind: QuestionKind;
  /** The language (BCP 47 primary subtag) of the corpus it was mined from; set by the engine. */
  readonly language?: string;
  /** From 0 to 1: how sure the evidence is that the terms name one concept. */
  readonly confidence: number;
  /** What answering settles, by which questions are ordered: confidence × uses outside the leading term, damped for short forms. */
  readonly worth: number;
  /** For verbs: the objects (nouns in their dictionary form) with which they name one operation. */
  readonly objects?: readonly string[];
  /** Most used first, ties by code units. */
  readonly terms: readonly QuestionTerm[];
  readonly reasons: readonly Reason[];
  /** The term that the documents' own glossary prefers, or that writers moved to, and why. */
  readonly preferred?: { readonly text: string; readonly reason: Reason };
  readonly places: readonly UsePlace[];
  /** The terms of questions about the same habit of writing, which wait until this one is answered. Set by the decisions. */
  readonly alike?: readonly (readonly QuestionTerm[])[];
}

/** The id of a question of a kind about some terms: their texts in order of code units, whatever their uses are. */
export function questionId(kind: QuestionKind, terms: readonly { readonly text: string }[]): string {
  return `${kind}:${terms
    .map(({ text }) => text)
    .sort(compareCodeUnits)
    .join('|')}`;
}
