// The lines of one block as one text, written to a builder from left to right with their places in the source.
import type { ContentBuilder } from '../content.js';
import { isBlank } from './lines.js';

/** Lines joined by `\n`: where each begins in the joined text and in the source. */
export interface Joined {
  readonly text: string;
  readonly joinedAt: readonly number[];
  readonly sourceAt: readonly number[];
}

/** Writes a joined text. Line breaks and the blanks around markup fold. */
export class JoinedText {
  /** Up to where the text has been written or skipped. */
  at = 0;
  private line = 0;
  /** The first line break at or behind the place written to last, or the text's end. */
  private newline = -1;

  constructor(
    private readonly joined: Joined,
    private readonly out: ContentBuilder,
  ) {}

  /** Writes the text up to `to`. */
  write(to: number): void {
    const { text } = this.joined;
    while (this.at < to) {
      if (this.newline < this.at) {
        const found = text.indexOf('\n', this.at);
        this.newline = found < 0 ? text.length : found;
      }
      const stop = Math.min(this.newline, to);
      let start = this.at;
      while (start < stop && isBlank(text.charCodeAt(start))) start++;
      let end = stop;
      while (end > start && isBlank(text.charCodeAt(end - 1))) end--;
      if (start > this.at) this.out.space(this.source(this.at), this.source(start));
      if (end > start) this.out.run(this.source(start), this.source(end));
      const next = stop < to ? stop + 1 : to;
      if (next > end) this.out.space(this.source(end), this.source(next));
      this.at = next;
    }
  }

  /** Leaves out what stands up to `to`. */
  skip(to: number): void {
    this.at = Math.max(this.at, to);
  }

  /** Writes one opaque unit for what stands up to `to`. */
  opaque(to: number): void {
    const from = this.source(this.at);
    this.out.opaque(from, this.source(to));
    this.skip(to);
  }

  /** The source offset of a place, which must not lie on a line before that of the last place asked for. */
  private source(at: number): number {
    const { joinedAt, sourceAt } = this.joined;
    while (this.line + 1 < joinedAt.length && joinedAt[this.line + 1]! <= at) this.line++;
    return sourceAt[this.line]! + at - joinedAt[this.line]!;
  }
}
