// A closed set of folded words as an open-addressing hash table over typed arrays: from a word's hash to its number.

/** Stands in a slot for a word's number where several words share its hash: then the spelling decides. */
export const SHARED = -1;

/**
 * Numbers words from 0 in order of first entry. A word that is not in the table may share a hash with one that is, so whoever looks
 * up by hash compares the text in the end.
 */
export class WordTable {
  private readonly numbers = new Map<string, number>();
  /** Slots of (hash, number + 1 or {@link SHARED}), a power of two of them, the second half of an empty one being 0. */
  slots = new Int32Array(2);
  mask = 0;

  get size(): number {
    return this.numbers.size;
  }

  /** Enters a word. */
  enter(word: string): void {
    if (!this.numbers.has(word)) this.numbers.set(word, this.numbers.size);
  }

  /** The number of a folded word given as a string of its own, or −1. */
  find(word: string): number {
    return this.numbers.get(word) ?? -1;
  }

  /** Lays out the table; words entered later are not in it. */
  freeze(): void {
    let size = 16;
    while (size < this.numbers.size * 2) size *= 2;
    this.mask = size - 1;
    this.slots = new Int32Array(size * 2);
    for (const [word, number] of this.numbers) {
      let hash = 0;
      for (let k = 0; k < word.length; k++) hash = hashStep(hash, word.charCodeAt(k));
      let slot = spread(hash) & this.mask;
      while (this.slots[slot * 2 + 1] !== 0 && this.slots[slot * 2] !== hash) slot = (slot + 1) & this.mask;
      this.slots[slot * 2 + 1] = this.slots[slot * 2 + 1] === 0 ? number + 1 : SHARED;
      this.slots[slot * 2] = hash;
    }
  }
}

/** Adds one unit to a word's hash, a polynomial in 127 modulo 2^32 that begins at 0. */
export function hashStep(hash: number, unit: number): number {
  return ((hash << 7) - hash + unit) | 0;
}

/** Brings the high bits down, which a power-of-two mask would ignore. */
export function spread(hash: number): number {
  const mixed = Math.imul(hash, 0x9e3779b1);
  return mixed ^ (mixed >>> 15);
}
