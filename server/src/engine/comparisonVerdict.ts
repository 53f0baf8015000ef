// What the tool itself would ask about two terms, and why or why not.
import type { Relation } from '../decisions/decisions.js';
import type { Comparison } from '../mining/comparison/comparison.js';
import type { Question } from '../mining/question.js';
import type { Refusal } from '../mining/synonyms/judge.js';
import type { EngineSettings } from './snapshot.js';

/** The stage that a pair of terms comes to on its way to a question. */
export type Stage =
  'decided' | 'asked' | 'asked-on-request' | Refusal | 'not-grounded' | 'too-weak' | 'verbs' | 'writing';

/** What the tool would do about two terms. */
export interface Verdict {
  readonly stage: Stage;
  /** In plain words: what is asked, or why nothing is. */
  readonly text: string;
  readonly question?: { readonly id: string; readonly kind: string; readonly confidence: number };
}

const REFUSED: Readonly<Record<Refusal, string>> = {
  rare: 'one of them stands alone too seldom for its use to tell anything',
  separate: 'the documents themselves keep them apart, by a glossary entry or a heading for each',
  evidence: 'no source says that they are one thing strongly enough: being used alike is not enough',
  usage: 'they are not used alike enough for what speaks for them',
  lexicon: 'they are opposites, members of one list, or forms that another kind of question asks about',
};

/** A term's letters and digits alone: what is left of it in every way of joining its words. */
const letters = (text: string): string => text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');

/** The verdict; a decision in force comes before everything. */
export function verdictOf(
  { terms, usage }: Comparison,
  context: {
    readonly decided: Relation | undefined;
    readonly question: Question | undefined;
    readonly settings: EngineSettings;
  },
): Verdict {
  const { decided, question, settings } = context;
  if (decided !== undefined) {
    const says = decided === 'one-concept' ? 'one concept' : 'two concepts';
    return { stage: 'decided', text: `The termbase has decided: ${says}.` };
  }
  if (question !== undefined) {
    const { id, kind, confidence } = question;
    const isAsked = settings.kinds.includes(kind) && confidence >= settings.leastConfidence;
    const sure = `${Math.round(confidence * 100)} % sure`;
    return {
      stage: isAsked ? 'asked' : 'asked-on-request',
      text: isAsked
        ? `Evenword asks about them (${kind}, ${sure}).`
        : `Evenword asks about them on request alone (${kind}, ${sure}).`,
      question: { id, kind, confidence },
    };
  }
  if (letters(terms[0].text) === letters(terms[1].text)) {
    const text =
      'Evenword does not ask: they are two ways of writing, and too few places could take either. A word that the code on a page has as well counts as a name there.';
    return { stage: 'writing', text };
  }
  if (terms.some(({ partOfSpeech }) => partOfSpeech === 'verb')) {
    const text =
      'Evenword does not ask: verbs are asked about with an object that both have, where list or dictionary calls them synonyms.';
    return { stage: 'verbs', text };
  }
  if (usage.refusal !== undefined)
    return { stage: usage.refusal, text: `Evenword does not ask: ${REFUSED[usage.refusal]}.` };
  if (!usage.isGrounded) {
    const text =
      'Evenword does not ask: no independent source says that they are one thing; they are merely used alike.';
    return { stage: 'not-grounded', text };
  }
  const sure = `${Math.round(usage.confidence * 100)} % sure, and it asks from ${Math.round(usage.leastConfidence * 100)} %`;
  return { stage: 'too-weak', text: `Evenword does not ask: it would be ${sure}.` };
}
