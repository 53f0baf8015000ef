// Words for questions: folding of plural and spelling for keys, the text that shows a form, and figures in plain words.
import { byCountThenText, compareCodeUnits } from '../base/order.js';
import type { TokenStream } from '../corpus/stream.js';
import type { Vocabulary } from '../corpus/vocabulary.js';
import { TokenFlag } from '../tokens/tokens.js';
import { isRunningText } from './places.js';
import type { Use } from './places.js';
import type { QuestionTerm, TermForm } from './question.js';

/** Plurals that no ending tells, with their singulars; from general knowledge of English. */
const IRREGULAR = new Map(
  `indices index|vertices vertex|matrices matrix|appendices appendix|analyses analysis|hypotheses hypothesis|bases basis
  |axes axis|crises crisis|theses thesis|syntheses synthesis|parentheses parenthesis|children child|criteria criterion
  |phenomena phenomenon|schemata schema|men man|women woman|feet foot|teeth tooth|geese goose|mice mouse|lives life
  |knives knife|leaves leaf|halves half|shelves shelf|selves self|wolves wolf|aliases alias|viruses virus|buses bus
  |statuses status|corpuses corpus|bonuses bonus|canvases canvas|biases bias|lenses lens|gases gas|quizzes quiz`
    .split('|')
    .map((pair) => pair.trim().split(' ') as [string, string]),
);

/** Singulars that end in s, and words that are never taken for plurals. */
const NEVER_PLURAL = new Set(
  `alias always as atlas bias bus canvas chaos corpus gas its lens news perhaps plus pos previous process s series species
  status this thus us various versus was yes across access address less express pass`.split(/\s+/),
);

/**
 * The key that singular and plural of an English noun share, in lower case: mostly the singular. Verbs in -s fold alike,
 * and -ie folds with -y (cookies tells not which it comes from), which does no harm.
 */
export function singularKey(word: string): string {
  if (word.length > 4 && word.endsWith('ie')) return `${word.slice(0, -2)}y`;
  const irregular = IRREGULAR.get(word);
  if (irregular !== undefined) return irregular;
  if (word.length < 3 || !word.endsWith('s') || NEVER_PLURAL.has(word)) return word;
  if (/(?:ss|us|is|'s)$/.test(word)) return word;
  if (word.endsWith('ies')) return word.length > 4 ? `${word.slice(0, -3)}y` : word.slice(0, -1);
  if (/(?:sh|ch|x|ss|zz)es$/.test(word)) return word.slice(0, -2);
  return word.slice(0, -1);
}

/** "once", "twice", "31 times". */
export function times(count: number): string {
  return count === 1 ? 'once' : count === 2 ? 'twice' : `${count} times`;
}

/** "1 page", "12 pages". */
export function pages(count: number): string {
  return count === 1 ? '1 page' : `${count} pages`;
}

/**
 * The spelling that shows a set of uses: the commonest in running text inside sentences, where capitals mean something;
 * elsewhere the commonest at all. Ties by code units, lower case before capitals.
 */
export function displayText(stream: TokenStream, vocabulary: Vocabulary, uses: readonly Use[]): string {
  const inside = uses.filter(
    (use) => isRunningText(stream, use.row) && (stream.flags[use.row]! & TokenFlag.sentenceStart) === 0,
  );
  const counts = new Map<string, number>();
  for (const use of inside.length > 0 ? inside : uses) {
    const text = spelledAt(stream, vocabulary, use);
    counts.set(text, (counts.get(text) ?? 0) + 1);
  }
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
  const forms = new Set([word, key, `${key}s`, `${key}es`]);
  if (key.endsWith('y')) forms.add(`${key.slice(0, -1)}ies`).add(`${key.slice(0, -1)}ie`);
  for (const [plural, singular] of IRREGULAR) if (singular === key) forms.add(plural);
  return [...forms].filter((form) => singularKey(form) === key);
}
