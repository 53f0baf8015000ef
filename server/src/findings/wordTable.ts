// A closed set of folded words as an open-addressing hash table over typed arrays: from a word's hash to its number.

const MULTIPLIER = 0x01000193;

/**
 * Numbers words from 0 in order of first entry. The hashes of the words in it differ from each other; a word that is not in it
 * may share a hash with one that is, so a match is compared with the text in the end.
 */
export class WordTable {
  private readonly numbers = new Map<string, number>();
  /** Slots of (hash, number + 1), a power of two of them; filled by {@link freeze}. */
  slots = new Int32Array(2);
  mask = 0;
  /** The hash of no units. */
  seed = 0;

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

  /** Lays out the table, with the first seed under which no two of its words share a hash. */
  freeze(): void {
    let size = 16;
    while (size < this.numbers.size * 3) size *= 2;
    this.mask = size - 1;
    for (this.seed = 0x811c9dc5 | 0; !this.layOut(size); this.seed = (this.seed + 1) | 0);
  }

  private layOut(size: number): boolean {
    const slots = new Int32Array(size * 2);
    for (const [word, number] of this.numbers) {
      let hash = this.seed;
      for (let k = 0; k < word.length; k++) hash = hashStep(hash, word.charCodeAt(k));
      let slot = spread(hash) & this.mask;
      for (; slots[slot * 2 + 1] !== 0; slot = (slot + 1) & this.mask) if (slots[slot * 2] === hash) return false;
      slots[slot * 2] = hash;
      slots[slot * 2 + 1] = number + 1;
    }
    this.slots = slots;
    return true;
  }
}

/** Adds one unit to a word's hash (FNV-1a: Fowler, Noll & Vo 1991). */
export function hashStep(hash: number, unit: number): number {
  return Math.imul(hash ^ unit, MULTIPLIER);
}

/** Brings the high bits down, which a power-of-two mask would ignore. */
export function spread(hash: number): number {
  return hash ^ (hash >>> 15);
}
