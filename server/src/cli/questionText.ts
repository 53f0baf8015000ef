// Questions as text for a terminal: the terms, the reasons and sentences side by side.
import { ExampleFinder } from '../engine/examples.js';
import type { Example } from '../engine/examples.js';
import type { Snapshot } from '../engine/snapshot.js';
import type { Question } from '../mining/question.js';
import type { CliHost } from './host.js';

/** The list of questions, for a person, and how many are open in all. */
export function renderQuestions(
  snapshot: Snapshot,
  questions: readonly Question[],
  host: CliHost,
  open: number,
): string {
  const { documents, words } = snapshot.relations.size;
  const few =
    questions.length < open ? `, of which ${questions.length} ${questions.length === 1 ? 'is' : 'are'} listed` : '';
  const head = `${plural(documents, 'page')}, ${plural(words, 'word')}: ${plural(open, 'open question')}${few}.\n`;
  if (questions.length === 0) return head;
  const examples = new ExampleFinder(snapshot);
  return (
    head + questions.map((question, index) => renderOne(question, index + 1, examples.of(question), host)).join('')
  );
}

function renderOne(question: Question, number: number, examples: readonly Example[], host: CliHost): string {
  const width = Math.max(...question.terms.map(({ text }) => text.length)) + 2;
  const terms = question.terms.map(
    ({ text, uses, documents }) =>
      `    ${host.emphasise(text.padEnd(width))}${plural(uses, 'use')} on ${plural(documents, 'page')}`,
  );
  const reasons = question.reasons.map(({ text }) => `    · ${text}`);
  const sentences = examples.map(({ uri, line, text, highlight }) => {
    const marked =
      text.slice(0, highlight.start) +
      host.emphasise(text.slice(highlight.start, highlight.end)) +
      text.slice(highlight.end);
    return `      ${host.faint(`${host.pathOf(uri)}:${line}`)}\n        ${marked}`;
  });
  return `\n${String(number).padStart(3)}. ${titleOf(question)} ${host.faint(`(${question.kind}${inLanguage(question)}, ${Math.round(question.confidence * 100)} % sure)`)}\n${[...terms, ...reasons, ...sentences].join('\n')}\n`;
}

/** The language, where it is not English. */
function inLanguage({ language }: Question): string {
  return language === undefined || language === 'en' ? '' : ` in ${language}`;
}

/** The question itself, in one sentence. */
export function titleOf({ kind, terms, objects }: Question): string {
  const names = terms.map(({ text }) => `“${text}”`);
  if (kind === 'ambiguous-abbreviation') return `Does ${names.join(', ')} mean one thing everywhere?`;
  const last = names[names.length - 1]!;
  const list = names.length < 2 ? last : `${names.slice(0, -1).join(', ')} and ${last}`;
  if (kind === 'variant')
    return `Which way of writing: ${names.slice(0, -1).join(', ')} or ${names[names.length - 1]!}?`;
  if (objects !== undefined) {
    const [object, ...more] = objects.map((noun) => `“${noun}”`);
    const others = more.length > 0 ? ` (also with ${more.join(', ')})` : '';
    return `One thing to do with ${object}, ${names.length === 2 ? 'two' : String(names.length)} verbs: ${list}?${others}`;
  }
  return `One thing, ${names.length === 2 ? 'two' : String(names.length)} names: ${list}?`;
}

function plural(count: number, noun: string): string {
  return `${count.toString().replace(/\B(?=(\d{3})+$)/g, ',')} ${noun}${count === 1 ? '' : 's'}`;
}
