// A document as a corpus holds it: its facts, with its words and blocks numbered.
import type { DocumentFacts } from '../facts/documentFacts.js';

/** One document in a corpus: its facts, and the corpus's number of each of its words. */
export interface CorpusDocument {
  readonly uri: string;
  readonly facts: DocumentFacts;
  /** From an index into `facts.words` to a word of the vocabulary. */
  readonly ids: Uint32Array;
  /** The corpus's number of each block's prose. */
  readonly blocks: Uint32Array;
}
