// What mining may draw on besides the documents.
import type { PastEdits } from './pastEdits.js';

/** Equal options and equal documents give equal questions. */
export interface MiningOptions {
  /** What earlier versions of the documents tell, where there are any. */
  readonly pastEdits?: PastEdits | undefined;
}

/** Nothing but the documents. */
export const DEFAULT_MINING: MiningOptions = {};

/** True where two options mine alike. What is compared by identity may say false of equals, never true of others. */
export function sameMining(a: MiningOptions, b: MiningOptions): boolean {
  const names = new Set([...Object.keys(a), ...Object.keys(b)]) as Set<keyof MiningOptions>;
  return [...names].every((name) => a[name] === b[name]);
}
