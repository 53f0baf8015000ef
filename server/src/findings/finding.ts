// A finding: one place in a document that departs from a decision, or uses a name that is still asked about.
import type { Span } from '../base/span.js';
import type { ZoneSet } from '../prose/zones.js';
import type { Form } from '../rewrite/inflect.js';

/** Stable names of the rules, as editors and reports show them. */
export type FindingCode = 'deprecated-term' | 'mixed-terms' | 'odd-companion';

/** A decided thing is a warning; an undecided one, or a matter of habit, is a hint and no more. */
export type Severity = 'hint' | 'information' | 'warning';

/** A finding within one block: `span` counts UTF-16 units of the block's text. */
export interface BlockFinding {
  readonly code: FindingCode;
  readonly span: Span;
  readonly severity: Severity;
  /** What, why, and what to do, in plain words. */
  readonly message: string;
  /** The term as the termbase or the question writes it. */
  readonly term: string;
  /** {@link CheckedTerm.id} of that term. */
  readonly termId: string;
  /** The term as it stands in the text. */
  readonly surface: string;
  readonly form: Form;
  /** The concept that the term was decided for. */
  readonly conceptId?: string;
  /** The question that asks about the term. */
  readonly questionId?: string;
  /** The term to use instead, in its base form. */
  readonly preferred?: string;
  /** All zones of the place, the block's own among them: a safety message is never changed in bulk. */
  readonly zones: ZoneSet;
}

/** A finding in a document: `span` counts UTF-16 units of the source, `proseSpan` those of block `block` of its prose. */
export interface Finding extends BlockFinding {
  readonly block: number;
  readonly proseSpan: Span;
}
