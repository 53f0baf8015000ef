// Which of a question's terms to suggest, and why; and which answers the termbase would accept.
import { compareCodeUnits } from '../base/order.js';
import type { Question, QuestionTerm, Reason } from '../mining/question.js';
import { primaryLanguage } from '../text/language.js';
import type { Answer } from '../termbase/answer.js';
import type { PartOfSpeech } from '../termbase/termbase.js';
import type { Decisions } from './decisions.js';
import type { Precedents } from './precedents.js';
import type { DecidedTerm } from './termsInForce.js';

/** The term to suggest. It need not be one of the question's: a deprecated term brings its preferred one with it. */
export interface Preference {
  readonly text: string;
  readonly reason: Reason;
}

/** Decisions of one kind that must agree before they count as a habit, and how far they must outnumber the opposite. */
const HABIT_COUNT = 2;
const HABIT_RATIO = 2;

/**
 * Suggests a term: the preferred term of a concept that the question touches; else the one that the documents' own glossary
 * prefers or that past edits moved to; else the one that earlier decisions speak for, by a word within it or by its manner of
 * writing; else the most used; ties by documents, then by code units.
 */
export function preferenceOf(question: Question, decisions: Decisions, precedents: Precedents): Preference {
  return (
    decidedPreference(question, decisions) ??
    minedPreference(question) ??
    partPreference(question, precedents) ??
    habitPreference(question, precedents) ??
    mostUsed(question)
  );
}

/**
 * The answers that contradict nothing decided, the suggested one first: prefer each of the terms, *either is fine*, two
 * concepts, not now. Where the question touches a decided concept, its preferred term alone can be preferred, and
 * *either* is not offered beside a deprecated term.
 */
export function answersOf(question: Question, decisions: Decisions, precedents: Precedents): readonly Answer[] {
  const { text: suggested } = preferenceOf(question, decisions, precedents);
  const decided = question.terms.map((term) => decisions.termsOfQuestionTerm(term)[0]);
  const open = question.terms.filter((_, index) => decided[index] === undefined).map(({ text }) => text);
  const known = decided.find((term) => term !== undefined);
  const uses = question.terms.reduce((sum, term) => sum + term.uses, 0);
  const scope = { ...scopeOfAnswer(question, known), ...languageOfAnswer(question, decisions) };
  // Decided terms keep their status; their concept takes part in the answer under its preferred term.
  const terms = known === undefined ? open : [known.preferred.text, ...open];
  const preferable = known === undefined ? [suggested, ...open.filter((text) => text !== suggested)] : [suggested];
  const isDeprecated = decided.some((term) => term?.entry.status === 'deprecated');
  return [
    ...preferable.map((preferred): Answer => ({ kind: 'prefer', terms, preferred, ...scope })),
    ...(isDeprecated ? [] : [{ kind: 'either', terms, ...scope } as const]),
    { kind: 'apart', terms },
    { kind: 'later', terms: question.terms.map(({ text }) => text), uses },
  ];
}

/** What an answer says of all its terms. */
interface AnswerScope {
  readonly partOfSpeech?: PartOfSpeech;
  readonly with?: readonly string[];
}

/** Stated where the file's language, or English where it states none, is another than the question's. */
function languageOfAnswer({ language }: Question, { chain }: Decisions): { readonly language?: string } {
  const usual = primaryLanguage(chain[0]?.language) ?? 'en';
  return language === undefined || language === usual ? {} : { language };
}

/** The objects, and the part of speech to write down: a verb's alone, since most terms are nouns, and only where all terms are verbs. */
function scopeOfAnswer({ terms, objects }: Question, known: DecidedTerm | undefined): AnswerScope {
  const about = objects === undefined ? {} : { with: objects };
  if (known !== undefined)
    return known.entry.partOfSpeech ? { partOfSpeech: known.entry.partOfSpeech, ...about } : about;
  return terms.every((term) => term.partOfSpeech === 'verb') ? { partOfSpeech: 'verb', ...about } : about;
}

function decidedPreference(question: Question, decisions: Decisions): Preference | undefined {
  for (const term of question.terms) {
    const decided = decisions.termsOfQuestionTerm(term)[0];
    if (decided === undefined) continue;
    const { preferred, entry } = decided;
    const text =
      preferred === entry
        ? `“${preferred.text}” is already the preferred term`
        : `the termbase prefers “${preferred.text}” to “${entry.text}”`;
    return { text: preferred.text, reason: { kind: 'termbase', text, value: 1 } };
  }
  return undefined;
}

/** Of a question that decisions have cut down, the preferred term may be gone. */
function minedPreference({ preferred, terms }: Question): Preference | undefined {
  return terms.some(({ text }) => text === preferred?.text) ? preferred : undefined;
}

function partPreference({ terms }: Question, precedents: Precedents): Preference | undefined {
  return winner(terms, (term, rival) => {
    const part = precedents.partChoice(term.text, rival.text);
    if (part === undefined) return undefined;
    return { kind: 'part', text: `you prefer “${part.preferred}” to “${part.deprecated}”`, value: 1 };
  });
}

function habitPreference({ terms }: Question, precedents: Precedents): Preference | undefined {
  return winner(terms, (term, rival) => {
    const tally = precedents.tallyOf(term.text, rival.text);
    if (tally === undefined || tally.chosen < HABIT_COUNT || tally.chosen < HABIT_RATIO * tally.against)
      return undefined;
    const { contrast, chosen, against } = tally;
    const text = `${chosen} of ${chosen + against} earlier decisions prefer ${contrast.chosen} to ${contrast.rival}`;
    return { kind: 'habit', text, value: chosen };
  });
}

/** The one term for which there is a reason against every rival; the reason against the most used rival speaks for it. */
function winner(
  terms: readonly QuestionTerm[],
  reasonOver: (term: QuestionTerm, rival: QuestionTerm) => Reason | undefined,
): Preference | undefined {
  for (const term of terms) {
    const reasons = terms.filter((rival) => rival !== term).map((rival) => reasonOver(term, rival));
    const [first] = reasons;
    if (first !== undefined && !reasons.includes(undefined)) return { text: term.text, reason: first };
  }
  return undefined;
}

function mostUsed({ terms }: Question): Preference {
  const [first, second] = [...terms].sort(
    (a, b) => b.uses - a.uses || b.documents - a.documents || compareCodeUnits(a.text, b.text),
  );
  const { text, uses, documents } = first!;
  if (second === undefined || second.uses < uses) {
    return { text, reason: { kind: 'uses', text: `it is the most used (${times(uses)})`, value: uses } };
  }
  if (second.documents < documents) {
    const reason = `as often used as the other (${times(uses)}), but in more documents (${documents})`;
    return { text, reason: { kind: 'documents', text: reason, value: documents } };
  }
  return { text, reason: { kind: 'tie', text: `used as often as the other (${times(uses)})`, value: uses } };
}

function times(uses: number): string {
  return uses === 1 ? 'once' : `${uses} times`;
}
