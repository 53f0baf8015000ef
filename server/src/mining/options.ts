// What mining may draw on besides the documents, and how it compares the use of terms.
import type { ZoneSet } from '../prose/zones.js';
import type { PastEdits } from './pastEdits.js';

/** Equal options and equal documents give equal questions. */
export interface MiningOptions {
  /** What earlier versions of the documents tell, where there are any. */
  readonly pastEdits?: PastEdits | undefined;
  /** Zones whose words do not count: code, labels, quotations and targets of links where missing. */
  readonly closedZones?: ZoneSet | undefined;
  /** How much a context says about a term: damped tf-idf where missing. */
  readonly weighting?: Weighting | undefined;
  /** How alike two terms' contexts are: Lin's measure where missing. */
  readonly similarity?: SimilarityName | undefined;
  /** Which contexts are compared: adjacent and syntactic ones where missing. */
  readonly contexts?: ContextKind | undefined;
  /** For contexts of the kind `window`: words to either side, from 1. */
  readonly windowWords?: number | undefined;
}

/** Published weights of a context; see `corpus/statistics/weights.ts`. */
export const WEIGHTINGS = ['tf-idf', 'ppmi', 'bm25', 'log-likelihood'] as const;
export type Weighting = (typeof WEIGHTINGS)[number];

/** Published measures of likeness; see `corpus/statistics/similarity.ts`. */
export const SIMILARITIES = ['lin', 'cosine', 'jaccard'] as const;
export type SimilarityName = (typeof SIMILARITIES)[number];

/** Narrow contexts tell what can stand in for a term, wide ones what its topic is; `all` is adjacent and syntactic. */
export const CONTEXT_KINDS = ['all', 'adjacent', 'window', 'syntactic'] as const;
export type ContextKind = (typeof CONTEXT_KINDS)[number];

/** How the use of terms is compared, every choice made. */
export interface UsageMeasures {
  readonly weighting: Weighting;
  readonly similarity: SimilarityName;
  readonly contexts: ContextKind;
  readonly windowWords: number;
}

/** The choices of some options, with the usual one where none was made. */
export function usageMeasures(options: MiningOptions): UsageMeasures {
  const { weighting = 'tf-idf', similarity = 'lin', contexts = 'all', windowWords = 5 } = options;
  return { weighting, similarity, contexts, windowWords };
}

/** Nothing but the documents. */
export const DEFAULT_MINING: MiningOptions = {};

/** True where two options mine alike. What is compared by identity may say false of equals, never true of others. */
export function sameMining(a: MiningOptions, b: MiningOptions): boolean {
  const names = new Set([...Object.keys(a), ...Object.keys(b)]) as Set<keyof MiningOptions>;
  return [...names].every((name) => a[name] === b[name]);
}
