// Does a question ask about a pair of the list? Both must stand in it as different terms, compared by dictionary forms.
import { isKnown } from '../../server/src/lexicon/synonyms.js';
import type { Question, QuestionTerm } from '../../server/src/mining/question.js';
import { singularKey } from '../../server/src/mining/wording.js';
import { verbForms } from '../../server/src/rewrite/verb.js';

/** How hyphens compare: `kept` where the pair is about them, else `open`, the same as spaces. */
export type Hyphens = 'kept' | 'open';

/**
 * The place, from 1, of the first question that holds both terms as different ones, or 0. Case and plural make no
 * difference; neither does the inflection of verbs, in questions about verbs and in those about spelling.
 */
export function placeAsked(questions: readonly Question[], a: string, b: string, hyphens: Hyphens): number {
  return 1 + questions.findIndex((question) => asks(question, a, b, hyphens));
}

/** Whether a question holds both terms as different ones. */
export function asks(question: Question, a: string, b: string, hyphens: Hyphens): boolean {
  // A question about a habit of writing names the other words that it is about.
  if (question.alike?.some((terms) => asks({ ...question, terms, alike: [] }, a, b, hyphens)) === true) return true;
  const left = holders(question, a, hyphens);
  if (left.length === 0) return false;
  const right = holders(question, b, hyphens);
  return right.some((at) => left.length > 1 || left[0] !== at);
}

function holders({ kind, terms }: Question, wanted: string, hyphens: Hyphens): number[] {
  const key = nounKey(wanted, hyphens);
  return terms.flatMap((term, index) => {
    const verbal = term.partOfSpeech === 'verb' || kind === 'verb-object' || kind === 'variant';
    const holds = textsOf(term).some(
      (text) => nounKey(text, hyphens) === key || (verbal && verbKey(text, hyphens) === verbKey(wanted, hyphens)),
    );
    return holds ? [index] : [];
  });
}

function textsOf(term: QuestionTerm): string[] {
  return [term.text, ...term.forms.map(({ text }) => text)];
}

/** Lower case, each word in the singular, words separated by one space. */
export function nounKey(text: string, hyphens: Hyphens): string {
  return wordsOf(text, hyphens).map(singularKey).join(' ');
}

/** The same with inflected verbs in their base form. */
export function verbKey(text: string, hyphens: Hyphens): string {
  return wordsOf(text, hyphens)
    .map((word) => baseOfVerb(word) ?? singularKey(word))
    .join(' ');
}

function wordsOf(text: string, hyphens: Hyphens): string[] {
  const plain = text.toLowerCase().replaceAll('’', "'");
  return plain.split(hyphens === 'open' ? /[\s-]+/ : /\s+/).filter((word) => word !== '');
}

const bases = new Map<string, string | undefined>();

/** The verb that a word in -ing or -ed is a form of: one that the general dictionary knows and that inflects so. */
function baseOfVerb(word: string): string | undefined {
  if (!bases.has(word)) bases.set(word, findBase(word));
  return bases.get(word);
}

function findBase(word: string): string | undefined {
  const stem = /^(.{2,}?)(?:ing|ed)$/.exec(word)?.[1];
  if (stem === undefined) return undefined;
  const candidates = [stem, `${stem}e`, stem.slice(0, -1), `${stem.slice(0, -1)}y`];
  return candidates.find((base) => {
    if (!isKnown(base, 'verb')) return false;
    const { gerund, past } = verbForms(base);
    return gerund.includes(word) || past.includes(word);
  });
}
