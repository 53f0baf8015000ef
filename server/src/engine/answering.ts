// The door to the termbase's writing for those who hold a snapshot.
export { answerEdits as writeAnswer } from '../termbase/edit.js';
export type { AnswerEdits } from '../termbase/edit.js';
