// Where each term stands: the corpus cut into terms, longest first, so that a word inside a longer term is not its own.
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { LONGEST_GRAM } from '../../corpus/grams.js';
import { followsOn, isContent } from '../../corpus/stream.js';
import type { Term } from './terms.js';

/** The places of terms in a stream: occurrence `i` is term `term[i]` in the rows `[first[i], first[i] + length[i])`. */
export interface Segments {
  readonly count: number;
  readonly term: Uint32Array;
  readonly first: Uint32Array;
  readonly length: Uint8Array;
  /** Occurrences of each term outside longer terms. */
  readonly uses: Uint32Array;
}

/**
 * Cuts a corpus into the given noun terms; occurrences are in order of their rows.
 * @param uses the class of each row, by `readUses`
 */
export function* segment(corpus: Corpus, terms: readonly Term[], uses: Uint8Array): Work<Segments> {
  const { stream, grams } = corpus;
  const ofWord = new Uint32Array(corpus.vocabulary.size);
  const ofGram = new Uint32Array(grams.size);
  terms.forEach((term, index) => {
    for (const { words } of term.forms) {
      if (words.length === 1) ofWord[words[0]!] = index + 1;
      else ofGram[grams.find(words)!] = index + 1;
    }
  });
  const term = new Uint32Array(stream.length);
  const first = new Uint32Array(stream.length);
  const length = new Uint8Array(stream.length);
  let count = 0;
  for (let row = 0; row < stream.length;) {
    const match = isContent(stream, row) ? longestAt(corpus, row, uses, ofWord, ofGram) : undefined;
    if (match !== undefined) {
      term[count] = match.term - 1;
      first[count] = row;
      length[count++] = match.length;
    }
    const next = row + (match?.length ?? 1);
    if (next >> 16 !== row >> 16) yield;
    row = next;
  }
  const usesOfTerms = new Uint32Array(terms.length);
  for (let i = 0; i < count; i++) usesOfTerms[term[i]!]!++;
  return {
    count,
    uses: usesOfTerms,
    term: term.slice(0, count),
    first: first.slice(0, count),
    length: length.slice(0, count),
  };
}

function longestAt(
  { stream, grams }: Corpus,
  row: number,
  uses: Uint8Array,
  ofWord: Uint32Array,
  ofGram: Uint32Array,
): { term: number; length: number } | undefined {
  const word = stream.fold[row]!;
  // A single word is this noun only where it is used as one; in a longer term the whole decides.
  let found = uses[row] === 0 && ofWord[word] !== 0 ? { term: ofWord[word]!, length: 1 } : undefined;
  let gram: number | undefined = word;
  for (let length = 2; length <= LONGEST_GRAM; length++) {
    const next = row + length - 1;
    if (!followsOn(stream, next)) break;
    gram = grams.findExtension(gram, stream.fold[next]!, length);
    if (gram === undefined) break;
    if (ofGram[gram] !== 0) found = { term: ofGram[gram]!, length };
  }
  return found;
}
