// The text of one block gathered from its lines, with the way back to the source.
import { isBlank, type Line } from './lines.js';

/** The lines of a block joined by `\n`, without blanks at either end of a line. */
export class Passage {
  readonly text: string;
  private readonly joined: number[] = [];
  private readonly sources: number[] = [];
  private found: Map<string, { from: number; at: number; last: number }> | undefined;
  private readonly closing = { from: 0, at: -1 };

  /** `lines` are stretches of `source` in ascending order, at least one. */
  constructor(
    readonly source: string,
    lines: readonly Line[],
  ) {
    let text = '';
    for (const { start, end } of lines) {
      let from = start;
      while (from < end && isBlank(source.charCodeAt(from))) from++;
      if (this.joined.length > 0) text += '\n';
      this.joined.push(text.length);
      this.sources.push(from);
      text += source.slice(from, end);
    }
    this.text = text;
  }

  /** The offset in the source of the unit at `at`. At a line's end that is the end of the line in the source. */
  sourceOf(at: number): number {
    const { joined, sources } = this;
    if (joined.length === 1) return sources[0]! + at;
    let low = 0;
    let high = joined.length - 1;
    while (low < high) {
      const middle = (low + high + 1) >>> 1;
      if (joined[middle]! <= at) low = middle;
      else high = middle - 1;
    }
    return sources[low]! + at - joined[low]!;
  }

  /** The offset in the source right behind the unit before `at`. */
  sourceEndOf(at: number): number {
    return at === 0 ? this.sourceOf(0) : this.sourceOf(at - 1) + 1;
  }

  /** As `indexOf`, at a cost that is linear over calls with ascending `from`; the text's length where there is none. */
  next(what: string, from: number): number {
    this.found ??= new Map();
    let known = this.found.get(what);
    if (!known) {
      known = { from: -1, at: -1, last: this.text.lastIndexOf(what) };
      this.found.set(what, known);
    }
    if (from > known.last) return this.text.length;
    if (known.from > from || known.at < from) {
      known.from = from;
      known.at = this.text.indexOf(what, from);
    }
    return known.at;
  }

  /** The next closing bracket that no backslash stands before, at the same cost. */
  nextClosing(from: number): number {
    const { closing, text } = this;
    if (closing.from > from || closing.at < from) {
      let at = text.indexOf(']', from);
      while (at > 0 && text.charCodeAt(at - 1) === 92) at = text.indexOf(']', at + 1);
      closing.from = from;
      closing.at = at < 0 ? text.length : at;
    }
    return closing.at;
  }
}
