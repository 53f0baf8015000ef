// The forms of a whole term: its head word is inflected, the rest stays.
import { numberOf, pluralForms } from './noun.js';
import { verbForms } from './verb.js';

/** The forms that a term occurs in. Append only: positions are form codes. */
export const FORMS = ['base', 'plural', 'thirdPerson', 'past', 'participle', 'gerund'] as const;
export type Form = (typeof FORMS)[number];

/** Part of speech as the termbase states it. */
export type PartOfSpeech = 'noun' | 'verb' | 'adjective' | 'adverb' | 'other';

/** One way to write a term. */
export interface InflectedTerm {
  readonly form: Form;
  readonly text: string;
}

const PARTICLE = /^(?:in|out|up|down|off|on|over|back|through|away|around|along|apart|aside|forward|into|onto)$/;
const PREPOSITION = /^(?:of|for|in|on|at|to|from|with|by|per|as|between|under|over|without)$/;

/** How a term inflects: stated, or read off a verb with its particle (*log in*), else as a noun. */
export function inflectsAs(text: string, partOfSpeech?: PartOfSpeech): 'noun' | 'verb' | 'none' {
  if (partOfSpeech === 'verb' || partOfSpeech === 'noun') return partOfSpeech;
  if (partOfSpeech !== undefined) return 'none';
  const words = text.split(/\s+/);
  return words.length > 1 && words.length < 4 && PARTICLE.test(words[words.length - 1]!.toLowerCase())
    ? 'verb'
    : 'noun';
}

/** The range of the head word in a term: a verb's first word; a noun's last, or the one before its preposition (*point of sale*). */
export function headOf(text: string, as: 'noun' | 'verb' | 'none'): { start: number; end: number } {
  // A single letter and its hyphen belong to the word behind them: e-mails, X-rays.
  const words = [...text.matchAll(/(?:(?<![^\s-])\p{L}-)?[^\s-]+/gu)].map((match) => ({
    start: match.index,
    end: match.index + match[0].length,
  }));
  if (words.length === 0) return { start: 0, end: text.length };
  if (as === 'verb') {
    // A hyphenated verb inflects at its end (copy-pasted), an open one at its first word (logged in).
    const open = text.search(/\s/);
    const first = open < 0 ? text : text.slice(0, open);
    const hyphen = first.lastIndexOf('-');
    return { start: hyphen + 1, end: first.length };
  }
  const preposition = words.findIndex(
    ({ start, end }, at) => at > 0 && at < words.length - 1 && PREPOSITION.test(text.slice(start, end).toLowerCase()),
  );
  return preposition > 0 ? words[preposition - 1]! : words[words.length - 1]!;
}

/** Every form of a term, its base first; alternatives of one form follow one another, the usual one first. */
export function termForms(text: string, partOfSpeech?: PartOfSpeech): readonly InflectedTerm[] {
  const as = inflectsAs(text, partOfSpeech);
  const forms: InflectedTerm[] = [{ form: 'base', text }];
  if (as === 'none') return forms;
  const { start, end } = headOf(text, as);
  const head = text.slice(start, end);
  const add = (form: Form, heads: readonly string[]): void => {
    for (const word of heads) {
      const whole = text.slice(0, start) + word + text.slice(end);
      if (!forms.some((known) => known.form === form && known.text === whole)) forms.push({ form, text: whole });
    }
  };
  if (!/\p{L}$/u.test(head)) return forms;
  if (as === 'noun') {
    if (numberOf(head) === 'plural') return forms;
    add(
      'plural',
      pluralForms(head).filter((word) => word !== head),
    );
    return forms;
  }
  const verb = verbForms(head.toLowerCase());
  const cased = (words: readonly string[]): string[] => words.map((word) => likeHead(head, word));
  add('thirdPerson', cased(verb.thirdPerson));
  add('past', cased(verb.past));
  add('participle', cased(verb.participle));
  add('gerund', cased(verb.gerund));
  return forms;
}

/** The term in the form asked for, by its usual spelling; undefined where it has no such form. */
export function inflectTerm(text: string, form: Form, partOfSpeech?: PartOfSpeech): string | undefined {
  const found = termForms(text, partOfSpeech).find((inflected) => inflected.form === form);
  return found?.text;
}

function likeHead(head: string, word: string): string {
  const lower = head.toLowerCase();
  let shared = 0;
  while (shared < head.length && shared < word.length && lower[shared] === word[shared]) shared++;
  return shared > 0 ? head.slice(0, shared) + word.slice(shared) : word;
}
