// What mining may draw on besides the documents.
import type { PastEdits } from './pastEdits.js';

/** Equal options and equal documents give equal questions. */
export interface MiningOptions {
  /** What earlier versions of the documents tell, where there are any. */
  readonly pastEdits?: PastEdits | undefined;
}

/** Nothing but the documents. */
export const DEFAULT_MINING: MiningOptions = {};
