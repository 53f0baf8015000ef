// What earlier versions of the documents say to questions of any kind: which of the names writers moved to.
import { compareCodeUnits } from '../base/order.js';
import { countReplacements, directionOf } from './pastEdits.js';
import type { Direction, PastEdits, ReplacementCount } from './pastEdits.js';
import type { Question, QuestionTerm, Reason } from './question.js';

/** The kind of reason that tells of past edits. */
const KIND = 'past-edit';

/**
 * The questions, each with a reason where writers replaced one of its names by another. The name that they moved to by habit is
 * preferred, unless something else prefers one already.
 */
export function heedPastEdits(questions: readonly Question[], edits: PastEdits | undefined): Question[] {
  if (edits === undefined || edits.commits.length === 0) return [...questions];
  const names = nameOfForm(questions);
  const counts = new Map<string, ReplacementCount>();
  for (const count of countReplacements(edits, (words) => names.get(words)))
    counts.set(`${count.from}\n${count.to}`, count);
  return questions.map((question) => withMoves(question, counts, names));
}

/** Lower-case ways of writing, each with the name that its edits are counted under. */
function nameOfForm(questions: readonly Question[]): Map<string, string> {
  const names = new Map<string, string>();
  for (const { terms } of questions) {
    for (const term of terms) {
      const forms = formsOf(term);
      const name = names.get(forms[0]!) ?? forms[0]!;
      for (const form of forms) if (!names.has(form)) names.set(form, name);
    }
  }
  return names;
}

function formsOf({ text, forms }: QuestionTerm): string[] {
  return [text, ...forms.map((form) => form.text)].map((form) => form.toLowerCase());
}

interface Move {
  readonly from: string;
  readonly to: string;
  readonly direction: Direction;
}

function withMoves(
  question: Question,
  counts: ReadonlyMap<string, ReplacementCount>,
  names: ReadonlyMap<string, string>,
): Question {
  const moves: Move[] = [];
  const nameOf = (term: QuestionTerm): string => names.get(term.text.toLowerCase())!;
  for (const from of question.terms) {
    for (const to of question.terms) {
      const forth = counts.get(`${nameOf(from)}\n${nameOf(to)}`);
      const direction = forth && directionOf(forth, counts.get(`${nameOf(to)}\n${nameOf(from)}`));
      if (direction !== undefined) moves.push({ from: from.text, to: to.text, direction });
    }
  }
  if (moves.length === 0) return question;
  moves.sort((a, b) => b.direction.times - a.direction.times || compareCodeUnits(a.to, b.to));
  const told = question.reasons.some(({ kind }) => kind === KIND);
  const reasons = told ? question.reasons : [...question.reasons, ...moves.map(reasonOf)];
  const left = new Set(moves.map(({ from }) => from));
  const chosen = moves.find(({ to, direction }) => direction.isHabit && !left.has(to));
  if (chosen === undefined || question.preferred !== undefined) return { ...question, reasons };
  return { ...question, reasons, preferred: { text: chosen.to, reason: reasonOf(chosen) } };
}

function reasonOf({ from, to, direction }: Move): Reason {
  const { text, times: value } = direction;
  return { kind: KIND, text: `writers replaced “${from}” by “${to}” ${text}`, value };
}
