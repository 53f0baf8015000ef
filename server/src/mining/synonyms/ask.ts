// Synonyms: different words for one concept, asked where independent evidence and usage agree.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { DEFAULT_MINING } from '../options.js';
import type { MiningOptions } from '../options.js';
import type { Question } from '../question.js';
import { askNouns, readNouns } from './nouns.js';
import { askVerbs } from './verbs.js';
import { readUses } from './wordUse.js';

/** Asks about synonymous nouns, verbs with their object, and terms alike in use alone; most worth first. */
export function* askSynonyms(corpus: Corpus, options: MiningOptions = DEFAULT_MINING): Work<Question[]> {
  const uses = readUses(corpus);
  yield;
  const nouns = yield* readNouns(corpus, uses);
  const questions = [...(yield* askNouns(corpus, nouns, options)), ...(yield* askVerbs(corpus, uses, nouns, options))];
  return questions.sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
}
