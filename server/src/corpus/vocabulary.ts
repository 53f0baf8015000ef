// The words of a corpus: each distinct spelling has a number, and each knows its lower-case form.
import { Interner } from '../base/interner.js';

/** An append-only table of spellings, shared by all snapshots of a corpus. */
export class Vocabulary {
  private readonly words = new Interner();
  private readonly folds: number[] = [];

  get size(): number {
    return this.words.size;
  }

  /** The number of a spelling, given anew where it was not known. */
  idOf(text: string): number {
    const known = this.words.find(text);
    if (known !== undefined) return known;
    const lower = text.toLowerCase();
    const fold = lower === text ? this.words.size : this.idOf(lower);
    const id = this.words.idOf(text);
    this.folds[id] = fold;
    return id;
  }

  /** The number of a spelling, or undefined where it was never seen. */
  find(text: string): number | undefined {
    return this.words.find(text);
  }

  /** The number of the lower-case form of a spelling. */
  foldOf(id: number): number {
    return this.folds[id]!;
  }

  textOf(id: number): string {
    return this.words.textOf(id);
  }
}
