// The report as plain data: what the HTML, the Markdown and the JSON are written from.
import type { Reason, QuestionKind } from '../mining/question.js';
import type { TermStatus } from '../termbase/termbase.js';
import type { Drift, WhereDriftLives } from './drift.js';

/** One of the five figures at the top. */
export interface Figure {
  readonly id: 'pages' | 'open-questions' | 'decided-concepts' | 'kept' | 'drift';
  readonly label: string;
  /** As it is printed: `1,204`, `96 %`, `–` where there is nothing to measure. */
  readonly text: string;
  /** The bare number (a share from 0 to 1), or undefined where there is nothing to measure. */
  readonly value?: number;
  readonly note: string;
}

/** A name with its uses in the documents. */
export interface ReportTerm {
  readonly text: string;
  readonly uses: number;
  /** Number of pages that use it. */
  readonly documents: number;
}

/** A sentence that uses a name. */
export interface ReportExample {
  readonly term: string;
  /** Relative to the report's folder. */
  readonly path: string;
  /** Counted from 1. */
  readonly line: number;
  readonly text: string;
  /** Where the name stands in `text`, in UTF-16 units, the end exclusive. */
  readonly highlight: { readonly start: number; readonly end: number };
}

/** An undecided mix. */
export interface ReportQuestion {
  readonly id: string;
  readonly kind: QuestionKind;
  /** BCP 47 primary subtag. */
  readonly language?: string;
  /** For verbs: the objects with which they name one operation. */
  readonly objects?: readonly string[];
  readonly confidence: number;
  /** Uses outside the leading name: those that an answer may change. */
  readonly settles: number;
  readonly terms: readonly (ReportTerm & { readonly forms: readonly string[] })[];
  readonly reasons: readonly Reason[];
  readonly examples: readonly ReportExample[];
  /** Missing where the names are meanings of one abbreviation, which is no drift of one concept's naming. */
  readonly drift?: Drift;
  readonly where?: WhereDriftLives;
}

/** A decided name: its status and the pages that use it, most uses first. */
export interface DecidedReportTerm extends ReportTerm {
  readonly status: TermStatus;
  readonly note?: string;
  readonly pages: readonly { readonly path: string; readonly uses: number }[];
}

/** A decided concept. */
export interface ReportConcept {
  readonly name: string;
  readonly id?: string;
  readonly subject?: string;
  readonly definition?: string;
  /** Objects that a decision about verbs is limited to. */
  readonly with: readonly string[];
  /** Preferred, admitted, deprecated. */
  readonly terms: readonly DecidedReportTerm[];
  /** Uses of deprecated names. */
  readonly toChange: number;
  /** Missing where no name is used. */
  readonly drift?: Drift;
  readonly where?: WhereDriftLives;
}

/** Names that stand together in the termbase: kept apart, or put off. */
export interface NamedTogether {
  readonly terms: readonly string[];
  readonly note?: string;
}

/** Everything that a report says. */
export interface ReportData {
  /** When it was made, as the caller writes it. */
  readonly generatedAt?: string;
  /** The name of the folder. */
  readonly folder: string;
  /** The state in one sentence. */
  readonly state: string;
  readonly documents: number;
  readonly words: number;
  readonly figures: readonly Figure[];
  /** By worth. */
  readonly questions: readonly ReportQuestion[];
  /** Those with most uses to change first, then by name. */
  readonly concepts: readonly ReportConcept[];
  readonly apart: readonly NamedTogether[];
  readonly later: readonly NamedTogether[];
  /** Termbases of folders further down: their decisions hold there and are not part of this report. */
  readonly otherTermbases: readonly { readonly path: string; readonly concepts: number }[];
}
