// Mends of parts of speech that a general tagger gets wrong in instructions.
import { BEFORE_BASE_FORM, DETERMINERS, OPENING_NOUNS } from './closedWords.js';
import type { WordForm } from './shownForms.js';
import { TAG, type Tag, TokenFlag } from './tokens.js';
import type { WinkLexicon } from './winkLexicon.js';

/** The rows of one block, as the mends see them: `forms` has a form for words alone. */
export interface TaggedRows {
  readonly tag: Uint8Array;
  readonly flags: Uint8Array;
  readonly forms: readonly (WordForm | undefined)[];
}

const CERTAIN_DETERMINERS = new Set('the a an its your our their my his every another no'.split(' '));
const { NOUN, PROPN, VERB, ADJ, AUX, ADV, PART, PRON } = TAG;
const FULL_OR_AUXILIARY = new Set('have has had having do does did doing done'.split(' '));
/** How many adverbs and pronouns may stand between an auxiliary and its verb: `do you not always want`. */
const REACH = 4;

/**
 * Changes tags in place: an imperative noun at a sentence's start before a determiner is a verb; so is a noun between *to* or a modal
 * and a determiner; a verb between a determiner and a noun is an adjective; *have* and *do* that help no verb are verbs.
 */
export function mendTags({ tag, flags, forms }: TaggedRows, lexicon: WinkLexicon): void {
  const last = tag.length - 1;
  let opening = false;
  for (let row = 0; row < last; row++) {
    if ((flags[row]! & TokenFlag.sentenceStart) !== 0) opening = true;
    const form = forms[row];
    if (form === undefined) continue;
    const isOpening = opening;
    opening = false;
    const now = tag[row];
    if (now === NOUN || now === PROPN) {
      const next = forms[row + 1];
      const determined = next !== undefined && DETERMINERS.has(next.lower);
      const before = row === 0 ? undefined : forms[row - 1];
      const governed = before !== undefined && now === NOUN && BEFORE_BASE_FORM.has(before.lower);
      if (governed && (determined || before.lower !== 'to') && mayBeBaseVerb(form, lexicon)) tag[row] = VERB;
      else if (isOpening && determined && !OPENING_NOUNS.has(form.lower) && mayBeBaseVerb(form, lexicon))
        tag[row] = VERB;
    } else if (now === AUX) {
      if (FULL_OR_AUXILIARY.has(form.lower) && !helps(tag, forms, row)) tag[row] = VERB;
    } else if (now === VERB && row > 0 && (tag[row + 1] === NOUN || tag[row + 1] === PROPN)) {
      const before = forms[row - 1];
      if (before !== undefined && CERTAIN_DETERMINERS.has(before.lower)) tag[row] = ADJ;
    }
  }
}

/** True where a verb comes after the auxiliary at a row, with nothing between but adverbs, negation and pronouns, or nothing at all comes. */
function helps(tag: Uint8Array, forms: TaggedRows['forms'], row: number): boolean {
  for (let at = row + 1; at < tag.length && at <= row + REACH; at++) {
    const next = tag[at];
    if (next === VERB || next === AUX) return true;
    if (next !== ADV && next !== PART && next !== PRON) return false;
    if (forms[at]?.lower === 'to') return false;
  }
  return false;
}

function mayBeBaseVerb(form: WordForm, lexicon: WinkLexicon): boolean {
  const { lower } = form;
  if (known(lower, 'VERB', lexicon)) return true;
  if (lexicon.knows(lower)) return false;
  return /^[a-z-]+$/.test(lower) && !lower.endsWith('s');
}

function known(lower: string, tag: Tag, lexicon: WinkLexicon): boolean {
  return lexicon.isBaseForm(lower, tag);
}
