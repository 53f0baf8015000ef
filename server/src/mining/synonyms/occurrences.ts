// The occurrences of each term in order, and which occurrence covers a row.
import type { Use } from '../places.js';
import type { Segments } from './segment.js';

/** The occurrences of terms, by term. */
export interface Occurrences {
  /** Indexes into the segments, ascending. */
  of(term: number): Uint32Array;
  /** The same as uses of rows. */
  usesOf(term: number): Use[];
}

/** Sorts the occurrences by term. */
export function indexOccurrences(segments: Segments): Occurrences {
  const first = new Uint32Array(segments.uses.length + 1);
  segments.uses.forEach((uses, term) => {
    first[term + 1] = first[term]! + uses;
  });
  const next = first.slice();
  const sorted = new Uint32Array(segments.count);
  for (let i = 0; i < segments.count; i++) sorted[next[segments.term[i]!]!++] = i;
  const of = (term: number): Uint32Array => sorted.subarray(first[term], first[term + 1]);
  return {
    of,
    usesOf: (term) => Array.from(of(term), (i): Use => ({ row: segments.first[i]!, length: segments.length[i]! })),
  };
}
