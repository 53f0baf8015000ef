// Uses of a form that are no use as a word: quoted, glued to signs, or in a line of code that is not marked as such.
import type { Corpus } from '../../corpus/corpus.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { endRowOfBlock, firstRowOfBlock } from '../../corpus/stream.js';

/** What a sign beside a form makes of it, as bits; `known` marks a word of the vocabulary that was looked at. */
const Sign = { known: 1, quote: 2, assignment: 4, mayOpen: 8, mayClose: 16 } as const;

const QUOTE = /^["'“”‘’«»]/u;
const ASSIGNMENT = /^(?:[:!=+]?=+|[-=]>)$/;
const MAY_OPEN = /^[("'“‘[—–,;]$/u;
const MAY_CLOSE = /^[)"'”’\].,;:!?…—–]/u;

/** Tells mentions from uses in one corpus. */
export class Mentions {
  private readonly signs: Uint8Array;

  constructor(private readonly corpus: Corpus) {
    this.signs = new Uint8Array(corpus.vocabulary.size);
  }

  /** True where the rows `[row, row + length)` are part of a larger thing (a path, an option) or spoken of. */
  isMention(row: number, length: number): boolean {
    const { flags } = this.corpus.stream;
    const end = row + length;
    const before = row > firstRowOfBlock(this.corpus.stream, row) ? row - 1 : -1;
    const after = end < endRowOfBlock(this.corpus.stream, row) ? end : -1;
    const signBefore = before < 0 ? 0 : this.signOf(before);
    const signAfter = after < 0 ? 0 : this.signOf(after);
    if ((signBefore & signAfter & Sign.quote) !== 0) return true;
    if (((signBefore | signAfter) & Sign.assignment) !== 0) return true;
    if (before >= 0 && (flags[row]! & TokenFlag.spaceBefore) === 0 && (signBefore & Sign.mayOpen) === 0) return true;
    return after >= 0 && (flags[after]! & TokenFlag.spaceBefore) === 0 && (signAfter & Sign.mayClose) === 0;
  }

  private signOf(row: number): number {
    const { stream, vocabulary } = this.corpus;
    if ((stream.flags[row]! & TokenFlag.word) !== 0) return 0;
    const id = stream.spelling[row]!;
    const known = this.signs[id]!;
    if (known !== 0) return known;
    const text = vocabulary.textOf(id);
    let sign: number = Sign.known;
    if (QUOTE.test(text)) sign |= Sign.quote;
    if (ASSIGNMENT.test(text)) sign |= Sign.assignment;
    if (MAY_OPEN.test(text)) sign |= Sign.mayOpen;
    if (MAY_CLOSE.test(text)) sign |= Sign.mayClose;
    return (this.signs[id] = sign);
  }
}
