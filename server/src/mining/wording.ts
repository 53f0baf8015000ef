// Words for questions: folding of plural and spelling for keys, the text that shows a form, and figures in plain words.
import { byCountThenText, compareCodeUnits } from '../base/order.js';
import type { TokenStream } from '../corpus/stream.js';
import type { Vocabulary } from '../corpus/vocabulary.js';
import { pluralsOf, singularOf } from '../lexicon/plurals.js';
import { isInsideSentence } from './places.js';
import type { Use } from './places.js';
import type { QuestionTerm, TermForm } from './question.js';

/**
 * The key that singular and plural of an English noun share, in lower case: mostly the singular. Verbs in -s fold alike,
 * and -ie folds with -y ("cookies" does not tell which it comes from), which does no harm.
 */
export function singularKey(word: string): string {
  const singular = singularOf(word);
  return singular.length > 4 && singular.endsWith('ie') ? `${singular.slice(0, -2)}y` : singular;
}

/** Nouns after the text of a control or the name of a product: what stands before in capitals is such a name. */
export const LABELLED_THINGS = new Set(
  `plugin plugins page pages tab tabs menu button buttons panel pane screen window dialog option options section field view
  app application box link icon list dropdown setting settings checkbox radio column project framework editor`.split(
    /\s+/,
  ),
);

/** "once", "twice", "31 times". */
export function times(count: number): string {
  return count === 1 ? 'once' : count === 2 ? 'twice' : `${count} times`;
}

/** "1 page", "12 pages". */
export function pages(count: number): string {
  return count === 1 ? '1 page' : `${count} pages`;
}

/** From this share of lower-case uses on, capitals are not part of a word. */
const LOWER_SHARE = 0.15;

/**
 * The spelling that shows a set of uses, as it stands inside sentences of running text, where capitals mean something:
 * lower case unless it is all but always capitalised, else the commonest. Ties by code units, lower case before capitals.
 */
export function displayText(stream: TokenStream, vocabulary: Vocabulary, uses: readonly Use[]): string {
  const inside = uses.filter((use) => isInsideSentence(stream, use.row));
  const counts = new Map<string, number>();
  for (const use of inside.length > 0 ? inside : uses) {
    const text = spelledAt(stream, vocabulary, use);
    counts.set(text, (counts.get(text) ?? 0) + 1);
  }
  const lower = [...counts].find(([text]) => text === text.toLowerCase());
  if (lower !== undefined && inside.length > 0 && lower[1] >= LOWER_SHARE * inside.length) return lower[0];
  const best = [...counts].sort(([a, m], [b, n]) => n - m || -compareCodeUnits(a, b))[0];
  return inside.length > 0 ? best![0] : lowerUnlessCamel(best![0]);
}

/** A use as it is spelled in its document, one space between words. */
export function spelledAt(stream: TokenStream, vocabulary: Vocabulary, use: Use): string {
  let text = vocabulary.textOf(stream.spelling[use.row]!);
  for (let i = 1; i < use.length; i++) text += ` ${vocabulary.textOf(stream.spelling[use.row + i]!)}`;
  return text;
}

function lowerUnlessCamel(text: string): string {
  return /\p{Ll}\p{Lu}|\p{Lu}\p{Lu}/u.test(text) ? text : text.toLowerCase();
}

/** A term of a question: its forms most used first, and their figures together. */
export function makeTerm(
  forms: readonly { readonly text: string; readonly count: number }[],
  documents: number,
  lead?: string,
): QuestionTerm {
  const sorted = [...forms].sort(byCountThenText);
  const uses = sorted.reduce((sum, form) => sum + form.count, 0);
  const listed: TermForm[] = sorted.map((form) => ({ text: form.text, uses: form.count }));
  return { text: lead ?? sorted[0]!.text, uses, documents, forms: listed };
}

/** Most used first, ties by code units. */
export function byUses(a: QuestionTerm, b: QuestionTerm): number {
  return b.uses - a.uses || compareCodeUnits(a.text, b.text);
}

/** The forms, singular and plural, that share a word's {@link singularKey}; some of them may be no words. */
export function numberForms(word: string): string[] {
  const key = singularKey(word);
  const forms = new Set([word, key, `${key}s`, ...pluralsOf(key)]);
  if (key.endsWith('y')) forms.add(`${key.slice(0, -1)}ie`);
  return [...forms].filter((form) => singularKey(form) === key);
}
