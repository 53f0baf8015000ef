// What an evaluation writes down: the shape of evaluate.json.
import type { QuestionKind } from '../../server/src/mining/question.js';
import type { Agreement } from './dictionary.js';
import type { GlossaryResult } from './glossary.js';
import type { PseudoBand } from './pseudo.js';
import type { NegativeAsked, PairFate } from './recall.js';

/** A question in the order it is asked, without its evidence. */
export interface AskedQuestion {
  readonly id: string;
  readonly kind: QuestionKind;
  readonly terms: readonly string[];
}

/** One documentation set. */
export interface SetResult {
  readonly name: string;
  readonly format: string;
  /** Formats that were read as plain text, for want of a reader of their own. */
  readonly asPlainText: boolean;
  readonly documents: number;
  readonly leftOut: number;
  readonly words: number;
  /** Processor time in seconds on one thread. */
  readonly readingSeconds: number;
  readonly miningSeconds: number;
  /** Peak resident memory of the process that read and mined the set alone, in MB (10⁶ bytes). */
  readonly peakMegabytes: number;
  /** Questions of the default kinds above the default threshold, in order. */
  readonly questions: readonly AskedQuestion[];
  /** All look-alikes that were mined, and how many of them are below the default threshold. */
  readonly lookAlikes: readonly AskedQuestion[];
  readonly hiddenLookAlikes: number;
  readonly pairs: readonly PairFate[];
  readonly negatives: number;
  readonly negativesAsked: readonly NegativeAsked[];
  readonly agreement: Agreement;
  readonly agreementOfLookAlikes: Agreement;
}

/** A set that was not evaluated, and why. */
export interface SkippedSet {
  readonly name: string;
  readonly reason: string;
}

/** A whole evaluation. */
export interface Evaluation {
  readonly sets: readonly SetResult[];
  readonly skipped: readonly SkippedSet[];
  readonly pseudo?: { readonly set: string; readonly bands: readonly PseudoBand[] };
  readonly glossary?: GlossaryResult;
}
