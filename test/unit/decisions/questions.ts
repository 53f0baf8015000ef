// Questions for the tests: only what the decisions read.
import type { Question, QuestionKind, QuestionTerm } from '../../../server/src/mining/question.js';
import { parseTermbase } from '../../../server/src/termbase/parse.js';
import type { Termbase } from '../../../server/src/termbase/termbase.js';

/** A term as `text×uses`, with `/verb` or `/noun` behind the text where its part of speech is known. */
export function term(written: string): QuestionTerm {
  const [, text, partOfSpeech, uses = '1'] = /^(.*?)(?:\/(noun|verb))?(?:×(\d+))?$/u.exec(written)!;
  return {
    text: text!,
    uses: Number(uses),
    documents: 1,
    forms: [{ text: text!, uses: Number(uses) }],
    ...(partOfSpeech !== undefined && { partOfSpeech: partOfSpeech as 'noun' | 'verb' }),
  };
}

/** A question about terms, written as for {@link term}; one place for each. */
export function question(written: readonly string[], kind: QuestionKind = 'synonym'): Question {
  const terms = written.map(term);
  return {
    id: `${kind}:${terms.map(({ text }) => text).join('|')}`,
    kind,
    confidence: 0.5,
    worth: 0.5 * terms.slice(1).reduce((sum, { uses }) => sum + uses, 0),
    terms,
    reasons: [],
    places: terms.map((_, index) => ({ term: index, document: 0, firstToken: index, lastToken: index })),
  };
}

/** A sound termbase from its text. */
export function termbase(text: string, uri = 'file:///docs/termbase.yaml'): Termbase {
  const { termbase: parsed, problems } = parseTermbase(text, uri);
  if (problems.length > 0) throw new Error(problems.map(({ message }) => message).join('\n'));
  return parsed;
}
