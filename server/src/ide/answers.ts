// Answering a question: the answers that can be given, and the chosen one as edits of the termbase in force.
import { answersOf } from '../decisions/preference.js';
import { writeAnswer } from '../engine/answering.js';
import type { Snapshot } from '../engine/snapshot.js';
import type { Question } from '../mining/question.js';
import type { Answer } from '../termbase/answer.js';
import type { TextEdit } from '../text/edits.js';

/** Which of the offered answers a writer chose. */
export interface Choice {
  readonly kind: Answer['kind'];
  /** With `prefer`: the chosen term. */
  readonly preferred?: string;
}

/** An answer that can be given, with the words that offer it. */
export interface OfferedAnswer {
  readonly title: string;
  readonly choice: Choice;
}

/** Edits of one termbase file, which is to be created first where `creates` says so. */
export type AnswerEdit =
  | { readonly kind: 'edit'; readonly uri: string; readonly creates: boolean; readonly edits: readonly TextEdit[] }
  | { readonly kind: 'refused'; readonly message: string };

/** The answers that contradict nothing decided where the URI stands, the suggested one first. */
export function offeredAnswers(snapshot: Snapshot, uri: string, question: Question): OfferedAnswer[] {
  const { decisionsFor, precedents } = snapshot.agendaAt(uri);
  return answersOf(question, decisionsFor(question), precedents).map((answer) => ({
    title: titleOf(answer),
    choice: { kind: answer.kind, ...(answer.kind === 'prefer' && { preferred: answer.preferred }) },
  }));
}

/**
 * The edits that write a choice into the termbase in force at `uri`, or into a new one at `newTermbaseUri`.
 * @param id of an open question; a question or answer that is no longer open is refused.
 */
export function answerQuestion(
  snapshot: Snapshot,
  uri: string,
  newTermbaseUri: string,
  id: string,
  choice: Choice,
): AnswerEdit {
  const { open, decisionsFor, precedents } = snapshot.agendaAt(uri);
  const question = open.find((each) => each.id === id);
  const answer =
    question &&
    answersOf(question, decisionsFor(question), precedents).find(
      (each) => each.kind === choice.kind && (each.kind !== 'prefer' || each.preferred === choice.preferred),
    );
  if (answer === undefined) return { kind: 'refused', message: 'This question is no longer open.' };
  const termbase = snapshot.termbaseAt(uri);
  const result = writeAnswer(termbase?.text ?? '', answer);
  if (result.kind === 'refused') return { kind: 'refused', message: result.message };
  return { kind: 'edit', uri: termbase?.uri ?? newTermbaseUri, creates: termbase === undefined, edits: result.edits };
}

function titleOf(answer: Answer): string {
  const quoted = answer.terms.map((term) => `“${term}”`);
  const names = `${quoted.slice(0, -1).join(', ')} and ${quoted[quoted.length - 1]!}`;
  const objects = 'with' in answer ? ` (with ${answer.with.map((noun) => `“${noun}”`).join(', ')})` : '';
  switch (answer.kind) {
    case 'prefer':
      return `Prefer “${answer.preferred}”${objects}`;
    case 'either':
      return `Either is fine: ${names} name one concept${objects}`;
    case 'apart':
      return `Two concepts: keep ${names} apart`;
    case 'later':
      return `Not now: do not ask about ${names}`;
  }
}
