// Pairs of whole numbers to small whole numbers: a hash table over typed arrays, append-only.
import { invariant } from './invariant.js';

const EMPTY = -1;

/** Gives each distinct pair `(left, right)` of numbers below 2^31 a number of its own, in order of arrival. */
export class PairTable {
  private lefts = new Int32Array(1024);
  private rights = new Int32Array(1024);
  private slots = new Int32Array(2048).fill(EMPTY);
  private count = 0;

  get size(): number {
    return this.count;
  }

  /** The number of a pair, given anew where it was not known. */
  idOf(left: number, right: number): number {
    const slot = this.slotOf(left, right);
    const found = this.slots[slot]!;
    if (found !== EMPTY) return found;
    if (this.count === this.lefts.length) this.growRows();
    const id = this.count++;
    this.lefts[id] = left;
    this.rights[id] = right;
    this.slots[slot] = id;
    if (this.count * 2 > this.slots.length) this.growSlots();
    return id;
  }

  /** The number of a pair, or undefined where it was never seen. */
  find(left: number, right: number): number | undefined {
    const found = this.slots[this.slotOf(left, right)]!;
    return found === EMPTY ? undefined : found;
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
      const id = this.slots[slot]!;
      if (id === EMPTY || (this.lefts[id] === left && this.rights[id] === right)) return slot;
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
    this.slots = new Int32Array(this.slots.length * 2).fill(EMPTY);
    for (let id = 0; id < this.count; id++) this.slots[this.slotOf(this.lefts[id]!, this.rights[id]!)] = id;
  }
}

/** Spreads a pair over 32 bits (multiplicative hashing, Knuth 1973, with a final shift). */
function mix(left: number, right: number): number {
  const h = Math.imul(left, 0x9e3779b1) ^ Math.imul(right + 0x7f4a7c15, 0x85ebca77);
  return h ^ (h >>> 15);
}
