// The compiled terms: one matcher over all statuses, so that the longest term decides, and what the rules ask of each term.
import { FORMS, inflectsAs, termForms, type PartOfSpeech } from '../rewrite/inflect.js';
import { CLOSED_ZONES } from '../prose/zones.js';
import type { ZoneSet } from '../prose/zones.js';
import type { CheckedTerm } from './checkedTerm.js';
import { foldText } from './foldWord.js';
import { ObjectSet } from './objectOfVerb.js';
import { TermMatcher, type OnMatch } from './termMatcher.js';

/** How far behind a match a term that overlaps it may end, in UTF-16 units. */
const REACH = 200;

/** A term with what its rules need at each match. */
export interface CompiledTerm {
  readonly checked: CheckedTerm;
  /** How it inflects and, for verbs, must be used. */
  readonly as: 'noun' | 'verb' | 'none';
  /** Matches are compared in exact case: asked for, or because another term differs from this one in case alone. */
  readonly caseSensitive: boolean;
  /** A word of its own whose spelling is also a form of a term of another part of speech. */
  readonly ambiguous: boolean;
  readonly objects: ObjectSet | undefined;
}

/** A list of terms ready for checking. Immutable; equal inputs give equal findings. */
export class TermSet {
  readonly terms: readonly CompiledTerm[];
  private readonly matcher: TermMatcher;

  /**
   * @param closed zones in which nothing is checked
   * @param inflects false in languages of which no inflection is known: terms are found as they are written, in any case
   */
  constructor(
    terms: readonly CheckedTerm[],
    readonly closed: ZoneSet = CLOSED_ZONES,
    inflects = true,
  ) {
    const inflected = (partOfSpeech: PartOfSpeech | undefined): PartOfSpeech | undefined =>
      inflects ? partOfSpeech : 'other';
    const spellings = new Map<string, Set<string>>();
    const uses = new Map<string, Set<string>>();
    for (const { text, partOfSpeech: stated } of terms) {
      const partOfSpeech = inflected(stated);
      gather(spellings, foldText(text), text);
      for (const form of termForms(text, partOfSpeech))
        gather(uses, foldText(form.text), inflectsAs(text, partOfSpeech));
    }
    this.terms = terms.map((checked): CompiledTerm => {
      const { text, withObjects, caseSensitive } = checked;
      const partOfSpeech = inflected(checked.partOfSpeech);
      return {
        checked,
        as: inflectsAs(text, partOfSpeech),
        caseSensitive: caseSensitive === true || spellings.get(foldText(text))!.size > 1,
        ambiguous: termForms(text, partOfSpeech).some((form) => uses.get(foldText(form.text))!.size > 1),
        objects: withObjects && withObjects.length > 0 ? new ObjectSet(withObjects) : undefined,
      };
    });
    this.matcher = new TermMatcher(
      this.terms.map(({ checked: { text, partOfSpeech: stated }, caseSensitive }) => {
        const partOfSpeech = inflected(stated);
        return { text, caseSensitive, ...(partOfSpeech === undefined ? {} : { partOfSpeech }) };
      }),
    );
  }

  /** Reports the terms of a text as {@link TermMatcher.scan} does. */
  scan(text: string, onMatch: OnMatch): void {
    this.matcher.scan(text, 0, text.length, onMatch);
  }

  /** True where a term that is in use (not deprecated, not asked about) begins within `[start, end)` and runs beyond `end`. */
  overlapsTermInUse(text: string, start: number, end: number): boolean {
    let furthest = 0;
    const keep: OnMatch = (index, at, stop) => {
      const { status } = this.terms[index]!.checked;
      if (at < end && status !== 'deprecated' && status !== 'undecided') furthest = Math.max(furthest, stop);
    };
    for (let from = nextWord(text, start, end); from < end; from = nextWord(text, from, end)) {
      this.matcher.scan(text, from, Math.min(text.length, end + REACH), keep);
    }
    return furthest > end;
  }
}

/** The form behind a form index. */
export function formAt(index: number): (typeof FORMS)[number] {
  return FORMS[index]!;
}

function nextWord(text: string, from: number, end: number): number {
  let at = from;
  while (at < end && /[\p{L}\p{N}_]/u.test(text.charAt(at))) at++;
  while (at < end && !/[\p{L}\p{N}_]/u.test(text.charAt(at))) at++;
  return at;
}

function gather(groups: Map<string, Set<string>>, key: string, value: string): void {
  const group = groups.get(key);
  if (group) group.add(value);
  else groups.set(key, new Set([value]));
}
