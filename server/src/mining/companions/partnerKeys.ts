// Words in a relation as numbers: a dictionary form with its particle and preposition.
import type { Corpus } from '../../corpus/corpus.js';
import type { Partner } from './grammar.js';
import { shownWord } from './shownWord.js';

/** More particles and prepositions than a language has: keys stay exact whatever the size of the vocabulary. */
const MOST_FUNCTION_WORDS = 2048;

/** Numbers the partners of one corpus; those without particle and preposition have the number of their lemma. */
export class PartnerKeys {
  readonly size: number;
  /** Particles and prepositions in order of arrival, behind a place for none; they are few. */
  private readonly functionWords: number[] = [-1];

  constructor(private readonly corpus: Corpus) {
    this.size = corpus.vocabulary.size;
  }

  /** The identity of a partner: its dictionary form with its particle and preposition. */
  of({ row, particle, preposition }: Partner): number {
    const { lemma } = this.corpus.stream;
    return lemma[row]! + this.size * (this.numberOf(particle) + MOST_FUNCTION_WORDS * this.numberOf(preposition));
  }

  lemmaOf(key: number): number {
    return key % this.size;
  }

  /** The words of a partner: “set up”, “store in”. */
  textOf(key: number): string {
    const { corpus, functionWords, size } = this;
    const rest = Math.floor(key / size);
    const behind = [rest % MOST_FUNCTION_WORDS, Math.floor(rest / MOST_FUNCTION_WORDS)].filter((number) => number > 0);
    const words = behind.map((number) => corpus.vocabulary.textOf(functionWords[number]!));
    return [shownWord(corpus, key % size), ...words].join(' ');
  }

  /** A particle or preposition as a small number of its own; 0 stands for none. */
  private numberOf(row: number | undefined): number {
    if (row === undefined) return 0;
    const word = this.corpus.stream.fold[row]!;
    let number = this.functionWords.indexOf(word);
    if (number < 0) number = this.functionWords.push(word) - 1;
    return Math.min(number, MOST_FUNCTION_WORDS - 1);
  }
}
