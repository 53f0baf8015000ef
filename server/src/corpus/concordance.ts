// Concordance: where a sequence of words stands in a corpus, found through its rarest word.
import { TokenFlag } from '../tokens/tokens.js';
import type { Corpus } from './corpus.js';

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
  const { stream } = corpus;
  const rarest = ids.reduce<number>(
    (best, id, at) => (stream.rowsOf(id!).length < stream.rowsOf(ids[best]!).length ? at : best),
    0,
  );
  const rows: number[] = [];
  const documents = new Set<number>();
  for (const row of stream.rowsOf(ids[rarest]!)) {
    const first = row - rarest;
    if (first < 0 || !ids.every((id, at) => stream.fold[first + at] === id && (at === 0 || joined(corpus, first + at))))
      continue;
    rows.push(first);
    documents.add(stream.documentOf(first));
  }
  return { rows, documents: documents.size };
}

/** True where a row's word follows the one before it with nothing but white space between. */
function joined({ stream }: Corpus, row: number): boolean {
  const wanted = TokenFlag.word | TokenFlag.spaceBefore;
  return (
    stream.counted[row] === 1 &&
    (stream.flags[row]! & (wanted | TokenFlag.sentenceStart)) === wanted &&
    (stream.flags[row - 1]! & TokenFlag.possessive) === 0
  );
}
