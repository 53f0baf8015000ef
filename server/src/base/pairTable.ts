// Pairs of whole numbers to small whole numbers: a hash table over typed arrays, append-only.
import { invariant } from './invariant.js';

const EMPTY = 0;

/** Gives each distinct pair `(left, right)` of numbers below 2^31 a number of its own, in order of arrival. */
export class PairTable {
  private lefts: Int32Array;
  private rights: Int32Array;
  /** Numbers of pairs plus one, at the places that their hashes give. */
  private slots: Int32Array;
  private count = 0;

  /** @param expected how many pairs there will be: a table that need not grow leaves nothing behind */
  constructor(expected = 1024) {
    const rows = Math.max(16, expected);
    this.lefts = new Int32Array(rows);
    this.rights = new Int32Array(rows);
    this.slots = new Int32Array(2 ** Math.ceil(Math.log2(rows * 2)));
  }

  get size(): number {
    return this.count;
  }

  /** The number of a pair, given anew where it was not known. */
  idOf(left: number, right: number): number {
    const slot = this.slotOf(left, right);
    const found = this.slots[slot]!;
    if (found !== EMPTY) return found - 1;
    if (this.count === this.lefts.length) this.growRows();
    const id = this.count++;
    this.lefts[id] = left;
    this.rights[id] = right;
    this.slots[slot] = id + 1;
    if (this.count * 2 > this.slots.length) this.growSlots();
    return id;
  }

  /** The number of a pair, or undefined where it was never seen. */
  find(left: number, right: number): number | undefined {
    const found = this.slots[this.slotOf(left, right)]!;
    return found === EMPTY ? undefined : found - 1;
  }

  leftOf(id: number): number {
    return this.lefts[id]!;
  }

  rightOf(id: number): number {
    return this.rights[id]!;
  }

  private slotOf(left: number, right: number): number {
    const mask = this.slots.length - 1;
    let slot = mix(left, right) & mask;
    for (;;) {
      const found = this.slots[slot]!;
      if (found === EMPTY || (this.lefts[found - 1] === left && this.rights[found - 1] === right)) return slot;
      slot = (slot + 1) & mask;
    }
  }

  private growRows(): void {
    invariant(this.count < 2 ** 30, 'a pair table holds fewer than 2^30 pairs');
    const lefts = new Int32Array(this.count * 2);
    const rights = new Int32Array(this.count * 2);
    lefts.set(this.lefts);
    rights.set(this.rights);
    this.lefts = lefts;
    this.rights = rights;
  }

  private growSlots(): void {
    const slots = (this.slots = new Int32Array(this.slots.length * 2));
    const mask = slots.length - 1;
    // All pairs differ: a free place is all that is looked for.
    for (let id = 0; id < this.count; id++) {
      let slot = mix(this.lefts[id]!, this.rights[id]!) & mask;
      while (slots[slot] !== EMPTY) slot = (slot + 1) & mask;
      slots[slot] = id + 1;
    }
  }
}

/** Spreads a pair over 32 bits (multiplicative hashing, Knuth 1973, with a final shift). */
function mix(left: number, right: number): number {
  const h = Math.imul(left, 0x9e3779b1) ^ Math.imul(right + 0x7f4a7c15, 0x85ebca77);
  return h ^ (h >>> 15);
}
