// All engines of questions over one corpus, in one order of worth.
import { compareCodeUnits } from '../base/order.js';
import type { Work } from '../base/work.js';
import type { Corpus } from '../corpus/corpus.js';
import { askAbbreviations } from './abbreviations/ask.js';
import { askGlossary } from './glossary/ask.js';
import { Glossary } from './glossary/glossary.js';
import { heedGlossary } from './glossary/heed.js';
import { heedPastEdits } from './heedPastEdits.js';
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
  const mined = corpus.language === 'en' ? yield* mineEnglish(corpus, options) : yield* askNeutral(corpus);
  const glossary = new Glossary(corpus);
  const questions = heedGlossary(corpus, glossary, mined);
  questions.push(...askGlossary(corpus, glossary, questions));
  return heedPastEdits(questions, options.pastEdits).sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
}

function* mineEnglish(corpus: Corpus, options: MiningOptions): Work<Question[]> {
  const variants = yield* askVariants(corpus);
  const abbreviations = yield* askAbbreviations(corpus);
  const synonyms = yield* askSynonyms(corpus, options);
  return [...variants, ...abbreviations, ...synonyms];
}
