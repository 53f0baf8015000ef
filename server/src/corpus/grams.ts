// Surface n-grams of two to four words as numbers: each is its beginning and one more word.
import { PairTable } from '../base/pairTable.js';

/** The longest n-gram that is counted. */
export const LONGEST_GRAM = 4;

/**
 * All n-grams ever seen, append-only. An n-gram of length n is the pair (its first n − 1 words, its last word), so the
 * table holds beginnings too. Ids of different lengths share one range.
 */
export class GramTable {
  private readonly pairs = new PairTable();
  /** The length in words of each gram. */
  private lengths = new Uint8Array(1024);

  get size(): number {
    return this.pairs.size;
  }

  /** The id of `prefix` followed by `word`; `length` is the length of the whole. A prefix of one word is its word id. */
  extend(prefix: number, word: number, length: number): number {
    const id = this.pairs.idOf(leftKey(prefix, length), word);
    if (id >= this.lengths.length) {
      const longer = new Uint8Array(id * 2);
      longer.set(this.lengths);
      this.lengths = longer;
    }
    this.lengths[id] = length;
    return id;
  }

  /** The id of a sequence of 2 to 4 word ids, or undefined where it was never seen. */
  find(words: ArrayLike<number>): number | undefined {
    let id: number | undefined = words[0];
    for (let n = 2; n <= words.length && id !== undefined; n++) id = this.pairs.find(leftKey(id, n), words[n - 1]!);
    return words.length < 2 ? undefined : id;
  }

  /** The id of `prefix` followed by `word`, or undefined where it was never seen. */
  findExtension(prefix: number, word: number, length: number): number | undefined {
    return this.pairs.find(leftKey(prefix, length), word);
  }

  /** The word ids of a gram, in order. */
  wordsOf(id: number): number[] {
    const words: number[] = [];
    let at = id;
    for (let n = this.lengths[id]!; n >= 2; n--) {
      words.push(this.pairs.rightOf(at));
      at = (this.pairs.leftOf(at) - (n === 2 ? 0 : 1)) / 2;
    }
    words.push(at);
    return words.reverse();
  }
}

/** Words and grams are numbered apart: even keys are words, odd keys are grams. */
function leftKey(prefix: number, length: number): number {
  return length === 2 ? prefix * 2 : prefix * 2 + 1;
}
