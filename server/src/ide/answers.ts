// Answering a question: the writer's choice as edits of the termbase in force, or the reason why it cannot be written.
import type { Answer } from '../termbase/answer.js';
import type { Snapshot } from '../engine/snapshot.js';
import { writeAnswer } from '../engine/answering.js';
import type { Question } from '../mining/question.js';
import type { TextEdit } from '../text/edits.js';

/** What a writer can say to a question. */
export type Choice =
  | { readonly kind: 'prefer'; readonly preferred: string }
  | { readonly kind: 'either' }
  | { readonly kind: 'apart' }
  | { readonly kind: 'later' };

/** Edits of one termbase file, which is to be created first where `creates` says so. */
export type AnswerEdit =
  | { readonly kind: 'edit'; readonly uri: string; readonly creates: boolean; readonly edits: readonly TextEdit[] }
  | { readonly kind: 'refused'; readonly message: string };

/**
 * The edits that write a choice into the termbase in force at `uri`, or into a new one at `newTermbaseUri`.
 * @param id of an open question; one that is no longer open is refused.
 */
export function answerQuestion(
  snapshot: Snapshot,
  uri: string,
  newTermbaseUri: string,
  id: string,
  choice: Choice,
): AnswerEdit {
  const question = snapshot.agendaAt(uri).open.find((each) => each.id === id);
  if (question === undefined) return { kind: 'refused', message: 'This question is no longer open.' };
  const termbase = snapshot.termbaseAt(uri);
  const result = writeAnswer(termbase?.text ?? '', answerOf(question, choice));
  if (result.kind === 'refused') return { kind: 'refused', message: result.message };
  return { kind: 'edit', uri: termbase?.uri ?? newTermbaseUri, creates: termbase === undefined, edits: result.edits };
}

function answerOf(question: Question, choice: Choice): Answer {
  const terms = question.terms.map(({ text }) => text);
  if (choice.kind === 'apart') return { kind: 'apart', terms };
  if (choice.kind === 'later') {
    return { kind: 'later', terms, uses: question.terms.reduce((sum, { uses }) => sum + uses, 0) };
  }
  const partOfSpeech = question.terms[0]!.partOfSpeech;
  const about = {
    terms,
    ...(partOfSpeech && { partOfSpeech }),
    ...(question.objects !== undefined && { with: question.objects }),
  };
  return choice.kind === 'either'
    ? { kind: 'either', ...about }
    : { kind: 'prefer', preferred: choice.preferred, ...about };
}
