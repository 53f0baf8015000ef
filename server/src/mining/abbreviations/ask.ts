// Abbreviations: a short and a long form that the documents explain to be one thing, both in free use; and ambiguous ones.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { Question } from '../question.js';
import { askAmbiguous } from './ambiguous.js';
import { askClippings } from './clippings.js';
import { findDefinitions } from './definitions.js';
import { groupDefinitions } from './explained.js';
import { askExplained } from './shortAndLong.js';

/** Short forms between two resting points. */
const STRIDE = 50;

/** All questions about short and long forms, the worthiest first. */
export function* askAbbreviations(corpus: Corpus): Work<Question[]> {
  const explained = groupDefinitions(findDefinitions(corpus));
  yield;
  const questions: Question[] = [];
  for (let i = 0; i < explained.length; i++) {
    if (i % STRIDE === 0) yield;
    const question = askAmbiguous(corpus, explained[i]!) ?? askExplained(corpus, explained[i]!, explained);
    if (question !== undefined) questions.push(question);
  }
  questions.push(...(yield* askClippings(corpus)));
  return questions.sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
}
