// Where things end in LaTeX: groups, options, control sequences, comments, verbatim text.

/** An argument that is not read ends within this many units, else it is taken as not closed. */
const LONGEST_ARGUMENT = 20_000;
const LONGEST_OPTION = 3_000;
/** After so many arguments that nothing closes, the reader looks for ends no further than the line. */
const MOST_FAILURES = 30;
const BLANKS = /[ \t]*(?:(?:%.*)?\n[ \t]*)?(?=[[{(<*])/y;
const BLANK_LINE = /\n[ \t]*\n/g;
const CONTROL_WORD = /[A-Za-z@]+/y;

/** Looks ahead in one text. Each look costs no more than the stretch that it passes, or a fixed bound. */
export class Scanner {
  private failures = 0;
  /** For a sequence to look for: the offset from which it was looked for, and where it was found (-1: nowhere). */
  private readonly found = new Map<string, { readonly from: number; readonly at: number }>();
  private blankLine = { from: -1, at: -1 };

  constructor(readonly text: string) {}

  /** The name of the control sequence whose backslash stands at `at`: letters, or one other unit, or '' at the end. */
  controlName(at: number): string {
    CONTROL_WORD.lastIndex = at + 1;
    return CONTROL_WORD.exec(this.text)?.[0] ?? this.text.charAt(at + 1);
  }

  /** Where the argument that may begin at `at` begins: blanks, one line break and comments may stand before it. */
  argument(at: number, opening: string): number {
    if (this.text[at] === opening) return at;
    let from = at;
    for (let lines = 0; lines < 4; lines++) {
      BLANKS.lastIndex = from;
      const blanks = BLANKS.exec(this.text);
      if (!blanks) {
        const comment = /[ \t]*%.*\n[ \t]*/y;
        comment.lastIndex = from;
        const skipped = comment.exec(this.text);
        if (!skipped) return -1;
        from += skipped[0].length;
        continue;
      }
      const begin = from + blanks[0].length;
      return this.text[begin] === opening ? begin : -1;
    }
    return -1;
  }

  /** Behind the brace that closes the one at `open`, or -1 where none does. */
  groupEnd(open: number): number {
    return this.closing(open, '{', '}', LONGEST_ARGUMENT);
  }

  /** Behind the bracket that closes the one at `open`, or -1 where none does in its paragraph. */
  optionEnd(open: number): number {
    return this.closing(open, '', ']', LONGEST_OPTION);
  }

  private closing(open: number, opening: string, closing: string, most: number): number {
    const { text } = this;
    const last = Math.min(text.length, open + (this.failures < MOST_FAILURES ? most : 200));
    let depth = 0;
    for (let at = open + 1; at < last; at++) {
      const unit = text[at]!;
      if (unit === '\\') at++;
      else if (unit === closing && depth === 0) return at + 1;
      else if (unit === '{') depth++;
      else if (unit === '}') {
        if (depth === 0) break;
        depth--;
      } else if (unit === '%') {
        const end = text.indexOf('\n', at);
        at = end < 0 ? last : end - 1;
      } else if (opening === '' && unit === '\n' && this.isBlankLine(at + 1)) break;
    }
    this.failures++;
    return -1;
  }

  /** True where the line that begins at `at` is blank. */
  isBlankLine(at: number): boolean {
    const { text } = this;
    let i = at;
    while (text[i] === ' ' || text[i] === '\t') i++;
    return i >= text.length || text[i] === '\n';
  }

  /** Behind verbatim text that begins at `at` with its delimiter, on one line; -1 where it has no end near by. */
  verbatimEnd(at: number): number {
    const { text } = this;
    const delimiter = text[at];
    if (delimiter === undefined || /[\sA-Za-z]/.test(delimiter)) return -1;
    if (delimiter === '{') {
      let depth = 0;
      for (let i = at; i < text.length && text[i] !== '\n' && i < at + LONGEST_OPTION; i++) {
        if (text[i] === '{') depth++;
        else if (text[i] === '}' && --depth === 0) return i + 1;
      }
      return -1;
    }
    const length = text.slice(at + 1, Math.min(this.lineEnd(at), at + LONGEST_OPTION)).indexOf(delimiter);
    return length < 0 ? -1 : at + length + 2;
  }

  /** Where `what` stands at or behind `from`, or -1. */
  find(what: string, from: number): number {
    const known = this.found.get(what);
    if (known && known.from <= from && (known.at < 0 || known.at >= from)) return known.at;
    const at = this.text.indexOf(what, from);
    this.found.set(what, { from, at });
    return at;
  }

  /** The end of the paragraph that `at` lies in: where the blank line behind it begins, or the text's end. */
  paragraphEnd(at: number): number {
    const { blankLine } = this;
    if (blankLine.from <= at && at <= blankLine.at) return blankLine.at;
    BLANK_LINE.lastIndex = at;
    const found = BLANK_LINE.exec(this.text)?.index ?? this.text.length;
    this.blankLine = { from: at, at: found };
    return found;
  }

  lineEnd(at: number): number {
    const end = this.find('\n', at);
    return end < 0 ? this.text.length : end;
  }

  /** The options in `[from, to)`: keys, and their values without the braces around them. */
  *options(from: number, to: number): Generator<{ key: string; start: number; end: number }> {
    const { text } = this;
    let at = from;
    while (at < to) {
      let depth = 0;
      let equals = -1;
      let end = at;
      for (; end < to; end++) {
        const unit = text[end]!;
        if (unit === '\\') end++;
        else if (unit === '{') depth++;
        else if (unit === '}') depth--;
        else if (depth === 0 && unit === '=' && equals < 0) equals = end;
        else if (depth === 0 && unit === ',') break;
      }
      end = Math.min(end, to);
      if (equals >= 0) yield { key: text.slice(at, equals).trim(), ...this.withoutBraces(equals + 1, end) };
      at = end + 1;
    }
  }

  private withoutBraces(from: number, to: number): { start: number; end: number } {
    let start = from;
    let end = to;
    while (start < end && /\s/.test(this.text[start]!)) start++;
    while (end > start && /\s/.test(this.text[end - 1]!)) end--;
    if (end - start >= 2 && this.text[start] === '{' && this.text[end - 1] === '}')
      return { start: start + 1, end: end - 1 };
    return { start, end };
  }
}
