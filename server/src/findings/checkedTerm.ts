// A term that pages are held to, as whoever knows the decisions hands it to the rules.
import type { PartOfSpeech } from '../rewrite/inflect.js';

/**
 * What is known about a term. `apart` marks a term of two concepts kept apart: it is never reported, and protects its words.
 * `undecided` marks a name that an open question asks about. `odd` marks an admitted verb with one object that it hardly ever
 * has, beside the entry that admits it.
 */
export type CheckedStatus = 'preferred' | 'admitted' | 'deprecated' | 'apart' | 'undecided' | 'odd';

/** One term to look for. */
export interface CheckedTerm {
  readonly id: string;
  /** The term in its base form, as its termbase or question writes it. */
  readonly text: string;
  readonly status: CheckedStatus;
  /** For a deprecated or odd term the term to use; for an undecided one the rival that leads, absent on the leading one itself. */
  readonly preferred?: string;
  /** The concept, or for an undecided term the question. */
  readonly conceptId: string;
  readonly partOfSpeech?: PartOfSpeech;
  /** The language (BCP 47 primary subtag) whose pages the term is looked for in; every language where it is missing. */
  readonly language?: string;
  /** For verbs: only uses with one of these objects are meant (*launch* a job); absent or empty: every use. */
  readonly withObjects?: readonly string[];
  /** Only this very case is meant. */
  readonly caseSensitive?: boolean;
  /** For an odd verb: how often it has its object, and how often the usual verb has it. */
  readonly companionUses?: { readonly uses: number; readonly usualUses: number };
}
