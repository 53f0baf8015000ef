// From decisions and open questions to the terms that pages are checked for.
import { compareCodeUnits } from '../base/order.js';
import type { Agenda } from '../decisions/decide.js';
import type { CheckedTerm } from '../findings/checkedTerm.js';
import type { Question, QuestionTerm } from '../mining/question.js';
import { languageOfConcept } from '../termbase/language.js';
import { termKey } from '../termbase/termKey.js';

/**
 * The terms of an agenda, in a fixed order: decided ones with their status; terms kept apart, which protect their words;
 * and the names of open questions. The leading name of a question has no rival named: it is no finding, so that a page that
 * keeps to the leading names is quiet.
 */
export function checkedTerms(agenda: Agenda): CheckedTerm[] {
  const terms = [...decidedTerms(agenda), ...apartTerms(agenda)];
  const decided = new Set(terms.map(({ text }) => termKey(text)));
  for (const question of agenda.open) terms.push(...undecidedTerms(question, decided));
  return terms;
}

function decidedTerms(agenda: Agenda): CheckedTerm[] {
  const files = new Map(agenda.decisions.chain.map((termbase) => [termbase.uri, termbase]));
  return agenda.decisions.concepts.flatMap(({ concept, uri, terms }) =>
    terms.map(({ entry, preferred }): CheckedTerm => {
      const conceptId = concept.id ?? `${uri}#${concept.preferred.key}`;
      const file = files.get(uri);
      const language = file && languageOfConcept(concept, file);
      return {
        ...(language !== undefined && { language }),
        ...{ id: `${conceptId} ${entry.text}`, text: entry.text, status: entry.status, conceptId },
        ...(entry.status !== 'preferred' && { preferred: preferred.text }),
        ...(entry.partOfSpeech && { partOfSpeech: entry.partOfSpeech }),
        ...(concept.with.length > 0 && { withObjects: concept.with.map(({ text }) => text) }),
        ...((entry.caseSensitive || termKey(entry.text) === preferred.key) &&
          entry.status === 'deprecated' && { caseSensitive: true }),
      };
    }),
  );
}

function apartTerms({ decisions }: Agenda): CheckedTerm[] {
  const known = new Map<string, CheckedTerm>();
  for (const { apart } of decisions.chain) {
    for (const { terms } of apart) {
      for (const { text, key } of terms) {
        if (decisions.termsOf(text).length > 0 || known.has(key)) continue;
        known.set(key, { id: `apart ${key}`, text, status: 'apart', conceptId: `apart ${key}` });
      }
    }
  }
  return [...known.values()].sort((a, b) => compareCodeUnits(a.id, b.id));
}

function undecidedTerms(question: Question, decided: ReadonlySet<string>): CheckedTerm[] {
  const [leading] = question.terms;
  return question.terms
    .filter((term) => !decided.has(termKey(term.text)))
    .map((term): CheckedTerm => ({
      ...{ id: `${question.id} ${term.text}`, text: term.text, status: 'undecided', conceptId: question.id },
      ...(term !== leading && { preferred: leading!.text }),
      ...(term.partOfSpeech && { partOfSpeech: term.partOfSpeech }),
      ...(question.language !== undefined && { language: question.language }),
      ...(question.objects !== undefined && { withObjects: question.objects }),
      ...(differsByCaseAlone(term, question) && { caseSensitive: true }),
    }));
}

function differsByCaseAlone(term: QuestionTerm, question: Question): boolean {
  return question.terms.some((other) => other !== term && termKey(other.text) === termKey(term.text));
}
