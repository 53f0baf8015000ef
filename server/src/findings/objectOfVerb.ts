// Whether a verb at its place has one of the objects that a decision is about: "launch the nightly job", "the job is launched".
import { termForms, type Form } from '../rewrite/inflect.js';
import { foldText } from './foldWord.js';
import { AFTER_OBJECT, AUXILIARIES, BE_FORMS, PREPOSITIONS } from './closedWords.js';
import { wordsAfter, wordsBefore, type NearbyWord } from './nearbyWords.js';

const REACH = 5;

/** The objects of a decision, in all their forms, folded. */
export class ObjectSet {
  private readonly phrases: readonly (readonly string[])[];

  constructor(objects: readonly string[]) {
    const spellings = new Set(objects.flatMap((object) => termForms(object, 'noun').map(({ text }) => foldText(text))));
    this.phrases = [...spellings].map((spelling) => spelling.split(' '));
  }

  /** True where the verb at `[start, end)` governs one of the objects, within a few words and the same clause. */
  isObjectOf(text: string, start: number, end: number, form: Form): boolean {
    if (this.followsActive(wordsAfter(text, end, REACH))) return true;
    return (form === 'past' || form === 'participle') && this.isPassiveSubject(wordsBefore(text, start, REACH + 3));
  }

  /** The object ends a noun phrase that begins right after the verb; *launch the job editor* has another object. */
  private followsActive(words: readonly NearbyWord[]): boolean {
    for (let at = 0; at < words.length; at++) {
      if (PREPOSITIONS.has(words[at]!.word)) return false;
      for (const phrase of this.phrases) {
        if (!phrase.every((word, k) => words[at + k]?.word === word)) continue;
        const next = words[at + phrase.length];
        if (next === undefined ? at + phrase.length < REACH : AFTER_OBJECT.has(next.word) || next.word.endsWith('ly'))
          return true;
      }
    }
    return false;
  }

  /** Nearest first: (auxiliaries) (be) object, or a participle right behind its object: *jobs launched by*. */
  private isPassiveSubject(words: readonly NearbyWord[]): boolean {
    let at = 0;
    let sawBe = false;
    while (
      at < words.length &&
      (BE_FORMS.has(words[at]!.word) || AUXILIARIES.has(words[at]!.word) || words[at]!.word.endsWith('ly'))
    ) {
      sawBe ||= BE_FORMS.has(words[at]!.word);
      at++;
    }
    if (at > 0 && !sawBe) return false;
    return this.phrases.some((phrase) => phrase.every((word, k) => words[at + phrase.length - 1 - k]?.word === word));
  }
}
