// The uses of a long form and of a short one: every way of writing that the corpus has, singular and plural.
import type { Corpus } from '../../corpus/corpus.js';
import { rowsOfSequence } from '../../corpus/concordance.js';
import type { Use } from '../places.js';
import { numberForms } from '../wording.js';
import { shortFormOf } from './definitions.js';

/** One form with its uses, in document order. */
export interface FormUses {
  readonly folds: readonly number[];
  readonly uses: readonly Use[];
}

/**
 * The forms of a long form that the corpus has: its words open or joined by hyphens, the last in singular or plural.
 * @param words lower-case words, the last in the singular
 */
export function formsOfLong(corpus: Corpus, words: readonly string[]): FormUses[] {
  const sequences: number[][] = [];
  const extend = (prefix: readonly number[], at: number): void => {
    if (at === words.length) sequences.push([...prefix]);
    for (let end = at + 1; end <= words.length; end++) {
      const head = words
        .slice(at, end - 1)
        .map((word) => `${word}-`)
        .join('');
      const tail = words[end - 1]!;
      for (const last of end === words.length ? numberForms(tail) : [tail]) {
        const id = corpus.vocabulary.find(head + last);
        if (id !== undefined && corpus.stream.rowsOf(id).length > 0) extend([...prefix, id], end);
      }
    }
  };
  extend([], 0);
  return sequences
    .map((folds) => ({
      folds,
      uses: rowsOfSequence(corpus.stream, folds).map((row) => ({ row, length: folds.length })),
    }))
    .filter(({ uses }) => uses.length > 0);
}

/** The uses of a short form written as one, singular and plural; in small letters it is another word (IT, it). */
export function formsOfShort(corpus: Corpus, short: string): FormUses[] {
  const { vocabulary, stream } = corpus;
  const forms: FormUses[] = [];
  for (const text of [short, `${short}s`]) {
    const fold = vocabulary.find(text.toLowerCase());
    if (fold === undefined) continue;
    const uses: Use[] = [];
    for (const row of stream.rowsOf(fold)) {
      const spelling = vocabulary.textOf(stream.spelling[row]!);
      if (spelling === text || shortFormOf(spelling)?.toLowerCase() === short.toLowerCase())
        uses.push({ row, length: 1 });
    }
    if (uses.length > 0) forms.push({ folds: [fold], uses });
  }
  return forms;
}
