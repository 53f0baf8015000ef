// Mends of parts of speech that a general tagger gets wrong in instructions.
import { BEFORE_BARE_VERB } from './closedWords.js';
import { Role } from './roles.js';
import type { WordForm } from './shownForms.js';
import { TAG, TokenFlag } from './tokens.js';
import type { WinkLexicon } from './winkLexicon.js';

/** The rows of one block, as the mends see them: `forms` has a form for words alone. */
export interface TaggedRows {
  readonly tag: Uint8Array;
  readonly flags: Uint8Array;
  readonly forms: readonly (WordForm | undefined)[];
}

const { NOUN, PROPN, VERB, ADJ, AUX, ADV, PART, PRON, NUM, PUNCT, SYM, DET, OPAQUE } = TAG;
/** How far an auxiliary's verb may be: `do you not always want`. */
const REACH = 4;

/**
 * Changes tags in place, from left to right:
 * an imperative noun at a sentence's start before a determiner is a verb; so is a noun between *to* or a modal and a determiner;
 * a noun in -ing before a determiner is a verb with its object; a verb between a determiner and a noun is an adjective;
 * *have* and *do* that help no verb are verbs.
 */
export function mendTags({ tag, flags, forms }: TaggedRows, lexicon: WinkLexicon): void {
  let opening = false;
  for (let row = 0; row < tag.length; row++) {
    if ((flags[row]! & TokenFlag.sentenceStart) !== 0) opening = true;
    const form = forms[row];
    const now = tag[row];
    if (form === undefined) {
      // A list's number and an opening bracket leave the sentence's first word to come.
      if (now !== NUM && now !== PUNCT && now !== SYM) opening = false;
      continue;
    }
    if (now === NOUN || now === PROPN) {
      const before = row === 0 ? undefined : forms[row - 1];
      if (isVerbInDisguise(form, now, before, forms[row + 1], opening, lexicon)) tag[row] = VERB;
    } else if (now === AUX) {
      if (has(form, Role.fullOrAuxiliary) && !helps(tag, forms, row)) tag[row] = VERB;
    } else if (now === VERB && row > 0 && (tag[row + 1] === NOUN || tag[row + 1] === PROPN)) {
      if (has(forms[row - 1], Role.certainDeterminer)) tag[row] = ADJ;
    }
    if (tag[row] === VERB && isHeadNoun({ tag, flags, forms }, row, lexicon)) tag[row] = NOUN;
    opening = false;
  }
}

/**
 * True for a base form that ends a noun phrase in the singular, as in "the replica set of": as a verb it would not agree with its subject.
 * After an auxiliary or a causative ("let the user set") the base form is right.
 */
function isHeadNoun({ tag, forms }: TaggedRows, row: number, lexicon: WinkLexicon): boolean {
  const before = row === 0 ? undefined : tag[row - 1];
  if (before !== NOUN && before !== PROPN && before !== OPAQUE) return false;
  const { lower } = forms[row]!;
  if (!lexicon.isBaseForm(lower, 'NOUN') || !lexicon.isBaseForm(lower, 'VERB') || /(?:s|ing)$/.test(lower))
    return false;
  if (forms[row - 1]?.lower.endsWith('s') === true || forms[row + 1]?.lower === 'to') return false;
  const next = tag[row + 1];
  if (next === DET || next === PRON || next === NUM || next === ADJ) return false;
  let at = row - 1;
  while (at > 0 && at > row - REACH && (tag[at] === NOUN || tag[at] === PROPN || tag[at] === OPAQUE || tag[at] === ADJ))
    at--;
  if (!has(forms[at], Role.certainDeterminer)) return false;
  const governor = at === 0 ? undefined : forms[at - 1];
  return governor === undefined || (tag[at - 1] !== AUX && !BEFORE_BARE_VERB.has(governor.lower));
}

function isVerbInDisguise(
  form: WordForm,
  now: number,
  before: WordForm | undefined,
  next: WordForm | undefined,
  opening: boolean,
  lexicon: WinkLexicon,
): boolean {
  const determined = has(next, Role.determiner);
  if (now === NOUN && before !== undefined && has(before, Role.beforeBaseForm)) {
    // After *to* a noun may stand ("compared to clouds"); after a modal none does.
    if ((determined || before.lower !== 'to') && mayBeBaseVerb(form, lexicon)) return true;
  }
  if (!determined) return false;
  if (opening && !has(form, Role.openingNoun) && mayBeBaseVerb(form, lexicon)) return true;
  return form.lower.endsWith('ing') && has(next, Role.certainDeterminer) && lexicon.canBe(form.lower, 'VERB');
}

/** True where a verb comes after the auxiliary at a row, with nothing between but adverbs, negation and pronouns. */
function helps(tag: Uint8Array, forms: TaggedRows['forms'], row: number): boolean {
  for (let at = row + 1; at < tag.length && at <= row + REACH; at++) {
    const next = tag[at];
    if (next === VERB || next === AUX) return true;
    if (next !== ADV && next !== PART && next !== PRON) return false;
    if (forms[at]?.lower === 'to') return false;
  }
  return false;
}

function has(form: WordForm | undefined, role: number): boolean {
  return form !== undefined && (form.roles & role) !== 0;
}

/** True where the word is known as a verb's base form, or is unknown and may be one. */
function mayBeBaseVerb({ lower }: WordForm, lexicon: WinkLexicon): boolean {
  if (lexicon.isBaseForm(lower, 'VERB')) return true;
  return !lexicon.knows(lower) && /^[a-z-]+$/.test(lower) && !lower.endsWith('s');
}
