// All engines of questions over one corpus, in one order of worth.
import { compareCodeUnits } from '../base/order.js';
import type { Work } from '../base/work.js';
import type { Corpus } from '../corpus/corpus.js';
import { askAbbreviations } from './abbreviations/ask.js';
import { askNeutral } from './neutral/ask.js';
import { DEFAULT_MINING } from './options.js';
import type { MiningOptions } from './options.js';
import type { Question } from './question.js';
import { askSynonyms } from './synonyms/ask.js';
import { askVariants } from './variants/ask.js';

/**
 * Asks every kind of question of a corpus. The result depends on the set of documents and the options alone. What the engines of
 * variants, abbreviations and synonyms know of grammar and words is English: other languages are asked about ways of writing alone.
 */
export function* mine(corpus: Corpus, options: MiningOptions = DEFAULT_MINING): Work<readonly Question[]> {
  if (corpus.language !== 'en') return yield* askNeutral(corpus);
  const variants = yield* askVariants(corpus);
  const abbreviations = yield* askAbbreviations(corpus);
  const synonyms = yield* askSynonyms(corpus, options);
  return [...variants, ...abbreviations, ...synonyms].sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
}
