// The growing columns that a scanner writes its tokens into; used again for block after block.
import type { BlockTokens } from './tokens.js';

/** What the scanner takes a token for. */
export const TokenKind = { word: 0, identifier: 1, number: 2, punctuation: 3, symbol: 4, opaque: 5 } as const;

/** Columns of scanned tokens, one row a token; only the first `length` rows count. */
export class TokenColumns {
  length = 0;
  start = new Uint32Array(256);
  end = new Uint32Array(256);
  flags = new Uint8Array(256);
  kind = new Uint8Array(256);
  tag = new Uint8Array(256);
  /** 1 where the token lies within, and does not begin, an unbroken run too long to show to a tagger. */
  inLongRun = new Uint8Array(256);

  /** Forgets all rows. */
  clear(): void {
    this.length = 0;
  }

  /** Appends a row and returns its index. */
  add(start: number, end: number, kind: number, flags: number): number {
    const row = this.length++;
    if (row === this.start.length) this.grow();
    this.start[row] = start;
    this.end[row] = end;
    this.kind[row] = kind;
    this.flags[row] = flags;
    this.tag[row] = 0;
    this.inLongRun[row] = 0;
    return row;
  }

  /** A copy of the rows, exactly as long as needed. */
  toBlockTokens(word: readonly string[], lemma: readonly string[]): BlockTokens {
    const { length } = this;
    return {
      start: this.start.slice(0, length),
      end: this.end.slice(0, length),
      tag: this.tag.slice(0, length),
      flags: this.flags.slice(0, length),
      word,
      lemma,
    };
  }

  private grow(): void {
    const size = this.start.length * 2;
    const wide = (old: Uint32Array<ArrayBuffer>): Uint32Array<ArrayBuffer> => {
      const larger = new Uint32Array(size);
      larger.set(old);
      return larger;
    };
    const narrow = (old: Uint8Array<ArrayBuffer>): Uint8Array<ArrayBuffer> => {
      const larger = new Uint8Array(size);
      larger.set(old);
      return larger;
    };
    this.start = wide(this.start);
    this.end = wide(this.end);
    this.flags = narrow(this.flags);
    this.kind = narrow(this.kind);
    this.tag = narrow(this.tag);
    this.inLongRun = narrow(this.inLongRun);
  }
}
