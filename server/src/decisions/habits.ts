// Habits of writing (-ise and -ize, "pre-" with and without a hyphen): questions about one habit are asked one at a time.
import type { Question } from '../mining/question.js';

/** Prefixes that are written with and without a hyphen. Common practice, no source. */
const PREFIXES =
  `anti auto bi co counter cross de extra hyper infra inter intra macro mega meta micro mid mini mis mono multi
  non off omni out over para peri poly post pre pro proto pseudo re semi sub super tele trans tri ultra un under uni up`.split(
    /\s+/,
  );

/** Endings that two spellings differ in, by the letters that differ, and how the habit reads. */
const ENDINGS: readonly { readonly letters: string; readonly around: RegExp; readonly name: string }[] = [
  { letters: 's/z', around: /is(?:e|es|ed|ing|ers?|able|ations?|ational)$/, name: '-ise and -ize' },
  { letters: '/u', around: /o(?:r|rs|red|ring|rite|rites|rful|rable|ral)$/, name: '-or and -our' },
  { letters: '/l', around: /l(?:ed|ing|ers?|able|ations?)$/, name: '-l- and -ll-' },
  { letters: 'er/re', around: /ers?$/, name: '-er and -re' },
  { letters: '/e', around: /ered$/, name: '-er and -re' },
  { letters: 'c/s', around: /[aeiou]n?[cs](?:e|es)$/, name: '-ce and -se' },
];

/** The habit that a question about ways of writing asks about, or undefined where it is about one word alone. */
export function habitOf({ kind, terms }: Question): string | undefined {
  if (kind !== 'variant' || terms.length !== 2) return undefined;
  const [a, b] = terms.map(({ text }) => text.toLowerCase()).sort() as [string, string];
  return hyphenHabit(a, b) ?? hyphenHabit(b, a) ?? spellingHabit(a, b);
}

/** A key of the habit: two languages have habits of their own, though they write a prefix alike. */
export function habitKeyOf(question: Question): string | undefined {
  const habit = habitOf(question);
  return habit === undefined ? undefined : `${question.language ?? 'en'} ${habit}`;
}

function hyphenHabit(hyphened: string, closed: string): string | undefined {
  const at = hyphened.indexOf('-');
  if (at < 0 || hyphened.indexOf('-', at + 1) >= 0 || hyphened.replace('-', '') !== closed) return undefined;
  const prefix = hyphened.slice(0, at);
  return PREFIXES.includes(prefix) ? `“${prefix}-” with and without a hyphen` : undefined;
}

function spellingHabit(a: string, b: string): string | undefined {
  let start = 0;
  while (start < a.length && a[start] === b[start]) start++;
  let end = 0;
  while (end < Math.min(a.length, b.length) - start && a[a.length - 1 - end] === b[b.length - 1 - end]) end++;
  const letters = [a.slice(start, a.length - end), b.slice(start, b.length - end)].sort().join('/');
  return ENDINGS.find((ending) => ending.letters === letters && ending.around.test(a))?.name;
}

/** Questions to ask now, and those that wait for another one about the same habit to be answered. */
export interface ByHabit {
  readonly open: readonly Question[];
  readonly waiting: readonly Question[];
}

/**
 * Keeps the first question about each habit; the others wait, and the first one names their words and is worth what they are
 * worth together. Those of which `putOff` has the key wait altogether.
 * @param questions the worthiest first
 */
export function byHabit(questions: readonly Question[], putOff: ReadonlySet<string>): ByHabit {
  const open: Question[] = [];
  const followers = new Map<string, Question[]>();
  const waiting: Question[] = [];
  for (const question of questions) {
    const habit = habitKeyOf(question);
    const group = habit === undefined ? undefined : followers.get(habit);
    if (habit === undefined) open.push(question);
    else if (putOff.has(habit)) waiting.push(question);
    else if (group !== undefined) {
      group.push(question);
      waiting.push(question);
    } else {
      followers.set(habit, []);
      open.push(question);
    }
  }
  return {
    open: open.map((question) => withFollowers(question, followers.get(habitKeyOf(question) ?? '') ?? [])),
    waiting,
  };
}

/** Words that a reason names at most. */
const MOST_NAMED = 4;

function withFollowers(question: Question, others: readonly Question[]): Question {
  if (others.length === 0) return question;
  const named = others.slice(0, MOST_NAMED).map(({ terms }) => terms.map(({ text }) => `“${text}”`).join(' and '));
  const more = others.length > named.length ? ` and ${others.length - named.length} more` : '';
  const text = `${habitOf(question)!} in ${others.length === 1 ? 'another word' : `${others.length} more words`}: ${named.join(', ')}${more}`;
  return {
    ...question,
    worth: others.reduce((sum, { worth }) => sum + worth, question.worth),
    alike: others.map(({ terms }) => terms),
    reasons: [...question.reasons, { kind: 'habit', text, value: others.length }],
  };
}
