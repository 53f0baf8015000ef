// What of a question is still undecided: the decided part is taken out, one question may become several.
import { hashText } from '../base/hash.js';
import { compareCodeUnits } from '../base/order.js';
import type { Question, QuestionTerm } from '../mining/question.js';
import type { Decisions } from './decisions.js';

/** How a question that is no longer asked was settled. */
export type Settlement = 'one-concept' | 'two-concepts' | 'one-and-two-concepts' | 'later';

/** The undecided rest of a question, or how it was settled. */
export interface Narrowed {
  readonly open: readonly Question[];
  readonly settled?: Settlement;
}

/**
 * Takes out of a question what the decisions answer. Terms of one concept are asked about through one of them; a term
 * whose relation to all others is decided drops out; rivals that are kept apart from each other go to separate questions.
 * An undecided question comes back as the very same object.
 */
export function narrow(question: Question, decisions: Decisions): Narrowed {
  const groups = conceptGroups(question.terms, decisions);
  const isOpen = (a: number[], b: number[]): boolean =>
    a.every((i) => b.every((j) => decisions.relationOf(question.terms[i]!, question.terms[j]!) === undefined));
  const open = undecidedSets(groups, isOpen).map((set) => subQuestion(question, set, decisions));
  if (open.length === 0) return { open, settled: settlement(groups) };
  const asked = open.filter((part) => decisions.putOff(part) === undefined);
  return asked.length > 0 ? { open: asked } : { open: asked, settled: 'later' };
}

function settlement(groups: readonly number[][]): Settlement {
  if (groups.length <= 1) return 'one-concept';
  return groups.some((group) => group.length > 1) ? 'one-and-two-concepts' : 'two-concepts';
}

/** Indices of the terms, those of one concept together; groups and their members in the question's order. */
function conceptGroups(terms: readonly QuestionTerm[], decisions: Decisions): number[][] {
  const groups: number[][] = [];
  for (const [index, term] of terms.entries()) {
    const joined = groups.filter((group) =>
      group.some((other) => decisions.relationOf(terms[other]!, term) === 'one-concept'),
    );
    const [home] = joined;
    if (home === undefined) groups.push([index]);
    else {
      home.push(index);
      for (const merged of joined.slice(1)) home.push(...groups.splice(groups.indexOf(merged), 1)[0]!);
      home.sort((a, b) => a - b);
    }
  }
  return groups;
}

/** Covers every undecided pair of groups by sets in which all pairs are undecided: greedily, in the question's order. */
function undecidedSets(groups: readonly number[][], isOpen: (a: number[], b: number[]) => boolean): number[][][] {
  const sets: number[][][] = [];
  const covered = new Set<string>();
  for (let i = 0; i < groups.length; i++) {
    for (let j = i + 1; j < groups.length; j++) {
      if (covered.has(`${i} ${j}`) || !isOpen(groups[i]!, groups[j]!)) continue;
      const members = [i, j];
      for (let k = 0; k < groups.length; k++) {
        if (!members.includes(k) && members.every((m) => isOpen(groups[m]!, groups[k]!))) members.push(k);
      }
      members.sort((a, b) => a - b);
      for (const a of members) for (const b of members) covered.add(`${a} ${b}`);
      sets.push(members.map((member) => groups[member]!));
    }
  }
  return sets;
}

function subQuestion(question: Question, groups: readonly number[][], decisions: Decisions): Question {
  const kept = groups.map((group) => spokesman(question.terms, group, decisions)).sort((a, b) => a - b);
  if (kept.length === question.terms.length) return question;
  const terms = kept.map((index) => question.terms[index]!);
  const names = terms.map(({ text }) => text).sort(compareCodeUnits);
  const rivals = terms.slice(1).reduce((sum, { uses }) => sum + uses, 0);
  return {
    ...question,
    id: `${question.id}-${hashText(names.join('\n')).toString(36)}`,
    worth: question.confidence * rivals,
    terms,
    places: question.places
      .filter(({ term }) => kept.includes(term))
      .map((place) => ({ ...place, term: kept.indexOf(place.term) })),
  };
}

/** The term that stands for its concept: the preferred one, else an admitted one, else the most used. */
function spokesman(terms: readonly QuestionTerm[], group: readonly number[], decisions: Decisions): number {
  const withStatus = (status: string): number | undefined =>
    group.find((index) => decisions.termsOfQuestionTerm(terms[index]!).some(({ entry }) => entry.status === status));
  return withStatus('preferred') ?? withStatus('admitted') ?? group[0]!;
}
