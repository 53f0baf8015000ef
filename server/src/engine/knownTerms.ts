// Terms as a person types them: their spellings in the documents, and the nearest known names where there are none.
import { byCountThenText } from '../base/order.js';
import { usesOfForms } from '../mining/companions/companions.js';
import { termForms } from '../rewrite/inflect.js';
import { nearestName } from '../termbase/nearestName.js';
import { termKey, termText } from '../termbase/termKey.js';
import type { LanguageRelations } from './relations.js';
import type { Snapshot } from './snapshot.js';

/** A term that no document uses. */
export interface UnknownTerm {
  readonly kind: 'unknown';
  readonly term: string;
  /** Known names that it may be a slip of; may be empty. */
  readonly nearest: readonly string[];
}

/** Words used fewer times than this are no suggestion. */
const FEWEST_USES = 2;

/** The lower-case spellings of a term: inflected as noun and as verb, with the forms that open questions know of it. */
export function spellingsOf(snapshot: Snapshot, term: string): string[] {
  const text = termText(term);
  const forms = [...termForms(text, 'noun'), ...termForms(text, 'verb')].map((form) => form.text);
  const key = termKey(text);
  for (const question of snapshot.relations.questions) {
    for (const { text: asked, forms: known } of question.terms) {
      if (termKey(asked) === key) forms.push(...known.map((form) => form.text));
    }
  }
  return [...new Set(forms.map((form) => form.toLowerCase()))];
}

/**
 * Of the languages whose documents use each of some terms the one that uses them most, ties by its tag; undefined where there
 * is none.
 * @param terms each by its lower-case spellings
 */
export function languageOf(
  snapshot: Snapshot,
  ...terms: readonly (readonly string[])[]
): LanguageRelations | undefined {
  const used = snapshot.relations.languages
    .map((each) => ({ each, uses: terms.map((forms) => usesOfForms(each.corpus, forms).length) }))
    .filter(({ uses }) => !uses.includes(0))
    .map(({ each, uses }) => ({ each, text: each.language, count: uses.reduce((sum, some) => sum + some, 0) }));
  return used.sort(byCountThenText)[0]?.each;
}

/** What a term that nothing uses may be a slip of: a decided or asked-about name, else the nearest words in its place. */
export function unknownTerm(snapshot: Snapshot, term: string): UnknownTerm {
  const names = new Set<string>();
  for (const { termbase } of snapshot.termbases)
    for (const { terms } of termbase.concepts) for (const { text } of terms) names.add(text);
  for (const { terms } of snapshot.relations.questions) for (const { text } of terms) names.add(text);
  const known = [...names].filter((name) => languageOf(snapshot, spellingsOf(snapshot, name)) !== undefined);
  const nearest = new Set<string>();
  const name = nearestName(term, known);
  if (name !== undefined) nearest.add(name);
  const respelled = respell(snapshot, termText(term));
  if (respelled !== undefined) nearest.add(respelled);
  return { kind: 'unknown', term, nearest: [...nearest] };
}

/** The term with each word that no document has replaced by the nearest that some has. */
function respell(snapshot: Snapshot, term: string): string | undefined {
  const words = new Set<string>();
  for (const { corpus } of snapshot.relations.languages) {
    for (let word = 0; word < corpus.vocabulary.size; word++) {
      if (corpus.stream.rowsOf(word).length >= FEWEST_USES) words.add(corpus.vocabulary.textOf(word));
    }
  }
  const known = [...words].filter((word) => /^\p{L}/u.test(word));
  const spelled = term
    .toLowerCase()
    .split(' ')
    .map((word) => (words.has(word) ? word : nearestName(word, known)));
  if (spelled.includes(undefined)) return undefined;
  const whole = spelled.join(' ');
  return languageOf(snapshot, [whole]) === undefined ? undefined : whole;
}
