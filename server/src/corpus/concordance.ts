// Concordance: where a sequence of words stands in a corpus, found through its rarest word.
import type { Corpus } from './corpus.js';
import { firstRowOfBlock, followsOn } from './stream.js';
import type { TokenStream } from './stream.js';

/** The uses of one spelling of a term. */
export interface Uses {
  /** Rows of the stream at which the words begin, ascending. */
  readonly rows: readonly number[];
  /** Number of documents that hold them. */
  readonly documents: number;
}

/**
 * Finds a term by its words, in any case, in counted text; parts are separated by spaces, and hyphens belong to words.
 * Matches do not cross punctuation, sentences or blocks.
 */
export function findUses(corpus: Corpus, term: string): Uses {
  const words = term
    .toLowerCase()
    .split(/\s+/)
    .filter((word) => word !== '');
  const ids = words.map((word) => corpus.vocabulary.find(word));
  if (ids.length === 0 || ids.some((id) => id === undefined)) return { rows: [], documents: 0 };
  const rows = rowsOfSequence(corpus.stream, ids as number[]);
  return { rows, documents: new Set(rows.map((row) => corpus.stream.documentOf(row))).size };
}

/** The rows, ascending, at which a sequence of lower-case words begins, with nothing but white space inside it. */
export function rowsOfSequence(stream: TokenStream, folds: readonly number[]): number[] {
  let rarest = 0;
  for (let i = 1; i < folds.length; i++) {
    if (stream.rowsOf(folds[i]!).length < stream.rowsOf(folds[rarest]!).length) rarest = i;
  }
  const found: number[] = [];
  for (const at of stream.rowsOf(folds[rarest]!)) {
    const first = at - rarest;
    if (first >= 0 && standsAt(stream, folds, first)) found.push(first);
  }
  return found;
}

function standsAt(stream: TokenStream, folds: readonly number[], first: number): boolean {
  if (first + folds.length > stream.length || stream.counted[first] !== 1) return false;
  for (let i = 0; i < folds.length; i++) {
    if (stream.fold[first + i] !== folds[i] || (i > 0 && !followsOn(stream, first + i))) return false;
  }
  return firstRowOfBlock(stream, first + folds.length - 1) <= first;
}
